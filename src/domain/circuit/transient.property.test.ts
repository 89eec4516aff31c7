import fc from 'fast-check';
import { describe, expect, it, vi } from 'vitest';
import type { Circuit, GapLaw } from './circuit-input';
import { solveTransient, type Transient } from './transient';

// Hundreds of runs: a machine that is busy with other tests takes its time.
vi.setConfig({ testTimeout: 60_000 });

const spread = (low: number, high: number) =>
  fc.double({ min: Math.log(low), max: Math.log(high), noNaN: true }).map(Math.exp);

const benchGap: fc.Arbitrary<GapLaw> = fc.oneof(
  fc.record({
    law: fc.constant('exponential' as const),
    end_ohm: spread(0.05, 1),
    start_ohm: spread(100, 3000),
    fall_s: spread(3e-10, 5e-9),
  }),
  fc.record({
    law: fc.constant('rompe-weizel' as const),
    end_ohm: spread(0.05, 1),
    start_ohm: spread(100, 3000),
    gap_cm: spread(0.05, 1),
    pressure_atm_abs: spread(0.5, 5),
    constant_cm2_atm_V2s: spread(0.5, 1.5),
  }),
);

const common = {
  charge_V: spread(3000, 40_000),
  gap_H: spread(2e-9, 2e-7),
  gap: benchGap,
  channel: fc.record({
    inductance_H: spread(3e-10, 2e-8),
    break_V: fc.option(spread(1000, 60_000)),
    end_ohm: spread(0.05, 2),
    start_ohm: spread(100, 3000),
    fall_s: spread(2e-10, 5e-9),
  }),
  window_s: spread(2e-8, 2e-7),
};

const benchCircuit: fc.Arbitrary<Circuit> = fc.oneof(
  fc.record({
    topology: fc.constant('charge-transfer' as const),
    dump_F: spread(2e-10, 1e-8),
    peaking_F: spread(2e-10, 1e-8),
    bleed_ohm: fc.option(spread(100, 1e9)),
    ...common,
  }),
  fc.record({
    topology: fc.constant('lc-inversion' as const),
    first_F: spread(2e-10, 1e-8),
    second_F: spread(2e-10, 1e-8),
    charging_H: spread(3e-7, 1e-3),
    charging_ohm: spread(0.1, 1e4),
    ...common,
  }),
);

function solved(circuit: Circuit): Transient {
  const result = solveTransient(circuit, { samples: 0 });
  if (!result.ok) throw new Error(`${result.refusal.words} ${JSON.stringify(circuit)}`);
  return result.value;
}

const near = (got: number, wanted: number) => Math.abs(got - wanted) <= 1e-4 * Math.abs(wanted);

