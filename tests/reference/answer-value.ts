import type { Answer } from '../../src/domain/units/answer';
import type { Result } from '../../src/domain/units/result';

/** The figure of an answer; NaN where it was refused, which no comparison passes. */
export function valueOf(result: Result<Answer>): number {
  return result.ok ? result.value.value : Number.NaN;
}

/** How far an answer lies off, as a share of what is expected. */
export function off(result: Result<Answer>, expected: number): number {
  return Math.abs(valueOf(result) / expected - 1);
}
