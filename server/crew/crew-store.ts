import type { Role } from '../../src/domain/book/bodies/people-bodies';
import type { CrewAnswer } from '../../src/domain/report/desk-shapes';
import type { Database, Transaction } from '../db/database';
import { toInt, toIntOrNull } from '../db/rows';

export type TabletFact = CrewAnswer['tablets'][number];
export type PersonFact = CrewAnswer['people'][number];

interface RawTablet {
  readonly id: string;
  readonly letter: string;
  readonly name: string;
  readonly last_seen_ms: string | null;
  readonly last_seq: string;
  readonly pending_count: number | null;
  readonly pending_oldest_wall_ms: string | null;
  readonly revoked_ms: string | null;
}

const tabletColumns = [
  'devices.id',
  'devices.letter',
  'devices.name',
  'devices.last_seen_ms',
  'devices.last_seq',
  'devices.pending_count',
  'devices.pending_oldest_wall_ms',
  'devices.revoked_ms',
] as const;

/** The server's own device writes only the founding of a lab and is no tablet that anybody could revoke. */
const serverLetter = '0';

export async function listTablets(database: Database, lab: string): Promise<TabletFact[]> {
  const rows = await database('devices')
    .select<RawTablet[]>(tabletColumns)
    .where({ lab })
    .whereNot({ letter: serverLetter })
    .orderBy([{ column: 'devices.enrolled_ms' }, { column: 'devices.letter' }]);
  return rows.map(readTablet);
}

export async function findTablet(
  database: Database,
  lab: string,
  id: string,
): Promise<TabletFact | undefined> {
  const row = await database('devices')
    .select(tabletColumns)
    .where({ lab, id })
    .whereNot({ letter: serverLetter })
    .first<RawTablet | undefined>();
  return row === undefined ? undefined : readTablet(row);
}

/** People as the Book names them, those who were removed as well. */
export async function listPeople(database: Database, lab: string): Promise<PersonFact[]> {
  return database('documents')
    .select<{ id: string; name: string; role: Role | null }[]>(
      'documents.id',
      database.raw(`JSON_VALUE(documents.doc, '$.name') AS name`),
      database.raw(`JSON_VALUE(documents.doc, '$.role') AS role`),
    )
    .where({ lab, kind: 'person' })
    .orderBy('documents.made_revision');
}

export interface Revocation {
  readonly lab: string;
  readonly device: string;
  readonly by: string;
  readonly at_ms: number;
}

/** Marks the tablet and ends every session on it. False when it was revoked before. */
export async function revokeTablet(
  transaction: Transaction,
  { lab, device, by, at_ms }: Revocation,
): Promise<boolean> {
  const changed = await transaction('devices')
    .where({ lab, id: device })
    .whereNull('revoked_ms')
    .update({ revoked_ms: at_ms, revoked_by: by });
  await transaction('refresh_tokens').where({ lab, device }).delete();
  return changed > 0;
}

function readTablet(row: RawTablet): TabletFact {
  const { id, letter, name, pending_count, pending_oldest_wall_ms } = row;
  return {
    id,
    letter,
    name,
    last_seen_ms: toIntOrNull(row.last_seen_ms),
    last_seq: toInt(row.last_seq),
    pending:
      pending_count === null
        ? null
        : { count: pending_count, oldest_wall_ms: toIntOrNull(pending_oldest_wall_ms) },
    revoked_ms: toIntOrNull(row.revoked_ms),
  };
}
