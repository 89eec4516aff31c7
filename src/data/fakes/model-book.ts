import { runEffect, mapStore } from '../../domain/book/documents/effect';
import type { Document } from '../../domain/book/documents/document';
import {
  chainHash,
  isIntact,
  type EntryStub,
  type Reason,
  type SealedEntry,
  type Verdict,
} from '../../domain/book/entry';
import { foldEntry } from '../../domain/book/fold';
import { GENESIS_HASH } from '../../domain/book/ids';
import type { PushResult, Pulled } from '../../domain/handover/wire';
import { judgeEntry } from '../../domain/rules/judge';

type Item = SealedEntry | EntryStub;

export interface ModelDevice {
  readonly id: string;
  readonly letter: string;
  readonly key: JsonWebKey;
  last_seq: number;
  revoked: boolean;
}

/** The server's Book as a pure model: the same domain functions, documents in a map (protocol 3.2 to 3.7). */
export interface ModelBook {
  epoch: string;
  entries: Pulled[];
  documents: Map<string, Document>;
  readonly devices: Map<string, ModelDevice>;
  readonly grants: Map<string, Set<string>>;
}

export function modelBook(epoch: string): ModelBook {
  return { epoch, entries: [], documents: new Map(), devices: new Map(), grants: new Map() };
}

export function headHash(book: ModelBook, revision = book.entries.length): string | undefined {
  return revision === 0 ? GENESIS_HASH : book.entries[revision - 1]?.chain_hash;
}

export interface ModelPush {
  readonly device: string;
  readonly session: string | null;
  readonly now_ms: number;
}

/** Judges in the order of the numbers; a hole or a fork ends the batch. */
export function pushToBook(book: ModelBook, items: readonly Item[], push: ModelPush): PushResult[] {
  const device = book.devices.get(push.device);
  if (device === undefined) throw new Error('the model knows no such tablet');
  const results: PushResult[] = [];
  for (const item of [...items].sort((a, b) => a.seq - b.seq)) {
    const nothing = { id: item.id, seq: item.seq, revision: null, reason: null };
    const known = book.entries.find((one) => one.entry.id === item.id);
    if (known !== undefined) {
      if (!isSameText(item, known.entry)) {
        results.push({ ...nothing, outcome: 'altered' });
        continue;
      }
      if (item.seq === device.last_seq + 1) device.last_seq = item.seq;
      results.push({ ...nothing, outcome: known.verdict, revision: known.revision, reason: known.reason });
      continue;
    }
    if (item.seq <= device.last_seq) return [...results, { ...nothing, outcome: 'fork-device' }];
    if (item.seq > device.last_seq + 1) return [...results, { ...nothing, outcome: 'hole' }];
    const judged = judgeItem(book, item, push);
    appendToBook(book, item, { ...judged, received_ms: push.now_ms });
    device.last_seq = item.seq;
    results.push({
      ...nothing,
      outcome: judged.verdict,
      revision: book.entries.length,
      reason: judged.reason,
    });
  }
  return results;
}

interface Judgement {
  readonly verdict: Verdict;
  readonly reason: Reason | null;
}

function judgeItem(book: ModelBook, item: Item, { session, device, now_ms }: ModelPush): Judgement {
  if ('stub' in item)
    return {
      verdict: 'held-back',
      reason: { cause: 'unreadable', code: 'stub', words: item.why, knew: null },
    };
  const hasGrant = (person: string) => book.grants.get(device)?.has(person) === true;
  return runEffect(judgeEntry(item, { session, hasGrant, now_ms }), mapStore(book.documents));
}

/** Appends with a verdict and folds; also how a model's first people and rigs come in. */
export function appendToBook(
  book: ModelBook,
  item: Item,
  judged: Judgement & { readonly received_ms: number },
): void {
  const revision = book.entries.length + 1;
  const { verdict, reason, received_ms } = judged;
  const previous = headHash(book) ?? GENESIS_HASH;
  const chain_hash = chainHash(previous, { revision, entry_sha: item.entry_sha, verdict, reason });
  book.entries.push({ revision, verdict, reason, received_ms, chain_hash, entry: item });
  if (!('stub' in item)) runEffect(foldEntry(item, { verdict, reason, revision }), mapStore(book.documents));
}

export function brokenIn(items: readonly Item[]): Item | undefined {
  return items.find((item) => !('stub' in item) && !isIntact(item));
}

/** A restore: everything after `revision` is gone, and the epoch is another (protocol 3.11). */
export function restoreBook(book: ModelBook, revision: number, epoch: string): void {
  const kept = book.entries.slice(0, revision);
  book.entries = [];
  book.documents = new Map();
  book.epoch = epoch;
  for (const device of book.devices.values()) device.last_seq = 0;
  for (const { entry, verdict, reason, received_ms } of kept) {
    appendToBook(book, entry, { verdict, reason, received_ms });
    const device = book.devices.get(entry.device);
    if (device !== undefined) device.last_seq = Math.max(device.last_seq, entry.seq);
  }
}

function isSameText(item: Item, known: Item): boolean {
  if ('stub' in item || 'stub' in known) return item.entry_sha === known.entry_sha;
  return item.kind === known.kind && item.author === known.author && item.body_sha === known.body_sha;
}
