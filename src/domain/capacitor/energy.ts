import { answer, type Answer } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { firstRefusal, ok, refused, type Result } from '../units/result';

export const CAPACITANCE_RULE = {
  field: 'capacitance_F',
  name: 'Capacitance',
  unit: 'F',
  min: 1e-15,
  max: 1,
} as const;
export const VOLTAGE_RULE = { field: 'voltage_V', name: 'Voltage', unit: 'V', min: 0, max: 1e6 } as const;

/**
 * Stored energy C V squared over 2, J. For a caution take the supply's limit and not self-break, and round up.
 * Ceramic parts lose capacitance under voltage: enter the value at V.
 */
export function storedEnergy(capacitance_F: number, voltage_V: number): Result<Answer> {
  const bad = firstRefusal([
    checkNumber(capacitance_F, CAPACITANCE_RULE),
    checkNumber(voltage_V, VOLTAGE_RULE),
  ]);
  if (bad !== undefined) return refused(bad);
  return ok(
    answer({
      value: 0.5 * capacitance_F * voltage_V ** 2,
      unit: 'J',
      relative: 0,
      model: 'Half of C V squared',
      valid: 'capacitance at this voltage',
    }),
  );
}

/** Charge that a ringing shot carries in all, uC: C V0 (1 + k)/(1 - k), k the voltage ratio per half cycle. */
export function shotCharge(capacitance_F: number, voltage_V: number, reversal: number): Result<Answer> {
  const bad = firstRefusal([
    checkNumber(capacitance_F, CAPACITANCE_RULE),
    checkNumber(voltage_V, VOLTAGE_RULE),
    checkNumber(reversal, { field: 'reversal', name: 'Reversal', unit: '', min: 0, max: 0.99 }),
  ]);
  if (bad !== undefined) return refused(bad);
  return ok(
    answer({
      value: (1e6 * capacitance_F * voltage_V * (1 + reversal)) / (1 - reversal),
      unit: '\u00b5C',
      relative: 0.1,
      model: 'Ringing with a fixed ratio per half cycle',
      valid: 'one gap, one ringing circuit',
    }),
  );
}
