import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { GapInput, GapSetup } from './gap-input';
import { gapFor, pressureFor, type GapPurpose } from './gap-solve';
import { selfBreak } from './self-break';

const KETTLE: GapInput = {
  gas: 'N2',
  electrodes: { shape: 'domed', radius_mm: 12 },
  gap_mm: 3,
  u_gap_mm: 0.05,
  pressure: { bar_abs: 1.966 },
  u_pressure_bar: 0.02,
  temperature_C: 21,
  u_temperature_C: 3,
  irradiated: true,
};
const SIDES = { 'hold-off-at-least': 'low_kV', 'break-at-most': 'high_kV', law: 'law_kV' } as const;
const PURPOSES = ['hold-off-at-least', 'break-at-most', 'law'] as const;

const at = (input: GapInput) => {
  const result = selfBreak(input);
  if (!result.ok) throw new Error(result.refusal.words);
  return result.value;
};

describe('solving for pressure and gap', () => {
  it.each(PURPOSES)('undoes selfBreak for %s', (purpose) => {
    const voltage_kV = at(KETTLE)[SIDES[purpose]];
    expect(pressureFor(KETTLE, { purpose, voltage_kV })).toMatchObject({
      ok: true,
      value: { unit: 'bar(abs)', purpose },
    });
    const pressure = pressureFor(KETTLE, { purpose, voltage_kV });
    const gap = gapFor(KETTLE, { purpose, voltage_kV });
    if (!pressure.ok || !gap.ok) throw new Error('refused');
    expect(Math.abs(pressure.value.value / 1.966 - 1)).toBeLessThan(1e-9);
    expect(Math.abs(gap.value.value / 3 - 1)).toBeLessThan(1e-9);
    expect(pressure.value.all).toHaveLength(1);
  });

  it('leans on the low side to hold off and on the high side to break', () => {
    const bar = (purpose: GapPurpose) => {
      const result = pressureFor(KETTLE, { purpose, voltage_kV: 18 });
      return result.ok ? result.value : undefined;
    };
    const hold = bar('hold-off-at-least');
    const law = bar('law');
    const breaks = bar('break-at-most');
    expect(hold).toMatchObject({ leansOn: 'low', rounding: 'up' });
    expect(breaks).toMatchObject({ leansOn: 'high', rounding: 'down' });
    expect(law).toMatchObject({ leansOn: 'law', rounding: 'nearest' });
    expect(hold?.value).toBeGreaterThan(law?.value ?? Infinity);
    expect(breaks?.value).toBeLessThan(law?.value ?? 0);
    expect(hold?.gap.low_kV).toBeGreaterThanOrEqual(18);
    expect(breaks?.gap.high_kV).toBeLessThanOrEqual(18);
    expect(law?.gap.law_kV).toBeCloseTo(18, 9);
  });

  it('agrees with the closed form in a uniform gap: 15 kV, 3 mm of air at 1.447 bar(abs)', () => {
    const plane: GapSetup = { ...KETTLE, gas: 'air', electrodes: { shape: 'plane' }, temperature_C: 20 };
    const result = pressureFor(plane, { purpose: 'law', voltage_kV: 15 });
    expect(result.ok && result.value.value).toBeCloseTo(1.447, 3);
  });

  it('keeps the target across the jump where the low side changes its factor', () => {
    const small: GapSetup = {
      ...KETTLE,
      gas: 'air',
      electrodes: { shape: 'plane' },
      gap_mm: 1,
      u_gap_mm: 0,
      u_pressure_bar: 0,
      u_temperature_C: 0,
      temperature_C: 20,
    };
    // 0.05 bar cm of air: 0.90 of the law just below it, 0.95 at it; the target lies in the jump.
    const law = 24.36 * 0.05 + 6.72 * Math.sqrt(0.05);
    const result = pressureFor(small, { purpose: 'hold-off-at-least', voltage_kV: 0.92 * law });
    if (!result.ok) throw new Error(result.refusal.words);
    expect(result.value.value).toBeCloseTo(0.5, 9);
    expect(result.value.gap.low_kV).toBeGreaterThanOrEqual(0.92 * law);
  });

  const setup = fc.record({
    gas: fc.constantFrom('air', 'N2', 'SF6', 'CO2', 'H2'),
    gap_mm: fc.double({ min: 1, max: 6, noNaN: true }),
    bar_abs: fc.double({ min: 0.6, max: 4.5, noNaN: true }),
    shape: fc.constantFrom('domed', 'cylinder', 'plane'),
    purpose: fc.constantFrom(...PURPOSES),
  });

  it('undoes selfBreak for any gap, both ways, within 1e-6', () => {
    fc.assert(
      fc.property(setup, ({ gas, gap_mm, bar_abs, shape, purpose }) => {
        const input = {
          ...KETTLE,
          gas,
          gap_mm,
          pressure: { bar_abs },
          electrodes: { shape, radius_mm: 12 },
        } as GapInput;
        const voltage_kV = at(input)[SIDES[purpose]];
        const pressure = pressureFor(input, { purpose, voltage_kV });
        const gap = gapFor(input, { purpose, voltage_kV });
        return (
          pressure.ok &&
          Math.abs(pressure.value.value / bar_abs - 1) < 1e-6 &&
          gap.ok &&
          Math.abs(gap.value.value / gap_mm - 1) < 1e-6
        );
      }),
      { numRuns: 25 },
    );
  });
});

