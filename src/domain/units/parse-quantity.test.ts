import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { formatLength, formatPressure, formatSi } from './format-si';
import { parseWithUnit, type ParsedQuantity } from './parse-quantity';
import type { Dimension } from './unit-table';

const read = (text: string, dimension: Dimension) =>
  parseWithUnit(text, { dimension, field: 'x', name: 'Quantity' });
const got = (text: string, dimension: Dimension): Partial<ParsedQuantity> => {
  const result = read(text, dimension);
  return result.ok ? result.value : {};
};

describe('parseWithUnit', () => {
  it.each<[string, Dimension, number]>([
    ['15 kV', 'voltage', 15_000],
    ['15kV', 'voltage', 15_000],
    ['2,5 nF', 'capacitance', 2.5e-9],
    ['2.5\u2009nF', 'capacitance', 2.5e-9],
    ['20 M\u03a9', 'resistance', 2e7],
    ['20 Mohm', 'resistance', 2e7],
    ['4 mJ', 'energy', 4e-3],
    ['45 uC', 'charge', 45e-6],
    ['45 \u00b5C', 'charge', 45e-6],
    ['1e-9 F', 'capacitance', 1e-9],
    ['\u22123 V', 'voltage', -3],
    ['0.125 in', 'length', 3.175],
    ['3,2 mm', 'length', 3.2],
    ['50 \u00b5m', 'length', 0.05],
    ['5 ns', 'time', 5e-9],
    ['2 min', 'time', 120],
    ['1.5 MHz', 'frequency', 1.5e6],
    ['2 TOhm', 'resistance', 2e12],
    ['337.1 nm', 'length', 3.371e-4],
    ['0.125 inch', 'length', 3.175],
  ])('reads %s', (text, dimension, value) => {
    expect((got(text, dimension).value ?? Number.NaN) / value).toBeCloseTo(1, 12);
  });

  it.each<[string, number, 'gauge' | 'absolute']>([
    ['1.2 bar(g)', 1.2, 'gauge'],
    ['1,2 bar (abs)', 1.2, 'absolute'],
    ['1.2 bar g', 1.2, 'gauge'],
    ['1.2 barg', 1.2, 'gauge'],
    ['1.2 bara', 1.2, 'absolute'],
    ['14.503773773 psig', 1, 'gauge'],
    ['14.503773773 psia', 1, 'absolute'],
    ['760 Torr abs', 1.01325, 'absolute'],
    ['100 kPa absolute', 1, 'absolute'],
    ['100000 Pa gauge', 1, 'gauge'],
    ['1000 mbar(g)', 1, 'gauge'],
    ['1 atm abs', 1.01325, 'absolute'],
    ['0.2 MPa(abs)', 2, 'absolute'],
    ['29.92126 inHg abs', 1.01325, 'absolute'],
    ['2 BAR(G)', 2, 'gauge'],
  ])('reads %s with its reference', (text, bar, reference) => {
    const parsed = got(text, 'pressure');
    expect(parsed.value).toBeCloseTo(bar, 7);
    expect(parsed.reference).toBe(reference);
  });

  it.each<[string, Dimension, string]>([
    ['1.2 bar', 'pressure', 'gauge-or-absolute'],
    ['760 Torr', 'pressure', 'gauge-or-absolute'],
    ['101325 Pa', 'pressure', 'gauge-or-absolute'],
    ['14.7 psi', 'pressure', 'gauge-or-absolute'],
    ['15', 'voltage', 'no-unit'],
    ['200 mPa abs', 'pressure', 'unit-unknown'],
    ['2 MPa', 'pressure', 'gauge-or-absolute'],
    ['15 kA', 'voltage', 'unit-unknown'],
    ['15 KV', 'voltage', 'unit-unknown'],
    ['3 bar(g)', 'length', 'unit-unknown'],
    ['kV', 'voltage', 'not-a-number'],
    ['', 'voltage', 'not-a-number'],
    ['1,000,000 V', 'voltage', 'not-a-number'],
    ['15,000 V', 'voltage', 'ambiguous-comma'],
    ['1,013 bar(abs)', 'pressure', 'ambiguous-comma'],
    ['1e999 V', 'voltage', 'not-finite'],
    ['3 constructor', 'length', 'unit-unknown'],
  ])('refuses %j as %s: %s', (text, dimension, type) => {
    expect(read(text, dimension)).toMatchObject({ ok: false, refusal: { type, field: 'x' } });
  });

  it('never gives NaN, whatever is typed', () => {
    fc.assert(
      fc.property(
        fc.string(),
        fc.constantFrom<Dimension>('voltage', 'pressure', 'length', 'time'),
        (text, dimension) => {
          const result = read(text, dimension);
          return !result.ok || Number.isFinite(result.value.value);
        },
      ),
    );
  });

  it('reads back what was printed, to the digits printed', () => {
    fc.assert(
      fc.property(fc.double({ min: 1e-14, max: 1e11, noNaN: true }), (value) => {
        const back = got(formatSi(value, 'F', { significant: 9, rounding: 'nearest' }), 'capacitance').value;
        return Math.abs((back ?? Number.NaN) / value - 1) < 1e-8;
      }),
    );
  });
});

