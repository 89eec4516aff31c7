import * as z from 'zod/mini';
import { uuid } from '../ids';
import { rigSpecSchema } from '../rig-spec';
import { hertz, bar_g, positive_kV, shortText, unixMs, words, optionalWords } from './fields';

/** Subject of all: the rig, whose id is that of its `rig.created`. */
export const rigBodies = {
  'rig.created': z.object({ name: shortText, number: shortText, spec: rigSpecSchema }),
  'rig.revised': z.object({
    number: shortText,
    /** Entry id of the revision that this one changes (protocol 1.6). */
    based_on: uuid,
    spec: rigSpecSchema,
    why: words,
  }),
  'rig.declared': z.object({ state: z.enum(['shorted', 'short-off']) }),
  'rig.stood-down': z.object({ why: words }),
  /** Names the stand-down; only its author, within two minutes of the same page life (protocol 1.4). */
  'rig.stand-down-retracted': z.object({ stand_down: uuid, incident: z.nullable(uuid) }),
  /** Names every stand-down and incident that it lifts. */
  'rig.returned': z.object({ lifts: z.array(uuid).check(z.minLength(1), z.maxLength(50)), words }),
  'hands.in': z.object({ where: optionalWords }),
  /** Taking out a tag that somebody else hung needs words: why, and how it was made sure that no hands are in. */
  'hands.out': z.object({ tag: uuid, words: z.optional(optionalWords) }),
  'gas.changed': z.object({ words }),
  'permit.asked': z.object({ rig_revision: uuid, words }),
  'permit.granted': z.object({
    rig_revision: uuid,
    envelope: z.object({ max_kV: positive_kV, max_bar_g: bar_g, max_rate_Hz: hertz }),
    until_ms: unixMs,
    words: optionalWords,
  }),
  'permit.withdrawn': z.object({ permit: uuid, why: words }),
  'parting.settled': z.object({
    settles: z.array(uuid).check(z.minLength(2), z.maxLength(10)),
    keeps: uuid,
    words,
  }),
} as const;
