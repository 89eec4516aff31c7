import type { Answer } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { computed } from '../units/computed';
import type { Result } from '../units/result';

const FAR_FIELD_PA = 520;
const REFERENCE_PA = 20e-6;
/** Peak limit for the ear, 140 dB (read). */
const LIMIT_DB = 140;
const LIMIT_PA = REFERENCE_PA * 10 ** (LIMIT_DB / 20);

const ENERGY_RULE = {
  field: 'energy_J',
  name: 'Energy',
  unit: 'J',
  min: 0,
  minExcluded: true,
  max: 1e6,
} as const;

/**
 * Upper bound of a spark's peak sound level, dB: all its energy to blast, 520 E^(1/3)/r Pa. Kinney and Graham's far
 * field (from memory), asymptote by own computation; sparks lie 6 to 10 dB under it. A closed box is louder.
 */
export function peakSoundLevel(energy_J: number, distance_m: number): Result<Answer> {
  return computed(
    [
      checkNumber(energy_J, ENERGY_RULE),
      checkNumber(distance_m, { field: 'distance_m', name: 'Distance', unit: 'm', min: 0.05, max: 1000 }),
    ],
    () => {
      const value = 20 * Math.log10((FAR_FIELD_PA * Math.cbrt(energy_J)) / distance_m / REFERENCE_PA);
      return {
        value,
        unit: 'dB',
        model: 'All energy to blast, far field',
        valid: 'an upper bound in the open; walls and boxes add to it',
        relative: { below: Math.abs(10 / value), above: 0 },
        warnings:
          value > LIMIT_DB
            ? [{ type: 'hearing', words: 'May pass 140\u2009dB at the ear: wear hearing protection.' }]
            : [],
      };
    },
  );
}

/** Distance inside which hearing protection is worn, m: where the bound passes 140 dB. Round it up. */
export function hearingDistance(energy_J: number): Result<Answer> {
  return computed([checkNumber(energy_J, ENERGY_RULE)], () => ({
    value: (FAR_FIELD_PA * Math.cbrt(energy_J)) / LIMIT_PA,
    unit: 'm',
    model: 'Where the bound passes 140 dB peak',
    valid: 'one shot in the open; many shots a day have a lower limit',
    relative: { below: 0.7, above: 0 },
  }));
}
