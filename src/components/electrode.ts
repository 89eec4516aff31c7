/**
 * The one profile of the app: flat back, small edge radii, a gently domed face (sagitta about a twentieth of its width).
 * Everything that looks like an electrode, drawn or masked, is this function's output.
 */

/** The way that the face looks: a body at the left of a gap faces right. */
export type Facing = 'up' | 'down' | 'left' | 'right';

export interface ElectrodeShape {
  /** Box of the whole body in the units of the drawing; the face's peak touches the side it faces. */
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
  readonly facing: Facing;
  /** Height of the dome over its chord; a twentieth of the face when left out. */
  readonly sagitta?: number;
  /** Radius of the rounded edges; a twelfth of the face when left out. */
  readonly edge?: number;
}

/** Closed outline of the body, as an SVG path. */
export function electrodePath(shape: ElectrodeShape): string {
  const p = profile(shape);
  const at = placer(shape);
  return (
    `M${at(0, p.depth)}L${at(0, p.shoulder)}Q${at(0, p.corner)} ${at(p.edge, p.dome)}` +
    `Q${at(p.face / 2, -p.dome)} ${at(p.face - p.edge, p.dome)}` +
    `Q${at(p.face, p.corner)} ${at(p.face, p.shoulder)}L${at(p.face, p.depth)}Z`
  );
}

/** The face with its two edges, open, for a rim that carries the weight or tells a hold. */
export function electrodeRim(shape: ElectrodeShape): string {
  const p = profile(shape);
  const at = placer(shape);
  return (
    `M${at(0, p.shoulder)}Q${at(0, p.corner)} ${at(p.edge, p.dome)}` +
    `Q${at(p.face / 2, -p.dome)} ${at(p.face - p.edge, p.dome)}Q${at(p.face, p.corner)} ${at(p.face, p.shoulder)}`
  );
}

/** The domed part of the face alone, without the edges. */
export function electrodeFace(shape: ElectrodeShape): string {
  const p = profile(shape);
  const at = placer(shape);
  return `M${at(p.edge, p.dome)}Q${at(p.face / 2, -p.dome)} ${at(p.face - p.edge, p.dome)}`;
}

/** The body as a stretched CSS mask: the value of a `mask` property. */
export function electrodeMask(shape: Omit<ElectrodeShape, 'x' | 'y'>): string {
  const path = electrodePath({ ...shape, x: 0, y: 0 });
  const svg =
    `<svg xmlns='http://www.w3.org/2000/svg' viewBox='0 0 ${round(shape.width)} ${round(shape.height)}' ` +
    `preserveAspectRatio='none'><path d='${path}'/></svg>`;
  return `url("data:image/svg+xml,${svg.replaceAll('<', '%3C').replaceAll('>', '%3E')}") 0 0 / 100% 100%`;
}

interface Profile {
  readonly face: number;
  readonly depth: number;
  readonly edge: number;
  readonly dome: number;
  readonly corner: number;
  readonly shoulder: number;
}

/** Lengths along the face and down from its peak. The edge's control point lies on the dome's end tangent, so nothing kinks. */
function profile(shape: ElectrodeShape): Profile {
  const upright = shape.facing === 'up' || shape.facing === 'down';
  const face = Math.max(0, upright ? shape.width : shape.height);
  const depth = Math.max(0, upright ? shape.height : shape.width);
  const edge = Math.min(shape.edge ?? face / 12, face / 2.5, depth / 1.6);
  const dome = Math.min(shape.sagitta ?? face / 20, depth / 4);
  const half = Math.max(face / 2 - edge, 1e-6);
  const corner = dome + edge * ((2 * dome) / half);
  const shoulder = Math.min(corner + edge, depth);
  return { face, depth, edge, dome, corner: Math.min(corner, depth), shoulder };
}

function placer(shape: ElectrodeShape): (along: number, down: number) => string {
  const { x, y, width, height } = shape;
  switch (shape.facing) {
    case 'up':
      return (along, down) => point(x + along, y + down);
    case 'down':
      return (along, down) => point(x + along, y + height - down);
    case 'left':
      return (along, down) => point(x + down, y + along);
    case 'right':
      return (along, down) => point(x + width - down, y + along);
  }
}

function point(x: number, y: number): string {
  return `${round(x)} ${round(y)}`;
}

function round(value: number): number {
  const rounded = Math.round(value * 100) / 100;
  return rounded === 0 ? 0 : rounded;
}
