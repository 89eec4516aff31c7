import { IDBFactory, IDBKeyRange } from 'fake-indexeddb';
import { describe, expect, it, vi } from 'vitest';
import { GENESIS_HASH, uuidFromBytes } from '../../domain/book/ids';
import { readEntry } from '../../domain/book/read-body';
import { isIntact } from '../../domain/book/entry';
import { seededBytes } from '../fakes/chance';
import { virtualTime } from '../fakes/virtual-time';
import type { AppendOrder } from './append-entry';
import { readDraft, type EntryDraft } from './entry-draft';
import { openBookStore } from './book-store';

const random = seededBytes(7);
const id = () => uuidFromBytes(random(16));
const lab = id();
const device = id();
const rig = id();

function openOne(indexedDB = new IDBFactory()) {
  return openBookStore(lab, {
    idb: { indexedDB, IDBKeyRange },
    random,
    timers: virtualTime().timers,
    ballast_MB: 2,
  });
}

function order(draft: EntryDraft, change: Partial<AppendOrder> = {}): AppendOrder {
  const read = readDraft(draft);
  if (read.type !== 'ok') throw new Error(read.words);
  return {
    lab,
    device,
    letter: 'C',
    id: id(),
    salt: '00'.repeat(16),
    draft: read.draft,
    author: null,
    witness: null,
    base: { epoch: id(), revision: 0, hash: GENESIS_HASH },
    stamp: {
      wall_ms: 1,
      offset_min: 0,
      zone: 'Etc/UTC',
      page_life: id(),
      monotonic_ms: 0,
      time_uncertain: false,
    },
    number_floor: 0,
    ...change,
  };
}

const down: EntryDraft = { kind: 'rig.stood-down', subject: rig, body: { why: 'arc at the bushing' } };
const unready = { missing: [{ code: 'x', words: 'x' }], why: 'x' };
const firing: EntryDraft = {
  kind: 'firing.opened',
  body: { rig, rig_revision: rig, check: null, permit: null, unready },
};

function quotaExceeded(): Error {
  const inner = new DOMException('The disk is full.', 'QuotaExceededError');
  return Object.assign(new Error('aborted'), { name: 'AbortError', inner });
}

vi.setConfig({ testTimeout: 30_000 });

describe('appending to the strict store', () => {
  it('gives two tabs that append at once one contiguous sequence', async () => {
    const indexedDB = new IDBFactory();
    const tabs = [openOne(indexedDB), openOne(indexedDB)] as const;
    const outcomes = await Promise.all(
      Array.from({ length: 40 }, (_one, index) => tabs[index % 2 === 0 ? 0 : 1].append(order(down))),
    );
    expect(outcomes.every((outcome) => outcome.type === 'saved')).toBe(true);
    const rows = await tabs[0].allOwn();
    expect(rows.map((row) => row.seq)).toEqual(Array.from({ length: 40 }, (_one, index) => index + 1));
    expect(rows.every((row) => isIntact(row.entry))).toBe(true);
  });

  it('takes running numbers in the same transaction and never below what the Book shows', async () => {
    const store = openOne();
    const numbers: string[] = [];
    for (const floor of [0, 0, 7, 0]) {
      const outcome = await store.append(order(firing, { number_floor: floor }));
      if (outcome.type !== 'saved') throw new Error(outcome.words);
      const read = readEntry(outcome.value.entry);
      if (read.type === 'readable' && read.entry.kind === 'firing.opened')
        numbers.push(read.entry.body.number);
    }
    expect(numbers).toEqual(['C-1', 'C-2', 'C-8', 'C-9']);
  });

  it('writes an order once, however often it is tried', async () => {
    const store = openOne();
    const same = order(down);
    const [first, again] = [await store.append(same), await store.append(same)];
    expect(first).toEqual(again);
    expect(await store.allOwn()).toHaveLength(1);
  });

  it('answers only after the transaction is complete', async () => {
    const indexedDB = new IDBFactory();
    const outcome = await openOne(indexedDB).append(order(down));
    expect(outcome.type).toBe('saved');
    // Another connection sees only what is committed.
    expect(await openOne(indexedDB).allOwn()).toHaveLength(1);
  });

  it('opens a connection again that was lost, and saves', async () => {
    const store = openOne();
    await store.open();
    store.database.close({ disableAutoOpen: true });
    expect((await store.append(order(down))).type).toBe('saved');
  });

  it('frees the ballast on a full disk, tries again, and says NOT SAVED when that does not help', async () => {
    const store = openOne();
    await store.reserve.layIn();
    expect(await store.reserve.isWhole()).toBe(true);
    const transaction = vi.spyOn(store.database, 'transaction').mockRejectedValueOnce(quotaExceeded());
    expect((await store.append(order(down))).type).toBe('saved');
    expect(await store.database.ballast.count()).toBe(0);

    transaction.mockRejectedValueOnce(quotaExceeded());
    const second = await store.append(order(down));
    expect(second).toMatchObject({ type: 'not-saved', cause: 'disk-full' });
    transaction.mockRestore();
    expect(await store.allOwn()).toHaveLength(1);
  });

  it('refuses a body that no entry can hold, and one that does not fit its kind, naming the field', () => {
    const long = readDraft({ ...down, body: { why: 'x'.repeat(2001) } });
    expect(long).toMatchObject({ type: 'unreadable' });
    expect(long.type === 'unreadable' ? long.words : '').toContain('why');
    const inputs = Object.fromEntries(
      Array.from({ length: 900 }, (_one, index) => [`field ${index}`, 'y'.repeat(80)]),
    );
    const large = readDraft({
      kind: 'lookup.kept',
      subject: rig,
      body: { lookup: 'gap', inputs, answers: {}, pinned: false },
    });
    expect(large.type).toBe('too-large');
  });
});

describe('what the server said', () => {
  it('is written once and survives being told twice', async () => {
    const store = openOne();
    const outcome = await store.append(order(down));
    if (outcome.type !== 'saved') throw new Error(outcome.words);
    const receipt = { id: outcome.value.id, verdict: 'irregular', revision: 9, reason: null } as const;
    await store.acknowledge([receipt], { epoch: 'e', now_ms: 5 });
    await store.acknowledge([receipt], { epoch: 'e', now_ms: 6 });
    expect(await store.byId(outcome.value.id)).toMatchObject({
      state: 'irregular',
      revision: 9,
      acknowledged_ms: 5,
    });
    expect(await store.waiting()).toEqual({ count: 0, oldest_wall_ms: null });
    expect(await store.ackedSeq(device)).toBe(1);
  });

  it('moves what waits to a new tablet with ids and texts unchanged and a sequence of its own', async () => {
    const store = openOne();
    const kept = [await store.append(order(down)), await store.append(order(down))];
    const before = await store.allOwn();
    const fresh = id();
    expect(await store.moveToDevice(fresh)).toBe(2);
    const after = await store.allOwn();
    expect(kept).toHaveLength(2);
    expect(after.map((row) => [row.device, row.seq])).toEqual([
      [fresh, 1],
      [fresh, 2],
    ]);
    expect(after.map((row) => [row.id, row.entry.body])).toEqual(
      before.map((row) => [row.id, row.entry.body]),
    );
    expect(after.every((row) => isIntact(row.entry))).toBe(true);
  });
});
