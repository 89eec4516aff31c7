import { fitLine } from '../numerics/line-fit';
import { studentQuantile } from '../numerics/student-t';
import { ok, refused, type Result } from '../units/result';
import type { rigLaw, RigSetting } from './rig-law';

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

/** Fewest readings that a fit takes. */
export const FEWEST = 3;
const FEWEST_FOR_BOTH = 5;
/** Chance in both tails together: intervals are at 95 %. */
export const TAILS = 0.05;
/** An offset counts as told apart when its interval is within this share of the smallest gap. */
const TOLD_APART = 0.1;
const SLOPE_STEP = 1e-4;

/** Numbers of a fit to the readings that were kept; residuals are relative, in their order. */
export interface Fitted {
  readonly type: 'gap-and-scale' | 'scale-alone';
  readonly scale: Interval;
  readonly offset_mm: Interval | null;
  readonly scatter: number;
  readonly freedom: number;
  readonly residuals: readonly number[];
}

type Law = ReturnType<typeof rigLaw>;

/** Gap and scale where the readings tell them apart, scale alone otherwise. */
export function fitKept(law: Law, kept: readonly SelfBreakReading[]): Result<Fitted> {
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

function scaleInterval(log: number, half: number): Interval {
  return { value: Math.exp(log), low: Math.exp(log - half), high: Math.exp(log + half) };
}

function meanOf(list: readonly number[]): number {
  return list.reduce((sum, one) => sum + one, 0) / list.length;
}

function rootOf(residuals: readonly number[], freedom: number): number {
  return Math.sqrt(residuals.reduce((sum, one) => sum + one * one, 0) / freedom);
}
