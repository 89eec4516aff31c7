import { getDoc, type Effect } from '../book/documents/effect';
import { findReading } from '../book/documents/entries-about-entries';
import { isKind } from '../book/kinds';
import { checkBody, type EntryOf } from '../book/read-body';
import { objection, type Objection } from './objection';

/** What corrections, strikes and claims may name (protocol 1.7). */
export function* bookObjection(
  entry: EntryOf<'entry.corrected' | 'entry.struck' | 'entry.claimed'>,
): Effect<Objection | null> {
  if (entry.kind === 'entry.claimed') return null;
  if (entry.kind === 'entry.struck') {
    const held = yield* getDoc('held', entry.body.strikes);
    if (held !== undefined) return null;
    const reading = yield* findReading(entry.body.strikes, entry.meta.subject);
    return reading === undefined
      ? objection('cannot-strike', 'Only readings, and the author’s own held-back entries, may be struck.')
      : null;
  }
  return yield* correctionObjection(entry);
}

function* correctionObjection(entry: EntryOf<'entry.corrected'>): Effect<Objection | null> {
  const { corrects, kind, body } = entry.body;
  if (!isKind(kind) || (kind !== 'firing.reading' && kind !== 'check.step-done')) {
    return objection(
      'cannot-correct',
      'What permits, forbids or answers is undone by the opposite entry, not corrected.',
    );
  }
  const checked = checkBody(kind, body);
  if (checked.type === 'unreadable') return objection('correction-unreadable', checked.words);
  if (kind === 'firing.reading') {
    const reading = yield* findReading(corrects, entry.meta.subject);
    return reading === undefined
      ? objection('unknown-reading', 'The reading that it corrects is not in this firing.')
      : null;
  }
  const check = yield* getDoc('check', entry.meta.subject);
  const known = check !== undefined && Object.values(check.steps).some((step) => step.entry === corrects);
  if (!known) return objection('unknown-step', 'The step that it corrects is not in this check.');
  return check.ended === null
    ? null
    : objection('check-ended', 'The check has ended; what it declared stands.', check.ended.at);
}
