import { answer, type Answer, type Warning } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { firstRefusal, ok, refused, type Result } from '../units/result';
import { ambientBar, gaugeToAbs, pressureGaugeBar } from '../units/pressure';
import { celsiusToKelvin } from '../units/temperature';
import { checkedSimilarity, GAP_CM_RULE, TEMPERATURE_RULE, type GapPoint } from './gas-density';
import {
  lawOrIndication,
  N2_RATIO_UP_TO_BAR_CM,
  nitrogenRatio,
  uniformByLaw_kV,
  type GasLaw,
} from './gas-law';
import type { GasName } from './gas-table';
import { AIR_CRITERION } from './streamer-criterion';

const FIELD_WARNING_MV_M = 10;
const LEAST_SLOPE_X_BAR_CM = 1e-4;

/**
 * Breakdown voltage of a uniform gap, kV. Refused below the law's range (the low-pd curve holds there) and
 * above it. Source: physics A(b) and K; air Schumann's form, from memory.
 */
export function uniformBreakdown(gas: GasName, point: GapPoint): Result<Answer> {
  const law = lawOrIndication(gas);
  if (!law.ok) return law;
  const x = checkedSimilarity(point);
  if (!x.ok) return x;
  const outside = refusalOutside(law.value, x.value);
  if (outside !== undefined) return refused(outside);
  const value = uniformByLaw_kV(law.value, x.value);
  return ok(
    answer({
      value,
      unit: 'kV',
      model: law.value.model,
      relative: law.value.relative,
      valid: `uniform field, ${String(law.value.lowestX_bar_cm)} to ${String(law.value.highestX_bar_cm)} bar cm`,
      warnings: uniformWarnings(law.value, value / point.gap_cm / 10),
    }),
  );
}

/**
 * The other published pair for air, 24.22 x' + 6.08 sqrt(x'), kV, with x' in atm cm at 293 K (read in a public
 * note). It reads 4.5 % below the sphere-gap standard where our pair is level with it: for comparison only.
 */
export function airSibling(x_atm_cm: number): Result<Answer> {
  const x = checkNumber(x_atm_cm, {
    field: 'x_atm_cm',
    name: 'Pressure times gap',
    unit: 'atm cm',
    min: 0.013,
    max: 50,
  });
  if (!x.ok) return x;
  return ok(
    answer({
      value: 24.22 * x.value + 6.08 * Math.sqrt(x.value),
      unit: 'kV',
      relative: 0.05,
      model: 'Other published law for air, 24.22 x + 6.08 \u221ax in atm cm',
      valid: 'uniform field in air; reads about 4.5 % low',
    }),
  );
}

/** Air gap from a gauge reading and the ambient pressure, kV. Ambient has no default. */
export function airFromGauge(
  reading_bar_g: number,
  ambient_bar: number,
  gap: { readonly gap_cm: number; readonly temperature_C: number },
): Result<Answer> {
  const reading = pressureGaugeBar(reading_bar_g);
  if (!reading.ok) return reading;
  const ambient = ambientBar(ambient_bar);
  if (!ambient.ok) return ambient;
  const absolute = gaugeToAbs(reading.value, ambient.value);
  if (!absolute.ok) return absolute;
  return uniformBreakdown('air', { ...gap, pressure_bar_abs: absolute.value });
}

/** What a gauge reading taken for an absolute one gives, as a share of the right voltage. */
export function gaugeMistakeRatio(
  reading_bar_g: number,
  ambient_bar: number,
  gap: { readonly gap_cm: number; readonly temperature_C: number },
): Result<Answer> {
  const right = airFromGauge(reading_bar_g, ambient_bar, gap);
  if (!right.ok) return right;
  const wrong = uniformBreakdown('air', { ...gap, pressure_bar_abs: reading_bar_g });
  if (!wrong.ok) return wrong;
  return ok(
    answer({
      value: wrong.value.value / right.value.value,
      unit: '1',
      relative: 0,
      model: 'Law for air at the gauge figure against the absolute pressure',
      valid: 'shows a mistake; never a correction',
    }),
  );
}

