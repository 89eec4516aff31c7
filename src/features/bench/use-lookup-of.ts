import { useEffect, useState } from 'react';
import type { Lookup } from '../../domain/lookup/lookup';

/** Undefined while the register of lookups is fetched: it is large, and a Bench without pins never needs it. */
export function useLookupOf(key: string): Lookup | null | undefined {
  const [lookup, setLookup] = useState<Lookup | null | undefined>(undefined);
  useEffect(() => {
    let wanted = true;
    void import('../../domain/lookup/lookups').then(({ lookupOf }) => {
      if (wanted) setLookup(lookupOf(key) ?? null);
    });
    return () => {
      wanted = false;
    };
  }, [key]);
  return lookup;
}
