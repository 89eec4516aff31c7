import { firstReach } from './piece';
import type { Peak, Watch } from './watch';

const LOW = 0.1;
const HIGH = 0.9;
/** A swing that ends this close to a crossing makes the rise jump. */
const CLOSE = 0.02;

export interface Rise {
  /** 10 to 90 % of the highest channel voltage, at the first crossing of each. */
  readonly rise_s: number;
  /** True where a hair more or less voltage would put a crossing on another swing. */
  readonly doubtful: boolean;
}

/** Rise of the channel voltage; null where there is none. */
export function riseOf({ trace, peaks, swings }: Watch): Rise | null {
  const { size } = peaks().channel_V;
  const low_s = firstCrossing(trace, LOW * size);
  const high_s = firstCrossing(trace, HIGH * size);
  if (!(size > 0) || low_s === undefined || high_s === undefined) return null;
  return { rise_s: high_s - low_s, doubtful: isDoubtful({ swings, size, high_s }) };
}

function firstCrossing(trace: Watch['trace'], level: number): number | undefined {
  for (let piece = 0; piece < trace.pieces(); piece += 1) {
    const theta = firstReach(trace.buffer(), trace.offset(piece, 0), level);
    if (theta !== undefined) return trace.start_s(piece) + theta * trace.length_s(piece);
  }
  return undefined;
}

function isDoubtful(rise: {
  readonly swings: readonly Peak[];
  readonly size: number;
  readonly high_s: number;
}): boolean {
  const { swings, size, high_s } = rise;
  const crossing = swings.find((swing) => swing.time_s >= high_s);
  return swings.some(
    (swing) =>
      (swing.time_s < high_s || swing === crossing) &&
      [LOW, HIGH].some((level) => Math.abs(swing.size / size - level) < CLOSE),
  );
}
