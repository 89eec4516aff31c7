import { solveLinear } from '../numerics/solve-linear';

/** A ring of charge about the axis; radius 0 is a point. Lengths in rod radii, the middle of the gap at 0. */
interface Ring {
  readonly radius: number;
  readonly place: number;
}

/** The solved field of two equal round-ended rods on one axis, at plus and minus half the voltage. */
export interface RodField {
  /** Field over mean field at the tip. */
  readonly fieldFactor: number;
  /** Largest departure of the potential on the rod's surface from its own, as a share: says how good the field is. */
  readonly residual: () => number;
  /** Field over mean field on the axis, at a share of the gap from one tip. */
  readonly fieldAt: (share: number) => number;
}

/** Depth of a ring under the surface, in steps between rings. */
const DEPTH = 1.4;

/**
 * Charge simulation: rings under the surface, as deep as they stand apart, with the potential met on the surface
 * above each. Singer, Steinbigler and Weiss, IEEE Trans. PAS-93 (1974) 1660 (from memory). `length` is the whole rod
 * with both its round ends, in radii. Undefined if it cannot be solved.
 */
export function solveRodField(gap: number, length: number): RodField | undefined {
  const outline = rodOutline(gap, length);
  const rings = outline.map(({ inside }) => inside);
  const size = rings.length;
  const system = new Float64Array(size * (size + 1));
  outline.forEach(({ surface }, row) => {
    rings.forEach((ring, at) => (system[row * (size + 1) + at] = pairPotential(ring, surface)));
    system[row * (size + 1) + size] = 0.5;
  });
  if (!solveLinear(system, size)) return undefined;
  const charges = Float64Array.from(rings, (_, row) => system[row * (size + 1) + size] ?? 0);
  const fieldAt = (share: number) => {
    const z = gap * (0.5 - share);
    let field = 0;
    rings.forEach((ring, index) => {
      const { radius, place } = ring;
      field += (charges[index] ?? 0) * (axialField(radius, z - place) - axialField(radius, z + place));
    });
    return -gap * field;
  };
  return { fieldFactor: fieldAt(0), residual: () => residualOf({ gap, length, outline, charges }), fieldAt };
}

interface Solved {
  readonly gap: number;
  readonly length: number;
  readonly outline: ReturnType<typeof rodOutline>;
  readonly charges: Float64Array;
}

/** Between the points where the potential was met. */
function residualOf({ gap, length, outline, charges }: Solved): number {
  let residual = 0;
  for (let index = 1; index < outline.length; index += 1) {
    const a = outline[index - 1]?.surface;
    const b = outline[index]?.surface;
    if (a === undefined || b === undefined) continue;
    const between = onRod(0.5 * (a.arc + b.arc), gap, length);
    let sum = 0;
    outline.forEach(({ inside }, at) => (sum += (charges[at] ?? 0) * pairPotential(inside, between)));
    residual = Math.max(residual, Math.abs(2 * sum - 1));
  }
  return residual;
}

interface SurfacePoint {
  readonly arc: number;
  readonly radius: number;
  readonly place: number;
  readonly outRadius: number;
  readonly outPlace: number;
}

/** A point of the right rod's outline by its way along it from the tip that faces the gap. */
function onRod(arc: number, gap: number, length: number): SurfacePoint {
  const shaft = length - 2;
  const quarter = Math.PI / 2;
  const nearCentre = 0.5 * gap + 1;
  if (arc < quarter) {
    const outRadius = Math.sin(arc);
    const outPlace = -Math.cos(arc);
    return { arc, radius: outRadius, place: nearCentre + outPlace, outRadius, outPlace };
  }
  if (arc <= quarter + shaft) {
    return { arc, radius: 1, place: nearCentre + arc - quarter, outRadius: 1, outPlace: 0 };
  }
  const angle = arc - shaft;
  const outRadius = Math.max(0, Math.sin(angle));
  const outPlace = -Math.cos(angle);
  return { arc, radius: outRadius, place: nearCentre + shaft + outPlace, outRadius, outPlace };
}

function rodOutline(gap: number, length: number) {
  const whole = Math.PI + length - 2;
  const arcs = arcsFrom(gap, whole);
  return arcs.map((arc, index) => {
    const surface = onRod(arc, gap, length);
    const apart = Math.max(arc - (arcs[index - 1] ?? -(arcs[1] ?? 1)), (arcs[index + 1] ?? 0) - arc);
    const depth = Math.min(DEPTH * apart, 0.85);
    const inside: Ring = {
      radius: Math.max(0, surface.radius - depth * surface.outRadius),
      place: surface.place - depth * surface.outPlace,
    };
    return { surface, inside };
  });
}

/** Steps that grow from the facing tip, where the field changes over the gap or the radius, to a tenth of the rod. */
function arcsFrom(gap: number, whole: number): readonly number[] {
  const arcs = [0];
  const finest = 0.12 * Math.min(1, gap);
  let arc = 0;
  while (arc < whole) {
    const left = whole - arc;
    arc += Math.min(finest + 0.12 * arc, 0.35, Math.max(0.12, 0.3 * left));
    if (arc < whole - 0.06) arcs.push(arc);
  }
  arcs.push(whole);
  return arcs;
}

/** Potential of a ring of unit charge and of its opposite on the other rod. */
function pairPotential(ring: Ring, point: { readonly radius: number; readonly place: number }): number {
  const { radius } = ring;
  return (
    ringPotential(radius, point.radius, point.place - ring.place) -
    ringPotential(radius, point.radius, point.place + ring.place)
  );
}

/** Potential of a ring, charge over its mean distance: 2 K(m)/(pi longest distance), K by Gauss's mean. */
function ringPotential(ring: number, radius: number, away: number): number {
  const longest = Math.sqrt((radius + ring) ** 2 + away * away);
  const shortest = Math.sqrt((radius - ring) ** 2 + away * away);
  return 1 / arithmeticGeometricMean(longest, shortest);
}

function arithmeticGeometricMean(a: number, b: number): number {
  let upper = a;
  let lower = b;
  while (upper - lower > 1e-15 * upper) {
    const mean = 0.5 * (upper + lower);
    lower = Math.sqrt(upper * lower);
    upper = mean;
  }
  return upper;
}

function axialField(radius: number, away: number): number {
  const square = radius * radius + away * away;
  return away / (square * Math.sqrt(square));
}
