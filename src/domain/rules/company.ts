import type { Guest, RigDoc } from '../book/documents/rig';
import { elapsedMs, type StampPoint } from '../book/stamp';
import { checkLapse } from './check-validity';

/** Nobody is believed to be still there longer than a declaration is believed. */
export const COMPANY_FOR_MS = 12 * 3_600_000;

/** Whether a guest counts as company now: shown the isolator, checked in within 12 h, and not irregularly. */
export function isCompany(guest: Guest, now: StampPoint): boolean {
  if (!guest.knows_isolator || guest.irregular !== null) return false;
  const age = elapsedMs(guest.stamp, now);
  return age !== null && age <= COMPANY_FOR_MS;
}

/**
 * Whether somebody is with `person` at the rig, as far as the Book knows: another who was there when the standing
 * before-firing check was walked, or somebody checked in. It proves nobody's presence; it asks for it to be declared.
 */
export function hasCompany(
  rig: RigDoc,
  person: string,
  here: { readonly device: string; readonly stamp: StampPoint },
): boolean {
  const atCheck = checkLapse(rig, here.device, here.stamp) === null ? (rig.ready_check?.present ?? []) : [];
  return (
    atCheck.some((id) => id !== person) ||
    rig.guests.some((guest) => guest.person !== person && isCompany(guest, here.stamp))
  );
}
