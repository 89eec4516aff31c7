import { answer, type Answer } from '../units/answer';
import { checkNumber, type NumberRule } from '../units/check-number';
import { firstRefusal, ok, refused, type Result } from '../units/result';
import { celsiusToKelvin } from '../units/temperature';

const REFERENCE_K = 293.15;

export const TEMPERATURE_RULE: NumberRule = {
  field: 'temperature_C',
  name: 'Temperature',
  unit: '\u00b0C',
  min: -60,
  max: 200,
};
export const PRESSURE_RULE: NumberRule = {
  field: 'pressure',
  name: 'Pressure',
  unit: 'bar(abs)',
  min: 0,
  minExcluded: true,
  minReason: 'absolute vacuum',
  max: 100,
};
export const GAP_CM_RULE: NumberRule = { field: 'gap_cm', name: 'Gap', unit: 'cm', min: 0.001, max: 100 };

/** A gap filled with gas, as the plain laws take it. Pressure is absolute. */
export interface GapPoint {
  readonly pressure_bar_abs: number;
  readonly gap_cm: number;
  readonly temperature_C: number;
}

/** Pressure times gap, brought to 20 C by gas density: x = p d 293.15/T, bar cm. */
export function similarity_bar_cm({ pressure_bar_abs, gap_cm, temperature_C }: GapPoint): number {
  return pressure_bar_abs * gap_cm * (REFERENCE_K / celsiusToKelvin(temperature_C));
}

/** The same after checking each input; refused by name when one is not a number or out of range. */
export function checkedSimilarity(point: GapPoint): Result<number> {
  const bad = firstRefusal([
    checkNumber(point.gap_cm, GAP_CM_RULE),
    checkNumber(point.pressure_bar_abs, PRESSURE_RULE),
    checkNumber(point.temperature_C, TEMPERATURE_RULE),
  ]);
  return bad === undefined ? ok(similarity_bar_cm(point)) : refused(bad);
}

/**
 * Relative air density (p/101.325 kPa) (293/(273 + T)) of the sphere-gap standard. Source: IEC 60052 and 60060-1,
 * form read in a public note. The standard scales voltages with it from 0.95 to 1.05 only.
 */
export function airDensity(pressure_kPa: number, temperature_C: number): Result<Answer> {
  const bad = firstRefusal([
    checkNumber(pressure_kPa, { ...PRESSURE_RULE, unit: 'kPa(abs)', max: 10_000 }),
    checkNumber(temperature_C, TEMPERATURE_RULE),
  ]);
  if (bad !== undefined) return refused(bad);
  const value = (pressure_kPa / 101.325) * (293 / (273 + temperature_C));
  const linear = value >= 0.95 && value <= 1.05;
  return ok(
    answer({
      value,
      unit: '1',
      relative: 0,
      model: 'Relative air density of the sphere-gap standard',
      valid: 'scales a table voltage from 0.95 to 1.05; outside it use the law with pressure times gap',
      warnings: linear
        ? []
        : [
            {
              type: 'density-far-from-1',
              words: 'Outside 0.95 to 1.05 a table voltage no longer scales with density.',
            },
          ],
    }),
  );
}

/**
 * Humidity factor of the sphere-gap standard, 1 + 0.002 (h/delta - 8.5), h in g/m3.
 * Source: IEC 60052:2002, from memory. A correction of 2 to 3 % at most.
 */
export function humidityFactor(humidity_g_m3: number, density: number): Result<Answer> {
  const bad = firstRefusal([
    checkNumber(humidity_g_m3, { field: 'humidity', name: 'Humidity', unit: 'g/m\u00b3', min: 0, max: 60 }),
    checkNumber(density, { field: 'density', name: 'Relative density', unit: '', min: 0.3, max: 2 }),
  ]);
  if (bad !== undefined) return refused(bad);
  return ok(
    answer({
      value: 1 + 0.002 * (humidity_g_m3 / density - 8.5),
      unit: '1',
      relative: 0.01,
      model: 'Humidity factor of the sphere-gap standard',
      valid: 'sphere gaps in air, 0 to about 25 g/m\u00b3',
    }),
  );
}
