import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { PASCHEN_MINIMA } from './gas-table';
import {
  isMonotone,
  lowPdVoltage,
  paschenMinimumPd,
  paschenMinimumVoltage,
  universalPaschen,
} from './low-pd';

const GASES = ['air', 'N2', 'CO2', 'SF6', 'H2'] as const;
const volt = (gas: string, pd: number) => {
  const result = lowPdVoltage(gas, pd);
  return result.ok ? result.value.value : Number.NaN;
};

describe('stitched low-pd curve', () => {
  // Own computation for air, V: another published parameterisation differs by 3 to 9 %.
  it.each([
    [1, 349],
    [2, 440],
    [3, 533],
    [5, 711],
    [7.5, 915],
    [10, 1101],
  ])('air at %d Torr cm is %d V', (pd, expected) => {
    expect(Math.abs(volt('air', pd) - expected)).toBeLessThan(1);
  });

  it.each(GASES)('passes for %s through the published minimum', (gas) => {
    const { voltage_V, pd_Torr_cm } = PASCHEN_MINIMA[gas];
    expect(volt(gas, pd_Torr_cm)).toBeCloseTo(voltage_V, 8);
  });

  it.each([
    ['air', 10],
    ['N2', 10],
    ['CO2', 10],
    ['SF6', 7.5],
    ['H2', 20],
  ] as const)('joins for %s at %d Torr cm without a step in height or slope', (gas, join) => {
    const h = 1e-5;
    const left = Math.log(volt(gas, join * (1 - h)) / volt(gas, join * (1 - 2 * h)));
    const right = Math.log(volt(gas, join * (1 + 2 * h)) / volt(gas, join * (1 + h)));
    expect(volt(gas, join * (1 + 1e-12)) / volt(gas, join * (1 - 1e-12))).toBeCloseTo(1, 9);
    expect(left / right).toBeCloseTo(1, 2);
  });

  it('rises strictly from the minimum on, for any two points', () => {
    const share = fc.double({ min: 0, max: 1, noNaN: true });
    fc.assert(
      fc.property(fc.constantFrom(...GASES), share, share, (gas, a, b) => {
        const from = PASCHEN_MINIMA[gas].pd_Torr_cm;
        const at = (t: number) => from * (50_000 / from) ** t;
        const [low, high] = a < b ? [a, b] : [b, a];
        return high - low < 1e-6 || volt(gas, at(high)) > volt(gas, at(low));
      }),
    );
  });

  it.each(GASES)('isMonotone says so for %s', (gas) => {
    expect(isMonotone(gas)).toEqual({ ok: true, value: true });
  });

  it('is flagged left of the minimum, and refused where the form ends', () => {
    expect(lowPdVoltage('air', 0.4)).toMatchObject({
      value: { valid: 'not for design', warnings: [{ type: 'left-of-minimum' }] },
    });
    expect(volt('air', 0.4)).toBeGreaterThan(327);
    expect(lowPdVoltage('air', 0.567 / Math.E)).toMatchObject({
      refusal: { type: 'no-breakdown-by-this-form' },
    });
    expect(lowPdVoltage('air', 0.1).ok).toBe(false);
  });

  it.each(['O2', 'He', 'N2+CO2', 'constructor', ''])('refuses %s, which lacks a minimum or a law', (gas) => {
    expect(lowPdVoltage(gas, 5)).toMatchObject({ refusal: { type: 'gas-without-law', field: 'gas' } });
    expect(isMonotone(gas).ok).toBe(false);
  });

  it('gives a positive finite number or a refusal for any pd', () => {
    fc.assert(
      fc.property(fc.constantFrom(...GASES), fc.double(), (gas, pd) => {
        const result = lowPdVoltage(gas, pd);
        return !result.ok || (Number.isFinite(result.value.value) && result.value.value > 0);
      }),
    );
  });
});

describe('universalPaschen', () => {
  it('is 1 at the minimum and 10/(1 + ln 10) at ten times it', () => {
    expect(universalPaschen(1)).toEqual({ ok: true, value: 1 });
    expect(universalPaschen(10)).toMatchObject({ value: 10 / (1 + Math.log(10)) });
  });

  it.each([0, 0.2, 1 / Math.E, -1, Number.NaN])('refuses %d', (y) => {
    expect(universalPaschen(y).ok).toBe(false);
  });
});

describe('published minima', () => {
  // Classic handbook table, from memory; 327 V for air read in a public source.
  it.each([
    ['air', 327, 0.567],
    ['N2', 251, 0.67],
    ['H2', 273, 1.15],
    ['He', 156, 4],
    ['Ar', 137, 0.9],
    ['SF6', 507, 0.26],
  ])('%s: %d V at %d Torr cm', (gas, voltage, pd) => {
    expect(paschenMinimumVoltage(gas)).toMatchObject({ value: { value: voltage, unit: 'V' } });
    expect(paschenMinimumPd(gas)).toMatchObject({ value: { value: pd, unit: 'Torr cm' } });
  });

  it.each(['H2O', 'Kr', 'Xe', 'toString'])('has none good enough for %s', (gas) => {
    expect(paschenMinimumVoltage(gas)).toMatchObject({ refusal: { type: 'gas-without-minimum' } });
    expect(paschenMinimumPd(gas).ok).toBe(false);
  });
});
