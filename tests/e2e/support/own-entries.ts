import type { Page } from 'playwright-core';

export interface OwnRow {
  readonly id: string;
  readonly seq: number;
  readonly kind: string;
}

/** What the tablet itself keeps as its own entries, read past the app from IndexedDB. */
export function ownEntries(page: Page): Promise<readonly OwnRow[]> {
  return page.evaluate(async () => {
    const names = (await indexedDB.databases())
      .map((one) => one.name ?? '')
      .filter((name) => name.startsWith('book-'));
    const rows: { id: string; seq: number; kind: string }[] = [];
    for (const name of names) {
      const database = await new Promise<IDBDatabase>((resolve, reject) => {
        const open = indexedDB.open(name);
        open.onsuccess = () => resolve(open.result);
        open.onerror = () => reject(open.error ?? new Error('could not open'));
      });
      const store = [...database.objectStoreNames].find((one) => one === 'entries');
      if (store !== undefined) {
        const all = await new Promise<unknown[]>((resolve, reject) => {
          const request = database.transaction(store).objectStore(store).getAll();
          request.onsuccess = () => resolve(request.result as unknown[]);
          request.onerror = () => reject(request.error ?? new Error('could not read'));
        });
        for (const row of all) {
          const entry = ((row as { entry?: unknown }).entry ?? row) as {
            id: string;
            seq: number;
            kind: string;
          };
          rows.push({ id: entry.id, seq: entry.seq, kind: entry.kind });
        }
      }
      database.close();
    }
    return rows.sort((a, b) => a.seq - b.seq);
  });
}
