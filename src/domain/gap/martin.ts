import { answer, type Answer } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { barToAtm } from '../units/pressure';
import { firstRefusal, ok, refused, type Result } from '../units/result';
import { fieldFactorOf } from './field-geometry';
import { GAP_CM_RULE, PRESSURE_RULE } from './gas-density';

/**
 * Closed-form fallback for spheres in air, kV: E_max = 24.6 P + 6.7 sqrt(P/d_eff) with P in atm and d_eff the
 * smaller of 0.115 R and d, V = E_max d/f. Without that clip it reads a fifth low at small gaps.
 * Source: J. C. Martin's notes, constants from memory. 3 % rms against the sphere-gap standard.
 */
export function martinSpheres(spheres: {
  readonly diameter_cm: number;
  readonly gap_cm: number;
  readonly pressure_bar_abs: number;
}): Result<Answer> {
  const bad = firstRefusal([
    checkNumber(spheres.diameter_cm, {
      field: 'diameter_cm',
      name: 'Diameter',
      unit: 'cm',
      min: 0.01,
      max: 1000,
    }),
    checkNumber(spheres.gap_cm, GAP_CM_RULE),
    checkNumber(spheres.pressure_bar_abs, PRESSURE_RULE),
  ]);
  if (bad !== undefined) return refused(bad);
  const radius_cm = spheres.diameter_cm / 2;
  const atm = barToAtm(spheres.pressure_bar_abs);
  const reach_cm = Math.min(0.115 * radius_cm, spheres.gap_cm);
  const field_kV_cm = 24.6 * atm + 6.7 * Math.sqrt(atm / reach_cm);
  const factor = fieldFactorOf('spheres_sym', spheres.gap_cm / radius_cm);
  return ok(
    answer({
      value: (field_kV_cm * spheres.gap_cm) / factor,
      unit: 'kV',
      relative: 0.09,
      model: 'Martin\u2019s closed form for spheres, clipped',
      valid: 'air at 20 \u00b0C, equal spheres',
    }),
  );
}

/**
 * Mean field of a pulse that breaks a long divergent gap in air, kV/cm: F (t d)^(1/6) = 22 P^0.6 with t the time
 * above about 89 % in microseconds and P in atm. Source: J. C. Martin 1970, from memory.
 */
export function martinPulseField(pulse: {
  readonly time_us: number;
  readonly gap_cm: number;
  readonly pressure_atm: number;
}): Result<Answer> {
  const bad = firstRefusal([
    checkNumber(pulse.time_us, { field: 'time_us', name: 'Time', unit: '\u00b5s', min: 0.001, max: 1000 }),
    checkNumber(pulse.gap_cm, {
      ...GAP_CM_RULE,
      min: 5,
      max: 1000,
      minReason: 'the form holds for long divergent gaps only, from about 10\u2009cm',
    }),
    checkNumber(pulse.pressure_atm, { field: 'pressure', name: 'Pressure', unit: 'atm', min: 0.01, max: 50 }),
  ]);
  if (bad !== undefined) return refused(bad);
  return ok(
    answer({
      value: (22 * pulse.pressure_atm ** 0.6) / (pulse.time_us * pulse.gap_cm) ** (1 / 6),
      unit: 'kV/cm',
      relative: 0.15,
      model: 'Martin\u2019s pulse form for long gaps in air',
      valid: 'divergent gaps from about 10 cm; not for gaps of millimetres',
    }),
  );
}
