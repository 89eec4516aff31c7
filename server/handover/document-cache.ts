import { docKey, type DocKey, type Document } from '../../src/domain/book/documents/document';
import type { SealedEntry } from '../../src/domain/book/entry';
import { readEntry } from '../../src/domain/book/read-body';
import { namedIds } from '../../src/domain/rules/references';

type Load = (ids: readonly string[]) => Promise<readonly Document[]>;

/** Firing to rig, reading to firing to rig: nothing that a rule asks lies deeper. */
const mostRounds = 3;

export interface DocumentCache {
  /** Fetches what a batch is likely to ask for, in as few looks as the depth of the documents. */
  readonly preload: (entries: readonly SealedEntry[]) => Promise<void>;
  /** Throws `LoadFailed` around whatever the database threw. */
  readonly get: (key: DocKey) => Promise<Document | undefined>;
}

/** Keeps a failure of the database apart from a rule or fold that threw: only the second may mark an entry. */
export class LoadFailed extends Error {
  constructor(cause: unknown) {
    super('a document could not be loaded', { cause });
  }
}

export function createDocumentCache(load: Load): DocumentCache {
  const documents = new Map<string, Document>();
  const asked = new Set<string>();

  async function fetch(ids: readonly string[]): Promise<readonly Document[]> {
    const fresh = [...new Set(ids)].filter((id) => !asked.has(id));
    if (fresh.length === 0) return [];
    const found = await load(fresh);
    for (const id of fresh) asked.add(id);
    for (const doc of found) documents.set(docKey(doc), doc);
    return found;
  }

  return {
    async preload(entries) {
      let ids: readonly string[] = entries.flatMap(idsOf);
      for (let round = 0; round < mostRounds && ids.length > 0; round++) {
        ids = (await fetch(ids)).flatMap(idsBehind);
      }
    },
    async get(key) {
      if (!asked.has(key.id)) {
        await fetch([key.id]).catch((error: unknown) => {
          throw new LoadFailed(error);
        });
      }
      return documents.get(docKey(key));
    },
  };
}

function idsOf(entry: SealedEntry): readonly string[] {
  const { lab, id, subject, author, witness } = entry;
  const people = [author, witness].filter((one) => one !== null);
  const outcome = readEntry(entry);
  return [
    lab,
    id,
    subject,
    ...people,
    ...(outcome.type === 'readable' ? [...namedIds(outcome.entry), ...rigOf(outcome.entry)] : []),
  ];
}

function rigOf(
  entry: Extract<ReturnType<typeof readEntry>, { type: 'readable' }>['entry'],
): readonly string[] {
  return entry.kind === 'firing.opened' || entry.kind === 'check.opened' || entry.kind === 'person.authorised'
    ? [entry.body.rig]
    : [];
}

function idsBehind(doc: Document): readonly string[] {
  const parent = doc.parent === null ? [] : [doc.parent];
  if (doc.kind === 'check') return [...parent, doc.sheet];
  if (doc.kind === 'correction') return [...parent, doc.corrected];
  if (doc.kind === 'held') return [...parent, ...idsOf(doc.entry)];
  return parent;
}
