import type { Feed } from '../line/lumped-verdict';

/** Resistance of the spark gap after it closes at t = 0. */
export type GapLaw =
  | {
      readonly law: 'exponential';
      /** What is left of it in the end. */
      readonly end_ohm: number;
      /** What it starts with above `end_ohm`. */
      readonly start_ohm: number;
      readonly fall_s: number;
    }
  | {
      readonly law: 'rompe-weizel';
      readonly end_ohm: number;
      /** What it starts with above `end_ohm`: the law has no start of its own. */
      readonly start_ohm: number;
      readonly gap_cm: number;
      readonly pressure_atm_abs: number;
      readonly constant_cm2_atm_V2s: number;
    };

/** The laser channel: open until its voltage first reaches `break_V`, then a falling resistance for good. */
export interface ChannelLaw {
  readonly inductance_H: number;
  /** Null for a channel that never breaks down. */
  readonly break_V: number | null;
  readonly end_ohm: number;
  readonly start_ohm: number;
  readonly fall_s: number;
}

interface Common {
  readonly charge_V: number;
  /** The gap with its straps: the whole loop but the sheet itself. */
  readonly gap_H: number;
  readonly gap: GapLaw;
  readonly channel: ChannelLaw;
  /** How long the transient is followed. */
  readonly window_s: number;
  /** The sheet that the switched capacitor is made of, where it is one; null for lumped parts. */
  readonly feed?: Feed | null;
}

/** Charge transfer: the dump capacitor is switched onto the peaking capacitor, which stands across the channel. */
export interface TransferCircuit extends Common {
  readonly topology: 'charge-transfer';
  readonly dump_F: number;
  readonly peaking_F: number;
  /** Across the peaking capacitor; null where there is none. */
  readonly bleed_ohm: number | null;
}

/** LC inversion: the first of two capacitors charged alike is switched; the channel lies between their free ends. */
export interface InversionCircuit extends Common {
  readonly topology: 'lc-inversion';
  readonly first_F: number;
  readonly second_F: number;
  /** Charging inductor across the channel and its resistance. */
  readonly charging_H: number;
  readonly charging_ohm: number;
}

export type Circuit = TransferCircuit | InversionCircuit;
