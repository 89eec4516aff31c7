import type { Answer } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { computed } from '../units/computed';
import type { Result } from '../units/result';

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
