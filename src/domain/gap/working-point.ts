import { answer, type Answer, type Warning } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { firstRefusal, ok, refused, type Result } from '../units/result';
import { earlyBreakProbability } from './early-break';

/** One sigma of self-break over its mean, from shot to shot. Physics A(e), from memory. */
export const SELF_BREAK_SCATTER = {
  'open-clean': { low: 0.005, high: 0.03 },
  'pressurised-or-worn': { low: 0.02, high: 0.06 },
} as const;
export type GapCondition = keyof typeof SELF_BREAK_SCATTER;

export interface WorkingPoint {
  /** Held voltage over the self-break that it is counted from. */
  readonly share: Answer;
  /** Sigmas between the two, counted with the widest scatter; the band's high end with the narrowest. */
  readonly margin: Answer;
  /** Chance of an early break per shot at that margin. */
  readonly earlyBreak: Answer;
  readonly warnings: readonly Warning[];
}

/** A triggered gap works at 60 to 80 % of self-break, and holds with 4 sigma at least. Common practice, no source. */
const WORKING_SHARE = { low: 0.6, high: 0.8 } as const;
const LEAST_MARGIN_SIGMA = 4;

/**
 * Where a gap that has to hold stands under its self-break. Count it from the low side of `selfBreak`, never from the law.
 * Normal scatter; refused for voltages that are none and for an unknown condition.
 */
export function workingPoint(held: {
  readonly voltage_kV: number;
  readonly lowSide_kV: number;
  readonly condition: GapCondition;
}): Result<WorkingPoint> {
  const bad = firstRefusal([
    checkNumber(held.voltage_kV, {
      field: 'voltage_kV',
      name: 'Held voltage',
      unit: 'kV',
      min: 0,
      max: 1000,
    }),
    checkNumber(held.lowSide_kV, {
      field: 'lowSide_kV',
      name: 'Low side of the self-break',
      unit: 'kV',
      min: 0.1,
      max: 1000,
    }),
  ]);
  if (bad !== undefined) return refused(bad);
  if (!Object.hasOwn(SELF_BREAK_SCATTER, held.condition)) {
    return refused({
      type: 'unknown-choice',
      field: 'condition',
      words: 'Condition of the gap: choose open and clean, or pressurised or worn.',
    });
  }
  const scatter = SELF_BREAK_SCATTER[held.condition];
  const share = held.voltage_kV / held.lowSide_kV;
  const sigmas = (sigma: number) => (1 - share) / sigma;
  const margin = sigmas(scatter.high);
  const [worst, best] = [earlyAt(margin), earlyAt(sigmas(scatter.low))];
  if (!worst.ok) return worst;
  if (!best.ok) return best;
  const warnings = warningsOf(share, margin);
  const valid = 'conditioned gap, normal scatter; worn electrodes have a longer tail';
  const common = { valid, warnings, model: 'Scatter of self-break by condition', unit: '1' };
  return ok({
    share: answer({ ...common, value: share, relative: 0, model: 'Held voltage over the low side' }),
    margin: { ...common, value: margin, unit: '\u03c3', band: ordered(margin, sigmas(scatter.low)) },
    earlyBreak: {
      ...worst.value,
      band: ordered(worst.value.value, best.value.value),
      warnings: [...worst.value.warnings, ...warnings],
    },
    warnings,
  });
}

/**
 * How far a slow ramp overshoots self-break while it waits for its first electron, kV: slope times statistical lag.
 * Physics A(e); the lag is as uncertain as the light on the electrodes, so the band is a factor of three.
 */
export function lagOvershoot(slope_kV_s: number, lag_s: number): Result<Answer> {
  const bad = firstRefusal([
    checkNumber(slope_kV_s, { field: 'slope_kV_s', name: 'Slope', unit: 'kV/s', min: 0, max: 1e12 }),
    checkNumber(lag_s, { field: 'lag_s', name: 'Statistical lag', unit: 's', min: 0, max: 100 }),
  ]);
  if (bad !== undefined) return refused(bad);
  return ok(
    answer({
      value: slope_kV_s * lag_s,
      unit: 'kV',
      model: 'Slope times statistical lag',
      valid: 'ramps slow against the formative time; ultraviolet light on the electrodes shortens the lag',
      relative: { below: 2 / 3, above: 2 },
    }),
  );
}

/** Beyond this the normal law is 0 or 1 to the last digit. */
function earlyAt(sigmas: number): Result<Answer> {
  return earlyBreakProbability(Math.max(-10, Math.min(37, sigmas)));
}

function ordered(one: number, other: number): { readonly low: number; readonly high: number } {
  return { low: Math.min(one, other), high: Math.max(one, other) };
}

function warningsOf(share: number, margin: number): readonly Warning[] {
  if (share >= 1) {
    return [{ type: 'above-self-break', words: 'The gap does not hold this: it may break at any time.' }];
  }
  if (margin < LEAST_MARGIN_SIGMA) {
    return [
      {
        type: 'little-margin',
        words: 'Less than 4\u2009\u03c3 below self-break: early breaks are to be expected.',
      },
    ];
  }
  if (share < WORKING_SHARE.low) {
    return [
      {
        type: 'hard-to-trigger',
        words: 'Below 60\u2009% of self-break a trigger may not fire the gap: it then stands charged.',
      },
    ];
  }
  if (share > WORKING_SHARE.high) {
    return [{ type: 'above-practice', words: 'Above the 60 to 80\u2009% at which triggered gaps are held.' }];
  }
  return [];
}
