import { checkNumber, type NumberRule } from '../units/check-number';
import { firstRefusal, ok, refused, type Refusal, type Result } from '../units/result';
import { LARGEST_GAP_OVER_RADIUS, tooSharp } from './curved-gap';
import { TEMPERATURE_RULE } from './gas-density';
import type { GasName } from './gas-table';

/** Domed electrodes are counted as spheres of their face's radius; plane ones need no radius. */
export const ELECTRODE_SHAPES = ['domed', 'sphere', 'cylinder', 'plane'] as const;
export type ElectrodeShape = (typeof ELECTRODE_SHAPES)[number];

/**
 * A spark gap as it is set. Every `u_` is the error that the setting may have; give 0 only where it is known.
 * `irradiated` says whether UV reaches the electrodes; without it a gap may hold a fifth more.
 */
export interface GapInput {
  readonly gas: GasName;
  readonly electrodes: { readonly shape: ElectrodeShape; readonly radius_mm?: number | null | undefined };
  readonly gap_mm: number;
  readonly u_gap_mm: number;
  readonly pressure: { readonly bar_abs: number };
  readonly u_pressure_bar: number;
  readonly temperature_C: number;
  readonly u_temperature_C: number;
  readonly irradiated: boolean;
}

/** The gap without its pressure, for curves and for solving. */
export type GapSetup = Omit<GapInput, 'pressure'>;

/** Where the two-sided rule of physics M holds. */
export const LOWEST_X_BAR_CM = 0.013;
export const FULLY_VALID_FROM_BAR_CM = 0.05;
export const HIGHEST_X_BAR_CM = 5;
export const HIGHEST_BAR_ABS = 5;

export const GAP_RULE: NumberRule = {
  field: 'gap_mm',
  name: 'Gap',
  unit: 'mm',
  min: 0.01,
  minReason: 'below it field emission rules and this law ends',
  max: 500,
};
export const GAP_PRESSURE_RULE: NumberRule = {
  field: 'pressure',
  name: 'Pressure',
  unit: 'bar(abs)',
  min: 0,
  minExcluded: true,
  minReason: 'absolute vacuum',
  max: HIGHEST_BAR_ABS,
  maxReason: 'no measurement supports the law beyond',
};
const GAP_ERROR_RULE: NumberRule = {
  field: 'u_gap_mm',
  name: 'Setting error of the gap',
  unit: 'mm',
  min: 0,
  max: 50,
};
const PRESSURE_ERROR_RULE: NumberRule = {
  field: 'u_pressure_bar',
  name: 'Setting error of the pressure',
  unit: 'bar',
  min: 0,
  max: 2,
};
const TEMPERATURE_ERROR_RULE: NumberRule = {
  field: 'u_temperature_C',
  name: 'Error of the temperature',
  unit: '\u00b0C',
  min: 0,
  max: 100,
};
const RADIUS_RULE: NumberRule = {
  field: 'radius_mm',
  name: 'Electrode radius',
  unit: 'mm',
  min: 0.1,
  max: 1000,
  maxReason: 'choose plane electrodes',
};

/** Radius of curved electrodes, or undefined for plane ones; refused by field when anything is out of range. */
export function checkSetup(setup: GapSetup): Result<{ readonly radius_mm: number | undefined }> {
  const bad =
    firstRefusal([
      checkNumber(setup.gap_mm, GAP_RULE),
      checkNumber(setup.u_gap_mm, GAP_ERROR_RULE),
      checkNumber(setup.u_pressure_bar, PRESSURE_ERROR_RULE),
      checkNumber(setup.temperature_C, TEMPERATURE_RULE),
      checkNumber(setup.u_temperature_C, TEMPERATURE_ERROR_RULE),
    ]) ??
    badChoice(setup) ??
    errorLargerThanSetting(setup);
  if (bad !== undefined) return refused(bad);
  if (setup.electrodes.shape === 'plane') return ok({ radius_mm: undefined });
  const radius = checkNumber(setup.electrodes.radius_mm, RADIUS_RULE);
  if (!radius.ok) return radius;
  const widest_mm = setup.gap_mm + setup.u_gap_mm;
  return widest_mm > LARGEST_GAP_OVER_RADIUS * radius.value
    ? refused(tooSharp())
    : ok({ radius_mm: radius.value });
}

function badChoice(setup: GapSetup): Refusal | undefined {
  if (!ELECTRODE_SHAPES.some((shape) => shape === setup.electrodes.shape)) {
    return {
      type: 'shape-unknown',
      field: 'electrodes',
      words: 'Electrodes: choose domed, sphere, cylinder or plane.',
    };
  }
  if (typeof setup.irradiated !== 'boolean') {
    return {
      type: 'uv-not-said',
      field: 'irradiated',
      words: 'UV on the gap: say whether it reaches the electrodes.',
    };
  }
  return undefined;
}

function errorLargerThanSetting(setup: GapSetup): Refusal | undefined {
  return setup.u_gap_mm >= setup.gap_mm
    ? {
        type: 'error-too-large',
        field: 'u_gap_mm',
        words: 'Setting error of the gap: must be smaller than the gap.',
      }
    : undefined;
}
