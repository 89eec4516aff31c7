import type { ReferenceCheck } from './checks-file';
import { FUNCTIONS, type Evaluated } from './fn-table';
import { InputProblem, Inputs } from './inputs';

const ABSOLUTE_AT_ZERO = 1e-9;

export type Verdict =
  | { readonly type: 'passed' }
  | { readonly type: 'failed'; readonly why: string }
  | { readonly type: 'skipped'; readonly why: string };

/** Holds the project's own answer against one check. */
export function evaluate(check: ReferenceCheck): Verdict {
  // A function named like something every object has must not be taken for a known one.
  const evaluator = Object.hasOwn(FUNCTIONS, check.fn) ? FUNCTIONS[check.fn] : undefined;
  if (evaluator === undefined) return { type: 'skipped', why: 'function not known' };
  try {
    const got = evaluator(new Inputs(check.inputs));
    return 'skip' in got ? { type: 'skipped', why: got.skip } : judge(got, check);
  } catch (error) {
    if (error instanceof InputProblem) return { type: 'failed', why: error.message };
    throw error;
  }
}

function judge(got: Evaluated, check: ReferenceCheck): Verdict {
  if (!got.ok) return { type: 'failed', why: `refused: ${got.refusal.words}` };
  const value = typeof got.value === 'object' ? got.value.value : got.value;
  if (holds(value, check)) return { type: 'passed' };
  const tolerance = typeof check.expected === 'number' ? ` within ${String(check.tolerance_rel)}` : '';
  return { type: 'failed', why: `got ${String(value)}, expected ${String(check.expected)}${tolerance}` };
}

function holds(value: number | boolean, { expected, tolerance_rel }: ReferenceCheck): boolean {
  if (typeof value === 'boolean' || typeof expected === 'boolean') return value === expected;
  const allowed = expected === 0 ? ABSOLUTE_AT_ZERO : tolerance_rel * Math.abs(expected);
  return Math.abs(value - expected) <= allowed;
}
