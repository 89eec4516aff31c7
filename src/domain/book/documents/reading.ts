import type { ReadingValues } from '../bodies/firing-bodies';
import type { Effect } from './effect';
import { getDoc, putDoc } from './effect';
import type { Trace } from './trace';
import { pointBack, standingValues, type Correction, type StandingValues } from './versions';

export type ReadingCorrection = Correction<ReadingValues>;

export interface ReadingDoc {
  readonly kind: 'reading';
  readonly id: string;
  /** The firing. */
  readonly parent: string;
  readonly rig: string;
  readonly no: number;
  readonly original: ReadingValues;
  readonly logged: Trace;
  readonly irregular: string | null;
  /** Each names the one that it replaces: the reading itself or an earlier correction (protocol 1.7). */
  readonly corrections: readonly ReadingCorrection[];
  readonly struck: (Trace & { readonly why: string }) | null;
}

export type StandingReading = StandingValues<ReadingValues>;

/** What the reading says now: the end of its chain of corrections. */
export function standingReading(reading: ReadingDoc): StandingReading {
  return standingValues(reading);
}

/** Corrects a reading and keeps the firing's count of shots in step. */
export function* correctReading(reading: ReadingDoc, correction: ReadingCorrection): Effect {
  const corrected = { ...reading, corrections: [...reading.corrections, correction] };
  yield* putDoc(corrected);
  yield* pointBack(correction.entry, reading.parent, reading.id);
  yield* recountShots(reading, corrected);
}

export function* strikeReading(reading: ReadingDoc, struck: Trace & { readonly why: string }): Effect {
  const after = { ...reading, struck };
  yield* putDoc(after);
  yield* recountShots(reading, after);
}

/** Wear leans to the larger count: while two corrections stand against each other the greater one counts. */
export function countedShots(reading: ReadingDoc): number {
  const now = standingReading(reading);
  if (now.type === 'struck') return 0;
  if (now.type === 'stands') return now.values.shots;
  return Math.max(...now.versions.map((one) => one.values.shots));
}

function* recountShots(before: ReadingDoc, after: ReadingDoc): Effect {
  const difference = countedShots(after) - countedShots(before);
  const firing = yield* getDoc('firing', before.parent);
  if (firing !== undefined && difference !== 0)
    yield* putDoc({ ...firing, shots: firing.shots + difference });
}
