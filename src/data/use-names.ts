import { useCallback } from 'react';
import { usePeople } from './use-book';

/** Names by person id; an author left open before a PIN says so. */
export function useNames(): (id: string | null) => string {
  const people = usePeople();
  return useCallback(
    (id) => {
      if (id === null) return 'author open';
      return people.find((person) => person.id === id)?.name ?? 'somebody not in this Book';
    },
    [people],
  );
}
