import type { Locator, Page } from 'playwright-core';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { KETTLE } from '../../seeds/rigs/kettle';
import { goTo, holdHalfSecond, holdSecond, press, signInFirst, takeRig, unlock } from './support/hands';
import { openLabServer, type LabServer, type SignIn } from './support/lab-server';
import { DESK, openTablet, PHONE, type Tablet } from './support/tablet';

/**
 * What a reviewer decides at the Desk, against what a locked tablet at the bench wrote without an author: stand-downs and
 * returning, permits withdrawn, incidents answered and closed, acts held back and confirmed or dismissed. In order.
 */
let lab: LabServer;
let bench: Tablet;
let desk: Tablet;
let milo: SignIn;

const deskRig = () => `${lab.url}/desk/rigs/${KETTLE.id}`;

beforeAll(async () => {
  lab = await openLabServer();
  const must = (role: string): SignIn => {
    const found = lab.signIns.find((one) => one.role === role);
    if (found === undefined) throw new Error(`no demo sign-in for ${role}`);
    return found;
  };
  milo = must('reviewer');
  bench = await openTablet(lab.url, PHONE);
  await signInFirst(bench.page(), must('operator'));
  await bench.page().goto(`${lab.url}/settings`);
  await unlock(bench.page(), must('operator').name);
  await press(bench.page().getByRole('button', { name: 'Lock', exact: true }));
  await bench.page().getByText('Who is at the bench?').waitFor();
  desk = await openTablet(lab.url, DESK);
  await signInFirst(desk.page(), milo);
  await takeRig(desk.page(), 'Kettle');
  await desk.page().evaluate(async () => (await navigator.serviceWorker.ready).scope);
  await toDeskRig();
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
    await tablet?.page().screenshot({ path: `${folder}/${task.id}-${name}.png` });
});

describe('a rig that was stood down on a locked phone', () => {
  it('is stood down without an author, and the incident reported', async () => {
    const page = bench.page();
    await page.getByRole('link', { name: 'Emergency' }).click();
    await page.getByRole('radio', { name: 'Kettle' }).click();
    await holdSecond(page.getByRole('button', { name: /Stand rig down/ }));
    await page.getByText(/Kettle is stood down: logged/).waitFor();
    await press(page.getByRole('button', { name: 'Report an incident' }));
    await page.getByLabel('What happened').fill('Flashover along the film edge');
    await holdSecond(page.getByRole('button', { name: 'Hold to report' }));
    await page.getByText(/The incident is reported: logged/).waitFor();
  });

  it('shows both at the Desk, where the incident is answered and closed', async () => {
    const page = desk.page();
    await standDowns().getByText('author open').first().waitFor({ timeout: 60_000 });
    const incidents = page.getByRole('region', { name: 'Incidents' });
    await incidents.getByText('Flashover along the film edge').waitFor();
    await incidents.getByLabel('Answer').fill('Film edge cleaned, photographs in the note');
    await holdHalfSecond(incidents.getByRole('button', { name: 'Answer', exact: true }));
    await incidents.getByText('Film edge cleaned', { exact: false }).waitFor({ timeout: 60_000 });
    await incidents.getByLabel('What came of it').fill('Edge margin widened to 30 mm');
    await holdSecond(incidents.getByRole('button', { name: 'Close incident' }));
    await incidents.getByText('No open incident').waitFor({ timeout: 60_000 });
  });

  it('is returned by naming every stand-down, and the phone is told', async () => {
    await standDowns().getByLabel('What was mended').fill('Film replaced, edge inspected');
    await holdSecond(standDowns().getByRole('button', { name: 'Return rig, lift all 2' }));
    await standDowns().getByText('Not stood down').waitFor({ timeout: 60_000 });
    await bench
      .page()
      .getByRole('banner')
      .getByText('stood down')
      .waitFor({ state: 'detached', timeout: 60_000 });
  });
});

describe('a permit', () => {
  it('is withdrawn with its reason, and none rules afterwards', async () => {
    const page = desk.page();
    const section = page.getByRole('region', { name: 'Withdraw the permit' });
    await section.getByLabel('Why it is withdrawn').fill('Relief valve due for a test');
    await holdSecond(section.getByRole('button', { name: 'Withdraw permit' }));
    await page.getByRole('region', { name: 'Permit', exact: true }).getByText('No permit rules').waitFor();
    await page
      .getByText('In the Book', { exact: false })
      .or(page.getByText('The server has applied it'))
      .first()
      .waitFor({ timeout: 60_000 });
  });
});

