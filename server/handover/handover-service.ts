import { isIntact, type EntryStub, type SealedEntry } from '../../src/domain/book/entry';
import { FOLD_VERSION } from '../../src/domain/book/fold';
import {
  PROTOCOL_VERSION,
  type HelloAnswer,
  type HelloRequest,
  type PullAnswer,
  type PushAnswer,
} from '../../src/domain/handover/wire';
import { BrokenEntry, NotYours, Reset, Revoked } from '../http/problems';
import type { BookStore, KnownEntry, LabState, Whose } from './book-store';
import type { HeadWatcher } from './head-watcher';
import { judgeBatch, type Domain } from './judge-batch';

export interface HandoverParts {
  readonly store: BookStore;
  readonly watcher: HeadWatcher;
  readonly domain: Domain;
  readonly now: () => number;
  readonly onFault: (id: string, error: unknown) => void;
}

export interface PushInput {
  readonly lab: string;
  readonly device: string;
  /** Person under whose own session this comes; null under the tablet's own token. */
  readonly session: string | null;
  readonly entries: readonly (SealedEntry | EntryStub)[];
  /** When it arrived, by the server's clock; now unless a seed says otherwise. */
  readonly received_ms?: number;
}

export interface PullInput {
  readonly lab: string;
  readonly device: string;
  readonly since: number;
  readonly hash: string;
  readonly limit: number;
  readonly wait_ms: number;
  readonly signal: AbortSignal;
}

export type HandoverService = ReturnType<typeof createHandoverService>;

export function createHandoverService({ store, watcher, domain, now, onFault }: HandoverParts) {
  async function mustLab(lab: string): Promise<LabState> {
    const state = await store.labState(lab);
    if (state === undefined) throw new Error(`there is no lab ${lab}`);
    return state;
  }

  return {
    /** Judges and stores a batch in one transaction; what it answers is committed (protocol 3.2 to 3.7). */
    async push({ lab, device, session, entries, received_ms = now() }: PushInput): Promise<PushAnswer> {
      refuseForeign(entries, { lab, device });
      refuseBroken(entries);
      const answer = await store.write({ lab, device }, async (writer) => {
        if (writer.tablet.revoked) throw new Revoked();
        const { results, change } = await judgeBatch(writer, {
          items: entries,
          session,
          received_ms,
          domain,
          onFault,
        });
        await writer.append(change);
        const head = change.entries.at(-1)?.revision ?? writer.lab.revision;
        return { results: [...results], last_seq: change.last_seq, head };
      });
      watcher.announce(lab, answer.head);
      return { ...answer, server_ms: now() };
    },

    async hello(whose: Whose, request: HelloRequest): Promise<HelloAnswer> {
      await store.noteReport(whose, {
        app_version: request.app_version,
        pending: request.pending,
        at_ms: now(),
      });
      const lab = await mustLab(whose.lab);
      const last_seq = (await store.tabletState(whose))?.last_seq ?? 0;
      const lost =
        request.acked_seq > last_seq || !(await isOfThisBook(store, whose.lab, { ...request.cursor, lab }));
      const older = request.protocol < PROTOCOL_VERSION || request.fold_version < FOLD_VERSION;
      return {
        state: lost ? 'reset' : older ? 'upgrade' : 'ok',
        epoch: lab.epoch,
        head: lab.revision,
        head_hash: lab.hash,
        last_seq,
        backup_revision: lab.backup_revision,
        server_ms: now(),
      };
    },

    /** Waits up to `wait_ms` for something beyond `since`; a tablet revoked meanwhile gets nothing (protocol 4.4). */
    async pull({ lab, device, since, hash, limit, wait_ms, signal }: PullInput): Promise<PullAnswer> {
      const before = await mustLab(lab);
      if (!(await isOfThisBook(store, lab, { epoch: before.epoch, revision: since, hash, lab: before }))) {
        throw new Reset(
          'The revision and hash that were asked from are not in this Book. Fill again from zero.',
        );
      }
      if (before.revision === since && wait_ms > 0) {
        await watcher.waitBeyond({ lab, since, wait_ms, signal });
        const tablet = await store.tabletState({ lab, device });
        if (tablet === undefined || tablet.revoked) throw new Revoked();
      }
      const { epoch, revision: head } = await mustLab(lab);
      if (epoch !== before.epoch) throw new Reset('The Book was restored meanwhile. Fill again from zero.');
      const found = await store.entriesAfter(lab, since, Math.min(limit, head - since));
      const to = found.at(-1)?.revision ?? since;
      if (found.length !== to - since) throw new Error(`revisions after ${since} of lab ${lab} have a gap`);
      return { epoch, since, to, head, more: to < head, entries: [...found] };
    },

    known: (lab: string, ids: readonly string[]): Promise<readonly KnownEntry[]> =>
      store.knownEntries(lab, ids),

    snapshot: store.snapshot,
  };
}

function refuseForeign(entries: PushInput['entries'], { lab, device }: Whose): void {
  const foreign = entries.findIndex((entry) => entry.lab !== lab || entry.device !== device);
  if (foreign >= 0) {
    throw new NotYours(
      'A tablet hands over its own entries of its own lab only. Nothing of the batch was taken.',
      {
        fields: { [`body.entries.${foreign}`]: 'is of another lab or tablet' },
      },
    );
  }
}

function refuseBroken(entries: PushInput['entries']): void {
  const broken = entries.find((entry) => !('stub' in entry) && !isIntact(entry));
  if (broken !== undefined) {
    throw new BrokenEntry(
      `The hashes of entry ${broken.id} are not those of what it says. Nothing was taken.`,
      {
        fields: { [`body.entries.${entries.indexOf(broken)}`]: `entry ${broken.id} does not fit its hashes` },
      },
    );
  }
}

interface Mirror {
  readonly epoch: string | null;
  readonly revision: number;
  readonly hash: string;
  readonly lab: LabState;
}

/** False where the tablet's mirror was filled from another Book than the one that stands here (protocol 3.11). */
async function isOfThisBook(
  store: BookStore,
  id: string,
  { epoch, revision, hash, lab }: Mirror,
): Promise<boolean> {
  if (epoch === null) return revision === 0;
  if (epoch !== lab.epoch || revision > lab.revision) return false;
  const ours = revision === lab.revision ? lab.hash : await store.hashAt(id, revision);
  return ours === hash;
}
