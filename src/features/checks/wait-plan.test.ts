import { describe, expect, it } from 'vitest';
import { SETTINGS, SPEC } from './check.fixture';
import { secondsLeft, waitPlan, waitShare } from './wait-plan';

describe('the wait before the stick', () => {
  it('is never under 60 s and lists every node with its own time', () => {
    const plan = waitPlan(SPEC, SETTINGS);
    expect(plan.required_s).toBe(60);
    // 400 MΩ · 5 nF · ln(25 kV / 50 V) = 12.43 s, rounded up; worked by hand.
    expect(plan.type === 'known' ? plan.nodes : []).toEqual([
      { name: 'Dump capacitor', words: '12.5\u2009s' },
      { name: 'Peaking capacitor', words: '< 0.1\u2009s' },
    ]);
  });

  it('gives no number at all where one bleed is unknown, and says which', () => {
    const [first, second] = SPEC.nodes;
    const plan = waitPlan({ ...SPEC, nodes: [first!, { ...second!, bleed_Mohm: null }] }, SETTINGS);
    expect(plan).toMatchObject({ type: 'unknown', required_s: null });
    expect(plan.type === 'unknown' ? plan.words : '').toContain('Peaking capacitor');
    expect(plan.type === 'unknown' ? plan.words : '').not.toMatch(/\d/);
  });

  it('counts whole seconds up and stops at none', () => {
    const plan = waitPlan(SPEC, SETTINGS);
    expect(secondsLeft(plan, 0)).toBe(60);
    expect(secondsLeft(plan, 59.2)).toBe(1);
    expect(secondsLeft(plan, 61)).toBe(0);
    expect(waitShare(plan, 30)).toBe(0.5);
    expect(waitShare(plan, 300)).toBe(1);
  });

  it('waits the 60 s also where it says no number', () => {
    const plan = waitPlan(SPEC, undefined);
    expect(secondsLeft(plan, 59)).toBe(1);
    expect(secondsLeft(plan, 60)).toBe(0);
  });
});
