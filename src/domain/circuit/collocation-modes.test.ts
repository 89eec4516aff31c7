import { describe, expect, it } from 'vitest';
import { radauCollocation } from './collocation';
import { collocationModes } from './collocation-modes';

interface Complex {
  readonly re: number;
  readonly im: number;
}

const S = 5;
const RADAU = radauCollocation(S);
const MODES = collocationModes(RADAU);

/** The matrix of a function, from its values at the modes. */
function matrixOf(f: (value: Complex) => Complex): Float64Array {
  const out = new Float64Array(S * S);
  MODES.values.forEach((value, mode) => {
    const { re, im } = f(value);
    for (let k = 0; k < S * S; k += 1) {
      const real = MODES.parts[2 * mode * S * S + k] ?? 0;
      const imaginary = MODES.parts[(2 * mode + 1) * S * S + k] ?? 0;
      out[k] = (out[k] ?? 0) + re * real + im * imaginary;
    }
  });
  return out;
}

const UNIT = Float64Array.from({ length: S * S }, (_, at) => (at % (S + 1) === 0 ? 1 : 0));
const apart = (one: Float64Array, other: Float64Array) =>
  Math.max(...one.map((entry, at) => Math.abs(entry - (other[at] ?? 0))));
const inverse = ({ re, im }: Complex) => ({ re: re / (re * re + im * im), im: -im / (re * re + im * im) });

describe('the modes of the method', () => {
  it('are a real one and two pairs, all to the right of zero', () => {
    expect(MODES.values.filter(({ im }) => im === 0)).toHaveLength(1);
    expect(MODES.values.filter(({ im }) => im > 0)).toHaveLength(2);
    expect(MODES.values.every(({ re }) => re > 0)).toBe(true);
  });

  it('have the eigenvalues of the method, by its trace and by that of its inverse', () => {
    const sum = (f: (value: Complex) => Complex) =>
      MODES.values.reduce((total, value) => total + (value.im === 0 ? 1 : 2) * f(value).re, 0);
    const trace = (matrix: Float64Array) =>
      matrix.reduce((total, entry, at) => (at % (S + 1) === 0 ? total + entry : total), 0);
    expect(sum((value) => value)).toBeCloseTo(trace(RADAU.a), 13);
    expect(sum(inverse)).toBeCloseTo(trace(RADAU.w), 9);
  });

  it('give the unit matrix, the method itself and its inverse back', () => {
    expect(
      apart(
        matrixOf(() => ({ re: 1, im: 0 })),
        UNIT,
      ),
    ).toBeLessThan(1e-12);
    expect(
      apart(
        matrixOf((value) => value),
        RADAU.a,
      ),
    ).toBeLessThan(1e-13);
    expect(apart(matrixOf(inverse), RADAU.w)).toBeLessThan(1e-10);
  });

  it('have the row sums of their matrices', () => {
    for (let part = 0; part < 2 * MODES.values.length; part += 1) {
      for (let row = 0; row < S; row += 1) {
        const from = (part * S + row) * S;
        const sum = MODES.parts.slice(from, from + S).reduce((total, entry) => total + entry, 0);
        expect(MODES.partSums[part * S + row]).toBeCloseTo(sum, 12);
      }
    }
  });
});
