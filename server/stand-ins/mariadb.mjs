import { spawn } from 'node:child_process';
import { createHash } from 'node:crypto';
import {
  existsSync,
  lstatSync,
  mkdirSync,
  openSync,
  closeSync,
  readFileSync,
  renameSync,
  rmSync,
} from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { allProcesses, commandLine, startedAt } from '../launch/process-table.mjs';
import {
  accountName,
  findProgram,
  lastLines,
  run,
  settlesWithin,
  sleep,
  tiedToParent,
} from '../launch/programs.mjs';
import { Refusal } from '../launch/refusal.mjs';

/** The kernel's limit for the path of a socket, less its end mark. */
const longestSocketPath = 107;
const startPatienceMs = 120_000;
const stopPatienceMs = 60_000;
const pollMs = 60;
/** Small logs and pool: a lab writes little, and a first start should not cost 100 MB of disk. */
const sizes = ['--innodb-log-file-size=16M', '--innodb-buffer-pool-size=64M', '--performance-schema=OFF'];

/**
 * A MariaDB of our own, in a folder of its own, on loopback. See mariadb.d.mts for the contract.
 * @type {typeof import('./mariadb.mjs').createMariaDb}
 */
export function createMariaDb({ folder, port, outlastsPowerCut = true }) {
  const dataFolder = path.join(folder, 'mariadb');
  const socket = socketPath(folder);
  const logFile = path.join(folder, 'log', 'mariadb.log');
  const pidFile = path.join(folder, 'mariadb.pid');
  const account = requireAccount();
  /** @type {import('node:child_process').ChildProcess | undefined} */
  let child;
  /** @type {Promise<void>} */
  let exited = Promise.resolve();
  let expectedToRun = false;
  /** @type {(() => void)[]} */
  const watchers = [];

  /** @param {string} statements */
  async function sql(statements) {
    const args = [
      '--no-defaults',
      `--socket=${socket}`,
      `--user=${account}`,
      '--batch',
      '--skip-column-names',
    ];
    const answer = await run(requireProgram('mariadb'), args, {
      input: statements,
      env: withoutClientSettings(),
      timeoutMs: 30_000,
    });
    if (!answer.ok) throw new Error(`MariaDB refused: ${answer.output.trim()}`);
    return answer.output.trimEnd();
  }

  async function initialise() {
    if (existsSync(dataFolder)) return false;
    const fresh = `${dataFolder}.new`;
    rmSync(fresh, { recursive: true, force: true });
    mkdirSync(fresh, { recursive: true, mode: 0o700 });
    const answer = await run(requireProgram('mariadb-install-db'), [
      '--no-defaults',
      `--datadir=${fresh}`,
      ...asRoot(),
      // Any other method leaves an administrator without a password within reach of the network.
      '--auth-root-authentication-method=socket',
      `--auth-root-socket-user=${account}`,
      '--skip-test-db',
      '--skip-name-resolve',
      '--innodb-log-file-size=16M',
    ]);
    if (!answer.ok)
      throw new Refusal(`MariaDB could not set up ${dataFolder}:\n${lastLines(answer.output, 15)}`);
    // Only a finished folder gets the real name, so a set-up that was broken off is done again.
    renameSync(fresh, dataFolder);
    return true;
  }

  async function start() {
    mkdirSync(path.dirname(logFile), { recursive: true });
    makeSocketFolder(socket, folder);
    const log = openSync(logFile, 'a');
    const server = [
      '--no-defaults',
      `--datadir=${dataFolder}`,
      `--socket=${socket}`,
      `--port=${port}`,
      '--bind-address=127.0.0.1',
      `--pid-file=${pidFile}`,
      ...asRoot(),
      '--skip-name-resolve',
      '--skip-log-bin',
      '--character-set-server=utf8mb4',
      '--collation-server=utf8mb4_unicode_ci',
      '--default-time-zone=+00:00',
      `--innodb-flush-log-at-trx-commit=${outlastsPowerCut ? 1 : 2}`,
      ...sizes,
    ];
    const tied = tiedToParent(requireProgram('mariadbd'), server);
    // In a session of its own, so that Ctrl-C in a terminal reaches the server first and the database last.
    const started = spawn(tied.command, tied.args, { stdio: ['ignore', log, log], detached: true });
    closeSync(log);
    child = started;
    exited = new Promise((resolve) => {
      started.once('error', () => resolve());
      started.once('exit', () => resolve());
    });
    void exited.then(() => {
      if (child === started) child = undefined;
      if (expectedToRun) for (const watcher of watchers) watcher();
    });
    await waitUntilReady(started);
    expectedToRun = true;
  }

  /** @param {import('node:child_process').ChildProcess} started */
  async function waitUntilReady(started) {
    const deadline = performance.now() + startPatienceMs;
    while (performance.now() < deadline) {
      if (child !== started)
        throw new Refusal(`MariaDB ended while starting. Its last words, from ${logFile}:\n${tail()}`);
      // The socket may still be an older server's: only the one whose number the new file names counts.
      if (readPid(pidFile) === started.pid && existsSync(socket) && (await answers())) return;
      await sleep(pollMs);
    }
    await kill();
    throw new Refusal(`MariaDB was not ready after ${startPatienceMs / 1000} s. See ${logFile}.`);
  }

  async function answers() {
    try {
      return (await sql('SELECT 1')) === '1';
    } catch {
      return false;
    }
  }

  async function stop() {
    expectedToRun = false;
    child?.kill('SIGTERM');
    if (!(await settlesWithin(exited, stopPatienceMs))) await kill();
  }

  async function kill() {
    expectedToRun = false;
    child?.kill('SIGKILL');
    await exited;
  }

  async function stopLeftover() {
    const left = allProcesses().find((pid) => isServerOf(pid, dataFolder));
    if (left === undefined || left === child?.pid) return false;
    const since = startedAt(left);
    try {
      await sql('SHUTDOWN');
    } catch {
      process.kill(left, 'SIGTERM');
    }
    const deadline = performance.now() + stopPatienceMs;
    while (startedAt(left) === since && since !== undefined) {
      if (performance.now() > deadline) {
        throw new Refusal(
          `A MariaDB of an earlier start (process ${left}) still holds ${dataFolder} and does not end.`,
        );
      }
      await sleep(pollMs);
    }
    return true;
  }

  function tail() {
    try {
      return lastLines(readFileSync(logFile, 'utf8'), 12);
    } catch {
      return '(nothing)';
    }
  }

  return {
    socket,
    port,
    logFile,
    initialise,
    start,
    stop,
    kill,
    stopLeftover,
    sql,
    onUnexpectedExit: (watcher) => void watchers.push(watcher),
  };
}

