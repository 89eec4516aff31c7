import type { Rounding } from '../units/format-quantity';
import type { NumberField } from './lookup';

/** An input where the figure crosses its target, with the sign of figure less target just below and above it. */
export interface Root {
  readonly x: number;
  readonly below: number;
  readonly above: number;
}

export interface Scanned {
  /** In rising order. */
  readonly roots: readonly Root[];
  /** Figure less target wherever the lookup had an answer. */
  readonly seen: readonly number[];
}

interface Options {
  readonly field: NumberField;
  /** A jump across the target counts only where the found value leans to one side of it. */
  readonly rounding: Rounding;
  /** False where one answer takes longer than a frame: fewer points. */
  readonly fast: boolean;
}

type Miss = (x: number) => number | null;

interface Point {
  readonly x: number;
  readonly y: number | null;
}

const PIECES = { fast: 72, slow: 24 } as const;
const HALVINGS = 60;
/** A miss that is this small beside what it was at the ends of its piece is a crossing, a larger one a jump. */
const CROSSING = 1e-6;
const GOLDEN = 0.6180339887498949;
const GOLDEN_STEPS = 40;

/** Every sign change over the field's range, and the two crossings of a dip between points. Poles are left out. */
export function scanRoots(at: Miss, { field, rounding, fast }: Options): Scanned {
  const whole = field.whole === true;
  const miss: Miss = whole ? (x) => at(Math.round(x)) : at;
  const grid = gridOf(field, fast ? PIECES.fast : PIECES.slow).map((x): Point => ({ x, y: miss(x) }));
  const points = whole ? grid : withDips(miss, grid);
  const roots: Root[] = [];
  for (const [i, point] of points.entries()) {
    const next = points[i + 1];
    const before = points[i - 1];
    if (point.y === 0) {
      // Where the figure stands on its target for a while, both ends of the stretch count.
      if (before?.y === 0 && next?.y === 0) continue;
      roots.push({ x: point.x, below: Math.sign(before?.y ?? 0), above: Math.sign(next?.y ?? 0) });
    } else if (point.y !== null && isPoint(next) && point.y * next.y < 0) {
      const root = crossing(
        miss,
        { from: { x: point.x, y: point.y }, to: { x: next.x, y: next.y } },
        { whole, rounding },
      );
      if (root !== null) roots.push(root);
    }
  }
  return { roots, seen: grid.flatMap(({ y }) => (y === null ? [] : [y])) };
}

/** The range that a slider offers closely, and that of the physics around it. */
function gridOf(field: NumberField, pieces: number): readonly number[] {
  const { min, max, minExcluded, slide, whole } = field;
  const least = minExcluded === true ? min + Math.max(Math.abs(min) * 1e-6, Number.MIN_VALUE) : min;
  if (whole === true && max - least <= 2 * pieces) {
    return Array.from({ length: Math.floor(max) - Math.ceil(least) + 1 }, (_, i) => Math.ceil(least) + i);
  }
  const all = [
    ...spaced(Math.max(least, slide.from), Math.min(max, slide.to), { pieces, log: slide.scale === 'log' }),
    ...outside(least, slide.from, pieces),
    ...outside(slide.to, max, pieces),
    least,
    max,
  ];
  const inside = all.filter((x) => Number.isFinite(x) && x >= least && x <= max);
  return [...new Set(whole === true ? inside.map(Math.round) : inside)].sort((a, b) => a - b);
}

/** A range that may span decades: by equal ratios where it can be, by equal steps otherwise. */
function outside(from: number, to: number, pieces: number): readonly number[] {
  if (!(to > from)) return [];
  const some = Math.ceil(pieces / 3);
  if (from > 0) return spaced(from, to, { pieces: some, log: to / from > 10 });
  if (from === 0 || to <= 0) return spaced(from, to, { pieces: some, log: false });
  return [...spaced(from, 0, { pieces: some, log: false }), ...spaced(0, to, { pieces: some, log: false })];
}

