import { formatFigure, roundToDecimals, type Rounding } from '../units/format-quantity';
import { ok, refused, type Refusal, type Result } from '../units/result';
import { numberAt, numberFieldOf } from './fields';
import { figureLine } from './figure-text';
import type { Figure, Lookup, LookupAnswer, NumberField, Solvable, Values } from './lookup';
import { scanRoots, type Root } from './solve-scan';

/** An input that meets a wanted figure. */
export interface Found {
  /** In the field's own unit, rounded so that the target is still met. */
  readonly value: number;
  /** Every input in range that just meets it, unrounded, in rising order. */
  readonly all: readonly number[];
  /** The answer at the rounded value. */
  readonly answer: LookupAnswer;
}

const MORE_DIGITS = 5;
const LEAST_DIGITS = 3;

/**
 * Finds the input of a solvable pair that brings its figure to `target`, over the field's whole range: by the domain's own
 * inverse where the pair has one, by scan and bracketing otherwise. Of several the one nearest to the present value counts. Refused
 * in words when nothing in range meets the target; nothing is ever invented at a pole or a jump. Meets the target at the rounded
 * value, which is verified by asking the lookup there.
 */
export function solveFor(
  lookup: Lookup,
  values: Values,
  ask: { readonly solvable: Solvable; readonly target: number | null },
): Result<Found> {
  const { solvable, target } = ask;
  const field = numberFieldOf(lookup, solvable.field);
  if (field === undefined) throw new Error(`${lookup.key} has no number ${solvable.field}`);
  if (target === null || !Number.isFinite(target)) return refused(noTarget(lookup, solvable));
  const search = searchOf({ lookup, values, solvable, field, target });
  if (solvable.exact === undefined) {
    const scanned = scanRoots(search.at, { field, rounding: solvable.rounding, fast: lookup.slow !== true });
    if (scanned.roots.length === 0) return refused(search.nothing(scanned.seen));
    const chosen = nearest(scanned.roots, numberAt(values, field.key), field);
    return settled(search, { root: chosen, all: scanned.roots.map((root) => root.x) });
  }
  const solved = solvable.exact(values, target);
  if (!solved.ok) return solved;
  const { value, all } = solved.value;
  return settled(search, { root: sidesAt(search, value), all });
}

interface Search {
  readonly field: NumberField;
  readonly rounding: Rounding;
  /** Figure less target; null where the lookup refuses or has no figure. */
  readonly at: (x: number) => number | null;
  readonly answerAt: (x: number) => Result<LookupAnswer>;
  readonly nothing: (seen: readonly number[]) => Refusal;
}

interface SearchParts {
  readonly lookup: Lookup;
  readonly values: Values;
  readonly solvable: Solvable;
  readonly field: NumberField;
  readonly target: number;
}

function searchOf({ lookup, values, solvable, field, target }: SearchParts): Search {
  let sample: Figure | undefined;
  let refusal: Refusal | undefined;
  const answerAt = (x: number, wants?: { readonly plot: boolean }) =>
    lookup.answer({ ...values, [field.key]: x }, wants);
  return {
    field,
    rounding: solvable.rounding,
    answerAt,
    at: (x) => {
      const answer = answerAt(x, { plot: false });
      if (!answer.ok) {
        // A refusal that is about another field holds wherever this one stands, and says more than a search.
        if (refusal === undefined || answer.refusal.field !== field.key) refusal = answer.refusal;
        return null;
      }
      const figure = figureAt(answer.value, solvable.figure);
      if (figure === undefined) return null;
      sample = figure;
      return figure.value - target;
    },
    nothing: (seen) => {
      if (sample === undefined || seen.length === 0) {
        return (
          refusal ?? {
            type: 'no-figure',
            field: field.key,
            words: `${field.label}: no answer for any value.`,
          }
        );
      }
      const low = Math.min(...seen) + target;
      const high = Math.max(...seen) + target;
      const unit = sample.unit === '' ? '' : `\u2009${sample.unit}`;
      const wanted = formatFigure(target, { digits: { significant: 4 }, rounding: 'nearest' });
      return {
        type: 'not-reached',
        field: field.key,
        words: `${field.label}: none in range brings \u201c${sample.label}\u201d to ${wanted}${unit}; it goes from ${figureLine(sample, low, 'up')} to ${figureLine(sample, high, 'down')}${unit} there.`,
      };
    },
  };
}

/** The figure of that key, unless words stand in its place. */
export function figureAt(answer: LookupAnswer, key: string): Figure | undefined {
  const figure = answer.figures.find((each) => each.key === key);
  return figure === undefined || figure.words !== undefined ? undefined : figure;
}

function noTarget(lookup: Lookup, solvable: Solvable): Refusal {
  const target = numberFieldOf(lookup, solvable.target ?? '');
  return {
    type: 'empty',
    field: solvable.target ?? solvable.field,
    words: `${target?.label ?? 'Wanted'}: enter the value that is wanted.`,
  };
}

function settled(
  search: Search,
  found: { readonly root: Root; readonly all: readonly number[] },
): Result<Found> {
  const { root, all } = found;
  for (const value of roundedTries(search, root.x)) {
    if (!meets(search, root, value)) continue;
    const answer = search.answerAt(value);
    if (answer.ok) return ok({ value, all, answer: answer.value });
  }
  const answer = search.answerAt(root.x);
  return answer.ok ? ok({ value: root.x, all, answer: answer.value }) : answer;
}

/** Coarse first: as many digits as the field has, then more where the coarse ones would miss the target. */
function roundedTries({ field, rounding }: Search, x: number): readonly number[] {
  if (field.whole === true) return [roundToDecimals(x, 0, rounding)];
  const exponent = x === 0 ? 0 : Math.floor(Math.log10(Math.abs(x)));
  const decimals = Math.max(field.decimals, LEAST_DIGITS - 1 - exponent);
  return Array.from({ length: MORE_DIGITS }, (_, more) => roundToDecimals(x, decimals + more, rounding));
}

function meets(search: Search, root: Root, value: number): boolean {
  const y = search.at(value);
  if (y === null) return false;
  if (search.rounding === 'nearest' || y === 0) return true;
  const wanted = search.rounding === 'up' ? root.above : root.below;
  return wanted === 0 || Math.sign(y) === wanted;
}

const BESIDE = 1e-7;

/** On which side of the target the figure lies just above and below an input that the domain found. */
function sidesAt({ at, field }: Search, x: number): Root {
  const step = BESIDE * Math.max(Math.abs(x), field.step);
  return { x, above: Math.sign(at(x + step) ?? 0), below: Math.sign(at(x - step) ?? 0) };
}

function nearest(roots: readonly Root[], now: number | null, field: NumberField): Root {
  const [first, ...others] = roots;
  if (first === undefined) throw new Error('no root to choose from');
  if (now === null) return first;
  const log = field.slide.scale === 'log' && now > 0 && field.min >= 0;
  const far = ({ x }: Root) => (log && x > 0 ? Math.abs(Math.log(x / now)) : Math.abs(x - now));
  return others.reduce((best, each) => (far(each) < far(best) ? each : best), first);
}
