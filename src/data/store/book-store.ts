import type { IdbPort, RandomBytes, Timers } from '../ports/ports';
import {
  acknowledgeInside,
  continueAltered,
  moveToDevice,
  waitAgain,
  waitAgainAbove,
  type Receipt,
  type Received,
} from './acknowledge';
import { appendInside, type AppendOrder } from './append-entry';
import { ballast, BALLAST_MB } from './ballast';
import { bookDatabase, type BookDatabase, type EntryRow } from './book-database';
import { getCount, getKey, putKey, type DeviceRecord, type KeyValues } from './book-keys';
import { strictWrite, type WriteOutcome } from './strict-write';

const OPEN_LIMIT_MS = 1500;

export interface Waiting {
  readonly count: number;
  readonly oldest_wall_ms: number | null;
}

export interface StorePorts {
  readonly idb: IdbPort;
  readonly random: RandomBytes;
  readonly timers: Timers;
  readonly ballast_MB?: number;
}

export type BookStore = ReturnType<typeof openBookStore>;

/** Own entries and everything else that must be durable before the screen says so. */
export function openBookStore(lab: string, ports: StorePorts) {
  const database = bookDatabase(lab, ports.idb);
  const reserve = ballast(database, ports.random, ports.ballast_MB ?? BALLAST_MB);
  const write = <T>(work: () => PromiseLike<T>) => strictWrite(database, work, reserve.free);
  return {
    lab,
    database,
    reserve,
    write,
    open: () => openWithin(database, ports.timers),
    key: <K extends keyof KeyValues>(key: K) => getKey(database, key),
    setKey: <K extends keyof KeyValues>(key: K, value: KeyValues[K]) =>
      write(() => putKey(database, key, value)),
    device: (): Promise<DeviceRecord | undefined> => getKey(database, 'device'),
    setDevice: (device: DeviceRecord, epoch: string) =>
      write(() =>
        database.transaction('rw', [database.keys], async () => {
          await putKey(database, 'device', device);
          await putKey(database, 'sentinel', { device: device.id, letter: device.letter });
          if (epoch !== '') await putKey(database, 'epoch', epoch);
        }),
      ),
    append: (order: AppendOrder): Promise<WriteOutcome<EntryRow>> =>
      write(() =>
        database.transaction(
          'rw',
          [database.entries, database.keys],
          async () => await appendInside(database, order),
        ),
      ),
    acknowledge: (receipts: readonly Receipt[], received: Received) =>
      change(database, () => acknowledgeInside(database, receipts, received)),
    continueAltered: (id: string, fresh: string) =>
      change(database, () => continueAltered(database, id, fresh)),
    moveToDevice: (device: string) => change(database, () => moveToDevice(database, device)),
    waitAgainAbove: (device: string, last_seq: number) =>
      change(database, () => waitAgainAbove(database, device, last_seq)),
    waitAgain: (rows: readonly EntryRow[]) =>
      change(database, async () => {
        for (const row of rows) await waitAgain(database, row);
      }),
    markStub: (id: string, why: string) =>
      change(database, async () => {
        const row = await database.entries.where('id').equals(id).first();
        if (row !== undefined) await database.entries.put({ ...row, stub: why });
      }),
    /** Next to be sent by this tablet, in order. */
    nextWaiting: (device: string, limit: number): Promise<readonly EntryRow[]> =>
      ofState(database, 'waiting', device).limit(limit).toArray(),
    waiting: () => countWaiting(database),
    waitingOf: (device: string): Promise<number> => ofState(database, 'waiting', device).count(),
    allWaiting: (): Promise<readonly EntryRow[]> => allWaiting(database).toArray(),
    /** Rows that the mirror does not hold yet: waiting, or taken at a revision beyond `revision`. */
    beyond: (revision: number) => rowsBeyond(database, revision),
    byId: (id: string): Promise<EntryRow | undefined> => database.entries.where('id').equals(id).first(),
    byIds: (ids: readonly string[]): Promise<readonly EntryRow[]> =>
      database.entries
        .where('id')
        .anyOf([...ids])
        .toArray(),
    alteredFrom: (ids: readonly string[]): Promise<readonly EntryRow[]> =>
      database.entries
        .where('altered_from')
        .anyOf([...ids])
        .toArray(),
    newest: (device: string, limit: number): Promise<readonly EntryRow[]> =>
      database.entries
        .where('[device+seq]')
        .between([device, 0], [device, Infinity])
        .reverse()
        .limit(limit)
        .toArray(),
    allOwn: (): Promise<readonly EntryRow[]> => database.entries.toArray(),
    ackedSeq: (device: string) => getCount(database, `acked_seq/${device}`),
    close: () => {
      database.close();
    },
  };
}

export type OpenOutcome = { readonly type: 'open' } | { readonly type: 'failed'; readonly words: string };

/** A blocked upgrade must not keep a start waiting for ever (protocol 2.5). */
async function openWithin(database: BookDatabase, timers: Timers): Promise<OpenOutcome> {
  const opening = database.open().then(
    (): OpenOutcome => ({ type: 'open' }),
    (error: unknown): OpenOutcome => ({
      type: 'failed',
      words: `The storage of this tablet did not open: ${String(error)}`,
    }),
  );
  let callOff = () => {};
  const late = new Promise<OpenOutcome>((resolve) => {
    callOff = timers.after(OPEN_LIMIT_MS, () => {
      resolve({
        type: 'failed',
        words:
          'The storage of this tablet does not open. Another tab may hold it in an older version: close the other tabs.',
      });
    });
  });
  const outcome = await Promise.race([opening, late]);
  callOff();
  return outcome;
}

/** Dexie follows awaits only inside a function that is itself written `async`: a bare arrow would commit too early. */
async function change<T>(database: BookDatabase, work: () => Promise<T>): Promise<T> {
  return await database.transaction('rw', [database.entries, database.keys], async () => await work());
}

function ofState(database: BookDatabase, state: EntryRow['state'], device: string) {
  return database.entries.where('[state+device+seq]').between([state, device, 0], [state, device, Infinity]);
}

function allWaiting(database: BookDatabase) {
  return database.entries
    .where('[state+device+seq]')
    .between(['waiting', '', 0], ['waiting', '\uffff', Infinity]);
}

async function countWaiting(database: BookDatabase): Promise<Waiting> {
  const [count, oldest] = await Promise.all([allWaiting(database).count(), allWaiting(database).first()]);
  return { count, oldest_wall_ms: oldest?.entry.stamp.wall_ms ?? null };
}

/** Own order: a tablet's entries replay by seq, those of an earlier tablet record before those of the present one. */
async function rowsBeyond(database: BookDatabase, revision: number): Promise<readonly EntryRow[]> {
  return await database.transaction('r', [database.entries], async () => {
    const waiting = await allWaiting(database).toArray();
    const taken = await database.entries.where('revision').above(revision).toArray();
    return [...taken, ...waiting].sort(byWritten);
  });
}

function byWritten(a: EntryRow, b: EntryRow): number {
  if (a.device === b.device) return a.seq - b.seq;
  return a.entry.stamp.wall_ms - b.entry.stamp.wall_ms;
}
