import type { AxialProfile } from './field-geometry';
import type { HexField, SurfacePoint } from './hex-field';
import type { HexShape } from './hex-outline';

const LEAST_STEP = 0.02;
const STEP_SHARE = 0.06;
const MOST_STEPS = 2000;

/**
 * Fields along the lines of force that may break first, from bar to bar, for the streamer integral: the line of the
 * highest field, and from flat to flat the middle axis too, which is shorter. Weights are lengths as shares of the gap:
 * along a bowed line they add up to more than 1. Half a line is traced and the other half is its mirror.
 */
export function tracePaths(field: HexField, shape: HexShape): readonly AxialProfile[] {
  const peak = traceFrom(field.peak, field, shape);
  return shape.orientation === 'edge' ? [peak] : [peak, traceFrom(field.front, field, shape)];
}

function traceFrom(
  start: SurfacePoint,
  field: HexField,
  { cornerOverFlats: finest, gapOverFlats: gap }: HexShape,
): AxialProfile {
  const first = LEAST_STEP * finest;
  // On the surface itself a panel's field has no side; the first step leaves it along the normal.
  let x = start.place.x + first * start.outward.x;
  let y = start.place.y + first * start.outward.y;
  let travelled = first;
  const fields = [start.field];
  const weights = [(2 * first) / gap];
  for (let step = 0; step < MOST_STEPS && x < 0; step += 1) {
    const size = STEP_SHARE * travelled + first;
    const half = along(field.fieldAt({ x, y }), 0.5 * size);
    const direction = field.fieldAt({ x: x + half.x, y: y + half.y });
    const move = along(direction, size);
    // The last step ends in the mirror plane.
    const share = move.x > 0 ? Math.min(1, -x / move.x) : 1;
    x += share * move.x;
    y += share * move.y;
    travelled += share * size;
    fields.push(Math.hypot(direction.x, direction.y));
    weights.push((2 * share * size) / gap);
    if (share < 1) break;
  }
  return {
    fieldFactor: field.fieldFactor,
    fields: Float64Array.from(fields),
    weights: Float64Array.from(weights),
  };
}

function along({ x, y }: { readonly x: number; readonly y: number }, length: number) {
  const size = Math.hypot(x, y);
  return { x: (length * x) / size, y: (length * y) / size };
}
