import { describe, expect, it, vi } from 'vitest';
import { exchange, labOf, newWorld, openTab, PIN, signIn } from './fakes/tablet';
import { modelReading } from './fakes/model-lab';

vi.setConfig({ testTimeout: 30_000 });

describe('a tablet from its first sign-in to a handed-over firing', () => {
  it('fills its Book, logs a firing offline and hands everything over exactly once', async () => {
    const { lab: model, newBrowser } = newWorld();
    const { client } = await openTab(newBrowser());
    expect(client.session()).toEqual({ state: 'no-lab' });
    const lab = await signIn(client, 'Ada');
    expect(lab.view.filling()).toBe(true);
    expect(await exchange(lab)).toBe('quiet');
    expect(lab.view.filling()).toBe(false);
    expect(lab.view.list('rig').map((rig) => rig.name)).toEqual(['Heron']);

    model.server.fault = () => 'lose-request';
    const unready = { missing: [{ code: 'no-check', words: 'No check.' }], why: 'bench test' };
    const opened = await lab.append({
      kind: 'firing.opened',
      body: { rig: model.rig, rig_revision: model.rig, check: null, permit: null, unready },
    });
    if (opened.type !== 'logged') throw new Error(JSON.stringify(opened));
    expect(opened.copies).toBe(2);
    expect(opened.forecast).toEqual({ verdict: 'applied', reason: null });
    const firing = opened.entry.id;
    for (let shot = 0; shot < 5; shot += 1)
      await lab.append({ kind: 'firing.reading', subject: firing, body: modelReading({ shots: shot }) });
    expect(await exchange(lab)).toBe('no-network');
    expect(lab.view.doc('firing', firing)).toMatchObject({
      number: 'A-1',
      readings: 5,
      opened: { at: null },
    });
    expect(lab.view.waiting().count).toBe(6);

    model.server.fault = () => 'none';
    expect(await exchange(lab)).toBe('quiet');
    expect(lab.view.waiting().count).toBe(0);
    const sent = model.server.book.entries.filter((one) => one.entry.device === lab.device().id);
    expect(sent.map((one) => one.entry.seq)).toEqual([1, 2, 3, 4, 5, 6]);
    expect(lab.view.doc('firing', firing)).toEqual(model.server.book.documents.get(`firing/${firing}`));
    await client.close();
  });

  it('opens locked after a reload and takes the PIN, and without one while a firing is open', async () => {
    const { lab: model, newBrowser } = newWorld();
    const browser = newBrowser();
    const first = await openTab(browser);
    const lab = await signIn(first.client, 'Ada');
    await exchange(lab);
    first.tab.kill();

    const second = await openTab(browser);
    const session = second.client.session();
    expect(session.state).toBe('locked');
    expect((await second.client.unlock(model.ada, '000001')).type).toBe('wrong');
    expect((await second.client.unlock(model.ada, PIN)).type).toBe('wait');
    const again = labOf(second.client);
    expect(again.view.list('rig')).toHaveLength(1);
    second.tab.kill();

    const third = await openTab(browser);
    await third.client.signIn({
      email: 'ada@lab.example',
      password: 'a long enough password',
      device_name: 'x',
    });
    await labOf(third.client).append({
      kind: 'firing.opened',
      body: {
        rig: model.rig,
        rig_revision: model.rig,
        check: null,
        permit: null,
        unready: { missing: [{ code: 'x', words: 'x' }], why: 'x' },
      },
    });
    third.tab.kill();

    const fourth = await openTab(browser);
    expect(fourth.client.session()).toMatchObject({ state: 'open', person: { id: model.ada } });
    await fourth.client.lock();
    expect(fourth.client.session().state).toBe('open');
  });
});