describe('any bench circuit', () => {
  it('keeps its energy, gains none and goes nowhere above the ceiling', () => {
    fc.assert(
      fc.property(benchCircuit, (circuit) => {
        const { energy, peakVoltage_V, fired_s } = solved(circuit);
        expect(Math.abs(energy.audit)).toBeLessThan(1e-6);
        for (const part of [energy.gap_J, energy.channel_J, energy.feed_J, energy.left_J]) {
          expect(part).toBeGreaterThanOrEqual(0);
        }
        // With the channel dark neither circuit more than doubles its charge, the charging inductor apart.
        if (fired_s === null && circuit.topology === 'charge-transfer') {
          expect(peakVoltage_V).toBeLessThanOrEqual(2 * circuit.charge_V * (1 + 1e-5));
        }
      }),
      { numRuns: 150 },
    );
  });

  it('is as high with all impedances doubled, at half the current', () => {
    fc.assert(
      fc.property(benchCircuit, (circuit) => {
        const one = solved(circuit);
        const two = solved(doubled(circuit));
        fc.pre(!one.marginal && !two.marginal);
        expect(near(two.peakVoltage_V, one.peakVoltage_V)).toBe(true);
        expect(near(two.rise_s, one.rise_s)).toBe(true);
        expect(near(2 * two.peakGap_A, one.peakGap_A)).toBe(true);
        expect(near(2 * (two.peakChannel_A ?? 0), one.peakChannel_A ?? 0)).toBe(true);
      }),
      { numRuns: 60 },
    );
  });

  it('is twice as high at twice the charge and break, where the gap knows no current', () => {
    fc.assert(
      fc.property(
        benchCircuit.filter(({ gap }) => gap.law === 'exponential'),
        (circuit) => {
          const one = solved(circuit);
          const { channel } = circuit;
          const break_V = channel.break_V === null ? null : 2 * channel.break_V;
          const two = solved({
            ...circuit,
            charge_V: 2 * circuit.charge_V,
            channel: { ...channel, break_V },
          });
          expect(near(two.peakVoltage_V, 2 * one.peakVoltage_V)).toBe(true);
          expect(near(two.peakGap_A, 2 * one.peakGap_A)).toBe(true);
          expect(two.marginal).toBe(one.marginal);
        },
      ),
      { numRuns: 40 },
    );
  });

  it('goes less high the more stays in its gap, with the channel dark', () => {
    fc.assert(
      fc.property(benchCircuit, spread(1, 30), (circuit, ohm) => {
        const channel = { ...circuit.channel, break_V: null };
        const peak = (end_ohm: number) =>
          solved({
            ...circuit,
            channel,
            gap: { law: 'exponential', end_ohm, start_ohm: 0.1, fall_s: 1e-12 },
            window_s: 8 * Math.sqrt(circuit.gap_H * ringing_F(circuit)),
          }).peakVoltage_V;
        return peak(1.2 * ohm) < peak(ohm) * (1 + 1e-5);
      }),
      { numRuns: 40 },
    );
  });

  it('has lost no less and peaked no lower when it is followed for longer', () => {
    fc.assert(
      fc.property(benchCircuit, (circuit) => {
        const half = solved({ ...circuit, window_s: circuit.window_s / 2 });
        const whole = solved(circuit);
        // What is lost only grows, and a peak once reached stays one.
        return (
          whole.energy.gap_J >= half.energy.gap_J * (1 - 1e-5) &&
          whole.energy.channel_J >= half.energy.channel_J * (1 - 1e-5) - 1e-9 &&
          whole.peakVoltage_V >= half.peakVoltage_V * (1 - 1e-5) &&
          whole.peakGap_A >= half.peakGap_A * (1 - 1e-5)
        );
      }),
      { numRuns: 40 },
    );
  });

  it('is the same again, to the last digit', () => {
    fc.assert(
      fc.property(benchCircuit, (circuit) => {
        expect(solved(circuit)).toEqual(solved(circuit));
      }),
      { numRuns: 20 },
    );
  });
});

/** Capacitance that rings with the gap. */
function ringing_F(circuit: Circuit): number {
  if (circuit.topology === 'lc-inversion') return circuit.first_F;
  return (circuit.dump_F * circuit.peaking_F) / (circuit.dump_F + circuit.peaking_F);
}

/** All inductances and resistances doubled and all capacitances halved. */
function doubled(circuit: Circuit): Circuit {
  const { channel, gap } = circuit;
  const common = {
    gap_H: 2 * circuit.gap_H,
    channel: {
      ...channel,
      inductance_H: 2 * channel.inductance_H,
      end_ohm: 2 * channel.end_ohm,
      start_ohm: 2 * channel.start_ohm,
    },
    gap: doubledGap(gap),
  };
  return circuit.topology === 'charge-transfer'
    ? {
        ...circuit,
        ...common,
        dump_F: circuit.dump_F / 2,
        peaking_F: circuit.peaking_F / 2,
        bleed_ohm: circuit.bleed_ohm === null ? null : 2 * circuit.bleed_ohm,
      }
    : {
        ...circuit,
        ...common,
        first_F: circuit.first_F / 2,
        second_F: circuit.second_F / 2,
        charging_H: 2 * circuit.charging_H,
        charging_ohm: 2 * circuit.charging_ohm,
      };
}

function doubledGap(gap: GapLaw): GapLaw {
  const ends = { end_ohm: 2 * gap.end_ohm, start_ohm: 2 * gap.start_ohm };
  // At half the current the action is a quarter and d/sqrt(S) doubles by itself.
  return { ...gap, ...ends };
}
