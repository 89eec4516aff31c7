import { describe, expect, it } from 'vitest';
import { tabletLetter } from './letters';

describe('letters of tablets', () => {
  it.each([
    [1, 'A'],
    [26, 'Z'],
    [27, 'AA'],
    [52, 'AZ'],
    [53, 'BA'],
    [702, 'ZZ'],
    [703, 'AAA'],
  ])('names tablet %i %s', (count, letter) => {
    expect(tabletLetter(count)).toBe(letter);
  });

  it('names each of the first thousand otherwise, and none before the first', () => {
    expect(new Set(Array.from({ length: 1000 }, (_, at) => tabletLetter(at + 1))).size).toBe(1000);
    for (const wrong of [0, -1, 1.5, NaN]) expect(() => tabletLetter(wrong)).toThrow(RangeError);
  });
});
