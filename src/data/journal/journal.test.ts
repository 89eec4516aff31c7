import { describe, expect, it } from 'vitest';
import { sealEntry, type SealedEntry } from '../../domain/book/entry';
import { GENESIS_HASH, uuidFromBytes } from '../../domain/book/ids';
import { seededBytes } from '../fakes/chance';
import { memoryJournal } from '../fakes/memory-journal';
import { memoryLockHub } from '../fakes/memory-locks';
import { settle, virtualTime } from '../fakes/virtual-time';
import { gatherJournals, openJournal, type Gathered } from './journal';
import { journalLine, readJournal, type JournalHeader } from './journal-line';

const random = seededBytes(11);
const id = () => uuidFromBytes(random(16));
const lab = id();
const device = id();

function entry(seq: number): SealedEntry {
  const own = id();
  const stamp = {
    wall_ms: seq,
    offset_min: 0,
    zone: 'Etc/UTC',
    page_life: own,
    monotonic_ms: 0,
    time_uncertain: false,
  };
  const base = { epoch: own, revision: 0, hash: GENESIS_HASH };
  const place = { lab, id: own, device, seq, subject: own, author: null, witness: null };
  return sealEntry({ ...place, kind: 'gas.changed', version: 1, base, stamp }, '{"words":"µ Ω \\n"}');
}

function header(last_seq: number): JournalHeader {
  const names = { lab_name: 'L', letter: 'C', device_name: 'D' };
  return { journal: 1, lab, device, epoch: '', last_seq, firing_count: 0, grants: [], ...names };
}

function browser() {
  const hub = memoryLockHub();
  const journal = memoryJournal();
  const { timers } = virtualTime();
  return {
    journal,
    tab: () => {
      const { locks, kill } = hub.openTab();
      return { ports: { files: journal.files, locks, timers }, kill };
    },
  };
}

async function gathered(tab: ReturnType<ReturnType<typeof browser>['tab']>): Promise<Gathered> {
  let found: Gathered | null = null;
  await gatherJournals(lab, tab.ports, (what) => {
    found = what;
    return Promise.resolve();
  });
  if (found === null) throw new Error('nothing was gathered');
  return found;
}

describe('lines of the second journal', () => {
  it('come back as they were written', () => {
    const [one, two] = [entry(1), entry(2)];
    const text =
      journalLine({ header: header(2) }) + journalLine({ entry: one }) + journalLine({ entry: two });
    expect(readJournal(text)).toEqual({ header: header(2), entries: [one, two], torn: [] });
  });

  it('show the torn last line wherever it was cut, and keep all before it', () => {
    const whole = journalLine({ entry: entry(1) });
    const last = journalLine({ entry: entry(2) });
    for (let cut = 1; cut < last.length - 1; cut += 7) {
      const read = readJournal(whole + last.slice(0, cut));
      expect(read.entries.map((one) => one.seq)).toEqual([1]);
      expect(read.torn).toEqual([last.slice(0, cut)]);
    }
  });

  it('show a line that the disk changed', () => {
    const line = journalLine({ entry: entry(1) });
    const bad = line.replace('"seq":1', '"seq":3');
    expect(readJournal(bad)).toMatchObject({ entries: [], torn: [bad.trimEnd()] });
  });
});

describe('files of the second journal', () => {
  it('are gathered once their page is gone, and not before', async () => {
    const { tab, journal } = browser();
    const first = tab();
    const opened = await openJournal({ lab, page_life: 'one' }, first.ports, {
      header: header(0),
      carried: [],
    });
    expect(await opened?.append(entry(1))).toBe(true);
    expect((await gathered(tab())).entries).toEqual([]);
    first.kill();
    await settle();
    const after = await gathered(tab());
    expect(after.entries.map((one) => one.seq)).toEqual([1]);
    expect(after.header).toEqual(header(0));
    expect(journal.text(`journal-${lab}`, 'one')).toContain('"seq":1');
  });

  it('say that they failed instead of throwing', async () => {
    const { tab, journal } = browser();
    const { ports } = tab();
    const opened = await openJournal({ lab, page_life: 'one' }, ports, { header: header(0), carried: [] });
    journal.breakDown();
    expect(await opened?.append(entry(1))).toBe(false);
    expect(
      await openJournal({ lab, page_life: 'two' }, ports, { header: header(0), carried: [] }),
    ).toBeNull();
  });
});