describe('an act without its author’s own session', () => {
  it('is held back for its author, who confirms it after signing in', async () => {
    await signOutOnline();
    await toDeskRig();
    await grant();
    await desk.page().getByRole('banner').getByText('1 held back').waitFor({ timeout: 60_000 });
    await signInAgain();
    await toHeld();
    await holdSecond(desk.page().getByRole('button', { name: 'Confirm', exact: true }));
    await desk.page().getByText('Nothing is held back.').waitFor({ timeout: 60_000 });
    await toDeskRig();
    await permit()
      .getByText(/^Permit/)
      .first()
      .waitFor();
    const rows = await lab.rows(
      "SELECT kind, verdict FROM entries WHERE kind IN ('permit.granted', 'entry.adopted') ORDER BY revision DESC LIMIT 2",
    );
    expect(rows.map((row) => [row['kind'], row['verdict']])).toEqual([
      ['entry.adopted', 'applied'],
      ['permit.granted', 'held-back'],
    ]);
  });

  it('is dismissed by its author with a reason, and waits no longer', async () => {
    await signOutOnline();
    await toDeskRig();
    await grant();
    await desk.page().getByRole('banner').getByText('1 held back').waitFor({ timeout: 60_000 });
    await toHeld();
    const page = desk.page();
    await page.getByLabel('Why it is dismissed').fill('The first permit stands already');
    await holdSecond(page.getByRole('button', { name: 'Dismiss', exact: true }));
    await page.getByText('Nothing is held back.').waitFor({ timeout: 60_000 });
  });
});

describe('without server and network, started afresh', () => {
  it('opens the Desk with what was fetched before, and the emergency card', async () => {
    await signInAgain();
    await toDesk();
    await desk.page().getByRole('table').waitFor();
    // A new page life, not a kill: what was fetched is a cache in small storage, which Chromium brings to the disk late.
    await desk.page().waitForTimeout(2500);
    await lab.killServer();
    await desk.cutNetwork(true);
    await desk.page().goto(`${lab.url}/desk`, { waitUntil: 'commit' });
    const page = desk.page();
    await unlock(page, milo.name);
    await page.getByRole('table').waitFor();
    expect((await page.getByRole('row').count()) > 5).toBe(true);
    await page
      .getByText(/What stands here was fetched/)
      .first()
      .waitFor();
    await page.getByRole('link', { name: 'Emergency' }).click();
    await page.getByRole('heading', { name: 'Switch off' }).waitFor();
  });
});

function standDowns(): Locator {
  return desk.page().getByRole('region', { name: 'Stand-downs' });
}

function permit(): Locator {
  return desk.page().getByRole('region', { name: 'Permit', exact: true });
}

async function grant(): Promise<void> {
  await holdSecond(desk.page().getByRole('button', { name: 'Grant permit' }));
  await permit().getByText('Logged.').waitFor();
}

async function toDesk(): Promise<void> {
  const page = desk.page();
  await goTo(page, 'Bench');
  await page.getByRole('link', { name: 'Desk', exact: true }).click();
  await page.getByRole('heading', { name: 'Firings' }).waitFor();
}

async function toDeskRig(): Promise<void> {
  await toDesk();
  await desk.page().getByRole('link', { name: 'Kettle: permit, stand-downs' }).click();
  await desk.page().waitForURL(deskRig());
  await permit().waitFor();
}

async function toHeld(): Promise<void> {
  await toDesk();
  await desk
    .page()
    .getByRole('link', { name: /^Held back/ })
    .click();
  await desk.page().getByRole('heading', { name: 'Held back', exact: true }).waitFor();
}

async function signOutOnline(): Promise<void> {
  const page = desk.page();
  await goTo(page, 'Bench');
  await page.getByRole('link', { name: 'Settings', exact: true }).click();
  await page.getByRole('button', { name: 'Sign out online' }).click();
  await opened(page);
  await page.getByText('not signed in online', { exact: false }).waitFor();
}

/** Signing out may lock the tablet; the PIN opens it again, without a session. */
async function opened(page: Page): Promise<void> {
  const choose = page.getByText('Who is at the bench?');
  await choose
    .or(page.getByText('not signed in online', { exact: false }))
    .first()
    .waitFor();
  if (await choose.first().isVisible()) {
    await unlock(page, milo.name);
    await goTo(page, 'Bench');
    await page.getByRole('link', { name: 'Settings', exact: true }).click();
  }
}

async function signInAgain(): Promise<void> {
  const page = desk.page();
  await goTo(page, 'Bench');
  await page.getByRole('link', { name: 'Person', exact: true }).click();
  await page.getByLabel('E-mail').fill(milo.email);
  await page.getByLabel('Password').fill(milo.password);
  await page.getByRole('button', { name: 'Sign in', exact: true }).click();
  await page.waitForURL(/\/bench\//);
}
