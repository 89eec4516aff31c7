import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Answer } from '../units/answer';
import type { Result } from '../units/result';
import { flowTime, freeVolumeIdeal, freeVolumeReal } from './cylinder';
import { nitrogenCompressibility } from './nitrogen-state';
import { purgeResidual, purgeVolumes } from './purge';
import { hoopStress, storedEnergyBrode, storedEnergyIsothermal, storedGasEnergy } from './vessel';

const value = (result: Result<Answer>) => (result.ok ? result.value.value : Number.NaN);
const FULL = { volume_L: 50, pressure_bar_abs: 200, temperature_C: 20 };

describe('nitrogen in a cylinder', () => {
  it('is 5 % less than the ideal gas says when full, a little more below 90 bar', () => {
    expect(value(freeVolumeReal(FULL)) / value(freeVolumeIdeal(FULL))).toBeCloseTo(0.9505, 3);
    const low = { ...FULL, pressure_bar_abs: 50 };
    expect(value(freeVolumeReal(low))).toBeGreaterThan(value(freeVolumeIdeal(low)));
  });

  it('is ideal in thin gas and has no step there', () => {
    expect(value(nitrogenCompressibility(0, 20))).toBe(1);
    expect(value(nitrogenCompressibility(0.00101, 20))).toBeCloseTo(1, 6);
  });

  it('rises with pressure in all its range', () => {
    const bar = fc.double({ min: 0.01, max: 350, noNaN: true });
    const C = fc.double({ min: -40, max: 100, noNaN: true });
    fc.assert(
      fc.property(bar, bar, C, (...[a, b, temperature_C]) => {
        const at = (pressure_bar_abs: number) =>
          value(freeVolumeReal({ volume_L: 50, pressure_bar_abs, temperature_C }));
        return at(Math.min(a, b)) <= at(Math.max(a, b)) * (1 + 1e-9);
      }),
      { numRuns: 40 },
    );
  });

  it('feeds 5 L/min for thirty hours from 200 bar down to 3', () => {
    expect(value(flowTime(FULL, { flow_L_min: 5, rest_bar_abs: 3 })) / 60).toBeCloseTo(30.25, 0);
    expect(value(flowTime(FULL, { flow_L_min: 5, rest_bar_abs: 200 }))).toBe(0);
    expect(flowTime(FULL, { flow_L_min: 5, rest_bar_abs: 201 })).toMatchObject({
      refusal: { field: 'rest_bar_abs' },
    });
    expect(flowTime(FULL, { flow_L_min: 0, rest_bar_abs: 3 })).toMatchObject({
      refusal: { field: 'flow_L_min' },
    });
  });

  it.each([Number.NaN, Infinity, -1, 351])('is refused at %d bar', (bar) => {
    expect(nitrogenCompressibility(bar, 20)).toMatchObject({ refusal: { field: 'pressure' } });
    expect(freeVolumeReal({ ...FULL, pressure_bar_abs: bar }).ok).toBe(false);
    expect(freeVolumeIdeal({ ...FULL, pressure_bar_abs: bar }).ok).toBe(false);
  });
});

describe('purge', () => {
  it('is undone by its inverse', () => {
    fc.assert(
      fc.property(fc.double({ min: 0, max: 20, noNaN: true }), (volumes) => {
        return Math.abs(value(purgeVolumes(value(purgeResidual(volumes)))) - volumes) < 1e-6;
      }),
    );
    expect(purgeVolumes(0).ok).toBe(false);
    expect(purgeVolumes(1.1).ok).toBe(false);
  });
});

describe('pressed gas', () => {
  const body = { pressure_bar_abs: 4, ambient_bar_abs: 1.01325, volume_L: 0.1 };

  it('holds 75 J by Brode and 55 J at one temperature: 0.1 L at 4 bar(abs)', () => {
    expect(value(storedEnergyBrode(body))).toBeCloseTo(74.67, 2);
    expect(value(storedEnergyIsothermal(body))).toBeCloseTo(54.9, 1);
  });

  it('refuses less than the ambient', () => {
    expect(storedEnergyBrode({ ...body, pressure_bar_abs: 0.9 })).toMatchObject({
      refusal: { field: 'pressure' },
    });
    expect(storedEnergyIsothermal({ ...body, ambient_bar_abs: 0 })).toMatchObject({
      refusal: { field: 'ambient' },
    });
  });

  it('strains a thin wall as p r/t, and acrylic too far', () => {
    const thin = { pressure_bar_g: 3, inner_mm: 100, outer_mm: 101 };
    expect(value(hoopStress(thin)) / ((0.3 * 100.5) / 1)).toBeCloseTo(1, 3);
    expect(hoopStress(thin)).toMatchObject({ value: { warnings: [{ type: 'stress-high' }] } });
    expect(hoopStress({ pressure_bar_g: 3, inner_mm: 15, outer_mm: 20 })).toMatchObject({
      value: { warnings: [] },
    });
    expect(hoopStress({ pressure_bar_g: 3, inner_mm: 15, outer_mm: 15 })).toMatchObject({
      refusal: { field: 'outer_mm' },
    });
  });
});

describe('the energy to show for a vessel', () => {
  // 0.1 L at 4 bar(abs): Brode 75 J, isothermal 55 J (physics P). Higher up the isothermal one is the larger.
  it('is the larger of both, with the smaller in its band', () => {
    const body = { pressure_bar_abs: 4, ambient_bar_abs: 1.01325, volume_L: 0.1 };
    const shown = storedGasEnergy(body);
    expect(value(shown)).toBeCloseTo(74.67, 2);
    expect(shown.ok && shown.value.band.low).toBeLessThanOrEqual(value(storedEnergyIsothermal(body)));
    const full = { ...body, pressure_bar_abs: 200 };
    expect(value(storedGasEnergy(full))).toBe(value(storedEnergyIsothermal(full)));
    expect(storedGasEnergy({ ...body, pressure_bar_abs: Number.NaN }).ok).toBe(false);
  });
});
