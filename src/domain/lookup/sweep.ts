import { numberFieldOf } from './fields';
import type { Lookup, NumberField, Values } from './lookup';
import { figureAt } from './solve';

/** One input against some figures of the answer. */
export interface SweepAsk {
  readonly field: string;
  readonly figures: readonly string[];
  readonly from: number;
  readonly to: number;
  readonly points: number;
  readonly scale: 'linear' | 'log';
}

export interface SweepFigure {
  readonly value: number;
  readonly low?: number;
  readonly high?: number;
}

export interface SweepRow {
  /** In the field's own unit. */
  readonly x: number;
  /** By figure; null where the lookup has no answer there. */
  readonly at: Readonly<Record<string, SweepFigure | null>>;
  /** Why there is none. */
  readonly refusal: string | null;
}

const MOST_POINTS = 400;
const POINTS = 61;

/** The sweep that a field offers by itself: what its slider shows. */
export function sweepOf(field: NumberField, figures: readonly string[], points = POINTS): SweepAsk {
  const { from, to, scale } = field.slide;
  return { field: field.key, figures, from, to, scale, points };
}

/** Asks the lookup at every x, in rising order. Refused points stay in the list as gaps; never NaN. */
export function sweep(lookup: Lookup, values: Values, ask: SweepAsk): readonly SweepRow[] {
  const field = numberFieldOf(lookup, ask.field);
  if (field === undefined) return [];
  return sweepAt(lookup, values, { field: ask.field, figures: ask.figures, xs: sweepXs(field, ask) });
}

export function sweepAt(
  lookup: Lookup,
  values: Values,
  ask: { readonly field: string; readonly figures: readonly string[]; readonly xs: readonly number[] },
): readonly SweepRow[] {
  return ask.xs.map((x) => {
    const answer = lookup.answer({ ...values, [ask.field]: x }, { plot: false });
    const at = Object.fromEntries(
      ask.figures.map((key) => {
        const figure = answer.ok ? figureAt(answer.value, key) : undefined;
        if (figure === undefined) return [key, null];
        const { value, low, high } = figure;
        return [key, { value, ...(low === undefined || high === undefined ? {} : { low, high }) }];
      }),
    );
    return { x, at, refusal: answer.ok ? null : answer.refusal.words };
  });
}

/** The inputs of a sweep: whole numbers once each, and nothing outside the field's range. */
export function sweepXs(field: NumberField, { from, to, points, scale }: SweepAsk): readonly number[] {
  const low = Math.max(field.min, Math.min(from, to));
  const high = Math.min(field.max, Math.max(from, to));
  if (!Number.isFinite(low) || !Number.isFinite(high) || !(high > low)) return [];
  const count = Math.max(2, Math.min(MOST_POINTS, Math.floor(points)));
  const log = scale === 'log' && low > 0;
  const xs = Array.from({ length: count }, (_, i) => {
    if (i === 0) return low;
    if (i === count - 1) return high;
    const share = i / (count - 1);
    const x = log ? low * (high / low) ** share : low + (high - low) * share;
    return field.whole === true ? Math.round(x) : Number(x.toPrecision(9));
  });
  const allowed = field.minExcluded === true ? xs.filter((x) => x > field.min) : xs;
  return [...new Set(allowed)];
}

const MANTISSAS = [1, 2, 5, 10] as const;
const DECADE = [1, 1.5, 2, 3, 5, 7] as const;

/** Round inputs for a table on the wall: steps of 1, 2 or 5, or 1, 1.5, 2, 3, 5, 7 a decade; at most `most` of them. */
export function roundXs(
  field: NumberField,
  { from, to, scale }: Pick<SweepAsk, 'from' | 'to' | 'scale'>,
  most: number,
): readonly number[] {
  const low = Math.max(field.min, Math.min(from, to));
  const high = Math.min(field.max, Math.max(from, to));
  if (!Number.isFinite(low) || !Number.isFinite(high) || !(high > low) || most < 2) return [];
  if (scale === 'log' && low > 0) return roundDecades(field, { low, high, most });
  const rough = (high - low) / (most - 1);
  const power = 10 ** Math.floor(Math.log10(rough));
  const mantissa = MANTISSAS.find((each) => each * power >= rough * (1 - 1e-9)) ?? 10;
  const step = field.whole === true ? Math.max(1, mantissa * power) : mantissa * power;
  const first = Math.ceil(low / step - 1e-9);
  const last = Math.floor(high / step + 1e-9);
  return Array.from({ length: Math.max(0, last - first + 1) }, (_, i) =>
    Number(((first + i) * step).toPrecision(12)),
  ).filter((x) => x >= field.min && x <= field.max && !(field.minExcluded === true && x === field.min));
}

function roundDecades(
  field: NumberField,
  { low, high, most }: { readonly low: number; readonly high: number; readonly most: number },
): readonly number[] {
  for (const mantissas of [DECADE, [1, 2, 5], [1, 3], [1]]) {
    const xs: number[] = [];
    for (let decade = Math.floor(Math.log10(low)); decade <= Math.ceil(Math.log10(high)); decade += 1) {
      for (const mantissa of mantissas) {
        const x = Number((mantissa * 10 ** decade).toPrecision(12));
        if (x >= low && x <= high && (field.whole !== true || Number.isInteger(x))) xs.push(x);
      }
    }
    if (xs.length <= most) return xs;
  }
  return [];
}
