import { randomInt } from 'node:crypto';
import type { Page } from 'playwright-core';
import { afterAll, beforeAll, expect, it } from 'vitest';
import { openCutDisk, type CutDisk } from './support/cut-disk';
import { holdSecond, signInFirst, unlock } from './support/hands';
import { openLabServer, type LabServer } from './support/lab-server';
import { ownEntries } from './support/own-entries';
import { openTablet, TABLET, type Tablet } from './support/tablet';

/**
 * Emulated power cuts: the browser is frozen, its disk is taken as it is, and everything goes on from that. What the screen
 * had acknowledged must be there. The control writes rows with the browser's own default durability and must lose some:
 * it shows that a cut is a cut. No cut in ten losing an entry means under 3 in 10 at 95 %; longer campaigns take more.
 */
const CUTS = Number(process.env['HOLDOFF_CUTS'] ?? 10);
const ACTS_A_CUT = 2;

let lab: LabServer;
let disk: CutDisk;
let tablet: Tablet;

beforeAll(async () => {
  lab = await openLabServer();
  disk = await openCutDisk();
  tablet = await openTablet(lab.url, TABLET, disk.folder);
}, 180_000);

afterAll(async () => {
  await tablet?.close();
  await disk?.close();
  await lab?.close();
});

it(
  'keeps every entry that the screen acknowledged through power cuts, where default durability loses',
  async () => {
    const [ada] = lab.signIns.filter((one) => one.role === 'operator');
    if (ada === undefined) throw new Error('no operator among the demo sign-ins');
    await signInFirst(tablet.page(), ada);
    await lab.killServer();
    await tablet.page().waitForTimeout(2000);
    await disk.settle();
    const acknowledged: string[] = [];
    const control = { written: 0, kept: 0 };
    for (let cut = 0; cut < CUTS; cut += 1) {
      for (let act = 0; act < ACTS_A_CUT; act += 1) await handsAct(tablet.page());
      const now = await idsOf(tablet.page());
      expect(now.length).toBeGreaterThanOrEqual(acknowledged.length + ACTS_A_CUT);
      acknowledged.splice(0, acknowledged.length, ...now);
      control.written += await writeControl(tablet.page(), cut);
      await tablet.page().waitForTimeout(randomInt(40));
      tablet.freeze();
      const { resume } = await disk.cut();
      await tablet.kill();
      await resume();
      await tablet.open(`${lab.url}/`);
      await unlock(tablet.page(), ada.name);
      await tablet.page().getByRole('button', { name: 'Stand rig down' }).waitFor();
      const kept = await idsOf(tablet.page());
      expect(kept.slice(0, acknowledged.length)).toEqual(acknowledged);
      control.kept += await countControl(tablet.page(), cut);
    }
    process.stdout.write(
      `emulated power cuts: ${String(CUTS)}; entries acknowledged ${String(acknowledged.length)}, lost 0; control rows ${String(control.written)}, lost ${String(control.written - control.kept)}\n`,
    );
    expect(acknowledged).toHaveLength(CUTS * ACTS_A_CUT);
    expect(control.kept).toBeLessThan(control.written);
  },
  CUTS * 60_000,
);

/** Hands in where nobody's are, hands out where they are; done when the screen offers the opposite. */
async function handsAct(page: Page): Promise<void> {
  const out = page.getByRole('button', { name: 'Hands out', exact: true });
  const into = page.getByRole('button', { name: 'Hands in', exact: true });
  await out.or(into).first().waitFor();
  const [before, after] = (await out.isVisible()) ? [out, into] : [into, out];
  await holdSecond(before);
  await after.waitFor();
}

async function idsOf(page: Page): Promise<readonly string[]> {
  return (await ownEntries(page)).map((row) => row.id);
}

/** Rows in the same origin with what the browser does by default, each acknowledged by its transaction. */
function writeControl(page: Page, cut: number): Promise<number> {
  return page.evaluate(async (round) => {
    const database = await new Promise<IDBDatabase>((resolve, reject) => {
      const open = indexedDB.open('control', 1);
      open.onupgradeneeded = () => open.result.createObjectStore('rows');
      open.onsuccess = () => resolve(open.result);
      open.onerror = () => reject(open.error ?? new Error('could not open'));
    });
    for (let row = 0; row < 50; row += 1) {
      await new Promise<void>((resolve, reject) => {
        const transaction = database.transaction('rows', 'readwrite');
        transaction.objectStore('rows').put('written', round * 1000 + row);
        transaction.oncomplete = () => resolve();
        transaction.onabort = () => reject(transaction.error ?? new Error('aborted'));
      });
    }
    database.close();
    return 50;
  }, cut);
}

function countControl(page: Page, cut: number): Promise<number> {
  return page.evaluate(async (round) => {
    const database = await new Promise<IDBDatabase>((resolve, reject) => {
      const open = indexedDB.open('control', 1);
      open.onupgradeneeded = () => open.result.createObjectStore('rows');
      open.onsuccess = () => resolve(open.result);
      open.onerror = () => reject(open.error ?? new Error('could not open'));
    });
    const count = await new Promise<number>((resolve, reject) => {
      const range = IDBKeyRange.bound(round * 1000, round * 1000 + 999);
      const request = database.transaction('rows').objectStore('rows').count(range);
      request.onsuccess = () => resolve(request.result);
      request.onerror = () => reject(request.error ?? new Error('could not count'));
    });
    database.close();
    return count;
  }, cut);
}
