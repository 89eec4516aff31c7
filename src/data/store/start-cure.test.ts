import { IDBFactory, IDBKeyRange } from 'fake-indexeddb';
import { describe, expect, it } from 'vitest';
import { seededBytes } from '../fakes/chance';
import { memoryLockHub } from '../fakes/memory-locks';
import { settle, virtualTime } from '../fakes/virtual-time';
import { cureTornLog } from './start-cure';

function world() {
  const time = virtualTime();
  const indexedDB = new IDBFactory();
  const { locks } = memoryLockHub().openTab();
  return {
    time,
    indexedDB,
    locks,
    idb: { indexedDB, IDBKeyRange },
    random: seededBytes(3),
    timers: time.timers,
  };
}

async function makeLeftover(indexedDB: IDBFactory, name: string): Promise<void> {
  await new Promise<void>((resolve) => {
    const opening = indexedDB.open(name);
    opening.onsuccess = () => {
      opening.result.close();
      resolve();
    };
  });
}

describe('the cure of a torn log', () => {
  it('creates and deletes its scratch database and leaves nothing behind', async () => {
    const ports = world();
    await makeLeftover(ports.indexedDB, 'holdoff-scratch-of-a-killed-start');
    await makeLeftover(ports.indexedDB, 'book-something');
    expect(await cureTornLog(ports)).toEqual({ type: 'cured' });
    expect((await ports.indexedDB.databases()).map((one) => one.name)).toEqual(['book-something']);
  });

  it('leaves the scratch database of a start that is still going on alone', async () => {
    const ports = world();
    const name = 'holdoff-scratch-living';
    await makeLeftover(ports.indexedDB, name);
    let release = () => {};
    void ports.locks.hold(
      name,
      { wait: 'never' },
      () => new Promise<void>((resolve) => void (release = resolve)),
    );
    await cureTornLog(ports);
    expect((await ports.indexedDB.databases()).map((one) => one.name)).toEqual([name]);
    release();
  });

  it('lets the start go on after 1.5 s and says so', async () => {
    const ports = world();
    const stuck = new Proxy(ports.indexedDB, {
      get: (target, key) => (key === 'open' ? () => ({}) : Reflect.get(target, key)),
    });
    const curing = cureTornLog({ ...ports, idb: { indexedDB: stuck, IDBKeyRange } });
    await settle();
    await ports.time.pass(1500);
    expect(await curing).toMatchObject({ type: 'not-cured' });
  });
});
