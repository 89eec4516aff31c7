import { answer, type Answer, type Basis, type Warning } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { andThen, firstRefusal, ok, refused, type Refusal, type Result } from '../units/result';
import {
  currentRate_Hz,
  highestRate,
  powerRate_Hz,
  relaxedRate,
  type ChargedGap,
  type Charging,
} from './supply-reach';

const UNBLOWN_HZ = 10;
const DOUBTFUL_TO_HZ = 50;
/** Gap volumes a shot that renew a blown gap; common practice, no source. */
const VOLUMES_A_SHOT = 3;

/** What a rig's rate is held by. */
export type RateLimit = 'charging' | 'supply-current' | 'supply-power' | 'gap-recovery' | 'purge-flow';

/** A gap that fires by itself, as its charging sees it. */
export interface FiringGap extends ChargedGap {
  /** Whether gas is blown through the gap; without it shots above 10 Hz are doubtful. */
  readonly blown: boolean;
  /** What is blown through it, where it is known: three gap volumes a shot are needed. */
  readonly purge?: { readonly flow_L_min: number; readonly volume_cm3: number };
}

export interface RatePlan extends Basis {
  /** Highest rate to plan with, Hz. Round it down. */
  readonly rate: Answer;
  readonly limitedBy: RateLimit;
  readonly words: string;
  /** Every limit that was asked, lowest first. */
  readonly limits: readonly { readonly type: RateLimit; readonly rate: Answer }[];
}

/** Time from empty to self-break, s: one over the rate that charging allows. Refused where the gap never fires. */
export function timeToSelfBreak(charging: Charging, gap: ChargedGap): Result<Answer> {
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
 * The rate to plan with and what holds it: charging, current or power of the supply, the recovery of an unblown gap
 * (10 Hz, doubtful up to 50; common practice, from memory), or the gas that is blown through it.
 */
export function planRate(charging: Charging, gap: FiringGap): Result<RatePlan> {
  const broken = checkNumber(gap.break_kV, {
    field: 'break_kV',
    name: 'Self-break voltage',
    unit: 'kV',
    min: 0,
    minExcluded: true,
    max: 1000,
  });
  if (!broken.ok) return broken;
  const bad = purgeRefusal(gap);
  if (bad !== undefined) return refused(bad);
  return andThen(relaxedRate(charging, gap), (relaxed) => {
    const limits = limitsOf(charging, gap, relaxed);
    const held = limits.reduce((least, one) => (one.rate.value < least.rate.value ? one : least));
    return ok({
      rate: held.rate,
      limitedBy: held.type,
      words: WORDS[held.type],
      limits: limits.toSorted((a, b) => a.rate.value - b.rate.value),
      model: 'Lowest of what charging, supply and gap allow',
      valid: 'a gap that fires by itself on a steady supply; a trigger has its own limits',
      warnings: gap.blown && gap.purge === undefined && held.rate.value > UNBLOWN_HZ ? [FLOW_UNKNOWN] : [],
    });
  });
}

interface Limit {
  readonly type: RateLimit;
  readonly rate: Answer;
}

function limitsOf(charging: Charging, gap: FiringGap, relaxed: Answer): readonly [Limit, ...Limit[]] {
  const { blown, purge } = gap;
  const others: readonly (Limit | undefined)[] = [
    { type: 'supply-current', rate: supplyRate(currentRate_Hz(charging, gap), 'Current of the supply') },
    charging.supply_W === undefined
      ? undefined
      : { type: 'supply-power', rate: supplyRate(powerRate_Hz(charging, gap), 'Power of the supply') },
    blown ? undefined : { type: 'gap-recovery', rate: RECOVERY },
    blown && purge !== undefined ? { type: 'purge-flow', rate: purgeRate(purge) } : undefined,
  ];
  return [{ type: 'charging', rate: relaxed }, ...others.filter((one) => one !== undefined)];
}

function supplyRate(value: number, model: string): Answer {
  return answer({
    value,
    unit: 'Hz',
    relative: 0.15,
    model,
    valid: 'a supply that gives what its plate says',
  });
}

const RECOVERY = answer({
  value: UNBLOWN_HZ,
  unit: 'Hz',
  relative: { below: 0.5, above: DOUBTFUL_TO_HZ / UNBLOWN_HZ - 1 },
  model: 'Recovery of an unblown gap of millimetres',
  valid: 'common practice, from memory; doubtful up to 50\u2009Hz',
});

function purgeRate({ flow_L_min, volume_cm3 }: NonNullable<FiringGap['purge']>): Answer {
  return answer({
    value: (flow_L_min * 1000) / 60 / (VOLUMES_A_SHOT * volume_cm3),
    unit: 'Hz',
    relative: 0.3,
    model: 'Three gap volumes of gas a shot',
    valid: 'common practice, no source; gas that sweeps the gap and not its corners',
  });
}

function purgeRefusal({ purge }: FiringGap): Refusal | undefined {
  if (purge === undefined) return undefined;
  return firstRefusal([
    checkNumber(purge.flow_L_min, {
      field: 'flow_L_min',
      name: 'Purge flow',
      unit: 'L/min',
      min: 1e-6,
      max: 1e5,
    }),
    checkNumber(purge.volume_cm3, {
      field: 'volume_cm3',
      name: 'Gap volume',
      unit: 'cm\u00b3',
      min: 1e-6,
      max: 1e5,
    }),
  ]);
}

const FLOW_UNKNOWN: Warning = {
  type: 'flow-unknown',
  words: 'Above 10\u2009Hz the gap needs three of its volumes of gas a shot: enter the flow.',
};

const WORDS: Readonly<Record<RateLimit, string>> = {
  charging: 'Ballast and capacitance hold the rate: a smaller ballast loads the supply more.',
  'supply-current': 'The current of the supply holds the rate.',
  'supply-power': 'The power of the supply holds the rate.',
  'gap-recovery': `The gap holds the rate: unblown it is doubtful from 10 to ${String(DOUBTFUL_TO_HZ)}\u2009Hz. Blow three volumes a shot.`,
  'purge-flow': 'The gas blown through the gap holds the rate: three volumes a shot.',
};
