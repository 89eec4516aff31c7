import { answer, type Answer } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { andThen, ok, type Result } from '../units/result';
import { highestRate, type Charging } from './supply-reach';

const UNBLOWN_HZ = 10;
const DOUBTFUL_TO_HZ = 50;

/** What a rig's rate is held by. */
export type RateLimit = 'charging' | 'supply-current' | 'gap-recovery';

/** A gap that fires by itself, as its charging sees it. */
export interface FiringGap {
  readonly capacitance_F: number;
  readonly break_kV: number;
  /** Whether gas is blown through the gap; without it shots above 10 Hz are doubtful. */
  readonly blown: boolean;
}

export interface RatePlan {
  /** Highest rate to plan with, Hz. Round it down. */
  readonly rate: Answer;
  readonly limitedBy: RateLimit;
  readonly words: string;
}

/** Time from empty to self-break, s: one over the rate that charging allows. Refused where the gap never fires. */
export function timeToSelfBreak(
  charging: Charging,
  gap: { readonly capacitance_F: number; readonly break_kV: number },
): Result<Answer> {
  return andThen(highestRate(charging, gap), (rate) =>
    ok(
      answer({
        value: 1 / rate.value,
        unit: 's',
        relative: 0.2,
        model: rate.model,
        valid: 'from empty; a gap close to what the supply reaches takes longer and scatters',
      }),
    ),
  );
}

/**
 * The rate to plan with and what holds it: charging, the current of the supply, or the recovery of an unblown gap (10 Hz,
 * doubtful up to 50; common practice, from memory).
 */
export function planRate(charging: Charging, gap: FiringGap): Result<RatePlan> {
  return andThen(
    checkNumber(gap.break_kV, {
      field: 'break_kV',
      name: 'Self-break voltage',
      unit: 'kV',
      min: 0,
      minExcluded: true,
      max: 1000,
    }),
    () =>
      andThen(highestRate(charging, gap), (rate) => {
        const byCurrent_Hz = (charging.supply_mA * 1e-3) / (gap.capacitance_F * gap.break_kV * 1000);
        const limitedBy: RateLimit =
          !gap.blown && rate.value > UNBLOWN_HZ
            ? 'gap-recovery'
            : rate.value >= byCurrent_Hz
              ? 'supply-current'
              : 'charging';
        const value = limitedBy === 'gap-recovery' ? UNBLOWN_HZ : rate.value;
        const planned: Answer = { ...rate, value, band: { low: 0.85 * value, high: 1.15 * value } };
        return ok({ rate: planned, limitedBy, words: WORDS[limitedBy] });
      }),
  );
}

const WORDS: Readonly<Record<RateLimit, string>> = {
  charging: 'Ballast and capacitance hold the rate: a smaller ballast loads the supply more.',
  'supply-current': 'The current of the supply holds the rate.',
  'gap-recovery': `The gap holds the rate: unblown it is doubtful from 10 to ${String(DOUBTFUL_TO_HZ)}\u2009Hz. Blow three volumes a shot.`,
};
