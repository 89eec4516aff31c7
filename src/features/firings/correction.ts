import type { ReadingValues } from '../../domain/book/bodies/firing-bodies';
import { baseOf, type Base, type ReadingDraft } from './reading-form';

/** The form of a correction: untouched fields say how they came into the reading that is corrected. */
export function correctionBase(before: ReadingValues): Base {
  const base = baseOf(before);
  const carried: readonly string[] = before.carried_over;
  const source = Object.fromEntries(
    Object.keys(base.values).map((key) => [key, carried.includes(key) ? 'carried over then' : 'as logged']),
  ) as Base['source'];
  return { ...base, source };
}

/** Why nothing can be corrected yet; null when it can. A note alone is a correction too. */
export function correctionRefusal(draft: ReadingDraft, before: ReadingValues, why: string): string | null {
  const changed = Object.keys(draft.entered).length > 0 || draft.note.trim() !== before.note;
  if (!changed) return 'Nothing is changed yet: choose a field first.';
  return why.trim() === '' ? 'Reason: say in words why the reading is corrected.' : null;
}

export function strikeRefusal(why: string): string | null {
  return why.trim() === '' ? 'Reason: say in words why the reading is struck.' : null;
}
