import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { solveLinear } from './solve-linear';

describe('solveLinear', () => {
  it('solves a system that needs a row exchange', () => {
    const system = Float64Array.from([0, 2, 1, 8, 1, 0, 0, 1, 3, 0, 1, 5]);
    expect(solveLinear(system, 3)).toBe(true);
    [1, 3, 2].forEach((one, row) => expect(system[4 * row + 3]).toBeCloseTo(one, 12));
  });

  it('inverts with the unit matrix on the right', () => {
    const system = Float64Array.from([0, 2, 1, 0, 3, 1, 0, 1]);
    expect(solveLinear(system, 2, 2)).toBe(true);
    const inverse = [2, 3, 6, 7].map((at) => system[at]);
    [-1 / 6, 1 / 3, 1 / 2, 0].forEach((one, at) => expect(inverse[at]).toBeCloseTo(one, 14));
  });

  it.each([
    ['singular', [1, 2, 1, 2, 4, 2], 2],
    ['zero', [0, 1], 1],
    ['not a number', [Number.NaN, 1], 1],
    ['infinite', [Infinity, 1], 1],
    ['beyond every number in its solution', [1e-200, 1e200], 1],
  ])('says so where a system is %s', (_how, entries, size) => {
    expect(solveLinear(Float64Array.from(entries), size)).toBe(false);
  });

  it('meets every equation of a well-made system, for both right-hand sides', () => {
    const entry = fc.double({ min: -1, max: 1, noNaN: true });
    fc.assert(
      fc.property(fc.array(entry, { minLength: 35, maxLength: 35 }), (list) => {
        // Heavy diagonals keep it far from singular.
        const system = Float64Array.from(list, (one, at) => (at % 8 === 0 ? one + 8 : one));
        const wanted = system.slice();
        expect(solveLinear(system, 5, 2)).toBe(true);
        for (let row = 0; row < 5; row += 1) {
          for (const column of [5, 6]) {
            let sum = 0;
            for (let k = 0; k < 5; k += 1) sum += (wanted[7 * row + k] ?? 0) * (system[7 * k + column] ?? 0);
            expect(sum).toBeCloseTo(wanted[7 * row + column] ?? Number.NaN, 12);
          }
        }
      }),
    );
  });
});
