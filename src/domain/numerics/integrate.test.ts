import { describe, expect, it } from 'vitest';
import { integrate } from './integrate';

describe('integrate', () => {
  it.each([
    { name: 'sine over half a turn', f: Math.sin, low: 0, high: Math.PI, exact: 2 },
    { name: 'a parabola', f: (x: number) => x * x, low: -1, high: 2, exact: 3 },
    { name: '1/x over a decade', f: (x: number) => 1 / x, low: 1, high: 10, exact: Math.LN10 },
    { name: 'a ramp with a kink', f: (x: number) => Math.max(x - 0.3, 0), low: 0, high: 1, exact: 0.245 },
    {
      name: 'a narrow peak',
      f: (x: number) => 1 / (1e-4 + x * x),
      low: -1,
      high: 1,
      exact: 200 * Math.atan(100),
    },
    { name: 'an empty range', f: Math.exp, low: 1, high: 1, exact: 0 },
  ])('agrees with the closed form for $name', ({ f, low, high, exact }) => {
    expect(Math.abs(integrate(f, { low, high }, 1e-10) - exact)).toBeLessThan(1e-8);
  });
});
