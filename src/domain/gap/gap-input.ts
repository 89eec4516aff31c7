import { checkNumber, type NumberRule } from '../units/check-number';
import { firstRefusal, refused, type Refusal, type Result } from '../units/result';
import { badGapFor, checkElectrodes, type CheckedElectrodes, type Electrodes } from './electrodes';
import { TEMPERATURE_RULE } from './gas-density';
import type { GasName } from './gas-table';

/**
 * A spark gap as it is set. Every `u_` is the error that the setting may have; give 0 only where it is known.
 * `irradiated` says whether UV reaches the electrodes; without it a gap may hold a fifth more.
 */
export interface GapInput {
  readonly gas: GasName;
  readonly electrodes: Electrodes;
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
/** The electrodes with all their numbers; refused by field when anything of the gap is out of range. */
export function checkSetup(setup: GapSetup): Result<CheckedElectrodes> {
  const bad =
    firstRefusal([
      checkNumber(setup.gap_mm, GAP_RULE),
      checkNumber(setup.u_gap_mm, GAP_ERROR_RULE),
      checkNumber(setup.u_pressure_bar, PRESSURE_ERROR_RULE),
      checkNumber(setup.temperature_C, TEMPERATURE_RULE),
      checkNumber(setup.u_temperature_C, TEMPERATURE_ERROR_RULE),
    ]) ??
    uvNotSaid(setup) ??
    errorLargerThanSetting(setup);
  if (bad !== undefined) return refused(bad);
  const electrodes = checkElectrodes(setup.electrodes);
  if (!electrodes.ok) return electrodes;
  const bare = badGapFor(electrodes.value, {
    narrow_mm: setup.gap_mm - setup.u_gap_mm,
    wide_mm: setup.gap_mm + setup.u_gap_mm,
  });
  return bare === undefined ? electrodes : refused(bare);
}

function uvNotSaid(setup: GapSetup): Refusal | undefined {
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
