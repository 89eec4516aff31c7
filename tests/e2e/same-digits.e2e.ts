import { afterAll, beforeAll, expect, it } from 'vitest';
import { signInFirst } from './support/hands';
import { openLabServer, type LabServer } from './support/lab-server';
import { openTablet, type Tablet } from './support/tablet';

/** One rig in every place that shows it: the server's paper, lookups, Bench, rig, editor and a firing. */
const PATIENCE = { timeout: 20_000, interval: 250 };

let lab: LabServer;
let tablet: Tablet;

beforeAll(async () => {
  lab = await openLabServer();
  tablet = await openTablet(lab.url);
}, 180_000);

afterAll(async () => {
  await tablet?.close();
  await lab?.close();
});

it.each(['Kettle', 'Wren', 'Heron'])('gives the same digits wherever %s is shown', async (name) => {
  const page = tablet.page();
  if (name === 'Kettle') {
    const [milo] = lab.signIns.filter((one) => one.role === 'reviewer');
    if (milo === undefined) throw new Error('no reviewer among the demo sign-ins');
    await signInFirst(page, milo);
  }
  const [row] = await lab.rows(
    `SELECT id FROM documents WHERE kind = 'rig' AND JSON_VALUE(doc, '$.name') = ?`,
    [name],
  );
  const id = String(row?.['id']);
  // Within the app: a new page would ask for the PIN again. What is not there yet is waited for, never guessed.
  const shown = async (path: string, figures: readonly (string | RegExp)[]): Promise<string> => {
    await page.evaluate((to) => {
      window.history.pushState({}, '', to);
      window.dispatchEvent(new PopStateEvent('popstate'));
    }, path);
    const read = async () => (await page.locator('body').innerText()).replace(/\s+/g, ' ');
    for (const figure of figures) {
      const there = (text: string) =>
        typeof figure === 'string' ? text.includes(` ${figure} `) : figure.test(text);
      await expect
        .poll(async () => there(await read()) || `${path} lacks ${String(figure)}`, PATIENCE)
        .toBe(true);
    }
    return read();
  };
  const sides = /below ([\d.]+) kV, the law says ([\d.]+) kV, and the gap may hold up to ([\d.]+) kV/;
  const energy = /Stored at the supply’s limit ([\d.]+) J/;
  const supply = /The supply reaches (?:[\d.]+ to [\d.]+ )?([\d.]+) kV/;
  const paper = await shown(`/desk/rigs/${id}`, [sides, energy, supply]);
  const [, low = '', law = '', high = ''] = sides.exec(paper) ?? [];
  const stored = energy.exec(paper)?.[1] ?? '';
  const reach = supply.exec(paper)?.[1] ?? '';

  await shown(`/lookups/gap/${id}`, [low, law, high]);
  // That lookup asks about one capacitor; an inversion charges both.
  if (name !== 'Heron') await shown(`/lookups/capacitor/${id}`, [stored]);
  await shown(`/bench/${id}`, [low, law, high, stored]);
  await shown(`/rigs/${id}`, [stored, reach]);
  await shown(`/rigs/${id}/revise`, ['Revise', stored, law, reach]);
});
