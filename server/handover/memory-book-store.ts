import { docKey } from '../../src/domain/book/documents/document';
import { FOLD_VERSION } from '../../src/domain/book/fold';
import { GENESIS_HASH } from '../../src/domain/book/ids';
import {
  PAGE_MAX_BYTES,
  type BookChange,
  type BookStore,
  type BookWriter,
  type ChangedDocument,
  type KnownEntry,
  type LabState,
  type StoredEntry,
  type TabletReport,
  type TabletState,
  type Whose,
} from './book-store';

interface MemoryLab {
  readonly state: LabState;
  readonly tablets: ReadonlyMap<string, TabletState>;
  readonly grants: ReadonlyMap<string, ReadonlySet<string>>;
  readonly entries: readonly StoredEntry[];
  readonly documents: ReadonlyMap<string, ChangedDocument>;
}

export interface MemoryBookStore extends BookStore {
  readonly addTablet: (whose: Whose, grants?: readonly string[]) => void;
  readonly reports: ReadonlyMap<string, TabletReport>;
}

/** The fake beside MariaDB: held to the same contract suite, all in memory, one writer per lab at a time. */
export function createMemoryBookStore(): MemoryBookStore {
  const labs = new Map<string, MemoryLab>();
  const queues = new Map<string, Promise<unknown>>();
  const reports = new Map<string, TabletReport>();

  function must(id: string): MemoryLab {
    const lab = labs.get(id);
    if (lab === undefined) throw new Error(`there is no lab ${id}`);
    return lab;
  }

  /** One after the other, whatever became of the one before. */
  function inTurn<T>(id: string, work: () => Promise<T>): Promise<T> {
    const turn = (queues.get(id) ?? Promise.resolve()).then(work, work);
    queues.set(id, turn);
    return turn;
  }

  async function change<T>(whose: Whose, work: (writer: BookWriter) => Promise<T>): Promise<T> {
    const before = must(whose.lab);
    let after = before;
    const result = await work(
      writerOf(before, whose, (appended) => {
        after = applyChange(after, whose, appended);
      }),
    );
    labs.set(whose.lab, after);
    return result;
  }

  return {
    reports,
    addTablet({ lab, device }, grants = []) {
      const known = must(lab);
      labs.set(lab, {
        ...known,
        tablets: new Map(known.tablets).set(device, { last_seq: 0, revoked: false }),
        grants: new Map(known.grants).set(device, new Set(grants)),
      });
    },
    write: (whose, work) => inTurn(whose.lab, () => change(whose, work)),
    found: ({ id, epoch, device }, work) =>
      inTurn(id, async () => {
        if (labs.has(id)) throw new Error(`lab ${id} is there already`);
        labs.set(id, {
          state: { epoch, revision: 0, hash: GENESIS_HASH, backup_revision: 0 },
          tablets: new Map([[device, { last_seq: 0, revoked: false }]]),
          grants: new Map(),
          entries: [],
          documents: new Map(),
        });
        try {
          return await change({ lab: id, device }, work);
        } catch (error) {
          labs.delete(id);
          throw error;
        }
      }),
    labState: (lab) => Promise.resolve(labs.get(lab)?.state),
    tabletState: ({ lab, device }) => Promise.resolve(labs.get(lab)?.tablets.get(device)),
    hashAt: (lab, revision) =>
      Promise.resolve(revision === 0 ? GENESIS_HASH : labs.get(lab)?.entries[revision - 1]?.chain_hash),
    entriesAfter: (lab, since, limit) =>
      Promise.resolve(pageOf(must(lab).entries.slice(since, since + limit))),
    knownEntries: (lab, ids) => Promise.resolve(knownOf(must(lab), ids)),
    noteReport({ device }, report) {
      reports.set(device, report);
      return Promise.resolve();
    },
    snapshot(lab, work) {
      const { state, documents } = must(lab);
      return work({ lab: state, fold_version: FOLD_VERSION, pages: pagesOf(documents) });
    },
  };
}

function writerOf(lab: MemoryLab, whose: Whose, append: (change: BookChange) => void): BookWriter {
  const tablet = lab.tablets.get(whose.device);
  if (tablet === undefined) throw new Error(`there is no tablet ${whose.device} in lab ${whose.lab}`);
  return {
    lab: lab.state,
    tablet,
    grantedPeople: () => Promise.resolve(lab.grants.get(whose.device) ?? new Set()),
    entriesByIds: (ids) => Promise.resolve(knownOf(lab, ids)),
    documentsByIds: (ids) =>
      Promise.resolve(
        [...lab.documents.values()].map((one) => one.doc).filter((doc) => ids.includes(doc.id)),
      ),
    append: (change) => {
      append(change);
      return Promise.resolve();
    },
  };
}

function applyChange(lab: MemoryLab, { device }: Whose, change: BookChange): MemoryLab {
  const { entries, documents, last_seq } = change;
  const last = entries.at(-1);
  const merged = new Map(lab.documents);
  for (const one of documents) {
    const key = docKey(one.doc);
    merged.set(key, { ...one, made: merged.get(key)?.made ?? one.made });
  }
  return {
    ...lab,
    state: last === undefined ? lab.state : { ...lab.state, revision: last.revision, hash: last.chain_hash },
    tablets: new Map(lab.tablets).set(device, { last_seq, revoked: false }),
    entries: [...lab.entries, ...entries],
    documents: merged,
  };
}

function knownOf(lab: MemoryLab, ids: readonly string[]): KnownEntry[] {
  return lab.entries
    .filter(({ entry }) => ids.includes(entry.id))
    .map(({ entry, revision, verdict, reason }) => ({
      id: entry.id,
      revision,
      text: 'stub' in entry ? null : { kind: entry.kind, author: entry.author, body_sha: entry.body_sha },
      entry_sha: entry.entry_sha,
      verdict,
      reason,
    }));
}

function pageOf(entries: readonly StoredEntry[]): readonly StoredEntry[] {
  let bytes = 0;
  const end = entries.findIndex(({ entry }, at) => {
    bytes += 'stub' in entry ? 0 : Buffer.byteLength(entry.body);
    return at > 0 && bytes > PAGE_MAX_BYTES;
  });
  return end < 0 ? entries : entries.slice(0, end);
}

async function* pagesOf(documents: ReadonlyMap<string, ChangedDocument>): AsyncGenerator<readonly string[]> {
  await Promise.resolve();
  yield [...documents.values()].map((one) => JSON.stringify(one.doc));
}
