import { describe, expect, it } from 'vitest';
import { ticks } from './ticks';

const labels = (axis: Parameters<typeof ticks>[0], most: number): (string | null)[] =>
  ticks(axis, most)
    .map((tick) => tick.label)
    .filter((label) => label !== null);

describe('engineering ticks', () => {
  it('writes every 5 of 8 to 32 kV with single steps between', () => {
    const all = ticks({ min: 8, max: 32, unit: 'kV' }, 8);
    expect(all.filter((tick) => tick.label !== null).map((tick) => tick.value)).toEqual([10, 15, 20, 25, 30]);
    expect(all).toHaveLength(25);
    expect(all[0]).toEqual({ value: 8, long: false, label: null });
  });

  it('steps by 1, 2 or 5 alone', () => {
    for (let most = 1; most <= 12; most += 1) {
      for (const max of [0.3, 1, 2.4, 7, 13, 26, 950, 40_000]) {
        const values = ticks({ min: 0, max, unit: '' }, most)
          .filter((tick) => tick.label !== null)
          .map((tick) => tick.value);
        const step = (values[1] ?? 0) - (values[0] ?? 0);
        if (values.length < 2) continue;
        const mantissa = Number((step / 10 ** Math.floor(Math.log10(step) + 1e-9)).toFixed(6));
        expect([1, 2, 5]).toContain(mantissa);
        expect(values.length).toBeLessThanOrEqual(most + 1);
      }
    }
  });

  it('leaves no dust of binary fractions', () => {
    expect(labels({ min: 0, max: 2, unit: 'bar(g)' }, 5)).toEqual(['0', '0.5', '1.0', '1.5', '2.0']);
    expect(ticks({ min: 0, max: 0.3, unit: '' }, 3).map((tick) => tick.value)).toContain(0.3);
  });

  it('writes a true minus', () => {
    expect(labels({ min: -1, max: 1, unit: 'kV' }, 3)).toEqual(['\u22121', '0', '1']);
  });

  it('marks decades on a log axis and 2 and 5 where there is room', () => {
    expect(labels({ min: 1, max: 100, unit: '', kind: 'log' }, 3)).toEqual(['1', '10', '100']);
    expect(labels({ min: 0.1, max: 10, unit: '', kind: 'log' }, 8)).toEqual([
      '0.1',
      '0.2',
      '0.5',
      '1',
      '2',
      '5',
      '10',
    ]);
  });

  it('gives none for an axis without length', () => {
    expect(ticks({ min: 3, max: 3, unit: '' }, 5)).toEqual([]);
    expect(ticks({ min: 0, max: Number.POSITIVE_INFINITY, unit: '' }, 5)).toEqual([]);
    expect(ticks({ min: Number.NaN, max: 3, unit: '' }, 5)).toEqual([]);
  });
});
