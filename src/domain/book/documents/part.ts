import type { BodyOf } from '../kinds';
import type { EntryOf } from '../read-body';
import { getDoc, putDoc, type Effect } from './effect';
import { updateRig, voidCheck } from './rig';
import { traceOf, type Standing, type Trace } from './trace';

/** A part on a rig, from the day it was fitted. Its id is that of its `part.fitted`. */
export interface PartDoc {
  readonly kind: 'part';
  readonly id: string;
  /** The rig. */
  readonly parent: string;
  readonly fitted: BodyOf<'part.fitted'>;
  readonly trace: Trace;
  readonly irregular: string | null;
  readonly retired: (Trace & { readonly why: string }) | null;
}

const PART_CHANGED = { code: 'part-changed', words: 'A part was changed after the check.' };

export function* foldPart(entry: EntryOf<'part.fitted' | 'part.retired'>, standing: Standing): Effect {
  const trace = traceOf(entry.meta, standing);
  const { subject } = entry.meta;
  if (entry.kind === 'part.retired') {
    yield* retire(entry.body.part, subject, { ...trace, why: entry.body.why });
  } else {
    const { replaces } = entry.body;
    yield* putDoc({
      kind: 'part',
      id: entry.meta.id,
      parent: subject,
      fitted: entry.body,
      trace,
      irregular: standing.irregular,
      retired: null,
    });
    if (replaces !== null) yield* retire(replaces, subject, { ...trace, why: 'Replaced' });
  }
  yield* updateRig(subject, (rig) => voidCheck(rig, trace, PART_CHANGED));
}

function* retire(id: string, rig: string, retired: Trace & { readonly why: string }): Effect {
  const part = yield* getDoc('part', id);
  if (part?.parent === rig && part.retired === null) yield* putDoc({ ...part, retired });
}
