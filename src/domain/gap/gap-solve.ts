import { checkNumber } from '../units/check-number';
import { formatFigure, type Rounding } from '../units/format-quantity';
import { andThen, ok, refused, type Refusal, type Result } from '../units/result';
import { celsiusToKelvin } from '../units/temperature';
import { bordersOf, borderNear, type BorderSearch } from './gap-borders';
import { checkElectrodes, gapLimits, type CheckedElectrodes } from './electrodes';
import {
  GAP_PRESSURE_RULE,
  FULLY_VALID_FROM_BAR_CM,
  GAP_RULE,
  HIGHEST_BAR_ABS,
  HIGHEST_X_BAR_CM,
  LOWEST_X_BAR_CM,
  type GapSetup,
} from './gap-input';
import { buildGapModel, checkGap, modelSideAt, sideAt, type CheckedGap, type GapSide } from './gap-model';
import { selfBreakAt, type GapAnswer } from './self-break';

/**
 * What the setting is for. To hold off at least: nothing fires below the voltage, so the low side decides. To
 * break at most: it has fired by then, so the high side decides. The law only for a best estimate.
 */
export type GapPurpose = 'hold-off-at-least' | 'break-at-most' | 'law';

export interface GapTarget {
  readonly purpose: GapPurpose;
  readonly voltage_kV: number;
}

/** A setting that meets a target, and the gap at it. */
export interface GapSolution {
  readonly value: number;
  readonly unit: 'bar(abs)' | 'mm';
  readonly purpose: GapPurpose;
  /** Which face of the answer the purpose leans on. */
  readonly leansOn: 'low' | 'high' | 'law';
  /** Which way to round the setting so that the target is still met. */
  readonly rounding: Rounding;
  /** Every setting in range where the target is just met, in rising order. */
  readonly all: readonly number[];
  readonly gap: GapAnswer;
}

// A hair inside the range, so that the ends themselves are never refused by a rounding error.
const INSIDE = 1e-9;
const MM_PER_CM = 10;

/**
 * The absolute pressure that meets a target at a given gap, bar. Refused in words, with the nearest limit, when
 * no pressure in the model's range does.
 */
export function pressureFor(setup: GapSetup, target: GapTarget): Result<GapSolution> {
  const model = buildGapModel(setup);
  if (!model.ok) return model;
  const narrow_cm = (setup.gap_mm - setup.u_gap_mm) / MM_PER_CM;
  const atX = (x_bar_cm: number) => (x_bar_cm * lowDensity(setup)) / narrow_cm + setup.u_pressure_bar;
  const densest = (HIGHEST_X_BAR_CM * density(setup.temperature_C)) / (setup.gap_mm / MM_PER_CM);
  return solve({
    target,
    unit: 'bar(abs)',
    field: 'pressure',
    low: atX(LOWEST_X_BAR_CM) * (1 + INSIDE),
    high: Math.min(HIGHEST_BAR_ABS, densest * (1 - INSIDE)),
    jump: atX(FULLY_VALID_FROM_BAR_CM),
    at: (bar, side) => modelSideAt(model.value, bar, side),
    describe: (bar) => selfBreakAt(model.value, bar),
  });
}

/** The gap that meets a target at a given absolute pressure, mm; refused as `pressureFor` is. */
export function gapFor(
  setup: Omit<GapSetup, 'gap_mm'> & { readonly pressure: { readonly bar_abs: number } },
  target: GapTarget,
): Result<GapSolution> {
  const pressure = checkNumber(setup.pressure.bar_abs, GAP_PRESSURE_RULE);
  if (!pressure.ok) return pressure;
  const bar = pressure.value;
  const electrodes = checkElectrodes(setup.electrodes);
  if (!electrodes.ok) return electrodes;
  const range = gapRange(setup, electrodes.value, bar);
  // A gap that could be in range brings out what is wrong with the other fields, by name.
  const spare_mm = GAP_RULE.min + 2 * setup.u_gap_mm;
  const likely_mm = range.high > range.low ? 0.5 * (range.low + range.high) : spare_mm;
  const probe = checkGap({ ...setup, gap_mm: Number.isFinite(likely_mm) ? likely_mm : 1 });
  if (!probe.ok) return probe;
  const bars = electrodes.value.shape === 'hex-bars';
  const sideOf = (gap: CheckedGap) => (gap_mm: number, side: GapSide) =>
    sideAt({ ...gap, setup: { ...setup, gap_mm } }, bar, side);
  return solve({
    target,
    unit: 'mm',
    field: 'gap_mm',
    ...range,
    ...(bars ? { like: sideOf({ ...probe.value, electrodes: { shape: 'plane' } }) } : {}),
    at: sideOf(probe.value),
    describe: (gap_mm) => andThen(buildGapModel({ ...setup, gap_mm }), (model) => selfBreakAt(model, bar)),
  });
}

