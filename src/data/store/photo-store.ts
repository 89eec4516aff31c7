import type { Ballast } from './ballast';
import type { BookDatabase } from './book-database';
import { storageFailure } from './storage-failure';

/** Safari fails on Blobs in IndexedDB, so bytes lie in pieces of at most 1 MB (protocol 2.1). */
const PART_BYTES = 1_000_000;

export type PhotoOutcome =
  | { readonly type: 'kept'; readonly sha256: string; readonly bytes: number }
  | { readonly type: 'not-saved'; readonly words: string };

export type PhotoStore = ReturnType<typeof photoStore>;

export function photoStore(database: BookDatabase, reserve: Ballast, subtle: SubtleCrypto) {
  return {
    put: async (bytes: ArrayBuffer): Promise<PhotoOutcome> => {
      const sha256 = hex(await subtle.digest('SHA-256', bytes));
      try {
        // Photos stop first: what is left of the disk is kept for entries (protocol 2.4).
        if (!(await reserve.isWhole()))
          return {
            type: 'not-saved',
            words: 'NOT SAVED: the tablet’s storage is nearly full and is kept for entries.',
          };
        const parts = Math.max(1, Math.ceil(bytes.byteLength / PART_BYTES));
        await database.transaction('rw', [database.photos], async () => {
          for (let part = 0; part < parts; part += 1) {
            const piece = bytes.slice(part * PART_BYTES, (part + 1) * PART_BYTES);
            await database.photos.put({ sha256, part, parts, bytes: piece });
          }
        });
        return { type: 'kept', sha256, bytes: bytes.byteLength };
      } catch (error) {
        return storageFailure(error);
      }
    },
    get: async (sha256: string): Promise<ArrayBuffer | null> => {
      const rows = await database.photos.where('sha256').equals(sha256).sortBy('part');
      const [first] = rows;
      if (first === undefined || rows.length !== first.parts) return null;
      return await new Blob(rows.map((row) => row.bytes)).arrayBuffer();
    },
  };
}

function hex(digest: ArrayBuffer): string {
  return Array.from(new Uint8Array(digest), (byte) => byte.toString(16).padStart(2, '0')).join('');
}
