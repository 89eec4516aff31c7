import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { arcThreshold, hazardBand, heatThreshold, reflexThreshold, shockThreshold } from './hazard';
import { exceedsTouchLimit, touchVerdict } from './touch';

describe('exceedsTouchLimit', () => {
  // IEC 60335-1, 8.1.4: 45 uC from 450 V to 15 kV, 350 mJ above (read in quotation); 0.1 uF below (from memory).
  it.each([
    [2e-9, 20_000, true],
    [1.5e-9, 20_000, false],
    [1e-9, 15_000, false],
    [3.1e-9, 15_000, true],
    [2.9e-9, 15_000, false],
    [1e-7, 500, true],
    [1e-7, 449, false],
    [1.1e-7, 449, true],
    [1, 40, false],
  ])('%d F at %d V: %s', (C, V, exceeds) => {
    expect(exceedsTouchLimit(C, V)).toEqual({ ok: true, value: exceeds });
  });

  it.each([
    [Number.NaN, 1000],
    [0, 1000],
    [1e-9, -1],
    [1e-9, Infinity],
  ])('refuses %d F at %d V', (C, V) => {
    expect(exceedsTouchLimit(C, V).ok).toBe(false);
  });
});

describe('thresholds', () => {
  // Reflex above 400 V read (NFPA 70E), 100 to 400 V from memory; shock and arc lines of a laboratory's page, read.
  it.each([
    [100, 1],
    [400, 1],
    [401, 0.25],
    [20_000, 0.25],
  ])('reflex at %d V is %d J', (V, J) => {
    expect(reflexThreshold(V)).toMatchObject({ value: { value: J, unit: 'J' } });
  });

  it('shock is 10 J and arc 10 kJ from 100 V', () => {
    expect(shockThreshold(100)).toMatchObject({ value: { value: 10 } });
    expect(arcThreshold(5000)).toMatchObject({ value: { value: 10_000 } });
  });

  it.each([99, Number.NaN, -1])('say nothing at %d V', (V) => {
    for (const of of [reflexThreshold, shockThreshold, arcThreshold]) expect(of(V).ok).toBe(false);
  });
});

describe('hazardBand', () => {
  it.each([
    [0.88e-9, 10, 'below-reflex'],
    [2e-9, 20, 'reflex'],
    [5e-9, 25, 'serious-injury'],
    [100e-9, 20, 'may-kill'],
    [10e-6, 20, 'blast'],
  ])('%d F at %d kV: %s', (C, kV, type) => {
    expect(hazardBand(C, { kV, mA: 1 })).toMatchObject({ ok: true, value: { type } });
  });

  it('stands with the supply beside it and rounds the energy up', () => {
    const result = hazardBand(5e-9, { kV: 25, mA: 1.5 });
    expect(result.ok && result.value.words).toMatch(
      /^1\.57\u2009J at the supply\u2019s 25\u2009kV and 1\.5\u2009mA: /,
    );
    expect(result).toMatchObject({ value: { exceedsTouchLimit: true } });
  });

  it('never calls an energy minor, small or safe, whatever it is', () => {
    const C = fc.double({ min: 1e-12, max: 1e-3, noNaN: true });
    fc.assert(
      fc.property(C, fc.double({ min: 0.1, max: 100, noNaN: true }), (capacitance, kV) => {
        const result = hazardBand(capacitance, { kV, mA: 1 });
        return (
          result.ok &&
          !/minor|small|safe|harmless/i.test(result.value.words) &&
          /kill/.test(result.value.words)
        );
      }),
    );
  });

  it.each([
    [Number.NaN, 10, 'capacitance_F'],
    [1e-9, Number.NaN, 'supply_kV'],
    [1e-9, 1e9, 'supply_kV'],
  ])('refuses %d F at %d kV beside %s', (C, kV, field) => {
    expect(hazardBand(C, { kV, mA: 1 })).toMatchObject({ refusal: { field } });
  });
});

describe('what a verdict rests on', () => {
  it('gives the touch limit with what it is on', () => {
    expect(touchVerdict(2e-9, 20_000)).toMatchObject({
      ok: true,
      value: { exceeds: true, measured: { unit: 'J' }, limit: { value: 0.35 }, model: 'IEC 60335-1, 8.1.4' },
    });
    expect(touchVerdict(2e-9, 10_000)).toMatchObject({
      value: { exceeds: false, measured: { unit: 'C' }, warnings: [{ type: 'still-painful' }] },
    });
    expect(touchVerdict(1e-6, 42)).toMatchObject({ value: { exceeds: false } });
    expect(touchVerdict(1e-6, 43)).toMatchObject({ value: { exceeds: true, limit: { unit: 'F' } } });
  });

  it('carries energy and limit beside the band, and speaks of X-rays above 30 kV', () => {
    const low = hazardBand(2e-9, { kV: 20, mA: 1 });
    expect(low.ok && low.value.energy.value).toBeCloseTo(0.4, 12);
    expect(low.ok && low.value.valid).not.toBe('');
    expect(low.ok && low.value.warnings.map(({ type }) => type)).toEqual(['over-touch-limit']);
    const high = hazardBand(2e-9, { kV: 31, mA: 1 });
    expect(high.ok && high.value.warnings.map(({ type }) => type)).toContain('x-rays');
  });

  it('keeps the heat line for low voltages', () => {
    expect(heatThreshold(48)).toMatchObject({ value: { value: 100, unit: 'J' } });
    expect(heatThreshold(101)).toMatchObject({ ok: false });
  });
});
