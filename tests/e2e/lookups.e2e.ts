import type { Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { LOOKUPS } from '../../src/domain/lookup/lookups';
import { seededRandom } from '../lookups/random-values';
import { goTo, holdHalfSecond, keyIn, press, signInFirst, takeRig, unlock } from './support/hands';
import { openLabServer, type LabServer, type SignIn } from './support/lab-server';
import { ownEntries } from './support/own-entries';
import { drawHands, playHands } from './support/random-hands';
import { openTablet, PHONE, TABLET, type Tablet } from './support/tablet';

/** Every lookup with the server dead and the network cut, at tablet and phone size. */
const SEED = 4;
const INPUTS = { tablet: 200, phone: 40 } as const;

let lab: LabServer;
const opened: Partial<Record<keyof typeof INPUTS, { readonly tablet: Tablet; readonly who: SignIn }>> = {};

const at = (size: keyof typeof INPUTS) => {
  const found = opened[size];
  if (found === undefined) throw new Error(`no ${size} was opened`);
  return found;
};
const pageOf = (size: keyof typeof INPUTS): Page => at(size).tablet.page();

beforeAll(async () => {
  lab = await openLabServer();
  for (const [size, px, role] of [
    ['tablet', TABLET, 'operator'],
    ['phone', PHONE, 'reviewer'],
  ] as const) {
    const who = lab.signIns.find((one) => one.role === role);
    if (who === undefined) throw new Error(`no demo sign-in for ${role}`);
    const tablet = await openTablet(lab.url, px);
    opened[size] = { tablet, who };
    await signInFirst(tablet.page(), who);
    await tablet.page().evaluate(async () => (await navigator.serviceWorker.ready).scope);
  }
  await takeRig(pageOf('tablet'), 'Kettle');
  await lab.killServer();
  for (const size of ['tablet', 'phone'] as const) {
    const { tablet, who } = at(size);
    await tablet.page().waitForTimeout(1200);
    await tablet.cutNetwork(true);
    await tablet.page().reload();
    await unlock(tablet.page(), who.name);
  }
}, 240_000);

afterAll(async () => {
  await opened.tablet?.tablet.close();
  await opened.phone?.tablet.close();
  await lab?.close();
});

async function openList(size: keyof typeof INPUTS): Promise<Page> {
  const page = pageOf(size);
  if (size === 'phone') await page.getByRole('button', { name: /open the places/ }).click();
  await goTo(page, 'Lookups');
  await page.getByRole('heading', { name: /^Lookups for/ }).waitFor();
  return page;
}

async function openLookup(size: keyof typeof INPUTS, title: string): Promise<Page> {
  const page = await openList(size);
  await page
    .getByRole('main')
    .getByRole('link', { name: new RegExp(`^${title}`) })
    .first()
    .click();
  await page.getByRole('region', { name: 'Inputs' }).waitFor();
  await page.locator('.lookup-answer, .lookup-empty .says').first().waitFor();
  return page;
}

describe.each(['tablet', 'phone'] as const)('on a %s without a network', (size) => {
  it.each(LOOKUPS.map((lookup) => [lookup.key, lookup] as const))(
    '%s opens from the list and survives any hand',
    async (_, lookup) => {
      const page = await openLookup(size, lookup.title);
      const wide = await page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth);
      expect(wide).toBeLessThanOrEqual(0);
      const random = seededRandom(SEED);
      const report = await playHands(page, drawHands(INPUTS[size], random));
      expect(report.wrong).toEqual([]);
      expect(report.answered + report.refused).toBeGreaterThan(INPUTS[size] / 2);
      const reset = page.getByRole('button', { name: 'Back to the rig' });
      if (await reset.isVisible()) await press(reset);
    },
    60_000,
  );

  it('shows no error in the console', () => {
    expect(at(size).tablet.errors.filter((words) => !/Failed to load resource|net::ERR/.test(words))).toEqual(
      [],
    );
  });
});

describe('with the gap in hand', () => {
  it('solves, leaning the way that was asked, and goes back to the rig', async () => {
    const page = await openLookup('tablet', 'Gap');
    await page.getByRole('button', { name: /^Find/ }).click();
    const dialog = page.getByRole('dialog');
    await dialog.getByRole('radio', { name: 'pressure', exact: true }).click();
    await dialog.getByRole('radio', { name: 'break at most' }).click();
    await press(dialog.getByRole('button', { name: 'Done' }));
    await page.getByText('found', { exact: true }).waitFor();
    await press(page.getByRole('button', { name: 'Back to the rig' }));
    await page.getByText('found', { exact: true }).waitFor({ state: 'detached' });
  });

  it('answers while a slider is dragged', async () => {
    const page = pageOf('tablet');
    const slider = page.getByRole('slider', { name: 'Slide pressure' });
    const box = await slider.boundingBox();
    if (box === null) throw new Error('no slider');
    const title = () => page.locator('figure.chart').first().getAttribute('aria-label');
    const before = await title();
    await page.mouse.move(box.x + box.width / 2, box.y + box.height / 2);
    await page.mouse.down();
    await page.mouse.move(box.x + box.width / 2 + 40, box.y + box.height / 2, { steps: 4 });
    const during = await title();
    await page.mouse.up();
    expect(during).not.toBe(before);
  });

  it('sweeps, shows the table behind the curve, and prints a bench table', async () => {
    const page = pageOf('tablet');
    await page.getByRole('button', { name: 'Sweep' }).click();
    await page.getByRole('figure', { name: /against pressure/ }).waitFor();
    await page.getByRole('button', { name: 'Table', exact: true }).click();
    expect(await page.locator('.chart-table').innerText()).toContain('bar(g)');
    await page.getByRole('button', { name: 'Answer', exact: true }).click();
    await page.evaluate(() => {
      window.print = () => {
        document.documentElement.dataset['printed'] =
          document.querySelector('.print-sheet')?.textContent ?? '';
      };
    });
    await page.getByRole('button', { name: 'Print for the wall' }).click();
    await page.waitForFunction(() => document.documentElement.dataset['printed'] !== undefined);
    const printed = await page.evaluate(() => document.documentElement.dataset['printed'] ?? '');
    expect(printed).toContain('Kettle, revision');
    expect(printed).toContain('may hold up to, kV');
  });

  it('is kept and pinned as entries of the Book', async () => {
    const page = pageOf('tablet');
    const before = (await ownEntries(page)).length;
    await holdHalfSecond(page.getByRole('button', { name: 'Hold to keep' }));
    await holdHalfSecond(page.getByRole('button', { name: 'Pin to bench' }));
    await expect.poll(async () => (await ownEntries(page)).length).toBe(before + 2);
    await openList('tablet');
    await page.getByRole('link', { name: /^Gap.*Pinned now/ }).waitFor();
  });

  it('comes back to the same field of the same lookup after a kill', async () => {
    const page = await openLookup('tablet', 'Gap');
    await page.getByRole('button', { name: /^Temperature/ }).click();
    await page.locator('.quantity-value').click();
    await keyIn(page, '31');
    await page.locator('.quantity-value').click();
    await press(page.locator('.keypad').getByRole('button', { name: '7', exact: true }));
    await page.waitForTimeout(1500);
    const { tablet, who } = at('tablet');
    await tablet.kill();
    await tablet.open(`${lab.url}/`);
    await tablet.cutNetwork(true);
    const again = tablet.page();
    await unlock(again, who.name);
    const pad = again.locator('.keypad');
    await pad.waitFor();
    expect(await pad.getAttribute('aria-label')).toBe('Temperature');
    expect(await pad.locator('.keypad-shown').innerText()).toContain('7');
  });
});
