import * as z from 'zod/mini';
import { reasonSchema, sealedEntrySchema, stubSchema } from '../book/entry';
import { sha256Hex, uuid } from '../book/ids';

/**
 * Version of the messages below. A test hashes their JSON Schemas: when it fails, raise this number, add a line to
 * PROTOCOL_HISTORY, and keep reading the older messages.
 */
export const PROTOCOL_VERSION = 1;
export const PROTOCOL_HISTORY: readonly string[] = ['1: hello, push, pull, snapshot, known'];

/** A push carries at most so much (protocol 3.8). */
export const PUSH_MAX_ENTRIES = 50;
export const PUSH_MAX_BYTES = 256 * 1024;

const revision = z.int().check(z.gte(0));
const seq = z.int().check(z.gte(0));

/** Which mirror a tablet holds: the epoch, the revision up to which it is filled, and the chain hash there. */
export const cursorSchema = z.object({ epoch: z.nullable(uuid), revision, hash: sha256Hex });
export type Cursor = z.infer<typeof cursorSchema>;

export const helloRequestSchema = z.object({
  protocol: z.int().check(z.gte(1)),
  app_version: z.string().check(z.maxLength(60)),
  fold_version: z.int().check(z.gte(1)),
  cursor: cursorSchema,
  /** Highest own seq that the server acknowledged, as the tablet remembers it. */
  acked_seq: seq,
  /** What waits on the tablet, for Crew: the server only remembers it. */
  pending: z.object({ count: z.int().check(z.gte(0)), oldest_wall_ms: z.nullable(z.int()) }),
});
export type HelloRequest = z.infer<typeof helloRequestSchema>;

export const helloAnswerSchema = z.object({
  /** `upgrade` is a notice: pushing goes on. `reset`: drop the mirror, fill from zero, send again (protocol 3.11). */
  state: z.enum(['ok', 'reset', 'revoked', 'upgrade']),
  epoch: uuid,
  head: revision,
  head_hash: sha256Hex,
  /** Last seq of this tablet that the server has. */
  last_seq: seq,
  backup_revision: revision,
  server_ms: z.int(),
});
export type HelloAnswer = z.infer<typeof helloAnswerSchema>;

/** What an entry of a push looks like: whole, or a stub in its place (protocol 3.7). */
export const pushItemSchema = z.union([sealedEntrySchema, stubSchema]);
export const pushRequestSchema = z.object({
  entries: z.array(pushItemSchema).check(z.minLength(1), z.maxLength(PUSH_MAX_ENTRIES)),
});
export type PushRequest = z.infer<typeof pushRequestSchema>;

export const pushResultSchema = z.object({
  id: uuid,
  seq,
  /**
   * `altered`: the id is in the Book with another body and the first stands. `fork-device`: another id stands at this
   * seq (protocol 3.6). `hole`: an earlier seq is missing, nothing from here on was taken.
   */
  outcome: z.enum(['applied', 'irregular', 'held-back', 'altered', 'fork-device', 'hole']),
  /** Absent where nothing was taken. */
  revision: z.nullable(revision),
  reason: z.nullable(reasonSchema),
});
export type PushResult = z.infer<typeof pushResultSchema>;

export const pushAnswerSchema = z.object({
  results: z.array(pushResultSchema),
  last_seq: seq,
  head: revision,
  server_ms: z.int(),
});
export type PushAnswer = z.infer<typeof pushAnswerSchema>;

/** An entry as pulled; of a stub only the envelope is there. */
export const pulledSchema = z.object({
  revision,
  verdict: z.enum(['applied', 'irregular', 'held-back']),
  reason: z.nullable(reasonSchema),
  received_ms: z.int(),
  chain_hash: sha256Hex,
  entry: pushItemSchema,
});
export type Pulled = z.infer<typeof pulledSchema>;

export const pullAnswerSchema = z.object({
  epoch: uuid,
  since: revision,
  /** Whole revisions from since + 1 to `to`; `more` says that the head named by the first page lies beyond. */
  to: revision,
  head: revision,
  more: z.boolean(),
  entries: z.array(pulledSchema),
});
export type PullAnswer = z.infer<typeof pullAnswerSchema>;

/** First line of a snapshot; then a document a line; then the trailer. Without the trailer nothing flips. */
export const snapshotHeaderSchema = z.object({
  snapshot: z.literal(1),
  epoch: uuid,
  revision,
  hash: sha256Hex,
  fold_version: z.int(),
});
export const snapshotTrailerSchema = z.object({ end: z.literal(true), documents: z.int().check(z.gte(0)) });

export const knownRequestSchema = z.object({ ids: z.array(uuid).check(z.maxLength(5000)) });
export const knownAnswerSchema = z.object({
  known: z.array(
    z.object({
      id: uuid,
      revision,
      outcome: z.enum(['applied', 'irregular', 'held-back']),
      reason: z.nullable(reasonSchema),
    }),
  ),
});
