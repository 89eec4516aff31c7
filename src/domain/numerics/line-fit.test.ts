import { describe, expect, it } from 'vitest';
import { fitLine } from './line-fit';

describe('fitLine', () => {
  it('finds a line that holds exactly', () => {
    const line = fitLine([1, 2, 4, 7].map((x) => [x, 3 - 2 * x] as const));
    expect(line?.slope).toBeCloseTo(-2, 12);
    expect(line?.intercept).toBeCloseTo(3, 12);
    expect(line?.scatter).toBeLessThan(1e-12);
  });

  // By hand: y = 1.4 + 0.8 x, squares left 2.4, spread 10.
  it('gives the errors of both numbers as worked by hand', () => {
    const line = fitLine([
      [1, 2],
      [2, 4],
      [3, 3],
      [4, 4],
      [5, 6],
    ]);
    expect(line?.slope).toBeCloseTo(0.8, 12);
    expect(line?.intercept).toBeCloseTo(1.4, 12);
    expect(line?.scatter).toBeCloseTo(Math.sqrt(2.4 / 3), 12);
    expect(line?.slopeError).toBeCloseTo(Math.sqrt(0.8 / 10), 12);
    expect(line?.interceptError).toBeCloseTo(Math.sqrt(0.8 * (1 / 5 + 9 / 10)), 12);
  });

  it.each([
    [[]],
    [[[1, 1]]],
    [
      [
        [2, 1],
        [2, 3],
        [2, 5],
      ],
    ],
  ] as const)('tells no slope from %j', (points) => {
    expect(fitLine(points)).toBeUndefined();
  });
});
