export interface Scrolled {
  readonly count: number;
  readonly row_px: number;
  readonly top_px: number;
  /** 0 while nothing is laid out. */
  readonly height_px: number;
}

/** Rows to either side of what is in view, so that a flick finds them drawn. */
const BESIDE = 20;
/** The window moves in steps, so that most scrolling draws nothing anew. */
const STEP = 10;

/** Which rows to draw: `from` up to and without `to`. */
export function windowOf({ count, row_px, top_px, height_px }: Scrolled): {
  readonly from: number;
  readonly to: number;
} {
  const first = Math.floor(Math.max(0, top_px) / row_px);
  const inView = Math.ceil(height_px / row_px);
  const from = Math.floor(Math.max(0, first - BESIDE) / STEP) * STEP;
  const to = Math.ceil((first + inView + BESIDE) / STEP) * STEP;
  const last = Math.min(count, to);
  return { from: Math.min(from, Math.max(0, last - BESIDE)), to: last };
}
