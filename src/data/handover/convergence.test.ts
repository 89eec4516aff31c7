import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { runEffect, mapStore } from '../../domain/book/documents/effect';
import type { Document } from '../../domain/book/documents/document';
import { foldEntry } from '../../domain/book/fold';
import type { NetFault } from '../fakes/model-server';
import { modelReading } from '../fakes/model-lab';
import type { MemoryBrowser } from '../fakes/memory-browser';
import { exchange, labOf, newWorld, openTab, signIn, type OpenTab, type World } from '../fakes/tablet';
import { restoreBook } from '../fakes/model-book';
import { uuidFromBytes } from '../../domain/book/ids';
import { seededBytes } from '../fakes/chance';
import { settle } from '../fakes/virtual-time';
import type { EntryDraft } from '../store/entry-draft';

/** Protocol 7: logged here, then on the server exactly once, and the same documents everywhere, whatever goes wrong. */

interface Tablet {
  readonly name: 'Ada' | 'Milo';
  readonly browser: MemoryBrowser;
  /** Two tabs of one browser. */
  tabs: readonly [OpenTab, OpenTab];
}

type Step =
  | { readonly type: 'append'; readonly tablet: number; readonly tab: number; readonly what: number }
  | {
      readonly type: 'exchange';
      readonly tablet: number;
      readonly tab: number;
      readonly faults: readonly NetFault[];
    }
  /** Both tabs of a browser at once, as when one was taken for dead. */
  | { readonly type: 'together'; readonly tablet: number }
  | { readonly type: 'kill'; readonly tablet: number }
  | { readonly type: 'empty'; readonly tablet: number }
  | { readonly type: 'pass'; readonly minutes: number }
  | { readonly type: 'restore'; readonly lost: number };

const TABLETS = 2;
const tablet = fc.nat({ max: TABLETS - 1 });
const fault = fc.constantFrom<NetFault>(
  'none',
  'none',
  'lose-request',
  'lose-answer',
  'portal',
  'foreign-413',
);
const step: fc.Arbitrary<Step> = fc.oneof(
  {
    weight: 8,
    arbitrary: fc.record({
      type: fc.constant('append' as const),
      tablet,
      tab: tablet,
      what: fc.nat({ max: 9 }),
    }),
  },
  {
    weight: 5,
    arbitrary: fc.record({
      type: fc.constant('exchange' as const),
      tablet,
      tab: tablet,
      faults: fc.array(fault, { maxLength: 6 }),
    }),
  },
  { weight: 2, arbitrary: fc.record({ type: fc.constant('together' as const), tablet }) },
  { weight: 1, arbitrary: fc.record({ type: fc.constant('kill' as const), tablet }) },
  { weight: 1, arbitrary: fc.record({ type: fc.constant('empty' as const), tablet }) },
  { weight: 1, arbitrary: fc.record({ type: fc.constant('pass' as const), minutes: fc.nat({ max: 90 }) }) },
  {
    weight: 2,
    arbitrary: fc.record({ type: fc.constant('restore' as const), lost: fc.integer({ min: 1, max: 6 }) }),
  },
);

const RUNS = Number(process.env['HOLDOFF_SEEDS'] ?? 8);

describe('any order, loss, repetition, crash and restore', () => {
  it(
    'ends with every logged entry in the Book once and the same documents everywhere',
    { timeout: 600_000 },
    async () => {
      await fc.assert(
        fc.asyncProperty(
          fc.array(step, { minLength: 10, maxLength: 40, size: 'max' }),
          fc.nat(),
          async (steps, seed) => {
            await play(steps, seed);
          },
        ),
        { numRuns: RUNS, endOnFailure: false, interruptAfterTimeLimit: 500_000 },
      );
    },
  );
});

async function play(steps: readonly Step[], seed: number): Promise<void> {
  const world = newWorld(seed);
  const tablets: Tablet[] = [];
  for (const name of ['Ada', 'Milo'] as const) {
    const browser = world.newBrowser();
    const first = await openTab(browser);
    await exchange(await signIn(first.client, name));
    tablets.push({ name, browser, tabs: [first, await openTab(browser)] });
  }
  const story: Story = { logged: [], seed, backed_up: world.lab.server.book.entries.length };
  for (const one of steps) await take(world, tablets, { step: one, story });
  await comeToRest(world, tablets);
  await check(world, tablets, story.logged);
  for (const { tabs } of tablets) for (const { client } of tabs) await client.close();
}

interface Story {
  readonly logged: string[];
  readonly seed: number;
  /** No restore goes back behind this revision; what the founding wrote is in every backup. */
  backed_up: number;
}

interface Taking {
  readonly step: Step;
  readonly story: Story;
}

async function reopen(tablet: Tablet, anew: boolean): Promise<void> {
  const first = await openTab(tablet.browser);
  if (anew) await signIn(first.client, tablet.name);
  tablet.tabs = [first, await openTab(tablet.browser)];
}

/** Whether the server no longer has something that it once acknowledged to this tablet. */
async function hasLost({ lab }: World, { tabs }: Tablet): Promise<boolean> {
  const rows = await labOf(tabs[0].client).store.allOwn();
  const ids = new Set(lab.server.book.entries.map((one) => one.entry.id));
  return rows.some((row) => row.state !== 'waiting' && !ids.has(row.id));
}

