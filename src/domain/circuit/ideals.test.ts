import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  idealPeakCurrent,
  inversionHalfPeriod,
  inversionPeak,
  transferEfficiency,
  transferHalfPeriod,
  transferPeak,
} from './ideals';

const value = (result: ReturnType<typeof transferPeak>) => (result.ok ? result.value.value : Number.NaN);
const nF = fc.double({ min: 1e-10, max: 1e-7, noNaN: true });

describe('a lossless transfer', () => {
  it('carries all energy over at gain one for equal capacitors', () => {
    const pair = { dump_F: 1e-9, peaking_F: 1e-9 };
    expect(value(transferPeak(pair, 12_000))).toBeCloseTo(12_000, 9);
    expect(value(transferEfficiency(pair))).toBe(1);
  });

  it('approaches twice the charge for a large dump capacitor, never reaching it', () => {
    fc.assert(
      fc.property(nF, nF, (dump_F, peaking_F) => value(transferPeak({ dump_F, peaking_F }, 1000)) < 2000),
    );
    expect(value(transferPeak({ dump_F: 1e-6, peaking_F: 1e-11 }, 1000))).toBeCloseTo(2000, 1);
  });

  it('keeps the energy: efficiency is peak squared over charge squared, times CP/CD', () => {
    fc.assert(
      fc.property(nF, nF, (dump_F, peaking_F) => {
        const pair = { dump_F, peaking_F };
        const byPeak = (value(transferPeak(pair, 1)) ** 2 * peaking_F) / dump_F;
        expect(value(transferEfficiency(pair)) / byPeak).toBeCloseTo(1, 9);
        // As efficient the other way round.
        const back = { dump_F: peaking_F, peaking_F: dump_F };
        expect(value(transferEfficiency(back)) / byPeak).toBeCloseTo(1, 9);
      }),
    );
  });
});

describe('an ideal ring', () => {
  it('has half period times peak current over pi as the charge that it moves', () => {
    const half_s = value(inversionHalfPeriod(2e-9, 1e-8));
    const peak_A = value(idealPeakCurrent({ charge_V: 15_000, series_F: 2e-9, inductance_H: 1e-8 }));
    expect((2 / Math.PI) * peak_A * half_s).toBeCloseTo(2 * 2e-9 * 15_000, 12);
  });

  it('takes as long for an inversion as for a transfer with the other capacitor huge', () => {
    const pair = { dump_F: 1e-9, peaking_F: 1e-3 };
    expect(value(transferHalfPeriod(pair, 2e-8)) / value(inversionHalfPeriod(1e-9, 2e-8))).toBeCloseTo(1, 5);
  });

  it('doubles its charge', () => {
    expect(value(inversionPeak(12_000))).toBe(24_000);
  });
});

describe('refusals', () => {
  it.each([
    [transferPeak({ dump_F: 0, peaking_F: 1e-9 }, 1000), 'dump_F'],
    [transferEfficiency({ dump_F: 1e-9, peaking_F: Number.NaN }), 'peaking_F'],
    [transferHalfPeriod({ dump_F: 1e-9, peaking_F: 1e-9 }, -1), 'inductance_H'],
    [inversionPeak(Infinity), 'charge_V'],
    [inversionHalfPeriod(1, 1e-8), 'first_F'],
    [idealPeakCurrent({ charge_V: 1000, series_F: -1, inductance_H: 1e-8 }), 'series_F'],
  ])('stand beside their field', (result, field) => {
    expect(result).toMatchObject({ ok: false, refusal: { field } });
  });
});
