import { answer, type Answer, type Warning } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { firstRefusal, ok, refused, type Result } from '../units/result';

const LENGTH_RULE = { field: 'gap_cm', name: 'Gap', unit: 'cm', min: 1e-3, max: 1000 } as const;

const SEED: Warning = {
  type: 'needs-a-start',
  words:
    'The law has no start of its own: a transient needs a start resistance and depends on it, though only weakly.',
};

/** What has been published for Rompe and Weizel\u2019s constant, cm2 atm/(V2 s); Mesyats and later, partly from memory. */
export const ROMPE_WEIZEL_RANGE = { low: 0.5, high: 1.2 } as const;

/** What has been published for Toepler\u2019s constant, V s/cm: nitrogen and SF6 (read) to air (from memory). */
const TOEPLER_RANGE = { low: 0.4e-4, high: 1.5e-4 } as const;

/**
 * Resistance of a spark after Rompe and Weizel (1944), ohm: d/sqrt(2 (a/p) S), S the integral of the squared current.
 */
export function rompeWeizelResistance(spark: {
  readonly gap_cm: number;
  readonly pressure_atm_abs: number;
  readonly constant_cm2_atm_V2s: number;
  readonly action_A2s: number;
}): Result<Answer> {
  const { gap_cm, pressure_atm_abs, constant_cm2_atm_V2s: constant, action_A2s } = spark;
  const bad = firstRefusal([
    checkNumber(gap_cm, LENGTH_RULE),
    checkNumber(pressure_atm_abs, {
      field: 'pressure_atm_abs',
      name: 'Pressure',
      unit: 'atm(abs)',
      min: 1e-3,
      max: 1000,
    }),
    checkNumber(constant, {
      field: 'constant_cm2_atm_V2s',
      name: 'Constant of the law',
      unit: 'cm\u00b2\u2009atm/(V\u00b2\u2009s)',
      min: 1e-3,
      max: 100,
    }),
    checkNumber(action_A2s, {
      field: 'action_A2s',
      name: 'Action',
      unit: 'A\u00b2\u2009s',
      min: 1e-15,
      minReason: 'the law has no value at the start',
      max: 1e9,
    }),
  ]);
  if (bad !== undefined) return refused(bad);
  const inside = constant >= ROMPE_WEIZEL_RANGE.low && constant <= ROMPE_WEIZEL_RANGE.high;
  return ok(
    answer({
      value: gap_cm / Math.sqrt((2 * constant * action_A2s) / pressure_atm_abs),
      unit: '\u2126',
      relative: inside
        ? {
            below: 1 - Math.sqrt(constant / ROMPE_WEIZEL_RANGE.high),
            above: Math.sqrt(constant / ROMPE_WEIZEL_RANGE.low) - 1,
          }
        : 0.5,
      model: 'Rompe and Weizel',
      valid: 'air and nitrogen; band from the published constants, 0.5 to 1.2',
      warnings: inside ? [SEED] : [SEED, outside('0.5 to 1.2')],
    }),
  );
}

/** Resistance of a spark after Toepler, ohm: k d/Q, Q the charge that has passed. */
export function toeplerResistance(spark: {
  readonly gap_cm: number;
  readonly constant_Vs_cm: number;
  readonly charge_C: number;
}): Result<Answer> {
  const { gap_cm, constant_Vs_cm: constant, charge_C } = spark;
  const bad = firstRefusal([
    checkNumber(gap_cm, LENGTH_RULE),
    checkNumber(constant, {
      field: 'constant_Vs_cm',
      name: 'Constant of the law',
      unit: 'V\u2009s/cm',
      min: 1e-6,
      max: 1e-2,
    }),
    checkNumber(charge_C, {
      field: 'charge_C',
      name: 'Charge',
      unit: 'C',
      min: 1e-12,
      minReason: 'the law has no value at the start',
      max: 1e6,
    }),
  ]);
  if (bad !== undefined) return refused(bad);
  const inside = constant >= TOEPLER_RANGE.low && constant <= TOEPLER_RANGE.high;
  return ok(
    answer({
      value: (constant * gap_cm) / charge_C,
      unit: '\u2126',
      relative: inside
        ? { below: 1 - TOEPLER_RANGE.low / constant, above: TOEPLER_RANGE.high / constant - 1 }
        : 0.5,
      model: 'Toepler',
      valid: 'band from the published constants, 0.4e-4 (nitrogen, SF6) to 1.5e-4 (air) V\u2009s/cm',
      warnings: inside ? [SEED] : [SEED, outside('0.4e-4 to 1.5e-4')],
    }),
  );
}

function outside(range: string): Warning {
  return { type: 'constant-unusual', words: `The constant lies outside what has been published: ${range}.` };
}
