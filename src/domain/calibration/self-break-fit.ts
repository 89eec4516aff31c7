import { fitLine } from '../numerics/line-fit';
import { studentQuantile } from '../numerics/student-t';
import { answer, type Answer, type Warning } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { ok, refused, type Refusal, type Result } from '../units/result';
import { testDrift, type Drift } from './drift';
import { rigLaw, type RigGap, type RigSetting } from './rig-law';

/** A measured self-break. `name` is how a person finds it again; `shot` orders the readings. */
export interface SelfBreakReading extends RigSetting {
  readonly name: string;
  readonly shot: number;
  readonly voltage_kV: number;
}

export interface Interval {
  readonly value: number;
  readonly low: number;
  readonly high: number;
}

export interface SettingRange {
  readonly gap_mm: readonly [low: number, high: number];
  readonly pressure_bar_abs: readonly [low: number, high: number];
}

/** A reading that was left out, and how far it lies off in robust sigmas. */
export interface Outlier {
  readonly name: string;
  readonly sigmas: number;
  readonly words: string;
}

/**
 * A rig's own self-break: scale times the law at the set gap plus an offset. All intervals at 95 %. `offset_mm` is null
 * where the readings cannot tell an offset of the gap from a scale.
 */
export interface SelfBreakFit {
  readonly type: 'gap-and-scale' | 'scale-alone';
  readonly rig: RigGap;
  readonly scale: Interval;
  readonly offset_mm: Interval | null;
  /** Relative scatter of single readings about the fit, one sigma. */
  readonly scatter: number;
  readonly used: number;
  /** Gaps and pressures among the readings that were used. */
  readonly read: SettingRange;
  readonly freedom: number;
  readonly outliers: readonly Outlier[];
  readonly drift: Drift;
  readonly warnings: readonly Warning[];
}

const FEWEST = 3;
const FEWEST_FOR_BOTH = 5;
const MOST = 5000;
const TAILS = 0.05;
/** An offset counts as told apart when its interval is within this share of the smallest gap. */
const TOLD_APART = 0.1;
const OUTLIER_SIGMAS = 4;
const MOST_OUTLIERS = 0.25;
/** A voltage is hardly read better than this, so nothing within it is an outlier. */
const LEAST_SIGMA = 0.005;
const SLOPE_STEP = 1e-4;
/** Own choice. */
const READ_MARGIN = 0.1;

/**
 * Least squares on ln V. Both numbers are fitted where gaps differ enough to tell them apart, scale alone otherwise.
 * Readings beyond 4 robust sigmas are left out one at a time, named, and never more than a quarter. Refused with fewer than
 * three readings, or where a reading lies outside the law.
 */
export function fitSelfBreak(rig: RigGap, readings: readonly SelfBreakReading[]): Result<SelfBreakFit> {
  const bad = readingsRefusal(readings);
  if (bad !== undefined) return refused(bad);
  const law = rigLaw(rig);
  const outliers: Outlier[] = [];
  let kept = readings;
  for (;;) {
    const fitted = fitKept(law, kept);
    if (!fitted.ok) return fitted;
    const worst = worstOf(fitted.value.residuals);
    const full = outliers.length + 1 > MOST_OUTLIERS * readings.length || kept.length - 1 < FEWEST;
    const reading = kept[worst.index];
    if (worst.sigmas < OUTLIER_SIGMAS || full || reading === undefined) {
      return ok(finish({ rig, kept, fitted: fitted.value, outliers }));
    }
    const side = (fitted.value.residuals[worst.index] ?? 0) < 0 ? 'low' : 'high';
    const words = `${reading.name}: ${worst.sigmas.toFixed(1)}\u2009\u03c3 ${side}, left out of the fit.`;
    outliers.push({ name: reading.name, sigmas: worst.sigmas, words });
    kept = kept.filter((_, index) => index !== worst.index);
  }
}

/**
 * Self-break by a rig's own fit, kV, with the band that single shots fall into at 95 %. It replaces the law and not the
 * low side: what must hold off stays with physics M.
 */
