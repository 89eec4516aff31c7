/**
 * The one refusal shape of the domain: an expected failure, said in words a person can act on.
 * `type` is for code to branch on, `field` names the input to stand beside, `words` is shown as it is.
 */
export interface Refusal {
  readonly type: string;
  readonly field?: string;
  readonly words: string;
}

/** A value, or the reason why there is none. Throwing is kept for bugs. */
export type Result<T, E = Refusal> =
  { readonly ok: true; readonly value: T } | { readonly ok: false; readonly refusal: E };

export function ok<T>(value: T): { readonly ok: true; readonly value: T } {
  return { ok: true, value };
}

export function refused<E>(refusal: E): { readonly ok: false; readonly refusal: E } {
  return { ok: false, refusal };
}

/** Carries a refusal on, or goes on with the value. */
export function andThen<A, B, E>(result: Result<A, E>, next: (value: A) => Result<B, E>): Result<B, E> {
  return result.ok ? next(result.value) : result;
}

export function mapResult<A, B, E>(result: Result<A, E>, change: (value: A) => B): Result<B, E> {
  return result.ok ? ok(change(result.value)) : result;
}

/** The first refusal of several results, or undefined when all hold a value. */
export function firstRefusal<E>(results: readonly Result<unknown, E>[]): E | undefined {
  for (const result of results) if (!result.ok) return result.refusal;
  return undefined;
}
