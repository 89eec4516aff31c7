import { formatQuantity, roundToSignificant, type Rounding } from './format-quantity';
import type { PressureReference } from './parse-quantity';
import { PLAIN_UNITS } from './unit-table';

/** Prefixes that screens use, largest first. */
const STEPS: readonly (readonly [power: number, sign: string])[] = [
  [9, 'G'],
  [6, 'M'],
  [3, 'k'],
  [0, ''],
  [-3, 'm'],
  [-6, '\u00b5'],
  [-9, 'n'],
  [-12, 'p'],
  [-15, 'f'],
];

/**
 * A quantity in a plain SI unit with the prefix that leaves one to three digits before the point: 2.5e-9 F is "2.5 nF". A
 * limit is rounded down and a wait up by `rounding`; the prefix is chosen after rounding, so 999.96 V up is "1.00 kV".
 */
export function formatSi(
  value: number,
  unit: string,
  { significant, rounding }: { readonly significant: number; readonly rounding: Rounding },
): string {
  const format = { digits: { significant }, rounding };
  if (value === 0 || !Number.isFinite(value)) return formatQuantity(value, unit, format);
  const rounded = Math.abs(roundToSignificant(value, significant, rounding));
  const [power, sign] = STEPS.find(([step]) => rounded >= Number(`1e${String(step)}`) * (1 - 1e-12)) ?? [
    -15,
    'f',
  ];
  return formatQuantity(
    Number((value / Number(`1e${String(power)}`)).toPrecision(15)),
    `${sign}${unit}`,
    format,
  );
}

/** Units a pressure is shown in. */
export type PressureUnit = 'bar' | 'mbar' | 'kPa' | 'Torr' | 'psi' | 'atm';

/** Units a length is shown in. */
export type LengthUnit = 'm' | 'mm' | '\u00b5m' | 'in';

interface Shown<Unit> {
  readonly significant: number;
  readonly rounding: Rounding;
  readonly unit?: Unit;
}

/**
 * A pressure with its reference always beside it: "1.20 bar(g)", "17.4 psi(g)". Rounded in the unit that is shown, so that a
 * limit stays below its bar in every unit.
 */
export function formatPressure(
  bar: number,
  reference: PressureReference,
  { significant, rounding, unit = 'bar' }: Shown<PressureUnit>,
): string {
  return formatQuantity(inUnit(bar, unit), `${unit}${reference === 'gauge' ? '(g)' : '(abs)'}`, {
    digits: { significant },
    rounding,
  });
}

/** A length in the unit asked for, rounded in that unit: 3.175 mm is "0.125 in". */
export function formatLength(
  length_mm: number,
  { significant, rounding, unit = 'mm' }: Shown<LengthUnit>,
): string {
  return formatQuantity(inUnit(length_mm, unit), unit, { digits: { significant }, rounding });
}

function inUnit(value: number, unit: PressureUnit | LengthUnit): number {
  return value / (PLAIN_UNITS[unit.toLowerCase()]?.size ?? 1);
}
