import type { Axis } from './types';

export interface Scale {
  /** Px of a value; values outside the axis land outside the range. */
  readonly at: (value: number) => number;
  readonly valueAt: (px: number) => number;
}

/** Maps an axis onto px. A log axis needs a positive minimum; a value that has no logarithm lands far below the range. */
export function scaleOf(axis: Axis, from_px: number, to_px: number): Scale {
  const log = axis.kind === 'log';
  const warp = (value: number): number => (log ? Math.log10(Math.max(value, Number.MIN_VALUE)) : value);
  const unwarp = (value: number): number => (log ? 10 ** value : value);
  const min = warp(axis.min);
  const span = warp(axis.max) - min;
  const px = to_px - from_px;
  return {
    at: (value) => (span === 0 ? from_px : from_px + ((warp(value) - min) / span) * px),
    valueAt: (at_px) => (px === 0 ? axis.min : unwarp(min + ((at_px - from_px) / px) * span)),
  };
}
