import type { SealedEntry } from '../../domain/book/entry';
import { waitingRow } from '../store/append-entry';
import { getCount, getKey, putCount, putKey } from '../store/book-keys';
import type { BookStore } from '../store/book-store';
import type { Gathered } from './journal';

export interface Recovery {
  /** Entries that the store had lost and has again. */
  readonly restored: number;
  /** The whole store had been emptied: the tablet's key and the PINs are gone, so somebody has to sign in. */
  readonly emptied: boolean;
  readonly words: readonly string[];
}

/**
 * Puts back what the strict store has lost and the journal still has (protocol 2.3). Rows keep their tablet and seq; a
 * place that is taken by something else means a cloned store, and the server will say so (protocol 3.6).
 */
export async function recoverFromJournal(store: BookStore, gathered: Gathered): Promise<Recovery> {
  const { database } = store;
  const outcome = await store.write(() =>
    database.transaction('rw', [database.entries, database.keys, database.people], async () => {
      const emptied = (await getKey(database, 'sentinel')) === undefined && gathered.header !== null;
      if (emptied) await restoreKeys(store, gathered);
      let restored = 0;
      for (const entry of gathered.entries) if (await restore(store, entry)) restored += 1;
      const words = findings(gathered, restored, emptied);
      if (words.length > 0)
        await putKey(database, 'findings', [...((await getKey(database, 'findings')) ?? []), ...words]);
      return { restored, emptied, words };
    }),
  );
  if (outcome.type === 'saved') return outcome.value;
  return { restored: 0, emptied: false, words: [outcome.words] };
}

async function restore(store: BookStore, entry: SealedEntry): Promise<boolean> {
  const { database } = store;
  const known = await database.entries.where('id').equals(entry.id).count();
  const taken = await database.entries.get([entry.device, entry.seq]);
  if (known > 0 || taken !== undefined) return false;
  // What was acknowledged may have been pruned: the count of acknowledged seqs outlives the row.
  if (entry.seq <= (await getCount(database, `acked_seq/${entry.device}`))) return false;
  await database.entries.add(waitingRow(entry));
  const key = `last_seq/${entry.device}` as const;
  if (entry.seq > (await getCount(database, key))) await putCount(database, key, entry.seq);
  return true;
}

async function restoreKeys(store: BookStore, { header }: Gathered): Promise<void> {
  if (header === null) return;
  const { database } = store;
  const { device, letter, device_name, lab, lab_name } = header;
  await putKey(database, 'sentinel', { device, letter });
  await putKey(database, 'device', {
    id: device,
    letter,
    name: device_name,
    lab: { id: lab, name: lab_name },
    keys: null,
    forked: true,
  });
  await putKey(database, 'epoch', header.epoch);
  await putKey(database, 'firing_count', header.firing_count);
  await putCount(database, `last_seq/${device}`, header.last_seq);
  for (const { id, name } of header.grants) {
    await database.people.put({ id, name, pin: null, failures: 0, granted_ms: 0, online: 'sign-in-needed' });
  }
}

function findings(gathered: Gathered, restored: number, emptied: boolean): string[] {
  const words: string[] = [];
  if (emptied)
    words.push(
      `This tablet’s storage had been emptied. ${restored} unsent entries were put back from its second journal; sign in to send them.`,
    );
  else if (restored > 0) words.push(`${restored} entries were put back from this tablet’s second journal.`);
  for (const line of gathered.torn)
    words.push(`A line of the second journal was torn and could not be read whole: ${line.slice(0, 400)}`);
  return words;
}
