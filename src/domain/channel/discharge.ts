import type { Answer } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { computed } from '../units/computed';
import { GAS_CONSTANT_J_MOL_K, SPEED_OF_LIGHT_M_S } from '../units/constants';
import type { Result } from '../units/result';
import { celsiusToKelvin } from '../units/temperature';
import { CHANNEL_CELSIUS_RULE, CHANNEL_PRESSURE_RULE } from './reduced-field';

const NITROGEN_KG_MOL = 0.0280134;
/** Specific heat of nitrogen at constant pressure, J/(kg K), room temperature. */
const NITROGEN_CP = 1040;

/** Time for light along the channel, ns. A travelling wave fires the channel at this pace. */
export function transitTime(length_m: number, refractiveIndex: number): Result<Answer> {
  return computed(
    [
      checkNumber(length_m, { field: 'length_m', name: 'Length', unit: 'm', min: 0, max: 1000 }),
      checkNumber(refractiveIndex, {
        field: 'refractiveIndex',
        name: 'Refractive index',
        unit: '',
        min: 1,
        max: 5,
      }),
    ],
    () => ({
      value: (1e9 * length_m * refractiveIndex) / SPEED_OF_LIGHT_M_S,
      unit: 'ns',
      model: 'Length over the speed of light',
      valid: 'gas and glass',
      relative: 0.001,
    }),
  );
}

/** Warming of the gas by one shot, K: E/(rho cp V). Hot gas is thin gas: renew it before the next shot. */
export function gasHeating(shot: {
  readonly energy_J: number;
  readonly volume_cm3: number;
  readonly pressure_bar_abs: number;
  readonly temperature_C: number;
}): Result<Answer> {
  const { energy_J, volume_cm3, pressure_bar_abs, temperature_C } = shot;
  return computed(
    [
      checkNumber(energy_J, { field: 'energy_J', name: 'Energy', unit: 'J', min: 0, max: 1e5 }),
      checkNumber(volume_cm3, {
        field: 'volume_cm3',
        name: 'Channel volume',
        unit: 'cm\u00b3',
        min: 1e-6,
        max: 1e7,
      }),
      checkNumber(pressure_bar_abs, CHANNEL_PRESSURE_RULE),
      checkNumber(temperature_C, CHANNEL_CELSIUS_RULE),
    ],
    () => {
      const kelvin = celsiusToKelvin(temperature_C);
      const density_kg_m3 = (pressure_bar_abs * 1e5 * NITROGEN_KG_MOL) / (GAS_CONSTANT_J_MOL_K * kelvin);
      const value = energy_J / (density_kg_m3 * NITROGEN_CP * volume_cm3 * 1e-6);
      return {
        value,
        unit: 'K',
        model: 'All energy into the gas of the channel',
        valid: 'up to some hundred kelvin; an arc heats its own thread far more',
        relative: { below: 0.5, above: 0.1 },
        warnings:
          value > 0.05 * kelvin
            ? [{ type: 'thin-gas', words: 'Over 5 % thinner gas for the next shot: renew it between shots.' }]
            : [],
      };
    },
  );
}

/** Gas flow that renews the channel, L/min: volume times rate times one to three renewals. */
export function renewalFlow(channel: {
  readonly volume_cm3: number;
  readonly rate_Hz: number;
  readonly renewals: number;
}): Result<Answer> {
  return computed(
    [
      checkNumber(channel.volume_cm3, {
        field: 'volume_cm3',
        name: 'Channel volume',
        unit: 'cm\u00b3',
        min: 0,
        max: 1e7,
      }),
      checkNumber(channel.rate_Hz, { field: 'rate_Hz', name: 'Rate', unit: 'Hz', min: 0, max: 1e5 }),
      checkNumber(channel.renewals, {
        field: 'renewals',
        name: 'Renewals a shot',
        unit: '',
        min: 0,
        max: 100,
      }),
    ],
    () => ({
      value: (channel.volume_cm3 * channel.rate_Hz * channel.renewals * 60) / 1000,
      unit: 'L/min',
      model: 'Channel volumes a shot',
      valid: 'common practice, one to three; across the channel, not along it',
      relative: 0.3,
    }),
  );
}

/**
 * Least density of starting electrons for an even discharge, 1/cm3: avalanche heads of radius sqrt(4 D t) must overlap,
 * 3/(4 pi r^3). After Palmer 1974 (abstract read). An order of size; the natural background of about 1000 is too little.
 */
export function preionisationMinimum(diffusion_cm2_s: number, time_s: number): Result<Answer> {
  return computed(
    [
      checkNumber(diffusion_cm2_s, {
        field: 'diffusion_cm2_s',
        name: 'Diffusion of electrons',
        unit: 'cm\u00b2/s',
        min: 1,
        max: 1e7,
      }),
      checkNumber(time_s, { field: 'time_s', name: 'Formative time', unit: 's', min: 1e-12, max: 1e-3 }),
    ],
    () => {
      const radius_cm = Math.sqrt(4 * diffusion_cm2_s * time_s);
      return {
        value: 3 / (4 * Math.PI * radius_cm ** 3),
        unit: '1/cm\u00b3',
        model: 'Overlap of avalanche heads',
        valid: 'an order of size',
        relative: { below: 0.9, above: 9 },
      };
    },
  );
}
