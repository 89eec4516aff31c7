import { describe, expect, it } from 'vitest';
import { erfc } from './erfc';

// Abramowitz and Stegun, tables 7.1 and 7.3 (from memory), as far as doubles carry.
const TABLE: readonly (readonly [number, number])[] = [
  [0, 1],
  [0.1, 0.8875370839817152],
  [0.5, 0.4795001221869535],
  [1, 0.15729920705028513],
  [1.5, 0.033894853524689274],
  [2, 0.004677734981047266],
  [2.5, 0.0004069520174449589],
  [3, 2.209049699858544e-5],
  [4, 1.541725790028002e-8],
  [5, 1.5374597944280349e-12],
];

describe('erfc', () => {
  it.each(TABLE)('erfc(%d) is %d', (x, expected) => {
    expect(Math.abs(erfc(x) / expected - 1)).toBeLessThan(1e-11);
  });

  it.each(TABLE)('erfc(-%d) is 2 - erfc(x)', (x, expected) => {
    expect(erfc(-x)).toBeCloseTo(2 - expected, 13);
  });

  it('joins the series to the fraction without a step', () => {
    expect(Math.abs(erfc(2 - 1e-9) / erfc(2 + 1e-9) - 1)).toBeLessThan(1e-7);
  });

  it('ends in 0 and 2, never below', () => {
    expect(erfc(40)).toBe(0);
    expect(erfc(-40)).toBe(2);
    expect(erfc(20)).toBeGreaterThanOrEqual(0);
  });
});
