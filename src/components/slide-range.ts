import { roundToDecimals } from '../domain/units/format-quantity';

/** What a slider offers. Values are rounded to about `decimals`, but never to fewer places than a thumb can tell apart. */
export interface SlideRange {
  readonly from: number;
  readonly to: number;
  readonly scale: 'linear' | 'log';
  readonly decimals: number;
  readonly whole?: boolean;
}

/** A thumb is no finer than this many places along the track. */
const PLACES = 400;

/** Where a value stands on the track, 0 to 1; values beyond an end stand beyond it. */
export function slideShare({ from, to, scale }: SlideRange, value: number): number {
  if (!(to > from)) return 0;
  if (scale === 'log' && from > 0) return value > 0 ? Math.log(value / from) / Math.log(to / from) : 0;
  return (value - from) / (to - from);
}

/** The value at a place on the track; the ends are given back exactly. */
export function slideValue(range: SlideRange, share: number): number {
  const { from, to, scale, decimals, whole } = range;
  if (share <= 0) return from;
  if (share >= 1) return to;
  const log = scale === 'log' && from > 0;
  const value = log ? from * (to / from) ** share : from + (to - from) * share;
  const width = log ? (value * Math.log(to / from)) / PLACES : (to - from) / PLACES;
  const needed = Math.ceil(-Math.log10(width));
  const digits = whole === true ? 0 : log ? needed : Math.min(needed, Math.max(decimals, needed - 1));
  const rounded = roundToDecimals(value, digits, 'nearest');
  return Math.min(to, Math.max(from, rounded));
}
