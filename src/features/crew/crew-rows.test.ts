import { describe, expect, it } from 'vitest';
import { inUseFirst, lastSeenWords, pendingWords, type Tablet } from './crew-rows';

const HOUR_MS = 3_600_000;
const tablet = (change: Partial<Tablet>): Tablet => ({
  id: 'a',
  letter: 'A',
  name: 'Bench tablet',
  last_seen_ms: 0,
  last_seq: 12,
  pending: { count: 12, oldest_wall_ms: HOUR_MS },
  revoked_ms: null,
  ...change,
});

describe('tablets of the crew', () => {
  it('says when each was last seen', () => {
    expect(lastSeenWords(tablet({}), 3 * HOUR_MS)).toBe('3 h ago');
    expect(lastSeenWords(tablet({ last_seen_ms: 5 * HOUR_MS }), 3 * HOUR_MS)).toBe('now');
    expect(lastSeenWords(tablet({ last_seen_ms: null }), 0)).toBe('never');
  });

  it('says what waited as last known, never that nothing waits now', () => {
    expect(pendingWords(tablet({}), 3 * HOUR_MS)).toBe('12 entries, the oldest 2 h');
    expect(pendingWords(tablet({ pending: { count: 1, oldest_wall_ms: null } }), 0)).toBe('1 entry');
    expect(pendingWords(tablet({ pending: { count: 0, oldest_wall_ms: null } }), 0)).toBe('nothing');
    expect(pendingWords(tablet({ pending: null }), 0)).toBe('not known');
  });

  it('keeps revoked tablets, after those in use', () => {
    const list = [tablet({ letter: 'AA' }), tablet({ letter: 'A', revoked_ms: 1 }), tablet({ letter: 'B' })];
    expect(inUseFirst(list).map(({ letter }) => letter)).toEqual(['B', 'AA', 'A']);
  });
});
