/** Cuts arrays of a length from one block. */
export type Scratch = (length: number) => Float64Array;

/** A block of memory for a whole run: an array of its own for every purpose would cost as much as a dozen steps. */
export function createScratch(length: number): Scratch {
  const block = new ArrayBuffer(length * Float64Array.BYTES_PER_ELEMENT);
  let used = 0;
  return (wanted) => {
    const part = new Float64Array(block, used * Float64Array.BYTES_PER_ELEMENT, wanted);
    used += wanted;
    return part;
  };
}
