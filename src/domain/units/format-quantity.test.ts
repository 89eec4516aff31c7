import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  formatFigure,
  formatQuantity,
  roundToDecimals,
  roundToSignificant,
  type FigureFormat,
} from './format-quantity';

const one: FigureFormat = { digits: { decimals: 1 }, rounding: 'nearest' };

describe('formatQuantity', () => {
  it.each<[number, string, FigureFormat, string]>([
    [18.78, 'kV', one, '18.8\u2009kV'],
    [-0.034, 'bar(g)', { digits: { decimals: 2 }, rounding: 'nearest' }, '\u22120.03\u2009bar(g)'],
    [1240, 'shots', { digits: { decimals: 0 }, rounding: 'nearest' }, '1,240\u2009shots'],
    [1234567.5, 'V', one, '1,234,567.5\u2009V'],
    [3.5, '', one, '3.5'],
    [12.44, 's', { digits: { decimals: 0 }, rounding: 'up' }, '13\u2009s'],
    [16.7587, 'kV', { digits: { significant: 3 }, rounding: 'down' }, '16.7\u2009kV'],
    [24.2767, 'kV', { digits: { significant: 3 }, rounding: 'up' }, '24.3\u2009kV'],
    [0.00123, 'A', { digits: { significant: 2 }, rounding: 'up' }, '0.0013\u2009A'],
    [123456, 'V', { digits: { significant: 2 }, rounding: 'down' }, '120,000\u2009V'],
    [9.96, 'kV', { digits: { significant: 2 }, rounding: 'up' }, '10\u2009kV'],
    [99.99, 'kV', { digits: { significant: 3 }, rounding: 'nearest' }, '100\u2009kV'],
    [0, 'kV', { digits: { significant: 3 }, rounding: 'up' }, '0.00\u2009kV'],
    [-0.01, 'kV', one, '0.0\u2009kV'],
  ])('writes %d %s', (...[value, unit, format, text]) => {
    expect(formatQuantity(value, unit, format)).toBe(text);
  });

  it.each([Number.NaN, Infinity, -Infinity])('writes a dash for %d and never the word', (value) => {
    expect(formatFigure(value, one)).toBe('\u2013');
  });
});

describe('rounding', () => {
  it('works in decimal: dust in the last binary digit does not move a figure', () => {
    expect(roundToDecimals(1.1, 1, 'up')).toBe(1.1);
    expect(roundToDecimals(0.1 + 0.2, 1, 'up')).toBe(0.3);
    expect(roundToDecimals(0.29, 2, 'down')).toBe(0.29);
    expect(roundToDecimals(1.005, 2, 'nearest')).toBe(1.01);
  });

  it('rounds halves away from zero', () => {
    expect(roundToDecimals(2.5, 0, 'nearest')).toBe(3);
    expect(roundToDecimals(-2.5, 0, 'nearest')).toBe(-3);
  });

  it('takes down and up as directions on the number line', () => {
    expect(roundToDecimals(-1.25, 1, 'down')).toBe(-1.3);
    expect(roundToDecimals(-1.25, 1, 'up')).toBe(-1.2);
  });

  it('rounds tens and hundreds by negative places', () => {
    expect(roundToDecimals(1234, -2, 'up')).toBe(1300);
    expect(roundToSignificant(1234, 1, 'down')).toBe(1000);
  });

  it('never moves a limit to its unsafe side', () => {
    const figure = fc.double({ min: -1e6, max: 1e6, noNaN: true });
    fc.assert(
      fc.property(figure, fc.integer({ min: 0, max: 6 }), (value, decimals) => {
        const dust = 1e-12 * Math.max(1, Math.abs(value));
        const step = 10 ** -decimals;
        const down = roundToDecimals(value, decimals, 'down');
        const up = roundToDecimals(value, decimals, 'up');
        const near = roundToDecimals(value, decimals, 'nearest');
        return (
          down <= value + dust &&
          down > value - step - dust &&
          up >= value - dust &&
          up < value + step + dust &&
          near >= down - dust &&
          near <= up + dust
        );
      }),
    );
  });

  it('writes the same figure that it rounds to', () => {
    const figure = fc.double({ min: -1e5, max: 1e5, noNaN: true });
    fc.assert(
      fc.property(figure, fc.integer({ min: 1, max: 6 }), (value, significant) => {
        const text = formatFigure(value, { digits: { significant }, rounding: 'down' });
        const read = Number(text.replaceAll(',', '').replace('\u2212', '-'));
        return Math.abs(read - roundToSignificant(value, significant, 'down')) <= 1e-12 * Math.abs(value);
      }),
    );
  });
});
