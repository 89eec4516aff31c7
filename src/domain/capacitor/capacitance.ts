import { answer, type Answer } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { firstRefusal, ok, refused, type Result } from '../units/result';
import { CAPACITANCE_RULE } from './energy';

/** Permittivity of vacuum, F/m: CODATA 2018. */
const EPSILON_0 = 8.8541878128e-12;

export interface Sheet {
  readonly eps_r: number;
  /** Overlap of the foils of one active layer. */
  readonly area_m2: number;
  /** Of all plies between two foils together. */
  readonly thickness_m: number;
  /** Active layers in parallel: k facing foils make k - 1. */
  readonly layers: number;
}

/**
 * Capacitance of a sheet capacitor, F: eps0 eps_r A n/t. Edges add at most 2 t/w; wrinkles and air films, which
 * are not counted, take away up to a third.
 */
export function sheetCapacitance({ eps_r, area_m2, thickness_m, layers }: Sheet): Result<Answer> {
  const bad = firstRefusal([
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
    checkNumber(layers, { field: 'layers', name: 'Active layers', unit: '', min: 1, max: 1000 }),
  ]);
  if (bad !== undefined) return refused(bad);
  return ok(
    answer({
      value: (EPSILON_0 * eps_r * area_m2 * layers) / thickness_m,
      unit: 'F',
      relative: { below: 0.35, above: 0.05 },
      model: 'Flat sheet without edges and air films',
      valid: 'film pressed or wet against the foil',
    }),
  );
}

/** Thickness of plies lying on each other, m. */
export function plyThickness_m(plies: number, ply_um: number): Result<number> {
  const bad = firstRefusal([
    checkNumber(plies, { field: 'plies', name: 'Plies', unit: '', min: 1, max: 100 }),
    checkNumber(ply_um, {
      field: 'ply_um',
      name: 'Thickness of one ply',
      unit: '\u00b5m',
      min: 0.1,
      max: 100_000,
    }),
  ]);
  return bad === undefined ? ok(plies * ply_um * 1e-6) : refused(bad);
}

/** A string of equal parts: `in_series` of them, and so many such strings side by side. */
export interface BankString {
  readonly part_F: number;
  readonly in_series: number;
  readonly in_parallel: number;
}

/** Capacitance of a bank of catalogue parts, F: strings in parallel add up. */
export function bankCapacitance(strings: readonly BankString[]): Result<Answer> {
  if (strings.length === 0) {
    return refused({ type: 'empty', field: 'bank', words: 'Bank: add at least one part.' });
  }
  let value = 0;
  for (const { part_F, in_series, in_parallel } of strings) {
    const bad = firstRefusal([
      checkNumber(part_F, CAPACITANCE_RULE),
      checkNumber(in_series, { field: 'in_series', name: 'Parts in series', unit: '', min: 1, max: 1000 }),
      checkNumber(in_parallel, {
        field: 'in_parallel',
        name: 'Strings in parallel',
        unit: '',
        min: 1,
        max: 1000,
      }),
    ]);
    if (bad !== undefined) return refused(bad);
    value += (part_F * in_parallel) / in_series;
  }
  return ok(
    answer({
      value,
      unit: 'F',
      relative: 0.2,
      model: 'Catalogue values added up',
      valid: 'ceramic parts lose 20 to 60 % at rated voltage, by class',
    }),
  );
}
