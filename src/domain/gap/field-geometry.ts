import { gaussLegendre } from '../numerics/gauss-legendre';

/** Two electrodes on one axis, by the ways their field can be written down exactly. */
export type FieldGeometry =
  'spheres_sym' | 'spheres_ground' | 'sphere_plane' | 'cylinders' | 'cylinder_plane';

/** The field on the axis over its mean, at the nodes of a rule for integrals over the gap. */
export interface AxialProfile {
  /** Largest field over mean field, at the electrode. */
  readonly fieldFactor: number;
  readonly fields: Float64Array;
  /** Weights of the nodes as shares of the gap; they add up to 1. */
  readonly weights: Float64Array;
}

// Below this the spheres' series needs thousands of images, and the field is flat to five digits anyway.
const FLAT_BELOW = 1e-5;
const LEAST_CHARGE = 1e-17;
const NODES = 128;

/** E_max/(V/d) at gap over radius x > 0, exact: image series for spheres, closed form for cylinders. */
export function fieldFactorOf(geometry: FieldGeometry, x: number): number {
  switch (geometry) {
    case 'sphere_plane':
      return fieldFactorOf('spheres_sym', 2 * x);
    case 'cylinder_plane':
      return fieldFactorOf('cylinders', 2 * x);
    case 'cylinders':
      return Math.sqrt(x * (x + 4)) / (2 * arcosh1p(0.5 * x));
    default:
      return x < FLAT_BELOW ? 1 + x / 3 : sphereField(geometry, x)(0);
  }
}

/** Axial profile of two equal parallel cylinders at gap over radius x > 0. */
export function cylinderProfile(x: number): AxialProfile {
  return profileFrom(fieldFactorOf('cylinders', x), cylinderField(x));
}

/** An axial profile from the field over its mean at a share of the gap. */
export function profileFrom(fieldFactor: number, fieldAt: (share: number) => number): AxialProfile {
  return { fieldFactor, fields: Float64Array.from(SHARES, fieldAt), weights: WEIGHTS };
}

/** Axial profiles of two equal spheres at gap over radius x > 0, by how they are connected. */
export interface SphereProfiles {
  readonly symmetric: AxialProfile;
  readonly oneEarthed: AxialProfile;
}

/** Both connections at once, since the symmetric field is the mean of the other and its mirror image. */
export function sphereProfiles(x: number): SphereProfiles {
  const earthed =
    x < FLAT_BELOW
      ? new Float64Array(NODES).fill(1)
      : Float64Array.from(SHARES, sphereField('spheres_ground', x));
  const symmetric = earthed.map((field, index) => 0.5 * (field + (earthed[NODES - 1 - index] ?? field)));
  return {
    symmetric: { fieldFactor: fieldFactorOf('spheres_sym', x), fields: symmetric, weights: WEIGHTS },
    oneEarthed: { fieldFactor: fieldFactorOf('spheres_ground', x), fields: earthed, weights: WEIGHTS },
  };
}

// Nodes crowd towards both electrodes, where the field changes most: t = (1 - cos theta)/2.
const RULE = gaussLegendre(NODES);
const SHARES = Float64Array.from(RULE.nodes, (node) => 0.5 * (1 - Math.cos(angle(node))));
const WEIGHTS = Float64Array.from(
  RULE.weights,
  (weight, index) => 0.25 * Math.PI * weight * Math.sin(angle(RULE.nodes[index] ?? 0)),
);

function angle(node: number): number {
  return 0.5 * Math.PI * (1 + node);
}

interface Image {
  readonly charge: number;
  readonly place: number;
}

/**
 * Charges that replace a unit sphere at unit potential facing an earthed one, centres 2 + x apart.
 * Each image is mirrored in turn in the far and in the near sphere; the charges fall off geometrically.
 */
function images(x: number): readonly Image[] {
  const apart = 2 + x;
  const list: Image[] = [{ charge: 1, place: 0 }];
  let charge = 1;
  let place = 0;
  while (Math.abs(charge) > LEAST_CHARGE) {
    const toFar = apart - place;
    charge /= -toFar;
    place = apart - 1 / toFar;
    list.push({ charge, place });
    charge /= -place;
    place = 1 / place;
    list.push({ charge, place });
  }
  return list;
}

/** Field over mean field at a share t of the gap from the live sphere. */
function sphereField(geometry: 'spheres_sym' | 'spheres_ground', x: number): (t: number) => number {
  const list = images(x);
  const fromLive = (z: number) => {
    let sum = 0;
    for (const { charge, place } of list) {
      const away = z - place;
      sum += (charge * Math.sign(away)) / (away * away);
    }
    return sum;
  };
  if (geometry === 'spheres_ground') return (t) => x * fromLive(1 + x * t);
  return (t) => 0.5 * x * (fromLive(1 + x * t) + fromLive(1 + x * (1 - t)));
}

// Two line charges at +-a from the middle; u is the place from the middle in radii.
function cylinderField(x: number): (t: number) => number {
  const a = Math.sqrt(0.25 * x * x + x);
  const scale = x / arcosh1p(0.5 * x);
  return (t) => {
    const u = x * (t - 0.5);
    return (scale * a) / (a * a - u * u);
  };
}

/** arcosh(1 + y) without losing digits for small y. */
function arcosh1p(y: number): number {
  return Math.log1p(y + Math.sqrt(y * (y + 2)));
}
