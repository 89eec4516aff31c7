import { describe, expect, it } from 'vitest';
import { EMPTY_PERMIT, readPermit, shownPermitText, stepPermit, type PermitDraft } from './permit-form';

const RIG = { max_kV: 16, max_bar_g: 0.8, max_rate_Hz: 4 };
const DAY_MS = 86_400_000;

const read = (texts: PermitDraft['texts']) => readPermit({ ...EMPTY_PERMIT, texts }, RIG, 1000);

describe('a permit being written', () => {
  it('is the envelope of the rig for a fortnight until somebody says otherwise', () => {
    expect(read({})).toEqual({ envelope: RIG, until_ms: 1000 + 14 * DAY_MS, refusals: {} });
  });

  it('may be narrower', () => {
    expect(read({ max_kV: '14', max_bar_g: '0,6', days: '3' })).toEqual({
      envelope: { max_kV: 14, max_bar_g: 0.6, max_rate_Hz: 4 },
      until_ms: 1000 + 3 * DAY_MS,
      refusals: {},
    });
  });

  it('is refused beyond the limits of the revision, in words', () => {
    expect(read({ max_kV: '17' }).refusals.max_kV).toContain('the limit of this revision');
    expect(read({ max_rate_Hz: '4.1' }).refusals.max_rate_Hz).toContain('at most 4');
  });

  it.each(['', 'abc', '-3', '1e9', '0'])('refuses %j for a voltage and never gives NaN', (text) => {
    const { envelope, refusals } = read({ max_kV: text });
    expect(refusals.max_kV).toBeDefined();
    expect(envelope.max_kV).toBe(16);
  });

  it.each(['0', '1.5', '400'])('refuses %s days', (text) => {
    expect(read({ days: text }).refusals.days).toBeDefined();
  });

  it('steps in decimal and never past the rig', () => {
    const step = (field: 'max_bar_g' | 'days', direction: -1 | 1, texts = {}) =>
      stepPermit({ ...EMPTY_PERMIT, texts }, { field, direction }, RIG).texts[field];
    expect(step('max_bar_g', -1)).toBe('0.75');
    expect(step('max_bar_g', 1)).toBe('0.8');
    expect(step('days', -1, { days: '1' })).toBe('1');
    expect(step('max_bar_g', -1, { max_bar_g: 'abc' })).toBe('0.75');
  });

  it('shows figures with a true minus, and nonsense as it was typed', () => {
    expect(shownPermitText('-0.50')).toBe('\u22120.50');
    expect(shownPermitText('')).toBeNull();
    expect(shownPermitText('abc')).toBe('abc');
  });
});
