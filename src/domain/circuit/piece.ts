import { brent } from '../numerics/brent';
import { STAGES } from './collocation';

/** Values that one piece of a curve holds: powers of theta on [0, 1], lowest first. */
export const PIECE = STAGES + 1;

const SAMPLES = 8;

/** Value of a piece that starts at `from` in a buffer. */
export function pieceAt(buffer: Float64Array, from: number, theta: number): number {
  let sum = 0;
  for (let k = STAGES; k >= 0; k -= 1) sum = sum * theta + (buffer[from + k] ?? 0);
  return sum;
}

/** Slope of a piece over theta. */
export function pieceSlope(buffer: Float64Array, from: number, theta: number): number {
  let sum = 0;
  for (let k = STAGES; k >= 1; k -= 1) sum = sum * theta + k * (buffer[from + k] ?? 0);
  return sum;
}

/** No value of the piece is larger than this. */
export function pieceBound(buffer: Float64Array, from: number): number {
  let sum = 0;
  for (let k = 0; k < PIECE; k += 1) sum += Math.abs(buffer[from + k] ?? 0);
  return sum;
}

/** Where a piece is largest in size. */
export function pieceTop(buffer: Float64Array, from: number): number {
  let best = 0;
  let size = -1;
  for (let sample = 0; sample <= SAMPLES; sample += 1) {
    const here = Math.abs(pieceAt(buffer, from, sample / SAMPLES));
    if (here > size) {
      size = here;
      best = sample / SAMPLES;
    }
  }
  const low = Math.max(0, best - 1 / SAMPLES);
  const high = Math.min(1, best + 1 / SAMPLES);
  const sign = pieceAt(buffer, from, best) < 0 ? -1 : 1;
  const slope = (theta: number) => sign * pieceSlope(buffer, from, theta);
  if (slope(low) <= 0) return low;
  if (slope(high) >= 0) return high;
  return zeroBetween(slope, low, high);
}

/** First theta at which the size of a piece reaches a level, or undefined. */
export function firstReach(buffer: Float64Array, from: number, level: number): number | undefined {
  if (pieceBound(buffer, from) < level) return undefined;
  const above = (theta: number) => level - Math.abs(pieceAt(buffer, from, theta));
  if (above(0) <= 0) return 0;
  const top = pieceTop(buffer, from);
  if (above(top) > 0) return undefined;
  let before = 0;
  for (let sample = 1; sample <= SAMPLES; sample += 1) {
    const theta = Math.min(top, sample / SAMPLES);
    if (above(theta) <= 0) return zeroBetween(above, before, theta);
    before = theta;
  }
  return top;
}

function zeroBetween(f: (theta: number) => number, low: number, high: number): number {
  const zero = brent(f, { low, high });
  return zero.ok ? zero.value : high;
}
