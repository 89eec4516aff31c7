import { dehydrate, hydrate, type DehydratedState, type QueryClient } from '@tanstack/react-query';
import * as z from 'zod/mini';
import type { SmallStore, Timers } from '../ports/ports';

const COALESCE_MS = 1000;
const DAY_MS = 24 * 60 * 60_000;
export const KEEP_MS = 30 * DAY_MS;

const keptSchema = z.object({ version: z.string(), kept_ms: z.number(), state: z.unknown() });

export interface KeeperParts {
  readonly client: QueryClient;
  readonly small: SmallStore;
  readonly timers: Timers;
  /** Wall clock, ms. */
  readonly now: () => number;
  readonly key: string;
  /** Answers of another version of the app are not read again. */
  readonly version: string;
}

/** Keeps fetched answers in small synchronous storage; a full or forbidden one only costs the offline copy. */
export function keepQueries({ client, small, timers, now, key, version }: KeeperParts) {
  let callOff: (() => void) | null = null;
  const text = small.get(key);
  if (text !== null) {
    const kept = readKept(text);
    if (kept !== null && kept.version === version && now() - kept.kept_ms < KEEP_MS)
      hydrate(client, kept.state as DehydratedState);
    else small.remove(key);
  }
  const write = () => {
    callOff = null;
    small.set(key, JSON.stringify({ version, kept_ms: now(), state: dehydrate(client) }));
  };
  const stopWatching = client.getQueryCache().subscribe((event) => {
    if (event.type === 'updated' || event.type === 'removed') callOff ??= timers.after(COALESCE_MS, write);
  });
  return {
    forget: () => {
      callOff?.();
      callOff = null;
      small.remove(key);
    },
    close: () => {
      stopWatching();
      if (callOff === null) return;
      callOff();
      write();
    },
  };
}

function readKept(text: string): z.infer<typeof keptSchema> | null {
  try {
    const parsed = keptSchema.safeParse(JSON.parse(text));
    return parsed.success ? parsed.data : null;
  } catch {
    return null;
  }
}
