import { answer, type Answer } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { firstRefusal, ok, refused, type Result } from '../units/result';

/** Constants of rho tau = k (E/rho)^-n, in g/cm3, s and kV/cm. T. H. Martin 1989, from memory. */
const K_SCALE = 97_800;
const EXPONENT = 3.44;

const DENSITY_RULE = { field: 'density_g_cm3', name: 'Gas density', unit: 'g/cm\u00b3', min: 1e-6, max: 0.1 };
const VALID = 'uniform gaps charged within nanoseconds; from memory, within a fifth';

/** Time from an over-voltage to the spark in a uniform field, s. */
export function formativeTime(field_kV_cm: number, density_g_cm3: number): Result<Answer> {
  const bad = firstRefusal([
    checkNumber(field_kV_cm, { field: 'field_kV_cm', name: 'Field', unit: 'kV/cm', min: 0.1, max: 10_000 }),
    checkNumber(density_g_cm3, DENSITY_RULE),
  ]);
  if (bad !== undefined) return refused(bad);
  const value = (K_SCALE * (field_kV_cm / density_g_cm3) ** -EXPONENT) / density_g_cm3;
  return ok(
    answer({ value, unit: 's', relative: 0.5, model: 'Formative time in a uniform field', valid: VALID }),
  );
}

/** Field at which a gap breaks on a steady ramp, kV/cm: the formative times along the ramp add up to one. */
export function rampBreakdownField(ramp_kV_cm_s: number, density_g_cm3: number): Result<Answer> {
  const bad = firstRefusal([
    checkNumber(ramp_kV_cm_s, {
      field: 'ramp_kV_cm_s',
      name: 'Rise of field',
      unit: 'kV/cm/s',
      min: 1,
      max: 1e15,
    }),
    checkNumber(density_g_cm3, DENSITY_RULE),
  ]);
  if (bad !== undefined) return refused(bad);
  const power = EXPONENT + 1;
  const value = (power * K_SCALE * density_g_cm3 ** (EXPONENT - 1) * ramp_kV_cm_s) ** (1 / power);
  return ok(
    answer({ value, unit: 'kV/cm', relative: 0.2, model: 'Formative time along a ramp', valid: VALID }),
  );
}
