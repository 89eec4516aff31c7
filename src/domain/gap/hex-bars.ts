import { answer, type Answer } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { firstRefusal, ok, refused, type Result } from '../units/result';
import type { AxialProfile } from './field-geometry';
import { checkedSimilarity, type GapPoint } from './gas-density';
import { gasLaw } from './gas-law';
import { checkSetup, type GapInput } from './gap-input';
import { solveHexField, type HexField } from './hex-field';
import type { HexOrientation, HexShape } from './hex-outline';
import { tracePaths } from './hex-path';
import { selfBreakAt, type GapAnswer } from './self-break';
import { AIR_CRITERION, type StreamerCriterion } from './streamer-criterion';
import { streamerVoltage_kV } from './streamer';

const LOWEST_X_BAR_CM = 0.013;
const HIGHEST_X_BAR_CM = 50;

/** Two equal hexagonal bars, side by side. Sharp edges have no radius to give: break them first. */
export interface HexBars {
  readonly orientation: HexOrientation;
  readonly acrossFlats_mm: number;
  readonly cornerRadius_mm: number;
}

/**
 * Field factor E_max/(V/d) of two hexagonal bars from corner radius and gap over the width across flats. Own
 * boundary-element solution, within 0.3 %; physics A(c). The peak lies at the corners, also from flat to flat.
 */
export function hexFieldFactor(shape: HexShape): Result<Answer> {
  const field = checkedField(shape);
  if (!field.ok) return field;
  return ok(
    answer({
      value: field.value.fieldFactor,
      unit: '1',
      relative: 0.02,
      model: 'Boundary elements in the cross-section',
      valid: 'long bars; a finite bar\u2019s ends and screw heads are further edges',
    }),
  );
}

/**
 * Breakdown of two hexagonal bars in air, kV: streamer integral along the line of force from the highest field, and from
 * flat to flat along the middle axis too, where that is weaker. The axis alone reads up to 15 % too high (physics K2). The
 * band reaches down to the edge-to-edge value, the one to plan with.
 */
export function hexBarBreakdown(bars: HexBars & GapPoint): Result<Answer> {
  const shape = shapeOf(bars, bars.gap_cm * 10);
  if (!shape.ok) return shape;
  const x = checkedSimilarity(bars);
  if (!x.ok) return x;
  if (x.value < LOWEST_X_BAR_CM || x.value > HIGHEST_X_BAR_CM) {
    return refused({
      type: x.value < LOWEST_X_BAR_CM ? 'pd-too-small' : 'pd-too-large',
      field: 'pressure',
      words: `Pressure times gap must lie between ${String(LOWEST_X_BAR_CM)} and ${String(HIGHEST_X_BAR_CM)}\u2009bar cm for this model.`,
    });
  }
  const own = weakestPath(shape.value, AIR_CRITERION, x.value);
  const edge = weakestPath({ ...shape.value, orientation: 'edge' }, AIR_CRITERION, x.value);
  if (!own.ok) return own;
  if (!edge.ok) return edge;
  const value = own.value.voltage_kV;
  const least = Math.min(value, edge.value.voltage_kV);
  return ok(
    answer({
      value,
      unit: 'kV',
      relative: { below: 1 - (1 - BAND) * (least / value), above: BAND },
      model: `Streamer integral, hexagonal bars ${bars.orientation} to ${bars.orientation}`,
      valid: 'air, 0.013 to 50 bar cm, long bars with radiused ends; no measurement of such bars was found',
      warnings: [BY_COMPUTATION],
    }),
  );
}

const BAND = 0.05;
const NO_FIELD = {
  type: 'no-field',
  field: 'bars',
  words: 'The field between these bars could not be computed.',
} as const;
const BY_COMPUTATION = {
  type: 'bars-by-computation',
  words: 'Hexagonal bars rest on computed fields alone. Burrs and bar ends break lower.',
} as const;

/**
 * Self-break of two hexagonal bars with both sides, as `selfBreak` gives it for other electrodes; physics K2 and M.
 * The low side takes the edge-to-edge field whatever faces what.
 */
