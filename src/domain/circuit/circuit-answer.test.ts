import { describe, expect, it } from 'vitest';
import { circuitAnswer, type CircuitAnswer } from './circuit-answer';
import type { Circuit } from './circuit-input';

const CIRCUIT: Circuit = {
  topology: 'charge-transfer',
  charge_V: 20_000,
  dump_F: 2.7e-9,
  peaking_F: 9e-10,
  bleed_ohm: 5000,
  gap_H: 2.5e-8,
  gap: {
    law: 'rompe-weizel',
    end_ohm: 0.1,
    start_ohm: 1000,
    gap_cm: 0.3,
    pressure_atm_abs: 2.5,
    constant_cm2_atm_V2s: 1,
  },
  channel: { inductance_H: 4e-9, break_V: 12_000, end_ohm: 0.5, start_ohm: 1000, fall_s: 1.2e-9 },
  window_s: 1e-7,
};

function answered(circuit: Circuit): CircuitAnswer {
  const result = circuitAnswer(circuit);
  if (!result.ok) throw new Error(result.refusal.words);
  return result.value;
}

const withBreak = (break_V: number | null): Circuit => ({
  ...CIRCUIT,
  channel: { ...CIRCUIT.channel, break_V },
});

describe('circuitAnswer', () => {
  it('gives every figure a band that holds it and is not nothing', () => {
    const { peakVoltage, rise, timeToPeak, peakGapCurrent, peakChannelCurrent } = answered(CIRCUIT);
    for (const figure of [peakVoltage, rise, timeToPeak, peakGapCurrent, peakChannelCurrent]) {
      if (figure === null) throw new Error('the channel of this circuit fires');
      expect(figure.band.low).toBeLessThan(figure.value);
      expect(figure.band.high).toBeGreaterThan(figure.value);
      expect(figure.band.high).toBeLessThan(2 * figure.band.low);
    }
  });

  it('says that a channel fires, or stays dark, whatever is not known', () => {
    expect(answered(CIRCUIT).fires).toEqual({ asGiven: true, always: true });
    expect(answered(withBreak(40_000))).toMatchObject({
      fires: { asGiven: false, always: true },
      peakChannelCurrent: null,
    });
    expect(answered(withBreak(null)).fires).toEqual({ asGiven: false, always: true });
  });

  it('says that it may not fire close to the top, though the transient itself is clear', () => {
    const close = answered(withBreak(20_000));
    expect(close.fires).toEqual({ asGiven: true, always: false });
    expect(close.transient.marginal).toBe(false);
    expect(close.warnings.map((warning) => warning.type)).toContain('may-not-fire');
  });

  it('carries a band of the exponential law as well', () => {
    const gap = { law: 'exponential' as const, end_ohm: 0.25, start_ohm: 800, fall_s: 1.5e-9 };
    const { rise } = answered({ ...CIRCUIT, gap });
    expect(rise.band.low).toBeLessThan(0.95 * rise.value);
    expect(rise.model).toContain('exponentially');
  });

  it('hands on a refusal and a stop', () => {
    expect(circuitAnswer({ ...CIRCUIT, charge_V: Number.NaN })).toMatchObject({
      refusal: { field: 'charge_V' },
    });
    let asked = 0;
    const stop = () => {
      asked += 1;
      return asked > 12;
    };
    expect(circuitAnswer(CIRCUIT, { shouldStop: stop })).toMatchObject({ refusal: { type: 'stopped' } });
  });
});
