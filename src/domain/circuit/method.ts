import { radauCollocation, STAGES } from './collocation';
import { collocationModes } from './collocation-modes';

const S = STAGES;

/** The method that circuits are followed with. */
export const RADAU = radauCollocation(S);
const MODES = collocationModes(RADAU);

/** Eigenvalues of its matrix, those of a pair by one of them. */
export const MODE_RE = Float64Array.from(MODES.values, ({ re }) => re);
export const MODE_IM = Float64Array.from(MODES.values, ({ im }) => im);
export const MODE_COUNT = MODES.values.length;
/** Real and imaginary part for every mode, of a function at it. */
export const WEIGHTS = 2 * MODE_COUNT;

/** The matrix of a function, from its values at the modes. */
export function matrixOf(weights: Float64Array, out: Float64Array): void {
  blend(MODES.parts, weights, out);
}

/** What the matrix of a function makes of ones. */
export function rowSumsOf(weights: Float64Array, out: Float64Array): void {
  blend(MODES.partSums, weights, out);
}

// All parts in one pass: with three modes a sum of six, written out because it is most of a change of step.
function blend(parts: Float64Array, weights: Float64Array, out: Float64Array): void {
  const n = out.length;
  const [w0, w1, w2] = [weights[0] ?? 0, weights[1] ?? 0, weights[2] ?? 0];
  const [w3, w4, w5] = [weights[3] ?? 0, weights[4] ?? 0, weights[5] ?? 0];
  for (let k = 0; k < n; k += 1) {
    out[k] =
      w0 * (parts[k] ?? 0) +
      w1 * (parts[k + n] ?? 0) +
      w2 * (parts[k + 2 * n] ?? 0) +
      w3 * (parts[k + 3 * n] ?? 0) +
      w4 * (parts[k + 4 * n] ?? 0) +
      w5 * (parts[k + 5 * n] ?? 0);
  }
}

/** Five entries of a matrix from a place on, times a vector: the innermost sum of a step, written out for its speed. */
export function sumOfFive(matrix: Float64Array, from: number, vector: Float64Array): number {
  return (
    (matrix[from] ?? 0) * (vector[0] ?? 0) +
    (matrix[from + 1] ?? 0) * (vector[1] ?? 0) +
    (matrix[from + 2] ?? 0) * (vector[2] ?? 0) +
    (matrix[from + 3] ?? 0) * (vector[3] ?? 0) +
    (matrix[from + 4] ?? 0) * (vector[4] ?? 0)
  );
}
