const SERIES_UP_TO = 2;
const TINY = 1e-300;

/**
 * Complementary error function, to about 1e-13 of its value: the series of erf for small arguments, the
 * continued fraction beyond. Source: Abramowitz and Stegun 7.1.5 and 7.1.14 (from memory).
 */
export function erfc(x: number): number {
  if (x < 0) return 2 - erfc(-x);
  return x < SERIES_UP_TO ? 1 - erfSeries(x) : erfcFraction(x);
}

function erfSeries(x: number): number {
  let term = x;
  let sum = x;
  for (let n = 1; n < 200; n += 1) {
    term *= (-x * x) / n;
    const part = term / (2 * n + 1);
    sum += part;
    if (Math.abs(part) < 1e-17 * Math.abs(sum)) break;
  }
  return (2 / Math.sqrt(Math.PI)) * sum;
}

// Lentz's method on x + (1/2)/(x + 1/(x + (3/2)/(x + ...))).
function erfcFraction(x: number): number {
  let fraction = x;
  let c = x;
  let d = 0;
  for (let n = 1; n < 500; n += 1) {
    const a = n / 2;
    d = 1 / Math.max(x + a * d, TINY);
    c = x + a / c;
    const change = c * d;
    fraction *= change;
    if (Math.abs(change - 1) < 1e-16) break;
  }
  return Math.exp(-x * x) / (Math.sqrt(Math.PI) * fraction);
}
