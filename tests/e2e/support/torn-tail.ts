import { appendFile, readdir, stat } from 'node:fs/promises';
import path from 'node:path';

/** What a kill in the middle of a write leaves: a record's header without its text (protocol 2.2). */
const TORN_HEADER = Buffer.from([0x11, 0x22, 0x33, 0x44, 0x75, 0x00, 0x01]);

/** Appends it to the newest log of every IndexedDB of a profile whose browser is down; says how many. */
export async function tearLogTails(profile: string): Promise<number> {
  const folder = path.join(profile, 'Default', 'IndexedDB');
  const stores = (await readdir(folder)).filter((name) => name.endsWith('.leveldb'));
  for (const store of stores) {
    const inside = path.join(folder, store);
    const logs = (await readdir(inside)).filter((name) => name.endsWith('.log'));
    const dated = await Promise.all(
      logs.map(async (name) => ({ name, at: (await stat(path.join(inside, name))).mtimeMs })),
    );
    const newest = dated.sort((a, b) => b.at - a.at)[0];
    if (newest === undefined) throw new Error(`${inside} has no log`);
    await appendFile(path.join(inside, newest.name), TORN_HEADER);
  }
  return stores.length;
}
