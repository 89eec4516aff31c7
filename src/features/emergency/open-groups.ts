import type { SealedEntry } from '../../domain/book/entry';

/** What one person did in one go before a PIN: entries about the same thing in the same page life. */
export interface OpenGroup {
  readonly key: string;
  readonly subject: string;
  /** In the order of writing. */
  readonly entries: readonly SealedEntry[];
}

/** Groups entries so that a make-safe check of a dozen steps is claimed in one touch; the newest group first. */
export function openGroups(entries: readonly SealedEntry[]): readonly OpenGroup[] {
  const groups = new Map<string, SealedEntry[]>();
  for (const entry of entries.toSorted((a, b) => a.seq - b.seq)) {
    const key = `${entry.subject}/${entry.stamp.page_life}`;
    groups.set(key, [...(groups.get(key) ?? []), entry]);
  }
  return [...groups]
    .map(([key, of]) => ({ key, subject: of[0]?.subject ?? '', entries: of }))
    .toSorted((a, b) => lastSeq(b) - lastSeq(a));
}

function lastSeq({ entries }: OpenGroup): number {
  return entries.at(-1)?.seq ?? 0;
}
