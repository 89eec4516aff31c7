import { withBand, type Answer } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { computed } from '../units/computed';
import { mapResult, type Result } from '../units/result';
import { minimumStrength } from './dielectrics';
import { VOLTAGE_RULE } from './energy';

const SHAPE_RULE = { field: 'beta', name: 'Weibull exponent', unit: '', min: 1, max: 100 } as const;
const AREA_RULE = {
  field: 'area_ratio',
  name: 'Area over the tested area',
  unit: '',
  min: 0,
  minExcluded: true,
  max: 1e9,
} as const;

/**
 * Strength of a large area as a share of the tested one's: (A/A0)^(-1/beta). Weakest link, beta 8 to 15 for films
 * (from memory); test electrodes are about 10 cm2.
 */
export function areaStrengthRatio(area_ratio: number, beta: number): Result<Answer> {
  return computed([checkNumber(area_ratio, AREA_RULE), checkNumber(beta, SHAPE_RULE)], () => ({
    value: area_ratio ** (-1 / beta),
    unit: '1',
    model: 'Weakest link, Weibull',
    valid: 'same film, same test; wrinkles and dust are not in it',
    relative: 0.1,
  }));
}

/** Chance that a sheet punctures at a stress: 1 - exp(-(A/A0) (E/E63)^beta), E63 the stress where 63 % of tests fail. */
export function punctureProbability(sheet: {
  readonly stress_over_E63: number;
  readonly area_ratio: number;
  readonly beta: number;
}): Result<Answer> {
  const { stress_over_E63, area_ratio, beta } = sheet;
  return computed(
    [
      checkNumber(stress_over_E63, {
        field: 'stress_over_E63',
        name: 'Stress over E63',
        unit: '',
        min: 0,
        max: 10,
      }),
      checkNumber(area_ratio, AREA_RULE),
      checkNumber(beta, SHAPE_RULE),
    ],
    () => {
      const value = -Math.expm1(-area_ratio * stress_over_E63 ** beta);
      return {
        value,
        unit: '1',
        model: 'Weakest link, Weibull',
        valid: 'one application of the voltage; an order of size',
        // An exponent of 8 instead of 10 moves small chances tenfold.
        relative: { below: 0.9, above: value === 0 ? 0 : Math.min(9, 1 / value - 1) },
      };
    },
  );
}

/** A sheet of film between two foils. */
export interface FilmSheet {
  readonly material: string;
  readonly thickness_mm: number;
  readonly area_cm2: number;
  readonly voltage_V: number;
}

/** Area under a usual test electrode, cm2, and a usual exponent; both from memory (physics N). */
const TESTED_CM2 = 10;
const FILM_BETA = 10;
/** Exponents that have been published for films; from memory. */
const BETA_RANGE = { low: 8, high: 15 } as const;

/**
 * Chance that a sheet punctures at a voltage, once: its minimum strength is taken for E63 of 10 cm2, which is cautious, and
 * the chance grown to its area with an exponent of 10; the band spans 8 to 15. An order of size.
 */
export function sheetPuncture({ material, thickness_mm, area_cm2, voltage_V }: FilmSheet): Result<Answer> {
  const strength = minimumStrength(material, thickness_mm);
  if (!strength.ok) return strength;
  const checked = [
    checkNumber(voltage_V, VOLTAGE_RULE),
    checkNumber(area_cm2, { field: 'area_cm2', name: 'Area', unit: 'cm\u00b2', min: 1e-3, max: 1e7 }),
  ];
  const share = voltage_V / 1000 / thickness_mm / strength.value.value;
  const chance = (beta: number) => -Math.expm1(-(area_cm2 / TESTED_CM2) * share ** beta);
  const made = computed(checked, () => ({
    value: chance(FILM_BETA),
    unit: '1',
    model: `Weakest link from 10\u2009cm\u00b2; ${strength.value.model}`,
    valid: 'one application of the voltage; wrinkles, dust and burrs are not in it',
    relative: 0,
    warnings: [
      ...strength.value.warnings,
      ...(share > 1 / 3
        ? [{ type: 'little-margin', words: 'Over a third of the minimum strength: too much with reversal.' }]
        : []),
    ],
  }));
  return mapResult(made, (one) => {
    const ends = [chance(BETA_RANGE.low), chance(BETA_RANGE.high)];
    return withBand(one, { low: Math.min(...ends), high: Math.max(...ends) });
  });
}
