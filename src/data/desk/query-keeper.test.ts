import { QueryClient } from '@tanstack/react-query';
import { describe, expect, it } from 'vitest';
import { virtualTime } from '../fakes/virtual-time';
import { KEEP_MS, keepQueries } from './query-keeper';

function desk() {
  const time = virtualTime();
  const kept = new Map<string, string>();
  const small = {
    get: (key: string) => kept.get(key) ?? null,
    set: (key: string, value: string) => void kept.set(key, value),
    remove: (key: string) => void kept.delete(key),
  };
  const open = (version = '1') => {
    const client = new QueryClient();
    const now = time.clock().wallMs;
    return { client, keeper: keepQueries({ client, small, timers: time.timers, now, key: 'desk', version }) };
  };
  return { time, kept, open };
}

describe('what the Desk fetched', () => {
  it('is readable again offline', async () => {
    const { time, open } = desk();
    open().client.setQueryData(['/api/desk/firings'], { firings: [1, 2] });
    await time.pass(1000);
    expect(open().client.getQueryData(['/api/desk/firings'])).toEqual({ firings: [1, 2] });
  });

  it('is gone once forgotten, from another version, when too old, and when damaged', async () => {
    const { time, kept, open } = desk();
    const { client, keeper } = open();
    client.setQueryData(['a'], 1);
    await time.pass(1000);
    expect(open('2').client.getQueryData(['a'])).toBeUndefined();
    client.setQueryData(['a'], 2);
    await time.pass(1000);
    keeper.forget();
    expect(open().client.getQueryData(['a'])).toBeUndefined();
    client.setQueryData(['a'], 3);
    await time.pass(KEEP_MS + 1000);
    expect(open().client.getQueryData(['a'])).toBeUndefined();
    kept.set('desk', '{"version":"1",');
    expect(open().client.getQueryData(['a'])).toBeUndefined();
  });
});
