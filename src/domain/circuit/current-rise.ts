import type { Waveform } from './waveform';

type Curve = Pick<Waveform, 'time_s' | 'channel_A'>;

const LOW = 0.1;
const HIGH = 0.9;
/** A first pulse counts from this share of the highest current on. */
const PULSE_SHARE = 0.5;
/** Falling back by this share of the highest ends a pulse. */
const FALL_SHARE = 0.05;

/**
 * Rise of the channel current, s: 10 to 90 % of its first pulse, straight between the points of the waveform. Later pulses of
 * a ringing circuit may go higher; by then the upper level is empty. Null where no current flows.
 */
export function currentRise_s(curve: Curve): number | null {
  const pulse = firstPulse(curve.channel_A);
  if (!(pulse > 0)) return null;
  const low_s = crossing(curve, LOW * pulse);
  const high_s = crossing(curve, HIGH * pulse);
  return low_s === null || high_s === null ? null : high_s - low_s;
}

/** Height of the first swing of the current that is at least half as high as the highest, A. */
function firstPulse(channel_A: readonly number[]): number {
  const highest = channel_A.reduce((most, ampere) => Math.max(most, Math.abs(ampere)), 0);
  let top = 0;
  for (const ampere of channel_A) {
    top = Math.max(top, Math.abs(ampere));
    if (top >= PULSE_SHARE * highest && Math.abs(ampere) < top - FALL_SHARE * highest) return top;
  }
  return top;
}

function crossing({ time_s, channel_A }: Curve, level: number): number | null {
  let before_s = time_s[0] ?? 0;
  let before = 0;
  for (const [i, at_s] of time_s.entries()) {
    const size = Math.abs(channel_A[i] ?? 0);
    if (size >= level) {
      return size === before ? at_s : before_s + ((level - before) / (size - before)) * (at_s - before_s);
    }
    before = size;
    before_s = at_s;
  }
  return null;
}
