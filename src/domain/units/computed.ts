import { answer, type Answer, type AnswerParts } from './answer';
import { firstRefusal, ok, refused, type Result } from './result';

/**
 * An answer once every input has passed its check: the first refusal otherwise. A figure beyond what a double holds is
 * refused in words too, so that no NaN and no Infinity ever leaves the physics.
 */
export function computed(checks: readonly Result<unknown>[], make: () => AnswerParts): Result<Answer> {
  const bad = firstRefusal(checks);
  if (bad !== undefined) return refused(bad);
  const made = answer(make());
  return [made.value, made.band.low, made.band.high].every(Number.isFinite) ? ok(made) : refused(BEYOND);
}

const BEYOND = {
  type: 'result-not-finite',
  words: 'These figures lie so far apart that no result can be given. Check their units.',
} as const;
