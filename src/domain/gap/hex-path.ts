import type { AxialProfile } from './field-geometry';
import type { HexField } from './hex-field';
import type { HexShape } from './hex-outline';

const LEAST_STEP = 0.02;
const STEP_SHARE = 0.06;
const MOST_STEPS = 2000;

/**
 * Field along the line of force that starts where the field is highest, from bar to bar, for the streamer integral.
 * Weights are lengths as shares of the gap: along a bowed line they add up to more than 1. Half the line is traced and the other half is its mirror.
 */
export function tracePeakLine(
  field: HexField,
  { cornerOverFlats: finest, gapOverFlats: gap }: HexShape,
): AxialProfile {
  const first = LEAST_STEP * finest;
  // On the surface itself a panel's field has no side; the first step leaves it along the normal.
  let x = field.peak.x + first * field.outward.x;
  let y = field.peak.y + first * field.outward.y;
  let travelled = first;
  const fields = [field.fieldFactor];
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
