import type { Circuit, GapLaw } from '../../src/domain/circuit/circuit-input';

/** Numbers from 0 to 1 that a seed fixes: mulberry32, public domain. */
export function seededRandom(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 2 ** 32;
  };
}

/** A circuit as small benches have them; every second one is an inversion, every other pair follows Rompe and Weizel. */
export function randomCircuit(random: () => number, index: number): Circuit {
  const between = (low: number, high: number) => low + (high - low) * random();
  // Parts that span a decade are as likely in every part of it.
  const spread = (low: number, high: number) => low * (high / low) ** random();
  const charge_V = between(9000, 24_000);
  const gap_H = spread(5e-9, 50e-9);
  // Rompe and Weizel's gap reaches lower voltages; most channels are to fire under either law.
  const channel = (highest: number) => ({
    inductance_H: spread(1e-9, 5e-9),
    break_V: random() < 0.25 ? null : charge_V * between(0.3, highest),
    end_ohm: spread(0.1, 0.6),
    start_ohm: spread(300, 1500),
    fall_s: spread(0.4e-9, 2e-9),
  });
  const gap = index % 4 < 2 ? exponentialGap({ between, spread }) : rompeWeizelGap({ between, spread });
  if (index % 2 === 0) {
    const peaking_F = spread(0.4e-9, 1.5e-9);
    const dump_F = peaking_F * between(1.2, 4);
    const series_F = (dump_F * peaking_F) / (dump_F + peaking_F);
    return {
      topology: 'charge-transfer',
      charge_V,
      dump_F,
      peaking_F,
      bleed_ohm: spread(5e3, 1e6),
      gap_H,
      gap,
      channel: channel(index % 4 < 2 ? 1.5 : 1),
      window_s: between(5, 7) * Math.PI * Math.sqrt(gap_H * series_F),
    };
  }
  const first_F = spread(0.4e-9, 3e-9);
  return {
    topology: 'lc-inversion',
    charge_V,
    first_F,
    second_F: first_F * between(0.5, 1.2),
    charging_H: spread(1e-6, 20e-6),
    charging_ohm: spread(0.5, 300),
    gap_H,
    gap,
    channel: channel(index % 4 < 2 ? 1.8 : 1.2),
    window_s: between(4, 6) * Math.PI * Math.sqrt(gap_H * first_F),
  };
}

interface Draw {
  readonly between: (low: number, high: number) => number;
  readonly spread: (low: number, high: number) => number;
}

function exponentialGap({ spread }: Draw): GapLaw {
  return {
    law: 'exponential',
    end_ohm: spread(0.05, 0.5),
    start_ohm: spread(200, 1500),
    fall_s: spread(0.5e-9, 3e-9),
  };
}

function rompeWeizelGap({ between, spread }: Draw): GapLaw {
  return {
    law: 'rompe-weizel',
    end_ohm: spread(0.05, 0.5),
    start_ohm: spread(200, 1500),
    gap_cm: between(0.1, 0.6),
    pressure_atm_abs: between(1, 4),
    constant_cm2_atm_V2s: between(0.8, 1.2),
  };
}
