import { createHash } from 'node:crypto';
import { IDBFactory, IDBKeyRange } from 'fake-indexeddb';
import { describe, expect, it } from 'vitest';
import { seededBytes } from '../fakes/chance';
import { ballast } from './ballast';
import { bookDatabase } from './book-database';
import { photoStore } from './photo-store';

const random = seededBytes(11);

async function opened(laysIn = true) {
  const database = bookDatabase('lab', { indexedDB: new IDBFactory(), IDBKeyRange });
  const reserve = ballast(database, random, 1);
  if (laysIn) await reserve.layIn();
  return { database, photos: photoStore(database, reserve, globalThis.crypto.subtle) };
}

/** A trace's file is many times one piece; the last piece is short. */
const bytes = new Uint8Array(2_300_000).map((_, i) => (i * 31) % 251);

describe('bytes of photos and traces', () => {
  it('lie in pieces of at most 1 MB and come back whole, under their hash', async () => {
    const { database, photos } = await opened();
    const sha256 = createHash('sha256').update(bytes).digest('hex');
    expect(await photos.put(bytes.buffer)).toEqual({ type: 'kept', sha256, bytes: bytes.length });
    const pieces = await database.photos.toArray();
    expect(pieces.map((one) => one.bytes.byteLength)).toEqual([1_000_000, 1_000_000, 300_000]);
    const back = await photos.get(sha256);
    expect(
      createHash('sha256')
        .update(new Uint8Array(back ?? new ArrayBuffer(0)))
        .digest('hex'),
    ).toBe(sha256);
    expect(await photos.put(bytes.buffer)).toMatchObject({ type: 'kept', sha256 });
    expect(await database.photos.count()).toBe(3);
  });

  it('are not there while a piece is missing', async () => {
    const { database, photos } = await opened();
    const kept = await photos.put(bytes.buffer);
    if (kept.type !== 'kept') throw new Error(kept.words);
    await database.photos.delete([kept.sha256, 1]);
    expect(await photos.get(kept.sha256)).toBeNull();
    expect(await photos.get('00'.repeat(32))).toBeNull();
  });

  it('stop first, in words, when what is kept back for entries is touched', async () => {
    const { database, photos } = await opened(false);
    expect(await photos.put(bytes.buffer)).toEqual({
      type: 'not-saved',
      words: expect.stringMatching(/^NOT SAVED: .*kept for entries/) as string,
    });
    expect(await database.photos.count()).toBe(0);
  });
});
