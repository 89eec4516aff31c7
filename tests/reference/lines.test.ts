import { describe, expect, it } from 'vitest';
import { blumleinLoadVoltage, distributedHalfPeriod } from '../../src/domain/line/distributed';
import { rectangularLoopInductance } from '../../src/domain/line/loop';
import { pairAirImpedance } from '../../src/domain/line/pair';
import { fringeShare, sheetInductance, stripImpedance, transitTime } from '../../src/domain/line/strip';
import { sparkInductance } from '../../src/domain/spark/spark-inductance';
import type { Answer } from '../../src/domain/units/answer';
import type { Result } from '../../src/domain/units/result';

const value = (result: Result<Answer>) => (result.ok ? result.value.value : Number.NaN);
const off = (got: number, wanted: number) => Math.abs(got / wanted - 1);

describe('a sheet shorted through a gap', () => {
  // First roots of x tan x = C. Carslaw and Jaeger, Conduction of Heat in Solids, appendix IV, table I; from memory.
  it.each([
    [0.01, 0.0998],
    [0.1, 0.3111],
    [0.2, 0.4328],
    [0.5, 0.6533],
    [1, 0.8603],
    [2, 1.0769],
    [5, 1.3138],
    [10, 1.4289],
    [100, 1.5552],
  ])('at an inductance ratio of %d: x = %d', (ratio, root) => {
    const half_s = value(distributedHalfPeriod({ gap_H: 1e-8, sheet_H: ratio * 1e-8, capacitance_F: 1e-9 }));
    const x = (Math.PI * Math.sqrt(ratio * 1e-8 * 1e-9)) / half_s;
    expect(Math.abs(x - root)).toBeLessThan(6e-5);
  });
});

describe('two equal strips in air', () => {
  // Thin strips far apart are wires of a quarter of their width: Z = (eta/pi) ln(4 s/w), exact in the limit. Conformal
  // mapping; equivalent radius of a strip: Balanis, Antenna Theory, table 9.3 (from memory).
  it.each([0.1, 0.03, 0.01])('of width %d of their spacing are thin wires', (width_m) => {
    const wires = (376.73 / Math.PI) * Math.log(4 / width_m);
    expect(off(value(pairAirImpedance({ width_m, spacing_m: 1 })), wires)).toBeLessThan(0.002);
  });

  // Wide strips: Z = eta/(w/s + (1 + ln(2 pi w/s))/pi), the edge formula (from memory).
  it.each([5, 10, 25, 100])('of %d spacings are a plane line with an edge', (width_m) => {
    const edge = 376.73 / (width_m + (1 + Math.log(2 * Math.PI * width_m)) / Math.PI);
    expect(off(value(pairAirImpedance({ width_m, spacing_m: 1 })), edge)).toBeLessThan(0.013);
    const plane = value(stripImpedance({ width_m, spacing_m: 1, eps_r: 1 }));
    expect(off(plane / value(fringeShare({ width_m, spacing_m: 1 })), edge)).toBeLessThan(1e-5);
  });
});

describe('loops', () => {
  // Square of round wire: L = (2 mu0 a/pi)(ln(a/rho) - 0.77401), current on the surface. Rosa, Bulletin of the Bureau of
  // Standards 4 (1908) 301; from memory.
  it.each([
    [1, 0.001],
    [0.1, 0.0005],
    [0.05, 0.001],
  ])('a square of side %d m and wire radius %d m', (side_m, radius_m) => {
    const rosa_nH = 800 * side_m * (Math.log(side_m / radius_m) - 0.77401);
    const found = value(
      rectangularLoopInductance({ long_m: side_m, short_m: side_m, conductorRadius_m: radius_m }),
    );
    expect(off(found, rosa_nH)).toBeLessThan(1e-4);
  });

  // A long rectangle is a pair of wires: 400 ln(s/a) nH a metre. Any handbook; closed form.
  it('a long rectangle of wire', () => {
    const found = value(rectangularLoopInductance({ long_m: 50, short_m: 0.1, conductorRadius_m: 0.001 }));
    expect(off(found, 50 * 400 * Math.log(100))).toBeLessThan(0.005);
  });

  // 50 ohm air line: 166.8 nH a metre (50 ohm over the speed of light).
  it('a coaxial line of 50 ohm', () => {
    const ratio = Math.exp((2 * Math.PI * 50) / 376.7303);
    const found = value(sparkInductance({ length_cm: 100, radius_cm: 0.1, return_cm: 0.1 * ratio }));
    expect(found).toBeCloseTo(166.78, 1);
  });
});

describe('waves', () => {
  // Speed of light 299 792 458 m/s and impedance of vacuum 376.730 ohm: SI and CODATA 2018.
  it('cross 0.3 m of air in a nanosecond', () => {
    expect(value(transitTime(0.299792458, 1))).toBeCloseTo(1, 12);
  });
  it('see 376.73 ohm between sheets as wide as far apart', () => {
    expect(value(stripImpedance({ width_m: 1, spacing_m: 1, eps_r: 1 }))).toBeCloseTo(376.7303, 4);
  });
  it('see 1.2566 uH on a square sheet a metre apart', () => {
    expect(value(sheetInductance({ width_m: 1, length_m: 1, spacing_m: 1 }))).toBeCloseTo(1256.637, 3);
  });
  // A. D. Blumlein, patent GB 589127 (1941): a matched load, twice a line, takes the charging voltage; from memory.
  it.each([
    [0.4, 1],
    [1e9, 2],
    [1e-6, 0],
  ])('put on %d ohm of a Blumlein of 0.2 ohm lines %d times the charge', (load_ohm, share) => {
    const found = value(blumleinLoadVoltage({ charge_V: 10_000, load_ohm, line_ohm: 0.2 }));
    expect(found / 10_000).toBeCloseTo(share, 5);
  });
});
