import type { Page } from 'playwright-core';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import {
  goTo,
  holdHalfSecond,
  holdSecond,
  keyIn,
  PIN,
  press,
  signInFirst,
  takeRig,
  unlock,
} from './support/hands';
import { openLabServer, type LabServer, type SignIn } from './support/lab-server';
import { ownEntries } from './support/own-entries';
import { DESK, openTablet, type Tablet } from './support/tablet';

/**
 * A check sheet from the desk to the bench: written and published by a reviewer, walked by an operator with the network
 * cut, a step waived, and the sheet retired again. The steps build on each other, in order.
 */
const TITLE = 'Gas change, Kettle alone';
const PATIENCE_MS = 25_000;
let lab: LabServer;
let bench: Tablet;
let desk: Tablet;
let ada: SignIn;
let milo: SignIn;

beforeAll(async () => {
  lab = await openLabServer();
  const must = (role: string): SignIn => {
    const found = lab.signIns.find((one) => one.role === role);
    if (found === undefined) throw new Error(`no demo sign-in for ${role}`);
    return found;
  };
  [ada, milo] = [must('operator'), must('reviewer')];
  bench = await openTablet(lab.url);
  await signInFirst(bench.page(), milo);
  await bench.page().getByRole('link', { name: 'Person' }).click();
  await signInFirst(bench.page(), ada);
  await takeRig(bench.page(), 'Kettle');
  desk = await openTablet(lab.url, DESK);
  await signInFirst(desk.page(), milo);
}, 240_000);

afterAll(async () => {
  await desk?.close();
  await bench?.close();
  await lab?.close();
});

afterEach(async ({ task }) => {
  const folder = process.env['HOLDOFF_E2E_PICTURES'];
  if (folder === undefined || task.result?.state !== 'fail') return;
  for (const [name, tablet] of [['bench', bench] as const, ['desk', desk] as const])
    await tablet?.page().screenshot({ path: `${folder}/${task.id}-${name}.png`, fullPage: true });
});

describe('1 · at the desk', () => {
  it('offers the ready sheets, and keeps what is typed through a reload', async () => {
    const page = desk.page();
    await page.goto(`${lab.url}/checks/sheets/new`);
    await unlock(page, milo.name);
    await page.getByRole('button', { name: /^Copy ready sheet: Make safe: LC inversion/ }).waitFor();
    await press(page.getByRole('button', { name: 'An empty sheet' }));
    await page.getByLabel('Title', { exact: true }).fill(TITLE);
    await page.waitForTimeout(600);
    // Not killed: the browser would forget a session that is seconds old, and an act needs its author's.
    await page.reload();
    const again = desk.page();
    await unlock(again, milo.name);
    expect(await again.getByLabel('Title', { exact: true }).inputValue()).toBe(TITLE);
  });

  it('refuses in words beside the step, fixes who may waive, and orders by buttons', async () => {
    const page = desk.page();
    await press(page.getByRole('radio', { name: 'Gas change' }));
    await press(page.getByRole('checkbox', { name: 'Kettle' }));
    await page.getByLabel(/^Caution/).fill('A cylinder empties a room of air in minutes.');

    await add(page, 'Add reading', 'Cylinder pressure');
    await page.getByLabel('Quantity', { exact: true }).fill('Gauge pressure');
    await page.getByLabel('Unit', { exact: true }).fill('bar(g)');
    await limit(page, 'Lowest', '20');
    await limit(page, 'Highest', '5');
    await step(page, 1).getByText('The lowest limit lies above the highest').waitFor();
    const publish = page.getByRole('button', { name: 'Hold to publish' });
    expect(await publish.getAttribute('aria-disabled')).toBe('true');
    await limit(page, 'Highest', '200');
    await step(page, 1).getByText('The lowest limit lies above').waitFor({ state: 'detached' });

    await add(page, 'Add confirm', 'Leak fluid on each joint');
    await press(step(page, 2).getByRole('radio', { name: 'the operator' }));
    await add(page, 'Add second person', 'Gas seen by a second person');
    const waive = step(page, 3).getByRole('radiogroup', { name: 'May be waived by' });
    expect(await waive.getByRole('radio', { name: 'the operator' }).isDisabled()).toBe(true);
    await add(page, 'Add confirm', 'Hard short seen on');
    await press(step(page, 4).getByRole('button', { name: 'Step 4 up' }));
    await press(page.getByRole('button', { name: 'Step 3 up' }));
    await page.getByRole('button', { name: 'Step 2 up' }).focus();
    await page.keyboard.press('Enter');
    await page.getByRole('listitem', { name: 'Step 1: Hard short seen on' }).waitFor();
    expect(await page.evaluate(() => document.activeElement?.getAttribute('aria-label'))).toBe('Step 1 down');
  });

  it('publishes with a hold, and the server takes it', async () => {
    const page = desk.page();
    await page.getByText('Ready to publish.').waitFor();
    await holdSecond(page.getByRole('button', { name: 'Hold to publish' }));
    await page
      .getByRole('region', { name: 'Gas change' })
      .getByRole('link', { name: new RegExp(`${TITLE}.*version 1`) })
      .waitFor({ timeout: PATIENCE_MS });
    const [row] = await lab.rows(
      "select verdict from entries where kind = 'sheet.published' order by revision desc limit 1",
    );
    expect(row?.['verdict']).toBe('applied');
  });

  it('publishes a second version after saying what differs', async () => {
    const page = desk.page();
    await page.getByRole('link', { name: new RegExp(TITLE) }).click();
    await page.getByRole('link', { name: 'Change this sheet' }).click();
    await page.getByText('Nothing differs from what is published.').waitFor();
    await press(step(page, 2).locator('.sheet-step-title'));
    await page.getByLabel(/^What to do/).fill('Stand to the side of it.');
    const changes = page.getByRole('list', { name: 'Differs from version 1' });
    await changes.getByText('Stand to the side of it.').waitFor();
    expect(await changes.getByRole('listitem').count()).toBe(1);
    await holdSecond(page.getByRole('button', { name: 'Hold to publish' }));
    await page
      .getByRole('link', { name: new RegExp(`${TITLE}.*version 2`) })
      .waitFor({ timeout: PATIENCE_MS });
  });
});

