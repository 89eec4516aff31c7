import type { Answer, Warning } from '../units/answer';
import { ok, refused, type Result } from '../units/result';
import type { Figure } from './lookup';

type Extra = Partial<Pick<Figure, 'unit' | 'digits' | 'decimals' | 'weight' | 'note'>> & {
  /** Times the answer's own unit, for a figure shown in another one. */
  readonly times?: number;
};

/** A figure of an answer of the physics, with its band where it has one. Three digits and `main` unless said otherwise. */
export function figureOf(
  [key, label]: readonly [key: string, label: string],
  of: Answer,
  { rounding, ...extra }: Extra & Pick<Figure, 'rounding'>,
): Figure {
  const { times = 1, unit = of.unit === '1' ? '' : of.unit, digits = 3, weight = 'main', ...rest } = extra;
  const { low, high } = of.band;
  return {
    key,
    label,
    value: of.value * times,
    unit,
    rounding,
    digits,
    weight,
    ...(low === high ? {} : { low: low * times, high: high * times }),
    ...rest,
  };
}

/** Several results as one, by name: the first refusal otherwise. */
export function allOf<T extends Readonly<Record<string, unknown>>>(results: {
  readonly [K in keyof T]: Result<T[K]>;
}): Result<T> {
  const values: Partial<Record<keyof T, unknown>> = {};
  for (const key of Object.keys(results) as (keyof T)[]) {
    const result = results[key];
    if (!result.ok) return refused(result.refusal);
    values[key] = result.value;
  }
  return ok(values as T);
}

/** Warnings of several answers, each said once. */
export function warningsOf(
  answers: readonly { readonly warnings: readonly Warning[] }[],
): readonly Warning[] {
  const byWords = new Map<string, Warning>();
  for (const warning of answers.flatMap(({ warnings }) => warnings)) {
    if (!byWords.has(warning.words)) byWords.set(warning.words, warning);
  }
  return [...byWords.values()];
}

/** So many values from one end to the other, evenly or by equal ratios. */
export function spread(
  { from, to }: { readonly from: number; readonly to: number },
  count: number,
  scale: 'linear' | 'log' = 'linear',
): readonly number[] {
  return Array.from({ length: count + 1 }, (_, i) => {
    const t = i / count;
    if (i === 0) return from;
    if (i === count) return to;
    return scale === 'log' ? from * (to / from) ** t : from + (to - from) * t;
  });
}
