import { describe, expect, it } from 'vitest';
import { windowOf } from './window-rows';

const at = (top_px: number, count = 1000) => windowOf({ count, row_px: 30, top_px, height_px: 300 });

describe('rows to draw', () => {
  it('holds what is in view with some to either side, and no more', () => {
    for (let top = 0; top <= 1000 * 30 - 300; top += 47) {
      const { from, to } = at(top);
      expect(from).toBeLessThanOrEqual(Math.max(0, top / 30 - 10));
      expect(to).toBeGreaterThanOrEqual(Math.min(1000, (top + 300) / 30 + 10));
      expect(to - from).toBeLessThanOrEqual(80);
    }
  });

  it('moves in steps', () => {
    expect(at(940)).toEqual(at(1190));
  });

  it('draws a short table whole, and stays within one that has shrunk under the scroll', () => {
    expect(at(0, 12)).toEqual({ from: 0, to: 12 });
    const shrunk = at(20_000, 12);
    expect(shrunk.to).toBe(12);
    expect(shrunk.from).toBeLessThanOrEqual(shrunk.to);
  });

  it('draws some rows before anything is laid out', () => {
    expect(windowOf({ count: 1000, row_px: 30, top_px: 0, height_px: 0 }).to).toBeGreaterThanOrEqual(20);
  });
});
