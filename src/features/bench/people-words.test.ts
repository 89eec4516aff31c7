import { describe, expect, it } from 'vitest';
import { PureBench } from '../../../tests/support/pure-bench';
import { ADA, idOf, MILO, MORNING_MS } from '../../../tests/support/pure-book';
import { heldFor, peopleWords } from './people-words';

const at = (minutes: number) => ({
  wall_ms: MORNING_MS + minutes * 60_000,
  page_life: idOf(0xcc01),
  monotonic_ms: minutes * 60_000,
  time_uncertain: false,
});
const names: Readonly<Record<string, string>> = { [ADA]: 'Ada Brook', [MILO]: 'Milo Venn' };
const nameOf = (id: string | null) => (id === null ? 'author open' : (names[id] ?? 'somebody'));

describe('who is at the rig, in one line', () => {
  it('says that nobody is', () => {
    const { book, rig } = new PureBench();
    expect(peopleWords(book.doc('rig', rig), nameOf, at(0))).toBe('No tags in.');
  });

  it('names every tag and guest with how long', () => {
    const { book, rig } = new PureBench();
    book.write('hands.in', rig, { where: '' });
    book.write('hands.in', rig, { where: 'C2' }, { by: MILO, at_min: 11 });
    const guest = { knows_isolator: true, eyewear: null, words: '' };
    book.write('guest.in', rig, { person: null, name: 'J. Reed', ...guest }, { at_min: 13 });
    book.write('guest.in', rig, { person: MILO, name: '', ...guest }, { at_min: 13 });
    expect(peopleWords(book.doc('rig', rig), nameOf, at(14))).toBe(
      'Hands in: Ada Brook 14 min, Milo Venn 3 min. Guests: J. Reed 1 min, Milo Venn 1 min.',
    );
  });

  it('does not make up a time that a broken clock cannot tell', () => {
    const other = { ...at(10), page_life: idOf(0xcc02), time_uncertain: true };
    expect(heldFor(at(0), other)).toBe('for an unknown time');
    expect(heldFor(at(0), at(0.5))).toBe('just now');
  });
});
