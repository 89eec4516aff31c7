import type { BookDatabase } from './book-database';
import { storageCause, storageFailure, type StorageFailure } from './storage-failure';

export type WriteOutcome<T> = { readonly type: 'saved'; readonly value: T } | StorageFailure;

/**
 * Runs a strict transaction and answers only after its `complete`. A full disk frees the ballast first; a lost
 * connection is closed and opened again; then one more try, and no third (protocol 2.4).
 */
export async function strictWrite<T>(
  database: BookDatabase,
  work: () => PromiseLike<T>,
  freeBallast: () => Promise<boolean> = () => Promise.resolve(false),
): Promise<WriteOutcome<T>> {
  try {
    return { type: 'saved', value: await work() };
  } catch (first) {
    if (!(await mend(database, first, freeBallast))) return storageFailure(first);
  }
  try {
    return { type: 'saved', value: await work() };
  } catch (second) {
    return storageFailure(second);
  }
}

async function mend(
  database: BookDatabase,
  error: unknown,
  freeBallast: () => Promise<boolean>,
): Promise<boolean> {
  try {
    if (storageCause(error) === 'disk-full') return await freeBallast();
    database.close({ disableAutoOpen: false });
    await database.open();
    return true;
  } catch {
    return false;
  }
}
