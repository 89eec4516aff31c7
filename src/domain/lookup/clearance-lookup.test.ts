import { describe, expect, it } from 'vitest';
import { DEMO_LAB_SETTINGS } from '../../../seeds/lab';
import { HERON_SPEC } from '../../../seeds/rigs/heron';
import { createAsked } from './asked.fixture';
import { CLEARANCE_LOOKUP as CLEARANCE } from './clearance-lookup';
import { solveFor } from './solve';

const { asked, figure, refusal, values } = createAsked(CLEARANCE, {
  spec: HERON_SPEC,
  settings: DEMO_LAB_SETTINGS,
});

const TABLE_AIR = { ambient_bar_abs: 1.01325, temperature_C: 25, humidity_percent: null };

describe('the clearance lookup', () => {
  // AIEE needle points, read: 5 kV 0.42 cm, 20 kV 1.75 cm, 40 kV 3.81 cm; three times that (practice).
  it.each([
    [5, 12.6],
    [20, 52.5],
    [40, 114.3],
    [1, 12.6],
  ])('keeps bare parts at %d kV %d mm apart', (voltage_kV, distance) => {
    const answer = figure('distance', { ...TABLE_AIR, voltage_kV });
    expect(answer.value).toBeCloseTo(distance, 6);
    expect(answer.rounding).toBe('up');
  });

  it('asks for more in thin air, by barometer or by altitude', () => {
    const thin = figure('distance', { ...TABLE_AIR, voltage_kV: 20, ambient_bar_abs: 0.8 });
    // 20 kV count as 25.3 kV there: 2.2 + 0.49 * 0.066 cm, three times.
    expect(thin.value).toBeCloseTo(30 * (2.2 + 0.49 * ((20 * 1.01325) / 0.8 - 25) * 0.2), 4);
    const high = { ...TABLE_AIR, voltage_kV: 20, air_by: 'altitude', altitude_m: 2000 };
    expect(figure('distance', high).value).toBeGreaterThan(thin.value);
    expect(figure('air', high).value).toBeCloseTo(0.95 * 0.795, 3);
  });

  it('holds a distance that there is against it, and gives its voltage', () => {
    const there = { ...TABLE_AIR, voltage_kV: 16, distance_mm: 52.5 };
    expect(figure('stands', there).value).toBeCloseTo(20, 5);
    expect(figure('stands', there).rounding).toBe('down');
    expect(asked(there).says).toMatch(/meets/);
    expect(asked({ ...there, distance_mm: 30 }).says).toMatch(/^Too near/);
    expect(figure('stands', { ...there, distance_mm: 12 }).words).toBe('no voltage of the table');
  });

  it('finds the voltage of a distance, and keeps the distance at the rounded value', () => {
    const at = values({ ...TABLE_AIR, ambient_bar_abs: 0.9 });
    const found = solveFor(CLEARANCE, at, { solvable: CLEARANCE.solvable[0]!, target: 60 });
    if (!found.ok) throw new Error(found.refusal.words);
    const needed = figure('distance', { ...at, voltage_kV: found.value.value });
    expect(needed.value).toBeLessThanOrEqual(60);
    expect(needed.value).toBeGreaterThan(59);
  });

  it('shows that an inversion doubles the voltage across its channel', () => {
    expect(figure('pulse', TABLE_AIR).label).toMatch(/32\.0\u2009kV/);
  });

  it('gives nothing beyond the table, and says what the voltage counts as', () => {
    const { words, field } = refusal({ ...TABLE_AIR, ambient_bar_abs: 0.9, voltage_kV: 38 });
    expect(field).toBe('voltage_kV');
    expect(words).toMatch(/counts as 42\.8\u2009kV/);
    expect(refusal({ ambient_bar_abs: null })).toMatchObject({ field: 'ambient_bar_abs' });
  });

  it('never calls it a barrier', () => {
    expect(asked().cautions[0]).toMatch(/No air gap is a barrier for a person\./);
  });
});
