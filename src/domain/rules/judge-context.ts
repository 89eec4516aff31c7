import { getDoc, type Effect } from '../book/documents/effect';
import type { Reason, Verdict } from '../book/entry';
import type { Stamp } from '../book/stamp';
import { isRole } from './roles';

export interface Judged {
  readonly verdict: Verdict;
  readonly reason: Reason | null;
}

/** What the judge needs beside the documents. */
export interface JudgeContext {
  /** Person whose own access token brought the entry; null when the tablet's own token did (protocol 3.5). */
  readonly session: string | null;
  /** Whether a person holds a grant for the tablet that wrote the entry. */
  readonly hasGrant: (person: string) => boolean;
  /** The server's clock, Unix ms: dates of permits and authorisations are compared with it. */
  readonly now_ms: number;
}

/**
 * When an entry was written, for comparing with the dates of permits: days may lie between writing and handing over.
 * An uncertain clock is not believed, and none may lie ahead of the server's (protocol 1.8).
 */
export function momentOf(stamp: Stamp, { now_ms }: Pick<JudgeContext, 'now_ms'>): number {
  return stamp.time_uncertain ? now_ms : Math.min(stamp.wall_ms, now_ms);
}

/** True when somebody other than `person` could review, so that nobody needs to judge their own work. */
export function* anotherReviewerExists(lab: string, person: string | null): Effect<boolean> {
  const crew = yield* getDoc('crew', lab);
  return Object.entries(crew?.roles ?? {}).some(
    ([id, role]) => id !== person && isRole(role, 'reviewer', 'lead'),
  );
}
