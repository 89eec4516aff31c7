import {
  checkField,
  enteredValue,
  fieldOf,
  numberAt,
  shownFields,
  shownValue,
  steppedValue,
  unitOf,
} from '../../domain/lookup/fields';
import type { Figure, Known, Lookup, NumberField, Solvable, Start, Values } from '../../domain/lookup/lookup';
import { roundToSignificant } from '../../domain/units/format-quantity';

/** The wanted value of a figure that no input of the lookup holds. */
export const WANTED = '@wanted';

export interface Find {
  /** Place of the pair in the lookup's list: which input is sought for which figure. */
  readonly solvable: number;
  /** Set where the wanted value is no input of the lookup's own. */
  readonly wanted: NumberField | null;
}

/** What is on screen and not kept yet. `view` is what the figure's place shows. */
export interface LookupForm {
  readonly values: Values;
  readonly known: Readonly<Record<string, Known>>;
  /** Units other than the field's own, by field. */
  readonly units: Readonly<Record<string, string>>;
  readonly active: string;
  /** The text in the open Keypad; null while it is closed. */
  readonly typing: string | null;
  readonly refusal: string | null;
  readonly find: Find | null;
  readonly view: 'answer' | 'sweep';
  readonly sweep: SweepChoice;
}

/** Null stands for what the lookup offers by itself. */
export interface SweepChoice {
  readonly field: string | null;
  readonly figures: readonly string[] | null;
}

/** Prefilled from the rig in hand; "what if" never touches the rig. */
export function lookupFormOf(lookup: Lookup, start: Start): LookupForm {
  const first = lookup.first ?? lookup.fields.find((field) => field.kind === 'number')?.key;
  return {
    values: start.values,
    known: start.known,
    units: {},
    active: first ?? lookup.fields[0]?.key ?? '',
    typing: null,
    refusal: null,
    find: null,
    view: 'answer',
    sweep: { field: null, figures: null },
  };
}

/** True once anything differs from what the rig and the lab say. */
export function isWhatIf(form: LookupForm): boolean {
  return form.find !== null || Object.values(form.known).includes('what-if');
}

export function solvableOf(lookup: Lookup, find: Find | null): Solvable | null {
  return find === null ? null : (lookup.solvable[find.solvable] ?? null);
}

/** The number field of that key, the wanted value of a search among them. */
export function numberOf(lookup: Lookup, form: LookupForm, key: string): NumberField | undefined {
  if (key === WANTED) return form.find?.wanted ?? undefined;
  const field = fieldOf(lookup, key);
  return field?.kind === 'number' ? field : undefined;
}

/** Key of the input that holds the wanted value while something is sought. */
export function wantedKey(lookup: Lookup, find: Find | null): string | null {
  const solvable = solvableOf(lookup, find);
  return solvable === null ? null : (solvable.target ?? WANTED);
}

/** Takes a typed text; a refusal stands beside the field and the value before it stays. */
export function enterText(lookup: Lookup, form: LookupForm, text: string): LookupForm {
  const field = numberOf(lookup, form, form.active);
  if (field === undefined) return { ...form, typing: null };
  const entered = enteredValue(field, { text, unit: form.units[field.key] ?? null }, form.values);
  if (!entered.ok) return { ...form, refusal: entered.refusal.words };
  return withValue(lookup, { ...form, typing: null }, { key: field.key, value: entered.value });
}

/** One step on the field's own grid. */
export function stepField(lookup: Lookup, form: LookupForm, direction: -1 | 1): LookupForm {
  const field = numberOf(lookup, form, form.active);
  if (field === undefined) return form;
  const stepped = steppedValue(field, form.values, direction);
  return stepped.ok
    ? withValue(lookup, form, { key: field.key, value: stepped.value })
    : { ...form, refusal: stepped.refusal.words };
}

/** What a slider gives, in the field's own unit. */
export function slideField(lookup: Lookup, form: LookupForm, value: number): LookupForm {
  const field = numberOf(lookup, form, form.active);
  if (field === undefined) return form;
  const checked = checkField(field, value);
  return checked.ok
    ? withValue(lookup, form, { key: field.key, value: checked.value })
    : { ...form, refusal: checked.refusal.words };
}

