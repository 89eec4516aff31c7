import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { createHeadWatcher } from './head-watcher';

describe('waiting for the head of a Book', () => {
  beforeEach(() => void vi.useFakeTimers());
  afterEach(() => void vi.useRealTimers());

  function watch(head = { revision: 1, fails: false }) {
    const polls: string[] = [];
    const failures: unknown[] = [];
    const watcher = createHeadWatcher({
      pollEveryMs: 300,
      readHead: (lab) => {
        polls.push(lab);
        return head.fails ? Promise.reject(new Error('down')) : Promise.resolve(head.revision);
      },
      onPollFailed: (error) => failures.push(error),
    });
    const woken: string[] = [];
    const wait = (
      name: string,
      more: { since?: number; wait_ms?: number; signal?: AbortSignal; lab?: string } = {},
    ) =>
      watcher
        .waitBeyond({ lab: 'lab', since: 1, wait_ms: 25_000, signal: new AbortController().signal, ...more })
        .then(() => void woken.push(name));
    return { watcher, polls, failures, woken, wait, head };
  }
  const settle = () => vi.advanceTimersByTimeAsync(0);

  it('wakes those whom a new revision concerns, at once', async () => {
    const { watcher, woken, wait } = watch();
    void wait('behind');
    void wait('ahead', { since: 5 });
    void wait('elsewhere', { lab: 'other' });
    watcher.announce('lab', 3);
    await settle();
    expect(woken).toEqual(['behind']);
    watcher.close();
  });

  it('polls once for all who wait in a lab, and not at all when nobody does', async () => {
    const { polls, woken, wait, head } = watch();
    void wait('one');
    void wait('two');
    await vi.advanceTimersByTimeAsync(650);
    expect(polls).toHaveLength(2);
    head.revision = 2;
    await vi.advanceTimersByTimeAsync(300);
    expect(woken).toEqual(['one', 'two']);
    await vi.advanceTimersByTimeAsync(3000);
    expect(polls).toHaveLength(3);
  });

  it('ends a wait when its time is over or its caller hangs up', async () => {
    const { woken, wait } = watch();
    const caller = new AbortController();
    void wait('short', { wait_ms: 1000 });
    void wait('gone', { signal: caller.signal });
    caller.abort();
    await settle();
    expect(woken).toEqual(['gone']);
    await vi.advanceTimersByTimeAsync(1000);
    expect(woken).toEqual(['gone', 'short']);
    await wait('gone before', { signal: caller.signal });
    expect(vi.getTimerCount()).toBe(0);
  });

  it('goes on polling after a poll that failed, and says so', async () => {
    const { woken, wait, head, failures } = watch({ revision: 2, fails: true });
    void wait('patient');
    await vi.advanceTimersByTimeAsync(600);
    expect(failures).toHaveLength(2);
    head.fails = false;
    await vi.advanceTimersByTimeAsync(300);
    expect(woken).toEqual(['patient']);
  });

  it('lets everybody go on closing, and nobody wait afterwards', async () => {
    const { watcher, woken, wait } = watch();
    void wait('one');
    watcher.close();
    await wait('late');
    expect(woken).toEqual(['one', 'late']);
    expect(vi.getTimerCount()).toBe(0);
  });
});
