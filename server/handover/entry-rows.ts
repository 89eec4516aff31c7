import {
  reasonSchema,
  reasonText,
  type EntryStub,
  type Reason,
  type SealedEntry,
  type Verdict,
} from '../../src/domain/book/entry';
import { toInt } from '../db/rows';
import type { KnownEntry, StoredEntry } from './book-store';

export const entryColumns = [
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
  'entries.stub_why',
  'entries.verdict',
  'entries.reason',
  'entries.received_ms',
  'entries.chain_hash',
] as const;

export const knownColumns = [
  'entries.id',
  'entries.revision',
  'entries.kind',
  'entries.author',
  'entries.body_sha',
  'entries.entry_sha',
  'entries.verdict',
  'entries.reason',
] as const;

/** A row as the driver gives it: 64-bit numbers as digits. */
export interface RawEntry {
  readonly lab: string;
  readonly revision: string;
  readonly id: string;
  readonly device: string;
  readonly seq: string;
  readonly kind: string | null;
  readonly version: number | null;
  readonly subject: string | null;
  readonly author: string | null;
  readonly witness: string | null;
  readonly base_epoch: string | null;
  readonly base_revision: string | null;
  readonly base_hash: string | null;
  readonly wall_ms: string | null;
  readonly offset_min: number | null;
  readonly zone: string | null;
  readonly page_life: string | null;
  readonly monotonic_ms: string | null;
  readonly time_uncertain: number | null;
  readonly body: string | null;
  readonly body_sha: string | null;
  readonly entry_sha: string;
  readonly stub_why: string | null;
  readonly verdict: Verdict;
  readonly reason: string | null;
  readonly received_ms: string;
  readonly chain_hash: string;
}

export function toEntryRow(stored: StoredEntry): Readonly<Record<string, string | number | boolean | null>> {
  const { revision, verdict, reason, received_ms, chain_hash, entry } = stored;
  const judged = { revision, verdict, reason: reasonText(reason), received_ms, chain_hash };
  const { lab, id, device, seq, entry_sha } = entry;
  if ('stub' in entry)
    return { ...emptyText, ...judged, lab, id, device, seq, entry_sha, stub_why: entry.why };
  const { kind, version, subject, author, witness, base, stamp, body, body_sha } = entry;
  return {
    ...judged,
    lab,
    id,
    device,
    seq,
    entry_sha,
    kind,
    version,
    subject,
    author,
    witness,
    base_epoch: base.epoch,
    base_revision: base.revision,
    base_hash: base.hash,
    wall_ms: stamp.wall_ms,
    offset_min: stamp.offset_min,
    zone: stamp.zone,
    page_life: stamp.page_life,
    monotonic_ms: JSON.stringify(stamp.monotonic_ms),
    time_uncertain: stamp.time_uncertain,
    body,
    body_bytes: Buffer.byteLength(body),
    body_sha,
    stub_why: null,
  };
}

const emptyText = {
  kind: null,
  version: null,
  subject: null,
  author: null,
  witness: null,
  base_epoch: null,
  base_revision: null,
  base_hash: null,
  wall_ms: null,
  offset_min: null,
  zone: null,
  page_life: null,
  monotonic_ms: null,
  time_uncertain: null,
  body: null,
  body_bytes: 0,
  body_sha: null,
} as const;

export function fromEntryRow(row: RawEntry): StoredEntry {
  return {
    revision: toInt(row.revision),
    verdict: row.verdict,
    reason: readReason(row.reason),
    received_ms: toInt(row.received_ms),
    chain_hash: row.chain_hash,
    entry: row.stub_why === null ? sealedOf(row) : stubOf(row, row.stub_why),
  };
}

function stubOf({ lab, id, device, seq, entry_sha }: RawEntry, why: string): EntryStub {
  return { stub: true, lab, id, device, seq: toInt(seq), entry_sha, why };
}

function sealedOf(row: RawEntry): SealedEntry {
  const { lab, id, device, seq, author, witness, entry_sha } = row;
  return {
    lab,
    id,
    device,
    seq: toInt(seq),
    kind: there(row.kind),
    version: there(row.version),
    subject: there(row.subject),
    author,
    witness,
    base: { epoch: there(row.base_epoch), revision: toInt(row.base_revision), hash: there(row.base_hash) },
    stamp: {
      wall_ms: toInt(row.wall_ms),
      offset_min: there(row.offset_min),
      zone: there(row.zone),
      page_life: there(row.page_life),
      monotonic_ms: Number(there(row.monotonic_ms)),
      time_uncertain: there(row.time_uncertain) === 1,
    },
    body: there(row.body),
    body_sha: there(row.body_sha),
    entry_sha,
  };
}

/** The schema's check `entries_whole` promises these columns for all but stubs. */
function there<T>(value: T | null): T {
  if (value === null) throw new Error('an entry that is no stub lacks a column');
  return value;
}

export type RawKnown = Pick<
  RawEntry,
  'id' | 'revision' | 'kind' | 'author' | 'body_sha' | 'entry_sha' | 'verdict' | 'reason'
>;

export function fromKnownRow(row: RawKnown): KnownEntry {
  const { id, revision, kind, author, body_sha, entry_sha, verdict, reason } = row;
  return {
    id,
    revision: toInt(revision),
    text: kind === null || body_sha === null ? null : { kind, author, body_sha },
    entry_sha,
    verdict,
    reason: readReason(reason),
  };
}

export function readReason(text: string | null): Reason | null {
  return text === null ? null : reasonSchema.parse(JSON.parse(text));
}
