import fc from 'fast-check';
import { describe, it, vi } from 'vitest';
import type { Circuit, GapLaw } from './circuit-input';
import { solveTransient } from './transient';

// Hundreds of runs: a machine that is busy with other tests takes its time.
vi.setConfig({ testTimeout: 60_000 });

const spread = (low: number, high: number) =>
  fc.double({ min: Math.log(low), max: Math.log(high), noNaN: true }).map(Math.exp);

describe('any numbers at all', () => {
  const any = fc.double();
  const anyGap = fc.oneof(
    fc.record({ law: fc.constant('exponential' as const), end_ohm: any, start_ohm: any, fall_s: any }),
    fc.record({
      law: fc.constant('rompe-weizel' as const),
      end_ohm: any,
      start_ohm: any,
      gap_cm: any,
      pressure_atm_abs: any,
      constant_cm2_atm_V2s: any,
    }),
  );

  it('are refused or give finite figures', () => {
    const rest = {
      charge_V: any,
      gap_H: any,
      gap: anyGap,
      channel: fc.record({ inductance_H: any, break_V: any, end_ohm: any, start_ohm: any, fall_s: any }),
      window_s: any,
    };
    const anyCircuit = fc.oneof(
      fc.record({
        topology: fc.constant('charge-transfer' as const),
        dump_F: any,
        peaking_F: any,
        bleed_ohm: any,
        ...rest,
      }),
      fc.record({
        topology: fc.constant('lc-inversion' as const),
        first_F: any,
        second_F: any,
        charging_H: any,
        charging_ohm: any,
        ...rest,
      }),
    );
    fc.assert(fc.property(anyCircuit, (circuit) => isSound(circuit)));
  });

  it('are refused or give finite figures over the whole range that is let in', () => {
    const gap: fc.Arbitrary<GapLaw> = fc.oneof(
      fc.record({
        law: fc.constant('exponential' as const),
        end_ohm: fc.oneof(fc.constant(0), spread(1e-6, 1e4)),
        start_ohm: spread(0.1, 1e8),
        fall_s: spread(1e-12, 1e-3),
      }),
      fc.record({
        law: fc.constant('rompe-weizel' as const),
        end_ohm: fc.oneof(fc.constant(0), spread(1e-6, 1e4)),
        start_ohm: spread(0.1, 1e8),
        gap_cm: spread(1e-3, 100),
        pressure_atm_abs: spread(1e-2, 100),
        constant_cm2_atm_V2s: spread(1e-2, 100),
      }),
    );
    const wide = {
      charge_V: spread(1, 1e6),
      gap_H: spread(1e-11, 1),
      gap,
      channel: fc.record({
        inductance_H: spread(1e-11, 1),
        break_V: fc.option(spread(1, 1e7)),
        end_ohm: fc.oneof(fc.constant(0), spread(1e-6, 1e4)),
        start_ohm: spread(0.1, 1e8),
        fall_s: spread(1e-12, 1e-3),
      }),
      window_s: spread(1e-10, 1e-3),
    };
    const wideCircuit: fc.Arbitrary<Circuit> = fc.oneof(
      fc.record({
        topology: fc.constant('charge-transfer' as const),
        dump_F: spread(1e-13, 1e-3),
        peaking_F: spread(1e-13, 1e-3),
        bleed_ohm: fc.option(spread(1, 1e12)),
        ...wide,
      }),
      fc.record({
        topology: fc.constant('lc-inversion' as const),
        first_F: spread(1e-13, 1e-3),
        second_F: spread(1e-13, 1e-3),
        charging_H: spread(1e-11, 1),
        charging_ohm: fc.oneof(fc.constant(0), spread(1e-6, 1e8)),
        ...wide,
      }),
    );
    fc.assert(
      fc.property(wideCircuit, (circuit) => isSound(circuit)),
      { numRuns: 150 },
    );
  });
});

function isSound(circuit: Circuit): boolean {
  const result = solveTransient(circuit, { samples: 20 });
  if (!result.ok) return result.refusal.words.length > 0;
  const { waveform, energy, warnings, ...figures } = result.value;
  const curves = [waveform.time_s, waveform.channel_V, waveform.gap_A, waveform.channel_A].flat();
  return (
    warnings.every((warning) => warning.words.length > 0) &&
    [...Object.values(figures), ...Object.values(energy), ...curves].every(
      (one) => typeof one !== 'number' || Number.isFinite(one),
    )
  );
}
