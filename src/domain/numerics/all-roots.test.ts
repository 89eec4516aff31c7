import { describe, expect, it } from 'vitest';
import { allRoots } from './all-roots';

const near = (roots: readonly number[], wanted: readonly number[]) => {
  expect(roots).toHaveLength(wanted.length);
  roots.forEach((root, index) => {
    expect(root).toBeCloseTo(wanted[index] ?? Number.NaN, 10);
  });
};

describe('allRoots', () => {
  it('finds every root of a cubic in rising order', () => {
    near(
      allRoots((x) => (x + 1) * (x - 0.5) * (x - 2), { low: -3, high: 3, pieces: 20 }),
      [-1, 0.5, 2],
    );
  });

  it('finds both branches of a curve with a minimum, on a logarithmic range', () => {
    // y/(1 + ln y) = 1.5 has one root left and one right of y = 1.
    const roots = allRoots((y) => y / (1 + Math.log(y)) - 1.5, {
      low: 0.4,
      high: 100,
      pieces: 60,
      logarithmic: true,
    });
    expect(roots).toHaveLength(2);
    roots.forEach((y) => {
      expect(y / (1 + Math.log(y))).toBeCloseTo(1.5, 10);
    });
  });

  it('invents none where there is none', () => {
    expect(allRoots((x) => x * x + 0.001, { low: -2, high: 2, pieces: 50 })).toEqual([]);
  });

  it('does not take a pole for a root', () => {
    expect(allRoots((x) => 1 / (x - 0.37), { low: 0, high: 1, pieces: 10 })).toEqual([]);
  });

  it('counts a root on a cut once', () => {
    near(
      allRoots((x) => x - 0.5, { low: 0, high: 1, pieces: 2 }),
      [0.5],
    );
  });

  it('keeps roots at the ends of the range', () => {
    near(
      allRoots((x) => x * (x - 3), { low: 0, high: 3, pieces: 7 }),
      [0, 3],
    );
  });

  it('cuts the range where the function has no value', () => {
    near(
      allRoots((x) => (x < 0 ? Number.NaN : x - 0.3), { low: -1, high: 1, pieces: 9 }),
      [0.3],
    );
  });

  it.each([
    { low: 1, high: 1, pieces: 4 },
    { low: 2, high: 1, pieces: 4 },
    { low: 0, high: 1, pieces: 4, logarithmic: true },
    { low: 0, high: 1, pieces: 0 },
  ])('gives no root for an empty or impossible range %j', (search) => {
    expect(allRoots((x) => x - 0.5, search)).toEqual([]);
  });
});
