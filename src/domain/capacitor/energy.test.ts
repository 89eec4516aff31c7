import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Answer } from '../units/answer';
import type { Result } from '../units/result';
import { bankCapacitance, plyThickness_m, sheetCapacitance } from './capacitance';
import { shotCharge, storedEnergy } from './energy';
import { airFilmField, dielectricStress, petMinimumStrength, stressMargin } from './stress';

const value = (result: Result<Answer>) => (result.ok ? result.value.value : Number.NaN);
const BAD = [Number.NaN, Infinity, -1, 1e9] as const;

describe('storedEnergy', () => {
  // Demo lab, at the working point and at the supply's limit; worked by hand.
  it.each([
    ['Heron', 7.05e-9, 12_184, 0.523],
    ['Heron at its limit', 7.05e-9, 16_000, 0.902],
    ['Kettle', 5e-9, 18_780, 0.882],
    ['Kettle at its limit', 5e-9, 25_000, 1.5625],
    ['Wren', 0.88e-9, 6370, 0.0179],
    ['Wren at its limit', 0.88e-9, 10_000, 0.044],
  ])('%s: %d F at %d V hold %d J', (...[_rig, C, V, J]) => {
    expect(Math.abs(value(storedEnergy(C, V)) / J - 1)).toBeLessThan(0.003);
  });

  it.each(BAD)('refuses %d as capacitance and as voltage', (bad) => {
    expect(storedEnergy(bad, 1000)).toMatchObject({ refusal: { field: 'capacitance_F' } });
    expect(storedEnergy(1e-9, bad)).toMatchObject({ refusal: { field: 'voltage_V' } });
  });
});

describe('sheetCapacitance', () => {
  // Heron: four plies of 175 um PET, eps_r 3.2; 300 x 320 and 300 x 260 mm.
  it.each([
    [0.3 * 0.32, 3.89],
    [0.3 * 0.26, 3.16],
  ])('%d m2 on four plies is %d nF', (area_m2, nF) => {
    const thickness = plyThickness_m(4, 175);
    expect(thickness.ok && thickness.value).toBeCloseTo(0.7e-3, 12);
    const C = sheetCapacitance({
      eps_r: 3.2,
      area_m2,
      thickness_m: thickness.ok ? thickness.value : 0,
      layers: 1,
    });
    expect(value(C) * 1e9).toBeCloseTo(nF, 2);
  });

  it('grows with active layers and falls with plies', () => {
    const sheet = { eps_r: 3.2, area_m2: 0.09, thickness_m: 125e-6, layers: 1 };
    expect(value(sheetCapacitance({ ...sheet, layers: 3 }))).toBeCloseTo(
      3 * value(sheetCapacitance(sheet)),
      20,
    );
    expect(value(sheetCapacitance({ ...sheet, thickness_m: 250e-6 }))).toBeCloseTo(
      value(sheetCapacitance(sheet)) / 2,
      20,
    );
  });

  it.each(BAD)('refuses %d in any field', (bad) => {
    const sheet = { eps_r: 3.2, area_m2: 0.09, thickness_m: 125e-6, layers: 1 };
    for (const field of ['eps_r', 'area_m2', 'thickness_m', 'layers'] as const) {
      expect(sheetCapacitance({ ...sheet, [field]: bad })).toMatchObject({ refusal: { field } });
    }
    expect(plyThickness_m(bad, 175).ok).toBe(false);
    expect(plyThickness_m(4, bad).ok).toBe(false);
  });
});

describe('bankCapacitance', () => {
  it('adds strings and divides along them', () => {
    expect(value(bankCapacitance([{ part_F: 2e-9, in_series: 2, in_parallel: 5 }]))).toBeCloseTo(5e-9, 20);
    const both = bankCapacitance([
      { part_F: 1e-9, in_series: 1, in_parallel: 2 },
      { part_F: 3e-9, in_series: 3, in_parallel: 1 },
    ]);
    expect(value(both)).toBeCloseTo(3e-9, 20);
  });

  it('refuses an empty bank and bad parts', () => {
    expect(bankCapacitance([])).toMatchObject({ refusal: { type: 'empty', field: 'bank' } });
    expect(bankCapacitance([{ part_F: 1e-9, in_series: 0, in_parallel: 1 }])).toMatchObject({
      refusal: { field: 'in_series' },
    });
    expect(bankCapacitance([{ part_F: Number.NaN, in_series: 1, in_parallel: 1 }]).ok).toBe(false);
  });
});

