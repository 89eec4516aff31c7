import { studentQuantile } from '../numerics/student-t';
import { answer, withBand, type Answer, type Basis, type Warning } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { ok, refused, type Refusal, type Result } from '../units/result';
import { testDrift, type Drift } from './drift';
import { FEWEST, fitKept, TAILS, type Fitted, type Interval, type SelfBreakReading } from './fit-kept';
import { rigLaw, type RigGap, type RigSetting } from './rig-law';
import { worstOf } from './worst-residual';

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
export interface SelfBreakFit extends Basis {
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
  /** Relative, of the readings that were kept, in their order. */
  readonly residuals: readonly number[];
  readonly outliers: readonly Outlier[];
  readonly drift: Drift;
  /** The fitted numbers as answers, intervals at 95 % as their bands. */
  readonly figures: { readonly scale: Answer; readonly offset: Answer | null; readonly scatter: Answer };
}

const MODEL = 'Least squares on the logarithm of the voltage';
const VALID = 'gaps and pressures among the readings; the low side for hold-off stays with the law';

const MOST = 5000;
/** Far under the minimum of any gas, and far enough from nought for logarithms. */
const LOWEST_KV = 0.01;
const OUTLIER_SIGMAS = 4;
const MOST_OUTLIERS = 0.25;
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

interface Finished {
  readonly rig: RigGap;
  readonly kept: readonly SelfBreakReading[];
  readonly fitted: Fitted;
  readonly outliers: readonly Outlier[];
}

function finish({ rig, kept, fitted, outliers }: Finished): SelfBreakFit {
  const { residuals } = fitted;
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
  return {
    ...fitted,
    rig,
    used: kept.length,
    read,
    outliers,
    drift,
    figures: figuresOf(fitted),
    model: MODEL,
    valid: VALID,
    warnings,
  };
}

function figuresOf({ scale, offset_mm, scatter, freedom }: Fitted): SelfBreakFit['figures'] {
  const intervalAnswer = (interval: Interval, unit: string): Answer =>
    withBand(answer({ value: interval.value, unit, relative: 0, model: MODEL, valid: VALID }), interval);
  // The spread of a standard deviation itself, to first order.
  const share = Math.min(1, 1 / Math.sqrt(2 * freedom));
  return {
    scale: intervalAnswer(scale, '1'),
    offset: offset_mm === null ? null : intervalAnswer(offset_mm, 'mm'),
    scatter: answer({ value: scatter, unit: '1', relative: share, model: MODEL, valid: VALID }),
  };
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
      min: LOWEST_KV,
      minReason: 'no gap breaks under it',
      max: 1000,
    });
    if (!voltage.ok) return voltage.refusal;
    const number = checkNumber(shot, { field: 'shot', name: `${name}, shot`, unit: '', min: 0, max: 1e12 });
    if (!number.ok) return number.refusal;
  }
  return undefined;
}
