import type { IdbPort, LockPort, RandomBytes, Timers } from '../ports/ports';

const PREFIX = 'holdoff-scratch-';
const LIMIT_MS = 1500;

export type CureOutcome =
  | { readonly type: 'cured' }
  /** The start goes on, and says so. */
  | { readonly type: 'not-cured'; readonly words: string };

interface CurePorts {
  readonly idb: IdbPort;
  readonly locks: LockPort;
  readonly random: RandomBytes;
  readonly timers: Timers;
}

/**
 * Chromium goes on writing behind a record header that a kill left torn at the end of its log, and the start after that
 * drops the whole store. Creating and deleting a database rotates the log, so this has to come before the first write of
 * every start (protocol 2.2).
 */
export async function cureTornLog(ports: CurePorts): Promise<CureOutcome> {
  const words = 'The tablet’s storage answered slowly at this start; the check of its log was left out.';
  return await Promise.race([
    rotate(ports),
    new Promise<CureOutcome>((resolve) => {
      ports.timers.after(LIMIT_MS, () => {
        resolve({ type: 'not-cured', words });
      });
    }),
  ]);
}

async function rotate(ports: CurePorts): Promise<CureOutcome> {
  const name = PREFIX + Array.from(ports.random(8), (byte) => byte.toString(16).padStart(2, '0')).join('');
  try {
    // The lock marks the scratch database as in use, so that another tab's start does not take it for a leftover.
    await ports.locks.hold(name, { wait: 'for-ever' }, async () => {
      await scratch(ports.idb.indexedDB, name);
    });
    await deleteLeftovers(ports, name);
    return { type: 'cured' };
  } catch (error) {
    return { type: 'not-cured', words: `The check of the storage’s log failed: ${String(error)}` };
  }
}

async function scratch(factory: IDBFactory, name: string): Promise<void> {
  const opening = factory.open(name, 1);
  opening.onupgradeneeded = () => {
    opening.result.createObjectStore('rows').put('row', 'row');
  };
  const database = await answer(opening);
  database.close();
  await answer(factory.deleteDatabase(name));
}

async function deleteLeftovers(ports: CurePorts, own: string): Promise<void> {
  const known = await ports.idb.indexedDB.databases();
  for (const { name } of known) {
    if (name === undefined || !name.startsWith(PREFIX) || name === own) continue;
    await ports.locks.hold(name, { wait: 'never' }, async () => {
      await answer(ports.idb.indexedDB.deleteDatabase(name));
    });
  }
}

function answer<T>(request: IDBRequest<T>): Promise<T> {
  return new Promise((resolve, reject) => {
    request.onsuccess = () => {
      resolve(request.result);
    };
    request.onerror = () => {
      reject(request.error ?? new Error('the request failed without a reason'));
    };
  });
}
