import { checkNumber, type NumberRule } from '../units/check-number';
import { formatFigure } from '../units/format-quantity';
import { parseNumber } from '../units/parse-number';
import { ok, refused, type Result } from '../units/result';
import type { Field, Lookup, NumberField, UnitChoice, Values } from './lookup';

export function fieldOf(lookup: Pick<Lookup, 'fields'>, key: string): Field | undefined {
  return lookup.fields.find((field) => field.key === key);
}

export function numberFieldOf(lookup: Pick<Lookup, 'fields'>, key: string): NumberField | undefined {
  const field = fieldOf(lookup, key);
  return field?.kind === 'number' ? field : undefined;
}

/** The fields that have a meaning for these values. */
export function shownFields(lookup: Pick<Lookup, 'fields'>, values: Values): readonly Field[] {
  return lookup.fields.filter((field) => field.shownFor?.(values) ?? true);
}

/** A value as a number, or null where it is none. */
export function numberAt(values: Values, key: string): number | null {
  const value = values[key];
  return typeof value === 'number' && Number.isFinite(value) ? value : null;
}

/** A value as words, or null where it is none. */
export function textAt(values: Values, key: string): string | null {
  const value = values[key];
  return typeof value === 'string' ? value : null;
}

export function ruleOf(field: NumberField): NumberRule {
  const { key, label, unit, min, max, minExcluded } = field;
  return {
    field: key,
    name: label,
    unit,
    min,
    max,
    ...(minExcluded === undefined ? {} : { minExcluded }),
  };
}

/** Holds a number to its field: range, and whole where only whole numbers have a meaning. */
export function checkField(field: NumberField, value: unknown): Result<number> {
  const checked = checkNumber(value, ruleOf(field));
  if (!checked.ok || field.whole !== true || Number.isInteger(checked.value)) return checked;
  return refused({ type: 'not-whole', field: field.key, words: `${field.label}: enter a whole number.` });
}

/**
 * A typed text as the field's value in its own unit. `unit` is the key of the unit it was typed in. Empty text is null where the
 * field may be left out, and refused in words otherwise.
 */
export function enteredValue(
  field: NumberField,
  typed: { readonly text: string; readonly unit: string | null },
  values: Values,
): Result<number | null> {
  if (field.optional === true && typed.text.trim() === '') return ok(null);
  const parsed = parseNumber(typed.text, field.key, field.label);
  if (!parsed.ok) return parsed;
  const unit = unitOf(field, typed.unit);
  const own = unit === null ? parsed.value : unit.toOwn(parsed.value, values);
  if (own === null) {
    return refused({
      type: 'unit-not-told',
      field: field.key,
      words: `${field.label}: in ${unit?.label ?? field.unit} it cannot be told yet; enter the ambient pressure first.`,
    });
  }
  return checkField(field, own);
}

/** The unit that is chosen beside the field's own; null for its own. */
export function unitOf(field: NumberField, key: string | null): UnitChoice | null {
  return field.units?.find((unit) => unit.key === key) ?? null;
}

/** The value as it stands on screen in a unit; null where there is none, or where it cannot be told in that unit. */
export function shownValue(field: NumberField, values: Values, unitKey: string | null): number | null {
  const own = numberAt(values, field.key);
  if (own === null) return null;
  const unit = unitOf(field, unitKey);
  return unit === null ? own : unit.fromOwn(own, values);
}

export function unitLabel(field: NumberField, unitKey: string | null): string {
  return unitOf(field, unitKey)?.label ?? field.unit;
}

export function unitDecimals(field: NumberField, unitKey: string | null): number {
  return unitOf(field, unitKey)?.decimals ?? field.decimals;
}

/** A field's value in words for rows and tables: as many digits as it was entered with, at least the field's. */
export function valueText(field: Field, values: Values, unitKey: string | null = null): string | null {
  if (field.kind !== 'number') {
    const value = textAt(values, field.key);
    if (value === null) return null;
    return field.kind === 'choice'
      ? (field.options.find((option) => option.value === value)?.label ?? null)
      : value;
  }
  const shown = shownValue(field, values, unitKey);
  return shown === null ? null : numberText(shown, unitDecimals(field, unitKey));
}

const MOST_DECIMALS = 6;

/** A number with the given decimals, or more where it would lose digits by them: 0.004 mm is never shown as 0.00. */
export function numberText(value: number, decimals: number): string {
  let digits = decimals;
  while (digits < MOST_DECIMALS && !closeEnough(value, digits)) digits += 1;
  return formatFigure(value, { digits: { decimals: digits }, rounding: 'nearest' });
}

function closeEnough(value: number, decimals: number): boolean {
  const rounded = Number(value.toFixed(decimals));
  return Math.abs(rounded - value) <= 5e-4 * Math.abs(value);
}

/** One step on the grid of the field's step, in its own unit. A step out of range is refused in words. */
export function steppedValue(field: NumberField, values: Values, direction: -1 | 1): Result<number> {
  const now =
    numberAt(values, field.key) ?? (field.minExcluded === true ? field.min : Math.max(0, field.min));
  const next = (Math.round(now / field.step) + direction) * field.step;
  return checkField(field, Number(next.toPrecision(12)));
}
