/** A straight line through points by least squares, with what the residuals say about its two numbers. */
export interface LineFit {
  /** Height at x = 0. */
  readonly intercept: number;
  readonly slope: number;
  readonly residuals: readonly number[];
  /** Standard deviation of the residuals with two numbers taken off; 0 for two points. */
  readonly scatter: number;
  readonly slopeError: number;
  readonly interceptError: number;
}

/** Undefined with fewer than two points, or where all stand at one x. */
export function fitLine(points: readonly (readonly [x: number, y: number])[]): LineFit | undefined {
  const count = points.length;
  if (count < 2) return undefined;
  const meanX = sum(points, ([x]) => x) / count;
  const meanY = sum(points, ([, y]) => y) / count;
  const spread = sum(points, ([x]) => (x - meanX) ** 2);
  // The same x but for rounding says nothing about a slope.
  if (!(spread > 1e-24 * (meanX * meanX + 1e-300) * count)) return undefined;
  const slope = sum(points, ([x, y]) => (x - meanX) * (y - meanY)) / spread;
  const intercept = meanY - slope * meanX;
  const residuals = points.map(([x, y]) => y - meanY - slope * (x - meanX));
  const squares = residuals.reduce((total, one) => total + one * one, 0);
  const scatter = count > 2 ? Math.sqrt(squares / (count - 2)) : 0;
  return {
    intercept,
    slope,
    residuals,
    scatter,
    slopeError: scatter / Math.sqrt(spread),
    interceptError: scatter * Math.sqrt(1 / count + (meanX * meanX) / spread),
  };
}

function sum<T>(list: readonly T[], of: (one: T) => number): number {
  return list.reduce((total, one) => total + of(one), 0);
}
