import { describe, expect, it } from 'vitest';
import { earlyBreakProbability } from './early-break';

describe('earlyBreakProbability', () => {
  // One-sided tails of the normal law, any table of it.
  it.each([
    [0, 0.5],
    [1, 0.158655254],
    [2, 0.0227501319],
    [3, 1.349898e-3],
    [4, 3.167124e-5],
    [5, 2.866516e-7],
  ])('at %d sigma is %d per shot', (sigma, probability) => {
    const result = earlyBreakProbability(sigma);
    expect(Math.abs((result.ok ? result.value.value : Number.NaN) / probability - 1)).toBeLessThan(1e-6);
  });

  it('says that the far tail is assumed', () => {
    expect(earlyBreakProbability(5)).toMatchObject({ value: { warnings: [{ type: 'tail-assumed' }] } });
    expect(earlyBreakProbability(2)).toMatchObject({ value: { warnings: [] } });
  });

  it.each([Number.NaN, Infinity, 1e9])('refuses %d sigma', (sigma) => {
    expect(earlyBreakProbability(sigma)).toMatchObject({ refusal: { field: 'margin_sigma' } });
  });
});
