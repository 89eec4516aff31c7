/** A measured table: x in rising order, y beside it. */
export type Table = readonly (readonly [x: number, y: number])[];

/** Straight lines between the rows of a table; undefined outside it, since a table says nothing there. */
export function readTable(table: Table, x: number): number | undefined {
  for (let index = 1; index < table.length; index += 1) {
    const left = table[index - 1];
    const right = table[index];
    if (left === undefined || right === undefined) break;
    if (x >= left[0] && x <= right[0]) {
      return left[1] + ((right[1] - left[1]) * (x - left[0])) / (right[0] - left[0]);
    }
  }
  return undefined;
}
