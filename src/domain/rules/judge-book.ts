import { getDoc, type Effect } from '../book/documents/effect';
import { entryKindOf, findStrikeable } from '../book/documents/entries-about-entries';
import { isKind, type Kind } from '../book/kinds';
import { checkBody, type EntryOf } from '../book/read-body';
import { objection, type Objection } from './objection';

const CORRECTABLE: ReadonlySet<Kind> = new Set<Kind>([
  'firing.reading',
  'check.step-done',
  'alignment.measured',
  'alignment.adjusted',
  'alignment.arc-seen',
  'photo.attached',
  'trace.attached',
]);

/** What corrections, strikes and claims may name (protocol 1.7). */
export function* bookObjection(
  entry: EntryOf<'entry.corrected' | 'entry.struck' | 'entry.claimed'>,
): Effect<Objection | null> {
  if (entry.kind === 'entry.claimed') return null;
  if (entry.kind === 'entry.struck') {
    const held = yield* getDoc('held', entry.body.strikes);
    if (held !== undefined) return null;
    const found = yield* findStrikeable(entry.body.strikes, entry.meta.subject);
    return found === undefined
      ? objection(
          'cannot-strike',
          'Only readings, alignments, notes, photos, traces and the author’s own held-back entries may be struck.',
        )
      : null;
  }
  return yield* correctionObjection(entry);
}

function* correctionObjection(entry: EntryOf<'entry.corrected'>): Effect<Objection | null> {
  const { corrects, kind, body } = entry.body;
  if (!isKind(kind) || !CORRECTABLE.has(kind)) {
    return objection(
      'cannot-correct',
      'What permits, forbids or answers is undone by the opposite entry, not corrected.',
    );
  }
  const checked = checkBody(kind, body);
  if (checked.type === 'unreadable') return objection('correction-unreadable', checked.words);
  return kind === 'check.step-done'
    ? yield* stepObjection(entry)
    : yield* valuesObjection(kind, corrects, entry.meta.subject);
}

function* valuesObjection(kind: Kind, corrects: string, subject: string): Effect<Objection | null> {
  const found = yield* findStrikeable(corrects, subject);
  if (found !== undefined && found.kind !== 'note' && entryKindOf(found) === kind) return null;
  return kind === 'firing.reading'
    ? objection('unknown-reading', 'The reading that it corrects is not in this firing.')
    : objection('unknown-entry', 'The entry that it corrects is not there.');
}

function* stepObjection(entry: EntryOf<'entry.corrected'>): Effect<Objection | null> {
  const check = yield* getDoc('check', entry.meta.subject);
  const known =
    check !== undefined && Object.values(check.steps).some((step) => step.entry === entry.body.corrects);
  if (!known) return objection('unknown-step', 'The step that it corrects is not in this check.');
  return check.ended === null
    ? null
    : objection('check-ended', 'The check has ended; what it declared stands.', check.ended.at);
}
