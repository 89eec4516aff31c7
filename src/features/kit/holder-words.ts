import { useMemo } from 'react';
import { usePeople, useRigs } from '../../data/use-book';
import type { Holder } from '../../domain/book/bodies/kit-bodies';

/** Names for holders; one that this tablet's Book does not know keeps that said. */
export function useHolderWords(): (holder: Holder | null) => string {
  const people = usePeople();
  const rigs = useRigs();
  return useMemo(() => {
    const names = new Map([...people, ...rigs].map((one) => [one.id, one.name]));
    return (holder) => {
      if (holder === null) return 'nobody has it';
      const name = names.get(holder.id) ?? 'somebody not in this Book';
      return holder.type === 'rig' ? `stays with ${name}` : name;
    };
  }, [people, rigs]);
}
