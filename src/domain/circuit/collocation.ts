import { solveLinear } from '../numerics/solve-linear';

/**
 * Stages of the implicit Runge-Kutta method. Five give order 9 at the end of a step: few, long steps, and the ring of
 * a pulsed circuit is what it mostly follows.
 */
export const STAGES = 5;

/** A collocation method on [0, 1]; matrices are stored row by row. */
export interface Collocation {
  readonly nodes: Float64Array;
  /** a[i][j]: integral of the j-th cardinal polynomial from 0 to node i. */
  readonly a: Float64Array;
  /** Inverse of `a`. */
  readonly w: Float64Array;
  /** Row sums of `w`. */
  readonly w1: Float64Array;
  /** Weights of a quadrature over the step. */
  readonly b: Float64Array;
  /** Powers of theta from the start value and the stage values: (s + 1) rows of (s + 1). */
  readonly powers: Float64Array;
}

/**
 * The Radau IIA method with `s` stages, of order 2s - 1: L-stable, and its last stage is the end of the step. It does
 * not conserve energy by construction, unlike Gauss collocation, so that an energy audit still says something.
 * The nodes are the zeros of P(s) - P(s-1) on [0, 1]. Source: Hairer and Wanner, Solving Ordinary Differential
 * Equations II, section IV.5 (from memory); the tests hold it against its own order conditions.
 */
export function radauCollocation(s: number): Collocation {
  const nodes = radauNodes(s);
  const cardinal = cardinalPowers(nodes);
  const a = new Float64Array(s * s);
  for (let i = 0; i < s; i += 1) {
    for (let j = 0; j < s; j += 1) {
      let sum = 0;
      for (let k = 0; k < s; k += 1) {
        sum += ((cardinal[k * s + j] ?? 0) * (nodes[i] ?? 0) ** (k + 1)) / (k + 1);
      }
      a[i * s + j] = sum;
    }
  }
  const w = inverse(a, s);
  const w1 = new Float64Array(s);
  for (let i = 0; i < s * s; i += 1) w1[Math.floor(i / s)] = (w1[Math.floor(i / s)] ?? 0) + (w[i] ?? 0);
  return {
    nodes,
    a,
    w,
    w1,
    b: a.slice((s - 1) * s),
    powers: cardinalPowers(Float64Array.from([0, ...nodes])),
  };
}

/** Powers (rows) of the cardinal polynomials (columns) of some nodes. */
function cardinalPowers(nodes: Float64Array): Float64Array {
  const n = nodes.length;
  return inverse(
    Float64Array.from({ length: n * n }, (_, index) => (nodes[Math.floor(index / n)] ?? 0) ** (index % n)),
    n,
  );
}

/** Legendre polynomial on [0, 1] and the one below it. */
function legendre(s: number, theta: number): { readonly top: number; readonly below: number } {
  const x = 2 * theta - 1;
  let below = 1;
  let top = x;
  for (let k = 1; k < s; k += 1) [below, top] = [top, ((2 * k + 1) * x * top - k * below) / (k + 1)];
  return { top, below };
}

/** Highest power of a Legendre polynomial on [0, 1]. */
export function legendreLeading(s: number): number {
  let leading = 1;
  for (let k = 1; k <= s; k += 1) leading *= (2 * (2 * k - 1)) / k;
  return leading;
}

function radauNodes(s: number): Float64Array {
  const f = (theta: number) => {
    const { top, below } = legendre(s, theta);
    return top - below;
  };
  const nodes: number[] = [];
  const pieces = 400;
  for (let piece = 0; piece < pieces - 1; piece += 1) {
    let low = piece / pieces;
    let high = (piece + 1) / pieces;
    if (f(low) * f(high) > 0) continue;
    for (let halving = 0; halving < 60; halving += 1) {
      const middle = 0.5 * (low + high);
      if (f(low) * f(middle) <= 0) high = middle;
      else low = middle;
    }
    nodes.push(0.5 * (low + high));
  }
  return Float64Array.from([...nodes, 1]);
}

function inverse(matrix: Float64Array, n: number): Float64Array {
  const system = new Float64Array(2 * n * n);
  for (let i = 0; i < n; i += 1) {
    system.set(matrix.subarray(i * n, (i + 1) * n), 2 * i * n);
    system[2 * i * n + n + i] = 1;
  }
  if (!solveLinear(system, n, n)) throw new Error('a fixed matrix of the method is singular');
  return Float64Array.from({ length: n * n }, (_, at) => system[at + (Math.floor(at / n) + 1) * n] ?? 0);
}
