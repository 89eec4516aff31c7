import { describe, expect, it, vi } from 'vitest';
import { uuidFromBytes } from '../../domain/book/ids';
import { seededBytes } from '../fakes/chance';
import { restoreBook } from '../fakes/model-book';
import { modelReading, modelSpec } from '../fakes/model-lab';
import type { NetFault } from '../fakes/model-server';
import { exchange, labOf, newWorld, openTab, signIn, type World } from '../fakes/tablet';
import type { LabClient } from '../lab-client';
import { settle } from '../fakes/virtual-time';

vi.setConfig({ testTimeout: 30_000 });

async function bench(name: 'Ada' | 'Milo' | 'Inge' = 'Ada') {
  const world = newWorld();
  const browser = world.newBrowser();
  const { client, tab } = await openTab(browser);
  const lab = await signIn(client, name);
  expect(await exchange(lab)).toBe('quiet');
  return { world, browser, client, tab, lab };
}

async function standDown(lab: LabClient, { lab: model }: World, why = 'arc at the bushing'): Promise<string> {
  const outcome = await lab.append({ kind: 'rig.stood-down', subject: model.rig, body: { why } });
  if (outcome.type !== 'logged') throw new Error(outcome.type);
  return outcome.entry.id;
}

function inBook({ lab }: World, id: string) {
  return lab.server.book.entries.find((one) => one.entry.id === id);
}

describe('an exchange that meets something else than our server', () => {
  it.each<[NetFault, string]>([
    ['lose-request', 'no-network'],
    ['lose-answer', 'no-network'],
    ['portal', 'no-network'],
  ])('keeps everything when %s, and sends it exactly once afterwards', async (fault, state) => {
    const { world, lab } = await bench();
    const id = await standDown(lab, world);
    world.lab.server.fault = (path) => (path.includes('push') ? fault : 'none');
    expect(await exchange(lab)).toBe(state);
    expect(lab.view.waiting().count).toBe(1);
    world.lab.server.fault = () => 'none';
    expect(await exchange(lab)).toBe('quiet');
    expect(world.lab.server.book.entries.filter((one) => one.entry.id === id)).toHaveLength(1);
    expect(await lab.store.byId(id)).toMatchObject({ state: 'applied', stub: null });
  });

  it('halves the batch at a foreign 413 and marks no entry', async () => {
    const { world, lab } = await bench();
    const ids = [];
    for (let count = 0; count < 5; count += 1) ids.push(await standDown(lab, world, `trial ${count}`));
    let refusals = 2;
    world.lab.server.fault = (path) => {
      if (!path.includes('push') || refusals === 0) return 'none';
      refusals -= 1;
      return 'foreign-413';
    };
    expect(await exchange(lab)).toBe('quiet');
    expect(ids.map((id) => inBook(world, id)?.verdict)).toEqual(Array(5).fill('applied'));
    expect(world.lab.server.paths.filter((path) => path.includes('push')).length).toBeGreaterThan(3);
  });
});

