import type { Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { HERON } from '../../seeds/rigs/heron';
import { holdHalfSecond, keyIn, press, signInFirst, unlock } from './support/hands';
import { openLabServer, type LabServer, type SignIn } from './support/lab-server';
import { ownEntries } from './support/own-entries';
import { openTablet, TABLET, type Tablet } from './support/tablet';

/**
 * With the network cut: a note is written, kept as a draft through a kill, amended and struck; a photo is made smaller,
 * kept and seen again; an oscilloscope's file with decimal commas is plotted without losing its one-point spike, kept,
 * and opened again from the tablet's own bytes.
 */
const POINTS = 20_000;
const SPIKE_AT = 12_345;

/** 16 kV behind a divider of 1,000, rising in 10 ns at 2 \u00b5s; one point of -9 V far behind it. */
function csv(points: number): string {
  const lines = ['Model;Bench 4', 'Saved;yes', 'Time (ns);CH1 (V);CH2 (mV)'];
  const comma = (value: number) => value.toFixed(4).replace('.', ',');
  for (let i = 0; i < points; i++) {
    const t = i * 0.5;
    const rise = Math.min(1, Math.max(0, (t - 2000) / 10));
    const tail = t > 2010 ? Math.exp(-(t - 2010) / 400) : 1;
    const value = i === SPIKE_AT ? -9 : 16 * rise * tail;
    lines.push(`${comma(t)};${comma(value)};${comma(10 * rise)}`);
  }
  return `${lines.join('\r\n')}\r\n`;
}

let lab: LabServer;
let ada: SignIn;
let tablet: Tablet;

beforeAll(async () => {
  lab = await openLabServer();
  const found = lab.signIns.find((one) => one.role === 'operator');
  if (found === undefined) throw new Error('no demo sign-in for an operator');
  ada = found;
  tablet = await openTablet(lab.url, TABLET);
  await signInFirst(tablet.page(), ada);
  await tablet.page().evaluate(async () => (await navigator.serviceWorker.ready).scope);
  await tablet.cutNetwork(true);
}, 180_000);

afterAll(async () => {
  await tablet?.close();
  await lab?.close();
});

describe('notes and photos, offline', () => {
  it('keeps a note being typed through a kill', async () => {
    await open(`/notes/rig/${HERON.id}`);
    await tablet.page().getByLabel('New note').fill('Film stained at the B end');
    // Drafts are durable within 250 ms; a loaded machine gets longer.
    await tablet.page().waitForTimeout(1000);
    await tablet.kill();
    await tablet.open(`${lab.url}/notes/rig/${HERON.id}`);
    await tablet.cutNetwork(true);
    await unlock(tablet.page(), ada.name);
    const field = tablet.page().getByLabel('New note');
    await field.waitFor();
    expect(await field.inputValue()).toBe('Film stained at the B end');
  });

  it('logs it, amends it with both versions readable, and strikes it', async () => {
    const page = tablet.page();
    await holdHalfSecond(page.getByRole('button', { name: 'Hold to log note' }));
    const notes = page.getByRole('list', { name: 'Notes' });
    await notes.getByText('Film stained at the B end').waitFor();
    await press(notes.getByRole('button', { name: 'Amend' }).first());
    await page.getByLabel('Amended note').fill('Film stained at the A end');
    await holdHalfSecond(page.getByRole('button', { name: 'Hold to log change' }));
    await notes.getByText('Film stained at the A end').waitFor();
    await press(notes.getByRole('button', { name: 'The version before' }).first());
    await notes.getByText('Film stained at the B end').waitFor();
    await press(notes.getByRole('button', { name: 'Strike' }).first());
    await page.getByRole('dialog').getByLabel('Why').fill('Wrong rig');
    await holdHalfSecond(page.getByRole('button', { name: 'Hold to strike' }));
    await notes.getByText(/Wrong rig/).waitFor();
    expect(await kinds(page)).toEqual(['note.written', 'note.amended', 'entry.struck']);
  });

  it('shrinks a photo, keeps it with its words, and shows it again after a reload', async () => {
    const page = tablet.page();
    await page.getByLabel('Photo', { exact: true }).setInputFiles({
      name: 'IMG_1.png',
      mimeType: 'image/png',
      buffer: await picture(page, 2400, 1200),
    });
    await page.getByRole('img', { name: 'The photo, not kept yet' }).waitFor();
    await page.getByLabel('Words under the photo').fill('Stain at the A end');
    await holdHalfSecond(page.getByRole('button', { name: 'Hold to keep photo' }));
    await page.getByRole('list', { name: 'Photos' }).getByText('Stain at the A end').waitFor();
    await open(`/notes/rig/${HERON.id}`);
    const small = page.getByRole('img', { name: 'Stain at the A end' });
    await small.waitFor();
    const size = await small.evaluate(async (img: HTMLImageElement) => {
      await img.decode();
      return [img.naturalWidth, img.naturalHeight];
    });
    expect(size).toEqual([1600, 800]);
    await press(page.getByRole('button', { name: 'Whole photo: Stain at the A end' }));
    await page.getByRole('dialog', { name: 'Stain at the A end' }).waitFor();
    await press(page.getByRole('button', { name: 'Close', exact: true }));
  });
});

describe('a trace, offline', () => {
  it('plots a file with decimal commas over the circuit, spike and all, and keeps it', async () => {
    const page = tablet.page();
    await open(`/firings/of/${HERON.id}`);
    await page.locator('a[href^="/firings/"]:not([href*="/of/"])').first().waitFor();
    const firing = await firingWithReadings(page);
    await open(`${firing}/traces`);
    await choose(page, 'shot-7.csv', csv(POINTS));
    await page
      .getByText(/20,000 points in 2 channels; separated by semicolons, decimal commas, 3 header lines/)
      .waitFor();
    await figure(page, 'Probe ratio, CH1', '1000');
    const table = page.getByRole('table', { name: 'Trace of CH1' });
    await table.getByText('\u22129.00').first().waitFor({ state: 'attached' });
    expect((await table.innerText()).includes('simulated')).toBe(true);
    const figures = page.getByRole('table', { name: 'Figures of CH1' });
    expect(await figures.innerText()).toMatch(/Peak, from rest\s+16\.0\s*kV/);
    expect(await figures.innerText()).toMatch(/Rise, 10 to 90 %\s+8\.00\s*ns/);
    await holdHalfSecond(page.getByRole('button', { name: 'Hold to keep trace' }));
    await page.getByText('shot-7.csv: logged', { exact: false }).waitFor();
    expect((await kinds(page)).at(-1)).toBe('trace.attached');
  });

  it('opens it again from its own bytes and looks further in', async () => {
    const page = tablet.page();
    await open(new URL(page.url()).pathname);
    await press(page.getByRole('button', { name: 'Open shot-7.csv' }));
    await page.getByRole('table', { name: 'Figures of CH1' }).waitFor();
    expect(await page.getByRole('table', { name: 'Figures of CH1' }).innerText()).toMatch(/16\.0\s*kV/);
    for (let i = 0; i < 3; i++) await press(page.getByRole('button', { name: 'Further in' }));
    await press(page.getByRole('button', { name: 'To the pulse' }));
    await page.getByRole('table', { name: 'Trace of CH1' }).waitFor({ state: 'attached' });
    expect(tablet.errors.filter((words) => !/net::ERR_|Failed to fetch/.test(words))).toEqual([]);
  });

  it('refuses what is no table, in words', async () => {
    const page = tablet.page();
    await choose(page, 'notes.txt', 'nothing to be read here\nat all\n');
    await page
      .getByRole('alert')
      .getByText(/No table of figures/)
      .waitFor();
  });
});

async function choose(page: Page, name: string, text: string): Promise<void> {
  const buffer = Buffer.from(text);
  await page.getByLabel('Trace file').setInputFiles({ name, mimeType: 'text/csv', buffer });
}

/** A large picture, made by the browser itself. */
async function picture(page: Page, width: number, height: number): Promise<Buffer> {
  const base64 = await page.evaluate(
    ([w, h]) => {
      const canvas = document.createElement('canvas');
      canvas.width = w ?? 0;
      canvas.height = h ?? 0;
      const drawing = canvas.getContext('2d');
      drawing?.fillRect(100, 100, 500, 500);
      return canvas.toDataURL('image/png').split(',')[1] ?? '';
    },
    [width, height],
  );
  return Buffer.from(base64, 'base64');
}

/** Path of the first firing in the list. */
async function firingWithReadings(page: Page): Promise<string> {
  const hrefs = await page
    .locator('main a[href^="/firings/"]')
    .evaluateAll((links) => links.map((link) => link.getAttribute('href') ?? ''));
  const found = hrefs.find((href) => /^\/firings\/[0-9a-f-]{36}$/.test(href));
  if (found === undefined) throw new Error('the demo lab has no firing of this rig');
  return found;
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

/** A new page life at a path: the tablet is locked then. */
async function open(path: string): Promise<void> {
  const page = tablet.page();
  await page.goto(`${lab.url}${path}`);
  await unlock(page, ada.name);
}
