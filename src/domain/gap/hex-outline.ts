interface OutlinePoint {
  readonly x: number;
  readonly y: number;
}

/** How two equal hexagonal bars face each other: flat to flat or edge to edge. */
export type HexOrientation = 'flat' | 'edge';

/** Corner radius and gap of two hexagonal bars, in units of the width across flats. */
export interface HexShape {
  readonly orientation: HexOrientation;
  readonly cornerOverFlats: number;
  readonly gapOverFlats: number;
}

/** A straight piece of the outline, from one end to the other. */
export interface Panel {
  readonly x0: number;
  readonly y0: number;
  readonly x1: number;
  readonly y1: number;
}

const THIRD_TURN = Math.PI / 3;
const ARC_PANELS = 22;
const MOST_ARC_PANELS = 90;
const BACK_ARC_PANELS = 6;
const FLAT_PANELS = 24;
const BACK_FLAT_PANELS = 12;

/**
 * The upper half of the left bar's outline, from its front on the axis around to its back. The middle of the gap lies
 * at x = 0, the width across flats is 1.
 */
export function hexOutline({
  orientation,
  cornerOverFlats: corner,
  gapOverFlats: gap,
}: HexShape): readonly Panel[] {
  // Corners are arcs about a smaller hexagon's corners, tangent to both flats.
  const reach = (0.5 - corner) / Math.cos(THIRD_TURN / 2);
  const front = orientation === 'flat' ? 0.5 : reach + corner;
  const centre = -(0.5 * gap + front);
  const first = orientation === 'flat' ? THIRD_TURN / 2 : 0;
  const panels: Panel[] = [];
  const corners = orientation === 'flat' ? 3 : 4;
  const points: OutlinePoint[] = [];
  if (orientation === 'flat') points.push({ x: centre + 0.5, y: 0 });
  for (let index = 0; index < corners; index += 1) {
    const middle = first + index * THIRD_TURN;
    const from = Math.max(0, middle - THIRD_TURN / 2);
    const to = Math.min(Math.PI, middle + THIRD_TURN / 2);
    const near = index <= 1;
    const place = (angle: number) => ({
      x: centre + reach * Math.cos(middle) + corner * Math.cos(angle),
      y: reach * Math.sin(middle) + corner * Math.sin(angle),
    });
    const start = place(from);
    const last = points.at(-1);
    if (last !== undefined) {
      const half = orientation === 'flat' && index === 0;
      points.push(...flatPoints(last, start, { count: near ? FLAT_PANELS : BACK_FLAT_PANELS, half }));
    } else {
      points.push({ ...start });
    }
    const count = near ? arcPanels(corner, gap) : BACK_ARC_PANELS;
    for (let step = 1; step <= count; step += 1) {
      points.push(place(from + (to - from) * arcShare(step / count, from === middle)));
    }
  }
  const last = points.at(-1);
  if (orientation === 'flat' && last !== undefined) {
    points.push(...flatPoints(last, { x: centre - 0.5, y: 0 }, { count: BACK_FLAT_PANELS, half: false }));
  }
  for (let index = 1; index < points.length; index += 1) {
    const a = points[index - 1];
    const b = points[index];
    if (a === undefined || b === undefined) continue;
    panels.push({ x0: a.x, y0: a.y, x1: b.x, y1: b.y });
  }
  return panels;
}

/** In a gap that is small against the corner radius the panels follow the gap. */
function arcPanels(corner: number, gap: number): number {
  return Math.min(MOST_ARC_PANELS, Math.max(ARC_PANELS, Math.ceil((4 * corner * THIRD_TURN) / gap)));
}

/** Points that crowd towards the arcs at the ends of a flat; a half flat crowds at its far end only. */
function flatPoints(
  from: OutlinePoint,
  to: OutlinePoint,
  { count, half }: { readonly count: number; readonly half: boolean },
) {
  return Array.from({ length: count }, (_, index) => {
    const t = (index + 1) / count;
    const share = half ? crowded(0.5 + 0.5 * t) * 2 - 1 : crowded(t);
    return { x: from.x + (to.x - from.x) * share, y: from.y + (to.y - from.y) * share };
  });
}

/** Maps 0..1 onto itself with points packed at both ends as the field's singularity asks. */
function crowded(t: number): number {
  const low = t ** 3;
  const high = (1 - t) ** 3;
  return low / (low + high);
}

/** The field changes fastest where an arc meets a flat; an arc cut in half by the axis has one such end. */
function arcShare(t: number, cut: boolean): number {
  return cut ? Math.sin(0.5 * Math.PI * t) : 0.5 * (1 - Math.cos(Math.PI * t));
}
