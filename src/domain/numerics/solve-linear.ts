/**
 * Solves a dense system of linear equations by elimination with the largest pivot of each column. Rows are left as
 * they are. Undefined where the system has no single solution.
 */
export function solveLinear(
  matrix: readonly (readonly number[] | Float64Array)[],
  right: readonly number[] | Float64Array,
): Float64Array | undefined {
  const size = right.length;
  const rows = matrix.map((row, index) => Float64Array.from([...row, right[index] ?? Number.NaN]));
  for (let column = 0; column < size; column += 1) {
    const pivot = pivotRow(rows, column);
    const chosen = rows[pivot];
    const displaced = rows[column];
    const lead = chosen?.[column] ?? 0;
    if (chosen === undefined || displaced === undefined || !(Math.abs(lead) > 0)) return undefined;
    rows[pivot] = displaced;
    rows[column] = chosen;
    for (let below = column + 1; below < size; below += 1) {
      const row = rows[below];
      if (row !== undefined) eliminate(row, chosen, column);
    }
  }
  return backSubstitute(rows, size);
}

function pivotRow(rows: readonly Float64Array[], column: number): number {
  let best = column;
  for (let row = column + 1; row < rows.length; row += 1) {
    if (Math.abs(rows[row]?.[column] ?? 0) > Math.abs(rows[best]?.[column] ?? 0)) best = row;
  }
  return best;
}

function eliminate(row: Float64Array, pivot: Float64Array, column: number): void {
  const factor = (row[column] ?? 0) / (pivot[column] ?? 1);
  if (factor === 0) return;
  for (let index = column; index < row.length; index += 1) {
    row[index] = (row[index] ?? 0) - factor * (pivot[index] ?? 0);
  }
}

function backSubstitute(rows: readonly Float64Array[], size: number): Float64Array | undefined {
  const solution = new Float64Array(size);
  for (let index = size - 1; index >= 0; index -= 1) {
    const row = rows[index];
    if (row === undefined) return undefined;
    let rest = row[size] ?? Number.NaN;
    for (let later = index + 1; later < size; later += 1) rest -= (row[later] ?? 0) * (solution[later] ?? 0);
    solution[index] = rest / (row[index] ?? Number.NaN);
  }
  return solution.every(Number.isFinite) ? solution : undefined;
}
