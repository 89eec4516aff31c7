import type { Answer } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { computed } from '../units/computed';
import { MAGNETIC_CONSTANT_H_M, SPEED_OF_LIGHT_M_S } from '../units/constants';
import type { Result } from '../units/result';

const CM2_PER_M2 = 1e4;

const AREA_RULE = { field: 'area_cm2', name: 'Loop area', unit: 'cm\u00b2', min: 0, max: 1e6 } as const;
const DISTANCE_RULE = { field: 'distance_m', name: 'Distance', unit: 'm', min: 0.001, max: 1000 } as const;

/**
 * Upper bound of the voltage that a discharge lead induces in a loop near it, V: mu0 A (dI/dt)/(2 pi r). A meter that
 * is read during a shot proves nothing.
 */
export function inducedVoltage(loop: {
  readonly area_cm2: number;
  readonly distance_m: number;
  readonly slope_A_s: number;
}): Result<Answer> {
  return computed(
    [
      checkNumber(loop.area_cm2, AREA_RULE),
      checkNumber(loop.distance_m, DISTANCE_RULE),
      checkNumber(loop.slope_A_s, {
        field: 'slope_A_s',
        name: 'Current slope',
        unit: 'A/s',
        min: 0,
        max: 1e16,
      }),
    ],
    () => ({
      value:
        (MAGNETIC_CONSTANT_H_M * (loop.area_cm2 / CM2_PER_M2) * loop.slope_A_s) /
        (2 * Math.PI * loop.distance_m),
      unit: 'V',
      model: 'Straight lead and a loop in its field',
      valid: 'an upper bound within a factor of three; the return lead beside it takes most away',
      relative: { below: 0.9, above: 2 },
    }),
  );
}

/**
 * Upper bound of the field that a discharge loop radiates, V/m: mu0 A I w^2/(4 pi c r), w = pi/(2 t), t the quarter
 * period. Far field, from r above a tenth of the wavelength.
 */
export function radiatedField(loop: {
  readonly area_cm2: number;
  readonly distance_m: number;
  readonly current_A: number;
  readonly quarter_s: number;
}): Result<Answer> {
  return computed(
    [
      checkNumber(loop.area_cm2, AREA_RULE),
      checkNumber(loop.distance_m, DISTANCE_RULE),
      checkNumber(loop.current_A, { field: 'current_A', name: 'Peak current', unit: 'A', min: 0, max: 1e7 }),
      checkNumber(loop.quarter_s, {
        field: 'quarter_s',
        name: 'Quarter period',
        unit: 's',
        min: 1e-11,
        max: 1,
      }),
    ],
    () => {
      const omega = Math.PI / (2 * loop.quarter_s);
      const area_m2 = loop.area_cm2 / CM2_PER_M2;
      return {
        value:
          (MAGNETIC_CONSTANT_H_M * area_m2 * loop.current_A * omega ** 2) /
          (4 * Math.PI * SPEED_OF_LIGHT_M_S * loop.distance_m),
        unit: 'V/m',
        model: 'Small current loop, far field',
        valid: 'within a factor of three; nearer than a wavelength over six it is more',
        relative: { below: 0.7, above: 2 },
        warnings:
          loop.distance_m < SPEED_OF_LIGHT_M_S / omega
            ? [{ type: 'near-field', words: 'Within the near field, where it is more than this.' }]
            : [],
      };
    },
  );
}
