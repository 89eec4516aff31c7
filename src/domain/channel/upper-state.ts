import type { Answer } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { computed } from '../units/computed';
import { numberDensity_cm3 } from '../units/constants';
import type { Result } from '../units/result';
import { celsiusToKelvin } from '../units/temperature';
import { CHANNEL_CELSIUS_RULE, CHANNEL_PRESSURE_RULE } from './reduced-field';

const RADIATIVE_NS = 37;
const QUENCH_N2_CM3_S = 1.15e-11;
const QUENCH_O2_CM3_S = 3e-10;
const AIR_N2 = 0.79;
const AIR_O2 = 0.21;
const PER_NS = 1e-9;

const NITROGEN_FORM = '36/(1 + 12.8 p) ns';

/**
 * Effective lifetime of the upper laser level C of nitrogen, ns: 36/(1 + 12.8 p), p in bar. The classic form
 * 36/(1 + p/58 Torr), from memory and read in a mirror of an encyclopedia; the kinetic constants give a fifth more.
 */
export function upperStateLifetime(pressure_bar_abs: number): Result<Answer> {
  return computed([checkNumber(pressure_bar_abs, CHANNEL_PRESSURE_RULE)], () => ({
    value: 1 / rateByForm_ns(pressure_bar_abs),
    unit: 'ns',
    model: NITROGEN_FORM,
    valid: 'pure nitrogen at room temperature',
    relative: 0.2,
  }));
}

/** The same from radiative lifetime (37 ns) and quenching by nitrogen, both from memory. */
export function upperStateLifetimeKinetic(pressure_bar_abs: number, temperature_C: number): Result<Answer> {
  return computed(checks(pressure_bar_abs, temperature_C), () => ({
    value: 1 / rateByKinetics_ns({ pressure_bar_abs, temperature_C, n2: 1, o2: 0 }),
    unit: 'ns',
    model: 'Radiation and quenching by nitrogen',
    valid: 'pure nitrogen; constants from memory',
    relative: 0.2,
  }));
}

/** Effective lifetime in air, ns: oxygen quenches it to half a nanosecond, which is why air lases weakly. */
export function upperStateLifetimeAir(pressure_bar_abs: number, temperature_C: number): Result<Answer> {
  return computed(checks(pressure_bar_abs, temperature_C), () => ({
    value: 1 / rateByKinetics_ns({ pressure_bar_abs, temperature_C, n2: AIR_N2, o2: AIR_O2 }),
    unit: 'ns',
    model: 'Radiation and quenching by nitrogen and oxygen',
    valid: 'dry air; constants from memory',
    relative: 0.25,
  }));
}

/** Effective lifetime with a share of oxygen in the nitrogen, ns. 0.1 % takes 2 %, 1 % takes 16 %: stay under 0.5 %. */
export function upperStateLifetimeWithOxygen(gas: {
  readonly pressure_bar_abs: number;
  readonly oxygen_share: number;
  readonly temperature_C: number;
}): Result<Answer> {
  const { pressure_bar_abs, oxygen_share, temperature_C } = gas;
  return computed(
    [
      ...checks(pressure_bar_abs, temperature_C),
      checkNumber(oxygen_share, { field: 'oxygen_share', name: 'Oxygen share', unit: '', min: 0, max: 1 }),
    ],
    () => ({
      value: 1 / lossRate_ns({ pressure_bar_abs, oxygen_share, temperature_C }),
      unit: 'ns',
      model: `${NITROGEN_FORM} and quenching by oxygen`,
      valid: 'nitrogen with some oxygen; the constant for oxygen is from memory',
      relative: 0.2,
      warnings:
        oxygen_share > 0.005
          ? [{ type: 'oxygen', words: 'More than 0.5 % oxygen: flush longer or look for a leak.' }]
          : [],
    }),
  );
}

function lossRate_ns(gas: {
  readonly pressure_bar_abs: number;
  readonly oxygen_share: number;
  readonly temperature_C: number;
}): number {
  const density = numberDensity_cm3(gas.pressure_bar_abs, celsiusToKelvin(gas.temperature_C));
  return rateByForm_ns(gas.pressure_bar_abs) + QUENCH_O2_CM3_S * gas.oxygen_share * density * PER_NS;
}

function rateByForm_ns(pressure_bar_abs: number): number {
  return (1 + 12.8 * pressure_bar_abs) / 36;
}

function rateByKinetics_ns(gas: {
  readonly pressure_bar_abs: number;
  readonly temperature_C: number;
  readonly n2: number;
  readonly o2: number;
}): number {
  const density = numberDensity_cm3(gas.pressure_bar_abs, celsiusToKelvin(gas.temperature_C));
  return 1 / RADIATIVE_NS + (QUENCH_N2_CM3_S * gas.n2 + QUENCH_O2_CM3_S * gas.o2) * density * PER_NS;
}

function checks(pressure_bar_abs: number, temperature_C: number) {
  return [
    checkNumber(pressure_bar_abs, CHANNEL_PRESSURE_RULE),
    checkNumber(temperature_C, CHANNEL_CELSIUS_RULE),
  ];
}
