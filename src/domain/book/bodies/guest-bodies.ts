import * as z from 'zod/mini';
import { uuid } from '../ids';
import { optionalWords } from './fields';

/** Who is at the rig beside the person who works it. Subject: the rig. */
export const guestBodies = {
  'guest.in': z.object({
    /** A member of the lab by id; null for somebody from outside, whom `name` may call by name. */
    person: z.nullable(uuid),
    name: optionalWords,
    /** Was shown the isolator and how to call help: only then nobody works alone beside them. */
    knows_isolator: z.boolean(),
    /** Eyewear that was lent, from the register. */
    eyewear: z.nullable(uuid),
    words: optionalWords,
  }),
  /** Names the `guest.in` that it ends. */
  'guest.out': z.object({ guest: uuid }),
} as const;
