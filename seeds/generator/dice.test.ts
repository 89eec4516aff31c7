import { describe, expect, it } from 'vitest';
import { isUuid } from '../../src/domain/book/ids';
import { createDice } from './dice';

describe('dice', () => {
  it('repeat from the same seed and differ from another', () => {
    const run = (seed: number) => Array.from({ length: 8 }, createDice(seed).uint32);
    expect(run(5)).toEqual(run(5));
    expect(run(5)).not.toEqual(run(6));
  });

  it('are even between 0 and 1 and normal about 0', () => {
    const dice = createDice(11);
    const count = 20_000;
    const even = Array.from({ length: count }, dice.unit);
    const normal = Array.from({ length: count }, dice.normal);
    const mean = (values: readonly number[]) => values.reduce((sum, one) => sum + one, 0) / values.length;
    // Four standard errors of so many throws.
    expect(Math.abs(mean(even) - 0.5)).toBeLessThan(4 / Math.sqrt(12 * count));
    expect(Math.abs(mean(normal))).toBeLessThan(4 / Math.sqrt(count));
    expect(Math.abs(mean(normal.map((one) => one ** 2)) - 1)).toBeLessThan(4 * Math.sqrt(2 / count));
    expect(Math.min(...even)).toBeGreaterThanOrEqual(0);
    expect(Math.max(...even)).toBeLessThan(1);
  });

  it('reach both ends of a whole range, and make ids of the Book’s form', () => {
    const dice = createDice(3);
    const throws = Array.from({ length: 200 }, () => dice.whole(1, 6));
    expect([Math.min(...throws), Math.max(...throws)]).toEqual([1, 6]);
    expect(isUuid(dice.uuid())).toBe(true);
  });
});
