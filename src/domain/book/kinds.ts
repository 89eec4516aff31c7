import type * as z from 'zod/mini';
import { alignmentBodies } from './bodies/alignment-bodies';
import { bookBodies } from './bodies/book-bodies';
import { checkBodies } from './bodies/check-bodies';
import { firingBodies } from './bodies/firing-bodies';
import { guestBodies } from './bodies/guest-bodies';
import { kitBodies, partBodies } from './bodies/kit-bodies';
import { noteBodies } from './bodies/note-bodies';
import { peopleBodies } from './bodies/people-bodies';
import { rigBodies } from './bodies/rig-bodies';

const bodies = {
  ...rigBodies,
  ...partBodies,
  ...alignmentBodies,
  ...guestBodies,
  ...checkBodies,
  ...firingBodies,
  ...noteBodies,
  ...kitBodies,
  ...peopleBodies,
  ...bookBodies,
} as const;

export type Kind = keyof typeof bodies;
export type BodyOf<K extends Kind> = z.infer<(typeof bodies)[K]>;

/** Version that this app writes, per kind; a kind that is not listed writes 1. */
const WRITTEN_VERSION: Partial<Record<Kind, number>> = {
  // 2: screws, laws of gap and channel, shapes of rods and bars, size of the beam. All may be left out, so 1 reads as 2.
  'rig.created': 2,
  'rig.revised': 2,
  // 2: purposes beyond firing and making safe, rigs, what a step guards. May be left out, so 1 reads as 2.
  'sheet.published': 2,
  // 2: kit that the step names, such as the eyewear put on. May be left out, so 1 reads as 2.
  'check.step-done': 2,
  // 2: words, for a tag that somebody else hung. May be left out, so 1 reads as 2.
  'hands.out': 2,
  // 2: output by attenuators and by eye, beam position, trigger, gas in the channel, dye. May be left out, so 1 reads as 2.
  'firing.reading': 2,
};

export const KINDS = Object.keys(bodies) as readonly Kind[];

export function isKind(kind: string): kind is Kind {
  return Object.hasOwn(bodies, kind);
}

export function versionOf(kind: Kind): number {
  return WRITTEN_VERSION[kind] ?? 1;
}

/** Schema of the body as this app writes it. Salt is checked apart, and unknown fields are dropped when reading. */
export function bodySchema<K extends Kind>(kind: K): (typeof bodies)[K] {
  return bodies[kind];
}
