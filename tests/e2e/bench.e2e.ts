import type { Page } from 'playwright-core';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { KETTLE } from '../../seeds/rigs/kettle';
import {
  goTo,
  holdHalfSecond,
  holdSecond,
  press,
  signInFirst,
  takeRig,
  typePin,
  unlock,
  PIN,
} from './support/hands';
import { openLabServer, type LabServer, type SignIn } from './support/lab-server';
import { ownEntries } from './support/own-entries';
import { openTablet, PHONE, TABLET, type Tablet } from './support/tablet';

/**
 * The Bench with the server dead and the network cut: tags and guests, what is due, pinned lookups, the face, and the
 * emergency card of a locked tablet whose open author is claimed afterwards. The steps build on each other, in order.
 */
let lab: LabServer;
let bench: Tablet;
let ada: SignIn;
let milo: SignIn;

const benchOf = () => `${lab.url}/bench/${KETTLE.id}`;

beforeAll(async () => {
  lab = await openLabServer();
  const must = (role: string): SignIn => {
    const found = lab.signIns.find((one) => one.role === role);
    if (found === undefined) throw new Error(`no demo sign-in for ${role}`);
    return found;
  };
  ada = must('operator');
  milo = must('reviewer');
  bench = await openTablet(lab.url);
  const page = bench.page();
  await signInFirst(page, milo);
  await page.getByRole('link', { name: 'Person' }).click();
  await signInFirst(page, ada);
  await takeRig(page, 'Kettle');
  await page.evaluate(async () => (await navigator.serviceWorker.ready).scope);
  // A page comes under its worker only at the next load.
  await page.reload();
  await unlock(page, ada.name);
  await lab.killServer();
  await bench.cutNetwork(true);
}, 180_000);

afterAll(async () => {
  await bench?.close();
  await lab?.close();
});

afterEach(async ({ task }) => {
  const folder = process.env['HOLDOFF_E2E_PICTURES'];
  if (folder === undefined || task.result?.state !== 'fail') return;
  await bench?.page().screenshot({ path: `${folder}/${task.id}-bench.png` });
});

describe('hands-in tags', () => {
  it('hangs two of one person from the Bench and from the list, and says since when', async () => {
    const page = bench.page();
    await goTo(page, 'Bench');
    await holdSecond(page.getByRole('button', { name: 'Hands in', exact: true }));
    await page.getByRole('link', { name: /Hands in: Ada Brook just now/ }).click();
    await page.getByRole('heading', { name: 'At Kettle' }).waitFor();
    await page.getByLabel('Where your hands go').fill('Peaking bank');
    await holdSecond(page.getByRole('button', { name: 'Hands in', exact: true }));
    const tags = page.getByRole('region', { name: 'Hands in' }).getByRole('listitem');
    await tags.nth(1).getByText('Peaking bank').waitFor();
    expect(await tags.count()).toBe(2);
  });

  it('lets another person hang their own and take out hers only with words', async () => {
    const page = bench.page();
    await changePerson(page, milo.name);
    await toPeople(page);
    await holdSecond(page.getByRole('button', { name: 'Hands in', exact: true }));
    const region = page.getByRole('region', { name: 'Hands in' });
    await region.getByText(milo.name, { exact: true }).waitFor();
    await press(region.getByRole('button', { name: `Take out ${ada.name}’s tag` }).first());
    const dialog = page.getByRole('dialog');
    const take = dialog.getByRole('button', { name: 'Hold to take it out' });
    await holdSecond(take);
    await dialog.getByRole('alert').getByText('Say why it may come off.').waitFor();
    await dialog.getByRole('textbox').fill('She has gone home; I looked, nothing is in');
    await holdSecond(take);
    await dialog.waitFor({ state: 'detached' });
    expect(await region.getByRole('listitem').count()).toBe(2);
    await holdSecond(region.getByRole('button', { name: 'Hands out', exact: true }));
    await region.getByText(milo.name, { exact: true }).waitFor({ state: 'detached' });
  });
});

