import { isKind } from '../../domain/book/kinds';
import { PUSH_MAX_BYTES, PUSH_MAX_ENTRIES, type PushRequest } from '../../domain/handover/wire';
import { KIND_RULES } from '../../domain/rules/roles';
import type { Bearer } from '../session/tokens';
import type { EntryRow } from '../store/book-database';

export type PushItem = PushRequest['entries'][number];

export interface Batch {
  readonly rows: readonly EntryRow[];
  readonly items: readonly PushItem[];
  /** An act counts only under its author's own token, so a batch holds the acts of one person at most (protocol 3.5). */
  readonly bearer: Bearer;
}

const ENVELOPE_BYTES = 64;

/** The longest run from the head of the queue that one request and one token can carry. */
export function nextBatch(rows: readonly EntryRow[], most: number): Batch {
  const taken: EntryRow[] = [];
  const items: PushItem[] = [];
  let author: string | null = null;
  let bytes = ENVELOPE_BYTES;
  for (const row of rows.slice(0, Math.min(most, PUSH_MAX_ENTRIES))) {
    const needs = actAuthor(row);
    if (needs !== null && author !== null && needs !== author) break;
    const item = toItem(row);
    bytes += new TextEncoder().encode(JSON.stringify(item)).length + 1;
    if (taken.length > 0 && bytes > PUSH_MAX_BYTES) break;
    author ??= needs;
    taken.push(row);
    items.push(item);
  }
  return { rows: taken, items, bearer: author === null ? 'device' : { person: author } };
}

/** A revision of a rig may turn out to loosen it, so it is sent like an act. */
function actAuthor({ entry, stub }: EntryRow): string | null {
  if (stub !== null || !isKind(entry.kind)) return null;
  const act = KIND_RULES[entry.kind].class === 'act' || entry.kind === 'rig.revised';
  return act ? entry.author : null;
}

function toItem({ entry, stub }: EntryRow): PushItem {
  if (stub === null) return entry;
  const { lab, id, device, seq, entry_sha } = entry;
  return { stub: true, lab, id, device, seq, entry_sha, why: stub };
}
