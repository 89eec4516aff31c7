import { useQueryClient } from '@tanstack/react-query';
import type { HoldOutcome } from '../../components/hold';
import { useDeskQueries, useDeskQuery } from '../../data/desk/use-desk-query';
import { crewAnswerSchema, type CrewAnswer } from '../../domain/report/desk-shapes';

const PATH = '/api/crew';

export interface Crew {
  readonly crew: CrewAnswer | undefined;
  readonly fetched_ms: number;
  /** Why the newest try brought nothing; null when it did. */
  readonly words: string | null;
  readonly revoke: (tablet: string) => Promise<HoldOutcome>;
}

export function useCrew(): Crew {
  const desk = useDeskQueries();
  const client = useQueryClient();
  const { data, fetched_ms, words } = useDeskQuery(PATH, crewAnswerSchema);
  return {
    crew: data,
    fetched_ms,
    words,
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
