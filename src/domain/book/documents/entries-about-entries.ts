import { checkBody } from '../read-body';
import type { EntryOf } from '../read-body';
import { getDoc, putDoc, type Effect } from './effect';
import { markHeld } from './held';
import { correctReading, strikeReading, type ReadingDoc } from './reading';
import { traceOf, type Standing } from './trace';

/** Corrections of readings and check steps. A correction of a correction names the correction. */
export function* foldCorrection(entry: EntryOf<'entry.corrected'>, standing: Standing): Effect {
  const { corrects, kind, body, why } = entry.body;
  const trace = traceOf(entry.meta, standing);
  if (kind === 'firing.reading') {
    const values = checkBody('firing.reading', body);
    const reading = yield* findReading(corrects, entry.meta.subject);
    if (values.type === 'unreadable' || reading === undefined) return;
    yield* correctReading(reading, { ...trace, replaces: corrects, values: values.body, why });
    return;
  }
  if (kind === 'check.step-done') {
    const step = checkBody('check.step-done', body);
    const check = yield* getDoc('check', entry.meta.subject);
    if (step.type === 'unreadable' || check === undefined) return;
    const record = check.steps[step.body.step];
    if (record === undefined || record.entry !== corrects) return;
    const corrected = { ...record, ...trace, result: step.body.result, words: step.body.note };
    yield* putDoc({ ...check, steps: { ...check.steps, [step.body.step]: corrected } });
  }
}

export function* foldStrike(entry: EntryOf<'entry.struck'>, standing: Standing): Effect {
  const { strikes, why } = entry.body;
  const trace = traceOf(entry.meta, standing);
  const held = yield* getDoc('held', strikes);
  if (held !== undefined) {
    yield* markHeld(strikes, { dismissed: trace });
    return;
  }
  const reading = yield* findReading(strikes, entry.meta.subject);
  if (reading !== undefined) yield* strikeReading(reading, { ...trace, why });
}

/** A reading of this firing by its own id or by that of one of its corrections. */
export function* findReading(id: string, firing: string): Effect<ReadingDoc | undefined> {
  const direct = yield* getDoc('reading', id);
  if (direct !== undefined) return direct.parent === firing ? direct : undefined;
  const pointer = yield* getDoc('correction', id);
  if (pointer === undefined) return undefined;
  const reading = yield* getDoc('reading', pointer.reading);
  return reading?.parent === firing ? reading : undefined;
}
