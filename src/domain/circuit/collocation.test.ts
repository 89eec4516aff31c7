import { describe, expect, it } from 'vitest';
import { radauCollocation } from './collocation';

describe('radauCollocation', () => {
  // Hairer and Wanner II, table IV.5.5 and 5.6 (from memory): the methods of order 3 and 5.
  it('is the known method of two stages', () => {
    const { nodes, a } = radauCollocation(2);
    expect([...nodes]).toEqual([expect.closeTo(1 / 3, 14), 1]);
    expect([...a]).toEqual(
      [5 / 12, -1 / 12, 3 / 4, 1 / 4].map((entry) => expect.closeTo(entry, 13) as number),
    );
  });

  it('has the known nodes of three stages', () => {
    const nodes = [(4 - Math.sqrt(6)) / 10, (4 + Math.sqrt(6)) / 10, 1];
    expect([...radauCollocation(3).nodes]).toEqual(nodes.map((node) => expect.closeTo(node, 14) as number));
  });

  it.each([2, 3, 5, 7])('integrates every power up to 2 s - 2 with %d stages, and not the next', (s) => {
    const { nodes, b } = radauCollocation(s);
    const integral = (power: number) =>
      b.reduce((sum, weight, index) => sum + weight * (nodes[index] ?? 0) ** power, 0);
    for (let power = 0; power <= 2 * s - 2; power += 1) {
      expect(integral(power) * (power + 1)).toBeCloseTo(1, 11);
    }
    expect(Math.abs(integral(2 * s - 1) * 2 * s - 1)).toBeGreaterThan(1e-10);
  });

  it('gives back a polynomial from its start and its stages', () => {
    const { nodes, powers } = radauCollocation(5);
    const f = (x: number) => 3 - x + 2 * x ** 3 - 7 * x ** 5;
    const values = [0, ...nodes].map(f);
    const found = Array.from({ length: 6 }, (_, k) =>
      values.reduce((sum, value, j) => sum + value * (powers[6 * k + j] ?? 0), 0),
    );
    expect(found).toEqual([3, -1, 0, 2, 0, -7].map((power) => expect.closeTo(power, 9) as number));
  });

  it('has w as the inverse of a', () => {
    const { a, w } = radauCollocation(5);
    for (let i = 0; i < 5; i += 1) {
      for (let j = 0; j < 5; j += 1) {
        let sum = 0;
        for (let k = 0; k < 5; k += 1) sum += (w[5 * i + k] ?? 0) * (a[5 * k + j] ?? 0);
        expect(sum).toBeCloseTo(i === j ? 1 : 0, 10);
      }
    }
  });
});