function spaced(
  from: number,
  to: number,
  { pieces, log }: { readonly pieces: number; readonly log: boolean },
): readonly number[] {
  if (!(to > from)) return [from];
  return Array.from({ length: pieces + 1 }, (_, i) => {
    if (i === 0) return from;
    if (i === pieces) return to;
    return log && from > 0 ? from * (to / from) ** (i / pieces) : from + ((to - from) * i) / pieces;
  });
}

/** Two crossings may lie in one piece: where three points dip towards the target, the bottom is looked for. */
function withDips(miss: Miss, points: readonly Point[]): readonly Point[] {
  return points.flatMap((point, i) => {
    const before = points[i - 1];
    const after = points[i + 1];
    if (point.y === null || !isPoint(before) || !isPoint(after)) return [point];
    const sign = Math.sign(point.y);
    const here = Math.abs(point.y);
    const falls = Math.max(Math.abs(before.y) - here, Math.abs(after.y) - here);
    // A curve that bends one way goes no deeper between its points than it fell to reach them; twice that is room enough.
    const dips =
      sign !== 0 &&
      Math.sign(before.y) === sign &&
      Math.sign(after.y) === sign &&
      here <= Math.abs(before.y) &&
      here <= Math.abs(after.y) &&
      here < 2 * falls;
    if (!dips) return [point];
    const bottom = bottomOf((x) => (miss(x) ?? Infinity) * sign, before.x, after.x);
    const y = miss(bottom);
    if (y === null || bottom === point.x) return [point];
    return [point, { x: bottom, y }].sort((a, b) => a.x - b.x);
  });
}

function isPoint(point: Point | undefined): point is { readonly x: number; readonly y: number } {
  return point !== undefined && point.y !== null;
}

function bottomOf(f: (x: number) => number, from: number, to: number): number {
  let [low, high] = [from, to];
  let a = high - GOLDEN * (high - low);
  let b = low + GOLDEN * (high - low);
  let [fa, fb] = [f(a), f(b)];
  for (let step = 0; step < GOLDEN_STEPS; step += 1) {
    if (fa < 0) return a;
    if (fb < 0) return b;
    if (fa < fb) {
      [high, b, fb] = [b, a, fa];
      a = high - GOLDEN * (high - low);
      fa = f(a);
    } else {
      [low, a, fa] = [a, b, fb];
      b = low + GOLDEN * (high - low);
      fb = f(b);
    }
  }
  return fa < fb ? a : b;
}

interface Bracket {
  readonly from: { readonly x: number; readonly y: number };
  readonly to: { readonly x: number; readonly y: number };
}

function crossing(
  miss: Miss,
  { from, to }: Bracket,
  { whole, rounding }: { readonly whole: boolean; readonly rounding: Rounding },
): Root | null {
  let [low, high] = [from, to];
  for (let step = 0; step < HALVINGS; step += 1) {
    const x = whole ? Math.round((low.x + high.x) / 2) : (low.x + high.x) / 2;
    if (x <= low.x || x >= high.x) break;
    const y = miss(x);
    if (y === null) return null;
    if (y === 0) return { x, below: Math.sign(low.y), above: Math.sign(high.y) };
    if (y * low.y > 0) low = { x, y };
    else high = { x, y };
  }
  const ends = Math.abs(from.y) + Math.abs(to.y);
  const left = Math.abs(low.y) + Math.abs(high.y);
  const sides = { below: Math.sign(low.y), above: Math.sign(high.y) };
  // At a pole the miss grows while the piece closes.
  if (left > ends) return null;
  const leans = rounding === 'up' ? high : low;
  if (left > CROSSING * ends && !whole) return rounding === 'nearest' ? null : { x: leans.x, ...sides };
  if (whole && rounding === 'nearest') {
    return { x: Math.abs(low.y) < Math.abs(high.y) ? low.x : high.x, ...sides };
  }
  return { x: leans.x, ...sides };
}
