import { allRoots } from '../numerics/all-roots';
import { borderOf } from '../numerics/bisect';
import { checkNumber } from '../units/check-number';
import { formatFigure, type Rounding } from '../units/format-quantity';
import { andThen, ok, refused, type Refusal, type Result } from '../units/result';
import { celsiusToKelvin } from '../units/temperature';
import { LARGEST_GAP_OVER_RADIUS } from './curved-gap';
import {
  GAP_PRESSURE_RULE,
  GAP_RULE,
  HIGHEST_BAR_ABS,
  HIGHEST_X_BAR_CM,
  LOWEST_X_BAR_CM,
  type GapSetup,
} from './gap-input';
import { buildGapModel, voltagesAt, type GapVoltages } from './gap-model';
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

const PIECES = 48;
// A hair inside the range, so that the ends themselves are never refused by a rounding error.
const INSIDE = 1e-9;

/**
 * The absolute pressure that meets a target at a given gap, bar. Refused in words, with the nearest limit, when
 * no pressure in the model's range does.
 */
export function pressureFor(setup: GapSetup, target: GapTarget): Result<GapSolution> {
  const model = buildGapModel(setup);
  if (!model.ok) return model;
  const narrow_cm = (setup.gap_mm - setup.u_gap_mm) / 10;
  const coldest = lowestPd(setup) / narrow_cm + setup.u_pressure_bar;
  const densest = (HIGHEST_X_BAR_CM * density(setup.temperature_C)) / (setup.gap_mm / 10);
  return solve({
    target,
    unit: 'bar(abs)',
    field: 'pressure',
    low: coldest * (1 + INSIDE),
    high: Math.min(HIGHEST_BAR_ABS, densest * (1 - INSIDE)),
    at: (bar) => voltagesAt(model.value, bar),
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
  const modelAt = (gap_mm: number) => buildGapModel({ ...setup, gap_mm });
  const range = gapRange(setup, bar);
  // A gap that could be in range brings out what is wrong with the other fields, by name.
  const spare_mm = GAP_RULE.min + 2 * setup.u_gap_mm;
  const likely_mm = range.high > range.low ? 0.5 * (range.low + range.high) : spare_mm;
  const probe = modelAt(Number.isFinite(likely_mm) ? likely_mm : 1);
  if (!probe.ok) return probe;
  return solve({
    target,
    unit: 'mm',
    field: 'gap_mm',
    ...range,
    at: (gap_mm) => andThen(modelAt(gap_mm), (model) => voltagesAt(model, bar)),
    describe: (gap_mm) => andThen(modelAt(gap_mm), (model) => selfBreakAt(model, bar)),
  });
}

function gapRange(setup: Omit<GapSetup, 'gap_mm'>, bar: number) {
  const lowBar = bar - setup.u_pressure_bar;
  const narrowest = lowBar > 0 ? (10 * lowestPd(setup)) / lowBar + setup.u_gap_mm : Infinity;
  const widest = (10 * HIGHEST_X_BAR_CM * density(setup.temperature_C)) / bar;
  const { shape, radius_mm } = setup.electrodes;
  const roundest =
    shape === 'plane' || typeof radius_mm !== 'number'
      ? Infinity
      : LARGEST_GAP_OVER_RADIUS * radius_mm - setup.u_gap_mm;
  return {
    low: Math.max(GAP_RULE.min, narrowest) * (1 + INSIDE),
    high: Math.min(GAP_RULE.max, widest, roundest) * (1 - INSIDE),
  };
}

function lowestPd(setup: Pick<GapSetup, 'temperature_C' | 'u_temperature_C'>): number {
  return LOWEST_X_BAR_CM * density(setup.temperature_C + setup.u_temperature_C);
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
  readonly at: (setting: number) => Result<GapVoltages>;
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
  const voltage = (setting: number) => {
    const voltages = search.at(setting);
    return voltages.ok ? voltages.value[`${side}_kV`] : Number.NaN;
  };
  const all = settingsFor(search, voltage);
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

function settingsFor({ target, low, high }: Search, voltage: (setting: number) => number): readonly number[] {
  const wanted = target.voltage_kV;
  if (target.purpose === 'law') {
    return allRoots((setting) => voltage(setting) - wanted, { low, high, pieces: PIECES, logarithmic: true });
  }
  // The low side jumps where the small-pd factor ends, so a border is sought and not a zero.
  const holds =
    target.purpose === 'hold-off-at-least'
      ? (setting: number) => voltage(setting) >= wanted
      : (setting: number) => voltage(setting) <= wanted;
  const borders: number[] = [];
  let before = { setting: low, good: holds(low) };
  for (let piece = 1; piece <= PIECES; piece += 1) {
    const setting = piece === PIECES ? high : low * (high / low) ** (piece / PIECES);
    const good = holds(setting);
    if (good !== before.good) {
      borders.push(
        borderOf(
          holds,
          good ? { fails: before.setting, holds: setting } : { fails: setting, holds: before.setting },
        ),
      );
    }
    before = { setting, good };
  }
  return borders;
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
