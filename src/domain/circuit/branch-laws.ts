import type { ChannelLaw, GapLaw } from './circuit-input';

/** Resistance of the gap from time or from the action (the integral of its squared current). */
export type GapResistance =
  | { readonly by: 'time'; readonly at: (time_s: number) => number }
  | {
      readonly by: 'action';
      readonly at: (action_A2s: number) => number;
      /** Change of resistance with action, from a resistance that `at` gave. */
      readonly slope: (action_A2s: number, resistance_ohm: number) => number;
    };

/**
 * The two laws of physics D. Rompe and Weizel's has no start of its own: an action to begin with stands in for what the
 * gap did before, chosen so that the resistance starts at `start_ohm` above its end.
 */
export function gapResistance(law: GapLaw): GapResistance {
  const { end_ohm, start_ohm } = law;
  if (law.law === 'exponential') {
    const perSecond = -1 / law.fall_s;
    return { by: 'time', at: (time_s) => end_ohm + start_ohm * Math.exp(time_s * perSecond) };
  }
  const { gap_cm, pressure_atm_abs, constant_cm2_atm_V2s } = law;
  // d / sqrt(2 (a/p) S), and the action that gives `start_ohm`.
  const scale = gap_cm / Math.sqrt((2 * constant_cm2_atm_V2s) / pressure_atm_abs);
  const seed_A2s = (scale / start_ohm) ** 2;
  return {
    by: 'action',
    at: (action_A2s) => end_ohm + scale / Math.sqrt(action_A2s + seed_A2s),
    slope: (action_A2s, resistance_ohm) => (-0.5 * (resistance_ohm - end_ohm)) / (action_A2s + seed_A2s),
  };
}

/** Resistance of a channel that broke down at `fired_s`. */
export function channelResistance({ end_ohm, start_ohm, fall_s }: ChannelLaw, fired_s: number) {
  const perSecond = -1 / fall_s;
  return (time_s: number): number => end_ohm + start_ohm * Math.exp((time_s - fired_s) * perSecond);
}
