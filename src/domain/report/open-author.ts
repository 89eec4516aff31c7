import type { SealedEntry } from '../book/entry';
import { readEntry } from '../book/read-body';

/** An entry that somebody wrote before a PIN, to be claimed afterwards (protocol 4.2). */
export type OpenEntry = SealedEntry;

/** Nobody's hand: the tablet writes it by itself. */
const NOBODYS: ReadonlySet<string> = new Set(['noise.counted']);

/** Of a tablet's own entries those without an author that no later one of them claims, in the order given. */
export function openAuthorEntries(own: readonly SealedEntry[]): readonly OpenEntry[] {
  const claimed = new Set(own.flatMap(claimedBy));
  return own.filter((entry) => entry.author === null && !NOBODYS.has(entry.kind) && !claimed.has(entry.id));
}

function claimedBy(entry: SealedEntry): readonly string[] {
  if (entry.kind !== 'entry.claimed') return [];
  const outcome = readEntry(entry);
  return outcome.type === 'readable' && outcome.entry.kind === 'entry.claimed'
    ? [outcome.entry.body.claims]
    : [];
}
