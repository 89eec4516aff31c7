import { describe, expect, it } from 'vitest';
import { EMPTY_NOTE, noteEntry } from './note-draft';

const ABOUT = { type: 'rig', id: '7b1c1c57-8a61-4b52-9a07-5f6c1a0a8a11' } as const;
const VERSION = '0a3bb3f6-0c5e-4d8e-9f0a-1b2c3d4e5f60';

describe('the entry of a note', () => {
  it('is none while nothing is said', () => {
    expect(noteEntry({ ...EMPTY_NOTE, words: ' \n ' }, ABOUT)).toBeNull();
  });

  it('is a note of its own, or a change of the version that was read', () => {
    expect(noteEntry({ ...EMPTY_NOTE, words: ' Film stained at B \n' }, ABOUT)).toEqual({
      kind: 'note.written',
      body: { about: ABOUT, words: 'Film stained at B' },
    });
    const amends = { note: ABOUT.id, version: VERSION };
    expect(noteEntry({ ...EMPTY_NOTE, words: 'At A', amends }, ABOUT)).toEqual({
      kind: 'note.amended',
      subject: ABOUT.id,
      body: { based_on: VERSION, words: 'At A' },
    });
  });
});
