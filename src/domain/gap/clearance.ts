import type { Answer } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { computed } from '../units/computed';
import type { Result } from '../units/result';
import { needleGap } from './needle-gap';

/** Bare parts stand this many needle gaps apart; common practice, no source. */
const CLEARANCE_FACTOR = 3;
const TABLE_FROM_KV = 5;

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
    max: 40,
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
