import { PIECE, pieceAt } from './piece';
import type { Scratch } from './scratch';

/** Curves that a trace keeps, in this order: channel voltage, gap current, channel current. */
export type Curve = 0 | 1 | 2;

const HEAD = 2;
const STRIDE = HEAD + 3 * PIECE;

/** Length of scratch that a trace takes: room for an ordinary run. */
export const TRACE_SCRATCH = 48 * STRIDE;

/** The pieces of a run in order of time, for finding crossings and for drawing. */
export interface Trace {
  readonly pieces: () => number;
  readonly add: (start_s: number, length_s: number, curves: Float64Array) => void;
  readonly start_s: (piece: number) => number;
  readonly length_s: (piece: number) => number;
  readonly buffer: () => Float64Array;
  /** Where a curve of a piece starts in the buffer. */
  readonly offset: (piece: number, curve: Curve) => number;
  /** Value of a curve at a time; times must not fall from call to call. */
  readonly reader: () => (curve: Curve, time_s: number) => number;
}

export function createTrace(scratch: Scratch): Trace {
  let data = scratch(TRACE_SCRATCH);
  let count = 0;
  const start_s = (piece: number) => data[piece * STRIDE] ?? 0;
  const length_s = (piece: number) => data[piece * STRIDE + 1] ?? 0;
  const offset = (piece: number, curve: Curve) => piece * STRIDE + HEAD + curve * PIECE;
  return {
    pieces: () => count,
    add(start, length, curves) {
      if ((count + 1) * STRIDE > data.length) {
        const larger = new Float64Array(2 * data.length);
        larger.set(data);
        data = larger;
      }
      const at = count * STRIDE;
      data[at] = start;
      data[at + 1] = length;
      for (let k = 0; k < 3 * PIECE; k += 1) data[at + HEAD + k] = curves[k] ?? 0;
      count += 1;
    },
    start_s,
    length_s,
    buffer: () => data,
    offset,
    reader() {
      let piece = 0;
      return (curve, time_s) => {
        while (piece < count - 1 && time_s > start_s(piece) + length_s(piece)) piece += 1;
        const theta = Math.min(1, Math.max(0, (time_s - start_s(piece)) / length_s(piece)));
        return pieceAt(data, offset(piece, curve), theta);
      };
    },
  };
}
