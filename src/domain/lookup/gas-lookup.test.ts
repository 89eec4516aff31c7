import { describe, expect, it } from 'vitest';
import { DEMO_LAB_SETTINGS } from '../../../seeds/lab';
import { HERON_SPEC } from '../../../seeds/rigs/heron';
import { createAsked } from './asked.fixture';
import { GAS_LOOKUP as GAS } from './gas-lookup';
import { solveFor } from './solve';

const { asked, figure, refusal, values } = createAsked(GAS, {
  spec: HERON_SPEC,
  settings: DEMO_LAB_SETTINGS,
});

// 50 L at 200 bar(abs) and 20 C: 9.22 m3 (physics G, CoolProp 8.0.0).
const FULL = { cylinder_L: 50, cylinder_bar_g: 199, ambient_bar_abs: 1, temperature_C: 20, rest_bar_g: 0 };

describe('the gas lookup, what is left', () => {
  it('counts nitrogen as a real gas, from the gauge with the ambient added', () => {
    expect(figure('whole', FULL).value).toBeCloseTo(9.22, 2);
    expect(figure('ideal', FULL).value).toBeCloseTo(9.7, 2);
    // What stays in at 1 bar(abs) is one water volume.
    expect(figure('left', FULL).value).toBeCloseTo(9220 - 49.3, -1);
  });

  it('lasts the litres over the flow, and leans to the short side', () => {
    const hours = figure('hours', { ...FULL, flow_L_min: 5 });
    expect(hours.value).toBeCloseTo(figure('left', FULL).value / 300, 6);
    expect(hours.rounding).toBe('down');
    expect(hours.low).toBeLessThan(0.95 * hours.value);
    expect(figure('days', { ...FULL, flow_L_min: 5, hours_day: 6 }).value).toBeCloseTo(hours.value / 6, 6);
  });

  it('orders in time: at the order\u2019s pressure what is left lasts the delivery', () => {
    const use = { ...FULL, flow_L_min: 5, hours_day: 6, delivery_days: 3 };
    const at = figure('order_at', use);
    expect(at.rounding).toBe('up');
    const then = { ...use, cylinder_bar_g: at.value };
    expect(figure('days', then).value).toBeGreaterThanOrEqual(3);
    expect(figure('order_in', then).value).toBeLessThan(0.2);
    expect(asked(then).says).toMatch(/^Order now/);
    expect(figure('order_at', { ...use, delivery_days: 300 }).words).toMatch(/second one/);
  });

  it('names the room that a whole cylinder leaves at 19.5 %, and none for air', () => {
    // 9.22 m3 over 1 - 19.5/20.95, with what the real gas leaves open on top.
    expect(figure('room', FULL).value).toBeGreaterThan(133);
    expect(asked({ ...FULL, gas: 'air' }).figures.map(({ key }) => key)).not.toContain('room');
  });

  it('refuses liquefied gases, and a rest above what is in it', () => {
    expect(refusal({ ...FULL, gas: 'CO2' })).toMatchObject({ field: 'gas', type: 'liquefied' });
    expect(refusal({ ...FULL, cylinder_bar_g: 5, rest_bar_g: 6 })).toMatchObject({
      field: 'rest_bar_g',
    });
    expect(refusal({ ambient_bar_abs: null })).toMatchObject({ field: 'ambient_bar_abs' });
  });

  it('finds the pressure that lasts a week', () => {
    const solvable = GAS.solvable[0]!;
    const at = values(FULL);
    const found = solveFor(GAS, at, { solvable, target: 20 });
    if (!found.ok) throw new Error(found.refusal.words);
    const hours = found.value.answer.figures.find(({ key }) => key === 'hours');
    expect(hours?.value).toBeGreaterThanOrEqual(20);
    expect(hours?.value).toBeLessThan(20.5);
  });
});

describe('the gas lookup, purging', () => {
  const PURGE = { subject: 'purge', volume_cm3: 1000, flow_L_min: 5, volumes: 5, ambient_bar_abs: 1.01325 };

  // Five volumes leave 0.7 % (physics G); a litre at 5 L/min is 12 s.
  it('leaves 0.7 % after five volumes, which take a minute', () => {
    expect(figure('residual', PURGE).value).toBeCloseTo(0.674, 3);
    expect(figure('purge', PURGE).value).toBeCloseTo(60, 6);
    expect(figure('oxygen', PURGE).value).toBeCloseTo(0.00674 * 20.95, 3);
  });

  it('takes twice the gas at 1 atm above the air', () => {
    expect(figure('purge', { ...PURGE, purge_bar_g: 1.01325 }).value).toBeCloseTo(120, 6);
  });
});

describe('the gas lookup, the pressed vessel', () => {
  const BODY = {
    subject: 'vessel',
    ambient_bar_abs: 1,
    vessel_bar_g: 3,
    volume_cm3: 100,
    inner_mm: 40,
    wall_mm: 8,
  };

  // 0.1 L at 4 bar(abs): 75 J by Brode, 55 J at one temperature (physics P).
  it('shows the larger energy of two', () => {
    expect(figure('energy', BODY).value).toBeCloseTo(75, 9);
    expect(figure('isothermal', BODY).value).toBeCloseTo(55.5, 1);
  });

  it('carries the hoop stress of a thick tube, by hand', () => {
    const hoop = (0.3 * (28 ** 2 + 20 ** 2)) / (28 ** 2 - 20 ** 2);
    expect(figure('hoop', BODY).value).toBeCloseTo(hoop, 9);
    expect(figure('margin', { ...BODY, strength_MPa: 50 }).value).toBeCloseTo(50 / hoop, 9);
    expect(figure('margin', BODY).words).toMatch(/enter the strength/);
    expect(asked({ ...BODY, strength_MPa: 2 }).warnings.map(({ type }) => type)).toContain('over-strength');
  });

  it.each([
    [{ rated_bar_g: null }, /No rating/],
    [{ rated_bar_g: 4, relief_bar_g: null }, /No relief valve/],
    [{ rated_bar_g: 4, relief_bar_g: 5 }, /above the rating/],
    [{ rated_bar_g: 2, relief_bar_g: 1.5 }, /more than the rating/],
    [{ rated_bar_g: 4, relief_bar_g: 3.5 }, /within the rating/],
  ])('says of %j what the relief valve is worth', (change, words) => {
    expect(asked({ ...BODY, ...change }).says).toMatch(words);
  });
});
