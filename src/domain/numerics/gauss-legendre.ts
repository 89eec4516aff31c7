/** Nodes in (-1, 1) and their weights. */
export interface QuadratureRule {
  readonly nodes: readonly number[];
  readonly weights: readonly number[];
}

/**
 * Gauss-Legendre rule of n points, exact for polynomials up to degree 2n - 1. Nodes by Newton's method on the
 * Legendre polynomial from the cosine estimate. Source: Abramowitz and Stegun 25.4.29 (from memory).
 */
export function gaussLegendre(points: number): QuadratureRule {
  const nodes: number[] = [];
  const weights: number[] = [];
  for (let index = 0; index < points; index += 1) {
    let x = Math.cos((Math.PI * (index + 0.75)) / (points + 0.5));
    let slope = 1;
    for (let step = 0; step < 20; step += 1) {
      const value = legendre(points, x);
      slope = value.slope;
      const change = value.height / slope;
      x -= change;
      if (Math.abs(change) < 1e-15) break;
    }
    slope = legendre(points, x).slope;
    nodes.push(x);
    weights.push(2 / ((1 - x * x) * slope * slope));
  }
  return { nodes: nodes.reverse(), weights: weights.reverse() };
}

/** Integral of a smooth function by a fixed rule. */
export function integrateWith(
  rule: QuadratureRule,
  f: (x: number) => number,
  range: { readonly low: number; readonly high: number },
): number {
  const half = 0.5 * (range.high - range.low);
  const middle = 0.5 * (range.high + range.low);
  let sum = 0;
  rule.nodes.forEach((node, index) => {
    sum += (rule.weights[index] ?? 0) * f(middle + half * node);
  });
  return half * sum;
}

function legendre(degree: number, x: number): { readonly height: number; readonly slope: number } {
  let before = 1;
  let height = x;
  for (let k = 2; k <= degree; k += 1) {
    const next = ((2 * k - 1) * x * height - (k - 1) * before) / k;
    before = height;
    height = next;
  }
  return { height, slope: (degree * (x * height - before)) / (x * x - 1) };
}
