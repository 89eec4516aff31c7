import { describe, expect, it } from 'vitest';
import type { Circuit, GapLaw, InversionCircuit, TransferCircuit } from './circuit-input';
import { solveTransient, type Transient } from './transient';

const DARK = { inductance_H: 3e-9, break_V: null, end_ohm: 0.3, start_ohm: 500, fall_s: 8e-10 };

/** A plain resistance: its start is over before the ring begins. */
const constantGap = (end_ohm: number): GapLaw => ({
  law: 'exponential',
  end_ohm,
  start_ohm: 0.1,
  fall_s: 1e-12,
});

const TRANSFER: TransferCircuit = {
  topology: 'charge-transfer',
  charge_V: 10_000,
  dump_F: 2e-9,
  peaking_F: 6e-10,
  bleed_ohm: null,
  gap_H: 2e-8,
  gap: constantGap(0),
  channel: DARK,
  window_s: 6e-8,
};

const INVERSION: InversionCircuit = {
  topology: 'lc-inversion',
  charge_V: 12_000,
  first_F: 1e-9,
  second_F: 7e-10,
  gap_H: 2e-8,
  // So slow that it takes no part.
  charging_H: 1,
  charging_ohm: 0,
  gap: constantGap(0),
  channel: DARK,
  window_s: 6e-8,
};

const BENCH: Circuit = {
  ...TRANSFER,
  charge_V: 18_000,
  dump_F: 3e-9,
  peaking_F: 1e-9,
  bleed_ohm: 20_000,
  gap_H: 1.5e-8,
  gap: { law: 'exponential', end_ohm: 0.25, start_ohm: 800, fall_s: 1.5e-9 },
  channel: { inductance_H: 2e-9, break_V: 20_000, end_ohm: 0.4, start_ohm: 800, fall_s: 1e-9 },
  window_s: 8e-8,
};

function solved(circuit: Circuit, options: Parameters<typeof solveTransient>[1] = {}): Transient {
  const result = solveTransient(circuit, options);
  if (!result.ok) throw new Error(result.refusal.words);
  return result.value;
}

const types = (transient: Transient) => transient.warnings.map((warning) => warning.type);

describe('a ring without loss', () => {
  it('meets the ideals of a transfer', () => {
    const series_F = (2e-9 * 6e-10) / 2.6e-9;
    const transient = solved(TRANSFER);
    expect(transient.peakVoltage_V / ((2 * 10_000 * 2) / 2.6)).toBeCloseTo(1, 5);
    expect(transient.peakGap_A / (10_000 * Math.sqrt(series_F / 2e-8))).toBeCloseTo(1, 5);
    // The peak comes back every period, as high each time.
    const period_s = 2 * Math.PI * Math.sqrt(2e-8 * series_F);
    const turns = transient.peakVoltage_s / period_s;
    expect(turns - Math.floor(turns)).toBeCloseTo(0.5, 3);
    // 1 - cos rises from a tenth to nine tenths of its peak in acos(0.8) to acos(-0.8).
    const rise_s = (period_s / (2 * Math.PI)) * (Math.acos(-0.8) - Math.acos(0.8));
    expect(transient.rise_s / rise_s).toBeCloseTo(1, 4);
    expect(transient.peakChannel_A).toBeNull();
  });

  it.each([3e-10, 7e-10, 2e-9])(
    'inverts to twice the charge whatever the second capacitor: %d F',
    (second_F) => {
      const transient = solved({ ...INVERSION, second_F });
      expect(transient.peakVoltage_V / 24_000).toBeCloseTo(1, 5);
      expect(transient.peakGap_A / (12_000 * Math.sqrt(1e-9 / 2e-8))).toBeCloseTo(1, 5);
    },
  );

  it('loses nothing, and the audit says so', () => {
    const { energy } = solved(TRANSFER);
    expect(energy.start_J).toBeCloseTo(0.1, 12);
    expect(energy.left_J / energy.start_J).toBeCloseTo(1, 4);
    expect(Math.abs(energy.audit)).toBeLessThan(1e-7);
  });
});

