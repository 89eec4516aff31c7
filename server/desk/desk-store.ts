import type { DocKind, DocOf } from '../../src/domain/book/documents/document';
import type { JudgedEntry } from '../../src/domain/book/entry';
import type { FiringEntry } from '../../src/domain/report/desk-shapes';
import type { Database } from '../db/database';
import { toInt } from '../db/rows';
import { deskEntryColumns, readFiringEntry, readJudgedEntry, type RawDeskEntry } from './desk-rows';

export interface Found<K extends DocKind> {
  readonly doc: DocOf<K>;
  /** Revision of the Book at which the document was first put, and last changed. */
  readonly made: number;
  readonly revision: number;
}

interface RawDocument {
  readonly doc: string;
  readonly made_revision: string;
  readonly revision: string;
}

const documentColumns = ['documents.doc', 'documents.made_revision', 'documents.revision'] as const;

export interface DocumentQuery<K extends DocKind> {
  readonly lab: string;
  readonly kind: K;
  readonly states?: readonly string[];
  readonly parent?: string;
  /** Made before this revision of the Book. */
  readonly before?: number;
  readonly limit: number;
}

/** Read models of one lab; every question names it. */
export type DeskStore = ReturnType<typeof createDeskStore>;

export function createDeskStore(database: Database) {
  return {
    /** Newest first by when each was made. */
    async listDocuments<K extends DocKind>(query: DocumentQuery<K>): Promise<Found<K>[]> {
      const { lab, kind, states, parent, before, limit } = query;
      const builder = database('documents').where({ lab, kind });
      if (states !== undefined) void builder.whereIn('documents.list_state', [...states]);
      if (parent !== undefined) void builder.where('documents.parent', parent);
      if (before !== undefined) void builder.where('documents.made_revision', '<', before);
      const rows = await builder
        .select<RawDocument[]>(documentColumns)
        .orderBy('documents.made_revision', 'desc')
        .limit(limit);
      return rows.map(readFound<K>);
    },

    async findDocument<K extends DocKind>(lab: string, kind: K, id: string): Promise<Found<K> | undefined> {
      const row = await database('documents')
        .select(documentColumns)
        .where({ lab, kind, id })
        .first<RawDocument | undefined>();
      return row === undefined ? undefined : readFound<K>(row);
    },

    /** A text of each document instead of the whole, by id. */
    async namesOf(lab: string, kind: 'person' | 'rig', ids: readonly string[]): Promise<Map<string, string>> {
      if (ids.length === 0) return new Map();
      const rows = await database('documents')
        .select<{ id: string; name: string }[]>(
          'documents.id',
          database.raw(`JSON_VALUE(documents.doc, '$.name') AS name`),
        )
        .where({ lab, kind })
        .whereIn('documents.id', [...new Set(ids)]);
      return new Map(rows.map(({ id, name }) => [id, name]));
    },

    /** Kind and parent of the rigs, firings, checks and incidents among these ids. */
    async parentsOf(
      lab: string,
      ids: readonly string[],
    ): Promise<{ id: string; kind: string; parent: string | null }[]> {
      if (ids.length === 0) return [];
      return database('documents')
        .select<{ id: string; kind: string; parent: string | null }[]>(
          'documents.id',
          'documents.kind',
          'documents.parent',
        )
        .where({ lab })
        .whereIn('documents.id', [...ids])
        .whereIn('documents.kind', ['rig', 'firing', 'check', 'incident']);
    },

    /** When the entries with these revisions arrived, and the chain hash there. */
    async pointsAt(
      lab: string,
      revisions: readonly number[],
    ): Promise<Map<number, { received_ms: number; chain_hash: string }>> {
      if (revisions.length === 0) return new Map();
      const rows = await database('entries')
        .select<{ revision: string; received_ms: string; chain_hash: string }[]>(
          'entries.revision',
          'entries.received_ms',
          'entries.chain_hash',
        )
        .where({ lab })
        .whereIn('entries.revision', [...new Set(revisions)]);
      return new Map(
        rows.map(({ revision, received_ms, chain_hash }) => [
          toInt(revision),
          { received_ms: toInt(received_ms), chain_hash },
        ]),
      );
    },

    async firingEntries(lab: string, firing: string): Promise<FiringEntry[]> {
      const rows = await database('entries')
        .join('devices', (join) => {
          join.on('devices.lab', 'entries.lab').andOn('devices.id', 'entries.device');
        })
        .select<(RawDeskEntry & { letter: string })[]>([...deskEntryColumns, 'devices.letter'])
        .where({ 'entries.lab': lab, 'entries.subject': firing })
        .orderBy('entries.revision');
      return rows.map(readFiringEntry);
    },

    /** Newest first; stubs have no text and are left out. */
    async listEntries(query: {
      readonly lab: string;
      readonly since: number;
      readonly limit: number;
      readonly verdict?: 'irregular';
    }): Promise<JudgedEntry[]> {
      const { lab, since, limit, verdict } = query;
      const rows = await database('entries')
        .select<RawDeskEntry[]>(deskEntryColumns)
        .where({ lab, ...(verdict === undefined ? {} : { verdict }) })
        .where('entries.revision', '>', since)
        .whereNull('entries.stub_why')
        .orderBy('entries.revision', 'desc')
        .limit(limit);
      return rows.map(readJudgedEntry);
    },

    async findEntry(lab: string, id: string): Promise<JudgedEntry | undefined> {
      const row = await database('entries')
        .select(deskEntryColumns)
        .where({ lab, id })
        .whereNull('entries.stub_why')
        .first<RawDeskEntry | undefined>();
      return row === undefined ? undefined : readJudgedEntry(row);
    },

    /** What came as a stub: it has no document, because nobody here knows its text (protocol 3.7). */
    async listStubs(lab: string, limit: number): Promise<StubFact[]> {
      const rows = await database('entries')
        .select<{ id: string; revision: string; received_ms: string; stub_why: string }[]>(
          'entries.id',
          'entries.revision',
          'entries.received_ms',
          'entries.stub_why',
        )
        .where({ lab, verdict: 'held-back' })
        .whereNotNull('entries.stub_why')
        .orderBy('entries.revision', 'desc')
        .limit(limit);
      return rows.map(({ id, revision, received_ms, stub_why }) => ({
        id,
        revision: toInt(revision),
        received_ms: toInt(received_ms),
        why: stub_why,
      }));
    },

    async bookPoint(lab: string): Promise<{ epoch: string; revision: number; hash: string } | undefined> {
      const row = await database('labs')
        .select('labs.epoch', 'labs.revision', 'labs.chain_hash')
        .where({ id: lab })
        .first<{ epoch: string; revision: string; chain_hash: string } | undefined>();
      return row === undefined
        ? undefined
        : { epoch: row.epoch, revision: toInt(row.revision), hash: row.chain_hash };
    },
  };
}

export interface StubFact {
  readonly id: string;
  readonly revision: number;
  readonly received_ms: number;
  readonly why: string;
}

function readFound<K extends DocKind>({ doc, made_revision, revision }: RawDocument): Found<K> {
  // The kind stands in the question, and only the folds write documents.
  return { doc: JSON.parse(doc) as DocOf<K>, made: toInt(made_revision), revision: toInt(revision) };
}
