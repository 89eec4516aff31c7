import type { Locator, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { KETTLE } from '../../seeds/rigs/kettle';
import {
  goTo,
  holdHalfSecond,
  holdSecond,
  keyIn,
  press,
  signInFirst,
  takeRig,
  unlock,
} from './support/hands';
import { openLabServer, type LabServer, type SignIn } from './support/lab-server';
import { openTablet, type Tablet } from './support/tablet';

/**
 * Logging with the network cut: what a bench notes now and then, bursts counted by rate and time through a kill, the
 * foot key, the rig's own curve, the summary and two firings side by side.
 */
let lab: LabServer;
let tablet: Tablet;
let ada: SignIn;

beforeAll(async () => {
  lab = await openLabServer();
  const found = lab.signIns.find((one) => one.role === 'operator');
  if (found === undefined) throw new Error('no demo sign-in for an operator');
  ada = found;
  tablet = await openTablet(lab.url);
  const page = tablet.page();
  await signInFirst(page, ada);
  await takeRig(page, 'Kettle');
  await goTo(page, 'Firings');
  await press(page.getByRole('link', { name: /^Own curve/ }));
  await page.getByRole('group', { name: 'Fit' }).waitFor({ timeout: 60_000 });
  await page.evaluate(async () => (await navigator.serviceWorker.ready).scope);
  await tablet.cutNetwork(true);
}, 240_000);

afterAll(async () => {
  await tablet?.close();
  await lab?.close();
});

describe('the rig’s own curve, offline', () => {
  it('says from what it was fitted, how sure, and what it does not decide', async () => {
    const page = tablet.page();
    await arrive(page, `/firings/calibration/${KETTLE.id}`, page.getByRole('group', { name: 'Fit' }));
    const text = (await page.getByRole('main').innerText()).replace(/\s+/g, ' ');
    expect(text).toMatch(/Scale, own over law [\d.]+ \([\d.]+ to [\d.]+\)/);
    expect(text).toContain('stays with the law’s low side');
    expect(text).toMatch(/drift|Self-break is/i);
    expect(text).toMatch(/Not used: .*not measured at self-break/);
    expect(text).not.toMatch(/NaN|Infinity/);
  });
});

describe('a firing, offline', () => {
  it('logs spot, trigger, channel gas and dye, and carries them over', async () => {
    const page = tablet.page();
    await recordUnready(page);
    await press(page.getByRole('button', { name: /^Voltage was/ }));
    await press(page.getByRole('radio', { name: 'self-break' }));
    for (const [label, text] of [
      ['Voltage', '18.8'],
      ['Pressure', '1.0'],
      ['Shots in burst', '40'],
      ['Rate', '5'],
    ] as const)
      await typeInto(page, label, text);
    await press(page.getByRole('radio', { name: 'even', exact: true }));

    await press(page.getByRole('button', { name: /^Spot by eye/ }));
    await typeInto(page, 'Attenuators', '4');
    await press(page.getByRole('button', { name: /^Eye scale/ }));
    await press(page.getByRole('radio', { name: /^3, clear/ }));
    await press(page.getByRole('button', { name: /^Beam position/ }));
    await press(page.getByRole('button', { name: '1 mm right' }));
    await press(page.getByRole('button', { name: '1 mm right' }));
    await press(page.getByRole('button', { name: '1 mm down' }));
    await page.getByRole('group', { name: /^Beam position: \+2, \u22121/ }).waitFor();
    await press(page.getByRole('button', { name: 'Done', exact: true }));
    await press(page.getByRole('button', { name: /^Spot by eye/ }));
    await press(page.getByRole('button', { name: /^Channel gas and dye/ }));
    await press(page.getByRole('button', { name: /^Channel gas –|^Channel gas not|^Channel gas\s*not/ }));
    await press(page.getByRole('radio', { name: 'air', exact: true }));
    await press(page.getByRole('button', { name: /^Dye batch/ }));
    await page.getByRole('textbox', { name: 'Batch of the dye' }).fill('R6G 14');
    await press(page.getByRole('button', { name: 'Done', exact: true }));
    await holdHalfSecond(page.getByRole('button', { name: 'Hold to log' }));
    await page.getByRole('group', { name: 'Reading 1 against the law' }).waitFor();
    expect(await lastBody(page, 'firing.reading')).toMatchObject({
      output_attenuators: 4,
      output_eye: 3,
      beam_x_mm: 2,
      beam_y_mm: -1,
      channel_gas: 'air',
      dye_batch: 'R6G 14',
    });
    await holdHalfSecond(page.getByRole('button', { name: 'Hold to log' }));
    await page.getByRole('group', { name: 'Reading 2 against the law' }).waitFor();
    const again = await lastBody(page, 'firing.reading');
    expect(again['carried_over']).toEqual(
      expect.arrayContaining(['output_attenuators', 'beam_x_mm', 'dye_batch']),
    );
  });

  it('counts a burst by rate and time, also one that a kill interrupts', async () => {
    let page = tablet.page();
    await holdHalfSecond(page.getByRole('button', { name: 'Start burst' }));
    await page.getByText(/^burst runs: \d+ shots? at 5/).waitFor();
    await page.waitForTimeout(2000);
    await holdHalfSecond(page.getByRole('button', { name: 'Stop burst' }));
    await page.getByText(/shots at 5\u2009Hz logged/).waitFor();
    const first = await lastBody(page, 'firing.shots-counted');
    expect(first['rate_Hz']).toBe(5);
    expect(first['shots']).toBeGreaterThanOrEqual(10);

    await holdHalfSecond(page.getByRole('button', { name: 'Start burst' }));
    await page.waitForTimeout(4000);
    await tablet.kill();
    await tablet.open(`${lab.url}/`);
    await tablet.cutNetwork(true);
    page = tablet.page();
    await page.getByText(/^burst was running when the app went away: \d+ shots/).waitFor();
    await holdHalfSecond(page.getByRole('button', { name: 'Count burst' }));
    await page.getByRole('button', { name: 'Start burst' }).waitFor();
    expect((await lastBody(page, 'firing.shots-counted'))['shots']).toBeGreaterThanOrEqual(5);
  });

  it('starts and stops a burst by foot where the setting says so', async () => {
    const page = tablet.page();
    const there = page.url();
    const setting = page.getByRole('radio', { name: 'starts and stops a burst' });
    await arrive(page, '/settings', setting);
    await press(setting);
    await arrive(page, new URL(there).pathname, page.getByRole('button', { name: 'Start burst' }));
    await foot(page);
    await page.getByRole('button', { name: 'Stop burst' }).waitFor();
    await foot(page);
    await page.getByRole('button', { name: 'Start burst' }).waitFor();
  });

  it('is summed up when it is closed, and stands beside the one before', async () => {
    const page = tablet.page();
    await holdSecond(page.getByRole('button', { name: 'Close firing' }));
    await press(page.getByText('Summary and wear'));
    const summary = page.getByRole('table', { name: 'Summary of the firing' });
    expect((await summary.innerText()).replace(/\s+/g, ' ')).toMatch(/Attenuators, a count 4/);
    await press(page.getByRole('link', { name: /^Compare with/ }));
    await page.getByRole('heading', { name: / beside / }).waitFor();
    const text = await page.getByRole('main').innerText();
    expect(text).toContain('Self-break, mean');
    expect(text).not.toMatch(/NaN|Infinity/);
  });
});

/** Opens an address and unlocks the tablet where it asks for the PIN; with a firing open it does not. */
async function arrive(page: Page, path: string, shown: Locator): Promise<void> {
  await page.goto(`${lab.url}${path}`);
  const pin = page.getByRole('radio', { name: ada.name, exact: true });
  await pin.or(shown).first().waitFor();
  if (await pin.isVisible()) await unlock(page, ada.name);
  await shown.waitFor();
}

async function recordUnready(page: Page): Promise<void> {
  const reason = page.getByLabel(/^Reason for recording it as unready/);
  await arrive(page, `/firings/open/${KETTLE.id}`, reason);
  await reason.fill('A test of the logging alone');
  await holdHalfSecond(page.getByRole('button', { name: 'Record as unready' }));
  await page.getByRole('button', { name: 'Hold to log' }).waitFor();
}

async function typeInto(page: Page, label: string, text: string): Promise<void> {
  const active = page.getByRole('group', { name: label, exact: true });
  if (!(await active.isVisible()))
    await press(page.getByRole('button', { name: new RegExp(`^${label}`) }).first());
  if (!(await page.locator('.keypad').isVisible())) await page.locator('.quantity-value').click();
  await keyIn(page, text);
}

async function foot(page: Page): Promise<void> {
  await page.keyboard.down('PageDown');
  await page.waitForTimeout(500);
  await page.keyboard.up('PageDown');
}

/** Body of the newest own entry of a kind, read past the app. */
function lastBody(page: Page, kind: string): Promise<Record<string, unknown>> {
  return page.evaluate(async (wanted) => {
    const names = (await indexedDB.databases())
      .map((one) => one.name ?? '')
      .filter((name) => name.startsWith('book-'));
    const found: { seq: number; body: string }[] = [];
    for (const name of names) {
      const database = await new Promise<IDBDatabase>((resolve, reject) => {
        const open = indexedDB.open(name);
        open.onsuccess = () => resolve(open.result);
        open.onerror = () => reject(open.error ?? new Error('could not open'));
      });
      const all = await new Promise<unknown[]>((resolve, reject) => {
        const request = database.transaction('entries').objectStore('entries').getAll();
        request.onsuccess = () => resolve(request.result as unknown[]);
        request.onerror = () => reject(request.error ?? new Error('could not read'));
      });
      for (const row of all) {
        const entry = ((row as { entry?: unknown }).entry ?? row) as {
          seq: number;
          kind: string;
          body: string;
        };
        if (entry.kind === wanted) found.push(entry);
      }
      database.close();
    }
    const last = found.sort((a, b) => a.seq - b.seq).at(-1);
    return JSON.parse(last?.body ?? '{}') as Record<string, unknown>;
  }, kind);
}
