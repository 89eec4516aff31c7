import type { Document } from '../../src/domain/book/documents/document';
import { writeAudit } from '../db/audit';
import type { Transaction } from '../db/database';
import type { BookChange, BookWriter, ChangedDocument, LabState, TabletState, Whose } from './book-store';
import { toDocumentRow, toReadingRow } from './document-rows';
import { fromKnownRow, knownColumns, toEntryRow, type RawKnown } from './entry-rows';

/** Rows of one statement: a whole push fits, and a large one stays below the server's packet limit. */
const rowsAtOnce = 100;

interface Locked {
  readonly lab: LabState;
  readonly tablet: TabletState;
}

/** The transaction holds the locks of lab and tablet until it ends. */
export function createMariaDbWriter(transaction: Transaction, whose: Whose, locked: Locked): BookWriter {
  const { lab, device } = whose;
  return {
    ...locked,
    async grantedPeople() {
      const rows = await transaction('grants')
        .select<{ person: string }[]>('grants.person')
        .where({ lab, device });
      return new Set(rows.map((row) => row.person));
    },
    async entriesByIds(ids) {
      const rows = await transaction('entries')
        .select<RawKnown[]>(knownColumns)
        .where({ lab })
        .whereIn('id', [...ids]);
      return rows.map(fromKnownRow);
    },
    async documentsByIds(ids) {
      const rows = await transaction('documents')
        .select<{ doc: string }[]>('documents.doc')
        .where({ lab })
        .whereIn('id', [...ids]);
      // Only the folds write them, and a refold makes them anew from the entries.
      return rows.map((row) => JSON.parse(row.doc) as Document);
    },
    append: (change) => append(transaction, whose, change),
  };
}

async function append(transaction: Transaction, whose: Whose, change: BookChange): Promise<void> {
  const { lab, device } = whose;
  const { entries, documents, last_seq, forked, at_ms } = change;
  for (const some of inParts(entries)) await transaction('entries').insert(some.map(toEntryRow));
  await writeDocuments(transaction, lab, documents);
  const last = entries.at(-1);
  if (last !== undefined) {
    await transaction('labs')
      .where({ id: lab })
      .update({ revision: last.revision, chain_hash: last.chain_hash });
  }
  await transaction('devices')
    .where({ lab, id: device })
    .update({ last_seq, last_seen_ms: at_ms, ...(forked ? { forked_ms: at_ms } : {}) });
  if (forked) await writeAudit(transaction, { lab, at_ms, what: 'tablet-forked', device, person: null });
}

/** Documents, and the flat tables that mirror some of them. */
export async function writeDocuments(
  transaction: Transaction,
  lab: string,
  documents: readonly ChangedDocument[],
): Promise<void> {
  for (const some of inParts(documents)) {
    await transaction('documents')
      .insert(some.map((one) => toDocumentRow(lab, one)))
      .onConflict(['lab', 'id', 'kind'])
      .merge(['parent', 'list_state', 'revision', 'doc']);
  }
  const readings = documents.flatMap((one) =>
    one.doc.kind === 'reading' ? [toReadingRow(lab, one.doc, one)] : [],
  );
  for (const some of inParts(readings)) {
    const { made_revision: _made, lab: _lab, id: _id, ...merged } = some[0] ?? {};
    await transaction('readings').insert(some).onConflict(['lab', 'id']).merge(Object.keys(merged));
  }
  for (const { doc } of documents) {
    if (doc.kind === 'person') await mirrorMembership(transaction, lab, doc);
  }
}

/** Somebody whom the Book names before they have an account here gets their membership with the account. */
async function mirrorMembership(
  transaction: Transaction,
  lab: string,
  { id, role }: Extract<Document, { kind: 'person' }>,
): Promise<void> {
  if (role === null) {
    await transaction('memberships').where({ lab, person: id }).delete();
    return;
  }
  await transaction.raw(
    `INSERT INTO memberships (lab, person, role) SELECT ?, people.id, ? FROM people WHERE people.id = ?
     ON DUPLICATE KEY UPDATE role = VALUES(role)`,
    [lab, role, id],
  );
}

function inParts<T>(rows: readonly T[]): T[][] {
  const parts: T[][] = [];
  for (let at = 0; at < rows.length; at += rowsAtOnce) parts.push(rows.slice(at, at + rowsAtOnce));
  return parts;
}
