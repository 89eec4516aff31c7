import { describe, expect, it } from 'vitest';
import { scaleOf } from './scale';

describe('scale', () => {
  it('maps ends to ends, upside down as well', () => {
    const y = scaleOf({ min: 8, max: 32, unit: 'kV' }, 564, 84);
    expect(y.at(8)).toBe(564);
    expect(y.at(32)).toBe(84);
    expect(y.at(24.3)).toBeCloseTo(238, 6);
  });

  it('puts equal ratios at equal distances on a log axis', () => {
    const x = scaleOf({ min: 1, max: 1000, unit: '', kind: 'log' }, 0, 300);
    expect([1, 10, 100, 1000].map((value) => Math.round(x.at(value)))).toEqual([0, 100, 200, 300]);
    expect(x.valueAt(150)).toBeCloseTo(10 ** 1.5, 6);
  });

  it('comes back from px to the value', () => {
    for (const kind of ['linear', 'log'] as const) {
      const x = scaleOf({ min: 0.5, max: 20, unit: '', kind }, 400, 790);
      for (const value of [0.5, 1, 7.3, 20]) expect(x.valueAt(x.at(value))).toBeCloseTo(value, 9);
    }
  });

  it('stays finite for what has no logarithm and for an axis without length', () => {
    expect(Number.isFinite(scaleOf({ min: 1, max: 10, unit: '', kind: 'log' }, 0, 100).at(0))).toBe(true);
    expect(scaleOf({ min: 2, max: 2, unit: '' }, 10, 100).at(2)).toBe(10);
  });
});
