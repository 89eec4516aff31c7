import { IDBFactory, IDBKeyRange } from 'fake-indexeddb';
import { describe, expect, it } from 'vitest';
import { GENESIS_HASH } from '../../domain/book/ids';
import type { PullAnswer } from '../../domain/handover/wire';
import { seededBytes } from '../fakes/chance';
import { modelLab } from '../fakes/model-lab';
import { beginFill } from './mirror-fill';
import { EMPTY_CURSOR, isFilling, openMirrorStore } from './mirror-store';

async function filled() {
  const model = modelLab(seededBytes(4), () => Date.UTC(2026, 7, 20));
  const { book } = model.server;
  const mirror = openMirrorStore(model.server.lab.id, { indexedDB: new IDBFactory(), IDBKeyRange });
  const fill = beginFill(mirror.database);
  const documents = [...book.documents.values()];
  await fill.stage(documents);
  const header = { epoch: book.epoch, revision: book.entries.length, hash: book.entries.at(-1)!.chain_hash };
  return { model, book, mirror, fill, documents, header };
}

describe('filling a mirror', () => {
  it('flips once everything that the trailer promised is there', async () => {
    const { mirror, fill, documents, header } = await filled();
    expect(isFilling(await mirror.cursor())).toBe(true);
    expect(await fill.flip(header, documents.length + 1, EMPTY_CURSOR)).toEqual({
      type: 'incomplete',
      staged: documents.length,
      promised: documents.length + 1,
    });
    expect(await mirror.database.documents.count()).toBe(0);
    expect((await fill.flip(header, documents.length, EMPTY_CURSOR)).type).toBe('flipped');
    expect(await mirror.database.documents.count()).toBe(documents.length);
    expect(isFilling(await mirror.cursor())).toBe(false);
  });

  it('does not flip over a mirror that another tab has moved meanwhile', async () => {
    const { mirror, fill, documents, header } = await filled();
    await fill.flip(header, documents.length, EMPTY_CURSOR);
    await fill.stage(documents.slice(1));
    expect((await fill.flip(header, documents.length - 1, EMPTY_CURSOR)).type).toBe('moved');
    expect(await mirror.database.documents.count()).toBe(documents.length);
  });
});

describe('a page of entries', () => {
  async function withPage() {
    const { model, book, mirror, fill, documents, header } = await filled();
    await fill.flip(header, documents.length, EMPTY_CURSOR);
    const since = book.entries.length;
    for (const why of ['one', 'two'])
      model.write('rig.stood-down', model.ada, { subject: model.rig, body: { why } });
    const page: PullAnswer = {
      epoch: book.epoch,
      since,
      to: since + 2,
      head: since + 2,
      more: false,
      entries: book.entries.slice(since),
    };
    return { mirror, book, page, since };
  }

  it('is folded and moves the cursor in one go, once', async () => {
    const { mirror, book, page } = await withPage();
    expect((await mirror.applyPage(page)).type).toBe('applied');
    expect((await mirror.applyPage(page)).type).toBe('moved');
    const rows = await mirror.database.documents.toArray();
    expect(new Map(rows.map((row) => [row.key, row.doc]))).toEqual(book.documents);
    expect(await mirror.cursor()).toMatchObject({ revision: page.to, hash: page.entries.at(-1)?.chain_hash });
  });

  it.each<[string, (page: PullAnswer) => PullAnswer]>([
    ['lacks a revision', (page) => ({ ...page, entries: page.entries.slice(1) })],
    ['ends before it says', (page) => ({ ...page, entries: page.entries.slice(0, 1) })],
    [
      'carries another verdict than was chained',
      (page) => ({
        ...page,
        entries: page.entries.map((one) => ({ ...one, verdict: 'irregular' as const })),
      }),
    ],
    [
      'carries a hash that does not follow',
      (page) => ({ ...page, entries: page.entries.map((one) => ({ ...one, chain_hash: GENESIS_HASH })) }),
    ],
  ])('that %s changes nothing', async (_name, spoil) => {
    const { mirror, page, since } = await withPage();
    const before = await mirror.database.documents.toArray();
    expect((await mirror.applyPage(spoil(page))).type).toBe('broken');
    expect(await mirror.database.documents.toArray()).toEqual(before);
    expect((await mirror.cursor()).revision).toBe(since);
  });

  it('of another epoch changes nothing', async () => {
    const { mirror, page } = await withPage();
    expect((await mirror.applyPage({ ...page, epoch: page.entries[0]!.entry.id })).type).toBe('moved');
  });
});
