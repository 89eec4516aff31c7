import { openClient, type HoldoffClient } from '../holdoff-client';
import type { LabClient } from '../lab-client';
import { seededBytes } from './chance';
import { memoryBrowser, type MemoryBrowser, type MemoryTab } from './memory-browser';
import { modelLab, PASSWORD, type ModelLab } from './model-lab';
import { virtualTime, type VirtualTime } from './virtual-time';

/** Enough to be slow for nobody: what is tested is the counting, not the hardness. */
const QUICK_PIN = 10;
export const PIN = '271828';

export interface World {
  readonly time: VirtualTime;
  readonly lab: ModelLab;
  readonly newBrowser: () => MemoryBrowser;
}

export function newWorld(seed = 1): World {
  const time = virtualTime();
  const random = seededBytes(seed);
  const wall = time.clock().wallMs;
  const lab = modelLab(random, wall);
  let browsers = 0;
  return {
    time,
    lab,
    newBrowser: () => {
      browsers += 1;
      return memoryBrowser({ time, seed: seed * 1000 + browsers, http: lab.server.http });
    },
  };
}

export interface OpenTab {
  readonly tab: MemoryTab;
  readonly client: HoldoffClient;
}

/** Opens a tab whose handover is moved by hand, unless asked otherwise. */
export async function openTab(browser: MemoryBrowser, exchanges_by_itself = false): Promise<OpenTab> {
  const tab = browser.openTab();
  const client = await openClient(tab.ports, {
    pin_iterations: QUICK_PIN,
    ballast_MB: 1,
    exchanges_by_itself,
  });
  return { tab, client };
}

export async function signIn(client: HoldoffClient, name: 'Ada' | 'Milo' | 'Inge'): Promise<LabClient> {
  const outcome = await client.signIn({
    email: `${name.toLowerCase()}@lab.example`,
    password: PASSWORD,
    device_name: 'bench tablet',
  });
  if (outcome.type !== 'signed-in') throw new Error(`sign-in failed: ${JSON.stringify(outcome)}`);
  const lab = labOf(client);
  if (outcome.pin_needed) await lab.session.setPin(PIN);
  return lab;
}

export function labOf(client: HoldoffClient): LabClient {
  const lab = client.lab();
  if (lab === null) throw new Error('no lab is open');
  return lab;
}

/** One round of the handover, hello and all. */
export async function exchange(lab: LabClient): Promise<string> {
  const outcome = await lab.exchange.round(new AbortController().signal, { greet: true });
  return outcome.type === 'later' || outcome.type === 'paused' ? outcome.state : outcome.type;
}