export function calibratedSelfBreak(fit: SelfBreakFit, setting: RigSetting): Result<Answer> {
  const offset_mm = fit.offset_mm?.value ?? 0;
  const law = rigLaw(fit.rig)({ ...setting, gap_mm: setting.gap_mm + offset_mm });
  if (!law.ok) return law;
  const value = fit.scale.value * law.value;
  const half = studentQuantile(TAILS, fit.freedom) * fit.scatter * Math.sqrt(1 + 1 / fit.used);
  const beyond = isBeyond(setting.gap_mm, fit.read.gap_mm);
  const extrapolated = beyond || isBeyond(setting.pressure_bar_abs, fit.read.pressure_bar_abs);
  return ok(
    answer({
      value,
      unit: 'kV',
      relative: { below: -Math.expm1(-half), above: Math.expm1(half) },
      model:
        fit.offset_mm === null
          ? 'Law times the rig\u2019s scale'
          : 'Law at the rig\u2019s effective gap, times its scale',
      valid: 'settings among those that were read; the low side for hold-off stays with the law',
      warnings: extrapolated ? [...fit.warnings, EXTRAPOLATED] : fit.warnings,
    }),
  );
}

const EXTRAPOLATED: Warning = {
  type: 'extrapolated',
  words: 'Beyond the gaps and pressures that were read: the band does not cover that.',
};

/** A little beyond is still among them: a gap is not set to the last digit. */
function isBeyond(value: number, [low, high]: readonly [number, number]): boolean {
  return value < (1 - READ_MARGIN) * low || value > (1 + READ_MARGIN) * high;
}

function rangeOf(values: readonly number[]): readonly [number, number] {
  return [Math.min(...values), Math.max(...values)];
}

interface Fitted {
  readonly type: SelfBreakFit['type'];
  readonly scale: Interval;
  readonly offset_mm: Interval | null;
  readonly scatter: number;
  readonly freedom: number;
  readonly residuals: readonly number[];
}

type Law = ReturnType<typeof rigLaw>;

function fitKept(law: Law, kept: readonly SelfBreakReading[]): Result<Fitted> {
  const alone = fitScale(law, kept);
  if (!alone.ok || kept.length < FEWEST_FOR_BOTH) return alone;
  const both = fitBoth(law, kept);
  return both === undefined ? alone : ok(both);
}

function fitScale(law: Law, kept: readonly SelfBreakReading[]): Result<Fitted> {
  const logs = logRatios(law, kept, 0);
  if (!logs.ok) return logs;
  const mean = meanOf(logs.value);
  const residuals = logs.value.map((one) => one - mean);
  const freedom = kept.length - 1;
  const scatter = rootOf(residuals, freedom);
  const half = (studentQuantile(TAILS, freedom) * scatter) / Math.sqrt(kept.length);
  return ok({
    type: 'scale-alone',
    scale: scaleInterval(mean, half),
    offset_mm: null,
    scatter,
    freedom,
    residuals,
  });
}

/** Gauss and Newton: at each offset the rest is a straight line in the law's slope with gap. Undefined if not told apart. */
function fitBoth(law: Law, kept: readonly SelfBreakReading[]): Fitted | undefined {
  const smallest = Math.min(...kept.map(({ gap_mm }) => gap_mm));
  let offset = 0;
  for (let round = 0; round < 30; round += 1) {
    const here = logRatios(law, kept, offset);
    const beside = logRatios(law, kept, offset + SLOPE_STEP * smallest);
    if (!here.ok || !beside.ok) return undefined;
    const points = here.value.map((log, index) => {
      // The law's own slope: the measured voltage drops out of the difference.
      const slope = (log - (beside.value[index] ?? log)) / (SLOPE_STEP * smallest);
      return [slope, log] as const;
    });
    const line = fitLine(points);
    if (line === undefined) return undefined;
    const freedom = kept.length - 2;
    const t = studentQuantile(TAILS, freedom);
    if (t * line.slopeError > TOLD_APART * smallest) return undefined;
    if (Math.abs(line.slope) < 1e-9 * smallest) {
      return {
        type: 'gap-and-scale',
        scale: scaleInterval(line.intercept, t * line.interceptError),
        offset_mm: { value: offset, low: offset - t * line.slopeError, high: offset + t * line.slopeError },
        scatter: line.scatter,
        freedom,
        residuals: line.residuals,
      };
    }
    // Half the smallest gap a round is as far as the straight line may be trusted.
    offset += Math.sign(line.slope) * Math.min(Math.abs(line.slope), 0.5 * (smallest + offset));
  }
  return undefined;
}

