import { checkNumber } from '../../../domain/units/check-number';
import { parseNumber } from '../../../domain/units/parse-number';
import { ok, refused, type Result } from '../../../domain/units/result';
import { readTyped, toOwn, unitsOf } from './edit-units';

interface Common {
  /** Path in the spec, as `specChanges` names it; rows of a list carry their own name instead of a place. */
  readonly key: string;
  readonly label: string;
  /** What it is and where to read it, in one line. */
  readonly help: string;
  /** What an empty field means: refused, null ("not known"), or left out of the spec. */
  readonly empty: 'refused' | 'null' | 'absent';
}

export interface NumberEdit extends Common {
  readonly kind: 'number';
  readonly unit: string;
  readonly min: number;
  readonly max: number;
  readonly minExcluded: boolean;
  readonly whole: boolean;
  readonly step: number;
}

export interface ChoiceEdit extends Common {
  readonly kind: 'choice';
  readonly options: readonly { readonly value: string; readonly label: string }[];
  /** `form`: it decides which fields there are and stands in no spec by itself. */
  readonly as: 'text' | 'boolean' | 'form';
}

export interface TextEdit extends Common {
  readonly kind: 'text';
  readonly maxLength: number;
}

/** A day, typed as eight figures. */
export interface DayEdit extends Common {
  readonly kind: 'day';
}

export type EditField = NumberEdit | ChoiceEdit | TextEdit | DayEdit;

/** What a field gives the spec: null is "not known", undefined leaves the field out. */
export type EditValue = number | string | boolean | null | undefined;

/** Reads what stands in a field, whatever it is: a value, or the reason in words. Never throws. */
export function readField(field: EditField, text: string, ambient_bar_abs: number | null): Result<EditValue> {
  const bare = text.trim();
  if (bare === '') {
    if (field.empty === 'null') return ok(null);
    if (field.empty === 'absent') return ok(undefined);
    return refused({ type: 'open', field: field.key, words: openWords(field) });
  }
  switch (field.kind) {
    case 'number':
      return readNumber(field, bare, ambient_bar_abs);
    case 'choice':
      return readChoice(field, bare);
    case 'day':
      return readDay(field, bare);
    case 'text':
      return bare.length <= field.maxLength
        ? ok(bare)
        : refused({
            type: 'too-long',
            field: field.key,
            words: `${field.label}: at most ${field.maxLength} characters.`,
          });
  }
}

function openWords(field: EditField): string {
  if (field.kind === 'choice') return `${field.label}: choose one.`;
  return field.kind === 'text' ? `${field.label}: say it in words.` : `${field.label}: enter a number.`;
}

function readNumber(field: NumberEdit, text: string, ambient_bar_abs: number | null): Result<number> {
  const { key, label, min, max, minExcluded } = field;
  const typed = readTyped(text);
  const units = unitsOf(field.unit, ambient_bar_abs);
  const unit = units.find((one) => one.key === (typed.unit ?? field.unit));
  if (unit === undefined)
    return refused({ type: 'unit-unknown', field: key, words: `${label}: choose its unit again.` });
  const number = parseNumber(typed.number, key, label);
  if (!number.ok) return number;
  const own = unit.size === 1 && unit.shift === 0 ? number.value : toOwn(number.value, unit);
  const value = own === 0 ? 0 : own; // "-0" is no figure of its own
  const checked = checkNumber(value, {
    field: key,
    name: label,
    unit: field.unit,
    min,
    max,
    ...(minExcluded ? { minExcluded } : {}),
  });
  if (!checked.ok || !field.whole || Number.isInteger(checked.value)) return checked;
  return refused({ type: 'not-whole', field: key, words: `${label}: enter a whole number.` });
}

function readChoice(field: ChoiceEdit, text: string): Result<string | boolean> {
  if (!field.options.some((option) => option.value === text))
    return refused({ type: 'no-such-choice', field: field.key, words: openWords(field) });
  return ok(field.as === 'boolean' ? text === 'yes' : text);
}

const DAY = /^(\d{4})-?(\d{2})-?(\d{2})$/;
const DAYS_OF = [31, 29, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31];

/** A day of the calendar as year, month and day: 20260110 and 2026-01-10 are the same. */
function readDay(field: DayEdit, text: string): Result<string> {
  const found = DAY.exec(text);
  const [year = 0, month = 0, day = 0] = (found ?? []).slice(1).map(Number);
  const last = month === 2 && !isLeap(year) ? 28 : (DAYS_OF[month - 1] ?? 0);
  if (found === null || year < 1900 || day < 1 || day > last)
    return refused({
      type: 'no-day',
      field: field.key,
      words: `${field.label}: eight figures, year, month and day, as 20260110.`,
    });
  return ok(`${found[1] ?? ''}-${found[2] ?? ''}-${found[3] ?? ''}`);
}

function isLeap(year: number): boolean {
  return year % 4 === 0 && (year % 100 !== 0 || year % 400 === 0);
}
