import type { NumberRule } from '../domain/units/check-number';
import { parseQuantity } from '../domain/units/parse-number';

/** A number entered by keypad or by steps; its text is kept by whoever shows it. */
export interface FigureSpec {
  readonly key: string;
  readonly label: string;
  /** For the narrow row, where the label is long. */
  readonly short?: string;
  readonly unit: string;
  readonly step: number;
  readonly rule: NumberRule;
  /** What stands while nothing was typed; empty where there is nothing to start from. */
  readonly initial: string;
  /** Where the initial value comes from, said while it is untouched. */
  readonly source?: string;
  /** What an empty field means; left out where it must be filled. */
  readonly whenEmpty?: string;
}

export type FigureTexts = Readonly<Record<string, string>>;

export type FigureRead =
  | { readonly type: 'value'; readonly value: number }
  | { readonly type: 'empty' }
  | { readonly type: 'refused'; readonly words: string };

/** Reads one field: typed text, else what stood there. */
export function readFigure(spec: FigureSpec, texts: FigureTexts): FigureRead {
  const text = texts[spec.key] ?? spec.initial;
  if (text.trim() === '' && spec.whenEmpty !== undefined) return { type: 'empty' };
  const read = parseQuantity(text, spec.rule);
  return read.ok ? { type: 'value', value: read.value } : { type: 'refused', words: read.refusal.words };
}

/** Every field read; the first refusal in their order, or null. */
export function readFigures(specs: readonly FigureSpec[], texts: FigureTexts) {
  const values: Record<string, number | null> = {};
  let refusal: string | null = null;
  for (const spec of specs) {
    const read = readFigure(spec, texts);
    values[spec.key] = read.type === 'value' ? read.value : null;
    if (read.type === 'refused') refusal ??= read.words;
  }
  return { values: values as Readonly<Record<string, number | null>>, refusal };
}

/** One step up or down, in decimal, so that 2.6 and 0.1 give 2.7; from an empty field it leads to the step. */
export function stepFigure(spec: FigureSpec, texts: FigureTexts, direction: -1 | 1): string {
  const read = readFigure(spec, texts);
  const from = read.type === 'value' ? read.value : 0;
  const next = Number((from + direction * spec.step).toPrecision(12));
  return String(Math.min(spec.rule.max, Math.max(spec.rule.min, next)));
}
