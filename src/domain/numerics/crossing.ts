/** Two points of a function on either side of zero, as close together as was asked for. */
export interface Crossing {
  /** Where the function is zero or above. */
  readonly above: number;
  readonly below: number;
}

interface Ends {
  readonly a: number;
  readonly fa: number;
  readonly b: number;
  readonly fb: number;
}

const MOST_ROUNDS = 200;

/**
 * Narrows a change of sign between `a` and `b` down to a length, or to the last digits of where it is. Works across a jump as well, and every
 * point that it gives back has been asked. Inverse quadratic steps where they can be trusted, halving otherwise:
 * T. R. Chandrupatla, Advances in Engineering Software 28 (1997) 145 (from memory). A value that is no number counts as
 * below.
 */
export function crossingBetween(f: (x: number) => number, ends: Ends, precision: number): Crossing {
  let { a, fa, b, fb } = ends;
  let c = a;
  let fc = fa;
  // A straight line first: most curves that come here are nearly straight.
  let share = insideShare(fa / (fa - fb));
  for (let round = 0; round < MOST_ROUNDS; round += 1) {
    const x = a + share * (b - a);
    const fx = f(x);
    if (fx >= 0 === fa >= 0) {
      c = a;
      fc = fa;
    } else {
      c = b;
      fc = fb;
      b = a;
      fb = fa;
    }
    a = x;
    fa = fx;
    const smaller = Math.abs(fa) < Math.abs(fb) ? a : b;
    const least = 0.5 * Math.max(precision, 4 * Number.EPSILON * Math.abs(smaller));
    const edge = least / Math.abs(b - a);
    if (edge >= 0.5 || (fa === 0 && fb < 0)) break;
    share = Math.min(1 - edge, Math.max(edge, stepOf({ a, fa, b, fb }, c, fc)));
  }
  return fa >= 0 ? { above: a, below: b } : { above: b, below: a };
}

function insideShare(share: number): number {
  return share > 0 && share < 1 ? share : 0.5;
}

function stepOf({ a, fa, b, fb }: Ends, c: number, fc: number): number {
  const xi = (a - b) / (c - b);
  const phi = (fa - fb) / (fc - fb);
  // Else the inverse parabola does not run from end to end.
  if (!(phi * phi < xi && (1 - phi) * (1 - phi) < 1 - xi)) return 0.5;
  return (fa / (fb - fa)) * (fc / (fb - fc)) + ((c - a) / (b - a)) * (fa / (fc - fa)) * (fb / (fc - fb));
}
