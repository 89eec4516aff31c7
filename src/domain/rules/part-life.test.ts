import { describe, expect, it } from 'vitest';
import { PureBench } from '../../../tests/support/pure-bench';
import type { BodyOf } from '../book/kinds';
import { partLife } from './part-life';

const fitted: BodyOf<'part.fitted'> = {
  what: 'Doorknob',
  place: 'first',
  where: '',
  serial: '',
  catalogue: null,
  fitted_on: null,
  shots_before: 1000,
  replaces: null,
  note: '',
};

describe('what a part has endured', () => {
  it('counts firings opened between fitting and retiring, corrections too', () => {
    const bench = new PureBench().ready();
    const { book, rig } = bench;
    const unready = { missing: [{ code: 'x', words: 'x' }], why: 'x' };
    const fire = (shots: number): string => {
      bench.open({ unready });
      const reading = bench.read({ shots }).entry.id;
      book.write('firing.closed', bench.firing, { summary: '' });
      return reading;
    };
    fire(5);
    const part = book.write('part.fitted', rig, fitted).entry.id;
    fire(30);
    const firings = () => [...book.documents.values()].filter((doc) => doc.kind === 'firing');
    const life = () => partLife(book.doc('part', part), firings());
    expect(life()).toEqual({ here: 30, all: 1030 });
    fire(12);
    book.write('part.retired', rig, { part, why: 'Cracked' });
    fire(100);
    expect(life()).toEqual({ here: 42, all: 1042 });
    expect(
      partLife({ ...book.doc('part', part), fitted: { ...fitted, shots_before: null } }, firings()),
    ).toEqual({
      here: 42,
      all: null,
    });
  });
});
