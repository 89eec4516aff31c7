import { describe, expect, it } from 'vitest';
import { readTable } from './table';

const TABLE = [
  [0, 10],
  [2, 14],
  [5, 5],
] as const;

describe('readTable', () => {
  it.each([
    [0, 10],
    [1, 12],
    [2, 14],
    [3, 11],
    [5, 5],
  ])('reads %d as %d', (x, y) => {
    expect(readTable(TABLE, x)).toBeCloseTo(y, 12);
  });

  it.each([-0.001, 5.001, Number.NaN])('says nothing at %d, outside the table', (x) => {
    expect(readTable(TABLE, x)).toBeUndefined();
  });

  it('says nothing from an empty table', () => {
    expect(readTable([], 1)).toBeUndefined();
  });
});
