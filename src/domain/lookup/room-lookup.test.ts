import { describe, expect, it } from 'vitest';
import { DEMO_LAB_SETTINGS } from '../../../seeds/lab';
import { HERON_SPEC } from '../../../seeds/rigs/heron';
import { createAsked } from './asked.fixture';
import { ROOM_LOOKUP as ROOM } from './room-lookup';
import { solveFor } from './solve';

const { asked, figure, refusal, values } = createAsked(ROOM, {
  spec: HERON_SPEC,
  settings: DEMO_LAB_SETTINGS,
});

describe('the room lookup, oxygen', () => {
  const LEAK = {
    subject: 'oxygen',
    room_m3: 30,
    flow_L_min: 5,
    hours: 24,
    air_changes_h: 1,
    ambient_bar_abs: 1,
  };

  // 5 L/min in 30 m3 sealed: 7.2 h to 19.5 % (physics G).
  it('is down to 19.5 % in a sealed room of 30 m3 after 7.2 h', () => {
    expect(figure('limit_time', LEAK).value).toBeCloseTo(7.17, 2);
    expect(figure('oxygen_long', LEAK).value).toBeCloseTo((20.95 * 500) / 505, 6);
    expect(figure('oxygen', LEAK).value).toBeCloseTo((20.95 * 500) / 505, 3);
  });

  // 9.22 m3 into 30 m3: 15.4 mixed, 14.5 displaced (physics P); the cylinder's own band takes a little more.
  it('shows the lower of both ways for a whole cylinder', () => {
    const dump = { ...LEAK, cylinder_L: 50, cylinder_bar_g: 199, temperature_C: 20 };
    expect(figure('oxygen_dump', dump).value).toBeLessThan(14.52);
    expect(figure('oxygen_dump', dump).value).toBeGreaterThan(14.3);
    expect(figure('oxygen_mixed', dump).value).toBeCloseTo(15.35, 1);
    expect(asked(dump).says).toMatch(/a cylinder that empties itself does not/);
  });

  it('is plain air without flow, and asks for the ambient', () => {
    expect(figure('oxygen', { ...LEAK, flow_L_min: 0 }).value).toBeCloseTo(20.95, 9);
    expect(refusal({ ...LEAK, ambient_bar_abs: null })).toMatchObject({ field: 'ambient_bar_abs' });
  });

  it('finds the air changes that keep 20 %', () => {
    const found = solveFor(ROOM, values(LEAK), { solvable: ROOM.solvable[0]!, target: 20 });
    if (!found.ok) throw new Error(found.refusal.words);
    expect(found.value.value).toBeGreaterThan(0.2);
    expect(found.value.answer.figures[0]?.value).toBeGreaterThanOrEqual(20);
  });
});

describe('the room lookup, ozone and nitrogen oxides', () => {
  // 1 W, 50 g/kWh, 30 m3, 1 an hour, decay 2: 0.28 ppm; 2 W of sparks: 0.67 ppm (physics P).
  const CORONA = { subject: 'air', room_m3: 30, air_changes_h: 1, corona_W: 1, yield_g_kWh: 50, decay_h: 2 };

  it('is 0.28 ppm of ozone and 0.67 ppm of nitrogen oxides, as worked', () => {
    expect(figure('ozone', CORONA).value).toBeCloseTo(0.28, 2);
    expect(figure('nox', { ...CORONA, shot_J: 0.2, rate_Hz: 10 }).value).toBeCloseTo(0.67, 2);
    expect(asked(CORONA).says).toMatch(/^Over the limit: ozone/);
  });

  it('says that nitrogen oxides rise without air changes', () => {
    expect(figure('nox', { ...CORONA, air_changes_h: 0 }).words).toMatch(/for as long as it runs/);
  });

  it('never names an energy without its supply', () => {
    expect(figure('spark_power', CORONA).note).toMatch(/0\.902\u2009J.*16\u2009kV and 1\u2009mA/);
    expect(figure('peak', { subject: 'sound' }).note).toMatch(/0\.902\u2009J.*16\u2009kV and 1\u2009mA/);
    expect(figure('peak', { subject: 'sound', supply_kV: null }).note).toMatch(/whatever supply/);
  });
});

describe('the room lookup, sound and pick-up', () => {
  // 0.4 J at 1 m: at most 146 dB; covered within 2.6 E^(1/3) m (physics Q).
  it('is at most 146 dB from 0.4 J at 1 m', () => {
    const shot = { subject: 'sound', shot_J: 0.4, distance_m: 1 };
    expect(figure('peak', shot).value).toBeCloseTo(145.65, 2);
    expect(figure('hearing', shot).value).toBeCloseTo(2.6 * Math.cbrt(0.4), 2);
  });

  // 10 cm2 at 0.3 m and 1e12 A/s: 670 V; 5 cm2, 5 kA, 5 ns, 3 m: 27 V/m (physics Q).
  it('induces 670 V and radiates 27 V/m, as worked', () => {
    const quarter_ns = 5;
    const current_A = (1e12 * 2 * quarter_ns * 1e-9) / Math.PI;
    const near = { subject: 'pick-up', loop_cm2: 10, distance_m: 0.3, current_A, quarter_ns };
    expect(figure('induced', near).value).toBeCloseTo(667, 0);
    const far = { subject: 'pick-up', lead_cm2: 5, distance_m: 3, current_A: 5000, quarter_ns };
    expect(figure('field', far).value).toBeCloseTo(27.4, 0);
  });
});
