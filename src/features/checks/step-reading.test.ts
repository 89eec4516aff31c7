import { describe, expect, it } from 'vitest';
import { SPEC } from './check.fixture';
import { limitWords, outsideWords, readValue, stepSize, type ReadingStep } from './step-reading';

const vessel: ReadingStep = {
  key: 'vessel-pressure',
  type: 'reading',
  title: 'Vessel pressure',
  detail: '',
  quantity: 'Gauge pressure',
  unit: 'bar(g)',
  lowest: 0,
  highest: null,
  highest_from_rig: 'envelope.max_bar_g',
  waive: 'reviewer',
};
const creep: ReadingStep = { ...vessel, unit: 'bar', lowest: -0.05, highest: 0.05, highest_from_rig: null };

describe('a reading with limits', () => {
  it('takes the upper limit from the rig revision', () => {
    expect(limitWords(vessel, SPEC)).toBe('0 to 1.2\u2009bar(g)');
    expect(outsideWords(vessel, 1.2, SPEC)).toBeNull();
    expect(outsideWords(vessel, 1.21, SPEC)).toBe(
      '1.21\u2009bar(g) is above the limit of 1.2\u2009bar(g): the step stays open.',
    );
  });

  it('says which side it left', () => {
    expect(outsideWords(creep, -0.06, SPEC)).toMatch(/^\u22120.06\u2009bar is below the limit of \u22120.05/);
    expect(outsideWords(creep, -0.05, SPEC)).toBeNull();
  });

  it('names one limit, or that there is none', () => {
    expect(limitWords({ ...creep, lowest: null }, SPEC)).toBe('at most 0.05\u2009bar');
    expect(limitWords({ ...creep, highest: null }, SPEC)).toBe('at least \u22120.05\u2009bar');
    expect(limitWords({ ...creep, highest: null, lowest: null }, SPEC)).toBe('no limits');
  });

  it('refuses only what is no number', () => {
    expect(readValue(creep, '').ok).toBe(false);
    expect(readValue(creep, '0,04')).toEqual({ ok: true, value: 0.04 });
    expect(readValue(creep, '9').ok).toBe(true);
  });

  it('steps finely enough for its limits', () => {
    expect(stepSize(creep, SPEC)).toBeCloseTo(0.001, 10);
    expect(stepSize({ ...creep, lowest: -50, highest: 50 }, SPEC)).toBe(1);
  });
});
