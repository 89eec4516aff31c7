import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { parseNumber, parseQuantity } from './parse-number';

const read = (text: string) => parseNumber(text, 'pressure', 'Pressure');

describe('parseNumber', () => {
  it.each([
    ['12.5', 12.5],
    ['12,5', 12.5],
    ['1,013', 1.013],
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