async function take(world: World, tablets: readonly Tablet[], { step: one, story }: Taking): Promise<void> {
  if (one.type === 'pass') {
    await world.time.pass(one.minutes * 60_000);
    return;
  }
  if (one.type === 'restore') {
    const { book } = world.lab.server;
    const kept = Math.max(story.backed_up, book.entries.length - one.lost);
    restoreBook(book, Math.min(kept, book.entries.length), uuidFromBytes(seededBytes(story.seed + kept)(16)));
    return;
  }
  const chosen = tablets[one.tablet]!;
  if (one.type === 'kill' || one.type === 'empty') {
    for (const { tab } of chosen.tabs) tab.kill();
    await settle();
    if (one.type === 'empty') {
      // A tablet that lost its store cannot give back what the server loses as well: one of the two is promised.
      if (await hasLost(world, chosen)) return await reopen(chosen, false);
      story.backed_up = world.lab.server.book.entries.length;
      chosen.browser.emptyIndexedDb();
    }
    await reopen(chosen, one.type === 'empty');
    return;
  }
  if (one.type === 'together') {
    await Promise.all(chosen.tabs.map(({ client }) => exchange(labOf(client))));
    return;
  }
  const lab = labOf(chosen.tabs[one.tab === 0 ? 0 : 1].client);
  if (one.type === 'append') {
    const draft = draftFor(
      world,
      lab.view.list('firing').filter((firing) => firing.closed === null),
      one,
    );
    const author = one.tablet === 0 ? world.lab.ada : world.lab.milo;
    const outcome = await lab.append({ ...draft, author });
    expect(outcome.type).toBe('logged');
    if (outcome.type === 'logged') story.logged.push(outcome.entry.id);
    return;
  }
  const faults = [...one.faults];
  world.lab.server.fault = () => faults.shift() ?? 'none';
  await exchange(lab);
  world.lab.server.fault = () => 'none';
}

function draftFor(
  { lab }: World,
  open: readonly { readonly id: string }[],
  { what }: { readonly what: number },
): EntryDraft {
  const firing = open[what % Math.max(1, open.length)]?.id;
  if (what < 2 || firing === undefined) {
    const unready = { missing: [{ code: 'no-check', words: 'No check.' }], why: 'trial' };
    return {
      kind: 'firing.opened',
      body: { rig: lab.rig, rig_revision: lab.rig, check: null, permit: null, unready },
    };
  }
  if (what < 6) return { kind: 'firing.reading', subject: firing, body: modelReading({ shots: what }) };
  if (what === 6) return { kind: 'firing.closed', subject: firing, body: { summary: '' } };
  if (what === 7) return { kind: 'rig.stood-down', subject: lab.rig, body: { why: 'trial' } };
  if (what === 8) return { kind: 'hands.in', subject: lab.rig, body: { where: '' } };
  return { kind: 'firing.sent-back', subject: firing, body: { words: 'More readings, please.' } };
}

/** Quiet: no more faults, and everybody exchanges until nothing moves. Two rounds each bring the other's last entries. */
async function comeToRest(world: World, tablets: readonly Tablet[]): Promise<void> {
  world.lab.server.fault = () => 'none';
  for (let round = 0; round < 3; round += 1)
    for (const { tabs } of tablets)
      for (const { client } of tabs) {
        expect(await exchange(labOf(client))).toBe('quiet');
        await settle();
      }
}

async function check(world: World, tablets: readonly Tablet[], logged: readonly string[]): Promise<void> {
  const { book } = world.lab.server;
  const ids = book.entries.map((one) => one.entry.id);
  expect(new Set(ids).size).toBe(ids.length);
  expect(logged.filter((id) => !ids.includes(id))).toEqual([]);
  for (const device of book.devices.values()) {
    const seqs = book.entries.filter((one) => one.entry.device === device.id).map((one) => one.entry.seq);
    // What moved to a new tablet may stand in the Book under the old one, so only the order is asked.
    expect(seqs).toEqual([...new Set(seqs)].sort((a, b) => a - b));
  }
  const replayed = new Map<string, Document>();
  for (const { entry, verdict, reason, revision } of book.entries)
    if (!('stub' in entry)) runEffect(foldEntry(entry, { verdict, reason, revision }), mapStore(replayed));
  expect(book.documents).toEqual(replayed);
  for (const { client } of tablets.flatMap(({ tabs }) => tabs)) {
    const lab = labOf(client);
    expect(lab.view.waiting().count).toBe(0);
    const rows = await lab.mirror.database.documents.toArray();
    expect(new Map(rows.map((row) => [row.key, row.doc]))).toEqual(replayed);
    for (const firing of lab.view.list('firing')) expect(firing).toEqual(replayed.get(`firing/${firing.id}`));
    const own = await lab.store.allOwn();
    for (const row of own) {
      const judged = book.entries.find((one) => one.entry.id === row.id);
      expect([row.state, row.revision]).toEqual([judged?.verdict, judged?.revision]);
    }
  }
}
