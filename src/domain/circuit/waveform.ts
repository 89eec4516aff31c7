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
  watch: Watch,
  { samples, fired_s }: { readonly samples: number; readonly fired_s: number | null },
): Waveform {
  const time_s = samples < 2 ? [] : timesOf(watch, { samples, fired_s });
  const channel_V: number[] = [];
  const gap_A: number[] = [];
  const channel_A: number[] = [];
  const read = watch.trace.reader();
  for (const time of time_s) {
    channel_V.push(read(0, time));
    gap_A.push(read(1, time));
    channel_A.push(read(2, time));
  }
  return { time_s, channel_V, gap_A, channel_A };
}

/** Even times with the marks between them, in order and each once. */
function timesOf(
  { trace, peaks, swings }: Watch,
  { samples, fired_s }: { readonly samples: number; readonly fired_s: number | null },
): readonly number[] {
  const last = trace.pieces() - 1;
  const end_s = trace.start_s(last) + trace.length_s(last);
  const { channel_V, gap_A, channel_A } = peaks();
  const marks = [channel_V, gap_A, channel_A, ...swings].map((peak) => peak.time_s);
  if (fired_s !== null) marks.push(fired_s);
  marks.sort((one, other) => one - other);
  const times: number[] = [];
  let next = 0;
  for (let sample = 0; sample < samples; sample += 1) {
    const even_s = (sample * end_s) / (samples - 1);
    for (; (marks[next] ?? Infinity) < even_s; next += 1) push(times, marks[next] ?? 0);
    push(times, even_s);
  }
  for (; next < marks.length; next += 1) push(times, marks[next] ?? 0);
  return times;
}

function push(times: number[], time_s: number): void {
  if (time_s !== times[times.length - 1]) times.push(time_s);
}