describe('formatSi', () => {
  it.each<[number, string, 'nearest' | 'down' | 'up', string]>([
    [2.5e-9, 'F', 'nearest', '2.50\u2009nF'],
    [15_000, 'V', 'nearest', '15.0\u2009kV'],
    [999.96, 'V', 'up', '1.00\u2009kV'],
    [999.96, 'V', 'down', '999\u2009V'],
    [-0.0047, 'A', 'nearest', '\u22124.70\u2009mA'],
    [0, 'V', 'nearest', '0.00\u2009V'],
    [77e-9, 'J', 'down', '77.0\u2009nJ'],
    [12.34, 's', 'up', '12.4\u2009s'],
    [Number.NaN, 'V', 'nearest', '\u2013\u2009V'],
  ])('%d %s rounded %s', (value, unit, rounding, text) => {
    expect(formatSi(value, unit, { significant: 3, rounding })).toBe(text);
  });

  it('never rounds a limit up nor a wait down', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 1e-12, max: 1e9, noNaN: true }),
        fc.integer({ min: 2, max: 6 }),
        (value, significant) => {
          const down =
            got(formatSi(value, 'V', { significant, rounding: 'down' }), 'voltage').value ?? Number.NaN;
          const up =
            got(formatSi(value, 'V', { significant, rounding: 'up' }), 'voltage').value ?? Number.NaN;
          return down <= value * (1 + 1e-12) && up >= value * (1 - 1e-12);
        },
      ),
    );
  });

  it('writes the reference beside a pressure', () => {
    expect(formatPressure(1.2, 'gauge', { significant: 3, rounding: 'nearest' })).toBe('1.20\u2009bar(g)');
    expect(formatPressure(2.2133, 'absolute', { significant: 3, rounding: 'up' })).toBe('2.22\u2009bar(abs)');
  });
});

describe('pressures and lengths in the unit asked for', () => {
  const plain = { significant: 4, rounding: 'nearest' } as const;

  // NIST SP 811, appendix B (from memory): 1 bar is 14.5038 psi, 750.062 Torr, 0.986923 atm.
  it.each([
    ['bar', '1.000\u2009bar(abs)'],
    ['mbar', '1,000\u2009mbar(abs)'],
    ['kPa', '100.0\u2009kPa(abs)'],
    ['Torr', '750.1\u2009Torr(abs)'],
    ['psi', '14.50\u2009psi(abs)'],
    ['atm', '0.9869\u2009atm(abs)'],
  ] as const)('1 bar in %s is %s', (unit, text) => {
    expect(formatPressure(1, 'absolute', { ...plain, unit })).toBe(text);
  });

  it.each([
    ['mm', '3.175\u2009mm'],
    ['in', '0.1250\u2009in'],
    ['\u00b5m', '3,175\u2009\u00b5m'],
    ['m', '0.003175\u2009m'],
  ] as const)('3.175 mm in %s is %s', (unit, text) => {
    expect(formatLength(3.175, { ...plain, unit })).toBe(text);
  });

  it('never shows a limit above itself in any unit', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 1e-3, max: 20, noNaN: true }),
        fc.constantFrom('bar', 'kPa', 'Torr', 'psi', 'atm' as const),
        (bar, unit) => {
          const shown = (rounding: 'down' | 'up') => {
            const text = formatPressure(bar, 'gauge', { significant: 3, rounding, unit });
            return got(text.replaceAll(',', ''), 'pressure').value ?? Number.NaN;
          };
          return shown('down') <= bar * (1 + 1e-12) && shown('up') >= bar * (1 - 1e-12);
        },
      ),
    );
  });
});
