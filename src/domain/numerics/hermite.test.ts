import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { hermite, isRising } from './hermite';

const CUBIC = (x: number) => 2 * x ** 3 - x + 4;
const SLOPE = (x: number) => 6 * x ** 2 - 1;

describe('hermite', () => {
  it('is exact for a cubic', () => {
    const piece = { x0: -1, x1: 2, y0: CUBIC(-1), y1: CUBIC(2), slope0: SLOPE(-1), slope1: SLOPE(2) };
    for (const x of [-1, -0.3, 0, 0.9, 1.7, 2]) expect(hermite(piece, x)).toBeCloseTo(CUBIC(x), 12);
  });

  it('passes through both ends with the slopes asked for', () => {
    const piece = { x0: 1, x1: 3, y0: 5, y1: 9, slope0: 0, slope1: 4 };
    const step = 1e-6;
    expect(hermite(piece, 1)).toBe(5);
    expect(hermite(piece, 3)).toBe(9);
    expect((hermite(piece, 1 + step) - 5) / step).toBeCloseTo(0, 4);
    expect((9 - hermite(piece, 3 - step)) / step).toBeCloseTo(4, 4);
  });
});

describe('isRising', () => {
  it.each([
    { slopes: [0, 1], rising: true },
    { slopes: [3, 3], rising: true },
    { slopes: [0, 3.01], rising: false },
    { slopes: [-0.1, 1], rising: false },
  ])('slopes $slopes of a piece of slope 1: $rising', ({ slopes, rising }) => {
    const [slope0 = Number.NaN, slope1 = Number.NaN] = slopes;
    expect(isRising({ x0: 0, x1: 1, y0: 0, y1: 1, slope0, slope1 })).toBe(rising);
  });

  it('refuses a falling piece', () => {
    expect(isRising({ x0: 0, x1: 1, y0: 1, y1: 0, slope0: 0, slope1: 0 })).toBe(false);
  });

  it('promises a curve that rises everywhere', () => {
    const slope = fc.double({ min: 0, max: 3, noNaN: true });
    fc.assert(
      fc.property(slope, slope, (slope0, slope1) => {
        const piece = { x0: 0, x1: 1, y0: 0, y1: 1, slope0, slope1 };
        let before = hermite(piece, 0);
        for (let step = 1; step <= 50; step += 1) {
          const now = hermite(piece, step / 50);
          if (now < before - 1e-12) return false;
          before = now;
        }
        return true;
      }),
    );
  });
});
