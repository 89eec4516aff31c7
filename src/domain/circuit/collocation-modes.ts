import type { Collocation } from './collocation';

interface Complex {
  readonly re: number;
  readonly im: number;
}

/**
 * The eigenvalues of a method's matrix `a` with what belongs to each: any function of `a` is then the sum of fixed
 * matrices, weighted by that function of the eigenvalues. Only one of a complex pair is kept; its weight's real and
 * imaginary part have a matrix each.
 */
export interface CollocationModes {
  readonly values: readonly Complex[];
  /** Two matrices for every value, for the real and the imaginary part of its weight; row by row, one after the other. */
  readonly parts: Float64Array;
  /** Row sums of the same matrices. */
  readonly partSums: Float64Array;
}

/** Modes of a Radau IIA method with an odd number of stages. */
export function collocationModes({ a, nodes }: Collocation): CollocationModes {
  const s = nodes.length;
  const all = inverseRoots(stabilityDenominator(s));
  const values = all.filter(({ im }) => im >= 0);
  const parts = new Float64Array(2 * values.length * s * s);
  values.forEach((value, mode) => {
    const others = all.filter((other) => other !== value);
    const { re, im } = projector(a, value, others);
    const share = value.im === 0 ? 1 : 2;
    for (let k = 0; k < s * s; k += 1) {
      parts[2 * mode * s * s + k] = share * (re[k] ?? 0);
      parts[(2 * mode + 1) * s * s + k] = -share * (im[k] ?? 0);
    }
  });
  const partSums = new Float64Array(2 * values.length * s);
  for (let k = 0; k < parts.length; k += 1) {
    const row = Math.floor(k / s);
    partSums[row] = (partSums[row] ?? 0) + (parts[k] ?? 0);
  }
  return { values, parts, partSums };
}

/**
 * Powers of z in det(1 - z a), lowest first: the denominator of the Padé approximant of e^z with one power less above.
 * Hairer and Wanner II, theorem 3.11 in chapter IV (from memory); the tests hold it against `a` itself.
 */
function stabilityDenominator(s: number): readonly number[] {
  const powers = [1];
  for (let j = 1; j <= s; j += 1) {
    powers.push(((powers[j - 1] ?? 0) * -(s - j + 1)) / (j * (2 * s - j)));
  }
  return powers;
}

/** One over each root, real ones without a trace of an imaginary part: Durand and Kerner's iteration. */
function inverseRoots(powers: readonly number[]): readonly Complex[] {
  // With the powers turned round the roots are the inverse ones.
  const s = powers.length - 1;
  const at = (x: Complex) => powers.reduce<Complex>((sum, power) => plus(times(sum, x), power), ZERO);
  let roots = Array.from({ length: s }, (_, k) => {
    const angle = (2 * Math.PI * k) / s + 0.4;
    return { re: 0.2 * Math.cos(angle), im: 0.2 * Math.sin(angle) };
  });
  for (let round = 0; round < 200; round += 1) {
    roots = roots.map((root, k) => {
      const apart = roots.reduce(
        (product, other, j) => (j === k ? product : times(product, minus(root, other))),
        ONE,
      );
      return minus(root, over(at(root), apart));
    });
  }
  return roots.map(({ re, im }) => ({ re, im: Math.abs(im) < 1e-9 ? 0 : im }));
}

/** Product of (a - other)/(value - other) over the others. */
function projector(a: Float64Array, value: Complex, others: readonly Complex[]) {
  const s = Math.sqrt(a.length);
  let re = Float64Array.from(a, (_, k) => (k % (s + 1) === 0 ? 1 : 0));
  let im = new Float64Array(a.length);
  for (const other of others) {
    const scale = over(ONE, minus(value, other));
    const nextRe = new Float64Array(a.length);
    const nextIm = new Float64Array(a.length);
    for (let i = 0; i < s; i += 1) {
      for (let j = 0; j < s; j += 1) {
        let sum: Complex = times(
          { re: re[i * s + j] ?? 0, im: im[i * s + j] ?? 0 },
          { re: -other.re, im: -other.im },
        );
        for (let k = 0; k < s; k += 1) {
          const right = a[k * s + j] ?? 0;
          sum = { re: sum.re + (re[i * s + k] ?? 0) * right, im: sum.im + (im[i * s + k] ?? 0) * right };
        }
        const scaled = times(sum, scale);
        nextRe[i * s + j] = scaled.re;
        nextIm[i * s + j] = scaled.im;
      }
    }
    re = nextRe;
    im = nextIm;
  }
  return { re, im };
}

const ZERO: Complex = { re: 0, im: 0 };
const ONE: Complex = { re: 1, im: 0 };

function plus(one: Complex, real: number): Complex {
  return { re: one.re + real, im: one.im };
}

function minus(one: Complex, other: Complex): Complex {
  return { re: one.re - other.re, im: one.im - other.im };
}

function times(one: Complex, other: Complex): Complex {
  return { re: one.re * other.re - one.im * other.im, im: one.re * other.im + one.im * other.re };
}

function over(one: Complex, other: Complex): Complex {
  const size = other.re * other.re + other.im * other.im;
  const turned = times(one, { re: other.re, im: -other.im });
  return { re: turned.re / size, im: turned.im / size };
}
