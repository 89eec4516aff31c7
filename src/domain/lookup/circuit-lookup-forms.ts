import { log, number } from './field-forms';
import { textAt } from './fields';
import type { NumberField, Values } from './lookup';

export type Shown = (values: Values) => boolean;

export const isInversion: Shown = (values) => textAt(values, 'topology') === 'lc-inversion';
export const is =
  (key: string, ...wanted: readonly string[]): Shown =>
  (values) =>
    wanted.includes(textAt(values, key) ?? '');
export const byRatio = is('second_by', 'ratio');
export const isWound: Shown = (values) => isInversion(values) && is('charging_by', 'inductor')(values);

export function length(
  key: string,
  label: string,
  parts: Pick<NumberField, 'help' | 'slide' | 'shownFor' | 'optional'>,
) {
  return number(key, label, { unit: 'mm', min: 0.001, max: 10_000, step: 1, decimals: 1, ...parts });
}

export function capacitance(key: string, label: string, parts: Pick<NumberField, 'help' | 'shownFor'>) {
  return number(key, label, {
    unit: 'nF',
    min: 0.001,
    max: 10_000,
    step: 0.1,
    decimals: 2,
    slide: log(0.05, 50),
    ...parts,
  });
}

export function inductance(
  key: string,
  label: string,
  parts: Pick<NumberField, 'help' | 'shownFor' | 'slide'>,
) {
  return number(key, label, { unit: 'nH', min: 0.05, max: 1e5, step: 1, decimals: 1, ...parts });
}

export const ohm = (
  key: string,
  label: string,
  parts: Pick<NumberField, 'help' | 'slide' | 'min' | 'max' | 'shownFor'>,
) => number(key, label, { unit: '\u2126', step: 0.1, decimals: 2, ...parts });
