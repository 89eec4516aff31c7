import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Answer } from '../units/answer';
import type { Result } from '../units/result';
import { bareClearance } from './clearance';
import { rodBreakdown, rodFieldFactor } from './capped-rods';
import { sphereBreakdown } from './curved-gap';
import { hexBarBreakdown, hexFieldFactor } from './hex-bars';
import { selfBreak } from './self-break';

const value = (result: Result<Answer>) => (result.ok ? result.value.value : Number.NaN);
const BARS = { orientation: 'flat', acrossFlats_mm: 10, cornerRadius_mm: 0.5 } as const;
const POINT = { gap_cm: 0.3, pressure_bar_abs: 2, temperature_C: 20 };
const SETUP = {
  gas: 'air',
  gap_mm: 3,
  u_gap_mm: 0.05,
  pressure: { bar_abs: 2 },
  u_pressure_bar: 0.02,
  temperature_C: 20,
  u_temperature_C: 3,
  irradiated: true,
} as const;

describe('hexBarBreakdown', () => {
  it('rises with pressure and with gap, and falls with heat', () => {
    const at = (change: Partial<typeof POINT>) => value(hexBarBreakdown({ ...BARS, ...POINT, ...change }));
    expect(at({ pressure_bar_abs: 2.1 })).toBeGreaterThan(at({}));
    expect(at({ gap_cm: 0.31 })).toBeGreaterThan(at({}));
    expect(at({ temperature_C: 60 })).toBeLessThan(at({}));
  });

  it('falls as the corners get sharper', () => {
    const at = (cornerRadius_mm: number) =>
      value(hexBarBreakdown({ ...BARS, ...POINT, orientation: 'edge', cornerRadius_mm }));
    expect(at(0.1)).toBeLessThan(at(0.3));
    expect(at(0.3)).toBeLessThan(at(1));
  });

  it.each([
    [{ cornerRadius_mm: 0.01 }, 'cornerRadius_mm'],
    [{ cornerRadius_mm: Number.NaN }, 'cornerRadius_mm'],
    [{ cornerRadius_mm: 5 }, 'cornerRadius_mm'],
    [{ acrossFlats_mm: Infinity }, 'acrossFlats_mm'],
    [{ gap_cm: 0.01 }, 'gap_mm'],
    [{ gap_cm: 3 }, 'gap_mm'],
    [{ pressure_bar_abs: -1 }, 'pressure'],
    [{ pressure_bar_abs: 0.01 }, 'pressure'],
    [{ temperature_C: 1000 }, 'temperature_C'],
  ])('refuses %j beside %s', (change, field) => {
    expect(hexBarBreakdown({ ...BARS, ...POINT, ...change })).toMatchObject({
      ok: false,
      refusal: { field },
    });
  });

  it('gives a finite factor of 1 or more, or a refusal, for any shape', () => {
    fc.assert(
      fc.property(
        fc.constantFrom('flat', 'edge'),
        fc.double(),
        fc.double(),
        (...[orientation, cornerOverFlats, gapOverFlats]) => {
          const result = hexFieldFactor({ orientation, cornerOverFlats, gapOverFlats });
          return !result.ok || Number.isFinite(result.value.value);
        },
      ),
      { numRuns: 50 },
    );
    fc.assert(
      fc.property(
        fc.constantFrom('flat', 'edge'),
        fc.double({ min: 0.005, max: 0.45, noNaN: true }),
        fc.double({ min: 0.02, max: 2, noNaN: true }),
        (...[orientation, cornerOverFlats, gapOverFlats]) => {
          const factor = value(hexFieldFactor({ orientation, cornerOverFlats, gapOverFlats }));
          return factor > 0.99 && factor < 6;
        },
      ),
      { numRuns: 12 },
    );
  });
});

