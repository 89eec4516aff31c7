import { describe, expect, it, vi } from 'vitest';
import { docKey } from '../../domain/book/documents/document';
import { standingReading } from '../../domain/book/documents/reading';
import { unliftedStandDowns } from '../../domain/book/documents/rig';
import { modelReading, modelSpec } from '../fakes/model-lab';
import { exchange, labOf, newWorld, openTab, signIn } from '../fakes/tablet';
import { settle } from '../fakes/virtual-time';
import type { LabClient } from '../lab-client';
import type { EntryDraft } from '../store/entry-draft';

vi.setConfig({ testTimeout: 30_000 });

const unready = { missing: [{ code: 'x', words: 'x' }], why: 'x' };

async function bench(name: 'Ada' | 'Milo' = 'Ada') {
  const world = newWorld();
  const browser = world.newBrowser();
  const { client } = await openTab(browser);
  const lab = await signIn(client, name);
  await exchange(lab);
  return { world, browser, client, lab, model: world.lab };
}

async function log(lab: LabClient, draft: EntryDraft): Promise<string> {
  const outcome = await lab.append(draft);
  if (outcome.type !== 'logged') throw new Error(outcome.words);
  return outcome.entry.id;
}

async function readings(lab: LabClient, firing: string) {
  lab.view.children('reading', firing);
  await settle();
  return lab.view.children('reading', firing).documents;
}

describe('what waits, folded over the mirror', () => {
  it('lets a tightening rule at once and a loosening not before it is applied', async () => {
    const { lab, model } = await bench('Milo');
    const { rig } = model;
    const down = await log(lab, { kind: 'rig.stood-down', subject: rig, body: { why: 'arc' } });
    const standing = () => unliftedStandDowns(lab.view.doc('rig', rig)!).length;
    expect(standing()).toBe(1);
    await log(lab, { kind: 'rig.returned', subject: rig, body: { lifts: [down], words: 'mended' } });
    expect(standing()).toBe(1);
    const max_kV = () => lab.view.doc('rig', rig)!.revisions.at(-1)!.spec.envelope.max_kV;
    await log(lab, {
      kind: 'rig.revised',
      subject: rig,
      body: { based_on: rig, spec: modelSpec({ max_kV: 20 }), why: 'higher' },
    });
    expect(max_kV()).toBe(16);
    await log(lab, {
      kind: 'rig.revised',
      subject: rig,
      body: { based_on: rig, spec: modelSpec({ max_kV: 10 }), why: 'lower' },
    });
    expect(max_kV()).toBe(10);
    expect(await exchange(lab)).toBe('quiet');
    expect(standing()).toBe(0);
    expect(lab.view.doc('rig', rig)).toEqual(
      model.server.book.documents.get(docKey({ kind: 'rig', id: rig })),
    );
  });

  it('takes back a stand-down of the same page life within two minutes, offline', async () => {
    const { world, lab, model } = await bench();
    const { rig } = model;
    const down = await log(lab, { kind: 'rig.stood-down', subject: rig, body: { why: 'slip' } });
    await world.time.pass(119_000);
    await log(lab, {
      kind: 'rig.stand-down-retracted',
      subject: rig,
      body: { stand_down: down, incident: null },
    });
    expect(unliftedStandDowns(lab.view.doc('rig', rig)!)).toEqual([]);
    const late = await log(lab, { kind: 'rig.stood-down', subject: rig, body: { why: 'slip' } });
    await world.time.pass(121_000);
    const outcome = await lab.append({
      kind: 'rig.stand-down-retracted',
      subject: rig,
      body: { stand_down: late, incident: null },
    });
    expect(outcome).toMatchObject({ forecast: { verdict: 'irregular', reason: { code: 'too-late' } } });
    expect(unliftedStandDowns(lab.view.doc('rig', rig)!)).toHaveLength(1);
  });

  it('shows readings and their corrections before and after they were handed over alike', async () => {
    const { lab, model } = await bench();
    const firing = await log(lab, {
      kind: 'firing.opened',
      body: { rig: model.rig, rig_revision: model.rig, check: null, permit: null, unready },
    });
    const reading = await log(lab, {
      kind: 'firing.reading',
      subject: firing,
      body: modelReading({ shots: 5 }),
    });
    const correct = (shots: number): EntryDraft => ({
      kind: 'entry.corrected',
      subject: firing,
      body: { corrects: reading, kind: 'firing.reading', body: modelReading({ shots }), why: 'miscounted' },
    });
    expect((await lab.append(correct(7))).type).toBe('logged');
    const shown = async () => (await readings(lab, firing)).map((one) => standingReading(one));
    const before = await shown();
    expect(before).toMatchObject([{ type: 'stands', corrected: true, values: { shots: 7 } }]);
    expect(lab.view.doc('firing', firing)).toMatchObject({ shots: 7, readings: 1 });
    await exchange(lab);
    expect(await shown()).toEqual(before);
    expect((await readings(lab, firing))[0]?.logged.at).not.toBeNull();
    // A correction of what the mirror holds already is found there, not in what waits.
    await lab.append(correct(9));
    expect(await shown()).toMatchObject([{ type: 'parted' }]);
  });

  it('says beforehand what would be said of an entry, and writes nothing', async () => {
    const { lab, model } = await bench();
    const { rig } = model;
    const ready: EntryDraft = {
      kind: 'firing.opened',
      body: { rig, rig_revision: rig, check: null, permit: null, unready: null },
    };
    expect(await lab.judge(ready)).toMatchObject({ verdict: 'irregular', reason: { code: 'no-check' } });
    expect(await lab.judge({ kind: 'gas.changed', subject: rig, body: { words: 'new bottle' } })).toEqual({
      verdict: 'applied',
      reason: null,
    });
    expect(await lab.store.allOwn()).toEqual([]);
  });

  it('gives the same object until it changes, as React asks', async () => {
    const { lab, model } = await bench();
    const before = {
      rigs: lab.view.list('rig'),
      rig: lab.view.doc('rig', model.rig),
      sheets: lab.view.list('sheet'),
    };
    expect(lab.view.list('rig')).toBe(before.rigs);
    await log(lab, { kind: 'hands.in', subject: model.rig, body: { where: '' } });
    expect(lab.view.list('rig')).not.toBe(before.rigs);
    expect(lab.view.doc('rig', model.rig)).not.toBe(before.rig);
    expect(lab.view.list('sheet')).toBe(before.sheets);
  });
});

