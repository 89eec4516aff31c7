import type { RigDoc } from '../../domain/book/documents/rig';
import { elapsedMs, type StampPoint } from '../../domain/book/stamp';
import { ageWords } from '../../domain/report/time-words';

type NameOf = (id: string | null) => string;

/** Who has hands in and who is checked in, in one line: "Hands in: Ada Brook 14 min. Guest: J. Reed 20 min." */
export function peopleWords(rig: RigDoc, nameOf: NameOf, now: StampPoint): string {
  const hands = rig.hands.map((tag) => `${nameOf(tag.by)} ${heldFor(tag.stamp, now)}`);
  const guests = rig.guests.map((guest) => `${guestName(guest, nameOf)} ${heldFor(guest.stamp, now)}`);
  const inside = hands.length === 0 ? 'No tags in.' : `Hands in: ${hands.join(', ')}.`;
  if (guests.length === 0) return inside;
  return `${inside} ${guests.length === 1 ? 'Guest' : 'Guests'}: ${guests.join(', ')}.`;
}

export function guestName(
  guest: { readonly person: string | null; readonly name: string },
  nameOf: NameOf,
): string {
  if (guest.person !== null) return nameOf(guest.person);
  return guest.name === '' ? 'a guest' : guest.name;
}

/** How long something has lasted; another page life with a broken clock cannot say. */
export function heldFor(since: StampPoint, now: StampPoint): string {
  const age = elapsedMs(since, now);
  if (age === null) return 'for an unknown time';
  return age < 60_000 ? 'just now' : ageWords(age);
}
