import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { formatFigure } from './format-quantity';
import { parseNumber, parseQuantity } from './parse-number';

const read = (text: string) => parseNumber(text, 'pressure', 'Pressure');

describe('parseNumber', () => {
  it.each([
    ['12.5', 12.5],
    ['12,5', 12.5],
    ['1.013', 1.013],
    ['0,125', 0.125],
    ['\u22120,125', -0.125],
    ['1,01', 1.01],
    ['1,0130', 1.013],
    ['1234,567', 1234.567],
    ['0012,500', 12.5],
    [',500', 0.5],
    ['15.000', 15],
    [' 0.966 ', 0.966],
    ['\u22123', -3],
    ['-3', -3],
    ['+2', 2],
    ['.5', 0.5],
    [',5', 0.5],
    ['5.', 5],
    ['1e3', 1000],
    ['0', 0],
    ['007', 7],
  ])('reads "%s" as %d', (text, value) => {
    expect(read(text)).toEqual({ ok: true, value });
  });

  it.each([
    ['', 'empty'],
    ['   ', 'empty'],
    ['abc', 'not-a-number'],
    ['1.2.3', 'not-a-number'],
    ['1,234,5', 'not-a-number'],
    ['1,234.5', 'not-a-number'],
    ['1 2', 'not-a-number'],
    ['--1', 'not-a-number'],
    ['0x10', 'not-a-number'],
    ['Infinity', 'not-a-number'],
    ['NaN', 'not-a-number'],
    ['1 bar', 'not-a-number'],
    ['.', 'not-a-number'],
    ['e5', 'not-a-number'],
    ['1e999', 'not-finite'],
  ])('refuses "%s" as %s, beside its field', (text, type) => {
    expect(read(text)).toMatchObject({ ok: false, refusal: { type, field: 'pressure' } });
  });

  it.each([
    ['15,000', '15000 or 15.0'],
    ['1,013', '1013 or 1.013'],
    ['12,500', '12500 or 12.5'],
    ['120,050', '120050 or 120.05'],
    ['\u221215,000', '\u221215000 or \u221215.0'],
    ['+2,500', '+2500 or +2.5'],
    [' 15,000 ', '15000 or 15.0'],
    ['1,500e3', '1500e3 or 1.5e3'],
  ])('refuses "%s", which can be read two ways: write %s', (text, ways) => {
    const result = read(text);
    expect(result).toMatchObject({ ok: false, refusal: { type: 'ambiguous-comma', field: 'pressure' } });
    expect(!result.ok && result.refusal.words.endsWith(`can be read two ways: write ${ways}.`)).toBe(true);
  });

  it.each([
    ['1,234.5', '1234.5'],
    ['1,234,567', '1234567'],
  ])('asks to leave the commas out of "%s"', (text, plain) => {
    expect(read(text)).toMatchObject({
      refusal: {
        type: 'not-a-number',
        words: `Pressure: "${text}": leave the commas out, as ${plain}.`,
      },
    });
  });

  it('never reads what a screen printed with thousands a thousand times too small', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 1000, max: 1e9, noNaN: true }),
        fc.integer({ min: 0, max: 4 }),
        (value, decimals) => {
          const shown = formatFigure(value, { digits: { decimals }, rounding: 'nearest' });
          return !read(shown).ok;
        },
      ),
    );
  });

  it('takes every text that the keypad can make, which never holds a comma', () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 999_999 }), fc.integer({ min: 0, max: 999 }), (whole, part) => {
        const result = read(`${String(whole)}.${String(part).padStart(3, '0')}`);
        return result.ok && Math.abs(result.value - (whole + part / 1000)) < 1e-9;
      }),
    );
  });

  it('says in words what was typed, shortened', () => {
    expect(read('two bar')).toMatchObject({ refusal: { words: 'Pressure: "two bar" is not a number.' } });
    expect(read('x'.repeat(500))).toMatchObject({
      refusal: { words: `Pressure: "${'x'.repeat(20)}\u2026" is not a number.` },
    });
  });

  it('gives a finite number or a refusal for any text', () => {
    fc.assert(
      fc.property(fc.string(), (text) => {
        const result = read(text);
        return result.ok ? Number.isFinite(result.value) : result.refusal.words.startsWith('Pressure: ');
      }),
    );
  });

  it('reads back every number a machine can write', () => {
    fc.assert(
      fc.property(fc.double({ noNaN: true, noDefaultInfinity: true }), (value) => {
        const result = read(String(value));
        return result.ok && Object.is(result.value + 0, value + 0);
      }),
    );
  });
});

describe('parseQuantity', () => {
  const rule = { field: 'gap_mm', name: 'Gap', unit: 'mm', min: 0.01, max: 500 };

  it('holds what it read to the rule', () => {
    expect(parseQuantity('3,0', rule)).toEqual({ ok: true, value: 3 });
    expect(parseQuantity('1e9', rule)).toMatchObject({
      refusal: { type: 'too-large', words: 'Gap: must be at most 500\u2009mm.' },
    });
    expect(parseQuantity('-2', rule)).toMatchObject({ refusal: { type: 'too-small' } });
    expect(parseQuantity('wide', rule)).toMatchObject({ refusal: { type: 'not-a-number' } });
  });
});
