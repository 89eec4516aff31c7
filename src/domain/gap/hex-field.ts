import { solveLinear } from '../numerics/solve-linear';
import { hexOutline, type HexShape, type Panel } from './hex-outline';

interface Point {
  readonly x: number;
  readonly y: number;
}

/** A place on the surface, the way out of the bar there, and the field over the mean field. */
export interface SurfacePoint {
  readonly place: Point;
  readonly outward: Point;
  readonly field: number;
}

/** The solved field of two hexagonal bars at plus and minus half the voltage, lengths over the width across flats. */
export interface HexField {
  /** Highest field over the mean field, mean of one panel. */
  readonly fieldFactor: number;
  /** Where on the surface the field is highest. */
  readonly peak: SurfacePoint;
  /** On the axis, at the front of the bar. */
  readonly front: SurfacePoint;
  /** Field over mean field, as a vector, at a place between the bars. */
  readonly fieldAt: (place: Point) => Point;
}

/**
 * Boundary elements in two dimensions: constant charge on straight panels, potential met in the middle of each, the
 * other three quarters by mirror. Against two cylinders in closed form within 0.1 %. Undefined if it cannot be solved.
 */
export function solveHexField(shape: HexShape): HexField | undefined {
  return solvePanels(hexOutline(shape), shape.gapOverFlats);
}

/** The same for any upper half outline left of x = 0, for the check against cylinders. */
export function solvePanels(panels: readonly Panel[], gap: number): HexField | undefined {
  const matrix = panels.map((at) => {
    const middle = middleOf(at);
    return Float64Array.from(panels, (panel) => mirrored(panel, middle, potential));
  });
  const charges = solveLinear(matrix, new Float64Array(panels.length).fill(0.5));
  if (charges === undefined) return undefined;
  let peak = 0;
  panels.forEach((_, index) => {
    if ((charges[index] ?? 0) > (charges[peak] ?? 0)) peak = index;
  });
  const surface = (index: number): SurfacePoint | undefined => {
    const panel = panels[index];
    if (panel === undefined) return undefined;
    return { place: middleOf(panel), outward: outwardOf(panel), field: gap * (charges[index] ?? Number.NaN) };
  };
  const loudest = surface(peak);
  const front = surface(0);
  if (loudest === undefined || front === undefined) return undefined;
  return {
    fieldFactor: loudest.field,
    peak: loudest,
    front,
    fieldAt: (place) => {
      let x = 0;
      let y = 0;
      panels.forEach((panel, index) => {
        const charge = gap * (charges[index] ?? 0);
        x += charge * mirrored(panel, place, fieldX);
        y += charge * mirroredY(panel, place);
      });
      return { x, y };
    },
  };
}

function middleOf({ x0, y0, x1, y1 }: Panel): Point {
  return { x: 0.5 * (x0 + x1), y: 0.5 * (y0 + y1) };
}

// The outline runs from the front over the top to the back, so outward is to its right.
function outwardOf({ x0, y0, x1, y1 }: Panel): Point {
  const length = Math.hypot(x1 - x0, y1 - y0);
  return { x: (y1 - y0) / length, y: -(x1 - x0) / length };
}

type Kernel = (panel: Panel, place: Point) => number;

/** A panel and its mirrors: the same charge below the axis, the opposite one on the other bar. */
function mirrored(panel: Panel, { x, y }: Point, kernel: Kernel): number {
  const below = kernel(panel, { x, y }) + kernel(panel, { x, y: -y });
  // The field along x of a mirrored charge is the mirrored field with the other sign; the potential keeps it.
  const other = kernel(panel, { x: -x, y }) + kernel(panel, { x: -x, y: -y });
  return kernel === fieldX ? below + other : below - other;
}

function mirroredY(panel: Panel, { x, y }: Point): number {
  return (
    fieldY(panel, { x, y }) -
    fieldY(panel, { x, y: -y }) -
    fieldY(panel, { x: -x, y }) +
    fieldY(panel, { x: -x, y: -y })
  );
}

/** Place of a point in a panel's own frame: along it from its start, and across. */
function inFrame({ x0, y0, x1, y1 }: Panel, { x, y }: Point) {
  const length = Math.hypot(x1 - x0, y1 - y0);
  const ux = (x1 - x0) / length;
  const uy = (y1 - y0) / length;
  return {
    length,
    ux,
    uy,
    along: (x - x0) * ux + (y - y0) * uy,
    across: (y - y0) * ux - (x - x0) * uy,
  };
}

/** Potential of unit charge density on a panel, -(1/2 pi) times the integral of ln r. */
function potential(panel: Panel, place: Point): number {
  const { length, along, across } = inFrame(panel, place);
  const rest = length - along;
  const angle = across === 0 ? 0 : across * (Math.atan(along / across) + Math.atan(rest / across));
  const sum = halfLog(along, across) + halfLog(rest, across) - length + angle;
  return -sum / (2 * Math.PI);
}

function halfLog(along: number, across: number): number {
  const square = along * along + across * across;
  return square === 0 ? 0 : 0.5 * along * Math.log(square);
}

function fieldParts(panel: Panel, place: Point) {
  const { length, ux, uy, along, across } = inFrame(panel, place);
  const rest = length - along;
  const tangent = 0.5 * Math.log((along * along + across * across) / (rest * rest + across * across));
  const normal = across === 0 ? 0 : Math.atan(along / across) + Math.atan(rest / across);
  return { ux, uy, tangent: tangent / (2 * Math.PI), normal: normal / (2 * Math.PI) };
}

function fieldX(panel: Panel, place: Point): number {
  const { ux, uy, tangent, normal } = fieldParts(panel, place);
  return tangent * ux - normal * uy;
}

function fieldY(panel: Panel, place: Point): number {
  const { ux, uy, tangent, normal } = fieldParts(panel, place);
  return tangent * uy + normal * ux;
}
