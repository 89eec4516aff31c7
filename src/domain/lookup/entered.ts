import { ok, refused, type Refusal, type Result } from '../units/result';
import { checkField, numberAt, shownFields, textAt } from './fields';
import type { ChoiceField, Field, Values } from './lookup';

/** What was entered, once every field that is asked has passed its rule. */
export interface Entered {
  /** A number that the lookup cannot do without. Asking for one that was left out or not asked is a bug. */
  readonly number: (key: string) => number;
  /** A number that may be missing or that these values do not ask for. */
  readonly maybe: (key: string) => number | null;
  readonly choice: (key: string) => string;
  readonly text: (key: string) => string;
}

/**
 * Holds every field that these values ask for to its rule: the first that fails is refused in words beside it. Behind this no
 * computation meets a missing number, a NaN or a choice that is not in its list.
 */
export function entered(fields: readonly Field[], values: Values): Result<Entered> {
  const shown = shownFields({ fields }, values);
  for (const field of shown) {
    const bad = refusalOf(field, values);
    if (bad !== undefined) return refused(bad);
  }
  const asked = new Set(shown.map((field) => field.key));
  const maybe = (key: string) => (asked.has(key) ? numberAt(values, key) : null);
  return ok({
    maybe,
    number: (key) => {
      const value = maybe(key);
      if (value === null) throw new Error(`no field asks for the number ${key}`);
      return value;
    },
    choice: (key) => textAt(values, key) ?? '',
    text: (key) => textAt(values, key) ?? '',
  });
}

function refusalOf(field: Field, values: Values): Refusal | undefined {
  if (field.kind === 'text') return undefined;
  if (field.kind === 'choice') return choiceRefusal(field, values);
  const value = values[field.key] ?? null;
  if (value === null) {
    if (field.optional === true) return undefined;
    return field.key === AMBIENT_KEY
      ? NO_AMBIENT
      : { type: 'empty', field: field.key, words: `${field.label}: enter a number.` };
  }
  const checked = checkField(field, value);
  return checked.ok ? undefined : checked.refusal;
}

function choiceRefusal(field: ChoiceField, values: Values): Refusal | undefined {
  const value = textAt(values, field.key);
  return field.options.some((option) => option.value === value)
    ? undefined
    : { type: 'unknown-choice', field: field.key, words: `${field.label}: choose one of the list.` };
}

const AMBIENT_KEY = 'ambient_bar_abs';

const NO_AMBIENT: Refusal = {
  type: 'no-ambient',
  field: AMBIENT_KEY,
  words: 'Ambient: enter the ambient pressure; it has no default.',
};

/** Physics names its own inputs in a refusal; on a screen it stands beside the field of the lookup, or beside none. */
export function beside<T>(
  result: Result<T>,
  fields: readonly Field[],
  names: Readonly<Record<string, string>> = {},
): Result<T> {
  if (result.ok || result.refusal.field === undefined) return result;
  const field = names[result.refusal.field] ?? result.refusal.field;
  if (fields.some((each) => each.key === field)) return refused({ ...result.refusal, field });
  const { type, words } = result.refusal;
  return refused({ type, words });
}
