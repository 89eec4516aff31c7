import type { Answer } from '../units/answer';
import { answer } from '../units/answer';

/** A channel as it is measured: scaled by its probe, in volts or amperes. */
export interface Trace {
  readonly seconds: Float64Array;
  readonly values: Float64Array;
}

/** What a pulse on a trace shows. Times count from the instrument's zero. */
export interface PulseFigures {
  /** What it rests at before the pulse: median of the quiet start. */
  readonly rest: number;
  /** Largest departure from rest, with its sign. */
  readonly peak: number;
  readonly peak_s: number;
  /** First crossings of 10 and 90 % of the peak; null where the trace starts above the 10 %. */
  readonly rise_s: number | null;
  /** First crossing of 10 %: the delay after the instrument's zero. */
  readonly start_s: number | null;
  /** First crossing of half the peak, for the delay between two channels. */
  readonly half_s: number | null;
  /** Scatter of the quiet start, standard deviation. */
  readonly noise: number;
}

/** Share of the trace that is taken as quiet, at most. */
const QUIET_SHARE = 0.05;
/** A quiet start that ends at the pulse needs at least so many points. */
const LEAST_QUIET = 5;

/** Peak, 10 to 90 % rise and delays of the first pulse, by the definitions that the circuit solver uses. */
export function pulseFigures({ seconds, values }: Trace): PulseFigures {
  const quiet = values.slice(0, Math.max(LEAST_QUIET, Math.floor(values.length * QUIET_SHARE))).sort();
  const rest = quiet[quiet.length >> 1] ?? 0;
  let peakAt = 0;
  let size = 0;
  for (let i = 0; i < values.length; i++) {
    const away = Math.abs((values[i] ?? 0) - rest);
    if (away > size) {
      size = away;
      peakAt = i;
    }
  }
  const peak = (values[peakAt] ?? rest) - rest;
  const crossing = (share: number) =>
    firstCrossing({ seconds, values }, { level: rest + peak * share, rising: peak > 0, until: peakAt });
  const ten = crossing(0.1);
  const ninety = crossing(0.9);
  return {
    rest,
    peak,
    peak_s: seconds[peakAt] ?? 0,
    rise_s: ten === null || ninety === null ? null : ninety - ten,
    start_s: ten,
    half_s: crossing(0.5),
    noise: scatter(quiet),
  };
}

interface Crossing {
  readonly level: number;
  readonly rising: boolean;
  readonly until: number;
}

/** Between the two points around the level, on a straight line. */
function firstCrossing({ seconds, values }: Trace, { level, rising, until }: Crossing): number | null {
  const beyond = (value: number) => (rising ? value >= level : value <= level);
  for (let i = 0; i <= until; i++) {
    const now = values[i] ?? 0;
    if (!beyond(now)) continue;
    if (i === 0) return null;
    const before = values[i - 1] ?? 0;
    const t0 = seconds[i - 1] ?? 0;
    return t0 + (((seconds[i] ?? 0) - t0) * (level - before)) / (now - before);
  }
  return null;
}

function scatter(sorted: Float64Array): number {
  const mean = sorted.reduce((sum, value) => sum + value, 0) / sorted.length;
  return Math.sqrt(sorted.reduce((sum, value) => sum + (value - mean) ** 2, 0) / sorted.length);
}

/** A ring after the pulse. */
export interface Ring {
  readonly frequency_Hz: Answer;
  /** Share that is left from one swing to the next of the same sign. */
  readonly left_per_period: number;
  readonly swings: number;
}

/** Extremes under this share of the first one are noise. */
const FADED = 0.08;
const LEAST_SWINGS = 3;

/**
 * Frequency of the damped ring after the peak, from the times at which it passes its resting level, with their scatter as
 * band; null with fewer than three swings. The level is the mean of the last tenth of the trace.
 */
export function ringAfter(trace: Trace, from_s: number): Ring | null {
  const { seconds, values } = trace;
  const first = seconds.findIndex((time) => time >= from_s);
  if (first === -1 || values.length - first < 8) return null;
  const tail = values.slice(-Math.max(4, Math.floor((values.length - first) / 10)));
  const level = tail.reduce((sum, value) => sum + value, 0) / tail.length;
  const { crossings, extremes } = swingsOf({ seconds, values }, { first, level });
  if (crossings.length < LEAST_SWINGS) return null;
  const halves = crossings.slice(1).map((time, i) => time - (crossings[i] ?? 0));
  const span = (crossings.at(-1) ?? 0) - (crossings[0] ?? 0);
  const half = span / halves.length;
  if (!(half > 0)) return null;
  const spread = Math.sqrt(halves.reduce((sum, one) => sum + (one - half) ** 2, 0) / halves.length) / half;
  const kept = extremes.slice(0, crossings.length);
  const ratio = kept.length < 2 ? 1 : ((kept.at(-1) ?? 1) / (kept[0] ?? 1)) ** (2 / (kept.length - 1));
  return {
    frequency_Hz: answer({
      value: 1 / (2 * half),
      unit: 'Hz',
      model: 'passages through the resting level after the peak',
      valid: 'for one damped ring; two rings of like strength give neither',
      relative: Math.min(
        0.9,
        spread / Math.sqrt(halves.length) + 0.5 / Math.max(1, (values.length - first) * (half / span)),
      ),
    }),
    left_per_period: Math.min(1, Math.max(0, ratio)),
    swings: crossings.length,
  };
}

function swingsOf(
  { seconds, values }: Trace,
  { first, level }: { readonly first: number; readonly level: number },
) {
  const crossings: number[] = [];
  const extremes: number[] = [];
  let largest = 0;
  for (let i = first; i < values.length; i++) largest = Math.max(largest, Math.abs((values[i] ?? 0) - level));
  let extreme = 0;
  for (let i = first + 1; i < values.length; i++) {
    const before = (values[i - 1] ?? 0) - level;
    const now = (values[i] ?? 0) - level;
    extreme = Math.max(extreme, Math.abs(before));
    if (before === 0 || before > 0 === now > 0) continue;
    // A passage counts once the swing before it stood clear of the noise.
    if (extreme < largest * FADED) {
      if (crossings.length > 0) break;
      continue;
    }
    const t0 = seconds[i - 1] ?? 0;
    crossings.push(t0 + (((seconds[i] ?? 0) - t0) * -before) / (now - before));
    extremes.push(extreme);
    extreme = 0;
  }
  return { crossings, extremes };
}

/**
 * Inductance of the loop that rings with a capacitance, from frequency and damping: w0^2 = w^2 + a^2 and L = 1/(w0^2 C).
 * Closed form of the damped series circuit.
 */
export function ringInductance(ring: Ring, capacitance_F: number): Answer | null {
  const frequency = ring.frequency_Hz.value;
  if (!(capacitance_F > 0) || !Number.isFinite(capacitance_F) || !(frequency > 0)) return null;
  const damping = -Math.log(Math.max(1e-6, ring.left_per_period)) * frequency;
  const value = 1 / (((2 * Math.PI * frequency) ** 2 + damping ** 2) * capacitance_F);
  if (!Number.isFinite(value)) return null;
  const relative = (ring.frequency_Hz.band.high - frequency) / frequency;
  return answer({
    value,
    unit: 'H',
    model: 'damped series circuit: L = 1/((w^2 + a^2) C)',
    valid: 'for one lumped loop; the capacitance is taken as exact',
    relative: Math.min(0.9, 2 * relative),
  });
}
