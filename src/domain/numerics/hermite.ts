/** One cubic piece: two ends, each with its height and slope. */
export interface HermitePiece {
  readonly x0: number;
  readonly x1: number;
  readonly y0: number;
  readonly y1: number;
  readonly slope0: number;
  readonly slope1: number;
}

/** Cubic Hermite interpolation between the ends of a piece. */
export function hermite({ x0, x1, y0, y1, slope0, slope1 }: HermitePiece, x: number): number {
  const width = x1 - x0;
  const t = (x - x0) / width;
  const rest = 1 - t;
  return (
    y0 * rest * rest * (1 + 2 * t) +
    y1 * t * t * (3 - 2 * t) +
    width * t * rest * (slope0 * rest - slope1 * t)
  );
}

/**
 * Whether a rising piece rises everywhere: each end slope between 0 and 3 times the mean slope is enough.
 * Source: Fritsch and Carlson, SIAM J. Numer. Anal. 17 (1980) 238 (from memory).
 */
export function isRising({ x0, x1, y0, y1, slope0, slope1 }: HermitePiece): boolean {
  const mean = (y1 - y0) / (x1 - x0);
  if (!(mean > 0)) return false;
  return [slope0, slope1].every((slope) => slope >= 0 && slope / mean <= 3);
}
