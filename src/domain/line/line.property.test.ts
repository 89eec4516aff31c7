import fc from 'fast-check';
import { describe, it } from 'vitest';
import { describeSoundness, type Probes } from '../../../tests/support/sound-results';
import type { Answer } from '../units/answer';
import type { Result } from '../units/result';
import * as distributed from './distributed';
import * as loop from './loop';
import * as lumped from './lumped-verdict';
import * as pair from './pair';
import * as feed from './sheet-feed';
import * as strip from './strip';

const PROBES: Probes = {
  distributedHalfPeriod: ([a, b, c]) =>
    distributed.distributedHalfPeriod({ gap_H: a * 1e-9, sheet_H: b * 1e-9, capacitance_F: c * 1e-9 }),
  blumleinLoadVoltage: ([a, b, c]) =>
    distributed.blumleinLoadVoltage({ charge_V: a, load_ohm: b, line_ohm: c }),
  rectangularLoopInductance: ([a, b, c]) =>
    loop.rectangularLoopInductance({ long_m: a, short_m: b, conductorRadius_m: c * 1e-3 }),
  channelLoopInductance: ([a, b]) => loop.channelLoopInductance(a, b),
  spreadInductance: ([a, b, c]) => loop.spreadInductance({ spacing_m: a, foot_m: b, edge_m: b + c }),
  lumpedVerdict: ([a, b, c, d]) =>
    lumped.lumpedVerdict(a * 1e-9, { sheet_H: b * 1e-9, transit_s: c * 1e-9 }, d > 5 ? null : d * 1e-9),
  pairAirImpedance: ([a, b]) => pair.pairAirImpedance({ width_m: a, spacing_m: b }),
  strapInductance: ([a, b, c]) => pair.strapInductance({ width_m: a, spacing_m: b, length_m: c }),
  sheetFeed: ([a, b, c, d, e]) =>
    feed.sheetFeed({ along_m: a, across_m: b, thickness_m: c * 1e-3, eps_r: 1 + d, pairs: 1 + e }),
  stripImpedance: ([a, b, c]) => strip.stripImpedance({ spacing_m: a, width_m: b, eps_r: 1 + c }),
  sheetInductance: ([a, b, c]) => strip.sheetInductance({ spacing_m: a, length_m: b, width_m: c }),
  transitTime: ([a, b]) => strip.transitTime(a, 1 + b),
  fringeShare: ([a, b]) => strip.fringeShare({ spacing_m: a, width_m: b }),
};

describeSoundness('line', PROBES, [distributed, loop, lumped, pair, feed, strip], ['withoutSheet']);

const value = (result: Result<Answer>) => (result.ok ? result.value.value : Number.NaN);
const size = fc.double({ min: 1e-3, max: 1, noNaN: true });
const more = fc.double({ min: 1.01, max: 4, noNaN: true });
const near = (a: number, b: number, tolerance = 1e-9) => Math.abs(a / b - 1) < tolerance;

describe('lines', () => {
  it('have inductance over capacitance as the square of their impedance, and transit as their product', () => {
    fc.assert(
      fc.property(size, size, fc.double({ min: 1, max: 10, noNaN: true }), (h, w, eps_r) => {
        const nH = value(strip.sheetInductance({ spacing_m: h, length_m: 1, width_m: w }));
        const ohm = value(strip.stripImpedance({ spacing_m: h, width_m: w, eps_r }));
        // L = Z T in any line, here in nH, ohm and ns.
        return near(nH, ohm * value(strip.transitTime(1, eps_r)));
      }),
    );
  });

  it('gain inductance with spacing and length and lose it with width', () => {
    fc.assert(
      fc.property(size, size, size, more, (...[h, l, w, by]) => {
        const at = (spacing_m: number, length_m: number, width_m: number) =>
          value(strip.sheetInductance({ spacing_m, length_m, width_m }));
        const here = at(h, l, w);
        return at(by * h, l, w) > here && at(h, by * l, w) > here && at(h, l, by * w) < here;
      }),
    );
  });

  it('of two strips in air never read under the plane wave with its whole edge', () => {
    fc.assert(
      fc.property(size, more, (spacing_m, by) => {
        const at = (width_m: number) => value(pair.pairAirImpedance({ width_m, spacing_m }));
        return at(by * spacing_m) < at(spacing_m);
      }),
    );
  });
});

describe('loops', () => {
  it('do not mind which side is called the long one', () => {
    fc.assert(
      fc.property(size, size, (w, h) => {
        const conductorRadius_m = 0.05 * Math.min(w, h);
        const at = (long_m: number, short_m: number) =>
          value(loop.rectangularLoopInductance({ long_m, short_m, conductorRadius_m }));
        return near(at(w, h), at(h, w));
      }),
    );
  });

  it('scale with their size', () => {
    fc.assert(
      fc.property(size, size, more, (w, h, by) => {
        const at = (k: number) =>
          value(
            loop.rectangularLoopInductance({
              long_m: k * w,
              short_m: k * h,
              conductorRadius_m: k * 0.01 * Math.min(w, h),
            }),
          );
        return near(at(by), by * at(1));
      }),
    );
  });

  it('spread in series: to a ring and on from it is the whole way', () => {
    fc.assert(
      fc.property(size, more, more, (foot_m, a, b) => {
        const at = (from: number, to: number) =>
          value(loop.spreadInductance({ spacing_m: 1e-3, foot_m: from, edge_m: to }));
        return near(at(foot_m, a * foot_m) + at(a * foot_m, a * b * foot_m), at(foot_m, a * b * foot_m));
      }),
    );
  });
});

describe('a sheet on its gap', () => {
  it('rings no faster than without its inductance and no slower than with all of it', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.01, max: 10, noNaN: true }), (ratio) => {
        const half = value(
          distributed.distributedHalfPeriod({ gap_H: 1e-8, sheet_H: ratio * 1e-8, capacitance_F: 1e-9 }),
        );
        const lumpedHalf = (loop_H: number) => Math.PI * Math.sqrt(loop_H * 1e-9);
        return half >= lumpedHalf(1e-8) && half <= lumpedHalf(1e-8 * (1 + ratio));
      }),
    );
  });

  it('stays within the band that the verdict gives its loop', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.001, max: 1, noNaN: true }), (ratio) => {
        const sheet_H = ratio * 1e-8;
        const verdict = lumped.lumpedVerdict(1e-8, { sheet_H, transit_s: 0 });
        if (!verdict.ok || verdict.value.type === 'travelling') return false;
        const half = value(distributed.distributedHalfPeriod({ gap_H: 1e-8, sheet_H, capacitance_F: 1e-9 }));
        const exact_H = (half / Math.PI) ** 2 / 1e-9;
        const { low, high } = verdict.value.loop.band;
        return exact_H >= low && exact_H <= high;
      }),
    );
  });

  it('is matched where the load is twice the line, and never gives twice the charge', () => {
    fc.assert(
      fc.property(size, size, (load_ohm, line_ohm) => {
        const share = value(distributed.blumleinLoadVoltage({ charge_V: 1, load_ohm, line_ohm }));
        return share < 2 && share > 1 === load_ohm > 2 * line_ohm;
      }),
    );
  });
});
