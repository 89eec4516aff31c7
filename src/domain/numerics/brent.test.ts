import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { brent } from './brent';

describe('brent', () => {
  it.each([
    { name: 'x cubed minus 2', f: (x: number) => x ** 3 - 2, low: 0, high: 3, root: Math.cbrt(2) },
    {
      name: 'cosine against x',
      f: (x: number) => Math.cos(x) - x,
      low: 0,
      high: 1,
      root: 0.7390851332151607,
    },
    { name: 'a flat tenth power', f: (x: number) => (x - 1) ** 9, low: 0, high: 2.5, root: 1 },
    {
      name: 'a steep exponential',
      f: (x: number) => Math.exp(20 * x) - 2,
      low: -1,
      high: 3,
      root: Math.LN2 / 20,
    },
    { name: 'a root at the low end', f: (x: number) => x, low: 0, high: 3, root: 0 },
    { name: 'a root at the high end', f: (x: number) => x - 3, low: 0, high: 3, root: 3 },
    { name: 'a falling function', f: (x: number) => 1 / x - 4, low: 0.01, high: 9, root: 0.25 },
  ])('finds the root of $name', ({ f, low, high, root }) => {
    const found = brent(f, { low, high });
    expect(found.ok).toBe(true);
    // The ninth power is flat to 1e-15 within a fiftieth of its root.
    if (found.ok) expect(Math.abs(found.value - root)).toBeLessThan(root === 1 ? 0.02 : 1e-12);
  });

  it('refuses ends on the same side', () => {
    const found = brent((x) => x * x + 1, { low: -1, high: 1 });
    expect(found).toMatchObject({ ok: false, refusal: { type: 'no-bracket' } });
  });

  it('refuses a function that has no number at an end', () => {
    expect(brent(() => Number.NaN, { low: 0, high: 1 }).ok).toBe(false);
  });

  it('undoes a cubic anywhere', () => {
    fc.assert(
      fc.property(fc.double({ min: -50, max: 50, noNaN: true }), (x) => {
        const wanted = x ** 3 + x;
        const found = brent((t) => t ** 3 + t - wanted, { low: -60, high: 60 });
        return found.ok && Math.abs(found.value - x) < 1e-10;
      }),
    );
  });
});
