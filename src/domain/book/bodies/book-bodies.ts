import * as z from 'zod/mini';
import { uuid } from '../ids';
import { optionalWords, shortText, words } from './fields';

const json = z.record(z.string(), z.unknown());

/** Entries about other entries, incidents, kept lookups and electrical noise. */
export const bookBodies = {
  /** Subject: the rig. */
  'incident.reported': z.object({
    what: words,
    near: optionalWords,
    made_safe: optionalWords,
    stand_down: z.nullable(uuid),
  }),
  /** Subject: the incident. */
  'incident.answered': z.object({ words }),
  'incident.closed': z.object({ words }),
  /** Subject: that of the entry corrected. `body` is the whole new body of the same kind (protocol 1.7). */
  'entry.corrected': z.object({ corrects: uuid, kind: shortText, body: json, why: optionalWords }),
  'entry.struck': z.object({ strikes: uuid, why: words }),
  'entry.adopted': z.object({ adopts: z.array(uuid).check(z.minLength(1), z.maxLength(50)) }),
  /** Subject: that of the entry claimed. */
  'entry.claimed': z.object({ claims: uuid }),
  /** Subject: the rig. The shown figures are kept as they were shown. */
  'lookup.kept': z.object({ lookup: shortText, inputs: json, answers: json, pinned: z.boolean() }),
  /** Subject: the tablet. */
  'noise.counted': z.object({ touches_ignored: z.int().check(z.gte(1)), over_s: z.number().check(z.gte(0)) }),
} as const;
