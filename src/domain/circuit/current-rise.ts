import type { Waveform } from './waveform';

const LOW = 0.1;
const HIGH = 0.9;

/**
 * Rise of the channel current, s: 10 to 90 % of its highest, first crossing of each, straight between the points of the
 * waveform. Null where no current flows.
 */
export function currentRise_s({ time_s, channel_A }: Pick<Waveform, 'time_s' | 'channel_A'>): number | null {
  const highest = channel_A.reduce((most, ampere) => Math.max(most, Math.abs(ampere)), 0);
  if (!(highest > 0)) return null;
  const low_s = crossing({ time_s, channel_A }, LOW * highest);
  const high_s = crossing({ time_s, channel_A }, HIGH * highest);
  return low_s === null || high_s === null ? null : high_s - low_s;
}

function crossing(
  { time_s, channel_A }: Pick<Waveform, 'time_s' | 'channel_A'>,
  level: number,
): number | null {
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
