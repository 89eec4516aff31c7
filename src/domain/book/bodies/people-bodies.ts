import * as z from 'zod/mini';
import { uuid } from '../ids';
import { labSettingsSchema } from '../rig-spec';
import { optionalWords, shortText, unixMs, words } from './fields';

export const ROLES = ['operator', 'reviewer', 'lead', 'reader'] as const;
export type Role = (typeof ROLES)[number];
export const roleSchema = z.enum(ROLES);

/** `lab.set`: subject is the lab. The others: subject is the person. */
export const peopleBodies = {
  'lab.set': labSettingsSchema,
  'person.joined': z.object({ name: shortText, role: roleSchema }),
  'person.role-set': z.object({ role: roleSchema }),
  'person.removed': z.object({ why: words }),
  'person.authorised': z.object({
    rig: uuid,
    task: z.enum(['fire']),
    until_ms: unixMs,
    words: optionalWords,
  }),
  'person.authorisation-ended': z.object({ authorisation: uuid, why: words }),
} as const;