describe('guests', () => {
  it('checks one in with who briefed them, shows them, and checks them out', async () => {
    const page = bench.page();
    await press(page.getByRole('button', { name: 'Check a guest in' }));
    const dome = page.getByRole('button', { name: 'Hold to check in' });
    await page.getByRole('radio', { name: 'From outside' }).click();
    await page.getByLabel('Name').fill('J. Reed');
    await holdHalfSecond(dome);
    await page.getByText('Say whether the isolator was shown.').first().waitFor();
    await page.getByRole('radio', { name: 'Shown', exact: true }).click();
    await holdHalfSecond(dome);
    const guests = page.getByRole('region', { name: 'Guests' });
    await guests.getByText(/briefed by Milo Venn, knows the isolator/).waitFor();
    await page.goto(benchOf());
    await unlock(page, milo.name);
    await page.getByText(/Guest: J. Reed/).waitFor();
    await press(page.getByRole('banner').getByRole('button'));
    await page
      .getByRole('main')
      .getByText(/Guest: J. Reed/)
      .waitFor();
    await page.goto(`${benchOf()}/people`);
    await unlock(page, milo.name);
    await holdHalfSecond(page.getByRole('button', { name: 'Check J. Reed out' }));
    await guests.getByText('Nobody is checked in.').waitFor();
  });
});

describe('what is due', () => {
  it('lists it with why, and leads to where it is mended', async () => {
    const page = bench.page();
    await goTo(page, 'Bench');
    await page.getByRole('link', { name: /all, and why/ }).click();
    const due = page.getByRole('list', { name: 'Due, the soonest first' });
    const first = await due.getByRole('listitem').first().innerText();
    expect(first).toContain('treat as charged');
    await due.getByRole('link', { name: /Hands in/ }).click();
    await page.getByRole('heading', { name: 'At Kettle' }).waitFor();
    await page.goBack();
    await due.getByRole('link', { name: /Vessel proof test/ }).click();
    await page.waitForURL(new RegExp(`/rigs/${KETTLE.id}$`));
  });
});

