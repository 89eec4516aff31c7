import type { Watch } from './watch';

/** Curves for a chart: evenly spaced in time, with the peaks and the breakdown as points of their own. */
export interface Waveform {
  readonly time_s: readonly number[];
  readonly channel_V: readonly number[];
  readonly gap_A: readonly number[];
  readonly channel_A: readonly number[];
}

/** Draws a run with about `samples` points; none for 0. */
export function drawWaveform(
  { trace, peaks, swings }: Watch,
  { samples, fired_s }: { readonly samples: number; readonly fired_s: number | null },
): Waveform {
  if (samples < 2) return { time_s: [], channel_V: [], gap_A: [], channel_A: [] };
  const last = trace.pieces() - 1;
  const end_s = trace.start_s(last) + trace.length_s(last);
  const { channel_V, gap_A, channel_A } = peaks();
  const marks = [channel_V, gap_A, channel_A, ...swings].map((peak) => peak.time_s);
  if (fired_s !== null) marks.push(fired_s);
  const even = Array.from({ length: samples }, (_, index) => (index * end_s) / (samples - 1));
  const time_s = [...new Set([...even, ...marks])].sort((one, other) => one - other);
  const read = trace.reader();
  const points = time_s.map((time) => [read(0, time), read(1, time), read(2, time)] as const);
  return {
    time_s,
    channel_V: points.map((point) => point[0]),
    gap_A: points.map((point) => point[1]),
    channel_A: points.map((point) => point[2]),
  };
}
