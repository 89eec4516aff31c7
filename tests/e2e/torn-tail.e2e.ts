import type { Page } from 'playwright-core';
import { afterAll, beforeAll, expect, it } from 'vitest';
import { holdSecond, signInFirst, unlock } from './support/hands';
import { openLabServer, type LabServer } from './support/lab-server';
import { ownEntries } from './support/own-entries';
import { openTablet, type Tablet } from './support/tablet';
import { tearLogTails } from './support/torn-tail';

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

it('keeps every logged entry when a kill has torn the tail of the browser’s log', async () => {
  const [ada] = lab.signIns.filter((one) => one.role === 'operator');
  if (ada === undefined) throw new Error('no operator among the demo sign-ins');
  await signInFirst(tablet.page(), ada);
  await lab.killServer();
  const logged: string[] = [];
  for (const act of ['Hands in', 'Hands out', 'Hands in']) {
    await holdSecond(tablet.page().getByRole('button', { name: act, exact: true }));
    await tablet
      .page()
      .getByRole('button', { name: act === 'Hands in' ? 'Hands out' : 'Hands in', exact: true })
      .waitFor();
    logged.push(...(await idsOf(tablet.page())).filter((id) => !logged.includes(id)));
    await tablet.kill();
    expect(await tearLogTails(tablet.profile)).toBeGreaterThan(0);
    await tablet.open(`${lab.url}/`);
    await unlock(tablet.page(), ada.name);
    await tablet.page().getByRole('button', { name: 'Stand rig down' }).waitFor();
  }
  expect(logged).toHaveLength(3);
  expect(await idsOf(tablet.page())).toEqual(logged);
});

async function idsOf(page: Page): Promise<readonly string[]> {
  return (await ownEntries(page)).map((row) => row.id);
}
