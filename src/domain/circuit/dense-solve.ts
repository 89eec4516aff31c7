/**
 * Solves a square system in place: `matrix` (row by row) is destroyed and `right` becomes the solution. Elimination
 * with row exchange; false where the matrix is singular or not finite.
 */
export function solveInPlace(matrix: Float64Array, right: Float64Array, n: number): boolean {
  for (let column = 0; column < n; column += 1) {
    let pivotRow = column;
    let pivotSize = Math.abs(matrix[column * n + column] ?? 0);
    for (let row = column + 1; row < n; row += 1) {
      const size = Math.abs(matrix[row * n + column] ?? 0);
      if (size > pivotSize) {
        pivotSize = size;
        pivotRow = row;
      }
    }
    if (!(pivotSize > 0 && pivotSize < Infinity)) return false;
    if (pivotRow !== column) {
      exchangeRows(matrix, n, [column, pivotRow]);
      exchangeRows(right, 1, [column, pivotRow]);
    }
    const top = column * n;
    const share = 1 / (matrix[top + column] ?? 0);
    const known = right[column] ?? 0;
    for (let row = column + 1; row < n; row += 1) {
      const start = row * n;
      const factor = (matrix[start + column] ?? 0) * share;
      if (factor === 0) continue;
      for (let k = column + 1; k < n; k += 1) {
        matrix[start + k] = (matrix[start + k] ?? 0) - factor * (matrix[top + k] ?? 0);
      }
      right[row] = (right[row] ?? 0) - factor * known;
    }
  }
  for (let row = n - 1; row >= 0; row -= 1) {
    const start = row * n;
    let sum = right[row] ?? 0;
    for (let k = row + 1; k < n; k += 1) sum -= (matrix[start + k] ?? 0) * (right[k] ?? 0);
    right[row] = sum / (matrix[start + row] ?? 0);
  }
  return true;
}

/** Inverse of a small square matrix into `out`; `matrix` is destroyed. False where it is singular. */
export function invertInto(matrix: Float64Array, out: Float64Array, n: number): boolean {
  out.fill(0);
  for (let i = 0; i < n; i += 1) out[i * n + i] = 1;
  for (let column = 0; column < n; column += 1) {
    let pivotRow = column;
    for (let row = column + 1; row < n; row += 1) {
      if (Math.abs(matrix[row * n + column] ?? 0) > Math.abs(matrix[pivotRow * n + column] ?? 0))
        pivotRow = row;
    }
    if (pivotRow !== column) {
      exchangeRows(matrix, n, [column, pivotRow]);
      exchangeRows(out, n, [column, pivotRow]);
    }
    const pivot = matrix[column * n + column] ?? 0;
    if (!(Math.abs(pivot) > 0 && Math.abs(pivot) < Infinity)) return false;
    const share = 1 / pivot;
    for (let k = 0; k < n; k += 1) {
      matrix[column * n + k] = (matrix[column * n + k] ?? 0) * share;
      out[column * n + k] = (out[column * n + k] ?? 0) * share;
    }
    for (let row = 0; row < n; row += 1) {
      if (row === column) continue;
      const factor = matrix[row * n + column] ?? 0;
      if (factor === 0) continue;
      for (let k = 0; k < n; k += 1) {
        matrix[row * n + k] = (matrix[row * n + k] ?? 0) - factor * (matrix[column * n + k] ?? 0);
        out[row * n + k] = (out[row * n + k] ?? 0) - factor * (out[column * n + k] ?? 0);
      }
    }
  }
  return true;
}

/** out = factor * one * other. */
export function multiplyInto(
  out: Float64Array,
  one: Float64Array,
  { other, factor, n }: { readonly other: Float64Array; readonly factor: number; readonly n: number },
): void {
  for (let i = 0; i < n; i += 1) {
    for (let j = 0; j < n; j += 1) {
      let sum = 0;
      for (let k = 0; k < n; k += 1) sum += (one[i * n + k] ?? 0) * (other[k * n + j] ?? 0);
      out[i * n + j] = factor * sum;
    }
  }
}

function exchangeRows(matrix: Float64Array, width: number, rows: readonly [number, number]): void {
  const one = rows[0] * width;
  const other = rows[1] * width;
  for (let k = 0; k < width; k += 1) {
    const kept = matrix[one + k] ?? 0;
    matrix[one + k] = matrix[other + k] ?? 0;
    matrix[other + k] = kept;
  }
}
