import type { Point } from '../../components/chart/types';
import type { RigSpec } from '../../domain/book/rig-spec';
import type { RigTransient } from '../../domain/rules/rig-circuit';
import { capacitance_F } from '../../domain/rules/rig-figures';
import type { Answer } from '../../domain/units/answer';
import { unitSize, type Measured } from './trace-figures';
import type { Loop, Shows } from './trace-draft';

/** The simulated side of a channel: its wave shape and what the solver says of it, in the unit of the channel. */
export interface Simulated {
  /** s after the gap breaks, and the height with the sign of the solver. */
  readonly points: readonly Point[];
  readonly peak: Pick<Answer, 'value' | 'band'>;
  readonly rise_s: number | null;
  /** First passage of 10 % of the peak. */
  readonly start_s: number | null;
  readonly label: string;
}

/** The wave shape of what a channel shows; null where the solver has none of it. */
export function simulatedOf(shows: Shows, { answer, currentRise_s }: RigTransient): Simulated | null {
  const { time_s, channel_V, channel_A, gap_A } = answer.transient.waveform;
  const size = unitSize(shows);
  const fired = answer.peakChannelCurrent !== null;
  if (shows !== 'channel-voltage' && shows !== 'current') return null;
  const values = shows === 'channel-voltage' ? channel_V : fired ? channel_A : gap_A;
  const points = time_s.map((x, i) => ({ x, y: (values[i] ?? 0) / size }));
  const peak =
    shows === 'channel-voltage' ? answer.peakVoltage : (answer.peakChannelCurrent ?? answer.peakGapCurrent);
  return {
    points,
    peak: { value: peak.value / size, band: { low: peak.band.low / size, high: peak.band.high / size } },
    rise_s: shows === 'channel-voltage' ? answer.rise.value : currentRise_s,
    start_s: firstPassage(points, 0.1),
    label: shows === 'channel-voltage' ? 'channel' : fired ? 'channel current' : 'gap current, channel dark',
  };
}

/** The simulated shape on the trace's own time, with the sign of the measured peak. */
export function laidOver(
  simulated: Simulated,
  one: Pick<Measured, 'start_s' | 'peak'>,
  by_s: number,
): readonly Point[] {
  const shift_s = (one.start_s ?? 0) - (simulated.start_s ?? 0) + by_s;
  const sign = firstPeak(simulated.points) * one.peak < 0 ? -1 : 1;
  return simulated.points.map(({ x, y }) => ({ x: x + shift_s, y: sign * y }));
}

function firstPeak(points: readonly Point[]): number {
  return points.reduce((most, { y }) => (Math.abs(y) > Math.abs(most) ? y : most), 0);
}

function firstPassage(points: readonly Point[], share: number): number | null {
  const level = Math.abs(firstPeak(points)) * share;
  if (!(level > 0)) return null;
  for (const [i, { x, y }] of points.entries()) {
    const before = points[i - 1];
    if (Math.abs(y) < level) continue;
    if (before === undefined) return x;
    const low = Math.abs(before.y);
    return before.x + ((level - low) / (Math.abs(y) - low)) * (x - before.x);
  }
  return null;
}

export const LOOP_WORDS: Readonly<Record<Loop, string>> = {
  first: 'first',
  second: 'second',
  series: 'both in series',
};

/** The capacitance that rings, by which of the rig's capacitors the loop holds; null where the rig does not say. */
export function loopCapacitance_F(spec: RigSpec, loop: Loop): number | null {
  const first = capacitance_F(spec.first);
  const second = capacitance_F(spec.second);
  if (!first.ok || !second.ok) return null;
  if (loop === 'first') return first.value;
  if (loop === 'second') return second.value;
  return (first.value * second.value) / (first.value + second.value);
}
