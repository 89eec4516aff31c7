/** Something to read beside a number before acting on it. */
export interface Warning {
  readonly type: string;
  readonly words: string;
}

/**
 * What physics gives back: never a bare number. `band` is in the unit of the value and holds the value;
 * `model` says which law was used and `valid` where it holds.
 */
export interface Answer {
  readonly value: number;
  readonly unit: string;
  readonly model: string;
  readonly band: { readonly low: number; readonly high: number };
  readonly valid: string;
  readonly warnings: readonly Warning[];
}

/**
 * What a result of several figures rests on as a whole: the law or practice, where it holds, and what to read beside it.
 * Figures that matter stand in such a result as answers of their own.
 */
export interface Basis {
  readonly model: string;
  readonly valid: string;
  readonly warnings: readonly Warning[];
}

/** What an answer is built from. */
export interface AnswerParts {
  readonly value: number;
  readonly unit: string;
  readonly model: string;
  readonly valid: string;
  /** Relative band either side, 0.03 for 3 %; 0 for a definition. */
  readonly relative: number | { readonly below: number; readonly above: number };
  readonly warnings?: readonly Warning[];
}

/** Builds an answer from a relative band. */
export function answer(parts: AnswerParts): Answer {
  const { value, unit, model, valid, relative, warnings = [] } = parts;
  const { below, above } = typeof relative === 'number' ? { below: relative, above: relative } : relative;
  const size = Math.abs(value);
  return {
    value,
    unit,
    model,
    valid,
    warnings,
    band: { low: value - size * below, high: value + size * above },
  };
}

/** The answer with a band of its own, for where a share of the value cannot give it. */
export function withBand(one: Answer, band: Answer['band']): Answer {
  return { ...one, band: { low: Math.min(band.low, one.value), high: Math.max(band.high, one.value) } };
}
