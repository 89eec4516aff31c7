import { readTable, type Table } from '../numerics/table';
import { answer, type Answer } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { ok, refused, type Result } from '../units/result';

/** Needle points in air at 25 C, kV peak against cm: AIEE spark-gap table, read in a public reprint. */
const NEEDLE_POINTS: Table = [
  [5, 0.42],
  [10, 0.85],
  [15, 1.3],
  [20, 1.75],
  [25, 2.2],
  [30, 2.69],
  [35, 3.2],
  [40, 3.81],
];

/**
 * Distance over which needle points spark in air, cm, from 5 to 40 kV peak. Bare parts need at least three times
 * this (common practice); the sphere and uniform laws are never for clearances.
 */
export function needleGap(voltage_kV: number): Result<Answer> {
  const voltage = checkNumber(voltage_kV, {
    field: 'voltage_kV',
    name: 'Voltage',
    unit: 'kV',
    min: 5,
    max: 40,
  });
  if (!voltage.ok) return voltage;
  const value = readTable(NEEDLE_POINTS, voltage.value);
  if (value === undefined) {
    return refused({
      type: 'outside-table',
      field: 'voltage_kV',
      words: 'Voltage: outside the table of needle points.',
    });
  }
  return ok(
    answer({
      value,
      unit: 'cm',
      relative: 0.05,
      model: 'Needle points in air, AIEE table',
      valid: '5 to 40 kV peak, dry air at 1 atm; keep bare parts three times as far apart',
    }),
  );
}
