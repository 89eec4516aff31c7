import {
  chainHash,
  type Base,
  type Reason,
  type SealedEntry,
  type Verdict,
} from '../../src/domain/book/entry';
import type { DocKind, DocOf, Document } from '../../src/domain/book/documents/document';
import { getDoc, mapStore, runEffect } from '../../src/domain/book/documents/effect';
import { foldEntry } from '../../src/domain/book/fold';
import { GENESIS_HASH } from '../../src/domain/book/ids';
import { judgeEntry } from '../../src/domain/rules/judge';

/** What came of an entry: the same figures that a server gives for the same entries. */
export interface Outcome {
  readonly id: string;
  readonly revision: number;
  readonly verdict: Verdict;
  readonly reason: Reason | null;
}

/** A judged entry with which a Book begins: its server founded it, so the judge never saw the first one. */
export interface FoundingEntry {
  readonly entry: SealedEntry;
  readonly revision: number;
  readonly verdict: Verdict;
  readonly reason: Reason | null;
  readonly chain_hash: string;
}

/** A Book in memory, judged, folded and chained by the domain alone. */
export interface MemoryBook {
  readonly head: () => Base;
  readonly doc: <K extends DocKind>(kind: K, id: string) => DocOf<K> | undefined;
  readonly documents: () => readonly Document[];
  readonly take: (entry: SealedEntry, by: { readonly session: string; readonly now_ms: number }) => Outcome;
}

export interface BookStart {
  readonly epoch: string;
  readonly founding: readonly FoundingEntry[];
  /** The people who have signed in on a tablet, by tablet. */
  readonly grants: ReadonlyMap<string, readonly string[]>;
}

export function createMemoryBook({ epoch, founding, grants }: BookStart): MemoryBook {
  const documents = new Map<string, Document>();
  const store = mapStore(documents);
  let head: Base = { epoch, revision: 0, hash: GENESIS_HASH };
  for (const { entry, revision, verdict, reason, chain_hash } of founding) {
    runEffect(foldEntry(entry, { verdict, reason, revision }), store);
    head = { epoch, revision, hash: chain_hash };
  }
  return {
    head: () => head,
    doc: (kind, id) => runEffect(getDoc(kind, id), store),
    documents: () => [...documents.values()],
    take: (entry, { session, now_ms }) => {
      const hasGrant = (person: string) => grants.get(entry.device)?.includes(person) ?? false;
      const { verdict, reason } = runEffect(judgeEntry(entry, { session, hasGrant, now_ms }), store);
      const revision = head.revision + 1;
      const link = { revision, entry_sha: entry.entry_sha, verdict, reason };
      runEffect(foldEntry(entry, { verdict, reason, revision }), store);
      head = { epoch, revision, hash: chainHash(head.hash, link) };
      return { id: entry.id, revision, verdict, reason };
    },
  };
}
