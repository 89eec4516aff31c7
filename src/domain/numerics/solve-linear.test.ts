import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { solveLinear } from './solve-linear';

describe('solveLinear', () => {
  it('solves a system that needs a row exchange', () => {
    const solution = solveLinear(
      [
        [0, 2, 1],
        [1, 0, 0],
        [3, 0, 1],
      ],
      [8, 1, 5],
    );
    [1, 3, 2].forEach((one, index) => expect(solution?.[index]).toBeCloseTo(one, 12));
  });

  it('leaves its rows as they are', () => {
    const matrix = [
      [2, 1],
      [1, 3],
    ];
    solveLinear(matrix, [1, 2]);
    expect(matrix).toEqual([
      [2, 1],
      [1, 3],
    ]);
  });

  it('says nothing about a singular system', () => {
    expect(
      solveLinear(
        [
          [1, 2],
          [2, 4],
        ],
        [1, 2],
      ),
    ).toBeUndefined();
    expect(solveLinear([[Number.NaN]], [1])).toBeUndefined();
  });

  it('meets every equation of a well-made system', () => {
    const entry = fc.double({ min: -1, max: 1, noNaN: true });
    fc.assert(
      fc.property(fc.array(entry, { minLength: 30, maxLength: 30 }), (list) => {
        // Heavy diagonals keep it far from singular.
        const rows = [0, 1, 2, 3, 4].map((row) =>
          [0, 1, 2, 3, 4].map((at) => (list[5 * row + at] ?? 0) + (row === at ? 8 : 0)),
        );
        const right = list.slice(25);
        const x = solveLinear(rows, right) ?? new Float64Array(5);
        return rows.every(
          (row, index) =>
            Math.abs(row.reduce((sum, one, at) => sum + one * (x[at] ?? 0), 0) - (right[index] ?? 0)) < 1e-12,
        );
      }),
    );
  });
});
