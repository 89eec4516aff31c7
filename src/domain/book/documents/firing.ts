import type { BodyOf } from '../kinds';
import type { EntryOf } from '../read-body';
import { getDoc, putDoc, type Effect } from './effect';
import type { ReadingDoc } from './reading';
import { holdBy, keepActive, updateRig } from './rig';
import { traceOf, type Standing, type Trace } from './trace';

export interface FiringReview extends Trace {
  readonly verdict: 'reviewed' | 'sent-back';
  readonly words: string;
  readonly left_out: readonly string[];
}

export interface FiringDoc {
  readonly kind: 'firing';
  readonly id: string;
  readonly parent: string;
  readonly number: string;
  readonly rig_revision: string;
  readonly check: string | null;
  readonly permit: string | null;
  readonly unready: BodyOf<'firing.opened'>['unready'];
  readonly opened: Trace;
  readonly opened_irregular: string | null;
  readonly readings: number;
  readonly irregular_readings: number;
  readonly shots: number;
  readonly last_reading: string | null;
  readonly closed: (Trace & { readonly summary: string }) | null;
  readonly reviews: readonly FiringReview[];
}

type FiringEntry = EntryOf<
  | 'firing.opened'
  | 'firing.reading'
  | 'firing.shots-counted'
  | 'firing.closed'
  | 'firing.reviewed'
  | 'firing.sent-back'
>;

export function* foldFiring(entry: FiringEntry, standing: Standing): Effect {
  const trace = traceOf(entry.meta, standing);
  if (entry.kind === 'firing.opened') {
    yield* openFiring(entry, trace, standing);
    return;
  }
  const firing = yield* getDoc('firing', entry.meta.subject);
  if (firing === undefined) return;
  switch (entry.kind) {
    case 'firing.reading':
      yield* addReading(firing, entry, standing);
      return;
    case 'firing.shots-counted':
      yield* putDoc({ ...firing, shots: firing.shots + entry.body.shots });
      yield* keepCheckActive(firing, trace);
      return;
    case 'firing.closed':
      yield* putDoc({ ...firing, closed: firing.closed ?? { ...trace, summary: entry.body.summary } });
      yield* updateRig(firing.parent, (rig) => ({
        ...rig,
        open_firings: rig.open_firings.filter((id) => id !== firing.id),
      }));
      yield* keepCheckActive(firing, trace);
      return;
    case 'firing.reviewed':
      yield* putDoc(
        withReview(firing, {
          ...trace,
          verdict: 'reviewed',
          words: entry.body.words,
          left_out: entry.body.left_out,
        }),
      );
      return;
    case 'firing.sent-back':
      yield* putDoc(
        withReview(firing, { ...trace, verdict: 'sent-back', words: entry.body.words, left_out: [] }),
      );
  }
}

/** The review that stands: the last one. */
export function standingReview(firing: FiringDoc): FiringReview | null {
  return firing.reviews.at(-1) ?? null;
}

function* openFiring(entry: EntryOf<'firing.opened'>, trace: Trace, standing: Standing): Effect {
  const { number, rig, rig_revision, check, permit, unready } = entry.body;
  const { id } = entry.meta;
  yield* putDoc({
    kind: 'firing',
    id,
    parent: rig,
    number,
    rig_revision,
    check,
    permit,
    unready,
    opened: trace,
    opened_irregular: standing.irregular,
    readings: 0,
    irregular_readings: 0,
    shots: 0,
    last_reading: null,
    closed: null,
    reviews: [],
  });
  yield* updateRig(rig, (doc) =>
    holdBy({ ...doc, open_firings: [...doc.open_firings, id], last_firing: id }, trace),
  );
}

function* addReading(firing: FiringDoc, entry: EntryOf<'firing.reading'>, standing: Standing): Effect {
  const trace = traceOf(entry.meta, standing);
  const no = firing.readings + 1;
  const reading: ReadingDoc = {
    kind: 'reading',
    id: trace.entry,
    parent: firing.id,
    rig: firing.parent,
    no,
    original: entry.body,
    logged: trace,
    irregular: standing.irregular,
    corrections: [],
    struck: null,
  };
  yield* putDoc(reading);
  yield* putDoc({
    ...firing,
    readings: no,
    irregular_readings: firing.irregular_readings + (standing.irregular === null ? 0 : 1),
    shots: firing.shots + entry.body.shots,
    last_reading: trace.entry,
  });
  yield* keepCheckActive(firing, trace);
}

function* keepCheckActive(firing: FiringDoc, trace: Trace): Effect {
  yield* updateRig(firing.parent, (rig) =>
    rig.ready_check?.check === firing.check ? keepActive(rig, trace) : rig,
  );
}

function withReview(firing: FiringDoc, review: FiringReview): FiringDoc {
  return { ...firing, reviews: [...firing.reviews, review] };
}
