import { describe, expect, it } from 'vitest';
import type { Circuit } from '../../src/domain/circuit/circuit-input';
import { solveTransient, type Transient } from '../../src/domain/circuit/transient';
import { circuitOf } from './fn-circuit';
import { Inputs } from './inputs';

interface Row {
  readonly parts: Readonly<Record<string, string | number | null>>;
  readonly peak_kV: number;
  readonly peak_ns: number;
  readonly rise_ns: number;
  readonly gap_A: number;
  readonly channel_A: number | null;
  /** Share of the energy in gap, channel, what is left, and feed, %. */
  readonly shares: readonly [gap: number, channel: number, left: number, feed: number];
}

const exponential = { gap: 'exp', Rg_end: 0.2, Rg0: 500, tau_g: 1e-9 };
const rompeWeizel = { gap: 'rw', Rg_end: 0.1, Rg0: 1000, a_rw: 1 };
const channel = { Rch_end: 0.5, Rch0: 1000, tau_c: 1e-9 };

/**
 * Six circuits by the names of physics D. Figures of ngspice-39 and of a Radau solver in another language, which agree
 * within 2e-4; computed for this project, no publication.
 */
const SOLVED_TWICE: Readonly<Record<string, Row>> = {
  'transfer, channel dark': {
    parts: {
      top: 'transfer',
      V0: 15e3,
      CD: 2e-9,
      CP: 6e-10,
      Lg: 2e-8,
      Lch: 3e-9,
      ...exponential,
      Rbleed: 1e4,
      Vbr: null,
      Rch_end: 0.3,
      Rch0: 500,
      tau_c: 8e-10,
      t_end: 6e-8,
    },
    peak_kV: 20.314,
    peak_ns: 13.1,
    rise_ns: 6.608,
    gap_A: 1787.4,
    channel_A: null,
    shares: [15, 0, 85, 0.4],
  },
  'transfer, fires': {
    parts: {
      top: 'transfer',
      V0: 18e3,
      CD: 3e-9,
      CP: 1e-9,
      Lg: 1.5e-8,
      Lch: 2e-9,
      gap: 'exp',
      Rg_end: 0.25,
      Rg0: 800,
      tau_g: 1.5e-9,
      Rbleed: 2e4,
      Vbr: 2e4,
      Rch_end: 0.4,
      Rch0: 800,
      tau_c: 1e-9,
      t_end: 8e-8,
    },
    peak_kV: 21.751,
    peak_ns: 17.15,
    rise_ns: 7.973,
    gap_A: 4558.1,
    channel_A: 6477.5,
    shares: [33, 61, 6, 0],
  },
  'transfer, Rompe and Weizel, fires': {
    parts: {
      top: 'transfer',
      V0: 2e4,
      CD: 2.7e-9,
      CP: 9e-10,
      Lg: 2.5e-8,
      Lch: 4e-9,
      ...rompeWeizel,
      d_cm: 0.3,
      p_atm: 2.5,
      Rbleed: 5e3,
      Vbr: 19e3,
      ...channel,
      tau_c: 1.2e-9,
      t_end: 1e-7,
    },
    peak_kV: 20.711,
    peak_ns: 17.27,
    rise_ns: 9.332,
    gap_A: 2773.9,
    channel_A: 4643.1,
    shares: [56, 43, 1, 0.2],
  },
  'inversion, channel dark': {
    parts: {
      top: 'lcinv',
      V0: 12e3,
      C1: 1e-9,
      C2: 1e-9,
      Lg: 2e-8,
      Lch: 3e-9,
      ...exponential,
      Lc: 5e-6,
      Rc: 1,
      Vbr: null,
      Rch_end: 0.3,
      Rch0: 500,
      tau_c: 8e-10,
      t_end: 6e-8,
    },
    peak_kV: 21.761,
    peak_ns: 17.64,
    rise_ns: 8.975,
    gap_A: 2319.9,
    channel_A: null,
    shares: [27, 0, 73, 0.2],
  },
  'inversion, fires': {
    parts: {
      top: 'lcinv',
      V0: 15e3,
      C1: 1.5e-9,
      C2: 1e-9,
      Lg: 1.2e-8,
      Lch: 2e-9,
      gap: 'exp',
      Rg_end: 0.2,
      Rg0: 800,
      tau_g: 1.2e-9,
      Lc: 3e-6,
      Rc: 0.5,
      Vbr: 22e3,
      Rch_end: 0.4,
      Rch0: 800,
      tau_c: 1e-9,
      t_end: 8e-8,
    },
    peak_kV: 24.967,
    peak_ns: 17.94,
    rise_ns: 8.522,
    gap_A: 4235.6,
    channel_A: 4700.7,
    shares: [29, 66, 5, 0.1],
  },
  'inversion, Rompe and Weizel, a fast charging inductor': {
    parts: {
      top: 'lcinv',
      V0: 14e3,
      C1: 2e-9,
      C2: 1.2e-9,
      Lg: 1.8e-8,
      Lch: 3e-9,
      ...rompeWeizel,
      d_cm: 0.25,
      p_atm: 2,
      Lc: 1e-6,
      Rc: 50,
      Vbr: 17e3,
      ...channel,
      t_end: 1e-7,
    },
    peak_kV: 18.284,
    peak_ns: 22.62,
    rise_ns: 12.415,
    gap_A: 2850,
    channel_A: 4271.3,
    shares: [51, 42, 0, 6.7],
  },
};

