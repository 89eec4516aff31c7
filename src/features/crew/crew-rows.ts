import type { CrewAnswer } from '../../domain/report/desk-shapes';
import { agoWords, ageWords } from '../../domain/report/time-words';

export type Tablet = CrewAnswer['tablets'][number];

/** When a tablet last spoke to the server. */
export function lastSeenWords(tablet: Tablet, now_ms: number): string {
  if (tablet.last_seen_ms === null) return 'never';
  return agoWords(Math.max(0, now_ms - tablet.last_seen_ms));
}

/** What waited on it when it last spoke: it may have logged more since. */
export function pendingWords(tablet: Tablet, now_ms: number): string {
  const { pending } = tablet;
  if (pending === null) return 'not known';
  if (pending.count === 0) return 'nothing';
  const entries = `${pending.count} ${pending.count === 1 ? 'entry' : 'entries'}`;
  if (pending.oldest_wall_ms === null) return entries;
  return `${entries}, the oldest ${ageWords(Math.max(0, now_ms - pending.oldest_wall_ms))}`;
}

/** The ones in use first, by letter; revoked ones stay in the list, because their entries do. */
export function inUseFirst(tablets: readonly Tablet[]): readonly Tablet[] {
  return tablets.toSorted(
    (a, b) =>
      Number(a.revoked_ms !== null) - Number(b.revoked_ms !== null) ||
      a.letter.length - b.letter.length ||
      a.letter.localeCompare(b.letter),
  );
}
