import type { Page } from 'playwright-core';
import { holdHalfSecond, holdSecond, keyIn, PIN, press } from './hands';

export interface WalkOptions {
  /** Who stands by, and has signed in on this tablet before. */
  readonly second: string;
  /** Reading steps by title; what is not named reads 0. */
  readonly readings: Readonly<Record<string, string>>;
}

const MOST_STEPS = 40;
const WAIT_PATIENCE_MS = 90_000;

/** Walks every step of the open check as a person would, and closes it. */
export async function walkCheck(page: Page, options: WalkOptions): Promise<void> {
  await page.waitForURL(/\/checks\/[0-9a-f-]{36}$/);
  await page.getByText(/^1 of \d+$/).waitFor();
  for (let step = 0; step < MOST_STEPS; step += 1) {
    const title = await page.getByRole('main').getByRole('heading', { level: 1 }).first().innerText();
    if (title.startsWith('Every step is done')) {
      await holdSecond(page.getByRole('button', { name: 'Close check' }));
      await page.getByRole('heading', { name: /closed/i }).waitFor();
      return;
    }
    await doStep(page, title, options);
    await page.waitForFunction((before) => document.querySelector('main h1')?.textContent !== before, title);
  }
  throw new Error('the check has no end');
}

async function doStep(page: Page, title: string, { second, readings }: WalkOptions): Promise<void> {
  const dome = (name: string) => page.getByRole('button', { name, exact: true });
  if (await dome('Hold to confirm').isVisible()) return holdHalfSecond(dome('Hold to confirm'));
  if (await dome('Start the wait').isVisible()) {
    await press(dome('Start the wait'));
    await dome('Hold: I short now').waitFor({ timeout: WAIT_PATIENCE_MS });
    return holdHalfSecond(dome('Hold: I short now'));
  }
  if (await dome('Enter their PIN').isVisible()) {
    await page.getByRole('radio', { name: second }).click();
    await press(dome('Enter their PIN'));
    await page.getByRole('group', { name: `PIN of ${second}` }).waitFor();
    for (const figure of PIN) await page.keyboard.press(figure);
    return page.keyboard.press('Enter');
  }
  if (await dome('Take photo').isVisible()) {
    await press(dome('Waive step'));
    await page.getByRole('dialog').getByRole('textbox').fill('The camera is in use at the other bench');
    return holdHalfSecond(page.getByRole('dialog').getByRole('button', { name: 'Hold to waive' }));
  }
  await page.locator('.quantity-value').click();
  await keyIn(page, readings[title] ?? '0');
  await holdHalfSecond(dome('Hold to log'));
}