function logRatios(
  law: Law,
  kept: readonly SelfBreakReading[],
  offset_mm: number,
): Result<readonly number[]> {
  const logs: number[] = [];
  for (const reading of kept) {
    const expected = law({ ...reading, gap_mm: reading.gap_mm + offset_mm });
    if (!expected.ok) {
      return refused({ ...expected.refusal, words: `${reading.name}: ${expected.refusal.words}` });
    }
    logs.push(Math.log(reading.voltage_kV / expected.value));
  }
  return ok(logs);
}

function worstOf(residuals: readonly number[]): { readonly index: number; readonly sigmas: number } {
  const middle = medianOf(residuals);
  const sigma = Math.max(LEAST_SIGMA, 1.4826 * medianOf(residuals.map((one) => Math.abs(one - middle))));
  let index = 0;
  residuals.forEach((one, at) => {
    if (Math.abs(one - middle) > Math.abs((residuals[index] ?? 0) - middle)) index = at;
  });
  return { index, sigmas: Math.abs((residuals[index] ?? 0) - middle) / sigma };
}

interface Finished {
  readonly rig: RigGap;
  readonly kept: readonly SelfBreakReading[];
  readonly fitted: Fitted;
  readonly outliers: readonly Outlier[];
}

function finish({ rig, kept, fitted, outliers }: Finished): SelfBreakFit {
  const { residuals, ...numbers } = fitted;
  const drift = testDrift(kept.map(({ shot }, index) => ({ shot, residual: residuals[index] ?? 0 })));
  const warnings: Warning[] = [];
  if (fitted.type === 'scale-alone') {
    warnings.push({
      type: 'scale-alone',
      words: 'These readings cannot tell a wrong gap from a wrong scale: read at two gaps or more.',
    });
  }
  if (drift.type === 'rising' || drift.type === 'falling')
    warnings.push({ type: 'drift', words: drift.words });
  for (const { words } of outliers) warnings.push({ type: 'outlier', words });
  const read = {
    gap_mm: rangeOf(kept.map(({ gap_mm }) => gap_mm)),
    pressure_bar_abs: rangeOf(kept.map(({ pressure_bar_abs }) => pressure_bar_abs)),
  };
  return { ...numbers, rig, used: kept.length, read, outliers, drift, warnings };
}

function readingsRefusal(readings: readonly SelfBreakReading[]): Refusal | undefined {
  if (readings.length < FEWEST || readings.length > MOST) {
    const limit = readings.length < FEWEST ? `at least ${String(FEWEST)}` : `at most ${String(MOST)}`;
    return {
      type: 'number-of-readings',
      field: 'readings',
      words: `Readings: give ${limit} measured self-breaks.`,
    };
  }
  for (const { name, voltage_kV, shot } of readings) {
    const voltage = checkNumber(voltage_kV, {
      field: 'voltage_kV',
      name: `${name}, voltage`,
      unit: 'kV',
      min: 0,
      minExcluded: true,
      max: 1000,
    });
    if (!voltage.ok) return voltage.refusal;
    const number = checkNumber(shot, { field: 'shot', name: `${name}, shot`, unit: '', min: 0, max: 1e12 });
    if (!number.ok) return number.refusal;
  }
  return undefined;
}

function scaleInterval(log: number, half: number): Interval {
  return { value: Math.exp(log), low: Math.exp(log - half), high: Math.exp(log + half) };
}

function meanOf(list: readonly number[]): number {
  return list.reduce((sum, one) => sum + one, 0) / list.length;
}

function rootOf(residuals: readonly number[], freedom: number): number {
  return Math.sqrt(residuals.reduce((sum, one) => sum + one * one, 0) / freedom);
}

function medianOf(list: readonly number[]): number {
  const sorted = list.toSorted((a, b) => a - b);
  const middle = Math.floor(sorted.length / 2);
  const upper = sorted[middle] ?? 0;
  return sorted.length % 2 === 1 ? upper : 0.5 * (upper + (sorted[middle - 1] ?? upper));
}
