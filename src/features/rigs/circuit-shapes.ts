import { electrodePath } from '../../components/electrode';
import type { RigSpec } from '../../domain/book/rig-spec';
import type { CircuitPlan, Electrodes } from './circuit-plan';

type Shape = RigSpec['gap']['electrodes'];

/** How far each shape's face stands out, as a share of its width, and how round its edges are. */
const PROFILES: Readonly<
  Record<Exclude<Shape, 'hex-bars'>, { readonly sagitta: number; readonly edge: number }>
> = {
  domed: { sagitta: 1 / 9, edge: 1 / 8 },
  plane: { sagitta: 0, edge: 1 / 16 },
  cylinder: { sagitta: 0.22, edge: 1 / 12 },
  'capped-rods': { sagitta: 0.5, edge: 1 / 12 },
};

/** Both electrodes of a gap, in the shape that they have. */
export function facesOf(place: Electrodes, shape: Shape): string {
  return shape === 'hex-bars' ? hexBars(place) : domes(place, PROFILES[shape]);
}

function domes(
  { upright, x, y, thick, long, apart }: Electrodes,
  profile: { readonly sagitta: number; readonly edge: number },
): string {
  const shape = { edge: thick * profile.edge, sagitta: thick * profile.sagitta };
  if (upright) {
    const box = { ...shape, x: x - thick / 2, width: thick, height: long };
    return (
      electrodePath({ ...box, y: y - apart / 2 - long, facing: 'down' }) +
      electrodePath({ ...box, y: y + apart / 2, facing: 'up' })
    );
  }
  const box = { ...shape, y: y - thick / 2, width: long, height: thick };
  return (
    electrodePath({ ...box, x: x - apart / 2 - long, facing: 'right' }) +
    electrodePath({ ...box, x: x + apart / 2, facing: 'left' })
  );
}

/** Two hexagons, flat to flat, each as deep as it is wide. */
function hexBars({ upright, x, y, thick, apart }: Electrodes): string {
  const half = thick / 2;
  const side = half * Math.tan(Math.PI / 6);
  const hexagon = (towards: -1 | 1): string => {
    const near = (towards * apart) / 2;
    const far = near + towards * thick;
    const middle = (near + far) / 2;
    const tip = 2 * side;
    const corners = [
      [near, -side],
      [near, side],
      [middle, tip],
      [far, side],
      [far, -side],
      [middle, -tip],
    ] as const;
    const points = corners.map(([along, across]) =>
      upright ? `${round(x + across)} ${round(y + along)}` : `${round(x + along)} ${round(y + across)}`,
    );
    return `M${points.join('L')}Z`;
  };
  return hexagon(-1) + hexagon(1);
}

/** A coil of four turns lying along the line at y, from x - long/2 to x + long/2. */
export function coilPath(x: number, y: number, long: number): string {
  const turn = long / 4;
  const arcs = Array.from({ length: 4 }, () => `a${turn / 2} ${turn / 2} 0 0 1 ${turn} 0`);
  return `M${round(x - long / 2)} ${round(y)}${arcs.join('')}`;
}

export interface RingPlace {
  readonly x: number;
  readonly y: number;
  /** From the ring down to the net that it stands on. */
  readonly stem: number;
}

/** More than these on one net would leave the drawing; the list beside names them all. */
const MOST_ON_A_NET = 3;

/**
 * One ring for every node that stays charged by itself, on the net of the capacitor that holds it. A second node on the
 * same net stands above the first with a stem, so that it cannot be read as another net. Null where no place is left.
 */
export function ringPlaces(plan: CircuitPlan, nodes: RigSpec['nodes']): readonly (RingPlace | null)[] {
  const taken = { first: 0, second: 0 };
  return nodes.map(({ holds }) => {
    const base = plan.rings[holds === 'first' ? 0 : 1];
    const k = taken[holds];
    taken[holds] += 1;
    if (base === undefined || k >= MOST_ON_A_NET) return null;
    const up = k * (2.2 * plan.ring_r);
    return base.y - up < plan.ring_r
      ? null
      : { x: base.x, y: base.y - up, stem: k === 0 ? 0 : 2.2 * plan.ring_r };
  });
}

function round(value: number): number {
  return Math.round(value * 10) / 10;
}
