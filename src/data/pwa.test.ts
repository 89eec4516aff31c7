import { describe, expect, it, vi } from 'vitest';
import { exchange, newWorld, openTab, signIn } from './fakes/tablet';
import type { ServiceWorkerPort } from './ports/ports';
import { createUpdateWatch } from './pwa';

vi.setConfig({ testTimeout: 30_000 });

function worker() {
  const done: string[] = [];
  let events: Parameters<ServiceWorkerPort['register']>[0] | null = null;
  const port: ServiceWorkerPort = {
    register: (given) => {
      events = given;
    },
    activate: () => done.push('activate'),
    reload: () => done.push('reload'),
  };
  return { port, done, waiting: () => events?.onWaiting(), replaced: () => events?.onReplaced() };
}

describe('a new version', () => {
  it('waits until it is accepted, and then reloads once', () => {
    const { port, done, waiting, replaced } = worker();
    const update = createUpdateWatch(port, () => null);
    update.accept();
    expect(update.state().state).toBe('none');
    waiting();
    expect(update.state()).toMatchObject({ state: 'waiting', may_accept: true });
    expect(done).toEqual([]);
    update.accept();
    replaced();
    expect(done).toEqual(['activate', 'reload']);
  });

  it('never reloads a page whose neighbour accepted it', () => {
    const { port, done, waiting, replaced } = worker();
    const update = createUpdateWatch(port, () => null);
    waiting();
    replaced();
    expect(update.state().state).toBe('reload-needed');
    expect(done).toEqual([]);
    update.accept();
    expect(done).toEqual(['reload']);
  });

  it('is not accepted while a firing is open on this tablet', async () => {
    const world = newWorld();
    const { client } = await openTab(world.newBrowser());
    const lab = await signIn(client, 'Ada');
    await exchange(lab);
    const { rig } = world.lab;
    const unready = { missing: [{ code: 'x', words: 'x' }], why: 'x' };
    const opened = await lab.append({
      kind: 'firing.opened',
      body: { rig, rig_revision: rig, check: null, permit: null, unready },
    });
    const { port, done, waiting } = worker();
    const update = createUpdateWatch(port, () => lab);
    const stop = update.subscribe(() => {});
    waiting();
    expect(update.state().may_accept).toBe(false);
    update.accept();
    expect(done).toEqual([]);
    if (opened.type === 'logged')
      await lab.append({ kind: 'firing.closed', subject: opened.entry.id, body: { summary: '' } });
    expect(update.state().may_accept).toBe(true);
    update.accept();
    expect(done).toEqual(['activate']);
    stop();
  });
});
