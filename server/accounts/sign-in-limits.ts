import { createHash } from 'node:crypto';
import type { Database } from '../db/database';
import { toInt } from '../db/rows';

const windowMs = 15 * 60_000;
/** The tight count is of one address trying one person; the loose ones stop spraying without letting a stranger lock a person out early. */
const limits = { pair: 10, person: 60, address: 120 } as const;

export interface SignInLimits {
  /** Counts an attempt before it is looked at. Answers how long to wait, s, or null when it may go on. */
  readonly count: (email: string, ip: string) => Promise<number | null>;
  /** After a success: what was counted for this person from this address is forgotten. */
  readonly forgive: (email: string, ip: string) => Promise<void>;
}

/** Counted in the database, so that neither a restart nor a second server begins anew. */
export function createSignInLimits(database: Database, now: () => number): SignInLimits {
  async function countOne(counted_sha: string): Promise<{ attempts: number; ends_ms: number }> {
    const at = now();
    // Assignments run from left to right: the count is set while the old window still stands.
    await database.raw(
      `INSERT INTO sign_in_counts (counted_sha, window_start_ms, attempts) VALUES (?, ?, 1)
       ON DUPLICATE KEY UPDATE
         attempts = IF(sign_in_counts.window_start_ms <= ?, 1, sign_in_counts.attempts + 1),
         window_start_ms = IF(sign_in_counts.window_start_ms <= ?, VALUES(window_start_ms), sign_in_counts.window_start_ms)`,
      [counted_sha, at, at - windowMs, at - windowMs],
    );
    const row = await database('sign_in_counts')
      .select('sign_in_counts.attempts', 'sign_in_counts.window_start_ms')
      .where({ counted_sha })
      .first<{ attempts: number; window_start_ms: string } | undefined>();
    if (row === undefined) return { attempts: 1, ends_ms: at };
    return { attempts: row.attempts, ends_ms: toInt(row.window_start_ms) + windowMs };
  }

  return {
    async count(email, ip) {
      const keys = keysOf(email, ip);
      let wait_ms = 0;
      for (const which of ['pair', 'person', 'address'] as const) {
        const { attempts, ends_ms } = await countOne(keys[which]);
        if (attempts > limits[which]) wait_ms = Math.max(wait_ms, ends_ms - now());
      }
      return wait_ms > 0 ? Math.ceil(wait_ms / 1000) : null;
    },
    async forgive(email, ip) {
      await database('sign_in_counts')
        .where({ counted_sha: keysOf(email, ip).pair })
        .delete();
      await database('sign_in_counts')
        .where('sign_in_counts.window_start_ms', '<', now() - windowMs)
        .limit(100)
        .delete();
    },
  };
}

function keysOf(email: string, ip: string) {
  return {
    pair: shaOf(`pair\n${email}\n${ip}`),
    person: shaOf(`person\n${email}`),
    address: shaOf(`address\n${ip}`),
  };
}

function shaOf(text: string): string {
  return createHash('sha256').update(text).digest('hex');
}
