import { afterAll, beforeAll, expect, it } from 'vitest';
import { signInFirst } from './support/hands';
import { openLabServer, type LabServer } from './support/lab-server';
import { openTablet, type Tablet } from './support/tablet';

/** One rig in every place that shows it: the server's paper, lookups, Bench, rig, editor and a firing. */
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
  // Within the app: a new page would ask for the PIN again.
  const shown = async (path: string, ready: string | RegExp): Promise<string> => {
    await page.evaluate((to) => {
      window.history.pushState({}, '', to);
      window.dispatchEvent(new PopStateEvent('popstate'));
    }, path);
    await page.getByText(ready).first().waitFor();
    return (await page.locator('body').innerText()).replace(/[\s\u2009\u00a0]+/g, ' ');
  };
  const paper = await shown(`/desk/rigs/${id}`, `nothing fires below`);
  const sides = /below ([\d.]+) kV, the law says ([\d.]+) kV, and the gap may hold up to ([\d.]+) kV/.exec(
    paper,
  );
  const stored = /Stored at the supply’s limit ([\d.]+) J/.exec(paper)?.[1];
  const reach = /The supply reaches ([\d.]+) kV/.exec(paper)?.[1];
  if (sides === null || stored === undefined || reach === undefined)
    throw new Error(`no figures on: ${paper}`);
  const [, low = '', law = '', high = ''] = sides;

  const places: readonly (readonly [place: string, text: string, figures: readonly string[]])[] = [
    ['gap lookup', await shown(`/lookups/gap/${id}`, 'may hold up to'), [low, law, high]],
    ['capacitor lookup', await shown(`/lookups/capacitor/${id}`, /Stored/), []],
    ['Bench', await shown(`/bench/${id}`, 'Stored at the supply'), [low, law, high, stored]],
    ['rig', await shown(`/rigs/${id}`, 'Stored at the supply'), [stored, reach]],
    ['editor', await shown(`/rigs/${id}/revise`, 'What comes out'), [stored, law]],
  ];
  const missing = places.flatMap(([place, text, figures]) =>
    figures.filter((figure) => !text.includes(figure)).map((figure) => `${place} lacks ${figure}: ${text}`),
  );
  expect(missing).toEqual([]);
});
