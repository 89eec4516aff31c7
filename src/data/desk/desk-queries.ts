import { QueryClient } from '@tanstack/react-query';
import type * as z from 'zod/mini';
import type { LabClient } from '../lab-client';
import type { LabOutcome } from '../session/tokens';
import { KEEP_MS, keepQueries } from './query-keeper';

const FRESH_MS = 30_000;

export interface DeskQueries {
  readonly client: QueryClient;
  readonly get: <T>(path: string, schema: z.ZodMiniType<T>) => Promise<LabOutcome<T>>;
  readonly post: <T>(path: string, body: unknown, schema: z.ZodMiniType<T> | null) => Promise<LabOutcome<T>>;
  /** Forgets everything fetched, in memory and in storage. */
  readonly empty: () => void;
  readonly close: () => void;
}

/**
 * What the Desk fetches and may read again offline, per lab and person; emptied when the tablet is locked. It never
 * carries an entry (protocol 2.7).
 */
export function openDeskQueries(lab: LabClient): DeskQueries {
  const person = lab.session.person() ?? 'nobody';
  const client = new QueryClient({
    defaultOptions: {
      queries: { gcTime: KEEP_MS, staleTime: FRESH_MS, retry: false, networkMode: 'always' },
    },
  });
  const keeper = keepQueries({
    client,
    small: lab.small,
    key: `holdoff-desk/${lab.lab.id}/${person}`,
    version: lab.app_version,
  });
  const empty = () => {
    client.clear();
    keeper.forget();
  };
  const stopWatching = lab.session.subscribe(() => {
    if (lab.session.person() !== person) empty();
  });
  return {
    client,
    get: (path, schema) => lab.request({ as: 'person', method: 'GET', path, schema }),
    post: (path, body, schema) => lab.request({ as: 'person', method: 'POST', path, body, schema }),
    empty,
    close: () => {
      stopWatching();
      keeper.close();
    },
  };
}
