import { rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { readJson } from './data-folder.mjs';
import { commandLine, startedAt } from './process-table.mjs';
import { sleep } from './programs.mjs';
import { Refusal } from './refusal.mjs';

const patienceMs = 10_000;

/**
 * Who runs from a data folder, written down in it so that a second start can refuse, and so that a start
 * after a kill finds what was left behind. A process is named by number and birth: numbers come back.
 * @param {string} folder
 */
export function runningFile(folder) {
  const file = path.join(folder, 'running.json');
  /** @type {Record<string, {pid: number, since: string}>} */
  let ours = {};

  /** @param {string} role @param {number} pid @param {string} [address] */
  function note(role, pid, address) {
    const since = startedAt(pid);
    if (since === undefined) return;
    ours = { ...ours, [role]: { pid, since, ...(address === undefined ? {} : { address }) } };
    writeFileSync(file, `${JSON.stringify(ours)}\n`);
  }

  return {
    note,
    /** Refuses while another start runs; ends a server that a killed one left. Says whether it did. */
    async takeOver() {
      const found = readJson(file) ?? {};
      const start = alive(found['start']);
      if (start !== undefined) {
        throw new Refusal(
          `Holdoff already runs from ${folder} (process ${start.pid}${start.address === undefined ? '' : `, ${start.address}`}).\n` +
            'Use that one, or stop it with Ctrl-C in its window; or give this one a folder of its own with HOLDOFF_DATA=...',
        );
      }
      let ended = false;
      for (const role of Object.keys(found).filter((name) => name !== 'start')) {
        ended = (await endLeftover(alive(found[role]))) || ended;
      }
      note('start', process.pid);
      return ended;
    },
    forget() {
      rmSync(file, { force: true });
    },
  };
}

/** @param {unknown} noted @returns {{pid: number, since: string, address?: string} | undefined} */
function alive(noted) {
  if (typeof noted !== 'object' || noted === null || !('pid' in noted) || !('since' in noted))
    return undefined;
  const { pid, since } = noted;
  if (typeof pid !== 'number' || typeof since !== 'string' || startedAt(pid) !== since) return undefined;
  const address = 'address' in noted && typeof noted.address === 'string' ? { address: noted.address } : {};
  return commandLine(pid) === undefined ? undefined : { pid, since, ...address };
}

/** @param {{pid: number, since: string} | undefined} left */
async function endLeftover(left) {
  if (left === undefined) return false;
  signal(left.pid, 'SIGTERM');
  const deadline = performance.now() + patienceMs;
  while (startedAt(left.pid) === left.since && performance.now() < deadline) await sleep(50);
  if (startedAt(left.pid) === left.since) signal(left.pid, 'SIGKILL');
  return true;
}

/** @param {number} pid @param {NodeJS.Signals} name */
function signal(pid, name) {
  try {
    process.kill(pid, name);
  } catch {
    // It ended by itself in the meantime.
  }
}