function gapRange(setup: Omit<GapSetup, 'gap_mm'>, electrodes: CheckedElectrodes, bar: number) {
  const lowBar = bar - setup.u_pressure_bar;
  const atX = (x_bar_cm: number) =>
    lowBar > 0 ? (MM_PER_CM * x_bar_cm * lowDensity(setup)) / lowBar + setup.u_gap_mm : Infinity;
  const densest = (MM_PER_CM * HIGHEST_X_BAR_CM * density(setup.temperature_C)) / bar;
  const { narrowest_mm, widest_mm } = gapLimits(electrodes);
  return {
    low: Math.max(GAP_RULE.min, atX(LOWEST_X_BAR_CM), narrowest_mm + setup.u_gap_mm) * (1 + INSIDE),
    high: Math.min(GAP_RULE.max, densest, widest_mm - setup.u_gap_mm) * (1 - INSIDE),
    jump: atX(FULLY_VALID_FROM_BAR_CM),
  };
}

function lowDensity(setup: Pick<GapSetup, 'temperature_C' | 'u_temperature_C'>): number {
  return density(setup.temperature_C + setup.u_temperature_C);
}

function density(temperature_C: number): number {
  return celsiusToKelvin(temperature_C) / celsiusToKelvin(20);
}

interface Search {
  readonly target: GapTarget;
  readonly unit: GapSolution['unit'];
  readonly field: string;
  readonly low: number;
  readonly high: number;
  /** Where the low side changes its factor and jumps. */
  readonly jump: number;
  /** A cheap curve not far from it, where one question takes milliseconds. */
  readonly like?: Search['at'];
  /** One side at a setting; NaN where there is none. */
  readonly at: (setting: number, side: GapSide) => number;
  readonly describe: (setting: number) => Result<GapAnswer>;
}

const SIDE = { 'hold-off-at-least': 'low', 'break-at-most': 'high', law: 'law' } as const;
const ROUNDING = { 'hold-off-at-least': 'up', 'break-at-most': 'down', law: 'nearest' } as const;

function solve(search: Search): Result<GapSolution> {
  const { target, unit, field, low, high } = search;
  const wanted = checkNumber(target.voltage_kV, {
    field: 'voltage_kV',
    name: 'Voltage',
    unit: 'kV',
    min: 0,
    minExcluded: true,
    max: 1000,
  });
  if (!wanted.ok) return wanted;
  if (!(high > low)) {
    return refused({
      type: 'no-range',
      field,
      words: 'With these settings and errors the model holds for no pressure and gap at all.',
    });
  }
  const side = SIDE[target.purpose];
  const voltage = (setting: number) => search.at(setting, side);
  const all = settingsFor(search, side);
  const value = target.purpose === 'hold-off-at-least' ? all[0] : all.at(-1);
  if (value === undefined) return refused(noSolution(search, voltage));
  const gap = search.describe(value);
  if (!gap.ok) return gap;
  return ok({
    value,
    unit,
    purpose: target.purpose,
    leansOn: side,
    rounding: ROUNDING[target.purpose],
    all,
    gap: gap.value,
  });
}

function settingsFor(search: Search, side: GapSide): readonly number[] {
  const { target, like, at, low, high, jump } = search;
  const bordersFor = (curve: Search['at']): BorderSearch => ({
    low,
    high,
    jump,
    voltage_kV: (setting) => curve(setting, side),
    wanted_kV: target.voltage_kV,
    keep: target.purpose === 'break-at-most' ? 'at-most' : 'at-least',
  });
  // The high side is that of a uniform gap for every shape.
  if (like === undefined || side === 'high') return bordersOf(bordersFor(at));
  const [hint = high] = bordersOf(bordersFor(like));
  return borderNear(bordersFor(at), hint);
}

function noSolution(
  { target, unit, field, low, high }: Search,
  voltage: (setting: number) => number,
): Refusal {
  const tooLow = voltage(low) > target.voltage_kV;
  const nearest = tooLow ? low : high;
  const limit = formatFigure(nearest, { digits: { significant: 3 }, rounding: tooLow ? 'up' : 'down' });
  const side = SIDE[target.purpose];
  const there = formatFigure(voltage(nearest), {
    digits: { significant: 3 },
    rounding: side === 'high' ? 'up' : 'down',
  });
  const what = {
    low: `nothing fires below ${there}\u2009kV`,
    high: `it may hold up to ${there}\u2009kV`,
    law: `the law gives ${there}\u2009kV`,
  }[side];
  const thing = unit === 'mm' ? 'gap' : 'pressure';
  return {
    type: tooLow ? 'already-above' : 'not-reached',
    field,
    words: tooLow
      ? `No such ${thing}: already at the smallest one the model holds for, ${limit}\u2009${unit}, ${what}.`
      : `No such ${thing}: even at the largest one the model holds for, ${limit}\u2009${unit}, ${what}.`,
  };
}