/** Sets a value. What another field shows in a unit that depends on it stays as it is shown: bar(abs) when the ambient moves. */
export function withValue(
  lookup: Lookup,
  form: LookupForm,
  { key, value }: { readonly key: string; readonly value: number | string | null },
): LookupForm {
  const next = { ...form.values, [key]: value };
  const moved: Record<string, number | string | null> = { ...next };
  for (const [other, unitKey] of Object.entries(form.units)) {
    const field = numberOf(lookup, form, other);
    if (other === key || field === undefined) continue;
    const shown = shownValue(field, form.values, unitKey);
    const own = shown === null ? null : (unitOf(field, unitKey)?.toOwn(shown, next) ?? null);
    if (own !== null) moved[other] = own;
  }
  return {
    ...form,
    values: moved,
    known: { ...form.known, [key]: 'what-if' },
    refusal: null,
    ...stillShown(lookup, form, moved),
  };
}

/** A field that has no meaning any more for these values is not left chosen. */
function stillShown(lookup: Lookup, form: LookupForm, values: Values): Pick<LookupForm, 'active'> {
  const { active } = form;
  if (active === WANTED) return { active };
  const shown = shownFields(lookup, values);
  if (shown.some((field) => field.key === active)) return { active };
  return { active: shown.find((field) => field.kind === 'number')?.key ?? active };
}

/** Another unit for the same value; nothing but its face changes. */
export function changeUnit(form: LookupForm, key: string, unit: string | null): LookupForm {
  const { [key]: _, ...others } = form.units;
  return { ...form, refusal: null, units: unit === null ? others : { ...others, [key]: unit } };
}

/** What the Keypad starts from: no commas, no binary dust. */
export function plainText(value: number): string {
  return String(Number(value.toPrecision(9)));
}

export function chooseField(form: LookupForm, key: string): LookupForm {
  return { ...form, active: key, refusal: null, typing: null };
}

/** Begins or ends to look for an input. The wanted value starts at what the figure is now, so nothing jumps. */
export function chooseFind(
  lookup: Lookup,
  form: LookupForm,
  { solvable, figure }: { readonly solvable: number | null; readonly figure: Figure | undefined },
): LookupForm {
  const pair = solvable === null ? undefined : lookup.solvable[solvable];
  if (solvable === null || pair === undefined) {
    return { ...form, find: null, refusal: null, active: solvedField(lookup, form) ?? form.active };
  }
  const key = pair.target ?? WANTED;
  const own = pair.target === undefined ? undefined : numberOf(lookup, form, pair.target);
  const before = form.find === null ? null : numberAt(form.values, wantedKey(lookup, form.find) ?? '');
  const sameFigure = solvableOf(lookup, form.find)?.figure === pair.figure;
  const now = figure === undefined ? null : roundToSignificant(figure.value, figure.digits, figure.rounding);
  const value = (sameFigure ? before : null) ?? numberAt(form.values, pair.target ?? '') ?? now;
  const wanted = own === undefined ? wantedField(figure, value) : null;
  return {
    ...form,
    find: { solvable, wanted },
    values: { ...form.values, [key]: value },
    known: own === undefined ? form.known : { ...form.known, [key]: 'what-if' },
    active: key,
    refusal: null,
  };
}

function solvedField(lookup: Lookup, form: LookupForm): string | null {
  return form.active === wantedKey(lookup, form.find) ? (solvableOf(lookup, form.find)?.field ?? null) : null;
}

const FAR = 1e15;
const SLIDE_FACTOR = 5;

/** A field for a wanted figure, with steps and a slider of the size that the figure has now. */
export function wantedField(figure: Figure | undefined, value: number | null): NumberField {
  const size = Math.abs(value ?? 1) || 1;
  const exponent = Math.floor(Math.log10(size));
  const step = Number(`1e${String(exponent - 1)}`);
  const positive = (value ?? 1) > 0;
  return {
    kind: 'number',
    key: WANTED,
    label: 'Wanted',
    unit: figure?.unit ?? '',
    min: -FAR,
    max: FAR,
    step,
    decimals: Math.max(0, Math.min(9, 1 - exponent)),
    slide: positive
      ? { from: size / SLIDE_FACTOR, to: size * SLIDE_FACTOR, scale: 'log' }
      : { from: -size * SLIDE_FACTOR, to: size * SLIDE_FACTOR, scale: 'linear' },
    help: `The value that \u201c${figure?.label ?? 'the answer'}\u201d has to have.`,
  };
}
