import { useQuery, useQueryClient } from '@tanstack/react-query';
import { createContext, use } from 'react';
import type { HoldOutcome } from '../../components/hold';
import type { DeskQueries } from '../../data/desk/desk-queries';
import { crewAnswerSchema, type CrewAnswer } from '../../domain/report/desk-shapes';

export const CrewContext = createContext<DeskQueries | null>(null);

const PATH = '/api/crew';
const OFTEN_MS = 15_000;

export interface Crew {
  readonly crew: CrewAnswer | undefined;
  readonly fetched_ms: number;
  /** Why the newest try brought nothing; null when it did. */
  readonly words: string | null;
  readonly revoke: (tablet: string) => Promise<HoldOutcome>;
}

export function useCrew(): Crew {
  const desk = use(CrewContext);
  if (desk === null) throw new Error('useCrew needs its provider above it');
  const client = useQueryClient();
  const query = useQuery({
    queryKey: [PATH],
    refetchInterval: OFTEN_MS,
    networkMode: 'always',
    queryFn: async () => {
      const outcome = await desk.get(PATH, crewAnswerSchema);
      if (outcome.type === 'ok') return outcome.value;
      throw new Error(outcome.type === 'problem' ? outcome.problem.detail : outcome.words);
    },
  });
  return {
    crew: query.data,
    fetched_ms: query.dataUpdatedAt,
    words: query.error === null ? null : query.error.message,
    revoke: async (tablet) => {
      const outcome = await desk.post(`/api/crew/tablets/${tablet}/revoke`, {}, crewAnswerSchema);
      if (outcome.type === 'ok') {
        client.setQueryData([PATH], outcome.value);
        return { type: 'settled' };
      }
      const words = outcome.type === 'problem' ? outcome.problem.detail : outcome.words;
      return { type: 'failed', words: `Not revoked. ${words}` };
    },
  };
}
