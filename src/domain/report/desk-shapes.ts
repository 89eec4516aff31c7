import * as z from 'zod/mini';
import { roleSchema } from '../book/bodies/people-bodies';
import type { DocKind, DocOf } from '../book/documents/document';
import { judgedEntrySchema, reasonSchema } from '../book/entry';
import { sha256Hex, uuid } from '../book/ids';

/** Answers of `/api/desk` and `/api/crew`: one shape for the server that gives them and the Desk that reads them. */

/** A document comes from a fold and was never typed by anybody: kind and id are checked, the rest is the fold's. */
function documentOf<K extends DocKind>(kind: K) {
  return z.looseObject({ kind: z.literal(kind), id: uuid }) as unknown as z.ZodMiniType<DocOf<K>>;
}

const count = z.int().check(z.gte(0));
const verdict = z.enum(['applied', 'irregular', 'held-back']);
/** Names by person id, for every person that an answer mentions. */
const names = z.record(z.string(), z.string());

export const WAITING_TYPES = [
  'unready',
  'irregular',
  'firing',
  'permit-asked',
  'incident',
  'parting',
  'held-back',
] as const;
export type WaitingType = (typeof WAITING_TYPES)[number];

/** One thing that waits for a reviewer: facts, not words. */
export const waitingItemSchema = z.object({
  type: z.enum(WAITING_TYPES),
  /** Firing, request, incident, rig (of a parting) or held-back entry. */
  id: uuid,
  rig: z.nullable(uuid),
  rig_name: z.nullable(z.string()),
  /** Firing or rig revision number; null where there is none. */
  number: z.nullable(z.string()),
  /** Words that a person wrote, or the reason of an unready or held-back entry; empty where there are none. */
  words: z.string(),
  /** Readings of a firing, and how many of them are irregular; revisions of a parting. */
  count,
  irregular: count,
  /** Kind of a held-back entry. */
  kind: z.nullable(z.string()),
  by: z.nullable(uuid),
  received_ms: z.int(),
  revision: count,
});
export type WaitingItem = z.infer<typeof waitingItemSchema>;
export const waitingAnswerSchema = z.object({ waiting: z.array(waitingItemSchema), people: names });
export type WaitingAnswer = z.infer<typeof waitingAnswerSchema>;

/** Where an entry of a firing stands in the Book. */
export const firingEntrySchema = z.object({
  id: uuid,
  revision: count,
  seq: count,
  device: uuid,
  letter: z.string(),
  kind: z.string(),
  verdict,
  reason: z.nullable(reasonSchema),
  entry_sha: sha256Hex,
  chain_hash: sha256Hex,
  received_ms: z.int(),
});
export type FiringEntry = z.infer<typeof firingEntrySchema>;

export const bookPointSchema = z.object({ epoch: uuid, revision: count, hash: sha256Hex });

export const firingAnswerSchema = z.object({
  firing: documentOf('firing'),
  rig: documentOf('rig'),
  check: z.nullable(documentOf('check')),
  sheet: z.nullable(documentOf('sheet')),
  readings: z.array(documentOf('reading')),
  entries: z.array(firingEntrySchema),
  book: bookPointSchema,
  people: names,
});
export type FiringAnswer = z.infer<typeof firingAnswerSchema>;

export const firingListSchema = z.object({
  firings: z.array(
    z.object({
      firing: documentOf('firing'),
      rig_name: z.string(),
      /** Of its last entry. */
      revision: count,
      chain_hash: sha256Hex,
    }),
  ),
  people: names,
});
export type FiringList = z.infer<typeof firingListSchema>;

export const entriesAnswerSchema = z.object({ entries: z.array(judgedEntrySchema), people: names });
export const heldBackAnswerSchema = z.object({ held: z.array(documentOf('held')), people: names });

export const crewAnswerSchema = z.object({
  people: z.array(z.object({ id: uuid, name: z.string(), role: z.nullable(roleSchema) })),
  tablets: z.array(
    z.object({
      id: uuid,
      letter: z.string(),
      name: z.string(),
      last_seen_ms: z.nullable(z.int()),
      last_seq: count,
      /** What waited on it when it last spoke; null when it never said. */
      pending: z.nullable(z.object({ count, oldest_wall_ms: z.nullable(z.int()) })),
      revoked_ms: z.nullable(z.int()),
    }),
  ),
});
export type CrewAnswer = z.infer<typeof crewAnswerSchema>;

const reportRowSchema = z.object({
  key: z.string(),
  label: z.string(),
  value: z.nullable(z.string()),
  unit: z.string(),
  refusal: z.nullable(z.string()),
  words: z.string(),
  caution: z.boolean(),
  band: z.nullable(z.string()),
  model: z.string(),
  valid: z.string(),
  warnings: z.array(z.string()),
});

/** A rig on paper, with the place in the Book that it was taken from. */
export const rigReportSchema = z.object({
  rig: uuid,
  name: z.string(),
  revision: z.object({ number: z.string(), entry: uuid }),
  rows: z.array(reportRowSchema),
  gap: z.object({
    at_bar_g: z.number(),
    low: z.nullable(z.string()),
    law: z.nullable(z.string()),
    high: z.nullable(z.string()),
    refusal: z.nullable(z.string()),
  }),
  book: z.object({ epoch: uuid, revision: count, hash: sha256Hex }),
});
export type RigReportAnswer = z.infer<typeof rigReportSchema>;
