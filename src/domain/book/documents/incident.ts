import type { EntryOf } from '../read-body';
import { getDoc, putDoc, type Effect } from './effect';
import { standDown, updateRig } from './rig';
import { traceOf, type Standing, type Trace } from './trace';

export interface IncidentDoc {
  readonly kind: 'incident';
  readonly id: string;
  readonly parent: string;
  readonly what: string;
  readonly near: string;
  readonly made_safe: string;
  readonly reported: Trace;
  readonly answers: readonly (Trace & { readonly words: string })[];
  readonly closed: (Trace & { readonly words: string }) | null;
}

type IncidentEntry = EntryOf<'incident.reported' | 'incident.answered' | 'incident.closed'>;

/** An incident stands its rig down by itself, under its own id. */
export function* foldIncident(entry: IncidentEntry, standing: Standing): Effect {
  const trace = traceOf(entry.meta, standing);
  if (entry.kind === 'incident.reported') {
    const { what, near, made_safe } = entry.body;
    const { id, subject } = entry.meta;
    yield* putDoc({
      kind: 'incident',
      id,
      parent: subject,
      what,
      near,
      made_safe,
      reported: trace,
      answers: [],
      closed: null,
    });
    yield* updateRig(subject, (rig) => standDown(rig, trace, what));
    return;
  }
  const incident = yield* getDoc('incident', entry.meta.subject);
  if (incident === undefined) return;
  const said = { ...trace, words: entry.body.words };
  yield* putDoc(
    entry.kind === 'incident.closed'
      ? { ...incident, closed: said }
      : { ...incident, answers: [...incident.answers, said] },
  );
}
