import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { blumleinLoadVoltage, distributedHalfPeriod } from './distributed';
import { channelLoopInductance, rectangularLoopInductance, spreadInductance } from './loop';
import { pairAirImpedance, strapInductance } from './pair';
import { fringeShare, sheetInductance, stripImpedance, transitTime } from './strip';

const value = (result: ReturnType<typeof transitTime>) => (result.ok ? result.value.value : Number.NaN);
const length = fc.double({ min: 1e-4, max: 1, noNaN: true });

describe('sheets', () => {
  it('have impedance times transit as their inductance', () => {
    fc.assert(
      fc.property(length, length, length, (spacing_m, width_m, length_m) => {
        const ohm = value(stripImpedance({ spacing_m, width_m, eps_r: 3.2 }));
        const nH = value(sheetInductance({ spacing_m, width_m, length_m }));
        expect((ohm * value(transitTime(length_m, 3.2))) / nH).toBeCloseTo(1, 9);
      }),
    );
  });

  it('warn and widen downwards where they are narrow', () => {
    const narrow = stripImpedance({ spacing_m: 0.01, width_m: 0.05, eps_r: 1 });
    expect(narrow).toMatchObject({ value: { warnings: [{ type: 'narrow-strip' }] } });
    // The pair in air knows its fringe: it lies inside the band.
    const pair = value(pairAirImpedance({ width_m: 0.05, spacing_m: 0.01 }));
    expect(narrow.ok && narrow.value.band.low < pair && pair < narrow.value.value).toBe(true);
    expect(stripImpedance({ spacing_m: 1e-4, width_m: 0.1, eps_r: 1 })).toMatchObject({
      value: { warnings: [] },
    });
  });

  it('agree with the pair in air by the fringe alone', () => {
    const pair = { width_m: 0.1, spacing_m: 0.004 };
    const plain = value(stripImpedance({ ...pair, eps_r: 1 }));
    const share = value(fringeShare(pair));
    expect(plain / share / value(pairAirImpedance(pair))).toBeCloseTo(1, 2);
  });

  it('have no edge formula for a strip that is nearly as thick as wide', () => {
    expect(fringeShare({ spacing_m: 0.01, width_m: 0.015 })).toMatchObject({
      refusal: { type: 'too-narrow' },
    });
  });
});

describe('pairs and loops', () => {
  it('of straps have more inductance the further apart', () => {
    const nH = (spacing_m: number) => value(strapInductance({ width_m: 0.02, spacing_m, length_m: 0.1 }));
    fc.assert(fc.property(length, (spacing_m) => nH(1.1 * spacing_m) > nH(spacing_m)));
  });

  it('of round wire are the same seen from either side', () => {
    const loop = (long_m: number, short_m: number) =>
      value(rectangularLoopInductance({ long_m, short_m, conductorRadius_m: 0.001 }));
    expect(loop(0.05, 0.03)).toBeCloseTo(loop(0.03, 0.05), 9);
  });

  it('of wire refuse a conductor that fills the loop', () => {
    expect(
      rectangularLoopInductance({ long_m: 0.05, short_m: 0.01, conductorRadius_m: 0.004 }),
    ).toMatchObject({
      refusal: { type: 'too-large', field: 'conductorRadius_m' },
    });
  });

  it('spread to a foot as large as the sheet is refused', () => {
    expect(spreadInductance({ spacing_m: 1e-3, foot_m: 0.1, edge_m: 0.1 })).toMatchObject({
      refusal: { field: 'edge_m' },
    });
  });

  it('of a channel grow with their section', () => {
    expect(value(channelLoopInductance(4e-4, 0.3))).toBeCloseTo(
      2 * value(channelLoopInductance(2e-4, 0.3)),
      9,
    );
  });
});

describe('distributedHalfPeriod', () => {
  const half = (sheet_H: number) =>
    value(distributedHalfPeriod({ gap_H: 1e-8, sheet_H, capacitance_F: 2e-9 }));
  it('is that of a third of the sheet: within 0.011 % at a tenth of the gap, 0.7 % at its own', () => {
    const lumped = (sheet_H: number) => Math.PI * Math.sqrt((1e-8 + sheet_H / 3) * 2e-9);
    expect(Math.abs(half(1e-9) / lumped(1e-9) - 1)).toBeLessThan(1.1e-4);
    expect(Math.abs(half(1e-8) / lumped(1e-8) - 1)).toBeLessThan(0.007);
    expect(Math.abs(half(1e-7) / lumped(1e-7) - 1)).toBeGreaterThan(0.02);
  });

  it('becomes four transits over two, the quarter-wave ring, when the gap is nothing', () => {
    const result = value(distributedHalfPeriod({ gap_H: 1e-13, sheet_H: 1e-6, capacitance_F: 1e-9 }));
    expect(result / (2 * Math.sqrt(1e-6 * 1e-9))).toBeCloseTo(1, 5);
  });
});

describe('every figure', () => {
  it('is finite or refused for any number', () => {
    const any = fc.double();
    fc.assert(
      fc.property(any, any, any, (x, y, z) =>
        [
          stripImpedance({ spacing_m: x, width_m: y, eps_r: z }),
          sheetInductance({ spacing_m: x, width_m: y, length_m: z }),
          transitTime(x, y),
          fringeShare({ spacing_m: x, width_m: y }),
          pairAirImpedance({ spacing_m: x, width_m: y }),
          strapInductance({ spacing_m: x, width_m: y, length_m: z }),
          rectangularLoopInductance({ long_m: x, short_m: y, conductorRadius_m: z }),
          channelLoopInductance(x, y),
          spreadInductance({ spacing_m: x, foot_m: y, edge_m: z }),
          distributedHalfPeriod({ gap_H: x, sheet_H: y, capacitance_F: z }),
          blumleinLoadVoltage({ charge_V: x, load_ohm: y, line_ohm: z }),
        ].every((result) => !result.ok || Number.isFinite(result.value.value)),
      ),
      { numRuns: 500 },
    );
  });

  it('is finite over the whole range that is let in, and inside its band', () => {
    const wide = fc.double({ min: -7, max: 2, noNaN: true }).map((power) => 10 ** power);
    fc.assert(
      fc.property(wide, wide, wide, (x, y, z) =>
        [
          stripImpedance({ spacing_m: x, width_m: y, eps_r: 1 + z }),
          pairAirImpedance({ spacing_m: x, width_m: y }),
          strapInductance({ spacing_m: x, width_m: y, length_m: z }),
          rectangularLoopInductance({ long_m: x, short_m: y, conductorRadius_m: 0.1 * Math.min(x, y) }),
        ].every((result) => {
          if (!result.ok) return true;
          const { value: figure, band } = result.value;
          return Number.isFinite(figure) && figure > 0 && band.low <= figure && figure <= band.high;
        }),
      ),
    );
  });
});
