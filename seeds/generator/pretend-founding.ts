import { chainHash } from '../../src/domain/book/entry';
import { GENESIS_HASH } from '../../src/domain/book/ids';
import { DEMO_LAB, DEMO_LAB_SETTINGS, type DemoTablet } from '../lab';
import { INGE } from '../people';
import { createDice } from './dice';
import type { FoundingEntry } from './memory-book';
import { namedId } from '../named-id';
import { createTablet } from './tablet';

/**
 * What a server writes when it founds a lab: its first lead and its settings, by a device of the server's own. For a
 * month in memory; a real one begins with the entries that its server wrote.
 */
export function pretendFounding(epoch: string, at_ms: number): readonly FoundingEntry[] {
  const device: DemoTablet = { id: namedId('server'), letter: '0', name: 'Server' };
  const base = { epoch, revision: 0, hash: GENESIS_HASH };
  const pen = createTablet(device, { lab: DEMO_LAB.id, zone: DEMO_LAB.zone, dice: createDice(1), base });
  pen.open(at_ms);
  const entries = [
    pen.write('person.joined', at_ms, {
      author: INGE.id,
      subject: INGE.id,
      body: { name: INGE.name, role: INGE.role },
    }),
    pen.write('lab.set', at_ms, { author: INGE.id, subject: DEMO_LAB.id, body: DEMO_LAB_SETTINGS }),
  ];
  const founding: FoundingEntry[] = [];
  for (const [at, entry] of entries.entries()) {
    const judged = { revision: at + 1, verdict: 'applied', reason: null } as const;
    const previous = founding.at(-1)?.chain_hash ?? GENESIS_HASH;
    founding.push({
      entry,
      ...judged,
      chain_hash: chainHash(previous, { ...judged, entry_sha: entry.entry_sha }),
    });
  }
  return founding;
}
