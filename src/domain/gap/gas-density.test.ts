import { describe, expect, it } from 'vitest';
import { airDensity, checkedSimilarity, humidityFactor, similarity_bar_cm } from './gas-density';

describe('similarity', () => {
  it('is pressure times gap at 20 C', () => {
    expect(similarity_bar_cm({ pressure_bar_abs: 2, gap_cm: 0.3, temperature_C: 20 })).toBeCloseTo(0.6, 12);
  });

  it('falls with temperature as density does', () => {
    const cold = similarity_bar_cm({ pressure_bar_abs: 1, gap_cm: 1, temperature_C: 0 });
    const hot = similarity_bar_cm({ pressure_bar_abs: 1, gap_cm: 1, temperature_C: 100 });
    expect(cold / hot).toBeCloseTo(373.15 / 273.15, 12);
  });

  it.each([
    [{ pressure_bar_abs: 0, gap_cm: 1, temperature_C: 20 }, 'pressure'],
    [{ pressure_bar_abs: -1, gap_cm: 1, temperature_C: 20 }, 'pressure'],
    [{ pressure_bar_abs: 1e9, gap_cm: 1, temperature_C: 20 }, 'pressure'],
    [{ pressure_bar_abs: 1, gap_cm: 0, temperature_C: 20 }, 'gap_cm'],
    [{ pressure_bar_abs: 1, gap_cm: Number.NaN, temperature_C: 20 }, 'gap_cm'],
    [{ pressure_bar_abs: 1, gap_cm: 1e9, temperature_C: 20 }, 'gap_cm'],
    [{ pressure_bar_abs: 1, gap_cm: 1, temperature_C: -273.15 }, 'temperature_C'],
    [{ pressure_bar_abs: 1, gap_cm: 1, temperature_C: Infinity }, 'temperature_C'],
  ])('refuses %j beside %s', (point, field) => {
    expect(checkedSimilarity(point)).toMatchObject({ ok: false, refusal: { field } });
  });
});

describe('airDensity', () => {
  // IEC 60052 / 60060-1: (p/101.325 kPa)(293/(273 + T)); worked by hand.
  it.each([
    [101.325, 20, 1],
    [101.325, 0, 293 / 273],
    [85, 25, (85 / 101.325) * (293 / 298)],
    [50.6625, 20, 0.5],
  ])('at %d kPa and %d C is %d', (kPa, C, delta) => {
    const result = airDensity(kPa, C);
    expect(result.ok && result.value.value).toBeCloseTo(delta, 12);
  });

  it('warns where a table voltage no longer scales with it', () => {
    expect(airDensity(101.325, 20)).toMatchObject({ value: { warnings: [] } });
    expect(airDensity(85, 20)).toMatchObject({ value: { warnings: [{ type: 'density-far-from-1' }] } });
  });

  it.each([
    [0, 20],
    [-1, 20],
    [Number.NaN, 20],
    [100, 1e9],
  ])('refuses %d kPa at %d C', (kPa, C) => {
    expect(airDensity(kPa, C).ok).toBe(false);
  });
});

describe('humidityFactor', () => {
  // IEC 60052:2002, from memory: 1 at h/delta = 8.5 g/m3 and 0.2 % for each gram.
  it.each([
    [8.5, 1, 1],
    [4, 1, 0.991],
    [18.5, 1, 1.02],
    [8.075, 0.95, 1],
  ])('%d g/m3 at density %d is %d', (h, delta, k) => {
    const result = humidityFactor(h, delta);
    expect(result.ok && result.value.value).toBeCloseTo(k, 12);
  });

  it.each([
    [-1, 1],
    [1e9, 1],
    [8, 0],
    [8, Number.NaN],
  ])('refuses h %d at density %d', (h, delta) => {
    expect(humidityFactor(h, delta).ok).toBe(false);
  });
});
