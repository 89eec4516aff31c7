import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { invertInto, multiplyInto, solveInPlace } from './dense-solve';

const entries = (n: number) =>
  fc.array(fc.double({ min: -9, max: 9, noNaN: true }), { minLength: n, maxLength: n });

describe('solveInPlace', () => {
  it('solves with row exchange where the first pivot is zero', () => {
    const right = Float64Array.from([2, 3]);
    expect(solveInPlace(Float64Array.from([0, 1, 1, 1]), right, 2)).toBe(true);
    expect([...right]).toEqual([1, 2]);
  });

  it('says that a singular system has no solution', () => {
    expect(solveInPlace(Float64Array.from([1, 2, 2, 4]), Float64Array.from([1, 1]), 2)).toBe(false);
    expect(solveInPlace(Float64Array.from([Number.NaN]), Float64Array.from([1]), 1)).toBe(false);
  });

  it('meets its system', () => {
    fc.assert(
      fc.property(entries(16), entries(4), (free, wanted) => {
        // A heavy diagonal keeps any drawn system away from the singular ones.
        const matrix = Float64Array.from(free, (entry, index) => (index % 5 === 0 ? 50 + entry : entry));
        const right = Float64Array.from(wanted);
        expect(solveInPlace(matrix.slice(), right, 4)).toBe(true);
        for (let i = 0; i < 4; i += 1) {
          let sum = 0;
          for (let j = 0; j < 4; j += 1) sum += (matrix[4 * i + j] ?? 0) * (right[j] ?? 0);
          expect(sum).toBeCloseTo(wanted[i] ?? Number.NaN, 10);
        }
      }),
    );
  });
});

describe('invertInto', () => {
  it('gives the unit matrix with what it inverts', () => {
    const matrix = Float64Array.from([0, 2, 1, 1, 1, 0, 3, 0, 1]);
    const inverse = new Float64Array(9);
    const product = new Float64Array(9);
    expect(invertInto(matrix.slice(), inverse, 3)).toBe(true);
    multiplyInto(product, matrix, { other: inverse, factor: 2, n: 3 });
    expect([...product]).toEqual(
      [2, 0, 0, 0, 2, 0, 0, 0, 2].map((entry) => expect.closeTo(entry, 12) as number),
    );
  });

  it('refuses a singular matrix', () => {
    expect(invertInto(Float64Array.from([1, 1, 1, 1]), new Float64Array(4), 2)).toBe(false);
  });
});
