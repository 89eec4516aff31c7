interface Range {
  readonly low: number;
  readonly high: number;
}

const DEEPEST = 40;

/**
 * Adaptive Simpson integration to an absolute tolerance, for checks and one-off integrals with kinks.
 * Source: the error estimate of one fifteenth of the difference between one and two panels (from memory).
 */
export function integrate(f: (x: number) => number, range: Range, tolerance: number): number {
  const middle = 0.5 * (range.low + range.high);
  const ends = { low: f(range.low), middle: f(middle), high: f(range.high) };
  return refine(f, { range, ends, tolerance, depth: 0 });
}

interface Panel {
  readonly range: Range;
  readonly ends: { readonly low: number; readonly middle: number; readonly high: number };
  readonly tolerance: number;
  readonly depth: number;
}

function refine(f: (x: number) => number, { range, ends, tolerance, depth }: Panel): number {
  const middle = 0.5 * (range.low + range.high);
  const left = { low: range.low, high: middle };
  const right = { low: middle, high: range.high };
  const leftEnds = { low: ends.low, middle: f(0.5 * (range.low + middle)), high: ends.middle };
  const rightEnds = { low: ends.middle, middle: f(0.5 * (middle + range.high)), high: ends.high };
  const two = simpson(left, leftEnds) + simpson(right, rightEnds);
  const difference = two - simpson(range, ends);
  if (Math.abs(difference) <= 15 * tolerance || depth >= DEEPEST) return two + difference / 15;
  const below = { tolerance: 0.5 * tolerance, depth: depth + 1 };
  return (
    refine(f, { range: left, ends: leftEnds, ...below }) +
    refine(f, { range: right, ends: rightEnds, ...below })
  );
}

function simpson(range: Range, ends: Panel['ends']): number {
  return ((range.high - range.low) / 6) * (ends.low + 4 * ends.middle + ends.high);
}
