import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { checkNumber, type NumberRule } from './check-number';

const RULE: NumberRule = {
  field: 'gap_mm',
  name: 'Gap',
  unit: 'mm',
  min: 0.01,
  max: 500,
  minReason: 'field emission',
};

describe('checkNumber', () => {
  it.each([0.01, 3, 500])('lets %d through', (value) => {
    expect(checkNumber(value, RULE)).toEqual({ ok: true, value });
  });

  it.each([
    { value: Number.NaN, type: 'not-a-number', words: 'Gap: enter a number.' },
    { value: '3', type: 'not-a-number', words: 'Gap: enter a number.' },
    { value: undefined, type: 'not-a-number', words: 'Gap: enter a number.' },
    { value: null, type: 'not-a-number', words: 'Gap: enter a number.' },
    { value: Infinity, type: 'not-finite', words: 'Gap: enter a finite number.' },
    { value: -Infinity, type: 'not-finite', words: 'Gap: enter a finite number.' },
    { value: 0, type: 'too-small', words: 'Gap: must be at least 0.01\u2009mm (field emission).' },
    { value: -3, type: 'too-small', words: 'Gap: must be at least 0.01\u2009mm (field emission).' },
    { value: 1e9, type: 'too-large', words: 'Gap: must be at most 500\u2009mm.' },
  ])('refuses $value in words beside its field', ({ value, type, words }) => {
    expect(checkNumber(value, RULE)).toEqual({ ok: false, refusal: { type, field: 'gap_mm', words } });
  });

  it('refuses the limit itself where it is excluded', () => {
    const above = { ...RULE, min: 0, minExcluded: true, minReason: 'absolute vacuum' };
    expect(checkNumber(0, above)).toMatchObject({ ok: false, refusal: { type: 'too-small' } });
    expect(checkNumber(1e-9, above).ok).toBe(true);
  });

  it('writes a negative limit with a true minus', () => {
    const result = checkNumber(-61, { field: 't', name: 'Temperature', unit: '\u00b0C', min: -60, max: 200 });
    expect(result).toMatchObject({
      refusal: { words: 'Temperature: must be at least \u221260\u2009\u00b0C.' },
    });
  });

  it('lets nothing through that is not finite and in range', () => {
    fc.assert(
      fc.property(fc.anything(), (value) => {
        const result = checkNumber(value, RULE);
        return !result.ok || (Number.isFinite(result.value) && result.value >= 0.01 && result.value <= 500);
      }),
    );
  });
});