/** @type {typeof import('./mariadb.mjs').createDatabaseSql} */
export function createDatabaseSql({ name, user, password }) {
  for (const word of [name, user, password]) {
    if (!/^[\w-]+$/.test(word))
      throw new Error('names and passwords of the stand-in are letters, digits, _ and -');
  }
  // The host has to be the address itself: the server resolves no names.
  const who = `'${user}'@'127.0.0.1'`;
  return [
    `CREATE DATABASE IF NOT EXISTS \`${name}\` CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_ci;`,
    `CREATE USER IF NOT EXISTS ${who} IDENTIFIED BY '${password}';`,
    `ALTER USER ${who} IDENTIFIED BY '${password}';`,
    // Unescaped, an underscore would stand for any letter here.
    `GRANT ALL PRIVILEGES ON \`${name.replaceAll('_', '\\_')}\`.* TO ${who};`,
  ].join('\n');
}

/** @param {number} pid @param {string} dataFolder */
function isServerOf(pid, dataFolder) {
  return commandLine(pid)?.includes(`--datadir=${dataFolder}`) === true && startedAt(pid) !== undefined;
}

/** @param {string} folder */
function socketPath(folder) {
  const near = path.join(folder, 'mariadb.sock');
  if (Buffer.byteLength(near) <= longestSocketPath) return near;
  const name = createHash('sha256').update(folder).digest('hex').slice(0, 16);
  return path.join(tmpdir(), `holdoff-${process.getuid?.() ?? 0}-${name}`, 'db.sock');
}

/**
 * A folder under a shared temporary place could have been put there by somebody else, to listen in.
 * @param {string} socket @param {string} folder
 */
function makeSocketFolder(socket, folder) {
  const place = path.dirname(socket);
  if (place === folder) return;
  mkdirSync(place, { recursive: true, mode: 0o700 });
  const found = lstatSync(place);
  if (!found.isDirectory() || found.uid !== process.getuid?.() || (found.mode & 0o077) !== 0) {
    throw new Refusal(
      `${place} is not a private folder of this account; remove it, or set HOLDOFF_DATA to a shorter path.`,
    );
  }
}

function requireAccount() {
  const account = accountName();
  if (account === '')
    throw new Refusal('This account has no name on this system, and the database needs one to sign in by.');
  return account;
}

/** @param {string} name */
function requireProgram(name) {
  const program = findProgram(name);
  if (program === undefined) throw new Refusal(`${name} is not installed.`);
  return program;
}

/** As root the server refuses to run unless it is told so in so many words. */
function asRoot() {
  return process.getuid?.() === 0 ? ['--user=root'] : [];
}

function withoutClientSettings() {
  return Object.fromEntries(Object.entries(process.env).filter(([name]) => !/^(MYSQL|MARIADB)_/.test(name)));
}

/** @param {string} file */
function readPid(file) {
  try {
    return Number(readFileSync(file, 'utf8'));
  } catch {
    return undefined;
  }
}
