import type { Result } from '../src/domain/units/result';

/** Unwraps what physics cannot refuse for a rig of ours. */
export function must<T>(result: Result<T>): T {
  if (!result.ok) throw new Error(`a demo rig was refused by physics: ${result.refusal.words}`);
  return result.value;
}
