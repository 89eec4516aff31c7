import type { Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { HERON } from '../../seeds/rigs/heron';
import { holdHalfSecond, holdSecond, keyIn, press, signInFirst, unlock } from './support/hands';
import { openLabServer, type LabServer, type SignIn } from './support/lab-server';
import { ownEntries } from './support/own-entries';
import { openTablet, PHONE, TABLET, type Size, type Tablet } from './support/tablet';

/**
 * The register and the alignment with the network cut: a piece is added, issued, brought back and found damaged; a
 * wedge is measured, turned away and written to the rig; a kill in the middle of a figure keeps what was typed.
 */
let lab: LabServer;
let ada: SignIn;
const SIZES: readonly (readonly [string, Size])[] = [
  ['tablet', TABLET],
  ['phone', PHONE],
];

beforeAll(async () => {
  lab = await openLabServer();
  const found = lab.signIns.find((one) => one.role === 'operator');
  if (found === undefined) throw new Error('no demo sign-in for an operator');
  ada = found;
}, 180_000);

afterAll(async () => {
  await lab?.close();
});

describe.each(SIZES)('on a %s, offline', (name, size) => {
  let tablet: Tablet;
  const number = `E-${name}`;

  beforeAll(async () => {
    tablet = await openTablet(lab.url, size);
    await signInFirst(tablet.page(), ada);
    await open(tablet, '/kit');
    await tablet.page().getByRole('link', { name: /^E4/ }).waitFor();
    // The screens' own chunks are in the cache once the worker has them; a reload then needs no network.
    await tablet.page().evaluate(async () => (await navigator.serviceWorker.ready).scope);
    await tablet.cutNetwork(true);
  }, 180_000);

  afterAll(async () => {
    await tablet?.close();
  });

  it('says what is overdue, what each rig asks for and what is to be ordered', async () => {
    const page = tablet.page();
    const main = page.getByRole('main');
    expect(await main.getByRole('link', { name: /^E4/ }).innerText()).toMatch(/inspection\s+overdue/);
    expect(await main.innerText()).toContain('2 overdue');
    const need = page.getByRole('table', { name: 'What each rig’s beam asks for' });
    expect(await need.innerText()).toMatch(/Heron\s+337\.1/);
    expect(await page.getByRole('region', { name: 'To order' }).innerText()).toContain('1 x Ceramic 1.0 nF');
    await press(page.getByRole('button', { name: 'Copy the order' }));
    await page.getByText(/^Copied\.$|copy them by hand/).waitFor();
  });

  it('adds a piece, issues it, takes it back damaged, and passes it again', async () => {
    const page = tablet.page();
    await press(page.getByRole('button', { name: 'Add to the register' }));
    await page.getByLabel('Number').fill(number);
    await page.getByLabel('Name').fill('Green pair');
    await figure(page, 'Density, line 1', '6');
    await figure(page, 'From, line 1', '190');
    await figure(page, 'To, line 1', '375');
    await page.getByText('Ready to log.').waitFor();
    await holdHalfSecond(page.getByRole('button', { name: 'Hold to log' }));
    await page.getByRole('heading', { name: `${number}, Green pair` }).waitFor();

    await press(page.getByRole('radio', { name: 'Ada Brook' }));
    await holdHalfSecond(page.getByRole('button', { name: 'Hold to log' }));
    await page.getByRole('radio', { name: 'Return' }).waitFor();

    await press(page.getByRole('radio', { name: 'damaged' }));
    await page.getByLabel('In words').fill('A lens is cracked');
    await holdHalfSecond(page.getByRole('button', { name: 'Hold to log' }));
    await page.getByText('did not pass: not to be relied on').waitFor();

    await press(page.getByRole('radio', { name: 'Inspect' }));
    await press(page.getByRole('radio', { name: 'passed', exact: true }));
    await page.getByText('Ready to log.').waitFor();
    await holdHalfSecond(page.getByRole('button', { name: 'Hold to log' }));
    await page.getByText(/^inspection due \d/).waitFor();
    expect(await kinds(page)).toEqual(['kit.added', 'kit.issued', 'kit.returned', 'kit.inspected']);
  });

  it('keeps a gap being typed through a kill, and comes back to it', async () => {
    await open(tablet, `/alignment/${HERON.id}`);
    await press(tablet.page().getByRole('radio', { name: 'gaps' }));
    await figure(tablet.page(), 'Gap at A', '2.65');
    // Drafts are durable within 250 ms; a loaded machine gets longer.
    await tablet.page().waitForTimeout(1000);
    await tablet.kill();
    await tablet.open(`${lab.url}/alignment/${HERON.id}`);
    await tablet.cutNetwork(true);
    await unlock(tablet.page(), ada.name);
    await tablet.page().getByText('2.65').first().waitFor();
  });

  it('says which screw, which way and how far, and keeps arcs and turns', async () => {
    const page = tablet.page();
    await figure(page, 'Gap at B', '2.31');
    const main = page.getByRole('main');
    await main.getByText('Not logged yet.').waitFor();
    await holdHalfSecond(page.getByRole('button', { name: 'Hold to log gaps' }));
    await page.getByRole('button', { name: 'Hold to log turns' }).waitFor();
    const advice = (await main.innerText()).replace(/\s+/g, ' ');
    expect(advice).toContain('3/8 turn clockwise closes by 0.19 mm');
    expect(advice).toContain('1/2 turn anticlockwise opens by 0.25 mm');
    expect(advice).toContain('Gaps drawn');
    await holdHalfSecond(page.getByRole('button', { name: 'Hold to log turns' }));
    await page.getByRole('button', { name: 'Hold to log gaps' }).waitFor();

    await figure(page, 'Gap at A', '2.5');
    await figure(page, 'Gap at B', '2.52');
    await holdHalfSecond(page.getByRole('button', { name: 'Hold to log gaps' }));
    await page.getByText('Even, as far as the feeler tells.').waitFor();
    await press(page.getByRole('button', { name: 'mid', exact: true }));
    await holdHalfSecond(page.getByRole('button', { name: 'Hold to log arcs' }));
    await page.getByText(/Arcs sit in the middle/).waitFor();
  });

  it('writes the result to the rig, and says before what that voids', async () => {
    const page = tablet.page();
    await press(page.getByRole('button', { name: 'Write to the rig' }));
    const dialog = page.getByRole('dialog');
    await dialog.getByText(/firing permit for revision .* lapses/).waitFor();
    await holdSecond(dialog.getByRole('button', { name: 'Hold to revise' }));
    await dialog.waitFor({ state: 'hidden' });
    expect((await kinds(page)).slice(4)).toEqual([
      'alignment.measured',
      'alignment.adjusted',
      'alignment.measured',
      'alignment.arc-seen',
      'rig.revised',
    ]);
    expect(tablet.errors.filter((words) => !/net::ERR_|Failed to fetch/.test(words))).toEqual([]);
  });
});

/** A new page life at a path: the tablet is locked then. */
async function open(tablet: Tablet, path: string): Promise<void> {
  const page = tablet.page();
  await page.goto(`${lab.url}${path}`);
  await unlock(page, ada.name);
}

/** Chooses a figure, wherever it stands, and keys it in. */
async function figure(page: Page, label: string, text: string): Promise<void> {
  const row = page.getByRole('button', { name: new RegExp(`^${label}`) });
  const active = page.getByRole('group', { name: label });
  if (!(await active.isVisible())) await press(row.first());
  await press(active.locator('.quantity-value'));
  await keyIn(page, text);
  await page.locator('.keypad').waitFor({ state: 'hidden' });
}

/** Kinds of this tablet's own entries, in order, without the count of ignored touches. */
async function kinds(page: Page): Promise<readonly string[]> {
  return (await ownEntries(page)).map(({ kind }) => kind).filter((kind) => kind !== 'noise.counted');
}
