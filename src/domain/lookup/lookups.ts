import type { Lookup } from './lookup';

/** Every lookup, in the order of use. */
export const LOOKUPS: readonly Lookup[] = [];

export function lookupOf(key: string): Lookup | undefined {
  return LOOKUPS.find((lookup) => lookup.key === key);
}