describe('an entry that the server cannot take', () => {
  it('goes on as a stub in its place, and those around it go whole', async () => {
    const { world, lab } = await bench();
    const before = await standDown(lab, world);
    const broken = await standDown(lab, world);
    const after = await standDown(lab, world);
    const row = await lab.store.byId(broken);
    if (row === undefined) throw new Error('no row');
    await lab.store.database.entries.put({
      ...row,
      entry: { ...row.entry, body: '{"why":"changed on the disk"}' },
    });
    expect(await exchange(lab)).toBe('quiet');
    expect([before, broken, after].map((id) => inBook(world, id)?.verdict)).toEqual([
      'applied',
      'held-back',
      'applied',
    ]);
    expect(await lab.store.byId(broken)).toMatchObject({
      state: 'held-back',
      reason: { cause: 'unreadable' },
    });
  });

  it('keeps its text and the reason when a rule holds it back', async () => {
    const { world, lab } = await bench('Milo');
    const { envelope } = modelSpec();
    const until_ms = world.time.clock().wallMs() + 3600_000;
    const { rig, inge } = world.lab;
    const outcome = await lab.append({
      kind: 'permit.granted',
      subject: rig,
      body: { rig_revision: rig, envelope, until_ms, words: '' },
    });
    if (outcome.type !== 'logged') throw new Error(outcome.type);
    // An act waits for the server's word: it has no effect here before that.
    expect(outcome.forecast).toBeNull();
    expect(lab.view.doc('rig', rig)?.permits).toHaveLength(1);
    world.lab.write('rig.revised', inge, {
      subject: rig,
      body: { number: '20', based_on: rig, spec: modelSpec({ max_kV: 12 }), why: 'new film' },
    });
    expect(await exchange(lab)).toBe('quiet');
    const [held] = lab.view.list('held');
    expect(held).toMatchObject({
      id: outcome.entry.id,
      reason: { cause: 'rule', code: 'superseded-revision' },
    });
    expect(held?.entry.body).toBe(outcome.entry.body);
  });

  it('gets a new id when the Book has its own with another text, and both stay', async () => {
    const { world, lab } = await bench();
    const id = await standDown(lab, world);
    const row = await lab.store.byId(id);
    if (row === undefined) throw new Error('no row');
    const { book } = world.lab.server;
    const other = world.lab.write('rig.stood-down', world.lab.milo, {
      subject: world.lab.rig,
      body: { why: 'other' },
    });
    const clash = book.entries.findIndex((one) => one.entry.id === other);
    const taken = book.entries[clash];
    if (taken === undefined) throw new Error('no entry');
    await lab.mirror.database.transaction('rw', [lab.mirror.database.meta], async () => {
      const cursor = await lab.mirror.database.meta.get('cursor');
      if (cursor !== undefined)
        await lab.mirror.database.meta.put({
          ...cursor,
          revision: book.entries.length,
          hash: taken.chain_hash,
        });
    });
    book.entries[clash] = { ...taken, entry: { ...taken.entry, id } };
    const second = await standDown(lab, world, 'second');
    expect(await exchange(lab)).toBe('quiet');
    const [again] = await lab.store.alteredFrom([id]);
    expect(again).toMatchObject({ state: 'applied', altered_from: id });
    expect(again?.entry.body).toBe(row.entry.body);
    expect(inBook(world, second)?.verdict).toBe('applied');
    await settle();
    lab.states.get(id);
    await settle();
    expect(lab.states.get(id)).toMatchObject({ verdict: 'altered' });
  });
});

describe('whose session brings an act', () => {
  it('is the author’s, also while somebody else is open', async () => {
    const { world, client, lab } = await bench('Milo');
    const firing = await closedFiring(world);
    await exchange(lab);
    const outcome = await lab.append({
      kind: 'firing.sent-back',
      subject: firing,
      body: { words: 'Again, please.' },
    });
    if (outcome.type !== 'logged') throw new Error(outcome.type);
    await signIn(client, 'Ada');
    lab.tokens.dropAll();
    expect(await exchange(lab)).toBe('quiet');
    expect(inBook(world, outcome.entry.id)?.verdict).toBe('applied');
  });

  it('is the tablet’s own when that session is over: held back until the author confirms', async () => {
    const { world, lab } = await bench('Milo');
    const firing = await closedFiring(world);
    await exchange(lab);
    const outcome = await lab.append({
      kind: 'firing.sent-back',
      subject: firing,
      body: { words: 'Again, please.' },
    });
    if (outcome.type !== 'logged') throw new Error(outcome.type);
    const later = await standDown(lab, world);
    world.lab.server.ended.add(world.lab.milo);
    lab.tokens.dropAll();
    expect(await exchange(lab)).toBe('quiet');
    expect(inBook(world, outcome.entry.id)?.reason?.cause).toBe('confirm');
    expect(inBook(world, later)?.verdict).toBe('applied');
    await settle();
    expect(lab.session.view()).toMatchObject({ state: 'open', online: 'sign-in-needed' });
  });

  async function closedFiring({ lab: model }: World): Promise<string> {
    const unready = { missing: [{ code: 'x', words: 'x' }], why: 'x' };
    const body = {
      number: 'Z-1',
      rig: model.rig,
      rig_revision: model.rig,
      check: null,
      permit: null,
      unready,
    };
    const firing = model.write('firing.opened', model.ada, { body });
    model.write('firing.closed', model.ada, { subject: firing, body: { summary: '' } });
    return Promise.resolve(firing);
  }
});