describe('no solution', () => {
  it.each(PURPOSES)('is said in words with the nearest limit for %s', (purpose) => {
    const beyond = pressureFor(KETTLE, { purpose, voltage_kV: 300 });
    expect(beyond).toMatchObject({ ok: false, refusal: { type: 'not-reached', field: 'pressure' } });
    if (!beyond.ok) expect(beyond.refusal.words).toContain('5.00\u2009bar(abs)');
    const below = gapFor(KETTLE, { purpose, voltage_kV: 0.1 });
    expect(below).toMatchObject({ ok: false, refusal: { type: 'already-above', field: 'gap_mm' } });
  });

  it('says what the gap does at the limit, rounded to its own side', () => {
    const hold = pressureFor(KETTLE, { purpose: 'hold-off-at-least', voltage_kV: 300 });
    const breaks = pressureFor(KETTLE, { purpose: 'break-at-most', voltage_kV: 1 });
    expect(!hold.ok && hold.refusal.words).toMatch(/nothing fires below [\d.]+\u2009kV/);
    expect(!breaks.ok && breaks.refusal.words).toMatch(/it may hold up to [\d.]+\u2009kV/);
  });

  it('is said where setting errors leave no range at all', () => {
    expect(
      pressureFor({ ...KETTLE, gap_mm: 0.03, u_gap_mm: 0.029 }, { purpose: 'law', voltage_kV: 5 }),
    ).toMatchObject({
      ok: false,
      refusal: { type: 'no-range', field: 'pressure' },
    });
    const u_pressure_bar = 1.966;
    expect(gapFor({ ...KETTLE, u_pressure_bar }, { purpose: 'law', voltage_kV: 5 })).toMatchObject({
      ok: false,
      refusal: { type: 'no-range', field: 'gap_mm' },
    });
  });
});

describe('bad input', () => {
  it.each([Number.NaN, Infinity, 0, -5, 1e9])('is refused beside the voltage: %d kV', (voltage_kV) => {
    for (const purpose of PURPOSES) {
      expect(pressureFor(KETTLE, { purpose, voltage_kV })).toMatchObject({
        refusal: { field: 'voltage_kV' },
      });
      expect(gapFor(KETTLE, { purpose, voltage_kV })).toMatchObject({ refusal: { field: 'voltage_kV' } });
    }
  });

  it.each([
    [{ gap_mm: Number.NaN }, 'gap_mm'],
    [{ temperature_C: 1e9 }, 'temperature_C'],
    [{ u_gap_mm: -1 }, 'u_gap_mm'],
    [{ gas: 'O2' as const }, 'gas'],
    [{ electrodes: { shape: 'sphere' as const } }, 'radius_mm'],
  ])('is refused beside its field when solving for pressure: %j', (change, field) => {
    expect(pressureFor({ ...KETTLE, ...change }, { purpose: 'law', voltage_kV: 10 })).toMatchObject({
      refusal: { field },
    });
  });

  it.each([
    [{ pressure: { bar_abs: Number.NaN } }, 'pressure'],
    [{ pressure: { bar_abs: 1e9 } }, 'pressure'],
    [{ temperature_C: Number.NaN }, 'temperature_C'],
    [{ u_gap_mm: Number.NaN }, 'u_gap_mm'],
    [{ u_pressure_bar: Infinity }, 'u_pressure_bar'],
    [{ electrodes: { shape: 'sphere' as const, radius_mm: -1 } }, 'radius_mm'],
  ])('is refused beside its field when solving for the gap: %j', (change, field) => {
    expect(gapFor({ ...KETTLE, ...change }, { purpose: 'law', voltage_kV: 10 })).toMatchObject({
      refusal: { field },
    });
  });
});
