const MOST_TERMS = 500;
const TINY = 1e-300;

/** Chance that Student's t with so many degrees of freedom lies beyond +-t, both tails together. */
export function studentTails(t: number, freedom: number): number {
  return incompleteBeta(freedom / (freedom + t * t), 0.5 * freedom);
}

/**
 * The t that leaves a chance in both tails together: 12.71 at one degree and 0.05. By halving, so it is as good as the
 * chance itself.
 */
export function studentQuantile(tails: number, freedom: number): number {
  let low = 0;
  let high = 1;
  while (studentTails(high, freedom) > tails && high < 1e12) high *= 2;
  for (let step = 0; step < 200; step += 1) {
    const middle = 0.5 * (low + high);
    if (middle === low || middle === high) break;
    if (studentTails(middle, freedom) > tails) low = middle;
    else high = middle;
  }
  return high;
}

/** Regularised incomplete beta I_x(a, 1/2); Abramowitz and Stegun 26.5.8 and 26.7.1 (from memory). */
function incompleteBeta(x: number, a: number): number {
  if (x <= 0) return 0;
  if (x >= 1) return 1;
  const b = 0.5;
  const front = Math.exp(logGamma(a + b) - logGamma(a) - logGamma(b) + a * Math.log(x) + b * Math.log1p(-x));
  return x < (a + 1) / (a + b + 2)
    ? (front * fraction(x, a, b)) / a
    : 1 - (front * fraction(1 - x, b, a)) / b;
}

function fraction(x: number, a: number, b: number): number {
  let c = 1;
  let d = 1 / guard(1 - ((a + b) * x) / (a + 1));
  let result = d;
  for (let m = 1; m < MOST_TERMS; m += 1) {
    const even = (m * (b - m) * x) / ((a + 2 * m - 1) * (a + 2 * m));
    const odd = (-(a + m) * (a + b + m) * x) / ((a + 2 * m) * (a + 2 * m + 1));
    d = 1 / guard(1 + even * d);
    c = guard(1 + even / c);
    result *= d * c;
    d = 1 / guard(1 + odd * d);
    c = guard(1 + odd / c);
    result *= d * c;
    if (Math.abs(d * c - 1) < 1e-15) break;
  }
  return result;
}

function guard(value: number): number {
  return Math.abs(value) < TINY ? TINY : value;
}

/** Logarithm of the gamma function above 0: Stirling's series after moving up to 10. */
function logGamma(x: number): number {
  let shift = 0;
  let z = x;
  while (z < 10) {
    shift -= Math.log(z);
    z += 1;
  }
  const inverse = 1 / (z * z);
  const series = (1 / 12 - inverse * (1 / 360 - inverse * (1 / 1260 - inverse / 1680))) / z;
  return shift + (z - 0.5) * Math.log(z) - z + 0.5 * Math.log(2 * Math.PI) + series;
}