export function hexBarSelfBreak(
  input: Omit<GapInput, 'electrodes'> & { readonly bars: HexBars },
): Result<GapAnswer> {
  const { bars, ...rest } = input;
  const setup = { ...rest, electrodes: { shape: 'plane' } } as const;
  const checked = checkSetup(setup);
  if (!checked.ok) return checked;
  const law = gasLaw(input.gas);
  if (!law.ok) return law;
  const shape = shapeOf(bars, input.gap_mm);
  const narrow = shapeOf({ ...bars, orientation: 'edge' }, input.gap_mm - input.u_gap_mm);
  if (!shape.ok) return shape;
  if (!narrow.ok) return narrow;
  const point = {
    pressure_bar_abs: input.pressure.bar_abs,
    gap_cm: input.gap_mm / 10,
    temperature_C: input.temperature_C,
  };
  const x = checkedSimilarity(point);
  if (!x.ok) return x;
  const field = weakestPath(shape.value, law.value.criterion, x.value);
  const narrowField = weakestPath(narrow.value, law.value.criterion, x.value);
  if (!field.ok) return field;
  if (!narrowField.ok) return narrowField;
  const sides = selfBreakAt(
    {
      // Bars take the factors of cylinders.
      setup: { ...setup, electrodes: { shape: 'cylinder', radius_mm: bars.cornerRadius_mm } },
      law: law.value,
      radius_mm: undefined,
      field: field.value.profile,
      narrowFields: [narrowField.value.profile],
    },
    input.pressure.bar_abs,
  );
  if (!sides.ok) return sides;
  return ok({
    ...sides.value,
    model: `Law: streamer integral, hexagonal bars ${bars.orientation} to ${bars.orientation}`,
    warnings: [...sides.value.warnings, BY_COMPUTATION],
  });
}

function shapeOf(bars: HexBars, gap_mm: number): Result<HexShape> {
  const bad = firstRefusal([
    checkNumber(bars.acrossFlats_mm, {
      field: 'acrossFlats_mm',
      name: 'Width across flats',
      unit: 'mm',
      min: 0.5,
      max: 500,
    }),
    checkNumber(bars.cornerRadius_mm, {
      field: 'cornerRadius_mm',
      name: 'Corner radius',
      unit: 'mm',
      min: 0.001,
      max: 250,
    }),
    checkNumber(gap_mm, { field: 'gap_mm', name: 'Gap', unit: 'mm', min: 0.01, max: 500 }),
  ]);
  if (bad !== undefined) return refused(bad);
  return ok({
    orientation: bars.orientation,
    cornerOverFlats: bars.cornerRadius_mm / bars.acrossFlats_mm,
    gapOverFlats: gap_mm / bars.acrossFlats_mm,
  });
}

function checkedField(shape: HexShape): Result<HexField> {
  const bad = firstRefusal([
    checkNumber(shape.cornerOverFlats, {
      field: 'cornerRadius_mm',
      name: 'Corner radius over the width across flats',
      unit: '',
      min: 0.005,
      minReason: 'a sharper edge has no field to give; break the edges',
      max: 0.45,
      maxReason: 'take a round bar',
    }),
    checkNumber(shape.gapOverFlats, {
      field: 'gap_mm',
      name: 'Gap over the width across flats',
      unit: '',
      min: 0.02,
      minReason: 'take plane electrodes',
      max: 2,
      maxReason: 'corona starts before breakdown there',
    }),
  ]);
  if (bad !== undefined) return refused(bad);
  if (!isOrientation(shape.orientation)) {
    return refused({
      type: 'unknown-choice',
      field: 'orientation',
      words: 'Orientation: choose flat or edge.',
    });
  }
  const field = solveHexField(shape);
  return field === undefined
    ? refused({
        type: 'no-field',
        field: 'bars',
        words: 'The field between these bars could not be computed.',
      })
    : ok(field);
}

function isOrientation(value: unknown): value is HexOrientation {
  return value === 'flat' || value === 'edge';
}

interface WeakestPath {
  readonly profile: AxialProfile;
  readonly voltage_kV: number;
}

function weakestPath(shape: HexShape, criterion: StreamerCriterion, x_bar_cm: number): Result<WeakestPath> {
  const field = checkedField(shape);
  if (!field.ok) return field;
  const paths = tracePaths(field.value, shape).map((profile) => ({
    // The highest field counts for its allowance wherever the path starts.
    profile: { ...profile, fieldFactor: field.value.fieldFactor },
    voltage_kV: streamerVoltage_kV(criterion, x_bar_cm, profile),
  }));
  const [first, ...others] = paths;
  if (first === undefined) return refused(NO_FIELD);
  return ok(others.reduce((weakest, path) => (path.voltage_kV < weakest.voltage_kV ? path : weakest), first));
}
