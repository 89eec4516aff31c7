import type { Answer } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { computed } from '../units/computed';
import type { Result } from '../units/result';

/** The power law of a part: endured shots at a rated stress and reversal. */
export interface LifeLaw {
  readonly ratedShots: number;
  /** 7.5 to 8 by pulsed-power practice (J. C. Martin gives 8 for plastics); from memory. */
  readonly exponent: number;
}

/** Life holds within a factor of five at best: two sigma of published spreads, from memory. */
export const LIFE_FACTOR = 5;

/** Expected shots at a stress over the rated one: N0 (E/E0)^-k. Within a factor of 5; never a promise for one part. */
export function lifeShots({ ratedShots, exponent }: LifeLaw, stress_ratio: number): Result<Answer> {
  return computed(
    [
      checkNumber(ratedShots, { field: 'ratedShots', name: 'Rated shots', unit: '', min: 1, max: 1e15 }),
      checkNumber(exponent, { field: 'exponent', name: 'Life exponent', unit: '', min: 1, max: 30 }),
      checkNumber(stress_ratio, {
        field: 'stress_ratio',
        name: 'Stress over the rated stress',
        unit: '',
        min: 0.01,
        max: 10,
      }),
    ],
    () => ({
      value: ratedShots * stress_ratio ** -exponent,
      unit: 'shots',
      model: 'Power law of insulation life',
      valid: 'within a factor of 5; strong reversal and high rate shorten it further',
      relative: { below: 1 - 1 / LIFE_FACTOR, above: LIFE_FACTOR - 1 },
      warnings:
        stress_ratio < 0.3
          ? [
              {
                type: 'extrapolated',
                words: 'Far under the rated stress the law is extrapolated; other wear rules there.',
              },
            ]
          : [],
    }),
  );
}

/**
 * Stress that counts for life, as a ratio: peak to peak over the rated peak to peak, reversal r from 0 to 1. In an LC
 * inversion the switched capacitor goes from +V0 to -V0: reversal 1.
 */
export function lifeStressRatio(stress: {
  readonly voltage_V: number;
  readonly reversal: number;
  readonly rated_V: number;
  readonly ratedReversal: number;
}): Result<Answer> {
  const reversalRule = { unit: '', min: 0, max: 1 };
  return computed(
    [
      checkNumber(stress.voltage_V, { field: 'voltage_V', name: 'Voltage', unit: 'V', min: 0, max: 1e6 }),
      checkNumber(stress.rated_V, { field: 'rated_V', name: 'Rated voltage', unit: 'V', min: 1, max: 1e6 }),
      checkNumber(stress.reversal, { field: 'reversal', name: 'Reversal', ...reversalRule }),
      checkNumber(stress.ratedReversal, { field: 'ratedReversal', name: 'Rated reversal', ...reversalRule }),
    ],
    () => ({
      value: (stress.voltage_V * (1 + stress.reversal)) / (stress.rated_V * (1 + stress.ratedReversal)),
      unit: '1',
      model: 'Peak to peak over rated peak to peak',
      valid: 'common practice for film; ceramics follow their maker',
      relative: 0.1,
    }),
  );
}
