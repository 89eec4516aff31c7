import { ok, refused, type Result } from '../units/result';

interface Bracket {
  readonly low: number;
  readonly high: number;
}

const MOST_STEPS = 200;

/**
 * A root of a continuous function inside a bracket whose ends differ in sign, to the last digits of a double.
 * Brent's method: inverse quadratic or secant steps, halving when they do not shrink the bracket enough.
 * Source: R. P. Brent, Algorithms for Minimization without Derivatives (1973), chapter 4 (from memory).
 */
export function brent(f: (x: number) => number, bracket: Bracket): Result<number> {
  let a = bracket.low;
  let b = bracket.high;
  let fa = f(a);
  let fb = f(b);
  if (fa === 0) return ok(a);
  if (fb === 0) return ok(b);
  if (!(fa * fb < 0)) {
    return refused({ type: 'no-bracket', words: 'The two ends do not lie on different sides of a root.' });
  }
  let c = a;
  let fc = fa;
  let width = b - a;
  let before = width;
  for (let step = 0; step < MOST_STEPS; step += 1) {
    if (fb * fc > 0) {
      c = a;
      fc = fa;
      width = b - a;
      before = width;
    }
    if (Math.abs(fc) < Math.abs(fb)) {
      [a, b, c] = [b, c, b];
      [fa, fb, fc] = [fb, fc, fb];
    }
    const tolerance = 2 * Number.EPSILON * Math.abs(b) + Number.MIN_VALUE;
    const half = 0.5 * (c - b);
    if (Math.abs(half) <= tolerance || fb === 0) return ok(b);
    const guess = interpolate({ a, b, c, fa, fb, fc, half });
    const taken =
      Math.abs(before) >= tolerance && Math.abs(fa) > Math.abs(fb) && guess.fits(before, tolerance);
    before = taken ? width : half;
    width = taken ? guess.step : half;
    a = b;
    fa = fb;
    b += Math.abs(width) > tolerance ? width : Math.sign(half) * tolerance;
    fb = f(b);
  }
  return ok(b);
}

interface Triple {
  readonly a: number;
  readonly b: number;
  readonly c: number;
  readonly fa: number;
  readonly fb: number;
  readonly fc: number;
  readonly half: number;
}

function interpolate({ a, b, c, fa, fb, fc, half }: Triple) {
  const s = fb / fa;
  let p: number;
  let q: number;
  if (a === c) {
    p = 2 * half * s;
    q = 1 - s;
  } else {
    const u = fa / fc;
    const r = fb / fc;
    p = s * (2 * half * u * (u - r) - (b - a) * (r - 1));
    q = (u - 1) * (r - 1) * (s - 1);
  }
  if (p > 0) q = -q;
  p = Math.abs(p);
  return {
    step: p / q,
    fits: (before: number, tolerance: number) =>
      2 * p < Math.min(3 * half * q - Math.abs(tolerance * q), Math.abs(before * q)),
  };
}
