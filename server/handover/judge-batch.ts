import { docKey, type Document } from '../../src/domain/book/documents/document';
import { runEffectAsync, type Effect } from '../../src/domain/book/documents/effect';
import { chainHash, type EntryStub, type Reason, type SealedEntry } from '../../src/domain/book/entry';
import { foldEntry, type Judgement } from '../../src/domain/book/fold';
import type { PushResult } from '../../src/domain/handover/wire';
import { judgeEntry } from '../../src/domain/rules/judge';
import type { Judged, JudgeContext } from '../../src/domain/rules/judge-context';
import type { BookChange, BookWriter, ChangedDocument, KnownEntry, StoredEntry } from './book-store';
import { createDocumentCache, LoadFailed, type DocumentCache } from './document-cache';

export type PushItem = SealedEntry | EntryStub;

/** The domain's rules and folds; an argument so that a test can hand in ones that throw. */
export interface Domain {
  readonly judge: (entry: SealedEntry, context: JudgeContext) => Effect<Judged>;
  readonly fold: (entry: SealedEntry, judgement: Judgement) => Effect;
}

export const holdoffDomain: Domain = { judge: judgeEntry, fold: foldEntry };

export interface Batch {
  readonly items: readonly PushItem[];
  /** Person whose own access token brought the batch (protocol 3.5). */
  readonly session: string | null;
  readonly received_ms: number;
  readonly domain: Domain;
  /** Told of every rule or fold that threw: it is a bug, and the entry is held back with `fault`. */
  readonly onFault: (id: string, error: unknown) => void;
}

export interface BatchOutcome {
  readonly results: readonly PushResult[];
  readonly change: BookChange;
}

/** Judges a batch in the order of its numbers, over a Book whose lock is held (protocol 3.4). Writes nothing. */
export async function judgeBatch(writer: BookWriter, batch: Batch): Promise<BatchOutcome> {
  const items = batch.items.toSorted((one, other) => one.seq - other.seq);
  const run = new BatchRun(writer, batch);
  await run.prepare(items);
  for (const item of items) {
    const goesOn = await run.take(item);
    if (!goesOn) break;
  }
  return run.outcome();
}

class BatchRun {
  readonly #writer: BookWriter;
  readonly #batch: Batch;
  readonly #cache: DocumentCache;
  readonly #known = new Map<string, KnownEntry>();
  readonly #changed = new Map<string, ChangedDocument>();
  readonly #entries: StoredEntry[] = [];
  readonly #results: PushResult[] = [];
  #granted: ReadonlySet<string> = new Set();
  #lastSeq: number;
  #head: { readonly revision: number; readonly hash: string };
  #forked = false;

  constructor(writer: BookWriter, batch: Batch) {
    this.#writer = writer;
    this.#batch = batch;
    this.#cache = createDocumentCache(writer.documentsByIds);
    this.#lastSeq = writer.tablet.last_seq;
    this.#head = writer.lab;
  }

