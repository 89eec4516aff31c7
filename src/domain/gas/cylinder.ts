import type { Answer } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { computed } from '../units/computed';
import { BAR_PER_ATM } from '../units/pressure';
import { firstRefusal, refused, type Result } from '../units/result';
import { celsiusToKelvin } from '../units/temperature';
import { compressibilityOf, CYLINDER_PRESSURE_RULE, GAS_TEMPERATURE_RULE } from './nitrogen-state';

/** Gas volumes are stated at 15 C and 1 atm, as gas suppliers do (ISO 13443). */
const FREE_C = 15;
/** The same state for every cylinder. */
const FREE_COMPRESSIBILITY = compressibilityOf(BAR_PER_ATM, FREE_C);

/** A cylinder by its water volume. A gauge reads the ambient pressure less: add it. */
export interface Cylinder {
  readonly volume_L: number;
  readonly pressure_bar_abs: number;
  readonly temperature_C: number;
}

/** Gas in a cylinder at 15 C and 1 atm, L, by the ideal gas; 5 % too much for a full one. */
export function freeVolumeIdeal(cylinder: Cylinder): Result<Answer> {
  return computed(checksOf(cylinder), () => ({
    value: idealOf(cylinder),
    unit: 'L',
    model: 'Ideal gas',
    valid: 'up to about 50 bar; above it take the real gas',
    relative: cylinder.pressure_bar_abs > 50 ? 0.2 : 0.01,
  }));
}

/** Nitrogen in a cylinder at 15 C and 1 atm, L, as a real gas. For what is left round down, for a leak round up. */
export function freeVolumeReal(cylinder: Cylinder): Result<Answer> {
  const bad = firstRefusal(checksOf(cylinder));
  if (bad !== undefined) return refused(bad);
  const inside = compressibilityOf(cylinder.pressure_bar_abs, cylinder.temperature_C);
  if (!inside.ok) return inside;
  if (!FREE_COMPRESSIBILITY.ok) return FREE_COMPRESSIBILITY;
  const outside = FREE_COMPRESSIBILITY.value;
  return computed([], () => ({
    value: (idealOf(cylinder) * outside) / inside.value,
    unit: 'L',
    model: 'Nitrogen as a real gas, at 15 \u00b0C and 1 atm',
    valid: 'pure nitrogen up to 350 bar(abs); the gauge and the gas\u2019s own temperature decide the rest',
    relative: 0.02,
  }));
}

/**
 * Minutes that a cylinder feeds a flow until it is down to a rest pressure, min. Flow counted at 15 C and 1 atm. Round
 * it down.
 */
export function flowTime(
  cylinder: Cylinder,
  draw: { readonly flow_L_min: number; readonly rest_bar_abs: number },
): Result<Answer> {
  const bad = firstRefusal([
    ...checksOf(cylinder),
    checkNumber(draw.flow_L_min, {
      field: 'flow_L_min',
      name: 'Flow',
      unit: 'L/min',
      min: 0,
      minExcluded: true,
      max: 1e4,
    }),
    checkNumber(draw.rest_bar_abs, {
      ...CYLINDER_PRESSURE_RULE,
      field: 'rest_bar_abs',
      name: 'Rest pressure',
      max: cylinder.pressure_bar_abs,
      maxReason: 'the pressure that is in it',
    }),
  ]);
  if (bad !== undefined) return refused(bad);
  const full = freeVolumeReal(cylinder);
  if (!full.ok) return full;
  const rest = freeVolumeReal({ ...cylinder, pressure_bar_abs: draw.rest_bar_abs });
  if (!rest.ok) return rest;
  return computed([], () => ({
    value: Math.max(0, full.value.value - rest.value.value) / draw.flow_L_min,
    unit: 'min',
    model: 'Real gas left over the flow',
    valid: 'no leak; a flowmeter is rarely better than 5 %',
    relative: 0.07,
  }));
}

function checksOf({ volume_L, pressure_bar_abs, temperature_C }: Cylinder) {
  return [
    checkNumber(volume_L, {
      field: 'volume_L',
      name: 'Water volume',
      unit: 'L',
      min: 0,
      minExcluded: true,
      max: 1e4,
    }),
    checkNumber(pressure_bar_abs, CYLINDER_PRESSURE_RULE),
    checkNumber(temperature_C, GAS_TEMPERATURE_RULE),
  ];
}

function idealOf({ volume_L, pressure_bar_abs, temperature_C }: Cylinder): number {
  return (
    ((volume_L * pressure_bar_abs) / BAR_PER_ATM) * (celsiusToKelvin(FREE_C) / celsiusToKelvin(temperature_C))
  );
}