/** S = dlnV/dlnd of the uniform law for air: a gap set 1 % wrong breaks S % wrong. At 20 C. */
export function gapSensitivity(pressure_bar_abs: number, gap_cm: number): Result<Answer> {
  const x = checkedSimilarity({ pressure_bar_abs, gap_cm, temperature_C: 20 });
  if (!x.ok) return x;
  if (x.value < LEAST_SLOPE_X_BAR_CM) {
    return refused({
      type: 'pd-too-small',
      field: 'pressure',
      words: 'Pressure times gap is so small that this law has no slope to give.',
    });
  }
  const linear = AIR_CRITERION.Ec_kV_per_bar_cm * x.value;
  const root = Math.sqrt(AIR_CRITERION.K * x.value);
  return ok(
    answer({
      value: (linear + 0.5 * root) / (linear + root),
      unit: '1',
      relative: 0.03,
      model: 'Slope of the law for air',
      valid: 'uniform field in air, 0.013 to 50 bar cm',
    }),
  );
}

/** Voltage of nitrogen as a share of air's at the same x. Source: physics K4, from memory; x at most 5 bar cm. */
export function nitrogenToAirRatio(x_bar_cm: number): Result<Answer> {
  const x = checkNumber(x_bar_cm, {
    field: 'x_bar_cm',
    name: 'Pressure times gap',
    unit: 'bar cm',
    min: 0,
    minExcluded: true,
    max: N2_RATIO_UP_TO_BAR_CM,
    maxReason: 'nothing founds the ratio beyond',
  });
  if (!x.ok) return x;
  return ok(
    answer({
      value: nitrogenRatio(x.value),
      unit: '1',
      relative: { below: 0.03, above: 0.19 },
      model: 'Nitrogen against air, 0.967 and less above 1 bar cm',
      valid: 'up to 5 bar cm; published tables reach 1.15',
    }),
  );
}

/** Absolute pressure at which the uniform law for air gives a voltage, bar. The exact inverse of the law. */
export function pressureForVoltage(
  voltage_kV: number,
  gap: { readonly gap_cm: number; readonly temperature_C: number },
): Result<Answer> {
  const bad = firstRefusal([
    checkNumber(voltage_kV, {
      field: 'voltage_kV',
      name: 'Voltage',
      unit: 'kV',
      min: 0,
      minExcluded: true,
      max: 1300,
    }),
    checkNumber(gap.gap_cm, GAP_CM_RULE),
    checkNumber(gap.temperature_C, TEMPERATURE_RULE),
  ]);
  if (bad !== undefined) return refused(bad);
  const { Ec_kV_per_bar_cm: Ec, K } = AIR_CRITERION;
  const root = (Math.sqrt(K + 4 * Ec * voltage_kV) - Math.sqrt(K)) / (2 * Ec);
  const x = root * root;
  const value = (x / gap.gap_cm) * (celsiusToKelvin(gap.temperature_C) / 293.15);
  // The refusal outside the law's range comes from the law itself, so that the two never disagree.
  const back = uniformBreakdown('air', { ...gap, pressure_bar_abs: value });
  if (!back.ok) return back;
  return ok(
    answer({
      value,
      unit: 'bar(abs)',
      relative: 0.035,
      model: 'Law for air solved for pressure',
      valid: 'uniform field in air, 0.013 to 50 bar cm',
      warnings: back.value.warnings,
    }),
  );
}

function refusalOutside(law: GasLaw, x: number) {
  if (x < law.lowestX_bar_cm) {
    return {
      type: 'pd-too-small',
      field: 'pressure',
      words: `Pressure times gap is below ${String(law.lowestX_bar_cm)}\u2009bar cm, where this law ends. Use the low-pressure curve.`,
    };
  }
  if (x > law.highestX_bar_cm) {
    return {
      type: 'pd-too-large',
      field: 'pressure',
      words: `Pressure times gap is above ${String(law.highestX_bar_cm)}\u2009bar cm, beyond what this law was checked against.`,
    };
  }
  return undefined;
}

function uniformWarnings(law: GasLaw, field_MV_m: number): readonly Warning[] {
  const warnings: Warning[] = [];
  if (field_MV_m > FIELD_WARNING_MV_M) {
    warnings.push({
      type: 'high-field',
      words: 'Above 10\u2009MV/m the gap breaks below the law, by 5 to 30 %, as its surface decides.',
    });
  }
  if (!law.usable) {
    warnings.push({
      type: 'indicative',
      words: 'An indication within 40 %, far off with a trace of impurity. Not to plan with.',
    });
  }
  return warnings;
}
