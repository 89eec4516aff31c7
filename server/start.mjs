import { existsSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { ensureClient } from './launch/client-build.mjs';
import { claimDataFolder, databaseAccount, secretsFolder } from './launch/data-folder.mjs';
import { ensureDebianPackages, mariaDbNeed } from './launch/debian.mjs';
import { checkNode, ensurePackages, withoutNpm } from './launch/packages.mjs';
import { requirePort } from './launch/ports.mjs';
import { lastLines, run } from './launch/programs.mjs';
import { Refusal } from './launch/refusal.mjs';
import { runningFile } from './launch/running.mjs';
import { startServer } from './launch/server-process.mjs';
import { createDatabaseSql, createMariaDb } from './stand-ins/mariadb.mjs';

// Only what comes with Node may be imported here: this script is what fetches the packages.

const root = fileURLToPath(new URL('..', import.meta.url)).replace(/\/$/, '');
const forDevelopment = process.argv.includes('--dev');
const say = (/** @type {string} */ line) => console.log(`holdoff · ${line}`);
const stopping = new AbortController();
/** What to end, in the order of starting. @type {{name: string, stop: () => Promise<void>}[]} */
const started = [];
/** @type {Promise<void> | undefined} */
let ending;

for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) {
  process.on(signal, () => {
    if (!stopping.signal.aborted) say('Stopping.');
    stopping.abort();
    void stopAll().then(() => process.exit(0));
  });
}

try {
  await main();
} catch (error) {
  if (stopping.signal.aborted) await stopAll().then(() => process.exit(0));
  if (error instanceof Refusal) console.error(`\n${error.message}\n`);
  else console.error(error);
  await stopAll();
  process.exit(1);
}

async function main() {
  checkNode();
  const settings = readSettings();
  claimDataFolder(settings.folder);
  const running = runningFile(settings.folder);
  if (await running.takeOver()) say('Ended a server that an earlier, killed start had left.');
  started.push({ name: 'the note of this start', stop: async () => running.forget() });
  await requireHttpPorts(settings);
  const database = await prepareDatabase(settings);
  await ensurePackages(root, say);
  const env = { ...settings.env, ...(await startDatabase(settings, database)) };
  await runScript('server/maintenance/migrate.ts', [], {
    env,
    purpose: 'bring the database to this version',
  });
  await runScript('server/maintenance/seed.ts', ['--if-empty'], { env, purpose: 'fill in the demo lab' });
  if (!forDevelopment && (await ensureClient(root, { say })) === 'unchanged')
    say('The client is up to date.');
  checkNotStopping();
  const address = forDevelopment
    ? await serveForDevelopment(settings, env, running)
    : await serve(settings, env, running);
  running.note('start', process.pid, address);
  greet(settings.folder, address);
}

function readSettings() {
  const env = process.env;
  const folder = path.resolve(root, env['HOLDOFF_DATA'] ?? '.holdoff');
  const port = portSetting('HOLDOFF_PORT', 8320);
  const host = env['HOLDOFF_HOST'] ?? '127.0.0.1';
  const apiPort = forDevelopment ? portSetting('HOLDOFF_API_PORT', port + 1) : port;
  const databasePort = portSetting('HOLDOFF_DB_PORT', 13_317);
  if (new Set([port, apiPort, databasePort]).size < (forDevelopment ? 3 : 2)) {
    throw new Refusal(
      `Each needs a port of its own: the browser's ${port}, the server's ${apiPort}, MariaDB's ${databasePort}.`,
    );
  }
  return {
    folder,
    host,
    port,
    apiPort,
    databasePort,
    /** Whoever names a database of their own gets no stand-in. */
    ownDatabase: env['HOLDOFF_DB_HOST'] === undefined,
    env: {
      ...withoutNpm(env),
      NODE_ENV: forDevelopment ? 'development' : 'production',
      HOLDOFF_DATA: folder,
      HOLDOFF_SECRETS: env['HOLDOFF_SECRETS'] ?? secretsPath(folder),
    },
  };
}

/** @param {string} folder */
function secretsPath(folder) {
  return path.join(folder, 'secrets');
}

/** @param {string} name @param {number} fallback */
function portSetting(name, fallback) {
  const given = process.env[name];
  if (given === undefined) return fallback;
  const port = Number(given);
  if (/^\d+$/.test(given) && port >= 1 && port <= 65_535) return port;
  throw new Refusal(`${name}=${given} is not a port: give a whole number from 1 to 65535.`);
}

/** @param {ReturnType<typeof readSettings>} settings */
async function requireHttpPorts({ host, port, apiPort }) {
  await requirePort({ port, host, purpose: 'the address in the browser', setting: 'HOLDOFF_PORT' });
  if (apiPort !== port) {
    await requirePort({
      port: apiPort,
      host: '127.0.0.1',
      purpose: 'the server behind Vite',
      setting: 'HOLDOFF_API_PORT',
    });
  }
}

/** All that can be refused is asked before the packages are fetched. @param {ReturnType<typeof readSettings>} settings */
async function prepareDatabase({ folder, databasePort, ownDatabase }) {
  if (!ownDatabase) return undefined;
  await ensureDebianPackages([mariaDbNeed], say);
  const database = createMariaDb({ folder, port: databasePort });
  if (await database.stopLeftover()) say('Ended a MariaDB that an earlier, killed start had left.');
  await requirePort({
    port: databasePort,
    host: '127.0.0.1',
    purpose: 'MariaDB',
    setting: 'HOLDOFF_DB_PORT',
  });
  return database;
}