describe('pinned lookups', () => {
  it('keeps a "what if" pinned, answers it on the Bench, and leaves the free places to the rest', async () => {
    const page = bench.page();
    await goTo(page, 'Bench');
    const pins = page.getByRole('region', { name: 'Pinned lookups' });
    await pins.getByText('Gap at 1.00 bar(g): breaks between').waitFor();
    await goTo(page, 'Lookups');
    await page.getByRole('main').getByRole('link', { name: /Gap/ }).first().click();
    await page.getByText('nothing fires below').first().waitFor();
    await holdHalfSecond(page.getByRole('button', { name: 'Pin to bench' }));
    await page.getByRole('banner').getByText('to hand over').waitFor();
    await goTo(page, 'Bench');
    await pins.getByText('Gap at 1.00 bar(g): breaks between').waitFor({ state: 'detached' });
    const pin = pins.getByRole('link').first();
    const shown = (await pin.innerText()).replace(/\s+/g, ' ');
    for (const figure of ['16.7', '18.8', '24.3']) expect(shown).toContain(figure);
    await pins.getByText('Stored at the supply’s limit').waitFor();
    await pin.click();
    await page.waitForURL(/\/lookups\/gap\//);
  });
});

describe('at phone size', () => {
  it('keeps tags and stand-down off the readings, and nothing wider than the screen', async () => {
    const page = bench.page();
    await page.setViewportSize(PHONE);
    await page.getByRole('button', { name: /open the places/ }).click();
    await goTo(page, 'Bench');
    await page.getByText('Stored at the supply’s limit').waitFor();
    const zone = page.getByRole('region', { name: 'Actions' });
    expect(await zone.getByRole('button').count()).toBe(1);
    expect(await page.getByRole('button', { name: 'Stand rig down' }).count()).toBe(1);
    expect(await widest(page)).toBeLessThanOrEqual(PHONE.width);
    await press(page.getByRole('banner').getByRole('button'));
    await page.getByRole('main').getByRole('status').getByText('Not known: treat as charged').waitFor();
    expect(await widest(page)).toBeLessThanOrEqual(PHONE.width);
    await page.setViewportSize(TABLET);
  });

  it('shows the state word at 14 mm on the tablet', async () => {
    const page = bench.page();
    // Height of the capitals, not of the line: a canvas measures what is drawn.
    const [cap, mm] = await page.locator('.bench-face-words').evaluate((words) => {
      const style = getComputedStyle(words);
      const context = document.createElement('canvas').getContext('2d');
      if (context === null) throw new Error('no canvas');
      context.font = `${style.fontWeight} ${style.fontSize} ${style.fontFamily}`;
      return [
        context.measureText('N').actualBoundingBoxAscent,
        Number.parseFloat(style.getPropertyValue('--mm')),
      ] as const;
    });
    expect(cap / mm).toBeGreaterThanOrEqual(14);
    const shown = (await page.getByRole('main').innerText()).replace(/\s+/g, ' ');
    for (const label of ['supply’s limit', 'stored at limit', 'wait at least', 'last declared short'])
      expect(shown).toContain(label);
  });
});

describe('an emergency on a locked tablet, started afresh without a network', () => {
  it('opens the card before any PIN and stands the rig down', async () => {
    await bench.page().waitForTimeout(1500);
    await bench.kill();
    await bench.open(`${lab.url}/`);
    await bench.cutNetwork(true);
    const page = bench.page();
    await page.getByText('Choose who you are.').waitFor();
    await page.getByRole('link', { name: 'Emergency' }).click();
    const steps = page.getByRole('list', { name: 'What to do' });
    await steps.getByRole('heading', { name: 'Switch off' }).waitFor();
    await page.getByRole('radio', { name: 'Kettle' }).click();
    await holdSecond(page.getByRole('button', { name: /Stand rig down/ }));
    await page.getByText(/Kettle is stood down: logged/).waitFor();
    await page.getByRole('banner').getByText('stood down').first().waitFor();
  });

  it('walks the make-safe sheet without a PIN as far as the wait', async () => {
    const page = bench.page();
    await press(page.getByRole('button', { name: 'Make-safe sheet' }));
    await press(page.getByRole('button', { name: /Open check: Make safe/ }));
    await page.getByText(/^1 of \d+$/).waitFor();
    await holdHalfSecond(page.getByRole('button', { name: 'Hold to confirm' }));
    await press(page.getByRole('button', { name: 'Start the wait' }));
    await page
      .getByText(/voltage not proven|at least|left/i)
      .first()
      .waitFor();
  });

  it('is claimed after the PIN, and the name stands where the author was open', async () => {
    const page = bench.page();
    await page.goto(benchOf());
    await unlock(page, ada.name);
    await page
      .getByText(/stood down by author open/i)
      .first()
      .waitFor();
    await page.getByRole('link', { name: /all, and why/ }).click();
    await page.getByRole('link', { name: /entries without an author/ }).click();
    const claim = page.getByRole('button', { name: /^Hold: I did th/ });
    await claim.first().waitFor();
    while ((await claim.count()) > 0) {
      const before = await claim.count();
      await holdHalfSecond(claim.first());
      await page.waitForFunction(
        (n) => document.querySelectorAll('.emergency-claims .hold-button').length < n,
        before,
      );
    }
    await page.getByText('Every entry of this tablet has its author.').waitFor();
    await goTo(page, 'Bench');
    await page.getByText(/Stood down by Ada Brook, said afterwards/).waitFor();
    const written = await ownEntries(page);
    expect(written.filter((row) => row.kind === 'entry.claimed').length).toBe(3);
  });

  it('hands everything over once the server is back: authors open, claims applied', async () => {
    await lab.startServer();
    await bench.cutNetwork(false);
    const page = bench.page();
    await page.getByRole('banner').getByText('to hand over').waitFor({ state: 'detached', timeout: 120_000 });
    const rows = await lab.rows(
      "SELECT kind, verdict, author IS NULL AS open FROM entries WHERE kind IN ('rig.stood-down', 'entry.claimed', 'hands.in', 'hands.out', 'guest.in', 'guest.out') AND device = (SELECT device FROM entries WHERE kind = 'entry.claimed' LIMIT 1)",
    );
    const counted = (kind: string) => rows.filter((row) => row['kind'] === kind).length;
    expect(rows.every((row) => row['verdict'] === 'applied')).toBe(true);
    expect(rows.filter((row) => Number(row['open']) === 1).map((row) => row['kind'])).toEqual([
      'rig.stood-down',
    ]);
    expect(['entry.claimed', 'hands.in', 'hands.out', 'guest.in', 'guest.out'].map(counted)).toEqual([
      3, 3, 2, 1, 1,
    ]);
  });
});

async function toPeople(page: Page): Promise<void> {
  await page.getByRole('link', { name: 'Hands and guests' }).click();
  await page.getByRole('heading', { name: 'At Kettle' }).waitFor();
}

function widest(page: Page): Promise<number> {
  return page.evaluate(() => document.documentElement.scrollWidth);
}

/** Offline: a touch and a PIN. */
async function changePerson(page: Page, name: string): Promise<void> {
  await goTo(page, 'Bench');
  await page.getByRole('link', { name: 'Person' }).click();
  await page.getByRole('radio', { name, exact: true }).click();
  await page.getByText(`PIN of ${name}`).waitFor();
  await typePin(page, PIN, 'Open');
  await page.getByRole('banner').getByText(name).waitFor();
}
