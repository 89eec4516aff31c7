import type { Locator, Page } from 'playwright-core';
import type { SignIn } from './lab-server';

/** What a person's hands do on a tablet. Presses are a mouse's: an instant touch would count as electrical noise. */
export const PIN = '271828';

const HOLD_MARGIN_MS = 250;

export async function press(button: Locator, hold_ms = 60): Promise<void> {
  await button.waitFor({ state: 'visible' });
  await button.scrollIntoViewIfNeeded();
  const box = await button.boundingBox();
  if (box === null) throw new Error('there is nothing to press');
  const page = button.page();
  await page.mouse.move(box.x + box.width / 2, box.y + Math.min(box.height / 2, box.height - 4));
  await page.mouse.down();
  await page.waitForTimeout(hold_ms);
  await page.mouse.up();
}

export const holdHalfSecond = (button: Locator) => press(button, 500 + HOLD_MARGIN_MS);
export const holdSecond = (button: Locator) => press(button, 1000 + HOLD_MARGIN_MS);

export async function typePin(page: Page, pin: string, enter: string): Promise<void> {
  for (const figure of pin) await press(page.getByRole('button', { name: figure, exact: true }));
  await press(page.getByRole('button', { name: enter, exact: true }));
}

/** First sign-in of a person on this tablet: e-mail, password, and a PIN chosen twice. */
export async function signInFirst(page: Page, who: SignIn): Promise<void> {
  await page.getByLabel('E-mail').fill(who.email);
  await page.getByLabel('Password').fill(who.password);
  await page.getByRole('button', { name: 'Sign in', exact: true }).click();
  await page.getByText(`${who.name}, choose a PIN`).waitFor();
  await typePin(page, PIN, 'Next');
  await page.getByText('The same PIN again').waitFor();
  await typePin(page, PIN, 'Next');
  await page.waitForURL(/\/bench\/[0-9a-f-]{36}/);
}

/** Opens a locked tablet, offline or not. */
export async function unlock(page: Page, name: string): Promise<void> {
  await page.getByRole('radio', { name, exact: true }).click();
  await page.getByText(`PIN of ${name}`).waitFor();
  await typePin(page, PIN, 'Open');
}

export async function goTo(page: Page, place: string): Promise<void> {
  await page.getByRole('navigation', { name: 'Places' }).getByRole('link', { name: place }).click();
}

export async function takeRig(page: Page, name: string): Promise<void> {
  await goTo(page, 'Rigs');
  await page.getByRole('main').getByText(name, { exact: true }).first().click();
  await page.getByRole('banner').getByText(name, { exact: true }).waitFor();
}

/** Types into the open keypad by its own keys, and enters. Letters have no key there. */
export async function keyIn(page: Page, text: string): Promise<void> {
  const keypad = page.locator('.keypad');
  const key = (name: string | RegExp) =>
    keypad.getByRole('button', typeof name === 'string' ? { name, exact: true } : { name });
  await press(key('Clear'));
  for (const figure of text) {
    if (figure === '-') await press(key(/^minus$/i));
    else if (figure === '.') await press(key(/^point$/i));
    else if (/\d/.test(figure)) await press(key(figure));
  }
  await press(keypad.locator('.key.enter'));
}
