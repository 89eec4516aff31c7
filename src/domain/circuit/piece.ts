import { STAGES } from './collocation';

/** Values that one piece of a curve holds: powers of theta on [0, 1], lowest first. */
export const PIECE = STAGES + 1;

const SAMPLES = 8;
const MOST_ROUNDS = 60;

/** Value of a piece that starts at `from` in a buffer. */
export function pieceAt(buffer: Float64Array, from: number, theta: number): number {
  let sum = 0;
  for (let k = STAGES; k >= 0; k -= 1) sum = sum * theta + (buffer[from + k] ?? 0);
  return sum;
}

/** Value at its end. */
export function pieceEnd(buffer: Float64Array, from: number): number {
  let sum = 0;
  for (let k = 0; k < PIECE; k += 1) sum += buffer[from + k] ?? 0;
  return sum;
}

/** Slope of a piece over theta. */
export function pieceSlope(buffer: Float64Array, from: number, theta: number): number {
  let sum = 0;
  for (let k = STAGES; k >= 1; k -= 1) sum = sum * theta + k * (buffer[from + k] ?? 0);
  return sum;
}

function pieceBend(buffer: Float64Array, from: number, theta: number): number {
  let sum = 0;
  for (let k = STAGES; k >= 2; k -= 1) sum = sum * theta + k * (k - 1) * (buffer[from + k] ?? 0);
  return sum;
}

/** Weights of the powers in each Bernstein coefficient: C(i, k)/C(n, k). */
const BERNSTEIN = Float64Array.from({ length: PIECE * PIECE }, (_, at) => {
  const [i, k] = [Math.floor(at / PIECE), at % PIECE];
  let share = 1;
  for (let j = 0; j < k; j += 1) share *= Math.max(0, i - j) / (STAGES - j);
  return share;
});

/** No value of the piece is larger than this, and it is close: its curve lies within its Bernstein coefficients. */
export function pieceBound(buffer: Float64Array, from: number): number {
  let bound = 0;
  for (let i = 0; i < PIECE; i += 1) {
    let sum = 0;
    for (let k = 0; k <= i; k += 1) sum += (BERNSTEIN[i * PIECE + k] ?? 0) * (buffer[from + k] ?? 0);
    bound = Math.max(bound, Math.abs(sum));
  }
  return bound;
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
  if (sign * pieceSlope(buffer, from, low) <= 0) return low;
  if (sign * pieceSlope(buffer, from, high) >= 0) return high;
  return levelBetween(buffer, from, { of: 'slope', level: 0, low, high });
}

/** First theta at which the size of a piece reaches a level, or undefined. */
export function firstReach(buffer: Float64Array, from: number, level: number): number | undefined {
  if (pieceBound(buffer, from) < level) return undefined;
  if (Math.abs(buffer[from] ?? 0) >= level) return 0;
  const endsAbove = Math.abs(pieceEnd(buffer, from)) >= level;
  const top = endsAbove ? 1 : pieceTop(buffer, from);
  if (!endsAbove && Math.abs(pieceAt(buffer, from, top)) < level) return undefined;
  let low = 0;
  for (let sample = 1; sample <= SAMPLES; sample += 1) {
    const high = Math.min(top, sample / SAMPLES);
    const value = pieceAt(buffer, from, high);
    if (Math.abs(value) >= level) {
      return levelBetween(buffer, from, { of: 'value', level: Math.sign(value) * level, low, high });
    }
    low = high;
  }
  return top;
}

interface Sought {
  readonly of: 'value' | 'slope';
  readonly level: number;
  readonly low: number;
  readonly high: number;
}

/** Where the value or the slope takes a level that lies between those at the two ends: Newton's steps, kept inside. */
function levelBetween(buffer: Float64Array, from: number, sought: Sought): number {
  const ofSlope = sought.of === 'slope';
  let { low, high } = sought;
  const value = (theta: number) =>
    (ofSlope ? pieceSlope(buffer, from, theta) : pieceAt(buffer, from, theta)) - sought.level;
  const rising = value(high) >= value(low);
  let theta = 0.5 * (low + high);
  for (let round = 0; round < MOST_ROUNDS; round += 1) {
    const here = value(theta);
    if (here === 0) return theta;
    if (here > 0 === rising) high = theta;
    else low = theta;
    const slope = ofSlope ? pieceBend(buffer, from, theta) : pieceSlope(buffer, from, theta);
    const newton = theta - here / slope;
    const next = newton > low && newton < high ? newton : 0.5 * (low + high);
    if (Math.abs(next - theta) <= 2 * Number.EPSILON) return next;
    theta = next;
  }
  return theta;
}
