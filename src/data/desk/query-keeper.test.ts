import { QueryClient } from '@tanstack/react-query';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { KEEP_MS, keepQueries } from './query-keeper';

beforeEach(() => {
  vi.useFakeTimers();
});
afterEach(() => {
  vi.useRealTimers();
});

function desk() {
  const kept = new Map<string, string>();
  const small = {
    get: (key: string) => kept.get(key) ?? null,
    set: (key: string, value: string) => void kept.set(key, value),
    remove: (key: string) => void kept.delete(key),
  };
  const open = async (version = '1') => {
    const client = new QueryClient({ defaultOptions: { queries: { gcTime: KEEP_MS } } });
    const keeper = keepQueries({ client, small, key: 'desk', version });
    await keeper.restored;
    return { client, keeper };
  };
  return { kept, open };
}

const pass = (ms: number) => vi.advanceTimersByTimeAsync(ms);

describe('what the Desk fetched', () => {
  it('is readable again offline', async () => {
    const { open } = desk();
    const first = await open();
    first.client.setQueryData(['/api/desk/firings'], { firings: [1, 2] });
    await pass(2000);
    const again = await open();
    expect(again.client.getQueryData(['/api/desk/firings'])).toEqual({ firings: [1, 2] });
  });

  it('is gone for another version of the app', async () => {
    const { open } = desk();
    const first = await open();
    first.client.setQueryData(['a'], 1);
    await pass(2000);
    first.keeper.close();
    expect((await open('2')).client.getQueryData(['a'])).toBeUndefined();
  });

  it('is gone once forgotten, and when too old', async () => {
    const { kept, open } = desk();
    const first = await open();
    first.client.setQueryData(['a'], 1);
    await pass(2000);
    first.keeper.close();
    expect(kept.size).toBe(1);
    first.keeper.forget();
    expect(kept.size).toBe(0);
    const second = await open();
    second.client.setQueryData(['a'], 2);
    await pass(2000);
    second.keeper.close();
    await pass(KEEP_MS + 1000);
    expect((await open()).client.getQueryData(['a'])).toBeUndefined();
  });
});
