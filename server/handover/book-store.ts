import type { Document } from '../../src/domain/book/documents/document';
import type { EntryStub, Reason, SealedEntry, Verdict } from '../../src/domain/book/entry';

/** Where a lab's Book stands. */
export interface LabState {
  readonly epoch: string;
  readonly revision: number;
  /** Chain hash at that revision. */
  readonly hash: string;
  readonly backup_revision: number;
}

export interface TabletState {
  /** Last number taken; the next entry carries the one after it. */
  readonly last_seq: number;
  readonly revoked: boolean;
}

export interface StoredEntry {
  readonly revision: number;
  readonly verdict: Verdict;
  readonly reason: Reason | null;
  readonly received_ms: number;
  readonly chain_hash: string;
  readonly entry: SealedEntry | EntryStub;
}

/** As much of a stored entry as decides whether one that comes again is the same. */
export interface KnownEntry {
  readonly id: string;
  readonly revision: number;
  /** Null for a stub. */
  readonly text: { readonly kind: string; readonly author: string | null; readonly body_sha: string } | null;
  readonly entry_sha: string;
  readonly verdict: Verdict;
  readonly reason: Reason | null;
}

export interface ChangedDocument {
  readonly doc: Document;
  /** Revision that first put it, of those in this change; kept when the document is already there. */
  readonly made: number;
  readonly revision: number;
}

export interface BookChange {
  readonly entries: readonly StoredEntry[];
  readonly documents: readonly ChangedDocument[];
  readonly last_seq: number;
  /** Set when another id came at a used number (protocol 3.6). */
  readonly forked: boolean;
  readonly at_ms: number;
}

/** A lab's Book while its lock is held: nobody else can append until the work is done. */
export interface BookWriter {
  readonly lab: LabState;
  readonly tablet: TabletState;
  readonly grantedPeople: () => Promise<ReadonlySet<string>>;
  readonly entriesByIds: (ids: readonly string[]) => Promise<readonly KnownEntry[]>;
  /** Documents of every kind under these ids. */
  readonly documentsByIds: (ids: readonly string[]) => Promise<readonly Document[]>;
  readonly append: (change: BookChange) => Promise<void>;
}

export interface Whose {
  readonly lab: string;
  readonly device: string;
}

export interface NewLab {
  readonly id: string;
  readonly name: string;
  readonly epoch: string;
  /** The server's own device: it writes only the founding. */
  readonly device: string;
  readonly made_ms: number;
  readonly lead: string;
}

export interface TabletReport {
  readonly app_version: string;
  readonly pending: { readonly count: number; readonly oldest_wall_ms: number | null };
  readonly at_ms: number;
}

export interface Snapshot {
  readonly lab: LabState;
  readonly fold_version: number;
  /** JSON texts of the documents, page by page. */
  readonly pages: AsyncIterable<readonly string[]>;
}

/** Where Books are kept. All of it or nothing of a `write` is done, and it answers after the commit. */
export interface BookStore {
  /** Locks the lab, then the tablet, then runs `work`, more than once where the database asks for that. */
  readonly write: <T>(whose: Whose, work: (writer: BookWriter) => Promise<T>) => Promise<T>;
  /** Makes the lab and its server device and runs `work` on the empty Book, in one transaction. */
  readonly found: <T>(lab: NewLab, work: (writer: BookWriter) => Promise<T>) => Promise<T>;
  readonly labState: (lab: string) => Promise<LabState | undefined>;
  readonly tabletState: (whose: Whose) => Promise<TabletState | undefined>;
  /** Chain hash at a revision, undefined beyond the head; at 0 that of the empty Book. */
  readonly hashAt: (lab: string, revision: number) => Promise<string | undefined>;
  /** Revisions from `since` + 1, as many as `limit` and a bound on bytes allow, at least one if there is one. */
  readonly entriesAfter: (lab: string, since: number, limit: number) => Promise<readonly StoredEntry[]>;
  readonly knownEntries: (lab: string, ids: readonly string[]) => Promise<readonly KnownEntry[]>;
  readonly noteReport: (whose: Whose, report: TabletReport) => Promise<void>;
  readonly snapshot: (lab: string, work: (snapshot: Snapshot) => Promise<void>) => Promise<void>;
}

/** Bodies of one page of a pull together stay below this, unless a single one is larger. */
export const PAGE_MAX_BYTES = 4 * 1024 * 1024;
