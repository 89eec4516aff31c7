import { describe, expect, it } from 'vitest';
import { createMemory } from './memory';

describe('createMemory', () => {
  it('computes once for a key, also where there is nothing to give', () => {
    const remember = createMemory<number | undefined>(2);
    let asked = 0;
    const nothing = () => {
      asked += 1;
      return undefined;
    };
    expect(remember('a', nothing)).toBeUndefined();
    expect(remember('a', nothing)).toBeUndefined();
    expect(asked).toBe(1);
  });

  it('forgets what was asked for the longest ago', () => {
    const remember = createMemory<number>(2);
    remember('a', () => 1);
    remember('b', () => 2);
    expect(remember('a', () => 3)).toBe(1);
    remember('c', () => 4);
    expect(remember('a', () => 5)).toBe(1);
    expect(remember('b', () => 6)).toBe(6);
  });
});
