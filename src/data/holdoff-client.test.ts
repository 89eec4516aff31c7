import { describe, expect, it, vi } from 'vitest';
import { exchange, labOf, newWorld, openTab, PIN, signIn } from './fakes/tablet';
import { modelReading } from './fakes/model-lab';
import { settle } from './fakes/virtual-time';

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

describe('one tablet in two tabs', () => {
  it('writes under the new tablet in both once one of them was enrolled anew', async () => {
    const { lab: model, newBrowser } = newWorld();
    const browser = newBrowser();
    const one = labOf(
      await openTab(browser).then(async ({ client }) => (await signIn(client, 'Ada'), client)),
    );
    const second = await openTab(browser);
    const two = labOf(second.client);
    await one.store.setDevice({ ...one.device(), forked: true }, model.server.book.epoch);
    await signIn(second.client, 'Ada');
    const fresh = two.device().id;
    const draft = { kind: 'rig.stood-down', subject: model.rig, body: { why: 'x' }, author: null } as const;
    for (const lab of [one, two]) await lab.append(draft);
    const rows = await two.store.allOwn();
    expect(rows.map((row) => [row.device, row.seq])).toEqual([
      [fresh, 1],
      [fresh, 2],
    ]);
    await settle();
    expect(one.device().id).toBe(fresh);
    expect(await exchange(one)).toBe('quiet');
  });
});

describe('switching person', () => {
  it('takes a PIN and no network, and sends each one’s entries as their own', async () => {
    const { lab: model, newBrowser } = newWorld();
    const { client } = await openTab(newBrowser());
    const lab = await signIn(client, 'Ada');
    await signIn(client, 'Milo');
    await exchange(lab);
    model.server.fault = () => 'lose-request';
    expect((await client.unlock(model.ada, PIN)).type).toBe('right');
    const down = { kind: 'rig.stood-down', subject: model.rig, body: { why: 'x' } } as const;
    await lab.append(down);
    expect((await client.unlock(model.milo, PIN)).type).toBe('right');
    await lab.append(down);
    expect((await client.checkPin(model.ada, PIN)).type).toBe('right');
    expect(client.session()).toMatchObject({ state: 'open', person: { id: model.milo } });
    model.server.fault = () => 'none';
    await exchange(lab);
    const sent = model.server.book.entries.filter((one) => one.entry.device === lab.device().id);
    expect(sent.map(({ entry }) => ('author' in entry ? entry.author : null))).toEqual([
      model.ada,
      model.milo,
    ]);
  });
});