function solved(circuit: Circuit, samples = 0): Transient {
  const result = solveTransient(circuit, { samples });
  if (!result.ok) throw new Error(result.refusal.words);
  return result.value;
}

describe('circuits solved twice', () => {
  it.each(Object.entries(SOLVED_TWICE))('%s', (_name, row) => {
    const found = solved(circuitOf(new Inputs(row.parts)));
    const off = (got: number, wanted: number) => Math.abs(got / wanted - 1);
    expect(off(found.peakVoltage_V, 1000 * row.peak_kV)).toBeLessThan(1e-4);
    expect(off(found.peakVoltage_s, 1e-9 * row.peak_ns)).toBeLessThan(1e-3);
    expect(off(found.rise_s, 1e-9 * row.rise_ns)).toBeLessThan(2e-4);
    expect(off(found.peakGap_A, row.gap_A)).toBeLessThan(1e-4);
    if (row.channel_A === null) expect(found.peakChannel_A).toBeNull();
    else expect(off(found.peakChannel_A ?? NaN, row.channel_A)).toBeLessThan(1e-4);
    const { start_J, gap_J, channel_J, left_J, feed_J } = found.energy;
    const [gap, ch, left, feed] = row.shares;
    expect(Math.abs((100 * gap_J) / start_J - gap)).toBeLessThan(0.6);
    expect(Math.abs((100 * channel_J) / start_J - ch)).toBeLessThan(0.6);
    expect(Math.abs((100 * left_J) / start_J - left)).toBeLessThan(0.6);
    expect(Math.abs((100 * feed_J) / start_J - feed)).toBeLessThan(0.1);
  });
});

describe('the single-stage impulse generator', () => {
  // A charge transfer over a plain resistance, with the tail resistor at the output. Kuffel, Zaengl and Kuffel, High
  // Voltage Engineering, section 2.3.1, circuit a: V = V0/(R1 C2 (a2 - a1)) (exp(-a1 t) - exp(-a2 t)), a1 and a2 the
  // roots of s^2 + (1/(R1 C1) + 1/(R1 C2) + 1/(R2 C2)) s + 1/(R1 R2 C1 C2). From memory; follows from Kirchhoff's laws.
  it.each([
    [1.25e-7, 1e-9, 400, 550],
    [2e-8, 1.2e-9, 70, 3000],
    [2e-8, 1.5e-9, 360, 8000],
  ])('C1 %d F, C2 %d F, R1 %d ohm, R2 %d ohm', (c1, c2, r1, r2) => {
    const half = 0.5 * (1 / (r1 * c1) + 1 / (r1 * c2) + 1 / (r2 * c2));
    const root = Math.sqrt(half * half - 1 / (r1 * r2 * c1 * c2));
    const slow = half - root;
    const fast = half + root;
    const wave = (t: number) =>
      (1e5 / (r1 * c2 * (fast - slow))) * (Math.exp(-slow * t) - Math.exp(-fast * t));
    const transient = solved(
      {
        topology: 'charge-transfer',
        charge_V: 100_000,
        dump_F: c1,
        peaking_F: c2,
        bleed_ohm: r2,
        // What a lumped circuit cannot do without is made too small to show.
        gap_H: 1e-11,
        gap: { law: 'exponential', end_ohm: r1, start_ohm: 0.1, fall_s: 1e-12 },
        channel: { inductance_H: 1e-9, break_V: null, end_ohm: 1, start_ohm: 1, fall_s: 1e-9 },
        window_s: 1e-4,
      },
      1000,
    );
    const peak_s = Math.log(fast / slow) / (fast - slow);
    expect(transient.peakVoltage_V / wave(peak_s)).toBeCloseTo(1, 5);
    expect(transient.peakVoltage_s / peak_s).toBeCloseTo(1, 2);
    const { time_s, channel_V } = transient.waveform;
    const worst = Math.max(...time_s.map((t, index) => Math.abs((channel_V[index] ?? NaN) - wave(t))));
    expect(worst / wave(peak_s)).toBeLessThan(2e-5);
  });
});
