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
    ['supply-power', { ...CHARGING, supply_W: 1 }, GAP],
    [
      'purge-flow',
      { ...CHARGING, ballast_Mohm: 2 },
      { ...GAP, blown: true, purge: { flow_L_min: 0.2, volume_cm3: 0.5 } },
    ],
  ] as const)('is held by %s', (limitedBy, charging, gap) => {
    const plan = planRate(charging, gap);
    if (!plan.ok) throw new Error('refused');
    const highest = highestRate(charging, gap);
    expect(plan.value.limitedBy).toBe(limitedBy);
    expect(plan.value.rate.value).toBeLessThanOrEqual(highest.ok ? highest.value.value : 0);
    expect(plan.value.rate.value).toBeLessThanOrEqual(gap.blown ? Infinity : 10);
  });

  it('lists every limit, lowest first, each with its law', () => {
    const plan = planRate({ ...CHARGING, supply_W: 30 }, GAP);
    const limits = plan.ok ? plan.value.limits : [];
    expect(limits.map(({ type }) => type).toSorted()).toEqual([
      'charging',
      'gap-recovery',
      'supply-current',
      'supply-power',
    ]);
    expect(limits.map(({ rate }) => rate.value)).toEqual(
      limits.map(({ rate }) => rate.value).toSorted((a, b) => a - b),
    );
    expect(limits[0]?.rate).toEqual(plan.ok ? plan.value.rate : undefined);
  });

  // 1.8 L/min for 0.5 cm3 and three volumes a shot: 20 Hz, worked by hand.
  it('turns a purge flow into the rate that it serves', () => {
    const purge = { flow_L_min: 1.8, volume_cm3: 0.5 };
    const plan = planRate({ ...CHARGING, ballast_Mohm: 0.5, supply_mA: 50 }, { ...GAP, blown: true, purge });
    expect(plan.ok && plan.value.rate.value).toBeCloseTo(20, 9);
    expect(planRate(CHARGING, { ...GAP, purge: { ...purge, volume_cm3: 0 } }).ok).toBe(false);
  });

  it('asks for the flow of a blown gap above 10 Hz', () => {
    const plan = planRate({ ...CHARGING, ballast_Mohm: 1, supply_mA: 50 }, { ...GAP, blown: true });
    expect(plan.ok && plan.value.warnings.map(({ type }) => type)).toEqual(['flow-unknown']);
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
