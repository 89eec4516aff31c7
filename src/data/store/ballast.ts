import type { RandomBytes } from '../ports/ports';
import type { BookDatabase } from './book-database';

const PART_BYTES = 1024 * 1024;
export const BALLAST_MB = 20;
const RANDOM_BYTES = 65_536;

/**
 * `storage.estimate()` does not see a full disk, so about 20 MB are kept to be freed when one is met: photos stop first,
 * and entries are the last to fail (protocol 2.4). Random bytes, since a store that compresses would keep nothing back.
 */
export function ballast(database: BookDatabase, random: RandomBytes, parts: number) {
  return {
    /** Lays in what is missing; false when the disk has no room for it. */
    layIn: async (): Promise<boolean> => {
      try {
        const held = new Set(await database.ballast.toCollection().primaryKeys());
        for (let part = 0; part < parts; part += 1) {
          if (!held.has(part)) await database.ballast.put({ part, bytes: noise(random) });
        }
        return true;
      } catch {
        return false;
      }
    },
    isWhole: async (): Promise<boolean> => (await database.ballast.count()) === parts,
    /** Frees all of it; false when there was nothing left to free. */
    free: async (): Promise<boolean> => {
      if ((await database.ballast.count()) === 0) return false;
      await database.ballast.clear();
      return true;
    },
  };
}

export type Ballast = ReturnType<typeof ballast>;

function noise(random: RandomBytes): ArrayBuffer {
  const part = new Uint8Array(PART_BYTES);
  const piece = random(RANDOM_BYTES);
  for (let at = 0; at < PART_BYTES; at += RANDOM_BYTES) part.set(piece, at);
  return part.buffer;
}
