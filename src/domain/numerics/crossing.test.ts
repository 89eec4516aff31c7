import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { crossingBetween } from './crossing';

const search = (f: (x: number) => number, [a, b]: readonly [number, number], precision = 1e-12) =>
  crossingBetween(f, { a, fa: f(a), b, fb: f(b) }, precision);

describe('crossingBetween', () => {
  it('ends on both sides of the root of two, close together', () => {
    const { above, below } = search((x) => x * x - 2, [1, 2]);
    expect(above * above).toBeGreaterThanOrEqual(2);
    expect(below * below).toBeLessThan(2);
    expect(above - below).toBeLessThan(2e-12);
  });

  it('finds a jump, from either side', () => {
    for (const sign of [1, -1]) {
      const { above, below } = search((x) => sign * (x < 0.3 ? -1 : 2), [0.1, 0.9]);
      expect(Math.max(above, below)).toBeGreaterThanOrEqual(0.3);
      expect(Math.min(above, below)).toBeLessThan(0.3);
      expect(Math.abs(above - below)).toBeLessThan(1e-12);
    }
  });

  it('takes what is no number for below', () => {
    const { above, below } = search((x) => (x < 5 ? Number.NaN : 1), [1, 10]);
    expect(above).toBeGreaterThanOrEqual(5);
    expect(below).toBeLessThan(5);
  });

  it('needs few questions for a curve that is nearly straight', () => {
    let asked = 0;
    const curve = (x: number) => {
      asked += 1;
      return Math.log(x ** 0.9 + 0.2 * Math.sqrt(x)) - 0.4;
    };
    search(curve, [0.1, 10], 1e-10);
    expect(asked).toBeLessThan(14);
  });

  it('meets any root of a cubic that it is given a bracket of', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.2, max: 50, noNaN: true }), (root) => {
        const { above, below } = search((x) => x ** 3 - root ** 3, [0.1, 100]);
        return above >= root * (1 - 1e-12) && Math.abs(above / root - 1) < 1e-11 && below <= above;
      }),
    );
  });
});
