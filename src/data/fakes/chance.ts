import type { RandomBytes } from '../ports/ports';

/** Repeatable bytes (xorshift32): a failing run is told by its seed. */
export function seededBytes(seed: number): RandomBytes {
  let state = (seed * 2_654_435_761 + 1) >>> 0 || 1;
  const next = () => {
    state ^= state << 13;
    state >>>= 0;
    state ^= state >>> 17;
    state ^= state << 5;
    state >>>= 0;
    return state;
  };
  return (count) => {
    const bytes = new Uint8Array(count);
    for (let at = 0; at < count; at += 1) bytes[at] = next() >>> 24;
    return bytes;
  };
}
