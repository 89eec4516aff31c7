import { docKey, type DocKind, type DocOf, type Document } from '../../domain/book/documents/document';

/** Kinds of which there are thousands: they are loaded by parent when somebody looks, and not at the start. */
const COLD: ReadonlySet<DocKind> = new Set([
  'reading',
  'correction',
  'claim',
  'lookup',
  'alignment',
  'note',
  'photo',
  'trace',
]);
export const HOT_KINDS: readonly DocKind[] = [
  'lab',
  'crew',
  'person',
  'rig',
  'sheet',
  'check',
  'firing',
  'incident',
  'part',
  'kit',
  'held',
];

export function isCold(kind: DocKind): boolean {
  return COLD.has(kind);
}

export interface Children<K extends DocKind> {
  readonly state: 'loading' | 'ready';
  readonly documents: readonly DocOf<K>[];
}

/**
 * The mirror's documents with this tablet's own changes over them, as stable objects: the same document or list is the
 * same reference until it changes, as `useSyncExternalStore` asks.
 */
export function documentCache() {
  let base = new Map<string, Document>();
  let overlay: ReadonlyMap<string, Document> = new Map();
  const coldParents = new Map<string, ReadonlyMap<string, Document>>();
  const versions = new Map<DocKind, number>();
  const lists = new Map<string, { readonly version: number; readonly value: unknown }>();

  const touch = (kinds: Iterable<DocKind>) => {
    for (const kind of new Set(kinds)) versions.set(kind, (versions.get(kind) ?? 0) + 1);
  };
  const memo = <T>(key: string, kind: DocKind, make: () => T): T => {
    const version = versions.get(kind) ?? 0;
    const known = lists.get(key);
    if (known !== undefined && known.version === version) return known.value as T;
    const value = make();
    lists.set(key, { version, value });
    return value;
  };
  const parentKey = (kind: DocKind, parent: string) => `${kind}<${parent}`;
  const merged = (kind: DocKind, under: Iterable<Document>, parent: string | null): Document[] => {
    const found = new Map<string, Document>();
    for (const doc of under) if (doc.kind === kind) found.set(doc.id, doc);
    for (const doc of overlay.values()) if (doc.kind === kind) found.set(doc.id, doc);
    return [...found.values()].filter((doc) => parent === null || doc.parent === parent);
  };

  return {
    /** The mirror's own, without what waits here: what the overlay is folded over. */
    baseOf: (key: string): Document | undefined => base.get(key),
    doc: (key: string): Document | undefined => overlay.get(key) ?? base.get(key),
    overlayOf: (key: string): Document | undefined => overlay.get(key),
    list: <K extends DocKind>(kind: K): readonly DocOf<K>[] =>
      memo(kind, kind, () => merged(kind, base.values(), null) as DocOf<K>[]),
    children: <K extends DocKind>(kind: K, parent: string): Children<K> =>
      memo(parentKey(kind, parent), kind, () => {
        const loaded = coldParents.get(parentKey(kind, parent));
        const under = isCold(kind) ? (loaded?.values() ?? []) : base.values();
        const documents = merged(kind, under, parent) as DocOf<K>[];
        return { state: isCold(kind) && loaded === undefined ? 'loading' : 'ready', documents };
      }),
    isLoaded: (kind: DocKind, parent: string) => coldParents.has(parentKey(kind, parent)),
    loadedParents: (): readonly (readonly [DocKind, string])[] =>
      [...coldParents.keys()].map((key) => {
        const [kind = '', parent = ''] = key.split('<');
        return [kind as DocKind, parent] as const;
      }),
    putChildren: (kind: DocKind, parent: string, documents: readonly Document[]) => {
      coldParents.set(parentKey(kind, parent), new Map(documents.map((doc) => [doc.id, doc])));
      touch([kind]);
    },
    replaceBase: (documents: readonly Document[]) => {
      touch([...base.values(), ...documents].map((doc) => doc.kind));
      base = new Map(documents.map((doc) => [docKey(doc), doc]));
    },
    putBase: (documents: readonly Document[]) => {
      for (const doc of documents) {
        if (!isCold(doc.kind)) {
          base.set(docKey(doc), doc);
          continue;
        }
        const key = parentKey(doc.kind, doc.parent ?? '');
        const siblings = coldParents.get(key);
        if (siblings !== undefined) coldParents.set(key, new Map(siblings).set(doc.id, doc));
      }
      touch(documents.map((doc) => doc.kind));
    },
    replaceOverlay: (next: ReadonlyMap<string, Document>) => {
      touch([...overlay.values(), ...next.values()].map((doc) => doc.kind));
      overlay = next;
    },
    overlay: () => overlay,
  };
}

export type DocumentCache = ReturnType<typeof documentCache>;