describe('a second tab of the same browser', () => {
  it('sees what the first one logs, and both count the same as waiting', async () => {
    const { browser, client, lab, model } = await bench();
    const second = labOf((await openTab(browser)).client);
    await log(lab, { kind: 'hands.in', subject: model.rig, body: { where: 'at the gap' } });
    await log(second, { kind: 'hands.in', subject: model.rig, body: { where: 'at the channel' } });
    await settle(300);
    for (const one of [lab, second]) {
      expect(one.view.doc('rig', model.rig)?.hands).toHaveLength(2);
      expect(one.view.waiting().count).toBe(2);
    }
    await exchange(second);
    await settle(300);
    expect(lab.view.doc('rig', model.rig)?.hands.map((tag) => tag.at !== null)).toEqual([true, true]);
    expect(lab.view.waiting().count).toBe(0);
    await client.close();
  });
});

describe('a mirror of another fold version', () => {
  it('reads as filling, is filled anew, and is ready again', async () => {
    const { browser, client, lab } = await bench();
    const { database } = lab.mirror;
    const row = await database.meta.get('cursor');
    if (row !== undefined) await database.meta.put({ ...row, fold_version: 0 });
    await client.close();
    const again = labOf((await openTab(browser)).client);
    expect(again.view.filling()).toBe(true);
    expect(await exchange(again)).toBe('quiet');
    expect(again.view.filling()).toBe(false);
  });
});
