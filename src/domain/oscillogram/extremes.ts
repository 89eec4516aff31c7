/** Lowest and highest value of each slice of a trace, so that a spike of a single point is drawn. */
export interface Envelope {
  readonly from_s: number;
  readonly to_s: number;
  /** By slice; NaN where no point lies in it. */
  readonly low: Float64Array;
  readonly high: Float64Array;
}

/**
 * Envelope of a trace over equal slices of time. `seconds` must not fall. Each point lands in one slice, the last edge
 * belongs to the last slice, so the extremes of the slices together are the extremes of the points in the window.
 */
export function envelope(
  trace: { readonly seconds: Float64Array; readonly values: Float64Array },
  window: { readonly from_s: number; readonly to_s: number },
  slices: number,
): Envelope {
  const { seconds, values } = trace;
  const { from_s, to_s } = window;
  const low = new Float64Array(slices).fill(Number.NaN);
  const high = new Float64Array(slices).fill(Number.NaN);
  const per_s = slices / (to_s - from_s);
  for (let i = firstAt(seconds, from_s); i < values.length; i++) {
    const time = seconds[i] ?? 0;
    if (time > to_s) break;
    const slice = Math.min(slices - 1, Math.floor((time - from_s) * per_s));
    const value = values[i] ?? 0;
    const lowest = low[slice] ?? Number.NaN;
    const highest = high[slice] ?? Number.NaN;
    if (!(value >= lowest)) low[slice] = value;
    if (!(value <= highest)) high[slice] = value;
  }
  return { from_s, to_s, low, high };
}

/** First point at or after a time, by halving. */
export function firstAt(seconds: Float64Array, time_s: number): number {
  let low = 0;
  let high = seconds.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((seconds[middle] ?? 0) < time_s) low = middle + 1;
    else high = middle;
  }
  return low;
}