describe('the self-break of bars', () => {
  const HEX = { shape: 'hex-bars', flats_mm: 10, corner_mm: 0.5, facing: 'flats' } as const;
  const bars = (change: object = {}, setup: object = {}) =>
    selfBreak({ ...SETUP, ...setup, electrodes: { ...HEX, ...change } });

  it('has both sides around the law, the low one by the edges', () => {
    const both = bars();
    const edge = bars({ facing: 'edges' });
    if (!both.ok || !edge.ok) throw new Error('refused');
    expect(both.value.low_kV).toBe(edge.value.low_kV);
    expect(both.value.low_kV).toBeLessThan(edge.value.law_kV);
    expect(both.value.law_kV).toBeGreaterThan(edge.value.law_kV);
    expect(both.value.high_kV).toBeGreaterThan(both.value.law_kV);
    const types = both.value.warnings.map(({ type }) => type);
    expect(types).toContain('bars-by-computation');
    expect(types).toContain('plan-with-edges');
    expect(both.value.model).toContain('hexagonal bars flat to flat, 10\u2009mm across flats');
  });

  it('has the voltage of the bars alone as its law', () => {
    const both = bars();
    expect(both.ok && both.value.law_kV).toBe(value(hexBarBreakdown({ ...BARS, ...POINT })));
  });

  it.each([
    [{}, { gas: 'O2' }, 'gas'],
    [{}, { gap_mm: Number.NaN }, 'gap_mm'],
    [{}, { u_gap_mm: 3 }, 'u_gap_mm'],
    [{}, { gap_mm: 0.22 }, 'gap_mm'],
    [{}, { gap_mm: 20 }, 'gap_mm'],
    [{ flats_mm: null }, {}, 'flats_mm'],
    [{ flats_mm: 600 }, {}, 'flats_mm'],
    [{ corner_mm: undefined }, {}, 'corner_mm'],
    [{ corner_mm: 0.04 }, {}, 'corner_mm'],
    [{ corner_mm: 4.6 }, {}, 'corner_mm'],
    [{ facing: null }, {}, 'facing'],
  ])('refuses bars %j in a setting %j beside %s', (change, setup, field) => {
    expect(bars(change, setup)).toMatchObject({ ok: false, refusal: { field } });
  });
});

describe('rods', () => {
  it('are spheres at small gaps', () => {
    const rods = value(rodBreakdown({ radius_cm: 1, ...POINT }));
    const spheres = value(sphereBreakdown({ diameter_cm: 2, ...POINT }));
    expect(Math.abs(rods / spheres - 1)).toBeLessThan(2e-4);
  });

  it('hold a little more than spheres at wide gaps', () => {
    const wide = { ...POINT, gap_cm: 2 };
    expect(value(rodBreakdown({ radius_cm: 0.5, ...wide }))).toBeGreaterThan(
      value(sphereBreakdown({ diameter_cm: 1, ...wide })),
    );
  });

  it('have both sides, the low one never above the spheres\u2019', () => {
    const rods = selfBreak({ ...SETUP, electrodes: { shape: 'capped-rods', radius_mm: 3 } });
    const spheres = selfBreak({ ...SETUP, electrodes: { shape: 'sphere', radius_mm: 3 } });
    if (!rods.ok || !spheres.ok) throw new Error('refused');
    expect(rods.value.low_kV).toBeLessThanOrEqual(spheres.value.low_kV * 1.001);
    expect(rods.value.high_kV).toBe(spheres.value.high_kV);
    expect(rods.value.law_kV).toBeGreaterThan(rods.value.low_kV);
  });

  it.each([
    [{ radius_mm: null }, 'radius_mm'],
    [{ radius_mm: 0 }, 'radius_mm'],
    [{ radius_mm: 0.5 }, 'gap_mm'],
    [{ rod_length_mm: 1 }, 'rod_length_mm'],
    [{ rod_length_mm: Number.NaN }, 'rod_length_mm'],
    [{ rod_length_mm: 700 }, 'rod_length_mm'],
  ])('refuse %j beside %s', (change, field) => {
    const electrodes = { shape: 'capped-rods', radius_mm: 3, ...change } as const;
    expect(selfBreak({ ...SETUP, electrodes })).toMatchObject({ ok: false, refusal: { field } });
  });

  it('take twenty radii for a straight part that is not said', () => {
    const at = (rod_length_mm?: number) =>
      selfBreak({ ...SETUP, electrodes: { shape: 'capped-rods', radius_mm: 3, rod_length_mm } });
    expect(at()).toEqual(at(60));
    expect(at()).not.toEqual(at(6));
  });

  it.each([
    [Number.NaN, 20],
    [0, 20],
    [21, 20],
    [1, 0.1],
    [1, Infinity],
  ])('refuse a gap of %d and a shaft of %d radii', (gap, shaft) => {
    expect(rodFieldFactor(gap, shaft).ok).toBe(false);
  });

  it('refuse to speak of corona', () => {
    expect(rodBreakdown({ radius_cm: 0.05, ...POINT })).toMatchObject({
      refusal: { type: 'gap-too-wide-for-radius' },
    });
  });
});

describe('bareClearance', () => {
  it('is three needle gaps, and the table\u2019s first row below it', () => {
    expect(value(bareClearance(20))).toBeCloseTo(52.5, 9);
    expect(value(bareClearance(1))).toBeCloseTo(12.6, 9);
  });

  it.each([-1, 40.1, Number.NaN, Infinity])('refuses %d kV', (kV) => {
    expect(bareClearance(kV)).toMatchObject({ refusal: { field: 'voltage_kV' } });
  });

  it('never falls with voltage', () => {
    const kV = fc.double({ min: 0, max: 40, noNaN: true });
    fc.assert(
      fc.property(
        kV,
        kV,
        (a, b) => value(bareClearance(Math.min(a, b))) <= value(bareClearance(Math.max(a, b))) + 1e-9,
      ),
    );
  });
});
