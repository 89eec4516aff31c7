import { judgedEntrySchema, reasonSchema, type JudgedEntry, type Reason } from '../../src/domain/book/entry';
import type { FiringEntry } from '../../src/domain/report/desk-shapes';
import { toInt } from '../db/rows';

export const deskEntryColumns = [
  'entries.lab',
  'entries.revision',
  'entries.id',
  'entries.device',
  'entries.seq',
  'entries.kind',
  'entries.version',
  'entries.subject',
  'entries.author',
  'entries.witness',
  'entries.base_epoch',
  'entries.base_revision',
  'entries.base_hash',
  'entries.wall_ms',
  'entries.offset_min',
  'entries.zone',
  'entries.page_life',
  'entries.monotonic_ms',
  'entries.time_uncertain',
  'entries.body',
  'entries.body_sha',
  'entries.entry_sha',
  'entries.verdict',
  'entries.reason',
  'entries.received_ms',
  'entries.chain_hash',
] as const;

/** Columns of an entry that is no stub, 64-bit numbers as digits; their types are checked in reading. */
export type RawDeskEntry = Readonly<
  Record<(typeof deskEntryColumns)[number] extends `entries.${infer Name}` ? Name : never, unknown>
>;

export function readJudgedEntry(row: RawDeskEntry): JudgedEntry {
  return judgedEntrySchema.parse({
    lab: row.lab,
    id: row.id,
    device: row.device,
    seq: toInt(row.seq),
    kind: row.kind,
    version: row.version,
    subject: row.subject,
    author: row.author,
    witness: row.witness,
    base: { epoch: row.base_epoch, revision: toInt(row.base_revision), hash: row.base_hash },
    stamp: {
      wall_ms: toInt(row.wall_ms),
      offset_min: row.offset_min,
      zone: row.zone,
      page_life: row.page_life,
      monotonic_ms: Number(row.monotonic_ms),
      time_uncertain: row.time_uncertain === 1,
    },
    body: row.body,
    body_sha: row.body_sha,
    entry_sha: row.entry_sha,
    revision: toInt(row.revision),
    verdict: row.verdict,
    reason: readReason(row.reason),
    received_ms: toInt(row.received_ms),
    chain_hash: row.chain_hash,
  });
}

export function readFiringEntry(row: RawDeskEntry & { readonly letter: string }): FiringEntry {
  const { id, revision, seq, device, kind, verdict, reason, entry_sha, chain_hash, received_ms } =
    readJudgedEntry(row);
  return {
    id,
    revision,
    seq,
    device,
    letter: row.letter,
    kind,
    verdict,
    reason,
    entry_sha,
    chain_hash,
    received_ms,
  };
}

function readReason(text: unknown): Reason | null {
  return typeof text === 'string' ? reasonSchema.parse(JSON.parse(text)) : null;
}
