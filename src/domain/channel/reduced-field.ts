import type { Answer } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { computed } from '../units/computed';
import { numberDensity_cm3 } from '../units/constants';
import { torrToBar } from '../units/pressure';
import type { Result } from '../units/result';
import { celsiusToKelvin } from '../units/temperature';

/** 1 Td is 1e-17 V cm2. */
const TOWNSEND_V_CM2 = 1e-17;

export const CHANNEL_PRESSURE_RULE = {
  field: 'pressure',
  name: 'Pressure',
  unit: 'bar(abs)',
  min: 1e-4,
  max: 100,
} as const;
export const CHANNEL_CELSIUS_RULE = {
  field: 'temperature_C',
  name: 'Temperature',
  unit: '\u00b0C',
  min: -60,
  max: 1000,
} as const;
const KELVIN_RULE = { field: 'temperature_K', name: 'Temperature', unit: 'K', min: 77, max: 10_000 } as const;

/** Field of 1 Td at 1 bar, kV/cm: 0.247 at 20 C. Ideal gas. */
export function townsendUnit(temperature_K: number): Result<Answer> {
  return computed([checkNumber(temperature_K, KELVIN_RULE)], () => ({
    value: (TOWNSEND_V_CM2 * numberDensity_cm3(1, temperature_K)) / 1000,
    unit: 'kV/cm',
    model: 'Ideal gas at 1 bar',
    valid: 'up to some tens of bar',
    relative: 0.001,
  }));
}

/**
 * Reduced field E/N of a channel, Td. Nitrogen breaks by itself at 125 to 150 Td in millimetre gaps at 1 atm; a laser
 * wants 150 to 300 while current flows (from memory).
 */
export function reducedField(channel: {
  readonly voltage_V: number;
  readonly gap_cm: number;
  readonly pressure_bar_abs: number;
  readonly temperature_K: number;
}): Result<Answer> {
  const { voltage_V, gap_cm, pressure_bar_abs, temperature_K } = channel;
  return computed(
    [
      checkNumber(voltage_V, { field: 'voltage_V', name: 'Voltage', unit: 'V', min: 0, max: 1e6 }),
      checkNumber(gap_cm, { field: 'gap_cm', name: 'Gap', unit: 'cm', min: 0.001, max: 100 }),
      checkNumber(pressure_bar_abs, CHANNEL_PRESSURE_RULE),
      checkNumber(temperature_K, KELVIN_RULE),
    ],
    () => ({
      value: voltage_V / gap_cm / numberDensity_cm3(pressure_bar_abs, temperature_K) / TOWNSEND_V_CM2,
      unit: 'Td',
      model: 'Mean field over density, ideal gas',
      valid: 'a uniform channel; once current flows the voltage across it is what counts',
      relative: 0.03,
    }),
  );
}

/** E/p in V/(cm Torr) as Td; 3.036 Td each at 20 C. Reported optimum 80 to 100 V/(cm Torr), read. */
export function reducedFieldFromTorr(field_V_cm_Torr: number, temperature_C: number): Result<Answer> {
  return computed(
    [
      checkNumber(field_V_cm_Torr, {
        field: 'field_V_cm_Torr',
        name: 'Field over pressure',
        unit: 'V/(cm Torr)',
        min: 0,
        max: 1e6,
      }),
      checkNumber(temperature_C, CHANNEL_CELSIUS_RULE),
    ],
    () => ({
      value:
        field_V_cm_Torr / numberDensity_cm3(torrToBar(1), celsiusToKelvin(temperature_C)) / TOWNSEND_V_CM2,
      unit: 'Td',
      model: 'Ideal gas',
      valid: 'the gas temperature, not the room\u2019s',
      relative: 0.001,
    }),
  );
}
