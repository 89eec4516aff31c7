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
 * other three quarters by mirror. Against two cylinders in closed form within 0.2 %. Undefined if it cannot be solved.
 */
export function solveHexField(shape: HexShape): HexField | undefined {
  return solvePanels(hexOutline(shape), shape.gapOverFlats);
}

/**
 * The same for any upper half outline left of x = 0, for the check against cylinders. Each panel starts where the one
 * before it ends.
 */
export function solvePanels(panels: readonly Panel[], gap: number): HexField | undefined {
  const outline = outlineOf(panels);
  const size = panels.length;
  const system = new Float64Array(size * (size + 1));
  panels.forEach((panel, row) => {
    const middle = middleOf(panel);
    for (const mirror of MIRRORS) {
      addPotentials(system.subarray(row * (size + 1)), outline, { place: middle, mirror });
    }
    system[row * (size + 1) + size] = 0.5;
  });
  if (!solveLinear(system, size)) return undefined;
  const charges = Float64Array.from(panels, (_, row) => system[row * (size + 1) + size] ?? 0);
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
  const scaled = charges.map((charge) => (gap * charge) / (2 * Math.PI));
  return {
    fieldFactor: loudest.field,
    peak: loudest,
    front,
    fieldAt: (place) => fieldOf(outline, scaled, place),
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

/** Corners of an outline with the direction and the length of the panel that starts at each. */
interface Outline {
  readonly x: Float64Array;
  readonly y: Float64Array;
  readonly ux: Float64Array;
  readonly uy: Float64Array;
  readonly length: Float64Array;
}

function outlineOf(panels: readonly Panel[]): Outline {
  const length = Float64Array.from(panels, ({ x0, y0, x1, y1 }) => Math.hypot(x1 - x0, y1 - y0));
  const last = panels.at(-1);
  return {
    x: Float64Array.from([...panels.map(({ x0 }) => x0), last?.x1 ?? 0]),
    y: Float64Array.from([...panels.map(({ y0 }) => y0), last?.y1 ?? 0]),
    ux: Float64Array.from(panels, ({ x0, x1 }, index) => (x1 - x0) / (length[index] ?? 0)),
    uy: Float64Array.from(panels, ({ y0, y1 }, index) => (y1 - y0) / (length[index] ?? 0)),
    length,
  };
}

// The mirrors by the signs of x and y. The field of a mirrored charge is the mirrored field: seen from the mirrored place,
// each part keeps or turns its sign with its own axis, and the charge on the other bar turns both once more.
const MIRRORS = [
  { x: 1, y: 1, charge: 1, partX: 1, partY: 1 },
  { x: 1, y: -1, charge: 1, partX: 1, partY: -1 },
  { x: -1, y: 1, charge: -1, partX: 1, partY: -1 },
  { x: -1, y: -1, charge: -1, partX: 1, partY: 1 },
] as const;

interface Seen {
  readonly place: Point;
  readonly mirror: (typeof MIRRORS)[number];
}

/**
 * Adds the potential of unit charge density on every panel of a mirrored outline to a row: -(1/2 pi) times the integral of
 * ln r. A corner's logarithm serves both panels that meet there.
 */
function addPotentials(row: Float64Array, outline: Outline, { place, mirror }: Seen): void {
  const { length } = outline;
  const scale = -mirror.charge / (2 * Math.PI);
  let dx = mirror.x * place.x - (outline.x[0] ?? 0);
  let dy = mirror.y * place.y - (outline.y[0] ?? 0);
  let log = Math.log(dx * dx + dy * dy);
  for (let index = 0; index < length.length; index += 1) {
    const ux = outline.ux[index] ?? 0;
    const uy = outline.uy[index] ?? 0;
    const whole = length[index] ?? 0;
    const along = dx * ux + dy * uy;
    const rest = whole - along;
    dx = mirror.x * place.x - (outline.x[index + 1] ?? 0);
    dy = mirror.y * place.y - (outline.y[index + 1] ?? 0);
    const across = Math.abs(dy * ux - dx * uy);
    const next = Math.log(dx * dx + dy * dy);
    const angle = Math.atan2(across * whole, across * across - along * rest);
    row[index] = (row[index] ?? 0) + scale * (0.5 * (along * log + rest * next) - whole + across * angle);
    log = next;
  }
}

function fieldOf(outline: Outline, charges: Float64Array, place: Point): Point {
  const { length } = outline;
  let fieldX = 0;
  let fieldY = 0;
  for (const mirror of MIRRORS) {
    let sumX = 0;
    let sumY = 0;
    let dx = mirror.x * place.x - (outline.x[0] ?? 0);
    let dy = mirror.y * place.y - (outline.y[0] ?? 0);
    let square = dx * dx + dy * dy;
    for (let index = 0; index < length.length; index += 1) {
      const ux = outline.ux[index] ?? 0;
      const uy = outline.uy[index] ?? 0;
      const whole = length[index] ?? 0;
      const along = dx * ux + dy * uy;
      const across = dy * ux - dx * uy;
      dx = mirror.x * place.x - (outline.x[index + 1] ?? 0);
      dy = mirror.y * place.y - (outline.y[index + 1] ?? 0);
      const next = dx * dx + dy * dy;
      const tangent = 0.5 * Math.log(square / next);
      const angle = Math.atan2(Math.abs(across) * whole, across * across - along * (whole - along));
      const normal = across < 0 ? -angle : across > 0 ? angle : 0;
      const charge = charges[index] ?? 0;
      sumX += charge * (tangent * ux - normal * uy);
      sumY += charge * (tangent * uy + normal * ux);
      square = next;
    }
    fieldX += mirror.partX * sumX;
    fieldY += mirror.partY * sumY;
  }
  return { x: fieldX, y: fieldY };
}
