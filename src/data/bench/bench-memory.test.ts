import { IDBFactory, IDBKeyRange } from 'fake-indexeddb';
import { describe, expect, it, vi } from 'vitest';
import { seededBytes } from '../fakes/chance';
import { memoryLockHub } from '../fakes/memory-locks';
import { settle, virtualTime } from '../fakes/virtual-time';
import type { PageEvent } from '../ports/ports';
import { getCount } from '../store/book-keys';
import { openBookStore } from '../store/book-store';
import { openDrafts } from './drafts';
import { firstPaintRoute, openResume } from './resume';
import { openWaitClock } from './wait-clock';

function tablet() {
  const time = virtualTime();
  const idb = { indexedDB: new IDBFactory(), IDBKeyRange };
  const locks = memoryLockHub();
  const hidden = new Set<() => void>();
  const kept = new Map<string, string>();
  const page = {
    visible: () => true,
    online: () => true,
    on: (event: PageEvent, run: () => void) => {
      if (event === 'hidden') hidden.add(run);
      return () => hidden.delete(run);
    },
  };
  const small = {
    get: (key: string) => kept.get(key) ?? null,
    set: (key: string, value: string) => void kept.set(key, value),
    remove: (key: string) => void kept.delete(key),
  };
  const { timers } = time;
  return {
    time,
    hide: () => {
      for (const run of hidden) run();
    },
    small,
    /** What one page life works with; a second one is a reload. */
    pageLife: () => {
      const store = openBookStore('lab', { idb, random: seededBytes(1), timers });
      const clock = time.clock();
      return {
        store,
        drafts: openDrafts({ store, timers, page, clock }),
        resume: openResume({ store, small, timers, page }),
        waits: openWaitClock({ store, clock, timers, locks: locks.openTab().locks }),
      };
    },
  };
}

const ADA = { person: 'ada', key: 'reading/1' };

vi.setConfig({ testTimeout: 30_000 });

describe('drafts', () => {
  it('are there after a reload, 250 ms after the last touch', async () => {
    const { time, pageLife } = tablet();
    const { drafts } = pageLife();
    drafts.set(ADA, { kV: '12' });
    drafts.set(ADA, { kV: '12.2' });
    expect(drafts.get(ADA)).toEqual({ value: { kV: '12.2' }, restored: false, save: 'saving' });
    await time.pass(250);
    expect(drafts.get(ADA)?.save).toBe('saved');
    const again = pageLife().drafts;
    await again.load();
    expect(again.get(ADA)).toEqual({ value: { kV: '12.2' }, restored: true, save: 'saved' });
  });

  it('are written at once when the page is hidden, and gone once cleared', async () => {
    const { time, hide, pageLife } = tablet();
    const { drafts } = pageLife();
    drafts.set(ADA, 'half a note');
    hide();
    await settle();
    const again = pageLife().drafts;
    await again.load();
    expect(again.get(ADA)?.value).toBe('half a note');
    again.clear(ADA);
    await time.pass(250);
    const last = pageLife().drafts;
    await last.load();
    expect(last.get(ADA)).toBeUndefined();
  });

  it('tell the next person only that they exist', async () => {
    const { time, pageLife } = tablet();
    const { drafts } = pageLife();
    drafts.set(ADA, 'hers');
    await time.pass(250);
    const milo = { person: 'milo', key: ADA.key };
    expect(drafts.get(milo)).toBeUndefined();
    expect(drafts.someoneElses(milo)).toBe(true);
    expect(drafts.someoneElses(ADA)).toBe(false);
  });

  it('say that they are not saved when the store fails, and try again with the next touch', async () => {
    const { time, pageLife } = tablet();
    const { drafts, store } = pageLife();
    await store.open();
    const failing = vi
      .spyOn(store.database, 'transaction')
      .mockRejectedValue(new Error('the disk does not answer'));
    drafts.set(ADA, 1);
    await time.pass(250);
    expect(drafts.get(ADA)).toMatchObject({ value: 1, save: 'not-saved' });
    failing.mockRestore();
    drafts.set(ADA, 2);
    await time.pass(250);
    expect(drafts.get(ADA)).toMatchObject({ value: 2, save: 'saved' });
  });
});

describe('where the hands were', () => {
  it('comes back: route, field, caret and scroll', async () => {
    const { time, small, pageLife } = tablet();
    const { resume } = pageLife();
    await resume.load();
    resume.route('/firings/1');
    resume.field('voltage', 3);
    resume.scroll(420);
    expect(firstPaintRoute(small)).toBe('/firings/1');
    await time.pass(250);
    small.remove('holdoff-resume');
    const again = pageLife().resume;
    await again.load();
    expect(again.atStart()).toEqual({ route: '/firings/1', field: 'voltage', caret: 3, scroll: 420 });
  });

  it('forgets the field with the route it was on, and shrugs at a damaged mirror', async () => {
    const { time, small, pageLife } = tablet();
    const { resume } = pageLife();
    resume.field('voltage', 3);
    resume.route('/bench');
    await time.pass(250);
    const again = pageLife().resume;
    await again.load();
    expect(again.atStart()).toMatchObject({ route: '/bench', field: null });
    small.set('holdoff-resume', '{"route":');
    expect(firstPaintRoute(small)).toBeNull();
  });
});

describe('a wait', () => {
  it('counts whole page lives together, and a reload never shortens it', async () => {
    const { time, pageLife } = tablet();
    const first = pageLife().waits;
    void first.start('check/wait');
    await time.pass(30_500);
    expect(first.get('check/wait')).toEqual({ waited_s: 30, running: true });

    const reloaded = pageLife().waits;
    first.close();
    await settle();
    await time.pass(3600_000);
    await reloaded.load('check/wait');
    expect(reloaded.get('check/wait').waited_s).toBeCloseTo(30.5, 3);
    void reloaded.start('check/wait');
    await time.pass(10_000);
    expect(reloaded.get('check/wait').waited_s).toBeCloseTo(40.5, 3);
  });

  it('does not see the wall clock', async () => {
    const { time, pageLife } = tablet();
    const { waits } = pageLife();
    void waits.start('check/wait');
    await time.pass(5000);
    time.setWall(Date.UTC(2099, 0, 1));
    await time.pass(1000);
    expect(waits.get('check/wait').waited_s).toBe(6);
  });

  it('is counted once by two tabs', async () => {
    const { time, pageLife } = tablet();
    const [one, two] = [pageLife(), pageLife()];
    void one.waits.start('check/wait');
    await settle();
    await two.waits.start('check/wait');
    await time.pass(20_000);
    expect(await getCount(two.store.database, 'wait/check/wait')).toBe(20);
  });

  it('shows nothing that is not durable', async () => {
    const { time, pageLife } = tablet();
    const { waits, store } = pageLife();
    void waits.start('check/wait');
    await time.pass(3000);
    const failing = vi
      .spyOn(store.database.keys, 'put')
      .mockRejectedValue(new Error('the disk does not answer'));
    await time.pass(5000);
    expect(waits.get('check/wait').waited_s).toBe(3);
    failing.mockRestore();
    await time.pass(1000);
    expect(waits.get('check/wait').waited_s).toBe(9);
  });
});
