import type { Feed } from '../line/lumped-verdict';
import { barToAtm } from '../units/pressure';
import type { Circuit, GapLaw } from './circuit-input';

/** The closed gap's resistance by the figures that a bench gives. */
export type BenchGapLaw =
  | {
      readonly law: 'exponential';
      readonly end_ohm: number;
      readonly start_ohm: number;
      readonly fall_ns: number;
    }
  | {
      readonly law: 'rompe-weizel';
      readonly end_ohm: number;
      readonly start_ohm: number;
      readonly gap_mm: number;
      readonly pressure_bar_abs: number;
      readonly constant_cm2_atm_V2s: number;
    };

/** A circuit in the units of the bench. Rigs and lookups both become circuits by these, so they give the same digits. */
export interface CircuitParts {
  readonly topology: Circuit['topology'];
  readonly charge_kV: number;
  /** Dump capacitor, or C1. */
  readonly first_nF: number;
  /** Peaking capacitor, or C2. */
  readonly second_nF: number;
  readonly gap_nH: number;
  readonly gap: BenchGapLaw;
  readonly channel_nH: number;
  readonly channel: {
    /** Null for a channel that never breaks down. */
    readonly break_kV: number | null;
    readonly end_ohm: number;
    readonly start_ohm: number;
    readonly fall_ns: number;
  };
  /** Across the channel of a charge transfer; null where nothing is. */
  readonly across_kohm: number | null;
  /** Across the channel of an LC inversion. */
  readonly charging_uH: number;
  readonly charging_ohm: number;
  readonly window_ns: number;
  readonly feed: Feed | null;
}

/** The parts as the solver takes them; what is out of range is refused there. */
export function circuitFrom(parts: CircuitParts): Circuit {
  const common = {
    charge_V: parts.charge_kV * 1000,
    gap_H: parts.gap_nH * 1e-9,
    gap: gapLawOf(parts.gap),
    channel: {
      inductance_H: parts.channel_nH * 1e-9,
      break_V: parts.channel.break_kV === null ? null : parts.channel.break_kV * 1000,
      end_ohm: parts.channel.end_ohm,
      start_ohm: parts.channel.start_ohm,
      fall_s: parts.channel.fall_ns * 1e-9,
    },
    window_s: parts.window_ns * 1e-9,
    feed: parts.feed,
  };
  const first_F = parts.first_nF * 1e-9;
  const second_F = parts.second_nF * 1e-9;
  return parts.topology === 'charge-transfer'
    ? {
        ...common,
        topology: 'charge-transfer',
        dump_F: first_F,
        peaking_F: second_F,
        bleed_ohm: parts.across_kohm === null ? null : parts.across_kohm * 1000,
      }
    : {
        ...common,
        topology: 'lc-inversion',
        first_F,
        second_F,
        charging_H: parts.charging_uH * 1e-6,
        charging_ohm: parts.charging_ohm,
      };
}

function gapLawOf(gap: BenchGapLaw): GapLaw {
  const { end_ohm, start_ohm } = gap;
  return gap.law === 'exponential'
    ? { law: 'exponential', end_ohm, start_ohm, fall_s: gap.fall_ns * 1e-9 }
    : {
        law: 'rompe-weizel',
        end_ohm,
        start_ohm,
        gap_cm: gap.gap_mm / 10,
        pressure_atm_abs: barToAtm(gap.pressure_bar_abs),
        constant_cm2_atm_V2s: gap.constant_cm2_atm_V2s,
      };
}

const HALF_PERIODS = 4;
const SHORTEST_NS = 40;
const LONGEST_NS = 20_000;

/** A window that shows the swing and what comes after it, ns: four half periods of the loop, two counting digits. */
export function windowFor(
  parts: Pick<CircuitParts, 'topology' | 'first_nF' | 'second_nF' | 'gap_nH' | 'feed'>,
): number {
  const { topology, first_nF, second_nF, gap_nH, feed } = parts;
  const series_nF = topology === 'lc-inversion' ? first_nF : (first_nF * second_nF) / (first_nF + second_nF);
  const loop_nH = gap_nH + ((feed?.sheet_H ?? 0) * 1e9) / 3;
  const half_ns = Math.PI * Math.sqrt(loop_nH * series_nF);
  const wanted = Number((HALF_PERIODS * half_ns).toPrecision(2));
  return Number.isFinite(wanted) ? Math.min(LONGEST_NS, Math.max(SHORTEST_NS, wanted)) : SHORTEST_NS;
}