/**
 * @param {ReturnType<typeof readSettings>} settings
 * @param {Awaited<ReturnType<typeof prepareDatabase>>} database
 */
async function startDatabase({ folder, databasePort }, database) {
  secretsFolder(folder);
  if (database === undefined) return {};
  checkNotStopping();
  if (await database.initialise())
    say(`Set up a database of its own in ${path.relative(process.cwd(), folder) || folder}.`);
  started.push({ name: 'MariaDB', stop: () => database.stop() });
  await database.start();
  say(`MariaDB answers on 127.0.0.1:${databasePort}.`);
  database.onUnexpectedExit(() => fail(`MariaDB ended unexpectedly. See ${database.logFile}.`));
  const account = databaseAccount(folder);
  await database.sql(createDatabaseSql(account));
  return {
    HOLDOFF_DB_HOST: '127.0.0.1',
    HOLDOFF_DB_PORT: String(databasePort),
    HOLDOFF_DB_USER: account.user,
    HOLDOFF_DB_PASSWORD: account.password,
    HOLDOFF_DB_NAME: account.name,
  };
}

/**
 * @param {string} script
 * @param {string[]} args
 * @param {{env: NodeJS.ProcessEnv, purpose: string}} options
 */
async function runScript(script, args, { env, purpose }) {
  checkNotStopping();
  const answer = await run(process.execPath, ['--import', 'tsx', script, ...args], { cwd: root, env });
  if (!answer.ok)
    throw new Refusal(`${script} could not ${purpose}. Its last words:\n${lastLines(answer.output, 20)}`);
  for (const line of answer.output.split('\n')) if (line.trim() !== '' && !line.startsWith('{')) say(line);
}

/**
 * @param {ReturnType<typeof readSettings>} settings
 * @param {NodeJS.ProcessEnv} env
 * @param {ReturnType<typeof runningFile>} running
 */
async function serve({ folder, port, host }, env, running) {
  return serveWith(
    {
      name: 'The server',
      args: ['--import', 'tsx', 'server/index.ts'],
      logFile: path.join(folder, 'log', 'server.log'),
    },
    { ...env, HOLDOFF_PORT: String(port), HOLDOFF_HOST: host, HOLDOFF_CLIENT: path.join(root, 'dist') },
    { running, role: 'server' },
  );
}

/**
 * @param {ReturnType<typeof readSettings>} settings
 * @param {NodeJS.ProcessEnv} env
 * @param {ReturnType<typeof runningFile>} running
 */
async function serveForDevelopment({ folder, port, apiPort }, env, running) {
  const address = `http://127.0.0.1:${port}`;
  const origins = process.env['HOLDOFF_ORIGINS'] ?? `${address},http://localhost:${port}`;
  await serveWith(
    {
      name: 'The server',
      args: ['node_modules/tsx/dist/cli.mjs', 'watch', '--clear-screen=false', 'server/index.ts'],
      logFile: path.join(folder, 'log', 'server.log'),
    },
    { ...env, HOLDOFF_PORT: String(apiPort), HOLDOFF_ORIGINS: origins, HOLDOFF_CLIENT: '' },
    { running, role: 'server' },
  );
  await serveWith(
    {
      name: 'Vite',
      args: ['server/launch/vite-server.mjs'],
      logFile: path.join(folder, 'log', 'vite.log'),
    },
    { ...env, HOLDOFF_PORT: String(port), HOLDOFF_API_PORT: String(apiPort) },
    { running, role: 'vite' },
  );
  return address;
}

/**
 * @param {{name: string, args: string[], logFile: string}} what
 * @param {NodeJS.ProcessEnv} env
 * @param {{running: ReturnType<typeof runningFile>, role: string}} note
 */
async function serveWith(what, env, { running, role }) {
  checkNotStopping();
  const server = startServer({ ...what, cwd: root, env, say });
  started.push({ name: what.name, stop: () => server.stop() });
  if (server.pid !== undefined) running.note(role, server.pid);
  const address = await server.ready();
  void server.exited.then((how) => fail(`${what.name} ended unexpectedly (${how}). See ${what.logFile}.`));
  return address;
}

/** @param {string} folder @param {string} address */
function greet(folder, address) {
  console.log(`\n  Holdoff is at  ${address}\n`);
  const signIns = readSignIns(path.join(folder, 'demo-sign-ins.json'));
  if (signIns.length > 0) {
    console.log('  The demo lab, to sign in with:');
    for (const { name, role, email, password } of signIns) {
      console.log(`    ${name.padEnd(18)} ${role.padEnd(12)} ${email.padEnd(30)} ${password}`);
    }
    console.log('');
  }
  console.log('  Ctrl-C stops it. What it keeps is in', path.relative(process.cwd(), folder) || folder);
}

/** @param {string} file @returns {{name: string, role: string, email: string, password: string}[]} */
function readSignIns(file) {
  if (!existsSync(file)) return [];
  const parsed = JSON.parse(readFileSync(file, 'utf8'));
  return Array.isArray(parsed) ? parsed : [];
}

function checkNotStopping() {
  if (stopping.signal.aborted) throw new Refusal('stopped');
}

/** @param {string} message */
function fail(message) {
  if (ending !== undefined) return;
  console.error(`\n${message}\n`);
  void stopAll().then(() => process.exit(1));
}

/** The last started ends first: the server before the database that it writes to. */
function stopAll() {
  ending ??= (async () => {
    for (const { stop } of started.reverse()) await stop();
  })();
  return ending;
}