describe('a ring with a resistance that stays', () => {
  const ohm = 3;
  const series_F = (2e-9 * 6e-10) / 2.6e-9;
  const damping = ohm / (2 * 2e-8);
  const omega = Math.sqrt(1 / (2e-8 * series_F) - damping ** 2);
  const end_V = (10_000 * 2) / 2.6;

  /** Closed form of the step answer of a series ring. */
  const voltage = (t: number) =>
    end_V * (1 - Math.exp(-damping * t) * (Math.cos(omega * t) + (damping / omega) * Math.sin(omega * t)));

  it('follows the closed form all along', () => {
    const { waveform } = solved({ ...TRANSFER, gap: constantGap(ohm) }, { samples: 200 });
    const worst = Math.max(
      ...waveform.time_s.map((t, index) => Math.abs((waveform.channel_V[index] ?? NaN) - voltage(t))),
    );
    // The start resistance of a picosecond is not in the closed form.
    expect(worst / end_V).toBeLessThan(1e-4);
  });

  it('peaks where the closed form does', () => {
    const transient = solved({ ...TRANSFER, gap: constantGap(ohm) });
    expect(transient.peakVoltage_V / voltage(Math.PI / omega)).toBeCloseTo(1, 5);
    expect(transient.peakVoltage_s / (Math.PI / omega)).toBeCloseTo(1, 3);
    expect(transient.energy.gap_J / transient.energy.start_J).toBeGreaterThan(0.1);
  });

  it('creeps up without overshoot when it is overdamped, and says that the window is short', () => {
    const transient = solved({ ...TRANSFER, gap: constantGap(100) });
    expect(transient.peakVoltage_V).toBeLessThan(end_V);
    expect(types(transient)).toContain('window-short');
  });
});

describe('the channel', () => {
  it('breaks down at its voltage and never opens again', () => {
    const transient = solved(BENCH);
    const fired_s = transient.fired_s ?? Number.NaN;
    const { time_s, channel_V, channel_A } = transient.waveform;
    const at = time_s.indexOf(fired_s);
    expect(channel_V[at]).toBeCloseTo(20_000, 4);
    expect(channel_A.slice(0, at + 1).every((amps) => amps === 0)).toBe(true);
    // The ring goes on through it, with both signs.
    expect(Math.max(...channel_A)).toBeGreaterThan(6000);
    expect(Math.min(...channel_A)).toBeLessThan(-100);
  });

  it('stays dark below its break and says how far it got', () => {
    const dark = solved({ ...BENCH, channel: { ...BENCH.channel, break_V: 30_000 } });
    expect(dark).toMatchObject({ fired_s: null, peakChannel_A: null, peakChannel_s: null, marginal: false });
    expect(dark.warnings.find((warning) => warning.type === 'channel-dark')?.words).toContain(
      'up to 21.9\u2009kV',
    );
  });

  // The same circuit with the channel open tops out there.
  const top_V = solved({ ...BENCH, channel: { ...BENCH.channel, break_V: null } }).peakVoltage_V;

  it.each([
    [0.9, true, false],
    [0.975, true, false],
    [0.985, true, true],
    [0.9999, true, true],
    [1.0001, false, true],
    [1.015, false, true],
    [1.025, false, false],
  ])('with its break at %d of the top: fires %s, marginal %s', (share, fires, marginal) => {
    const transient = solved({ ...BENCH, channel: { ...BENCH.channel, break_V: share * top_V } });
    expect(transient.fired_s !== null).toBe(fires);
    expect(transient.marginal).toBe(marginal);
    expect(types(transient).includes('marginal')).toBe(marginal);
  });

  it('lowers what the capacitor reaches when it breaks down early', () => {
    const peak = (break_V: number) =>
      solved({ ...BENCH, channel: { ...BENCH.channel, break_V } }).peakVoltage_V;
    expect(peak(10_000)).toBeLessThan(peak(15_000));
    expect(peak(15_000)).toBeLessThan(peak(20_000));
  });
});

