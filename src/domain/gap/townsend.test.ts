import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Answer } from '../units/answer';
import type { Result } from '../units/result';
import { PASCHEN_MINIMA } from './gas-table';
import { forcedB, gammaFromMinimum, pdMinFromGamma, townsendOvershoot, townsendVoltage } from './townsend';

const AIR = { A_per_cm_Torr: 15, B_V_per_cm_Torr: 365 };
const value = (result: Result<Answer>) => (result.ok ? result.value.value : Number.NaN);

describe('townsendVoltage', () => {
  it('has its minimum at e ln(1 + 1/gamma)/A, with E/p exactly B there', () => {
    for (const gamma of [0.001, 0.01, 0.1]) {
      const pdMin = (Math.E * Math.log(1 + 1 / gamma)) / 15;
      const lowest = value(townsendVoltage({ ...AIR, gamma }, pdMin));
      expect(lowest / pdMin).toBeCloseTo(365, 8);
      expect(value(townsendVoltage({ ...AIR, gamma }, pdMin * 1.01))).toBeGreaterThan(lowest);
      expect(value(townsendVoltage({ ...AIR, gamma }, pdMin * 0.99))).toBeGreaterThan(lowest);
    }
  });

  it('has no value at its pole and left of it, and says what that means', () => {
    const pole = Math.log(101) / 15;
    for (const pd of [pole, pole * 0.5, 1e-6]) {
      expect(townsendVoltage({ ...AIR, gamma: 0.01 }, pd)).toMatchObject({
        ok: false,
        refusal: { type: 'no-breakdown-by-this-form', field: 'pd_Torr_cm' },
      });
    }
  });

  it('warns outside the E/p range of the gas, where textbooks overshoot', () => {
    expect(townsendVoltage({ ...AIR, gamma: 0.01 }, 700, 'air')).toMatchObject({
      value: { warnings: [{ type: 'outside-E-over-p' }] },
    });
    expect(townsendVoltage({ ...AIR, gamma: 0.01 }, 2, 'air')).toMatchObject({ value: { warnings: [] } });
  });

  it('gives a positive finite number or a refusal for any input', () => {
    fc.assert(
      fc.property(fc.double(), fc.double(), fc.double(), fc.double(), (...[A, B, gamma, pd]) => {
        const result = townsendVoltage({ A_per_cm_Torr: A, B_V_per_cm_Torr: B, gamma }, pd);
        return !result.ok || (Number.isFinite(result.value.value) && result.value.value > 0);
      }),
    );
  });
});

describe('calibrating gamma', () => {
  it('matches the voltage of the minimum and misses its place: air 0.896 against 0.567 Torr cm', () => {
    const minimum = { ...AIR, voltage_V: PASCHEN_MINIMA.air.voltage_V };
    const gamma = value(gammaFromMinimum(minimum));
    const pdMin = value(pdMinFromGamma(minimum));
    expect(gamma).toBeCloseTo(0.00718, 5);
    expect(pdMin).toBeCloseTo(0.8959, 4);
    expect(value(townsendVoltage({ ...AIR, gamma }, pdMin))).toBeCloseTo(327, 8);
  });

  it('meets both coordinates only with another B: air 577', () => {
    expect(value(forcedB(327, 0.567))).toBeCloseTo(576.7, 1);
  });

  it.each([0, -1, Number.NaN, Infinity])('refuses a voltage of %d', (voltage_V) => {
    expect(gammaFromMinimum({ ...AIR, voltage_V }).ok).toBe(false);
    expect(pdMinFromGamma({ ...AIR, voltage_V }).ok).toBe(false);
    expect(forcedB(voltage_V, 1).ok).toBe(false);
  });
});

describe('townsendOvershoot', () => {
  // Own computation in two ways: 9 % at 1 atm and 1 mm, 14 % at 2 bar and 3 mm, 12 % at 3 bar and 5 mm.
  it.each([
    [1.01325, 0.1, 0.09],
    [2, 0.3, 0.137],
    [3, 0.5, 0.12],
    [4, 1, 0.075],
  ])('at %d bar and %d cm the textbook form is %d too high', (bar, cm, over) => {
    expect(Math.abs(value(townsendOvershoot(bar, cm)) - over)).toBeLessThan(0.01);
  });

  it('refuses where the law itself does', () => {
    expect(townsendOvershoot(-1, 1).ok).toBe(false);
  });
});