describe('a server or a tablet that is not what it was', () => {
  it('sends again what a restored server lost, and drops nothing', async () => {
    const { world, lab } = await bench();
    const ids = [await standDown(lab, world, 'one'), await standDown(lab, world, 'two')];
    await exchange(lab);
    const { book } = world.lab.server;
    restoreBook(book, book.entries.length - 1, uuidFromBytes(seededBytes(9)(16)));
    expect(inBook(world, ids[1] ?? '')).toBeUndefined();
    expect(await exchange(lab)).toBe('quiet');
    expect(ids.map((id) => inBook(world, id)?.verdict)).toEqual(['applied', 'applied']);
    expect(lab.view.cursor()).toMatchObject({ epoch: book.epoch, revision: book.entries.length });
    expect(await lab.mirror.database.set_aside.count()).toBeGreaterThan(0);
  });

  it('keeps what waits on a revoked tablet', async () => {
    const { world, lab } = await bench();
    await standDown(lab, world);
    const device = world.lab.server.book.devices.get(lab.device().id);
    if (device !== undefined) device.revoked = true;
    expect(await exchange(lab)).toBe('revoked');
    expect(lab.view.waiting().count).toBe(1);
  });

  it('finds a cloned tablet by its first push and goes on as a new one after a sign-in, both branches kept', async () => {
    const { world, client, lab } = await bench();
    const old = lab.device();
    const mine = await standDown(lab, world, 'branch one');
    // The other branch of the clone has used this seq already.
    const known = world.lab.server.book.devices.get(old.id);
    if (known !== undefined) known.last_seq = 1;
    expect(await exchange(lab)).toBe('fork');
    expect(lab.view.waiting().count).toBe(1);
    expect(await exchange(lab)).toBe('fork');
    await signIn(client, 'Ada');
    expect(lab.device().id).not.toBe(old.id);
    expect(lab.device().letter).not.toBe(old.letter);
    expect(await exchange(lab)).toBe('quiet');
    expect(inBook(world, mine)).toMatchObject({
      verdict: 'applied',
      entry: { device: lab.device().id, seq: 1 },
    });
  });

  it('rebuilds an emptied store from the second journal, says so, and sends it as a new tablet', async () => {
    const { world, browser, tab, lab } = await bench();
    world.lab.server.fault = () => 'lose-request';
    const ids = [await standDown(lab, world, 'one'), await standDown(lab, world, 'two')];
    const old = lab.device();
    tab.kill();
    await settle();
    browser.emptyIndexedDb();
    const [file = ''] = await browser.journal.files.list(`journal-${lab.lab.id}`);
    const text = browser.journal.text(`journal-${lab.lab.id}`, file) ?? '';
    browser.journal.setText(`journal-${lab.lab.id}`, file, `${text}0123456789abcdef {"entry":{"lab":"`);

    world.lab.server.fault = () => 'none';
    const again = await openTab(browser);
    expect(again.client.notices.join(' ')).toContain('had been emptied');
    expect(again.client.notices.join(' ')).toContain('torn');
    const rebuilt = labOf(again.client);
    expect(rebuilt.view.waiting().count).toBe(2);
    expect(await exchange(rebuilt)).toBe('sign-in-to-send');
    expect((await again.client.unlock(world.lab.ada, '271828')).type).toBe('sign-in-needed');
    await signIn(again.client, 'Ada');
    expect(await exchange(labOf(again.client))).toBe('quiet');
    expect(ids.map((id) => inBook(world, id)?.verdict)).toEqual(['applied', 'applied']);
    expect(labOf(again.client).device().id).not.toBe(old.id);
  });

  it('logs with one copy only when the second journal fails, and says so', async () => {
    const { world, browser, lab } = await bench();
    browser.journal.breakDown();
    const outcome = await lab.append({ kind: 'rig.stood-down', subject: world.lab.rig, body: { why: 'x' } });
    expect(outcome).toMatchObject({ type: 'logged', copies: 1, words: 'logged, one copy only' });
  });
});

describe('readings after a stand-down', () => {
  it('arrive as irregular where another tablet had stood the rig down, none lost', async () => {
    const { world, lab } = await bench();
    const { rig, milo } = world.lab;
    const unready = { missing: [{ code: 'x', words: 'x' }], why: 'x' };
    const opened = await lab.append({
      kind: 'firing.opened',
      body: { rig, rig_revision: rig, check: null, permit: null, unready },
    });
    if (opened.type !== 'logged') throw new Error(opened.type);
    world.lab.write('rig.stood-down', milo, { subject: rig, body: { why: 'smell of ozone' } });
    const reading = await lab.append({
      kind: 'firing.reading',
      subject: opened.entry.id,
      body: modelReading(),
    });
    expect(reading).toMatchObject({ forecast: { verdict: 'applied' } });
    expect(await exchange(lab)).toBe('quiet');
    lab.view.children('reading', opened.entry.id);
    await settle();
    const { state, documents } = lab.view.children('reading', opened.entry.id);
    expect(state).toBe('ready');
    expect(documents.map((doc) => doc.irregular)).toEqual(['stood-down']);
  });
});
