import { QueryClientProvider, useQuery } from '@tanstack/react-query';
import { createContext, use, useEffect, useState, type ReactNode } from 'react';
import type * as z from 'zod/mini';
import { useLabClient } from '../client-context';
import { useBookState } from '../use-book';
import { useSession } from '../use-session';
import { openDeskQueries, type DeskQueries } from './desk-queries';

const DeskContext = createContext<DeskQueries | null>(null);

/** What Desk and Crew fetch lives here, per lab and person; it comes with their own chunks and nothing of the bench needs it. */
export function DeskProvider({ children }: { readonly children: ReactNode }) {
  const lab = useLabClient();
  const session = useSession();
  const person = session.state === 'open' ? session.person.id : 'nobody';
  // Another person never sees what the one before had fetched.
  return <PersonsDesk key={`${lab.lab.id}/${person}`}>{children}</PersonsDesk>;
}

function PersonsDesk({ children }: { readonly children: ReactNode }) {
  const lab = useLabClient();
  const [desk] = useState(() => openDeskQueries(lab));
  const { revision } = useBookState();
  // Whatever moved the Book may have moved what was fetched: an act that was applied shows at once.
  useEffect(() => {
    void desk.client.invalidateQueries();
  }, [desk, revision]);
  return (
    <DeskContext value={desk}>
      <QueryClientProvider client={desk.client}>{children}</QueryClientProvider>
    </DeskContext>
  );
}

export interface DeskAnswer<T> {
  readonly data: T | undefined;
  /** Unix ms of the last good answer; 0 while there is none. */
  readonly fetched_ms: number;
  /** Why the newest try brought nothing; null when it did. What was fetched before stays readable. */
  readonly words: string | null;
  readonly refetch: () => void;
}

const OFTEN_MS = 15_000;

/** What is fetched for whoever is open; only below a DeskProvider. */
export function useDeskQueries(): DeskQueries {
  const desk = use(DeskContext);
  if (desk === null) throw new Error('a Desk query needs the DeskProvider above it');
  return desk;
}

/** One answer of the Desk: fetched while there is a network, kept readable with its age when there is none. */
export function useDeskQuery<T>(path: string, schema: z.ZodMiniType<T>): DeskAnswer<T> {
  const desk = useDeskQueries();
  const query = useQuery({
    queryKey: [path],
    refetchInterval: OFTEN_MS,
    // The browser's own idea of being online is a hint at best: always try.
    networkMode: 'always',
    queryFn: async (): Promise<T> => {
      const outcome = await desk.get(path, schema);
      if (outcome.type === 'ok') return outcome.value;
      throw new Error(outcome.type === 'problem' ? outcome.problem.detail : outcome.words);
    },
  });
  return {
    data: query.data,
    fetched_ms: query.dataUpdatedAt,
    words: query.error === null ? null : query.error.message,
    refetch: () => void query.refetch(),
  };
}
