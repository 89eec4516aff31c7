import { gatherJournals, openJournal, type Gathered, type Journal } from './journal/journal';
import type { JournalHeader } from './journal/journal-line';
import { recoverFromJournal } from './journal/recovery';
import type { Ports } from './ports/ports';
import { lastSeq } from './store/append-entry';
import { getKey, type DeviceRecord } from './store/book-keys';
import { openBookStore, type BookStore } from './store/book-store';
import { openMirrorStore, type MirrorStore } from './store/mirror-store';

export interface LabStores {
  readonly store: BookStore;
  readonly mirror: MirrorStore;
  readonly journal: Journal | null;
  readonly device: DeviceRecord;
  readonly epoch: string;
  readonly notices: readonly string[];
}

export type StoresOutcome =
  | { readonly type: 'open'; readonly stores: LabStores }
  | { readonly type: 'not-enrolled' }
  | { readonly type: 'failed'; readonly words: string };

export interface LabPlace {
  readonly lab: string;
  readonly page_life: string;
}

/** Opens a lab's two databases, and its journal: first what older page lives left, then a file of our own. */
export async function openLabStores(
  ports: Ports & { readonly ballast_MB?: number },
  { lab, page_life }: LabPlace,
): Promise<StoresOutcome> {
  const store = openBookStore(lab, ports);
  const opened = await store.open();
  if (opened.type === 'failed') return opened;
  const journalPorts = { files: ports.journal, locks: ports.locks, timers: ports.timers };
  const notices: string[] = [];
  let journal: Journal | null = null;
  const take = async (gathered: Gathered) => {
    const recovery = await recoverFromJournal(store, gathered);
    notices.push(...recovery.words);
    const device = await store.device();
    if (device === undefined) return;
    journal = await openJournal({ lab, page_life }, journalPorts, {
      header: await headerOf(store, device),
      carried: await stillWaiting(store),
    });
    // Only once the new file has it all may the old ones go.
    if (journal !== null)
      for (const name of gathered.files) await ports.journal.remove(`journal-${lab}`, name);
  };
  try {
    await gatherJournals(lab, journalPorts, take);
  } catch (error) {
    notices.push(
      `The second journal of this tablet cannot be used (${String(error)}): entries have one copy only.`,
    );
  }
  const device = await store.device();
  if (device === undefined) {
    store.close();
    const [words] = notices;
    return words === undefined ? { type: 'not-enrolled' } : { type: 'failed', words };
  }
  const earlier = (await store.key('findings')) ?? [];
  return {
    type: 'open',
    stores: {
      store,
      mirror: openMirrorStore(lab, ports.idb),
      journal,
      device,
      epoch: (await store.key('epoch')) ?? '',
      notices: [...new Set([...earlier, ...notices])],
    },
  };
}

export async function headerOf(store: BookStore, device: DeviceRecord): Promise<JournalHeader> {
  const { database } = store;
  const people = await database.people.toArray();
  return {
    journal: 1,
    lab: device.lab.id,
    lab_name: device.lab.name,
    device: device.id,
    letter: device.letter,
    device_name: device.name,
    epoch: (await getKey(database, 'epoch')) ?? '',
    last_seq: await lastSeq(database, device.id),
    firing_count: (await getKey(database, 'firing_count')) ?? 0,
    grants: people.map(({ id, name }) => ({ id, name })),
  };
}

async function stillWaiting(store: BookStore) {
  const rows = await store.allWaiting();
  return rows.map((row) => row.entry);
}
