import { type ChildProcess, spawn } from 'node:child_process';
import { mkdtemp, readFile, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { setTimeout as sleep } from 'node:timers/promises';
import { chromium, type Browser, type BrowserContext, type Page } from 'playwright-core';

/** A tablet is a real Chromium process on a profile of its own that outlives it. */
export interface Tablet {
  /** Folder of the browser's profile. */
  readonly profile: string;
  readonly page: () => Page;
  /** `kill -9` of the whole browser, as a dying battery would. */
  kill(): Promise<void>;
  /** Stops every process of the browser where it stands, as the instant before a power cut. */
  freeze(): void;
  /** Opens the browser again on the same profile. */
  open(url?: string): Promise<void>;
  cutNetwork(cut: boolean): Promise<void>;
  /** Console errors and page errors since the start, for a test to look at. */
  readonly errors: string[];
  close(): Promise<void>;
}

export interface Size {
  readonly width: number;
  readonly height: number;
}

export const TABLET: Size = { width: 1180, height: 820 };
export const PHONE: Size = { width: 390, height: 844 };
export const DESK: Size = { width: 1440, height: 900 };

const CHROMIUM = '/usr/bin/chromium';
const FLAGS = [
  '--headless',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
  '--remote-debugging-port=0',
];

interface Running {
  readonly child: ChildProcess;
  readonly browser: Browser;
  readonly context: BrowserContext;
  readonly page: Page;
}

/** `within` is the folder in which the profile is made: a disk of its own, for a test that cuts its power. */
export async function openTablet(
  url: string,
  size: Size = TABLET,
  within: string = tmpdir(),
): Promise<Tablet> {
  const profile = await mkdtemp(path.join(within, 'holdoff-tablet-'));
  const errors: string[] = [];
  let running: Running | undefined;
  const must = (): Running => {
    if (running === undefined) throw new Error('the tablet is off');
    return running;
  };
  const open = async (to: string = url) => {
    running = await launch(profile, size, errors);
    await running.page.goto(to, { waitUntil: 'commit' });
  };
  const kill = async () => {
    const { child } = must();
    running = undefined;
    await killGroup(child);
  };
  await open();
  return {
    profile,
    page: () => must().page,
    kill,
    freeze: () => {
      const { child } = must();
      if (child.pid !== undefined) process.kill(-child.pid, 'SIGSTOP');
    },
    open,
    errors,
    cutNetwork: (cut) => must().context.setOffline(cut),
    close: async () => {
      if (running !== undefined) await kill();
      await rm(profile, { recursive: true, force: true, maxRetries: 5 });
    },
  };
}

async function launch(profile: string, size: Size, errors: string[]): Promise<Running> {
  const rootFlags = process.getuid?.() === 0 ? ['--no-sandbox'] : [];
  const portFile = path.join(profile, 'DevToolsActivePort');
  await rm(portFile, { force: true });
  const child = spawn(
    CHROMIUM,
    [
      ...FLAGS,
      ...rootFlags,
      `--window-size=${size.width},${size.height}`,
      `--user-data-dir=${profile}`,
      'about:blank',
    ],
    {
      detached: true,
      stdio: 'ignore',
    },
  );
  const port = await debuggingPort(portFile);
  const browser = await chromium.connectOverCDP(`http://127.0.0.1:${port}`);
  const [context] = browser.contexts();
  if (context === undefined) throw new Error('Chromium opened no context');
  const page = context.pages()[0] ?? (await context.newPage());
  await page.setViewportSize(size);
  page.on('console', (message) => {
    if (message.type() === 'error') errors.push(message.text());
  });
  page.on('pageerror', (error) => errors.push(error.message));
  return { child, browser, context, page };
}

async function debuggingPort(file: string): Promise<string> {
  for (let attempt = 0; attempt < 300; attempt += 1) {
    const text = await readFile(file, 'utf8').catch(() => '');
    const [port] = text.split('\n');
    if (port !== undefined && /^\d+$/.test(port)) return port;
    await sleep(100);
  }
  throw new Error('Chromium did not say its debugging port');
}

async function killGroup(child: ChildProcess): Promise<void> {
  if (child.pid === undefined || child.exitCode !== null) return;
  const exit = new Promise((resolve) => child.once('exit', resolve));
  process.kill(-child.pid, 'SIGKILL');
  await exit;
  // Helper processes let go of the profile a moment after their parent.
  await sleep(300);
}
