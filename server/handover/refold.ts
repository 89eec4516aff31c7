import { docKey, type Document } from '../../src/domain/book/documents/document';
import { mapStore, runEffect } from '../../src/domain/book/documents/effect';
import { foldEntry, FOLD_VERSION } from '../../src/domain/book/fold';
import type { Database } from '../db/database';
import { toInt } from '../db/rows';
import { inTransaction } from '../db/transaction';
import type { ChangedDocument } from './book-store';
import { entryColumns, fromEntryRow, type RawEntry } from './entry-rows';
import { writeDocuments } from './mariadb-book-writer';

const entriesAtOnce = 500;

/**
 * Makes a lab's documents anew from its entries and their stored verdicts, under the lab's lock (protocol 1.9). The
 * entries stay as they are. Answers how many documents there are now.
 */
export function refoldLab(database: Database, lab: string): Promise<number> {
  return inTransaction(database, async (transaction) => {
    await transaction('labs').select('labs.id').where({ id: lab }).forUpdate();
    const documents = new Map<string, Document>();
    const stations = new Map<string, { made: number; revision: number }>();
    for (let since = 0; ;) {
      const rows = await transaction('entries')
        .select<RawEntry[]>(entryColumns)
        .where({ lab })
        .where('entries.revision', '>', since)
        .orderBy('entries.revision')
        .limit(entriesAtOnce);
      const last = rows.at(-1);
      if (last === undefined) break;
      for (const { entry, verdict, reason, revision } of rows.map(fromEntryRow)) {
        if ('stub' in entry) continue;
        const store = mapStore(documents);
        runEffect(foldEntry(entry, { verdict, reason, revision }), {
          get: store.get,
          put(doc) {
            store.put(doc);
            const key = docKey(doc);
            stations.set(key, { made: stations.get(key)?.made ?? revision, revision });
          },
        });
      }
      since = toInt(last.revision);
    }
    for (const table of ['documents', 'readings', 'memberships'])
      await transaction(table).where({ lab }).delete();
    const changed = [...documents].map(([key, doc]): ChangedDocument => {
      const station = stations.get(key);
      if (station === undefined) throw new Error(`${key} was never put`);
      return { doc, ...station };
    });
    await writeDocuments(transaction, lab, changed);
    await transaction('labs').where({ id: lab }).update({ fold_version: FOLD_VERSION });
    return changed.length;
  });
}

/** Refolds every lab whose documents an earlier fold made. */
export async function refoldOutdatedLabs(database: Database): Promise<readonly string[]> {
  const labs = await database('labs')
    .select<{ id: string }[]>('labs.id')
    .where('labs.fold_version', '<', FOLD_VERSION);
  for (const { id } of labs) await refoldLab(database, id);
  return labs.map((lab) => lab.id);
}
