import {
  bodyText,
  chainHash,
  sealEntry,
  type Reason,
  type SealedEntry,
  type Verdict,
} from '../../src/domain/book/entry';
import { docKey, type DocKind, type DocOf, type Document } from '../../src/domain/book/documents/document';
import { mapStore, runEffect } from '../../src/domain/book/documents/effect';
import { foldEntry } from '../../src/domain/book/fold';
import { GENESIS_HASH } from '../../src/domain/book/ids';
import type { BodyOf, Kind } from '../../src/domain/book/kinds';
import type { Role } from '../../src/domain/book/bodies/people-bodies';
import { judgeEntry } from '../../src/domain/rules/judge';

/** The nth id: readable in a failing test. */
export function idOf(n: number): string {
  return `00000000-0000-4000-8000-${n.toString(16).padStart(12, '0')}`;
}

export const LAB = idOf(0xaa01);
export const EPOCH = idOf(0xaa02);
export const TABLET_A = idOf(0xaa0a);
export const TABLET_B = idOf(0xaa0b);
export const INGE = idOf(0xbb01);
export const MILO = idOf(0xbb02);
export const ADA = idOf(0xbb03);
export const TARIQ = idOf(0xbb04);

/** 2026-03-02, 08:00 UTC. */
export const MORNING_MS = Date.UTC(2026, 2, 2, 8);

export interface Written {
  readonly entry: SealedEntry;
  readonly verdict: Verdict;
  readonly reason: Reason | null;
  readonly revision: number;
  readonly chain_hash: string;
}

export interface WriteOptions {
  readonly by?: string | null;
  readonly witness?: string | null;
  readonly device?: string;
  /** Person whose session brings it; their own unless said otherwise. */
  readonly session?: string | null;
  readonly id?: string;
  readonly version?: number;
  /** Minutes after the morning, on the tablet's wall clock. */
  readonly at_min?: number;
  readonly stamp?: Partial<SealedEntry['stamp']>;
  readonly base_revision?: number;
  /** The server's clock, minutes after the morning; the tablet's unless said otherwise. */
  readonly arrives_min?: number;
}

/** A Book judged and folded by the domain alone, with one person in each role and Ada's grant on tablet A. */
export class PureBook {
  readonly documents = new Map<string, Document>();
  readonly written: Written[] = [];
  readonly grants = new Map<string, ReadonlySet<string>>([
    [TABLET_A, new Set([ADA, MILO])],
    [TABLET_B, new Set([MILO])],
  ]);
  #count = 0;
  #head = GENESIS_HASH;

  constructor(
    roles: Readonly<Record<string, Role>> = {
      [INGE]: 'lead',
      [MILO]: 'reviewer',
      [ADA]: 'operator',
      [TARIQ]: 'reader',
    },
  ) {
    for (const [person, role] of Object.entries(roles)) {
      this.#keep(this.seal('person.joined', person, { name: person.slice(-4), role }, { by: INGE }), {
        verdict: 'applied',
        reason: null,
      });
    }
  }

  seal<K extends Kind>(
    kind: K,
    subject: string | null,
    body: BodyOf<K>,
    options: WriteOptions = {},
  ): SealedEntry {
    return this.sealRaw({ kind, subject, body, options });
  }

  sealRaw(what: {
    kind: string;
    subject: string | null;
    body: Readonly<Record<string, unknown>>;
    options?: WriteOptions;
  }): SealedEntry {
    const { kind, subject, body, options = {} } = what;
    this.#count += 1;
    const id = options.id ?? idOf(this.#count);
    const at_ms = (options.at_min ?? 0) * 60_000;
    return sealEntry(
      {
        lab: LAB,
        id,
        device: options.device ?? TABLET_A,
        seq: this.#count,
        kind,
        version: options.version ?? 1,
        subject: subject ?? id,
        author: options.by === undefined ? ADA : options.by,
        witness: options.witness ?? null,
        base: { epoch: EPOCH, revision: options.base_revision ?? this.written.length, hash: this.#head },
        stamp: {
          wall_ms: MORNING_MS + at_ms,
          offset_min: 0,
          zone: 'Etc/UTC',
          page_life: idOf(0xcc01),
          monotonic_ms: at_ms,
          time_uncertain: false,
          ...options.stamp,
        },
      },
      bodyText(body, 'ab'.repeat(16)),
    );
  }

  write<K extends Kind>(
    kind: K,
    subject: string | null,
    body: BodyOf<K>,
    options: WriteOptions = {},
  ): Written {
    return this.take(this.seal(kind, subject, body, options), options);
  }

  take(entry: SealedEntry, options: WriteOptions = {}): Written {
    const context = {
      session: options.session === undefined ? entry.author : options.session,
      hasGrant: (person: string) => this.grants.get(entry.device)?.has(person) ?? false,
      now_ms: MORNING_MS + (options.arrives_min ?? options.at_min ?? 0) * 60_000,
    };
    const judged = runEffect(judgeEntry(entry, context), mapStore(this.documents));
    return this.#keep(entry, judged);
  }

  doc<K extends DocKind>(kind: K, id: string): DocOf<K> {
    const found = this.documents.get(docKey({ kind, id }));
    if (found?.kind !== kind) throw new Error(`no ${kind} ${id}`);
    return found as DocOf<K>;
  }

  #keep(entry: SealedEntry, { verdict, reason }: { verdict: Verdict; reason: Reason | null }): Written {
    const revision = this.written.length + 1;
    this.#head = chainHash(this.#head, { revision, entry_sha: entry.entry_sha, verdict, reason });
    runEffect(foldEntry(entry, { verdict, reason, revision }), mapStore(this.documents));
    const written = { entry, verdict, reason, revision, chain_hash: this.#head };
    this.written.push(written);
    return written;
  }
}
