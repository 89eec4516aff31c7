import { describe, expect, it } from 'vitest';
import type { ReadingDoc } from '../domain/book/documents/reading';
import { steadySnapshot } from './use-readings-of';

const doc = (id: string) => ({ id }) as ReadingDoc;

describe('readings of several firings', () => {
  it('stay the same object while lists are made anew with the same readings', () => {
    const one = doc('1');
    const lists = new Map([['a', [one]]]);
    const read = steadySnapshot(['a'], (firing) => ({
      state: 'ready',
      documents: [...(lists.get(firing) ?? [])],
    }));
    const first = read();
    expect(read()).toBe(first);
    lists.set('a', [one, doc('2')]);
    expect(read()).not.toBe(first);
    expect(read().readingsOf('a')).toHaveLength(2);
    lists.set('a', [one, doc('2')]);
    const changed = read();
    lists.set('a', [doc('1'), doc('2')]);
    expect(read()).not.toBe(changed);
  });

  it('are loading until the last list is there', () => {
    let state: 'loading' | 'ready' = 'loading';
    const read = steadySnapshot(['a', 'b'], (firing) => ({
      state: firing === 'a' ? 'ready' : state,
      documents: [],
    }));
    expect(read().state).toBe('loading');
    state = 'ready';
    expect(read().state).toBe('ready');
    expect(read().readingsOf('c')).toEqual([]);
  });
});
