import { ALIGNMENT_LOOKUP } from './alignment-lookup';
import { CAPACITOR_LOOKUP } from './capacitor-lookup';
import { CLEARANCE_LOOKUP } from './clearance-lookup';
import { GAP_LOOKUP } from './gap-lookup';
import { GAS_LOOKUP } from './gas-lookup';
import type { Lookup } from './lookup';

/** Every lookup, in the order of use. */
export const LOOKUPS: readonly Lookup[] = [
  GAP_LOOKUP,
  CAPACITOR_LOOKUP,
  ALIGNMENT_LOOKUP,
  GAS_LOOKUP,
  CLEARANCE_LOOKUP,
];

export function lookupOf(key: string): Lookup | undefined {
  return LOOKUPS.find((lookup) => lookup.key === key);
}
