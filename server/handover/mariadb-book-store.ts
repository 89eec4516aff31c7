import { GENESIS_HASH } from '../../src/domain/book/ids';
import { FOLD_VERSION } from '../../src/domain/book/fold';
import { writeAudit } from '../db/audit';
import type { Database, Transaction } from '../db/database';
import { toInt, toIntOrNull } from '../db/rows';
import { inTransaction } from '../db/transaction';
import {
  PAGE_MAX_BYTES,
  type BookStore,
  type LabState,
  type StoredEntry,
  type TabletState,
  type Whose,
} from './book-store';
import {
  entryColumns,
  fromEntryRow,
  fromKnownRow,
  knownColumns,
  type RawEntry,
  type RawKnown,
} from './entry-rows';
import { createMariaDbWriter } from './mariadb-book-writer';
import { withSnapshot } from './mariadb-snapshot';

const labColumns = ['labs.epoch', 'labs.revision', 'labs.chain_hash', 'labs.backup_revision'] as const;

interface RawLab {
  readonly epoch: string;
  readonly revision: string;
  readonly chain_hash: string;
  readonly backup_revision: string;
}

export function createMariaDbBookStore(database: Database): BookStore {
  return {
    write: (whose, work) =>
      inTransaction(database, async (transaction) => {
        // The lab first: while it is locked, revisions are given in the order of the commits (protocol 3.2).
        const lab = await lockLab(transaction, whose.lab);
        const tablet = await lockTablet(transaction, whose);
        return work(createMariaDbWriter(transaction, whose, { lab, tablet }));
      }),
    found: (lab, work) =>
      inTransaction(database, async (transaction) => {
        const { id, name, epoch, device, made_ms, lead } = lab;
        await transaction('labs').insert({
          id,
          name,
          epoch,
          chain_hash: GENESIS_HASH,
          fold_version: FOLD_VERSION,
          created_ms: made_ms,
        });
        await transaction('devices').insert({
          lab: id,
          id: device,
          letter: '0',
          name: 'Holdoff server',
          enrolled_ms: made_ms,
        });
        await writeAudit(transaction, { lab: id, at_ms: made_ms, what: 'lab-founded', device, person: lead });
        const empty = { epoch, revision: 0, hash: GENESIS_HASH, backup_revision: 0 };
        const whose = { lab: id, device };
        return work(
          createMariaDbWriter(transaction, whose, { lab: empty, tablet: { last_seq: 0, revoked: false } }),
        );
      }),
    async labState(lab) {
      const row = await database('labs').select(labColumns).where({ id: lab }).first<RawLab | undefined>();
      return row === undefined ? undefined : readLab(row);
    },
    async tabletState({ lab, device }) {
      const row = await database('devices')
        .select('devices.last_seq', 'devices.revoked_ms')
        .where({ lab, id: device })
        .first<RawTablet | undefined>();
      return row === undefined ? undefined : readTablet(row);
    },
    async hashAt(lab, revision) {
      if (revision === 0) return GENESIS_HASH;
      const row = await database('entries')
        .select('entries.chain_hash')
        .where({ lab, revision })
        .first<{ chain_hash: string } | undefined>();
      return row?.chain_hash;
    },
    entriesAfter: (lab, since, limit) => readPage(database, { lab, since, limit }),
    async knownEntries(lab, ids) {
      if (ids.length === 0) return [];
      const rows = await database('entries')
        .select<RawKnown[]>(knownColumns)
        .where({ lab })
        .whereIn('id', [...ids]);
      return rows.map(fromKnownRow);
    },
    async noteReport({ lab, device }, { app_version, pending, at_ms }) {
      await database('devices').where({ lab, id: device }).update({
        app_version,
        pending_count: pending.count,
        pending_oldest_wall_ms: pending.oldest_wall_ms,
        last_seen_ms: at_ms,
      });
    },
    snapshot: (lab, work) => withSnapshot(database, lab, work),
  };
}

interface Page {
  readonly lab: string;
  readonly since: number;
  readonly limit: number;
}

async function readPage(database: Database, { lab, since, limit }: Page): Promise<StoredEntry[]> {
  const sizes = await database('entries')
    .select<{ revision: string; body_bytes: number }[]>('entries.revision', 'entries.body_bytes')
    .where({ lab })
    .andWhere('entries.revision', '>', since)
    .orderBy('entries.revision')
    .limit(limit);
  const last = lastOfPage(sizes);
  if (last === undefined) return [];
  const rows = await database('entries')
    .select<RawEntry[]>(entryColumns)
    .where({ lab })
    .andWhere('entries.revision', '>', since)
    .andWhere('entries.revision', '<=', last)
    .orderBy('entries.revision');
  return rows.map(fromEntryRow);
}

function lastOfPage(sizes: readonly { revision: string; body_bytes: number }[]): string | undefined {
  let bytes = 0;
  let last: string | undefined;
  for (const { revision, body_bytes } of sizes) {
    bytes += body_bytes;
    if (last !== undefined && bytes > PAGE_MAX_BYTES) break;
    last = revision;
  }
  return last;
}

async function lockLab(transaction: Transaction, id: string): Promise<LabState> {
  const row = await transaction('labs')
    .select(labColumns)
    .where({ id })
    .forUpdate()
    .first<RawLab | undefined>();
  if (row === undefined) throw new Error(`there is no lab ${id}`);
  return readLab(row);
}

interface RawTablet {
  readonly last_seq: string;
  readonly revoked_ms: string | null;
}

async function lockTablet(transaction: Transaction, { lab, device }: Whose): Promise<TabletState> {
  const row = await transaction('devices')
    .select('devices.last_seq', 'devices.revoked_ms')
    .where({ lab, id: device })
    .forUpdate()
    .first<RawTablet | undefined>();
  if (row === undefined) throw new Error(`there is no tablet ${device} in lab ${lab}`);
  return readTablet(row);
}

function readLab({ epoch, revision, chain_hash, backup_revision }: RawLab): LabState {
  return { epoch, revision: toInt(revision), hash: chain_hash, backup_revision: toInt(backup_revision) };
}

function readTablet({ last_seq, revoked_ms }: RawTablet): TabletState {
  return { last_seq: toInt(last_seq), revoked: toIntOrNull(revoked_ms) !== null };
}
