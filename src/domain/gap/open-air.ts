import type { Answer, Warning } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { computed } from '../units/computed';
import { BAR_PER_ATM, barToKilopascal } from '../units/pressure';
import { ok, type Result } from '../units/result';
import { celsiusToKelvin } from '../units/temperature';
import { airDensity } from './gas-density';

/** The table of needle points stands at this temperature and 1 atm. */
const TABLE_C = 25;
const MOST_HUMIDITY = 100;

/** Air at the bench. Humidity is relative, null where nobody measured it. */
export interface OpenAir {
  readonly ambient_bar_abs: number;
  readonly temperature_C: number;
  readonly humidity_percent: number | null;
}

/**
 * What a voltage counts as in this air against a table taken at 25 C and 1 atm: at least 1. Thin air breaks sooner, in proportion to
 * its density, and dry air sooner than damp air by the humidity factor for points under direct voltage (IEC 60060-1, from memory):
 * 1 + 0.014 (h/d - 11) - 0.00022 (h/d - 11)^2 from 1 to 15 g/m3. Denser and damper air earns no credit, and neither does humidity
 * that nobody measured.
 */
export function airPenalty(air: OpenAir): Result<Answer> {
  const density = densityOf(air);
  if (!density.ok) return density;
  const humid = dryFactor(air, density.value);
  if (!humid.ok) return humid;
  return computed([], () => ({
    value: 1 / (Math.min(1, density.value) * Math.min(1, humid.value)),
    unit: '1',
    model: 'Relative air density and the humidity factor for points, no credit for dense or damp air',
    valid: '0.6 to 1.1 bar(abs); surfaces between the parts count apart',
    relative: 0.03,
    warnings: warningsOf(air),
  }));
}

function densityOf({ ambient_bar_abs, temperature_C }: OpenAir): Result<number> {
  const here = airDensity(barToKilopascal(ambient_bar_abs), temperature_C);
  if (!here.ok) return here;
  const there = airDensity(barToKilopascal(BAR_PER_ATM), TABLE_C);
  return there.ok ? ok(here.value.value / there.value.value) : there;
}

function dryFactor({ humidity_percent, temperature_C }: OpenAir, density: number): Result<number> {
  if (humidity_percent === null) return ok(1);
  const humidity = checkNumber(humidity_percent, {
    field: 'humidity_percent',
    name: 'Humidity',
    unit: '%',
    min: 0,
    max: MOST_HUMIDITY,
  });
  if (!humidity.ok) return humidity;
  const grams = waterVapour_g_m3(humidity.value, temperature_C) / density;
  const from_11 = Math.min(15, Math.max(1, grams)) - 11;
  return ok(1 + 0.014 * from_11 - 0.00022 * from_11 ** 2);
}

/** Water in air, g/m3, by Magnus' formula over water (WMO constants, from memory): within 1 % from 0 to 50 C. */
export function waterVapour_g_m3(humidity_percent: number, temperature_C: number): number {
  const pressure_hPa = 6.112 * Math.exp((17.62 * temperature_C) / (243.12 + temperature_C));
  return (216.7 * (humidity_percent / 100) * pressure_hPa) / celsiusToKelvin(temperature_C);
}

function warningsOf({ humidity_percent, ambient_bar_abs }: OpenAir): readonly Warning[] {
  const warnings: Warning[] = [];
  if (humidity_percent === null) {
    warnings.push({
      type: 'humidity-unknown',
      words: 'Humidity not entered: dry winter air breaks up to a sixth sooner between points.',
    });
  }
  if (humidity_percent !== null && humidity_percent > 80) {
    warnings.push({
      type: 'damp',
      words: 'Damp air wets surfaces: they flash over long before the air between bare parts does.',
    });
  }
  if (ambient_bar_abs < 0.6) {
    warnings.push({
      type: 'thin-air',
      words: 'So thin an air lies outside what this correction was made for.',
    });
  }
  return warnings;
}

/**
 * Pressure of the air at a height above the sea, bar(abs): standard atmosphere (ICAO, from memory), -500 to 9000 m. Weather moves
 * it by 5 % (deep lows, common practice): the low end of the band is the one to plan clearances with.
 */
export function standardAtmosphere(altitude_m: number): Result<Answer> {
  return computed(
    [checkNumber(altitude_m, { field: 'altitude_m', name: 'Altitude', unit: 'm', min: -500, max: 9000 })],
    () => ({
      value: BAR_PER_ATM * (1 - 2.25577e-5 * altitude_m) ** 5.25588,
      unit: 'bar(abs)',
      model: 'Standard atmosphere',
      valid: '\u2212500 to 9,000 m; a barometer at the bench goes before it',
      relative: { below: 0.05, above: 0.04 },
    }),
  );
}
