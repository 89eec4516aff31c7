import { randomUUID } from 'node:crypto';
import { beforeEach, describe, expect, it } from 'vitest';
import { chainHash, sealEntry, type SealedEntry } from '../../src/domain/book/entry';
import type { Document } from '../../src/domain/book/documents/document';
import { GENESIS_HASH } from '../../src/domain/book/ids';
import type { BookChange, BookStore, BookWriter, StoredEntry, Whose } from '../../server/handover/book-store';

export interface ContractStore {
  readonly store: BookStore;
  /** Makes a tablet in a lab that is founded, with a grant for each person. */
  readonly addTablet: (whose: Whose, people: readonly string[]) => Promise<void>;
  /** Makes a person that a grant may name. */
  readonly addPerson: () => Promise<string>;
}

/** What every keeper of Books has to do; run over the fake and over MariaDB. */
export function describeBookStore(name: string, open: () => Promise<ContractStore>): void {
  describe(name, () => {
    let opened: ContractStore;
    let store: BookStore;
    let lab: string;
    let whose: Whose;
    let person: string;

    beforeEach(async () => {
      opened = await open();
      store = opened.store;
      person = await opened.addPerson();
      lab = randomUUID();
      await store.found(newLab(lab, person), () => Promise.resolve());
      whose = { lab, device: randomUUID() };
      await opened.addTablet(whose, [person]);
    });

    it('begins a Book empty, at revision 0 with the hash of zeros', async () => {
      expect(await store.labState(lab)).toMatchObject({ revision: 0, hash: GENESIS_HASH });
      expect(await store.hashAt(lab, 0)).toBe(GENESIS_HASH);
      expect(await store.hashAt(lab, 1)).toBeUndefined();
      expect(await store.entriesAfter(lab, 0, 10)).toEqual([]);
      expect(await store.labState(randomUUID())).toBeUndefined();
    });

    it('gives back an entry with every field as it was written', async () => {
      const entry = sample(whose, 1, {
        text: 'Übergang — 3 µm, “Ω” \u0000 end',
        monotonic_ms: 12345.600000023842,
      });
      const stored = await append(store, whose, [entry]);
      expect(await store.entriesAfter(lab, 0, 10)).toEqual(stored);
      expect(await store.hashAt(lab, 1)).toBe(stored[0]?.chain_hash);
      expect(await store.labState(lab)).toMatchObject({ revision: 1, hash: stored[0]?.chain_hash });
      expect(await store.tabletState(whose)).toEqual({ last_seq: 1, revoked: false });
    });

    it('gives back a stub, and one that was held back with its reason', async () => {
      const stub = {
        stub: true,
        lab,
        id: randomUUID(),
        device: whose.device,
        seq: 1,
        entry_sha: 'e'.repeat(64),
        why: 'too long',
      } as const;
      const stored = await append(store, whose, [stub]);
      expect(await store.entriesAfter(lab, 0, 10)).toEqual(stored);
      expect(await store.knownEntries(lab, [stub.id])).toMatchObject([
        { id: stub.id, text: null, verdict: 'held-back' },
      ]);
    });

    it('pages by count, and never past the limit', async () => {
      const entries = [1, 2, 3].map((seq) => sample(whose, seq));
      const stored = await append(store, whose, entries);
      expect(await store.entriesAfter(lab, 1, 1)).toEqual(stored.slice(1, 2));
      expect(await store.entriesAfter(lab, 1, 50)).toEqual(stored.slice(1));
      expect(await store.entriesAfter(lab, 3, 50)).toEqual([]);
    });

    it('ends a page early where the texts grow large, but always gives one', async () => {
      const long = 'x'.repeat(60_000);
      const entries = Array.from({ length: 90 }, (_, at) => sample(whose, at + 1, { text: long }));
      await append(store, whose, entries);
      const page = await store.entriesAfter(lab, 0, 90);
      expect(page.length).toBeGreaterThan(0);
      expect(page.length).toBeLessThan(90);
      expect(page.map((one) => one.revision)).toEqual(page.map((_, at) => at + 1));
    });

    it('shows a writer what the Book has: known entries, grants and documents of every kind under an id', async () => {
      const entry = sample(whose, 1);
      const doc = claim(entry.id);
      await append(store, whose, [entry], [doc]);
      await store.write(whose, async (writer) => {
        expect(writer.tablet).toEqual({ last_seq: 1, revoked: false });
        expect(writer.lab.revision).toBe(1);
        expect(await writer.grantedPeople()).toEqual(new Set([person]));
        expect(await writer.entriesByIds([entry.id, randomUUID()])).toMatchObject([
          { id: entry.id, revision: 1, verdict: 'applied', text: { kind: entry.kind, author: entry.author } },
        ]);
        expect(await writer.documentsByIds([doc.id, randomUUID()])).toEqual([doc]);
      });
    });

    it('writes nothing of a work that throws', async () => {
      const work = store.write(whose, async (writer) => {
        await writer.append(changeOf(writer, [sample(whose, 1)]));
        throw new Error('on purpose');
      });
      await expect(work).rejects.toThrow('on purpose');
      expect(await store.labState(lab)).toMatchObject({ revision: 0 });
      expect(await store.tabletState(whose)).toMatchObject({ last_seq: 0 });
      expect(await store.entriesAfter(lab, 0, 10)).toEqual([]);
    });

    it('lets one writer of a lab in after the other, so that each sees all before it', async () => {
      const others = await Promise.all(
        Array.from({ length: 6 }, async () => {
          const other = { lab, device: randomUUID() };
          await opened.addTablet(other, []);
          return other;
        }),
      );
      await Promise.all(others.map((other) => append(store, other, [sample(other, 1)])));
      const all = await store.entriesAfter(lab, 0, 100);
      expect(all.map((one) => one.revision)).toEqual([1, 2, 3, 4, 5, 6]);
      expect(new Set(all.map((one) => one.entry.device)).size).toBe(6);
    });

    it('keeps labs apart', async () => {
      const other = randomUUID();
      await store.found(newLab(other, person), () => Promise.resolve());
      const entry = sample(whose, 1);
      await append(store, whose, [entry], [claim(entry.id)]);
      expect(await store.labState(other)).toMatchObject({ revision: 0 });
      expect(await store.knownEntries(other, [entry.id])).toEqual([]);
      expect(await store.tabletState({ ...whose, lab: other })).toBeUndefined();
      expect(await linesOf(store, other)).toEqual([]);
    });

    it('replaces a document that is there and hands all out in a snapshot', async () => {
      const first = sample(whose, 1);
      const second = sample(whose, 2);
      await append(store, whose, [first], [claim(first.id), claim(second.id)]);
      const before = claim(first.id);
      const changed: Document = before.kind === 'claim' ? { ...before, parent: randomUUID() } : before;
      await append(store, whose, [second], [changed]);
      const found = (await linesOf(store, lab)).map((line) => JSON.parse(line) as Document);
      expect(found.toSorted(byId)).toEqual([changed, claim(second.id)].toSorted(byId));
    });
  });
}

