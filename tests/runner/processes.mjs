import { spawn } from 'node:child_process';
import { randomUUID } from 'node:crypto';
import { mkdtempSync, readFileSync, readdirSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { sleep, tiedToParent } from '../../server/launch/programs.mjs';

const markName = 'HOLDOFF_TEST_RUN';
const patienceMs = 5000;

/**
 * Starts programs and finds all that came of them again. Browsers and databases leave the process group of
 * their parent, and may outlive it; a mark in the environment is handed down to all of them, and is this
 * run's alone, so nothing foreign can be hit. Likewise all of them put their temporary files into one folder.
 */
export function createProcessKeeper() {
  const mark = randomUUID();
  const folder = mkdtempSync(path.join(tmpdir(), 'holdoff-run-'));
  const environment = { ...process.env, [markName]: mark, TMPDIR: folder };
  delete environment['NODE_ENV'];
  return {
    folder,
    /** Ends everything and takes the temporary files away. */
    async close() {
      await this.stopAll();
      rmSync(folder, { recursive: true, force: true, maxRetries: 3 });
    },
    /**
     * @param {readonly string[]} args arguments for Node
     * @param {{cwd: string, env?: NodeJS.ProcessEnv}} options
     * @returns {Promise<number>} the exit code
     */
    node(args, options) {
      const tied = tiedToParent(process.execPath, args);
      const child = spawn(tied.command, tied.args, {
        cwd: options.cwd,
        env: { ...environment, ...options.env },
        stdio: ['ignore', 'inherit', 'inherit'],
        detached: true,
      });
      return new Promise((resolve) => {
        child.on('error', () => resolve(127));
        child.on('close', (code) => resolve(code ?? 1));
      });
    },
    /** Stops whatever still carries the mark, and names it. */
    async stopAll() {
      const names = marked(mark).map((found) => found.command);
      if (names.length === 0) return [];
      signalAll(mark, 'SIGTERM');
      const deadline = performance.now() + patienceMs;
      while (marked(mark).length > 0 && performance.now() < deadline) await sleep(100);
      signalAll(mark, 'SIGKILL');
      return names;
    },
  };
}

/** @param {string} mark @param {NodeJS.Signals} signal */
function signalAll(mark, signal) {
  for (const { pid } of marked(mark)) {
    try {
      process.kill(pid, signal);
    } catch {
      // It ended between being listed and being signalled.
    }
  }
}

/** @param {string} mark */
function marked(mark) {
  const needle = `${markName}=${mark}`;
  return readdirSync('/proc')
    .filter((name) => /^\d+$/.test(name) && Number(name) !== process.pid)
    .flatMap((name) => {
      try {
        if (!readFileSync(`/proc/${name}/environ`, 'latin1').split('\0').includes(needle)) return [];
        const command = readFileSync(`/proc/${name}/cmdline`, 'latin1').replaceAll('\0', ' ').trim();
        return [{ pid: Number(name), command: command.slice(0, 120) }];
      } catch {
        return [];
      }
    });
}
