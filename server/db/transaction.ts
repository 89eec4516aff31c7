import { setTimeout as sleep } from 'node:timers/promises';
import type { Database, Transaction } from './database';
import { isRetryable } from './database-errors';

const mostAttempts = 6;
const firstPauseMs = 5;

/**
 * Runs `work` in one transaction and tries the whole of it again when the database asks for that. `work` may
 * therefore run more than once: it keeps nothing outside. No savepoints: a deadlock inside one ends the transaction
 * and the next statement would commit by itself (protocol 3.2). A failed COMMIT is thrown, never taken as done.
 */
export async function inTransaction<T>(
  database: Database,
  work: (transaction: Transaction) => Promise<T>,
): Promise<T> {
  for (let attempt = 1; ; attempt++) {
    let thrown: { readonly error: unknown } | undefined;
    try {
      // Knex rolls back by itself when `work` rejects, also after a lock wait timeout, which rolls back nothing.
      return await database.transaction(async (transaction) => {
        try {
          return await work(transaction);
        } catch (error) {
          thrown = { error };
          throw error;
        }
      });
    } catch (error) {
      // On a dead connection the rollback fails as well, and its error would stand in for what went wrong.
      const first = thrown === undefined ? error : thrown.error;
      const rolledBack = first === error;
      if (attempt === mostAttempts || !rolledBack || !isRetryable(first)) throw first;
      await sleep(firstPauseMs * 2 ** attempt * (0.5 + Math.random()));
    }
  }
}
