import { borderOf } from '../numerics/bisect';
import type { Answer } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { computed } from '../units/computed';
import { refused, type Result } from '../units/result';
import { needleGap } from './needle-gap';

/** Bare parts stand this many needle gaps apart; common practice, no source. */
export const CLEARANCE_FACTOR = 3;
const TABLE_FROM_KV = 5;
const TABLE_TO_KV = 40;

/**
 * Air clearance of bare high-voltage parts, mm: three times the needle-point gap at this voltage, never the sphere or
 * uniform law (physics M). Under 5 kV the table's first row counts. Round it up. Up to 40 kV peak.
 */
export function bareClearance(voltage_kV: number): Result<Answer> {
  const voltage = checkNumber(voltage_kV, {
    field: 'voltage_kV',
    name: 'Voltage',
    unit: 'kV',
    min: 0,
    max: TABLE_TO_KV,
    maxReason: 'the table of needle points ends there',
  });
  if (!voltage.ok) return voltage;
  const needle = needleGap(Math.max(TABLE_FROM_KV, voltage.value));
  if (!needle.ok) return needle;
  return computed([], () => ({
    value: CLEARANCE_FACTOR * needle.value.value * 10,
    unit: 'mm',
    model: 'Three needle-point gaps, AIEE table',
    valid: 'up to 40 kV peak, dry air at 1 atm; dirt, damp and surfaces between the parts need more',
    relative: 0.05,
    warnings: [{ type: 'no-barrier', words: 'No air gap counts as a barrier for a person.' }],
  }));
}

/**
 * Highest voltage for which bare parts at this distance keep the clearance, kV peak: the inverse of `bareClearance`. Round it down.
 * Refused under the distance of the table's first row, 12.6 mm, and never above 40 kV.
 */
export function voltageForClearance(distance_mm: number): Result<Answer> {
  const distance = checkNumber(distance_mm, {
    field: 'distance_mm',
    name: 'Distance',
    unit: 'mm',
    min: 0,
    max: 1e5,
  });
  if (!distance.ok) return distance;
  const keeps = (voltage_kV: number) => {
    const needed = bareClearance(voltage_kV);
    return needed.ok && needed.value.value <= distance.value + 1e-9;
  };
  if (!keeps(TABLE_FROM_KV)) {
    return refused({
      type: 'too-small',
      field: 'distance_mm',
      words:
        'Distance: too small to keep a clearance at any voltage of the table, which begins at 5\u2009kV.',
    });
  }
  const value = keeps(TABLE_TO_KV)
    ? TABLE_TO_KV
    : borderOf(keeps, { fails: TABLE_TO_KV, holds: TABLE_FROM_KV });
  return computed([], () => ({
    value,
    unit: 'kV',
    model: 'Three needle-point gaps, AIEE table',
    valid: '5 to 40 kV peak, dry air at 1 atm',
    relative: { below: 0.05, above: 0.05 },
    warnings: [{ type: 'no-barrier', words: 'No air gap counts as a barrier for a person.' }],
  }));
}
