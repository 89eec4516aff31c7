import { crossingBetween } from '../numerics/crossing';

/** Where a side of a gap meets a wanted voltage, over pressure or over gap. */
export interface BorderSearch {
  readonly low: number;
  readonly high: number;
  /** Where the low side changes its factor and jumps. */
  readonly jump: number;
  readonly voltage_kV: (setting: number) => number;
  readonly wanted_kV: number;
  /** Which side of a border is wanted: there the voltage is still at least, or at most, what is wanted. */
  readonly keep: 'at-least' | 'at-most';
}

/**
 * Every side rises with pressure and with gap: a dense search over all shapes found no fall. The pieces are there in
 * case one has one.
 */
const PIECES = 4;
const PRECISION = 1e-12;
const PRECISION_FROM_HINT = 1e-9;
const MOST_STRIDES = 60;
// Voltage over gap on logarithmic scales, and a stride somewhat too long, so that it ends beyond the border.
const USUAL_SLOPE = 0.85;
const OVERSHOOT = 1.15;
const SHORTEST_STRIDE = 1e-3;

/** Every setting at which the voltage is just met, in rising order. */
export function bordersOf(search: BorderSearch): readonly number[] {
  const over = excessOf(search);
  const borders: number[] = [];
  let before: Point | undefined;
  for (const setting of cutsOf(search)) {
    const x = Math.log(setting);
    const here = { x, y: over(x) };
    if (before !== undefined && before.y >= 0 !== here.y >= 0) {
      borders.push(borderBetween(over, before, { end: here, precision: PRECISION }));
    }
    before = here;
  }
  return borders;
}

/**
 * The one border of a side that rises and takes milliseconds to work out, from a setting that is not far away: five or
 * six questions instead of twenty.
 */
export function borderNear(search: BorderSearch, hint: number): readonly number[] {
  const over = excessOf(search);
  const low = Math.log(search.low);
  const high = Math.log(search.high);
  const inside = (x: number) => Math.min(high, Math.max(low, x));
  const rises = search.keep === 'at-least' ? 1 : -1;
  const start = inside(Math.log(hint));
  let before: Point = { x: start, y: over(start) };
  for (let stride = 0; stride < MOST_STRIDES; stride += 1) {
    const way = before.y >= 0 ? -rises : rises;
    const length = Math.max(SHORTEST_STRIDE, (OVERSHOOT * Math.abs(before.y)) / USUAL_SLOPE);
    const x = inside(before.x + way * (Number.isFinite(length) ? length : SHORTEST_STRIDE));
    if (x === before.x) return [];
    const here = { x, y: over(x) };
    if (before.y >= 0 !== here.y >= 0) {
      return [borderBetween(over, before, { end: here, precision: PRECISION_FROM_HINT })];
    }
    before = here;
  }
  return [];
}

interface Point {
  readonly x: number;
  readonly y: number;
}

/**
 * Zero or more exactly where the target is kept, whatever a logarithm's last digit says. Logarithms straighten the curve,
 * and a straight one is found in few steps.
 */
function excessOf({ voltage_kV, wanted_kV, keep }: BorderSearch): (logSetting: number) => number {
  const sign = keep === 'at-least' ? 1 : -1;
  const logWanted = Math.log(wanted_kV);
  return (logSetting) => {
    const here_kV = voltage_kV(Math.exp(logSetting));
    const excess = sign * (Math.log(here_kV) - logWanted);
    return sign * (here_kV - wanted_kV) >= 0 ? Math.max(0, excess) : Math.min(-Number.EPSILON, excess);
  };
}

function borderBetween(
  over: (x: number) => number,
  start: Point,
  { end, precision }: { readonly end: Point; readonly precision: number },
): number {
  const ends = { a: start.x, fa: start.y, b: end.x, fb: end.y };
  return Math.exp(crossingBetween(over, ends, precision).above);
}

/** The range in pieces of equal ratio, cut at the jump, with a point on either side of it. */
function cutsOf({ low, high, jump }: BorderSearch): readonly number[] {
  const cuts = Array.from({ length: PIECES + 1 }, (_, index) =>
    index === 0 ? low : index === PIECES ? high : low * (high / low) ** (index / PIECES),
  );
  const around = [jump * (1 - PRECISION), jump * (1 + PRECISION)].filter((one) => one > low && one < high);
  return [...cuts, ...around].sort((one, other) => one - other);
}
