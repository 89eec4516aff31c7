import { describe, expect, it } from 'vitest';
import { slideShare, slideValue, type SlideRange } from './slide-range';

const linear: SlideRange = { from: 0, to: 3, scale: 'linear', decimals: 2 };
const log: SlideRange = { from: 0.2, to: 20, scale: 'log', decimals: 2 };

describe('a slider’s range', () => {
  it('maps its ends onto the ends of the track, exactly', () => {
    for (const range of [linear, log]) {
      expect([slideValue(range, 0), slideValue(range, 1)]).toEqual([range.from, range.to]);
      expect([slideShare(range, range.from), slideShare(range, range.to)]).toEqual([0, 1]);
    }
  });

  it('comes back from every place to within what a thumb can tell apart', () => {
    for (const range of [linear, log]) {
      for (let place = 1; place < 100; place += 1) {
        expect(slideShare(range, slideValue(range, place / 100))).toBeCloseTo(place / 100, 2);
      }
    }
  });

  it('gives round values, finer at the low end of decades', () => {
    expect(slideValue(linear, 1 / 3)).toBe(1);
    expect(String(slideValue(linear, 0.3337))).toBe('1');
    expect(String(slideValue({ ...log, from: 1e-6, to: 1 }, 0.1)).length).toBeLessThan(9);
    expect(slideValue({ from: 1, to: 30, scale: 'linear', decimals: 0, whole: true }, 0.5)).toBe(16);
  });

  it('never divides by a range that is none', () => {
    expect(slideShare({ ...linear, to: 0 }, 1)).toBe(0);
    expect(slideShare(log, 0)).toBe(0);
  });
});