describe('stress', () => {
  it('Heron at 16 kV on 0.7 mm: 22.9 kV/mm, 3.5 times below 80', () => {
    expect(value(dielectricStress(16_000, 0.7e-3))).toBeCloseTo(22.857, 3);
    expect(value(stressMargin(16_000, 0.7e-3, 80))).toBeCloseTo(3.5, 10);
    expect(stressMargin(16_000, 0.7e-3, 80)).toMatchObject({ value: { warnings: [] } });
  });

  it('warns of a margin under 3', () => {
    expect(stressMargin(20_000, 0.5e-3, 60)).toMatchObject({
      value: { warnings: [{ type: 'little-margin' }] },
    });
  });

  it('refuses what gives no margin', () => {
    expect(stressMargin(0, 0.5e-3, 60)).toMatchObject({ refusal: { type: 'no-stress' } });
    expect(stressMargin(1000, 0, 60)).toMatchObject({ refusal: { field: 'thickness_m' } });
    expect(stressMargin(1000, 1e-3, -60)).toMatchObject({ refusal: { field: 'strength_kV_mm' } });
  });

  // Published minimum of a PET data sheet, kV/mm at um, read.
  it.each([
    [75, 115],
    [100, 100],
    [125, 90],
    [150, 85],
    [175, 80],
    [200, 70],
    [250, 65],
    [300, 60],
    [350, 55],
  ])('PET of %d um is promised %d kV/mm, within 6 %', (um, strength) => {
    expect(Math.abs(value(petMinimumStrength(um)) / strength - 1)).toBeLessThan(0.06);
  });

  it.each([74, 351, Number.NaN])('says nothing of PET of %d um', (um) => {
    expect(petMinimumStrength(um)).toMatchObject({ refusal: { field: 'thickness_um' } });
  });
});

describe('airFilmField', () => {
  it('discharges at every half cycle: 15 kV, 250 um PET, 20 um of air, 153 kV/mm', () => {
    expect(value(airFilmField({ voltage_V: 15_000, thickness_um: 250, eps_r: 3.2, air_um: 20 }))).toBeCloseTo(
      152.87,
      2,
    );
  });

  it('is eps_r times the stress for the thinnest film', () => {
    const film = { voltage_V: 10_000, thickness_um: 100, eps_r: 3.2, air_um: 0 };
    expect(value(airFilmField(film))).toBeCloseTo(3.2 * value(dielectricStress(10_000, 100e-6)), 9);
    expect(airFilmField({ ...film, air_um: -1 })).toMatchObject({ refusal: { field: 'air_um' } });
  });
});

describe('shotCharge', () => {
  it('gives the worked example: 2 nF, 15 kV, 0.6: 120 uC', () => {
    expect(value(shotCharge(2e-9, 15_000, 0.6))).toBeCloseTo(120, 9);
  });

  it('is the charge itself without ringing', () => {
    expect(value(shotCharge(2e-9, 15_000, 0))).toBeCloseTo(30, 9);
    expect(shotCharge(2e-9, 15_000, 1)).toMatchObject({ refusal: { field: 'reversal' } });
  });
});

it('gives finite numbers or refusals for any input', () => {
  const any = fc.double();
  fc.assert(
    fc.property(any, any, any, any, (...[a, b, c, d]) => {
      const results = [
        storedEnergy(a, b),
        shotCharge(a, b, c),
        sheetCapacitance({ eps_r: a, area_m2: b, thickness_m: c, layers: d }),
        dielectricStress(a, b),
        stressMargin(a, b, c),
        airFilmField({ voltage_V: a, thickness_um: b, eps_r: c, air_um: d }),
      ];
      return results.every((result) => !result.ok || Number.isFinite(result.value.value));
    }),
  );
});
