/**
 * Solves linear equations in place, for several right-hand sides at once: `system` is `size` rows of `size` coefficients
 * followed by `columns` right-hand sides, and these become the solutions; the coefficients are destroyed. Elimination
 * with the largest pivot of each column; false where there is no single finite solution.
 */
export function solveLinear(system: Float64Array, size: number, columns = 1): boolean {
  const width = size + columns;
  for (let column = 0; column < size; column += 1) {
    if (!bringUpPivot(system, { size, width, column })) return false;
    const top = column * width;
    const share = 1 / (system[top + column] ?? 0);
    for (let row = column + 1; row < size; row += 1) {
      const start = row * width;
      const factor = (system[start + column] ?? 0) * share;
      if (factor === 0) continue;
      for (let k = column + 1; k < width; k += 1) {
        system[start + k] = (system[start + k] ?? 0) - factor * (system[top + k] ?? 0);
      }
    }
  }
  return substituteBack(system, size, width);
}

function bringUpPivot(
  system: Float64Array,
  { size, width, column }: { readonly size: number; readonly width: number; readonly column: number },
): boolean {
  let pivot = column;
  let largest = Math.abs(system[column * width + column] ?? 0);
  for (let row = column + 1; row < size; row += 1) {
    const entry = Math.abs(system[row * width + column] ?? 0);
    if (entry > largest) {
      largest = entry;
      pivot = row;
    }
  }
  if (!(largest > 0 && largest < Infinity)) return false;
  if (pivot === column) return true;
  const one = column * width;
  const other = pivot * width;
  for (let k = column; k < width; k += 1) {
    const kept = system[one + k] ?? 0;
    system[one + k] = system[other + k] ?? 0;
    system[other + k] = kept;
  }
  return true;
}

function substituteBack(system: Float64Array, size: number, width: number): boolean {
  for (let row = size - 1; row >= 0; row -= 1) {
    const start = row * width;
    const share = 1 / (system[start + row] ?? 0);
    for (let column = size; column < width; column += 1) {
      let rest = system[start + column] ?? 0;
      for (let k = row + 1; k < size; k += 1) {
        rest -= (system[start + k] ?? 0) * (system[k * width + column] ?? 0);
      }
      const solution = rest * share;
      if (!Number.isFinite(solution)) return false;
      system[start + column] = solution;
    }
  }
  return true;
}
