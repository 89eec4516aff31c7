import type { PartDoc } from '../../../domain/book/documents/part';
import type { BodyOf } from '../../../domain/book/kinds';
import type { DayEdit, NumberEdit } from '../edit/edit-field';
import { readField } from '../edit/edit-field';
import type { PartPlace } from './part-words';

/** A part about to be fitted, as it stands on screen. */
export interface FitDraft {
  readonly what: string;
  readonly place: PartPlace | null;
  readonly where: string;
  readonly serial: string;
  readonly fitted_on: string;
  readonly shots_before: string;
  readonly replaces: string;
  readonly note: string;
}

export const EMPTY_FIT: FitDraft = {
  what: '',
  place: null,
  where: '',
  serial: '',
  fitted_on: '',
  shots_before: '0',
  replaces: '',
  note: '',
};

export const FITTED_ON: DayEdit = {
  kind: 'day',
  key: 'fitted_on',
  label: 'Fitted on',
  help: 'Year, month and day, as 20261201. Empty: not known.',
  empty: 'null',
};
export const SHOTS_BEFORE: NumberEdit = {
  kind: 'number',
  key: 'shots_before',
  label: 'Shots before',
  unit: 'shots',
  help: 'What it had endured before it came here. Empty: nobody knows.',
  empty: 'null',
  min: 0,
  max: 1e12,
  minExcluded: false,
  whole: true,
  step: 100,
};

export type Fit =
  | { readonly ok: true; readonly body: BodyOf<'part.fitted'> }
  | { readonly ok: false; readonly words: string };

/** The part as it would be written, or why not, in words. */
export function fitOf(draft: FitDraft, parts: readonly PartDoc[]): Fit {
  const what = draft.what.trim();
  if (what === '') return { ok: false, words: 'Say what the part is.' };
  if (draft.place === null) return { ok: false, words: 'Choose where it works.' };
  const fitted_on = readField(FITTED_ON, draft.fitted_on, null);
  if (!fitted_on.ok) return { ok: false, words: fitted_on.refusal.words };
  const shots_before = readField(SHOTS_BEFORE, draft.shots_before, null);
  if (!shots_before.ok) return { ok: false, words: shots_before.refusal.words };
  const replaces = parts.find((part) => part.id === draft.replaces && part.retired === null);
  if (draft.replaces !== '' && replaces === undefined)
    return { ok: false, words: 'The part that it replaces is not on the rig any more. Choose again.' };
  return {
    ok: true,
    body: {
      what,
      place: draft.place,
      where: draft.where.trim(),
      serial: draft.serial.trim(),
      catalogue: null,
      fitted_on: typeof fitted_on.value === 'string' ? fitted_on.value : null,
      shots_before: typeof shots_before.value === 'number' ? shots_before.value : null,
      replaces: replaces?.id ?? null,
      note: draft.note.trim(),
    },
  };
}
