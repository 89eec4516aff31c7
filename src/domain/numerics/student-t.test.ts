import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { studentQuantile, studentTails } from './student-t';

describe('studentTails', () => {
  // One degree of freedom is Cauchy's distribution, two have a closed form as well.
  it.each([0.1, 1, 3, 50])('has the closed forms at t = %d', (t) => {
    expect(studentTails(t, 1)).toBeCloseTo(1 - (2 / Math.PI) * Math.atan(t), 12);
    expect(studentTails(t, 2)).toBeCloseTo(1 - t / Math.sqrt(2 + t * t), 12);
  });

  it('is everything at 0 and the same on both sides', () => {
    expect(studentTails(0, 7)).toBe(1);
    expect(studentTails(-2, 7)).toBe(studentTails(2, 7));
  });

  it('falls with t', () => {
    const t = fc.double({ min: 0, max: 50, noNaN: true });
    fc.assert(
      fc.property(t, t, fc.integer({ min: 1, max: 200 }), (...[a, b, freedom]) => {
        const [low, high] = [Math.min(a, b), Math.max(a, b)];
        return studentTails(low, freedom) >= studentTails(high, freedom) - 1e-12;
      }),
    );
  });

  it('is undone by the quantile', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.001, max: 0.9, noNaN: true }),
        fc.integer({ min: 1, max: 300 }),
        (tails, freedom) => {
          return Math.abs(studentTails(studentQuantile(tails, freedom), freedom) / tails - 1) < 1e-6;
        },
      ),
    );
  });
});
