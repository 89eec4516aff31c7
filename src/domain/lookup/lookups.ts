import { GAP_LOOKUP } from './gap-lookup';
import type { Lookup } from './lookup';

/** Every lookup, in the order of use. */
export const LOOKUPS: readonly Lookup[] = [GAP_LOOKUP];

export function lookupOf(key: string): Lookup | undefined {
  return LOOKUPS.find((lookup) => lookup.key === key);
}
