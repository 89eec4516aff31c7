import { spawn, spawnSync } from 'node:child_process';
import { accessSync, constants } from 'node:fs';
import path from 'node:path';

// The search path of a normal user on Debian lacks the folders where servers are installed.
const systemFolders = ['/usr/sbin', '/usr/bin', '/sbin', '/bin', '/usr/local/sbin', '/usr/local/bin'];

/**
 * The full path of a program, or undefined. `HOLDOFF_PROGRAM_PATH` replaces the folders that are searched.
 * @param {string} name
 * @returns {string | undefined}
 */
export function findProgram(name) {
  const given = process.env['HOLDOFF_PROGRAM_PATH'];
  const folders =
    given === undefined ? [...(process.env['PATH'] ?? '').split(':'), ...systemFolders] : given.split(':');
  return folders
    .filter((folder) => folder !== '')
    .map((folder) => path.join(folder, name))
    .find(isExecutable);
}

/** @param {string} file */
function isExecutable(file) {
  try {
    accessSync(file, constants.X_OK);
    return true;
  } catch {
    return false;
  }
}

/**
 * Command and arguments that make a child die with its parent, where the system offers that: a start script
 * that is killed without warning leaves no server and no database behind.
 * @param {string} command
 * @param {readonly string[]} args
 * @returns {{command: string, args: string[]}}
 */
export function tiedToParent(command, args) {
  const setpriv = findProgram('setpriv');
  if (setpriv === undefined) return { command, args: [...args] };
  return { command: setpriv, args: ['--pdeathsig', 'TERM', '--', command, ...args] };
}

/**
 * Runs a program to its end, and ends it with this process unless it `outlives` it.
 * @param {string} command
 * @param {readonly string[]} args
 * @param {{cwd?: string, env?: NodeJS.ProcessEnv, input?: string, timeoutMs?: number, outlives?: boolean}} [options]
 * @returns {Promise<{ok: boolean, output: string}>} `output` holds both streams
 */
export function run(command, args, options = {}) {
  const { cwd, env = process.env, input, timeoutMs, outlives = false } = options;
  const tied = outlives ? { command, args } : tiedToParent(command, args);
  const child = spawn(tied.command, tied.args, {
    ...(cwd === undefined ? {} : { cwd }),
    env,
    stdio: [input === undefined ? 'ignore' : 'pipe', 'pipe', 'pipe'],
    ...(timeoutMs === undefined ? {} : { timeout: timeoutMs, killSignal: 'SIGKILL' }),
  });
  if (input !== undefined) child.stdin?.on('error', () => undefined).end(input);
  let output = '';
  for (const stream of [child.stdout, child.stderr]) {
    stream?.setEncoding('utf8').on('data', (text) => (output += text));
  }
  return new Promise((resolve) => {
    child.on('error', (error) => resolve({ ok: false, output: `${output}${error.message}` }));
    child.on('close', (code) => resolve({ ok: code === 0, output }));
  });
}

/** Name of the account that this process runs under, as the database sees it at its socket. */
export function accountName() {
  const answer = spawnSync(findProgram('id') ?? 'id', ['-un'], { encoding: 'utf8' });
  return answer.stdout.trim();
}

/** @param {string} text @param {number} count */
export function lastLines(text, count) {
  return text.trimEnd().split('\n').slice(-count).join('\n');
}

/** @param {number} ms @returns {Promise<void>} */
export function sleep(ms) {
  return new Promise((resolve) => setTimeout(resolve, ms));
}

/**
 * Whether a promise settles in time; leaves no timer behind that would keep the process alive.
 * @param {Promise<unknown>} promise
 * @param {number} ms
 * @returns {Promise<boolean>}
 */
export async function settlesWithin(promise, ms) {
  /** @type {NodeJS.Timeout | undefined} */
  let timer;
  /** @type {Promise<false>} */
  const late = new Promise((resolve) => (timer = setTimeout(() => resolve(false), ms)));
  try {
    return await Promise.race([promise.then(() => /** @type {const} */ (true)), late]);
  } finally {
    clearTimeout(timer);
  }
}
