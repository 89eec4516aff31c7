import { readdirSync } from 'node:fs';
import { findProgram, lastLines, run } from './programs.mjs';
import { Refusal } from './refusal.mjs';

/**
 * What the project needs from Debian. The core packages of MariaDB bring no system service and no database
 * of their own; the server's set-up script needs a program that only the client package carries.
 */
export const mariaDbNeed = {
  name: 'MariaDB',
  programs: ['mariadbd', 'mariadb', 'mariadb-install-db', 'my_print_defaults'],
  packages: ['mariadb-server-core', 'mariadb-client-core'],
};

export const chromiumNeed = { name: 'Chromium', programs: ['chromium'], packages: ['chromium'] };

/** The circuit solver is held against it. */
export const ngspiceNeed = { name: 'ngspice', programs: ['ngspice'], packages: ['ngspice'] };

/**
 * Installs what is missing, or says which command does it.
 * @param {readonly {name: string, programs: readonly string[], packages: readonly string[]}[]} needs
 * @param {(line: string) => void} say
 */
export async function ensureDebianPackages(needs, say) {
  const missing = needs.filter((need) => need.programs.some((program) => findProgram(program) === undefined));
  if (missing.length === 0) return;
  const packages = missing.flatMap((need) => need.packages);
  const names = missing.map((need) => need.name).join(' and ');
  const command = `apt-get install --no-install-recommends ${packages.join(' ')}`;
  const apt = findProgram('apt-get');
  if (apt === undefined) {
    throw new Refusal(
      `${names} is not installed, and this system has no apt-get to install it with.\n` +
        `Install what Debian 12 calls ${packages.join(', ')} in this system's own way, then start again.`,
    );
  }
  const prefix = await privilege();
  if (prefix === undefined) {
    throw new Refusal(
      `${names} is not installed, and this account may not install packages (not root, no sudo without a password).\n` +
        `Ask somebody who may to run:\n\n    sudo apt-get update && sudo ${command}\n\nthen start again. Nothing else needs those rights.`,
    );
  }
  say(`Installing ${names} (${packages.join(', ')}) with apt.`);
  if (aptListsAreEmpty()) {
    say('The package lists are empty: fetching them first.');
    await aptGet(prefix, ['update'], 'apt-get update');
  }
  await aptGet(prefix, ['install', '-y', '--no-install-recommends', ...packages], command);
  const still = missing.filter((need) => need.programs.some((program) => findProgram(program) === undefined));
  if (still.length > 0) {
    throw new Refusal(
      `apt reported success, but ${still.map((need) => need.name).join(' and ')} is still not there.`,
    );
  }
}

/** What to put before a command so that it may install packages: nothing for root, else sudo that asks nothing. */
async function privilege() {
  if (process.getuid?.() === 0) return [];
  const sudo = findProgram('sudo');
  if (sudo === undefined) return undefined;
  const answer = await run(sudo, ['-n', 'true'], { timeoutMs: 10_000 });
  return answer.ok ? [sudo, '-n'] : undefined;
}

/**
 * @param {readonly string[]} prefix
 * @param {readonly string[]} args
 * @param {string} shown
 */
async function aptGet(prefix, args, shown) {
  const [command, ...rest] = [
    ...prefix,
    'env',
    'DEBIAN_FRONTEND=noninteractive',
    findProgram('apt-get') ?? 'apt-get',
    '-q',
    '-o',
    'DPkg::Lock::Timeout=120',
    ...args,
  ];
  // Half an installation is worse than one that ends a little later than whoever asked for it.
  const answer = await run(command ?? 'env', rest, { outlives: true });
  if (answer.ok) return;
  throw new Refusal(
    `"${shown}" failed. Its last words:\n${lastLines(answer.output, 12)}\n` +
      'Without a network, install the packages another way, then start again.',
  );
}

function aptListsAreEmpty() {
  try {
    return !readdirSync('/var/lib/apt/lists').some((name) => /_Packages(\.\w+)?$/.test(name));
  } catch {
    return true;
  }
}
