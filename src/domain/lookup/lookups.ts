import { ALIGNMENT_LOOKUP } from './alignment-lookup';
import { BEAM_LOOKUP } from './beam-lookup';
import { CAPACITOR_LOOKUP } from './capacitor-lookup';
import { CHARGE_LOOKUP } from './charge-lookup';
import { CIRCUIT_LOOKUP } from './circuit-lookup';
import { CLEARANCE_LOOKUP } from './clearance-lookup';
import { DYE_LOOKUP } from './dye-lookup';
import { GAP_LOOKUP } from './gap-lookup';
import { GAS_LOOKUP } from './gas-lookup';
import type { Lookup } from './lookup';
import { ROOM_LOOKUP } from './room-lookup';
import { UNITS_LOOKUP } from './units-lookup';

/** Every lookup, in the order of use. */
export const LOOKUPS: readonly Lookup[] = [
  GAP_LOOKUP,
  CAPACITOR_LOOKUP,
  CIRCUIT_LOOKUP,
  ALIGNMENT_LOOKUP,
  CHARGE_LOOKUP,
  GAS_LOOKUP,
  CLEARANCE_LOOKUP,
  BEAM_LOOKUP,
  DYE_LOOKUP,
  ROOM_LOOKUP,
  UNITS_LOOKUP,
];

export function lookupOf(key: string): Lookup | undefined {
  return LOOKUPS.find((lookup) => lookup.key === key);
}
