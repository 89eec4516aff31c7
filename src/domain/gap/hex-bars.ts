import { answer, type Answer } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { firstRefusal, ok, refused, type Result } from '../units/result';
import { CORNER_OVER_FLATS_RULE, GAP_OVER_FLATS_RULE } from './electrodes';
import { hexPaths } from './gap-fields';
import { checkedSimilarity, type GapPoint } from './gas-density';
import type { HexOrientation, HexShape } from './hex-outline';
import { AIR_CRITERION } from './streamer-criterion';
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
  const checked = checkedShape(shape);
  if (!checked.ok) return checked;
  // Every path carries the highest field of the shape.
  const value = hexPaths(checked.value)?.[0]?.fieldFactor;
  if (value === undefined) return refused(NO_FIELD);
  return ok(
    answer({
      value,
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
  const own = weakestPath_kV(shape.value, x.value);
  const edge = weakestPath_kV({ ...shape.value, orientation: 'edge' }, x.value);
  if (!own.ok) return own;
  if (!edge.ok) return edge;
  const value = own.value;
  const least = Math.min(value, edge.value);
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

function checkedShape(shape: HexShape): Result<HexShape> {
  const bad = firstRefusal([
    checkNumber(shape.cornerOverFlats, { ...CORNER_OVER_FLATS_RULE, field: 'cornerRadius_mm' }),
    checkNumber(shape.gapOverFlats, GAP_OVER_FLATS_RULE),
  ]);
  if (bad !== undefined) return refused(bad);
  return isOrientation(shape.orientation)
    ? ok(shape)
    : refused({
        type: 'unknown-choice',
        field: 'orientation',
        words: 'Orientation: choose flat or edge.',
      });
}

function isOrientation(value: unknown): value is HexOrientation {
  return value === 'flat' || value === 'edge';
}

function weakestPath_kV(shape: HexShape, x_bar_cm: number): Result<number> {
  const checked = checkedShape(shape);
  if (!checked.ok) return checked;
  const paths = hexPaths(checked.value);
  if (paths === undefined) return refused(NO_FIELD);
  return ok(Math.min(...paths.map((path) => streamerVoltage_kV(AIR_CRITERION, x_bar_cm, path))));
}
