import { describe, expect, it } from 'vitest';
import { bodyText, sealEntry } from '../../domain/book/entry';
import { bytesWords, entryRow, type EntryOfTablet } from './entry-row';

const id = (last: number): string => `00000000-0000-4000-8000-00000000000${last}`;

const own: EntryOfTablet = {
  entry: sealEntry(
    {
      lab: id(1),
      id: id(2),
      device: id(3),
      seq: 12,
      kind: 'rig.stood-down',
      version: 1,
      subject: id(4),
      author: id(5),
      witness: null,
      base: { epoch: id(6), revision: 0, hash: '0'.repeat(64) },
      stamp: {
        wall_ms: Date.UTC(2026, 11, 11, 15, 4),
        offset_min: 0,
        zone: 'Europe/London',
        page_life: id(7),
        monotonic_ms: 0,
        time_uncertain: false,
      },
    },
    bodyText({ why: 'Smell of ozone' }, 'ab'.repeat(16)),
  ),
  place: 'on this tablet',
  verdict: 'waiting',
  reason: null,
  revision: null,
};

describe('a row of the Handover', () => {
  it('says what an entry is, where it is and what the server said', () => {
    expect(entryRow(own, 'Europe/London')).toMatchObject({
      seq: '12',
      when: '11 Dec 15:04',
      kind: 'Rig stood down',
      substance: 'Smell of ozone',
      place: 'on this tablet',
      verdict: 'waits for the server',
      reason: '',
    });
  });

  it('never says that an irregular entry was refused', () => {
    const reason = {
      cause: 'rule',
      code: 'stood-down',
      words: 'The rig was stood down.',
      knew: false,
    } as const;
    const row = entryRow({ ...own, place: 'sent', verdict: 'irregular', reason, revision: 812 }, 'UTC');
    expect(row.verdict).toBe('in the Book, irregular, revision 812');
    expect(row.reason).toBe('The rig was stood down. The tablet could not know.');
  });

  it('says when the clock was not to be believed', () => {
    const stamp = { ...own.entry.stamp, time_uncertain: true };
    expect(entryRow({ ...own, entry: { ...own.entry, stamp } }, 'UTC').when).toContain('time uncertain');
  });

  it('rounds what is used up', () => {
    expect(bytesWords(999)).toBe('999\u2009B');
    expect(bytesWords(3_410_000)).toBe('3.5\u2009MB');
    expect(bytesWords(20_000_000_000)).toBe('20\u2009GB');
  });
});