  async prepare(items: readonly PushItem[]): Promise<void> {
    for (const known of await this.#writer.entriesByIds(items.map((item) => item.id))) {
      this.#known.set(known.id, known);
    }
    const fresh = items.filter((item) => !this.#known.has(item.id));
    if (fresh.length === 0) return;
    this.#granted = await this.#writer.grantedPeople();
    await this.#cache.preload(fresh.flatMap((item) => ('stub' in item ? [] : [item])));
  }

  /** Answers whether the batch goes on after this item. */
  async take(item: PushItem): Promise<boolean> {
    const known = this.#known.get(item.id);
    if (known !== undefined) {
      this.#answerKnown(item, known);
      return true;
    }
    if (item.seq <= this.#lastSeq) {
      this.#forked = true;
      this.#refuse(item, 'fork-device');
      return false;
    }
    if (item.seq > this.#lastSeq + 1) {
      this.#refuse(item, 'hole');
      return false;
    }
    const revision = this.#head.revision + 1;
    const judged = 'stub' in item ? judgeStub(item) : await this.#judge(item, revision);
    this.#append(item, judged);
    return true;
  }

  outcome(): BatchOutcome {
    return {
      results: this.#results,
      change: {
        entries: this.#entries,
        documents: [...this.#changed.values()],
        last_seq: this.#lastSeq,
        forked: this.#forked,
        at_ms: this.#batch.received_ms,
      },
    };
  }

  /** The stored verdict, under whatever number it comes; the number counts as used, or the queue could not go on. */
  #answerKnown(item: PushItem, known: KnownEntry): void {
    if (item.seq === this.#lastSeq + 1) this.#lastSeq = item.seq;
    if (!isSameText(item, known)) {
      this.#refuse(item, 'altered');
      return;
    }
    const { verdict, revision, reason } = known;
    this.#results.push({ id: item.id, seq: item.seq, outcome: verdict, revision, reason });
  }

  #refuse(item: PushItem, outcome: 'altered' | 'fork-device' | 'hole'): void {
    this.#results.push({ id: item.id, seq: item.seq, outcome, revision: null, reason: null });
  }

  async #judge(entry: SealedEntry, revision: number): Promise<Judged> {
    const { session, received_ms, domain } = this.#batch;
    try {
      const context = {
        session,
        now_ms: received_ms,
        hasGrant: (person: string) => this.#granted.has(person),
      };
      const judged = await this.#run(domain.judge(entry, context));
      await this.#fold(entry, judged, revision);
      return judged;
    } catch (error) {
      if (error instanceof LoadFailed) throw error.cause;
      this.#batch.onFault(entry.id, error);
      const faulty: Judged = { verdict: 'held-back', reason: fault };
      await this.#fold(entry, faulty, revision);
      return faulty;
    }
  }

  async #fold(entry: SealedEntry, judged: Judged, revision: number): Promise<void> {
    const put = new Map<string, Document>();
    await this.#run(this.#batch.domain.fold(entry, { ...judged, revision }), put);
    // Only a fold that came to its end changes anything.
    for (const [key, doc] of put) {
      this.#changed.set(key, { doc, made: this.#changed.get(key)?.made ?? revision, revision });
    }
  }

  #run<T>(effect: Effect<T>, put = new Map<string, Document>()): Promise<T> {
    const get = async (key: Parameters<DocumentCache['get']>[0]) =>
      this.#changed.get(docKey(key))?.doc ?? (await this.#cache.get(key));
    return runEffectAsync(effect, { get }, put);
  }

  #append(entry: PushItem, { verdict, reason }: Judged): void {
    const revision = this.#head.revision + 1;
    const { entry_sha, id, seq } = entry;
    const chain_hash = chainHash(this.#head.hash, { revision, entry_sha, verdict, reason });
    const { received_ms } = this.#batch;
    this.#entries.push({ revision, verdict, reason, received_ms, chain_hash, entry });
    this.#known.set(id, { id, revision, text: textOf(entry), entry_sha, verdict, reason });
    this.#results.push({ id, seq, outcome: verdict, revision, reason });
    this.#head = { revision, hash: chain_hash };
    this.#lastSeq = seq;
  }
}

const fault: Reason = {
  cause: 'fault',
  code: 'fault',
  words:
    'The server made a mistake while judging this entry. It is kept and can be adopted once that is mended.',
  knew: null,
};

function judgeStub({ why }: EntryStub): Judged {
  const words = why === '' ? 'Its text could not be sent.' : `Its text could not be sent: ${why}`;
  return { verdict: 'held-back', reason: { cause: 'unreadable', code: 'stub', words, knew: null } };
}

function textOf(item: PushItem): KnownEntry['text'] {
  return 'stub' in item ? null : { kind: item.kind, author: item.author, body_sha: item.body_sha };
}

function isSameText(item: PushItem, known: KnownEntry): boolean {
  const text = textOf(item);
  if (text === null || known.text === null) return item.entry_sha === known.entry_sha;
  return (
    text.kind === known.text.kind &&
    text.author === known.text.author &&
    text.body_sha === known.text.body_sha
  );
}
