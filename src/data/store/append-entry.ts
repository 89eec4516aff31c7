import { bodyText, sealEntry, type Base, type SealedEntry } from '../../domain/book/entry';
import { firingNumber, revisionNumber } from '../../domain/book/ids';
import type { Stamp } from '../../domain/book/stamp';
import type { BookDatabase, EntryRow } from './book-database';
import { getCount, getKey, putCount, putKey } from './book-keys';
import type { ReadDraft } from './entry-draft';

export interface AppendOrder {
  readonly lab: string;
  /** What the page believes; another tab may have enrolled the tablet anew, and then the store decides. */
  readonly device: string;
  readonly letter: string;
  readonly id: string;
  readonly salt: string;
  readonly draft: ReadDraft;
  readonly author: string | null;
  readonly witness: string | null;
  readonly base: Base;
  readonly stamp: Stamp;
  /** Highest running number that the Book already shows for this; the count never falls below it. */
  readonly number_floor: number;
}

/** Takes `seq` and running number and seals the entry, all inside the caller's strict transaction (protocol 2.4). */
export async function appendInside(database: BookDatabase, order: AppendOrder): Promise<EntryRow> {
  // A connection may be lost between commit and answer: the second try must find what the first one wrote.
  const written = await database.entries.where('id').equals(order.id).first();
  if (written !== undefined) return written;
  const here = await getKey(database, 'sentinel');
  const { device, letter } = here ?? order;
  const seq = (await lastSeq(database, device)) + 1;
  const { kind, version } = order.draft;
  const subject = subjectOf(order);
  const body = await numbered(database, { ...order, letter }, subject);
  const entry = sealEntry(
    {
      lab: order.lab,
      id: order.id,
      device,
      seq,
      kind,
      version,
      subject,
      author: order.author,
      witness: order.witness,
      base: order.base,
      stamp: order.stamp,
    },
    bodyText(body, order.salt),
  );
  const row = waitingRow(entry);
  await database.entries.add(row);
  await putCount(database, `last_seq/${device}`, seq);
  await noteWallTime(database, order.stamp);
  return row;
}

export function waitingRow(entry: SealedEntry): EntryRow {
  return {
    device: entry.device,
    seq: entry.seq,
    id: entry.id,
    entry,
    state: 'waiting',
    revision: null,
    epoch: null,
    reason: null,
    acknowledged_ms: null,
    stub: null,
    altered_from: null,
  };
}

/** The count goes on even where rows were pruned. */
export async function lastSeq(database: BookDatabase, device: string): Promise<number> {
  const last = await database.entries.where('[device+seq]').between([device, 0], [device, Infinity]).last();
  return Math.max(last?.seq ?? 0, await getCount(database, `last_seq/${device}`));
}

function subjectOf({ draft, id, lab }: AppendOrder): string {
  if (draft.subject === 'itself') return id;
  return draft.subject === 'lab' ? lab : draft.subject;
}

async function numbered(
  database: BookDatabase,
  order: AppendOrder,
  subject: string,
): Promise<Readonly<Record<string, unknown>>> {
  const { draft, letter, number_floor } = order;
  if (draft.number === null) return draft.body;
  if (draft.number === 'firing') {
    const count = Math.max((await getKey(database, 'firing_count')) ?? 0, number_floor) + 1;
    await putKey(database, 'firing_count', count);
    return { ...draft.body, number: firingNumber(letter, count) };
  }
  const count = Math.max(await getCount(database, `revision_count/${subject}`), number_floor) + 1;
  await putCount(database, `revision_count/${subject}`, count);
  return { ...draft.body, number: revisionNumber(letter, count) };
}

/** A clock that once showed more than it does now has been set back (protocol 1.8). */
async function noteWallTime(database: BookDatabase, stamp: Stamp): Promise<void> {
  if (stamp.time_uncertain) return;
  const highest = (await getKey(database, 'highest_wall_ms')) ?? 0;
  if (stamp.wall_ms > highest) await putKey(database, 'highest_wall_ms', stamp.wall_ms);
}
