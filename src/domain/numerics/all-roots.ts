import { brent } from './brent';

interface Search {
  readonly low: number;
  readonly high: number;
  /** Pieces the range is cut into: two roots in one piece are missed, so it follows from the curve's shape. */
  readonly pieces: number;
  /** Equal ratios instead of equal steps, for a range over decades; needs low > 0. */
  readonly logarithmic?: boolean;
}

/**
 * Every sign change of a continuous function in a range, in rising order: none where there is none, and a
 * pole is not taken for a root. Values that are not finite cut the range.
 */
export function allRoots(f: (x: number) => number, search: Search): readonly number[] {
  const roots: number[] = [];
  const xs = cuts(search);
  let before: { readonly x: number; readonly y: number } | undefined;
  for (const x of xs) {
    const y = f(x);
    if (!Number.isFinite(y)) {
      before = undefined;
      continue;
    }
    if (y === 0) {
      roots.push(x);
    } else if (before !== undefined && before.y * y < 0) {
      const root = brent(f, { low: before.x, high: x });
      if (root.ok && isCrossing(f, root.value, { before: before.y, after: y })) roots.push(root.value);
    }
    before = { x, y };
  }
  return roots;
}

function cuts({ low, high, pieces, logarithmic = false }: Search): readonly number[] {
  if (!(high > low) || !(pieces >= 1) || (logarithmic && !(low > 0))) return [];
  return Array.from({ length: pieces + 1 }, (_, index) => {
    // The ends are exact, so that a root at the very end of the range is not lost to rounding.
    if (index === 0) return low;
    if (index === pieces) return high;
    const share = index / pieces;
    return logarithmic ? low * (high / low) ** share : low + (high - low) * share;
  });
}

// At a pole the function is far larger than at the ends of its piece; at a root it is far smaller.
function isCrossing(
  f: (x: number) => number,
  x: number,
  ends: { readonly before: number; readonly after: number },
): boolean {
  const there = Math.abs(f(x));
  return there <= Math.max(Math.abs(ends.before), Math.abs(ends.after));
}
