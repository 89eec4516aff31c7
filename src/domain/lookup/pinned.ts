import type { LookupDoc } from '../book/documents/lookup';

/**
 * The lookups that are pinned to a rig's Bench, newest first: of each lookup the newest entry with `pinned`, unless a later one
 * of the same lookup takes the pin away (`inputs.unpins`). What is kept without a pin leaves the pin as it is. `docs` is what
 * `useLookups(rig)` gives: newest first.
 */
export function pinnedLookups(docs: readonly LookupDoc[]): readonly LookupDoc[] {
  const decided = new Set<string>();
  return docs.filter(({ kept }) => {
    const unpins = kept.inputs['unpins'] === true;
    if (decided.has(kept.lookup) || (!kept.pinned && !unpins)) return false;
    decided.add(kept.lookup);
    return kept.pinned;
  });
}
