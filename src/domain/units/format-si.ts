import { formatQuantity, roundToSignificant, type Rounding } from './format-quantity';
import type { PressureReference } from './parse-quantity';

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

/** A pressure with its reference always beside it: "1.20 bar(g)". */
export function formatPressure(
  bar: number,
  reference: PressureReference,
  { significant, rounding }: { readonly significant: number; readonly rounding: Rounding },
): string {
  return formatQuantity(bar, reference === 'gauge' ? 'bar(g)' : 'bar(abs)', {
    digits: { significant },
    rounding,
  });
}
