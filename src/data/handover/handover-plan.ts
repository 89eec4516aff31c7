/** What one round of the handover knows; the plan is a pure function of it. */
export interface RoundFacts {
  /** The server has answered hello in this round. */
  readonly greeted: boolean;
  /** The mirror is not of the server's Book (protocol 3.11). */
  readonly reset: boolean;
  /** A reset was settled and the new Book has not arrived yet. */
  readonly refilling: boolean;
  readonly filling: boolean;
  /** Own entries that can be sent. */
  readonly waiting: number;
  /** The server has another entry at a seq of ours: nothing is sent until somebody signs in (protocol 3.6). */
  readonly forked: boolean;
  readonly cursor: number;
  readonly head: number;
}

export type RoundStep = 'hello' | 'reset' | 'push' | 'fill' | 'pull' | 'done';

/**
 * Hello, push until empty, fill once, pull until head (protocol 3.9). Pushing goes first, since what is lost here is
 * lost; only after a reset the new Book comes first, or entries that it has already would be missing on the screens.
 */
export function nextStep(facts: RoundFacts): RoundStep {
  if (!facts.greeted) return 'hello';
  if (facts.reset) return 'reset';
  if (facts.refilling) return 'fill';
  if (facts.waiting > 0 && !facts.forked) return 'push';
  if (facts.filling) return 'fill';
  return facts.cursor < facts.head ? 'pull' : 'done';
}

const FIRST_BACKOFF_MS = 1000;
const LONGEST_BACKOFF_MS = 60_000;

/** Wait before the next try after so many failed ones: 1 s doubling to 60 s, of which chance takes up to half. */
export function backoffMs(failures: number, chance: number): number {
  const full = Math.min(LONGEST_BACKOFF_MS, FIRST_BACKOFF_MS * 2 ** Math.min(failures - 1, 10));
  return Math.max(FIRST_BACKOFF_MS, full * (1 - chance / 2));
}

/** Somebody who logs while the network is away wants it sent soon, but not one request per entry. */
export const APPEND_RETRY_MS = 2000;
