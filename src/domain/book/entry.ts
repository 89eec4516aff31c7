import * as z from 'zod/mini';
import { uuid, sha256Hex } from './ids';
import { hashFields, hashText } from './length-prefixed';
import { stampSchema, type Stamp } from './stamp';

/** Largest body, in UTF-16 units of its text; the strict store and the server hold to the same figure (protocol 2.4). */
export const MAX_BODY_CHARS = 64_000;

/** The mirror that the screen stood on when the entry was written (protocol 1.3). */
export const baseSchema = z.object({ epoch: uuid, revision: z.int().check(z.gte(0)), hash: sha256Hex });
export type Base = z.infer<typeof baseSchema>;

/**
 * An entry as its tablet sealed it and as it travels. `body` is the exact text that was hashed: JSON of an object with
 * the kind's fields and 16 random bytes of `salt` in hexadecimal. Immutable from here on.
 */
export const sealedEntrySchema = z.object({
  lab: uuid,
  id: uuid,
  device: uuid,
  seq: z.int().check(z.gte(1)),
  kind: z.string().check(z.regex(/^[a-z]+\.[a-z-]+$/, 'must look like firing.reading'), z.maxLength(48)),
  version: z.int().check(z.gte(1), z.lte(9999)),
  /** Id of the thing that the entry is about: for a first entry its own id. */
  subject: uuid,
  /** Person; null where the author was left open before a PIN (protocol 4.2). */
  author: z.nullable(uuid),
  /** A second person with a grant for this tablet. */
  witness: z.nullable(uuid),
  base: baseSchema,
  stamp: stampSchema,
  body: z.string().check(z.maxLength(MAX_BODY_CHARS)),
  body_sha: sha256Hex,
  entry_sha: sha256Hex,
});
export type SealedEntry = z.infer<typeof sealedEntrySchema>;

export type UnsealedEntry = Omit<SealedEntry, 'body' | 'body_sha' | 'entry_sha'>;

/** What the tablet could not send whole: it keeps its place in the sequence (protocol 3.7). */
export const stubSchema = z.object({
  stub: z.literal(true),
  lab: uuid,
  id: uuid,
  device: uuid,
  seq: z.int().check(z.gte(1)),
  entry_sha: sha256Hex,
  why: z.string().check(z.maxLength(500)),
});
export type EntryStub = z.infer<typeof stubSchema>;

export type Verdict = 'applied' | 'irregular' | 'held-back';

/** Why an entry is irregular or held back. */
export const reasonSchema = z.object({
  /** held back: rule, fault, version, unreadable, confirm, follows; irregular: always rule. */
  cause: z.enum(['rule', 'fault', 'version', 'unreadable', 'confirm', 'follows']),
  code: z.string(),
  words: z.string(),
  /** Whether the tablet's mirror already showed the objection; null where that has no meaning. */
  knew: z.nullable(z.boolean()),
  follows: z.optional(uuid),
});
export type Reason = z.infer<typeof reasonSchema>;

/** An entry with what the server said of it. */
export const judgedEntrySchema = z.extend(sealedEntrySchema, {
  /** The text is absent for a stub that has not been brought in by rescue file. */
  revision: z.int().check(z.gte(1)),
  verdict: z.enum(['applied', 'irregular', 'held-back']),
  reason: z.nullable(reasonSchema),
  received_ms: z.int(),
  chain_hash: sha256Hex,
});
export type JudgedEntry = z.infer<typeof judgedEntrySchema>;

/** Serialises a body with its salt: the text that is hashed, stored and sent unchanged. */
export function bodyText(body: Readonly<Record<string, unknown>>, saltHex: string): string {
  return JSON.stringify({ ...body, salt: saltHex });
}

/** Seals an entry: computes the hash of the body's text and of the whole (protocol 3.3). */
export function sealEntry(entry: UnsealedEntry, body: string): SealedEntry {
  const body_sha = hashText(body);
  return { ...entry, body, body_sha, entry_sha: entrySha({ ...entry, body_sha }) };
}

/**
 * Hash of everything an entry says: lab, id, device, seq, kind, version, subject, author, witness, base (epoch,
 * revision, hash), stamp (wall_ms, offset_min, zone, page_life, monotonic_ms, time_uncertain), body_sha, in this order.
 */
export function entrySha(entry: UnsealedEntry & { readonly body_sha: string }): string {
  return hashFields([
    entry.lab,
    entry.id,
    entry.device,
    entry.seq,
    entry.kind,
    entry.version,
    entry.subject,
    entry.author,
    entry.witness,
    entry.base.epoch,
    entry.base.revision,
    entry.base.hash,
    ...stampFields(entry.stamp),
    entry.body_sha,
  ]);
}

/** True when body and entry hashes are those of the text and fields they stand with. */
export function isIntact(entry: SealedEntry): boolean {
  return hashText(entry.body) === entry.body_sha && entrySha(entry) === entry.entry_sha;
}

/** Links one judged entry to the one before it (protocol 3.3). `reason` enters as its JSON text, null where there is none. */
export function chainHash(
  previous: string,
  link: Pick<JudgedEntry, 'revision' | 'entry_sha' | 'verdict' | 'reason'>,
): string {
  return hashFields([previous, link.revision, link.entry_sha, link.verdict, reasonText(link.reason)]);
}

/** The one text form of a reason, hashed and stored. */
export function reasonText(reason: Reason | null): string | null {
  if (reason === null) return null;
  const { cause, code, words, knew, follows } = reason;
  return JSON.stringify(
    follows === undefined ? { cause, code, words, knew } : { cause, code, words, knew, follows },
  );
}

function stampFields(stamp: Stamp) {
  return [
    stamp.wall_ms,
    stamp.offset_min,
    stamp.zone,
    stamp.page_life,
    stamp.monotonic_ms,
    stamp.time_uncertain,
  ] as const;
}
