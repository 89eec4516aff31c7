import { spawn } from 'node:child_process';
import { createWriteStream, existsSync, mkdirSync, renameSync, statSync } from 'node:fs';
import path from 'node:path';
import { createInterface } from 'node:readline';
import { settlesWithin, tiedToParent } from './programs.mjs';
import { Refusal } from './refusal.mjs';

const largestLogBytes = 8_000_000;
const readyPatienceMs = 60_000;
const stopPatienceMs = 15_000;
const warnLevel = 40;

/**
 * Starts a long-running Node child: its log goes to a file, what a person should see to the terminal.
 * @param {{name: string, args: string[], cwd: string, env: NodeJS.ProcessEnv, logFile: string, say: (line: string) => void}} options
 */
export function startServer({ name, args, cwd, env, logFile, say }) {
  const log = openLog(logFile);
  const tied = tiedToParent(process.execPath, args);
  // In a session of its own, so that Ctrl-C reaches it once, from here, and in the right order.
  const child = spawn(tied.command, tied.args, {
    cwd,
    env,
    stdio: ['ignore', 'pipe', 'pipe'],
    detached: true,
  });
  /** @type {(address: string) => void} */
  let announce = () => undefined;
  /** @type {Promise<string>} */
  const announced = new Promise((resolve) => (announce = resolve));
  const last = /** @type {string[]} */ ([]);
  for (const stream of [child.stdout, child.stderr]) {
    createInterface({ input: stream }).on('line', (line) => {
      log.write(`${line}\n`);
      last.push(line);
      if (last.length > 15) last.shift();
      const address = /^holdoff listening (\S+)/.exec(line)?.[1];
      if (address !== undefined) announce(address);
      else for (const shown of worthShowing(line, stream === child.stderr)) say(shown);
    });
  }
  /** @type {Promise<string>} */
  const exited = new Promise((resolve) => {
    child.once('error', (error) => resolve(error.message));
    child.once('close', (code, signal) => resolve(signal ?? `exit code ${code}`));
  });
  void exited.then(() => log.end());

  return {
    pid: child.pid,
    /** How it ended, once it has. */
    exited,
    /** The address that it announces, once it answers there. */
    async ready() {
      const firstWord = Promise.race([
        announced.then((address) => ({ address })),
        exited.then((how) => ({ how })),
      ]);
      const outcome = (await settlesWithin(firstWord, readyPatienceMs))
        ? await firstWord
        : { how: `no answer after ${readyPatienceMs / 1000} s` };
      if ('address' in outcome) return outcome.address;
      throw new Refusal(
        `${name} did not start (${outcome.how}). Its last words, from ${logFile}:\n${last.join('\n')}`,
      );
    },
    async stop() {
      child.kill('SIGTERM');
      if (await settlesWithin(exited, stopPatienceMs)) return;
      say(`${name} does not end by itself after ${stopPatienceMs / 1000} s: ending it.`);
      child.kill('SIGKILL');
      await exited;
    },
  };
}

/** @param {string} file */
function openLog(file) {
  mkdirSync(path.dirname(file), { recursive: true });
  if (existsSync(file) && statSync(file).size > largestLogBytes) renameSync(file, `${file}.1`);
  return createWriteStream(file, { flags: 'a', mode: 0o600 });
}

/** @param {string} line @param {boolean} isError @returns {string[]} */
function worthShowing(line, isError) {
  if (!line.startsWith('{')) return isError && line.trim() !== '' ? [line] : [];
  try {
    const { level, msg, error, err, requestId } = JSON.parse(line);
    if (typeof level !== 'number' || level < warnLevel) return [];
    const reason = error?.message ?? err?.message;
    const parts = [msg, reason, requestId === undefined ? undefined : `request ${requestId}`];
    return [
      `${level > warnLevel ? 'error' : 'warning'}: ${parts.filter((part) => part !== undefined).join(' · ')}`,
    ];
  } catch {
    return [];
  }
}
