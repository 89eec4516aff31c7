import { pieceAt, pieceBound, pieceEnd, pieceSlope, pieceTop } from './piece';
import type { Scratch } from './scratch';
import { createTrace, TRACE_SCRATCH, type Curve, type Trace } from './trace';

/** Largest size of a curve, with its time. */
export interface Peak {
  readonly time_s: number;
  readonly size: number;
}

export interface Peaks {
  readonly channel_V: Peak;
  readonly gap_A: Peak;
  readonly channel_A: Peak;
}

/** Keeps what a run is asked for afterwards. */
export interface Watch {
  readonly trace: Trace;
  /** Of all that was added so far. */
  readonly peaks: () => Peaks;
  /** Every local maximum of the size of the channel voltage. */
  readonly swings: readonly Peak[];
  readonly add: (start_s: number, length_s: number, curves: Float64Array) => void;
}

/** Length of scratch that a watch takes. */
export const WATCH_SCRATCH = TRACE_SCRATCH;

export function createWatch(scratch: Scratch): Watch {
  const trace = createTrace(scratch);
  const swings: Peak[] = [];
  let rising = false;
  let found: { readonly pieces: number; readonly peaks: Peaks } | undefined;
  return {
    trace,
    swings,
    peaks() {
      const pieces = trace.pieces();
      if (found?.pieces !== pieces) {
        const peaks = { channel_V: peakOf(trace, 0), gap_A: peakOf(trace, 1), channel_A: peakOf(trace, 2) };
        found = { pieces, peaks };
      }
      return found.peaks;
    },
    add(start_s, length_s, curves) {
      trace.add(start_s, length_s, curves);
      // Whether the size of the channel voltage rises at either end.
      const start_V = curves[0] ?? 0;
      const startsRising = start_V * (curves[1] ?? 0) > 0;
      const endsRising = pieceEnd(curves, 0) * pieceSlope(curves, 0, 1) > 0;
      if (rising && !startsRising) swings.push({ time_s: start_s, size: Math.abs(start_V) });
      if (startsRising && !endsRising) swings.push(topOf(curves, 0, { start_s, length_s }));
      rising = endsRising;
    },
  };
}

/** The largest size of a curve over one step. */
export function topOf(
  curves: Float64Array,
  offset: number,
  step: { readonly start_s: number; readonly length_s: number },
): Peak {
  const theta = pieceTop(curves, offset);
  return { time_s: step.start_s + theta * step.length_s, size: Math.abs(pieceAt(curves, offset, theta)) };
}

/** The ends of all pieces first: few pieces can hold more than the largest of them, and only these are searched. */
function peakOf(trace: Trace, curve: Curve): Peak {
  const buffer = trace.buffer();
  const pieces = trace.pieces();
  let largest = 0;
  for (let piece = 0; piece < pieces; piece += 1) {
    largest = Math.max(largest, Math.abs(pieceEnd(buffer, trace.offset(piece, curve))));
  }
  let peak: Peak = { time_s: 0, size: 0 };
  // A channel that stays dark has no current to search.
  if (largest === 0) return peak;
  for (let piece = 0; piece < pieces; piece += 1) {
    const offset = trace.offset(piece, curve);
    if (pieceBound(buffer, offset) < largest * (1 - 1e-12)) continue;
    const top = topOf(buffer, offset, { start_s: trace.start_s(piece), length_s: trace.length_s(piece) });
    if (top.size > peak.size) peak = top;
    largest = Math.max(largest, peak.size);
  }
  return peak;
}
