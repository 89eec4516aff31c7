import type { Page } from 'playwright-core';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { HERON } from '../../seeds/rigs/heron';
import { holdHalfSecond, holdSecond, keyIn, press, signInFirst, unlock } from './support/hands';
import { openLabServer, type LabServer, type SignIn } from './support/lab-server';
import { ownEntries } from './support/own-entries';
import { openTablet, PHONE, TABLET, type Size, type Tablet } from './support/tablet';

/**
 * The rig editor with the network cut: a rig from nothing to its simulated waveform and first revision, a revision that
 * says what it costs, and 200 random edits, each answered or refused in words.
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
  const rig = `Siskin ${name}`;

  beforeAll(async () => {
    tablet = await openTablet(lab.url, size);
    await signInFirst(tablet.page(), ada);
    await tablet.page().goto(`${lab.url}/rigs`, { waitUntil: 'commit' });
    await unlock(tablet.page(), ada.name);
    await tablet.page().getByRole('button', { name: 'New rig' }).waitFor();
    // The editor's own chunk is in the cache once the worker has it; a reload then needs no network.
    await tablet.page().evaluate(async () => (await navigator.serviceWorker.ready).scope);
    await tablet.cutNetwork(true);
  }, 180_000);

  afterAll(async () => {
    await tablet?.close();
  });

  // A picture says why a step failed; it is only taken where somebody asked for it.
  afterEach(async ({ task }) => {
    const folder = process.env['HOLDOFF_E2E_PICTURES'];
    if (folder === undefined || task.result?.state !== 'fail') return;
    await tablet.page().screenshot({ path: `${folder}/${task.id}-${name}.png` });
  });

  it('builds a rig from nothing to a simulated waveform and its first revision', async () => {
    const page = tablet.page();
    await press(page.getByRole('button', { name: 'New rig' }));
    await press(page.getByRole('radio', { name: 'charge transfer' }));
    await next(page, 'Spark gap');
    await suggested(page);
    await next(page, 'Vessel');
    await suggested(page);
    await next(page, 'Dump capacitor');
    await suggested(page);
    await enter(page, /^Capacitance/, '5');
    await next(page, 'Peaking capacitor');
    await suggested(page);
    await enter(page, /^Capacitance/, '1.4');
    await next(page, 'Laser channel');
    await suggested(page);
    await next(page, 'Supply and charging');
    await suggested(page);
    await enter(page, /^Supply voltage/, '20');

    const wave = page.getByRole('region', { name: 'Simulated waveform' });
    await wave
      .getByText(/peaks at/)
      .first()
      .waitFor();
    expect(await wave.innerText()).toMatch(/kV/);
    expect(await page.getByText(/what is open is assumed/).innerText()).toMatch(/Envelope/);

    await next(page, 'Charged nodes and bleeds');
    await suggested(page);
    await next(page, 'Shorting points');
    await suggested(page);
    await next(page, 'Model');
    await suggested(page);
    await next(page, 'Envelope');
    await suggested(page);
    await enter(page, /^Envelope voltage/, '30');
    await next(page, 'Beam');
    await suggested(page);
    await next(page, 'Screws and feelers');
    await press(page.getByRole('button', { name: 'Review', exact: true }));

    // 30 kV are more than the supply's 20: refused in words, with the way there.
    await page.getByLabel('Name of the rig').fill(rig);
    await press(page.getByRole('button', { name: /above the supply’s limit of 20/ }));
    await enter(page, /^Envelope voltage/, '18');
    await press(page.getByRole('button', { name: 'All sections' }));
    await press(page.getByRole('button', { name: 'Review', exact: true }));
    await page
      .getByText(/the rig gets no wait at all/)
      .first()
      .waitFor();
    await holdSecond(page.getByRole('button', { name: 'Hold to create' }));
    await page.getByRole('heading', { name: new RegExp(`${rig}, revision 1`) }).waitFor();
    await page
      .getByRole('region', { name: 'Simulated waveform' })
      .getByText(/peaks at/)
      .first()
      .waitFor();
    expect((await ownEntries(page)).map((one) => one.kind)).toContain('rig.created');
    expect(await page.getByRole('main').innerText()).not.toMatch(/NaN|undefined|Infinity/);
  });

  it('keeps a half-typed number through a kill, and says before the hold what a revision voids', async () => {
    const page = tablet.page();
    await page.goto(`${lab.url}/rigs/${HERON.id}/revise`, { waitUntil: 'commit' });
    await unlock(page, ada.name);
    await press(page.getByRole('button', { name: /Spark gap/ }));
    await press(page.getByRole('button', { name: /^Gap/ }).first());
    await press(page.locator('.keypad').getByRole('button', { name: '3', exact: true }));
    await press(page.locator('.keypad').getByRole('button', { name: 'Point', exact: true }));
    await page.waitForTimeout(400);
    await tablet.kill();
    await tablet.open(`${lab.url}/rigs/${HERON.id}/revise`);
    await tablet.cutNetwork(true);
    const again = tablet.page();
    await unlock(again, ada.name);
    await again.getByText('was 2.6').first().waitFor();
    await enter(again, /^Gap/, '3.1');
    await press(again.getByRole('button', { name: 'Review', exact: true }));
    const main = again.getByRole('main');
    await main.getByText(/is void with it|no permit to lose/).waitFor();
    await main.getByText('Touches safety').waitFor();
    expect(await main.innerText()).toMatch(/Gap\s+was\s+2\.6\s*mm\s+is\s+3\.1\s*mm/);
  });

  it('fits a part with its day, and opens its ledger', async () => {
    const page = tablet.page();
    await page.goto(`${lab.url}/rigs/${HERON.id}/parts`, { waitUntil: 'commit' });
    await unlock(page, ada.name);
    await press(page.getByRole('button', { name: 'Fit a part' }));
    await page.getByLabel('What it is').fill('PET stack, four plies');
    await press(page.getByRole('radio', { name: 'C1', exact: true }));
    await enter(page, /^Fitted on/, '20261120');
    await enter(page, /^Shots before/, '1200');
    await holdHalfSecond(page.getByRole('button', { name: 'Hold to fit' }));
    await press(page.getByRole('button', { name: /PET stack, four plies/ }));
    const main = page.getByRole('main');
    await main.getByText('Left, likely').waitFor();
    const said = await main.innerText();
    expect(said).toContain('1,200 before');
    expect(said).toContain('2026-11-20');
    expect(said).toMatch(/[\d,]+ to [\d,]+ shots/);
  });

  it('answers or refuses in words whatever is typed: 100 edits of a fixed seed', async () => {
    const page = tablet.page();
    const roll = dice(size.width);
    await page.goto(`${lab.url}/rigs/${HERON.id}/revise`, { waitUntil: 'commit' });
    await unlock(page, ada.name);
    await page.locator('.edit-overview, .edit-section').waitFor();
    if (await page.locator('.edit-section').isVisible())
      await press(page.getByRole('button', { name: 'All sections' }));
    let edits = 0;
    while (edits < 100) {
      const sections = page.locator('.edit-overview button');
      await press(sections.nth(Math.floor(roll() * (await sections.count()))), 45);
      for (let i = 0; i < 8; i += 1) {
        await randomEdit(page, roll);
        edits += 1;
      }
      const said = await page.getByRole('main').innerText();
      expect(said).not.toMatch(/NaN|undefined|Infinity|\[object/);
      await press(page.getByRole('button', { name: 'All sections' }), 45);
    }
    expect(
      tablet.errors.filter((words) => !/ERR_INTERNET_DISCONNECTED|Failed to (load|fetch)/.test(words)),
    ).toEqual([]);
  });
});

async function next(page: Page, section: string): Promise<void> {
  await press(page.getByRole('button', { name: `Next: ${section}` }));
  await page.getByRole('heading', { name: new RegExp(`^${section}`) }).waitFor();
}

async function suggested(page: Page): Promise<void> {
  await press(page.getByRole('button', { name: 'Suggest what is open' }));
  await press(page.getByRole('button', { name: 'These are right' }));
  await page.getByRole('button', { name: 'These are right' }).waitFor({ state: 'detached' });
}

async function enter(page: Page, field: RegExp, text: string): Promise<void> {
  await press(page.locator('.edit-numbers').getByRole('button', { name: field }).first());
  await keyIn(page, text);
  await page.locator('.keypad').waitFor({ state: 'detached' });
}

/** One touch somewhere in the section, or some keys in its keypad. */
async function randomEdit(page: Page, roll: () => number): Promise<void> {
  const rows = page.locator('.edit-numbers button');
  const radios = page.locator('.edit-section [role=radio]');
  const [rowCount, radioCount] = [await rows.count(), await radios.count()];
  if (radioCount > 0 && (roll() < 0.3 || rowCount === 0)) {
    await press(radios.nth(Math.floor(roll() * radioCount)), 45);
    return;
  }
  if (rowCount === 0) return;
  await press(rows.nth(Math.floor(roll() * rowCount)), 45);
  const keypad = page.locator('.keypad');
  for (let i = 0; i < 4; i += 1) await page.keyboard.press(KEYS[Math.floor(roll() * KEYS.length)] ?? '0');
  await page.keyboard.press('Enter');
  // A number that is refused keeps the keypad, with the reason in words.
  if (await keypad.isVisible()) {
    expect(await keypad.innerText()).not.toMatch(/NaN|undefined|Infinity/);
    await page.keyboard.press('Escape');
  }
}

const KEYS = ['0', '1', '5', '9', '.', '-', 'Backspace', '7'];

function dice(seed: number): () => number {
  let state = seed;
  return () => {
    state = (state + 0x6d2b79f5) | 0;
    let t = Math.imul(state ^ (state >>> 15), 1 | state);
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t;
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296;
  };
}
