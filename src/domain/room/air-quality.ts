import type { Answer, Warning } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { computed } from '../units/computed';
import { numberDensity_cm3 } from '../units/constants';
import { BAR_PER_ATM } from '../units/pressure';
import type { Result } from '../units/result';

/**
 * Workplace limits, ppm. Ozone: OSHA 8 h and NIOSH ceiling; NO 8 h; NO2: OSHA's ceiling and the 15 minutes that NIOSH
 * recommends (NIOSH, Documentation for Immediately Dangerous Concentrations, 10102-44-0); all read.
 */
export const LIMITS_PPM = {
  ozone: 0.1,
  nitricOxide: 25,
  nitrogenDioxide: 5,
  nitrogenDioxideShort: 1,
} as const;

/** 1 ppm of ozone at 20 C and 1 atm, mg/m3: 47.998 g/mol over 24.055 L/mol. */
const OZONE_MG_M3_PER_PPM = 47.998 / 24.055;
const AIR_MOLECULES_CM3 = numberDensity_cm3(BAR_PER_ATM, 293.15);

/** Nitrogen oxides of a hot spark in air, molecules a joule: transient spark, abstract read. */
export const SPARK_MOLECULES_PER_J = 7e16;

const POWER_RULE = { field: 'power_W', name: 'Power', unit: 'W', min: 0, max: 1e6 } as const;
const ROOM_RULE = { field: 'room_m3', name: 'Room volume', unit: 'm\u00b3', min: 0.1, max: 1e6 } as const;
const AIR_CHANGES_RULE = {
  field: 'airChanges_h',
  name: 'Air changes',
  unit: '1/h',
  min: 0,
  max: 1000,
} as const;

/** A room and how often its air is renewed. */
export interface Room {
  readonly room_m3: number;
  readonly airChanges_h: number;
}

/**
 * Ozone in the long run, ppm: P Y/(V (ACH + k)). Corona and glow in air make 10 to 60 g/kWh (from memory, within a
 * factor of five); it decays at 1 to 3 an hour. Hot sparks make none to speak of. The smell is no alarm.
 */
export function ozoneLevel(
  source: { readonly power_W: number; readonly yield_g_kWh: number; readonly decay_per_h: number },
  { room_m3, airChanges_h }: Room,
): Result<Answer> {
  const { power_W, yield_g_kWh, decay_per_h } = source;
  return computed(
    [
      checkNumber(power_W, POWER_RULE),
      checkNumber(yield_g_kWh, {
        field: 'yield_g_kWh',
        name: 'Ozone yield',
        unit: 'g/kWh',
        min: 0,
        max: 300,
      }),
      checkNumber(decay_per_h, { field: 'decay_per_h', name: 'Decay', unit: '1/h', min: 0, max: 100 }),
      checkNumber(room_m3, ROOM_RULE),
      checkNumber(airChanges_h, AIR_CHANGES_RULE),
      checkNumber(airChanges_h + decay_per_h, {
        field: 'airChanges_h',
        name: 'Air changes and decay together',
        unit: '1/h',
        min: 0.01,
        minReason: 'without either the level never settles',
        max: 1100,
      }),
    ],
    () => {
      // W times g/kWh is mg/h.
      const value = (power_W * yield_g_kWh) / (room_m3 * (airChanges_h + decay_per_h)) / OZONE_MG_M3_PER_PPM;
      return {
        value,
        unit: 'ppm',
        model: 'Yield against air changes and decay',
        valid: 'within a factor of five, as the yield is; higher beside the source',
        relative: { below: 0.8, above: 4 },
        warnings: over(
          value,
          LIMITS_PPM.ozone,
          'Over the limit of 0.1\u2009ppm: ventilate or enclose it. The smell is no alarm.',
        ),
      };
    },
  );
}

/**
 * Nitrogen oxides in the long run, ppm: molecules a joule over the air changes. Sparks in air make about 7e16 a joule
 * (transient spark, abstract read). Held against the ceiling for NO2, the stricter one.
 */
export function nitrogenOxideLevel(
  source: { readonly power_W: number; readonly molecules_per_J: number },
  { room_m3, airChanges_h }: Room,
): Result<Answer> {
  return computed(
    [
      checkNumber(source.power_W, POWER_RULE),
      checkNumber(source.molecules_per_J, {
        field: 'molecules_per_J',
        name: 'Molecules a joule',
        unit: '1/J',
        min: 0,
        max: 1e19,
      }),
      checkNumber(room_m3, ROOM_RULE),
      checkNumber(airChanges_h, {
        ...AIR_CHANGES_RULE,
        min: 0.01,
        minReason: 'without air changes the level never settles',
      }),
    ],
    () => {
      const molecules_h = source.power_W * source.molecules_per_J * 3600;
      const value = (1e6 * molecules_h) / (room_m3 * 1e6 * airChanges_h * AIR_MOLECULES_CM3);
      return {
        value,
        unit: 'ppm',
        model: 'Molecules a joule against air changes',
        valid: 'within a factor of three; higher beside the gap',
        relative: { below: 0.7, above: 2 },
        warnings: nitrogenWarnings(value),
      };
    },
  );
}

function nitrogenWarnings(value: number): readonly Warning[] {
  if (value > LIMITS_PPM.nitrogenDioxideShort && value <= LIMITS_PPM.nitrogenDioxide) {
    const words =
      'Over 1\u2009ppm, the 15 minutes that NIOSH recommends for NO2: ventilate or enclose the gap.';
    return [{ type: 'near-limit', words }];
  }
  const words = 'Over the ceiling of 5\u2009ppm for NO2: ventilate or enclose the gap.';
  return over(value, LIMITS_PPM.nitrogenDioxide, words);
}

/** What ozone's yield leaves open; nitrogen oxides are held to it too, since NO2 counts at a fifth of its ceiling. */
const UNCERTAINTY = 5;

// A level within its own uncertainty of the limit is worth a word before it is over it.
function over(value: number, limit: number, words: string): readonly Warning[] {
  if (value > limit) return [{ type: 'over-limit', words }];
  return value > limit / UNCERTAINTY
    ? [{ type: 'near-limit', words: 'Within its uncertainty of the limit: ventilate.' }]
    : [];
}
