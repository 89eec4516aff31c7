import { describe, expect, it } from 'vitest';
import { planRate, timeToSelfBreak } from './rate-limits';
import { highestRate, type Charging } from './supply-reach';

const CHARGING: Charging = { supply_kV: 25, supply_mA: 1.5, ballast_Mohm: 25, bleed_Mohm: 400 };
const GAP = { capacitance_F: 5e-9, break_kV: 18.78, blown: false };

describe('planRate', () => {
  it.each([
    ['charging', CHARGING, GAP],
    ['supply-current', { ...CHARGING, supply_mA: 0.1 }, GAP],
    ['gap-recovery', { ...CHARGING, ballast_Mohm: 2 }, GAP],
    ['charging', { ...CHARGING, ballast_Mohm: 10 }, { ...GAP, blown: true }],
  ] as const)('is held by %s', (limitedBy, charging, gap) => {
    const plan = planRate(charging, gap);
    if (!plan.ok) throw new Error('refused');
    const highest = highestRate(charging, gap);
    expect(plan.value.limitedBy).toBe(limitedBy);
    expect(plan.value.rate.value).toBeLessThanOrEqual(highest.ok ? highest.value.value : 0);
    expect(plan.value.rate.value).toBeLessThanOrEqual(gap.blown ? Infinity : 10);
  });

  it('is refused where the gap never fires', () => {
    expect(planRate(CHARGING, { ...GAP, break_kV: 24 })).toMatchObject({ refusal: { type: 'never-fires' } });
    expect(planRate(CHARGING, { ...GAP, break_kV: Number.NaN })).toMatchObject({
      refusal: { field: 'break_kV' },
    });
  });
});

describe('timeToSelfBreak', () => {
  it('is one over the rate', () => {
    const rate = highestRate(CHARGING, GAP);
    const time = timeToSelfBreak(CHARGING, GAP);
    expect(rate.ok && time.ok && rate.value.value * time.value.value).toBeCloseTo(1, 12);
    expect(timeToSelfBreak(CHARGING, { ...GAP, capacitance_F: 0 }).ok).toBe(false);
  });
});
