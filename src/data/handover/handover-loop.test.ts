import { describe, expect, it, vi } from 'vitest';
import { labOf, newWorld, openTab, signIn } from '../fakes/tablet';
import type { LabClient } from '../lab-client';

// Virtual minutes are hundreds of rounds, each with real database work.
vi.setConfig({ testTimeout: 60_000 });

async function running() {
  const world = newWorld();
  const browser = world.newBrowser();
  const open = await openTab(browser, true);
  const lab = await signIn(open.client, 'Ada');
  await world.time.pass(100);
  return { world, browser, ...open, lab };
}

function pushes(world: ReturnType<typeof newWorld>): number {
  return world.lab.server.paths.filter((path) => path.includes('/push')).length;
}

async function standDown(lab: LabClient, rig: string): Promise<void> {
  const outcome = await lab.append({ kind: 'rig.stood-down', subject: rig, body: { why: 'trial' } });
  expect(outcome.type).toBe('logged');
}

describe('the handover by itself', () => {
  it('fills the Book after the sign-in and hands over what is logged without a touch', async () => {
    const { world, lab, client } = await running();
    expect(lab.view.filling()).toBe(false);
    expect(lab.handover.status()).toMatchObject({ state: 'idle', waiting: 0 });
    await standDown(lab, world.lab.rig);
    await world.time.pass(2000);
    expect(lab.view.waiting().count).toBe(0);
    expect(pushes(world)).toBe(1);
    await client.close();
  });

  it('says what waits while there is no network, backs off, and goes on by itself', async () => {
    const { world, lab, client } = await running();
    world.lab.server.fault = () => 'lose-request';
    await standDown(lab, world.lab.rig);
    await world.time.pass(5000);
    expect(lab.handover.status()).toMatchObject({
      state: 'no-network',
      waiting: 1,
      words: 'No network. 1 entry on this tablet only.',
    });
    const asked = world.lab.server.paths.length;
    await world.time.pass(10 * 60_000);
    // At most one try a minute, at least one in two: never silent, never hammering.
    const tries = world.lab.server.paths.length - asked;
    expect(tries).toBeGreaterThanOrEqual(10);
    expect(tries).toBeLessThanOrEqual(26);
    world.lab.server.fault = () => 'none';
    await world.time.pass(61_000);
    expect(lab.handover.status()).toMatchObject({ state: 'idle', waiting: 0 });
    await client.close();
  });

  it('tries at once when the network says that it is back', async () => {
    const { world, lab, tab, client } = await running();
    world.lab.server.fault = () => 'lose-request';
    await standDown(lab, world.lab.rig);
    await world.time.pass(5 * 60_000);
    world.lab.server.fault = () => 'none';
    tab.say('online');
    await world.time.pass(100);
    expect(lab.view.waiting().count).toBe(0);
    await client.close();
  });

  it('tries soon after an entry, but not once per entry', async () => {
    const { world, lab, client } = await running();
    world.lab.server.fault = () => 'lose-request';
    await world.time.pass(10 * 60_000);
    const asked = world.lab.server.paths.length;
    for (let count = 0; count < 20; count += 1) {
      await standDown(lab, world.lab.rig);
      await world.time.pass(200);
    }
    expect(world.lab.server.paths.length - asked).toBeLessThanOrEqual(3);
    expect(world.lab.server.paths.length - asked).toBeGreaterThanOrEqual(1);
    await client.close();
  });

  it('pauses with "sign in to send" once the tablet’s session is refused, and goes on after a sign-in', async () => {
    const { world, lab, client } = await running();
    const record = lab.device();
    await lab.adoptDevice({ ...record, keys: null }, world.lab.server.book.epoch);
    await standDown(lab, world.lab.rig);
    await world.time.pass(2000);
    expect(lab.handover.status().state).toBe('sign-in-to-send');
    expect(lab.handover.status().words).toContain('Sign in to send.');
    await signIn(client, 'Ada');
    await world.time.pass(2000);
    expect(lab.view.waiting().count).toBe(0);
    await client.close();
  });
});

describe('two tabs of one browser', () => {
  it('have one exchanger, and both see what either of them logs', async () => {
    const { world, browser, client, lab } = await running();
    const second = await openTab(browser, true);
    const other = labOf(second.client);
    await world.time.pass(100);
    expect(other.handover.status().state).toBe('other-tab');
    await standDown(other, world.lab.rig);
    await world.time.pass(2000);
    expect(pushes(world)).toBe(1);
    for (const one of [lab, other]) {
      expect(one.view.waiting().count).toBe(0);
      expect(one.view.doc('rig', world.lab.rig)).toEqual(
        world.lab.server.book.documents.get(`rig/${world.lab.rig}`),
      );
    }
    await second.client.close();
    await client.close();
  });

  it('hand the exchange on when the holder dies', async () => {
    const { world, browser, tab } = await running();
    const second = await openTab(browser, true);
    const third = await openTab(browser, true);
    tab.kill();
    await world.time.pass(1000);
    const states = () => [second, third].map(({ client }) => labOf(client).handover.status().state).sort();
    expect(states()).toEqual(['idle', 'other-tab']);
    await second.client.close();
    await world.time.pass(1000);
    expect(labOf(third.client).handover.status().state).toBe('idle');
    await third.client.close();
  });

  it('take it from a holder that has been silent for 30 s, but only where somebody looks', async () => {
    const { world, browser, tab } = await running();
    const second = await openTab(browser, true);
    second.tab.setVisible(false);
    tab.freeze();
    await world.time.pass(60_000);
    expect(labOf(second.client).handover.status().state).toBe('other-tab');
    second.tab.setVisible(true);
    await world.time.pass(10_000);
    expect(labOf(second.client).handover.status().state).toBe('idle');
    await second.client.close();
  });
});