describe('2 · at the bench, offline', () => {
  it('walks it, waives a step with a reason, and closes it', async () => {
    const page = bench.page();
    await goTo(page, 'Checks');
    await page.getByRole('article', { name: TITLE }).waitFor({ timeout: PATIENCE_MS });
    await page.evaluate(async () => (await navigator.serviceWorker.ready).scope);
    await bench.cutNetwork(true);

    await press(page.getByRole('button', { name: `Open check: ${TITLE}` }));
    await page.getByRole('heading', { name: 'Hard short seen on' }).waitFor();
    expect(await page.getByRole('button', { name: 'Waive step' }).count()).toBe(0);
    await holdHalfSecond(page.getByRole('button', { name: 'Hold to confirm' }));
    await page.getByRole('heading', { name: 'Cylinder pressure' }).waitFor();
    await page.locator('.quantity-value').click();
    await keyIn(page, '180');
    await holdHalfSecond(page.getByRole('button', { name: 'Hold to log' }));
    await page.getByRole('heading', { name: 'Leak fluid on each joint' }).waitFor();
    await press(page.getByRole('button', { name: 'Waive step' }));
    await page.getByRole('dialog').getByRole('textbox').fill('No joint was opened');
    await holdHalfSecond(page.getByRole('dialog').getByRole('button', { name: 'Hold to waive' }));
    await page.getByRole('heading', { name: 'Gas seen by a second person' }).waitFor();
    expect(await page.getByRole('button', { name: 'Waive step' }).count()).toBe(0);
    await page.getByRole('radio', { name: milo.name }).click();
    await press(page.getByRole('button', { name: 'Enter their PIN' }));
    await page.getByRole('group', { name: `PIN of ${milo.name}` }).waitFor();
    for (const figure of PIN) await page.keyboard.press(figure);
    await page.keyboard.press('Enter');
    await page.getByText('Closing declares nothing').waitFor();
    await holdSecond(page.getByRole('button', { name: 'Close check' }));
    await page.getByText('It declared nothing about Kettle.').waitFor();
    const kinds = (await ownEntries(page)).map((one) => one.kind);
    expect(kinds.filter((kind) => kind.startsWith('check.'))).toEqual([
      'check.opened',
      'check.step-done',
      'check.step-done',
      'check.step-waived',
      'check.step-done',
      'check.closed',
    ]);
  });

  it('prints the record, and finds the check by what was waived', async () => {
    const page = bench.page();
    await page.evaluate(() => {
      window.print = () => {
        document.title = document.querySelector('.check-record')?.textContent ?? 'nothing';
      };
    });
    await press(page.getByRole('button', { name: 'Print the record' }));
    await page.waitForFunction(() => document.title.includes('version 2'));
    const paper = await page.title();
    for (const words of [milo.name, 'No joint was opened', '180', 'on this tablet only'])
      expect(paper).toContain(words);
    await press(page.getByRole('button', { name: 'All checks' }));
    await press(page.getByRole('radio', { name: 'Gas change' }));
    await press(page.getByRole('radio', { name: 'with a step waived' }));
    await page
      .getByRole('region', { name: 'Earlier checks' })
      .getByRole('link', { name: 'Gas change' })
      .waitFor();
  });
});

describe('3 · retired', () => {
  it('is offered no more once the server has taken it', async () => {
    const page = desk.page();
    await page.getByRole('link', { name: new RegExp(`${TITLE}.*version 2`) }).click();
    await press(page.getByRole('button', { name: 'Retire', exact: true }));
    await page.getByRole('dialog').getByRole('textbox').fill('The manifold replaced it');
    await holdSecond(page.getByRole('dialog').getByRole('button', { name: 'Hold to retire' }));
    await page.getByText('No check is opened on it any more.').waitFor({ timeout: PATIENCE_MS });
    await bench.cutNetwork(false);
    await bench.page().getByRole('article', { name: TITLE }).waitFor({ state: 'detached', timeout: 60_000 });
    const [row] = await lab.rows(
      "select verdict from entries where kind = 'check.closed' order by revision desc limit 1",
    );
    expect(row?.['verdict']).toBe('applied');
  });
});

const step = (page: Page, no: number) => page.getByRole('listitem', { name: new RegExp(`^Step ${no}:`) });

async function add(page: Page, button: string, title: string): Promise<void> {
  await press(page.getByRole('button', { name: button, exact: true }));
  await page.getByLabel('Step title').fill(title);
}

async function limit(page: Page, name: string, text: string): Promise<void> {
  await press(page.locator('.sheet-limits').getByRole('button', { name: new RegExp(`^${name}`) }));
  await keyIn(page, text);
  await page.locator('.keypad').waitFor({ state: 'detached' });
}