describe('warnings', () => {
  it.each([
    [{ ...TRANSFER, bleed_ohm: 200 }, 'bleed-loss'],
    [{ ...INVERSION, charging_H: 1e-6, charging_ohm: 50 }, 'charging-loss'],
    [{ ...TRANSFER, gap: constantGap(0) }, 'two-peaks'],
    [
      {
        ...BENCH,
        gap: {
          law: 'rompe-weizel',
          end_ohm: 0.1,
          start_ohm: 1000,
          gap_cm: 0.3,
          pressure_atm_abs: 2.5,
          constant_cm2_atm_V2s: 3,
        },
      },
      'constant-unusual',
    ],
  ] satisfies [Circuit, string][])('of circuit %#: %s', (circuit, type) => {
    expect(types(solved(circuit))).toContain(type);
  });

  it('are none for an ordinary circuit', () => {
    expect(solved(BENCH).warnings).toEqual([]);
  });
});

describe('a sheet in the loop', () => {
  const feed = (share: number, transit_s = 5e-10) => ({ sheet_H: share * BENCH.gap_H, transit_s });

  it('counts with a third of its inductance', () => {
    const sheet = solved({ ...BENCH, feed: feed(0.09) });
    const wire = solved({ ...BENCH, gap_H: 1.03 * BENCH.gap_H });
    expect(sheet.peakVoltage_V).toBe(wire.peakVoltage_V);
    expect(types(sheet)).toEqual([]);
    expect(types(solved({ ...BENCH, feed: feed(0.5) }))).toContain('wave-steps');
  });

  it.each([
    ['more inductance than the gap', { ...BENCH, feed: feed(1.1) }, {}],
    ['a wanted rise under twice the transit', { ...BENCH, feed: feed(0.1, 2e-9) }, { wantedRise_s: 3e-9 }],
    ['a rise found under twice the transit', { ...BENCH, feed: feed(0.1, 5e-9) }, {}],
  ])('withholds the wave shape: %s', (_why, circuit, options) => {
    expect(solveTransient(circuit, options)).toMatchObject({
      ok: false,
      refusal: { type: 'travelling-waves', field: 'feed' },
    });
  });
});

describe('a run', () => {
  it('keeps every peak in a coarse drawing', () => {
    const transient = solved(BENCH, { samples: 12 });
    const top = (curve: readonly number[]) => Math.max(...curve.map(Math.abs));
    const { waveform } = transient;
    expect(waveform.time_s.length).toBeLessThan(60);
    expect(top(waveform.channel_V) / transient.peakVoltage_V).toBeCloseTo(1, 12);
    expect(top(waveform.gap_A) / transient.peakGap_A).toBeCloseTo(1, 12);
    expect(top(waveform.channel_A) / (transient.peakChannel_A ?? NaN)).toBeCloseTo(1, 12);
    expect(solved(BENCH, { samples: 0 }).waveform.time_s).toEqual([]);
  });

  it('stops when it is asked to, and only then', () => {
    let asked = 0;
    const stop = () => {
      asked += 1;
      return asked === 2;
    };
    expect(solveTransient(BENCH, { shouldStop: stop })).toMatchObject({ refusal: { type: 'stopped' } });
    expect(asked).toBe(2);
    expect(solveTransient(BENCH, { shouldStop: () => false }).ok).toBe(true);
  });

  it('refuses a window that holds a hundred thousand rings', () => {
    expect(solveTransient({ ...TRANSFER, window_s: 1e-3 })).toMatchObject({
      refusal: { type: 'too-long', field: 'window_s' },
    });
  });

  it.each<[Partial<TransferCircuit>, string]>([
    [{ charge_V: 0 }, 'charge_V'],
    [{ dump_F: Number.NaN }, 'dump_F'],
    [{ peaking_F: -1e-9 }, 'peaking_F'],
    [{ bleed_ohm: 0 }, 'bleed_ohm'],
    [{ gap_H: Infinity }, 'gap_H'],
    [{ window_s: 0 }, 'window_s'],
    [{ gap: { ...constantGap(1), law: 'exponential', fall_s: 0 } as GapLaw }, 'gap.fall_s'],
    [{ channel: { ...DARK, break_V: -1 } }, 'channel.break_V'],
    [{ channel: { ...DARK, start_ohm: 0 } }, 'channel.start_ohm'],
    [{ feed: { sheet_H: -1, transit_s: 0 } }, 'sheet_H'],
  ])('refuses %j beside its field', (change, field) => {
    expect(solveTransient({ ...TRANSFER, ...change })).toMatchObject({ ok: false, refusal: { field } });
  });
});
