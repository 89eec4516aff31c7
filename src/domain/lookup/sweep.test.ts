import { describe, expect, it } from 'vitest';
import { numberFieldOf } from './fields';
import type { NumberField } from './lookup';
import { roundXs, sweep, sweepOf, sweepXs } from './sweep';
import { toyLookup } from './toy-lookup.fixture';

const fieldOf = (parts: Partial<NumberField> = {}) => {
  const field = numberFieldOf(
    toyLookup((x) => x, { x: parts }),
    'x',
  );
  if (field === undefined) throw new Error('no field');
  return field;
};

describe('sweeping one input', () => {
  it('asks at every point, from end to end', () => {
    const lookup = toyLookup((x) => 2 * x);
    const rows = sweep(lookup, {}, { ...sweepOf(fieldOf(), ['y']), points: 11 });
    expect(rows.map(({ x }) => x)).toEqual([0, 1, 2, 3, 4, 5, 6, 7, 8, 9, 10]);
    expect(rows[3]?.at['y']).toEqual({ value: 6, low: 5, high: 7 });
  });

  it('leaves gaps where the lookup refuses, with the reason', () => {
    const lookup = toyLookup((x) => (x > 4 && x < 6 ? null : x));
    const rows = sweep(lookup, {}, { ...sweepOf(fieldOf(), ['y', 'nothing']), points: 11 });
    expect(rows[5]).toEqual({ x: 5, at: { y: null, nothing: null }, refusal: 'Input: not there.' });
    expect(rows[6]?.at['y']).not.toBeNull();
  });

  it('steps by equal ratios on a log scale', () => {
    const range = { from: 0.1, to: 100, scale: 'log' as const };
    const xs = sweepXs(fieldOf({ max: 1000 }), { field: 'x', figures: [], points: 4, ...range });
    expect(xs).toEqual([0.1, 1, 10, 100]);
  });

  it('stays in the field’s range, takes whole numbers once, and leaves out an excluded end', () => {
    const ask = { field: 'x', figures: [], from: -5, to: 50, points: 100, scale: 'linear' as const };
    const whole = sweepXs(fieldOf({ whole: true, min: 1 }), ask);
    expect(whole).toEqual([1, 2, 3, 4, 5, 6, 7, 8, 9, 10]);
    expect(sweepXs(fieldOf({ minExcluded: true }), ask)[0]).toBeGreaterThan(0);
  });

  it.each([
    [Number.NaN, 1],
    [3, 3],
    [0, Infinity],
  ])('gives nothing for a range from %d to %d that is none', (from, to) => {
    const ask = { field: 'x', figures: [], from, to, points: 5, scale: 'linear' as const };
    expect(sweepXs(fieldOf({ max: Infinity }), ask)).toEqual([]);
  });
});

describe('round inputs for the wall', () => {
  it.each([
    [{ from: 0, to: 3, scale: 'linear' as const }, 21, [0, 0.2, 0.4]],
    [{ from: 0.13, to: 1.07, scale: 'linear' as const }, 11, [0.2, 0.3, 0.4]],
    [{ from: 0.9, to: 10, scale: 'log' as const }, 15, [1, 1.5, 2]],
    [{ from: 0.09, to: 10, scale: 'log' as const }, 8, [0.1, 0.2, 0.5]],
  ])('begins %j in at most %i rows with %j', (range, most, expected) => {
    const xs = roundXs(fieldOf({ min: 0, max: 10 }), range, most);
    expect(xs.slice(0, 3)).toEqual(expected);
    expect(xs.length).toBeLessThanOrEqual(most);
    expect(xs.length).toBeGreaterThan(most / 3);
  });
});
