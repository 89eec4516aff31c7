import { describe, expect, it } from 'vitest';
import { computed } from './computed';
import { ok, refused } from './result';

const parts = { unit: 'V', model: 'm', valid: 'v', relative: 0.1 };

describe('computed', () => {
  it('carries the first refusal on and does not compute', () => {
    const result = computed(
      [ok(1), refused({ type: 'too-small', words: 'first' }), refused({ type: 'x', words: 'second' })],
      () => {
        throw new Error('must not be reached');
      },
    );
    expect(result).toMatchObject({ refusal: { words: 'first' } });
  });

  it('gives the band around the value', () => {
    expect(computed([], () => ({ ...parts, value: 10 }))).toMatchObject({
      value: { value: 10, band: { low: 9, high: 11 } },
    });
  });

  it.each([Number.NaN, Infinity, -Infinity])('refuses a result of %d in words', (value) => {
    expect(computed([], () => ({ ...parts, value }))).toMatchObject({
      refusal: { type: 'result-not-finite' },
    });
  });

  it('refuses a band that runs away', () => {
    expect(computed([], () => ({ ...parts, value: 1, relative: Infinity })).ok).toBe(false);
  });
});
