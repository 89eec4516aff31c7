import { PIECE, pieceAt, pieceBound, pieceSlope, pieceTop } from './piece';
import { createTrace, type Trace } from './trace';

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
  readonly peaks: () => Peaks;
  /** Every local maximum of the size of the channel voltage. */
  readonly swings: readonly Peak[];
  readonly add: (start_s: number, length_s: number, curves: Float64Array) => void;
}

const NONE: Peak = { time_s: 0, size: 0 };

export function createWatch(): Watch {
  const trace = createTrace();
  const swings: Peak[] = [];
  const found = [NONE, NONE, NONE];
  let rising = false;

  /** Whether the size of the channel voltage rises there. */
  const risesAt = (curves: Float64Array, theta: number) =>
    pieceAt(curves, 0, theta) * pieceSlope(curves, 0, theta) > 0;

  return {
    trace,
    swings,
    peaks: () => ({ channel_V: found[0] ?? NONE, gap_A: found[1] ?? NONE, channel_A: found[2] ?? NONE }),
    add(start_s, length_s, curves) {
      trace.add(start_s, length_s, curves);
      for (let curve = 0; curve < found.length; curve += 1) {
        const offset = curve * PIECE;
        if (pieceBound(curves, offset) <= (found[curve]?.size ?? 0)) continue;
        const top = topOf(curves, offset, { start_s, length_s });
        if (top.size > (found[curve]?.size ?? 0)) found[curve] = top;
      }
      const startsRising = risesAt(curves, 0);
      const endsRising = risesAt(curves, 1);
      if (rising && !startsRising) swings.push({ time_s: start_s, size: Math.abs(pieceAt(curves, 0, 0)) });
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
