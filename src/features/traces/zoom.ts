/** Seconds of the file. */
export interface Window {
  readonly from_s: number;
  readonly to_s: number;
}

export type ZoomStep = 'in' | 'out' | 'earlier' | 'later' | 'whole';

/** A shorter look than this many parts of the whole shows nothing more of any trace. */
const FINEST = 1e6;

/** The next window, never beyond the whole and never empty. */
export function zoomed(whole: Window, now: Window, step: ZoomStep): Window {
  const span_s = now.to_s - now.from_s;
  const middle_s = (now.from_s + now.to_s) / 2;
  const least_s = (whole.to_s - whole.from_s) / FINEST;
  switch (step) {
    case 'whole':
      return whole;
    case 'in':
      return around(whole, middle_s, Math.max(least_s, span_s / 2));
    case 'out':
      return around(whole, middle_s, span_s * 2);
    case 'earlier':
      return around(whole, middle_s - span_s / 4, span_s);
    case 'later':
      return around(whole, middle_s + span_s / 4, span_s);
  }
}

/** A window of a length around a time, moved inside the whole where it would leave it. */
export function around(whole: Window, middle_s: number, span_s: number): Window {
  const length_s = Math.min(span_s, whole.to_s - whole.from_s);
  const from_s = Math.min(Math.max(middle_s - length_s / 2, whole.from_s), whole.to_s - length_s);
  return { from_s, to_s: from_s + length_s };
}
