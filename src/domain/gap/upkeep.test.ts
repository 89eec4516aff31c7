import { describe, expect, it } from 'vitest';
import { highFieldFactor, highFieldShare } from './high-field';
import { needleGap } from './needle-gap';
import { erosionGrowth, purgeFlow } from './upkeep';

describe('highFieldFactor', () => {
  // Common practice: 3 % a MV/m above 10, floor 0.70.
  it.each([
    [0, 1],
    [8, 1],
    [10, 1],
    [12, 0.94],
    [20, 0.7],
    [100, 0.7],
  ])('at %d MV/m is %d', (field, factor) => {
    expect(highFieldShare(field)).toBeCloseTo(factor, 12);
    expect(highFieldFactor(field)).toMatchObject({ ok: true, value: { value: highFieldShare(field) } });
  });

  it.each([-1, Number.NaN, 1e9])('refuses %d MV/m', (field) => {
    expect(highFieldFactor(field).ok).toBe(false);
  });

  it('lets voltage times factor still rise with voltage, so that the low side has one answer', () => {
    for (let field = 1; field < 40; field += 0.25) {
      expect((field + 0.25) * highFieldShare(field + 0.25)).toBeGreaterThan(field * highFieldShare(field));
    }
  });
});

describe('purgeFlow', () => {
  it('is three volumes a shot: 0.5 cm3 at 20 Hz, 1.8 L/min', () => {
    const result = purgeFlow({ volume_cm3: 0.5, rate_Hz: 20, volumes: 3 });
    expect(result.ok && result.value.value).toBeCloseTo(1.8, 12);
  });

  it.each([
    [{ volume_cm3: 0, rate_Hz: 1, volumes: 3 }, 'volume_cm3'],
    [{ volume_cm3: 1, rate_Hz: -1, volumes: 3 }, 'rate_Hz'],
    [{ volume_cm3: 1, rate_Hz: 1, volumes: Number.NaN }, 'volumes'],
  ])('refuses %j beside %s', (gap, field) => {
    expect(purgeFlow(gap)).toMatchObject({ refusal: { field } });
  });
});

describe('erosionGrowth', () => {
  const wear = { yield_ucm3_per_C: 5, charge_C: 120e-6, shots: 1e6, area_cm2: 0.2 };

  it('gives the worked example, 30 um, within a factor of 3', () => {
    const result = erosionGrowth(wear);
    if (!result.ok) throw new Error('refused');
    expect(result.value.value).toBeCloseTo(30, 9);
    expect(result.value.band.low).toBeCloseTo(10, 9);
    expect(result.value.band.high).toBeCloseTo(90, 9);
  });

  it.each([
    [{ ...wear, yield_ucm3_per_C: -1 }, 'yield'],
    [{ ...wear, charge_C: Infinity }, 'charge_C'],
    [{ ...wear, shots: Number.NaN }, 'shots'],
    [{ ...wear, area_cm2: 0 }, 'area_cm2'],
  ])('refuses %j beside %s', (bad, field) => {
    expect(erosionGrowth(bad)).toMatchObject({ refusal: { field } });
  });
});

describe('needleGap', () => {
  // AIEE table of needle points, read in a public reprint.
  it.each([
    [5, 0.42],
    [20, 1.75],
    [22, 1.93],
    [40, 3.81],
  ])('at %d kV peak is %d cm', (kV, cm) => {
    const result = needleGap(kV);
    expect(result.ok && result.value.value).toBeCloseTo(cm, 10);
  });

  it('asks for three times as much in its words', () => {
    const result = needleGap(10);
    expect(result.ok && result.value.valid).toContain('three times');
  });

  it.each([4.9, 40.1, Number.NaN, -10])('refuses %d kV, outside its table', (kV) => {
    expect(needleGap(kV)).toMatchObject({ refusal: { field: 'voltage_kV' } });
  });
});
