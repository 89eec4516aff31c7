import { docKey, type DocKey, type DocKind, type DocOf, type Document } from './document';

/**
 * Rules and folds are generators that ask for documents and hand changed ones back. Whoever runs them decides where
 * documents live: a map, IndexedDB inside a transaction, MariaDB under the lab's lock.
 */
export type DocRequest = ({ readonly op: 'get' } & DocKey) | { readonly op: 'put'; readonly doc: Document };
export type Effect<T = void> = Generator<DocRequest, T, Document | undefined>;

export function* getDoc<K extends DocKind>(kind: K, id: string): Effect<DocOf<K> | undefined> {
  const found = yield { op: 'get', kind, id };
  return found?.kind === kind ? (found as DocOf<K>) : undefined;
}

export function* putDoc(doc: Document): Effect {
  yield { op: 'put', doc };
}

export interface DocStore {
  readonly get: (key: DocKey) => Document | undefined;
  readonly put: (doc: Document) => void;
}

export function runEffect<T>(effect: Effect<T>, store: DocStore): T {
  let step = effect.next();
  while (!step.done) {
    const request = step.value;
    if (request.op === 'put') {
      store.put(request.doc);
      step = effect.next(undefined);
    } else {
      step = effect.next(store.get(request));
    }
  }
  return step.value;
}

export interface AsyncDocSource {
  readonly get: (key: DocKey) => PromiseLike<Document | undefined>;
}

/**
 * Runs an effect over documents that load asynchronously. Puts are kept in `changed`, seen by later gets, and written
 * by the caller in its own transaction.
 */
export async function runEffectAsync<T>(
  effect: Effect<T>,
  source: AsyncDocSource,
  changed: Map<string, Document>,
): Promise<T> {
  let step = effect.next();
  while (!step.done) {
    const request = step.value;
    if (request.op === 'put') {
      changed.set(docKey(request.doc), request.doc);
      step = effect.next(undefined);
    } else {
      step = effect.next(changed.get(docKey(request)) ?? (await source.get(request)));
    }
  }
  return step.value;
}

/** A store in memory; `documents` is filled in place. */
export function mapStore(documents: Map<string, Document>): DocStore {
  return {
    get: (key) => documents.get(docKey(key)),
    put: (doc) => {
      documents.set(docKey(doc), doc);
    },
  };
}
