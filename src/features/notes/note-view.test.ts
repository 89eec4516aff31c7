import { describe, expect, it } from 'vitest';
import type { NoteDoc, NoteVersion } from '../../domain/book/documents/note';
import { noteView } from './note-view';

const version = (entry: string, based_on: string | null, wall_ms: number): NoteVersion => ({
  entry,
  by: 'ada',
  device: 'tablet',
  at: null,
  stamp: {
    wall_ms,
    zone: 'Etc/UTC',
    mono_ms: 0,
    boot: '',
    server_ms: null,
    server_mono_ms: null,
  } as unknown as NoteVersion['stamp'],
  words: `words of ${entry}`,
  based_on,
});

const note = (versions: readonly NoteVersion[], heads: readonly string[]): NoteDoc => ({
  kind: 'note',
  id: 'a',
  parent: 'rig',
  about: { type: 'rig', id: 'rig' },
  versions,
  heads,
  struck: null,
});

describe('a note as it is read', () => {
  const [a, b, c] = [version('a', null, 1), version('b', 'a', 2), version('c', 'a', 3)];

  it('shows what stands and keeps what was said before, newest first', () => {
    const d = version('d', 'b', 4);
    const view = noteView(note([a, b, d], ['d']));
    expect(view.standing).toEqual([d]);
    expect(view.earlier).toEqual([b, a]);
    expect(view.parted).toBe(false);
  });

  it('shows both where two amended apart', () => {
    const view = noteView(note([a, b, c], ['b', 'c']));
    expect(view.standing.map((one) => one.entry)).toEqual(['b', 'c']);
    expect(view.parted).toBe(true);
  });
});
