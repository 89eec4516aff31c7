import { describe, expect, it } from 'vitest';
import { reducedFieldFromTorr, townsendUnit } from '../../src/domain/channel/reduced-field';
import { transitTime } from '../../src/domain/channel/discharge';
import { upperStateLifetime, upperStateLifetimeAir } from '../../src/domain/channel/upper-state';
import { studentQuantile } from '../../src/domain/numerics/student-t';
import { numberDensity_cm3 } from '../../src/domain/units/constants';
import { parseWithUnit } from '../../src/domain/units/parse-quantity';
import type { Dimension } from '../../src/domain/units/unit-table';
import { off, valueOf } from './answer-value';

describe('gas density and reduced field', () => {
  // Loschmidt constant, CODATA 2018: 2.686780111e25 and 2.651645804e25 1/m3 at 0 C and 1 atm and 1 bar (from memory).
  it.each([
    [1.01325, 2.686780111e19],
    [1, 2.651645804e19],
  ])('%d bar at 0 C: %d molecules in a cubic centimetre', (bar, expected) => {
    expect(Math.abs(numberDensity_cm3(bar, 273.15) / expected - 1)).toBeLessThan(1e-8);
  });

  // Raizer, Gas Discharge Physics: 1 V/(cm Torr) is 2.83 Td at 0 C, 3.03 at 20 C and 3.11 at 27 C (from memory).
  it.each([
    [0, 2.83],
    [20, 3.03],
    [26.85, 3.11],
  ])('1 V/(cm Torr) at %d C is %d Td', (C, Td) => {
    expect(off(reducedFieldFromTorr(1, C), Td)).toBeLessThan(0.003);
  });

  // 2.5e25 molecules and 2.5e4 V/m make 1 Td: the defining example of an encyclopedia, read.
  it('1 Td is 2.5e4 V/m at 2.5e25 molecules in a cubic metre', () => {
    const kelvin = 1e5 / (1.380649e-23 * 2.5e25);
    expect(off(townsendUnit(kelvin), 0.25)).toBeLessThan(1e-9);
  });
});

describe('upper level and light', () => {
  // 58 Torr halve the life of 36 ns: the classic form of the nitrogen laser literature (from memory).
  it('is halved by 58 Torr', () => {
    expect(off(upperStateLifetime(58 / 750.0616827), 18)).toBeLessThan(0.01);
  });

  // 0.5 to 0.7 ns at 1 atm: air fluorescence literature (from memory).
  it('lives half a nanosecond in air', () => {
    const life_ns = valueOf(upperStateLifetimeAir(1.01325, 20));
    expect(life_ns).toBeGreaterThan(0.45);
    expect(life_ns).toBeLessThan(0.7);
  });

  // A foot of light is a nanosecond: 0.299792458 m a nanosecond, exact by the definition of the metre.
  it('goes a foot in about a nanosecond', () => {
    expect(off(transitTime(0.299792458, 1), 1)).toBeLessThan(1e-12);
    expect(off(transitTime(0.3048, 1), 1.0167)).toBeLessThan(1e-4);
  });
});

describe('Student\u2019s t', () => {
  // Two tails: tables after Fisher, Statistical Methods for Research Workers, read in two reprints.
  it.each([
    [1, 0.05, 12.706],
    [2, 0.05, 4.303],
    [3, 0.05, 3.182],
    [4, 0.05, 2.776],
    [5, 0.05, 2.571],
    [10, 0.05, 2.228],
    [20, 0.05, 2.086],
    [30, 0.05, 2.042],
    [5, 0.01, 4.032],
    [10, 0.01, 3.169],
    [1, 0.001, 636.62],
    [29, 0.1, 1.699],
  ])('%d degrees of freedom, %d in both tails: %d', (...[freedom, tails, t]) => {
    expect(Math.abs(studentQuantile(tails, freedom) / t - 1)).toBeLessThan(3e-4);
  });
});

describe('units against the guide', () => {
  // NIST SP 811, appendix B (from memory).
  it.each<[string, Dimension, number]>([
    ['1 atm abs', 'pressure', 1.01325],
    ['1 psia', 'pressure', 0.06894757],
    ['1 Torr abs', 'pressure', 1.333224e-3],
    ['1 mmHg (gauge)', 'pressure', 1.333224e-3],
    ['1 hPa abs', 'pressure', 1e-3],
    ['1 in', 'length', 25.4],
    ['1 mil', 'length', 0.0254],
    ['1 h', 'time', 3600],
  ])('%s as %s is %d', (text, dimension, size) => {
    const read = parseWithUnit(text, { dimension, field: 'x', name: 'Quantity' });
    expect(Math.abs((read.ok ? read.value.value : Number.NaN) / size - 1)).toBeLessThan(4e-7);
  });
});