function newLab(id: string, lead: string) {
  return {
    id,
    name: 'Contract bench',
    epoch: randomUUID(),
    device: randomUUID(),
    made_ms: 1_700_000_000_000,
    lead,
  };
}

async function linesOf(store: BookStore, lab: string): Promise<string[]> {
  const lines: string[] = [];
  await store.snapshot(lab, async ({ pages }) => {
    for await (const page of pages) lines.push(...page);
  });
  return lines;
}

function sample(
  { lab, device }: Whose,
  seq: number,
  more: { readonly text?: string; readonly monotonic_ms?: number } = {},
): SealedEntry {
  const id = randomUUID();
  return sealEntry(
    {
      lab,
      id,
      device,
      seq,
      kind: 'noise.counted',
      version: 1,
      subject: device,
      author: null,
      witness: null,
      base: { epoch: randomUUID(), revision: 7, hash: 'a'.repeat(64) },
      stamp: {
        wall_ms: 1_764_000_000_000,
        offset_min: -90,
        zone: 'America/St_Johns',
        page_life: randomUUID(),
        monotonic_ms: more.monotonic_ms ?? 17.25,
        time_uncertain: true,
      },
    },
    JSON.stringify({ note: more.text ?? 'short' }),
  );
}

function claim(id: string): Document {
  const stamp = {
    wall_ms: 1,
    offset_min: 0,
    zone: 'Etc/UTC',
    page_life: id,
    monotonic_ms: 0,
    time_uncertain: false,
  };
  return { kind: 'claim', id, parent: id, claimed: { entry: id, by: null, device: id, stamp, at: 1 } };
}

type Item = StoredEntry['entry'];

function changeOf(
  writer: BookWriter,
  items: readonly Item[],
  documents: readonly Document[] = [],
): BookChange {
  let { revision, hash } = writer.lab;
  const entries = items.map((entry): StoredEntry => {
    revision += 1;
    const verdict = 'stub' in entry ? 'held-back' : 'applied';
    const reason =
      verdict === 'applied'
        ? null
        : ({ cause: 'unreadable', code: 'stub', words: 'no “text”', knew: null } as const);
    hash = chainHash(hash, { revision, entry_sha: entry.entry_sha, verdict, reason });
    return { revision, verdict, reason, received_ms: 1_764_000_001_000, chain_hash: hash, entry };
  });
  return {
    entries,
    documents: documents.map((doc) => ({ doc, made: revision, revision })),
    last_seq: items.at(-1)?.seq ?? writer.tablet.last_seq,
    forked: false,
    at_ms: 1_764_000_001_000,
  };
}

function append(
  store: BookStore,
  whose: Whose,
  items: readonly Item[],
  documents: readonly Document[] = [],
): Promise<readonly StoredEntry[]> {
  return store.write(whose, async (writer) => {
    const change = changeOf(writer, items, documents);
    await writer.append(change);
    return change.entries;
  });
}

function byId(one: Document, other: Document): number {
  return one.id < other.id ? -1 : 1;
}
