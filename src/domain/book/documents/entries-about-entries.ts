import { isKind } from '../kinds';
import { checkBody } from '../read-body';
import type { EntryOf } from '../read-body';
import type { AlignmentDoc, AlignmentValues } from './alignment';
import { getDoc, putDoc, type Effect } from './effect';
import { markHeld } from './held';
import type { NoteDoc, PhotoDoc, TraceDoc } from './note';
import { correctReading, strikeReading, type ReadingDoc } from './reading';
import { traceOf, type Standing, type Trace } from './trace';
import { correctedId, pointBack } from './versions';

type Strikeable = ReadingDoc | AlignmentDoc | PhotoDoc | TraceDoc | NoteDoc;
type Correctable = Exclude<Strikeable, NoteDoc>;

/** Kind of the entries that a document came from, which its correction must repeat. */
export function entryKindOf(doc: Correctable): string {
  switch (doc.kind) {
    case 'reading':
      return 'firing.reading';
    case 'alignment':
      return doc.original.kind;
    case 'photo':
      return 'photo.attached';
    case 'trace':
      return 'trace.attached';
  }
}

/** A correction of a correction names the correction. */
export function* foldCorrection(entry: EntryOf<'entry.corrected'>, standing: Standing): Effect {
  const { corrects, kind, body, why } = entry.body;
  const trace = traceOf(entry.meta, standing);
  if (kind === 'check.step-done') {
    yield* correctStep(entry, trace);
    return;
  }
  const found = yield* findStrikeable(corrects, entry.meta.subject);
  if (found === undefined || found.kind === 'note' || entryKindOf(found) !== kind || !isKind(kind)) return;
  const checked = checkBody(kind, body);
  if (checked.type === 'unreadable') return;
  const correction = { ...trace, replaces: corrects, why };
  if (found.kind === 'reading') {
    const values = checked.body as ReadingDoc['original'];
    yield* correctReading(found, { ...correction, values });
    return;
  }
  yield* putDoc(withCorrection(found, correction, checked.body));
  yield* pointBack(trace.entry, found.parent, found.id);
}

function* correctStep(entry: EntryOf<'entry.corrected'>, trace: Trace): Effect {
  const step = checkBody('check.step-done', entry.body.body);
  const check = yield* getDoc('check', entry.meta.subject);
  if (step.type === 'unreadable' || check === undefined) return;
  const record = check.steps[step.body.step];
  if (record === undefined || record.entry !== entry.body.corrects) return;
  const { result, note, kit } = step.body;
  const corrected = { ...record, ...trace, result, words: note, kit: kit ?? [] };
  yield* putDoc({ ...check, steps: { ...check.steps, [step.body.step]: corrected } });
}

type CorrectionHead = Trace & { readonly replaces: string; readonly why: string };

/** The values were checked against the kind of entry that the document came from. */
function withCorrection(
  doc: Exclude<Correctable, ReadingDoc>,
  head: CorrectionHead,
  values: unknown,
): Correctable {
  switch (doc.kind) {
    case 'alignment': {
      const whole = { kind: doc.original.kind, body: values } as AlignmentValues;
      return { ...doc, corrections: [...doc.corrections, { ...head, values: whole }] };
    }
    case 'photo':
      return {
        ...doc,
        corrections: [...doc.corrections, { ...head, values: values as PhotoDoc['original'] }],
      };
    case 'trace':
      return {
        ...doc,
        corrections: [...doc.corrections, { ...head, values: values as TraceDoc['original'] }],
      };
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
  const found = yield* findStrikeable(strikes, entry.meta.subject);
  if (found === undefined) return;
  const struck = { ...trace, why };
  if (found.kind === 'reading') yield* strikeReading(found, struck);
  else yield* putDoc({ ...found, struck });
}

/**
 * What a correction or strike about `subject` may name, by its own id or by that of one of its corrections: readings
 * and alignments stand under their firing or rig; notes, photos and traces are their own subject (protocol 1.7).
 */
export function* findStrikeable(id: string, subject: string): Effect<Strikeable | undefined> {
  const of = yield* correctedId(id);
  const below = (yield* getDoc('reading', of)) ?? (yield* getDoc('alignment', of));
  if (below !== undefined) return below.parent === subject ? below : undefined;
  if (of !== subject) return undefined;
  return (yield* getDoc('note', of)) ?? (yield* getDoc('photo', of)) ?? (yield* getDoc('trace', of));
}
