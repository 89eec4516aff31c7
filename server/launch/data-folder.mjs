import { randomBytes } from 'node:crypto';
import {
  accessSync,
  chmodSync,
  constants,
  existsSync,
  mkdirSync,
  readFileSync,
  readdirSync,
  renameSync,
  statSync,
  writeFileSync,
} from 'node:fs';
import path from 'node:path';
import { Refusal } from './refusal.mjs';

const markerName = 'holdoff-data.json';
const layout = 1;

/**
 * Makes the data folder, or checks that the one there is Holdoff's and this account's. Nothing is ever
 * written into a folder that holds something else.
 * @param {string} folder absolute
 * @returns {'made' | 'found'}
 */
export function claimDataFolder(folder) {
  const marker = path.join(folder, markerName);
  if (existsSync(folder)) {
    checkFolder(folder, marker);
    if (existsSync(marker)) return 'found';
  }
  try {
    mkdirSync(folder, { recursive: true, mode: 0o700 });
    writeFileSync(
      marker,
      `${JSON.stringify({ product: 'holdoff', layout, made: new Date().toISOString() })}\n`,
    );
  } catch (error) {
    throw new Refusal(
      `${folder} could not be made (${reasonOf(error)}). Set another place with HOLDOFF_DATA=...`,
    );
  }
  return 'made';
}

/** @param {string} folder @param {string} marker */
function checkFolder(folder, marker) {
  const elsewhere = 'Set another place with HOLDOFF_DATA=..., then start again.';
  const found = statSync(folder);
  if (!found.isDirectory()) throw new Refusal(`${folder} is not a folder. ${elsewhere}`);
  const own = process.getuid?.();
  if (own !== undefined && found.uid !== own) {
    throw new Refusal(
      `${folder} belongs to another account (number ${found.uid}; this one is ${own}), whose Book may be in it. ` +
        `Start as that account, or: ${elsewhere}`,
    );
  }
  try {
    accessSync(folder, constants.R_OK | constants.W_OK | constants.X_OK);
  } catch {
    throw new Refusal(`This account may not write in ${folder}. ${elsewhere}`);
  }
  if (!existsSync(marker)) {
    if (readdirSync(folder).length === 0) return;
    throw new Refusal(
      `${folder} holds files, but no ${markerName}: it is not a data folder of Holdoff, and nothing was changed in it. ${elsewhere}`,
    );
  }
  const written = readJson(marker);
  if (written?.['product'] !== 'holdoff' || written['layout'] !== layout) {
    throw new Refusal(
      `${marker} was not written by this version of Holdoff (it reads ${JSON.stringify(written)}); nothing was changed. ${elsewhere}`,
    );
  }
}

/**
 * The account that the server uses at its database; made once, kept where only this account can read it.
 * @param {string} folder
 * @returns {{name: string, user: string, password: string}}
 */
export function databaseAccount(folder) {
  const secrets = secretsFolder(folder);
  const file = path.join(secrets, 'database.json');
  const kept = readJson(file);
  if (kept !== undefined) {
    const { name, user, password } = kept;
    if (typeof name === 'string' && typeof user === 'string' && typeof password === 'string') {
      return { name, user, password };
    }
    throw new Refusal(`${file} is damaged. Without it the server cannot sign in to its database.`);
  }
  const made = { name: 'holdoff', user: 'holdoff', password: randomBytes(24).toString('hex') };
  // Written aside first: a start that is broken off here must not leave half a file.
  writeFileSync(`${file}.new`, `${JSON.stringify(made)}\n`, { mode: 0o600 });
  renameSync(`${file}.new`, file);
  return made;
}

/** @param {string} folder */
export function secretsFolder(folder) {
  const secrets = path.join(folder, 'secrets');
  mkdirSync(secrets, { recursive: true, mode: 0o700 });
  chmodSync(secrets, 0o700);
  return secrets;
}

/** @param {string} file @returns {Record<string, unknown> | undefined} */
export function readJson(file) {
  if (!existsSync(file)) return undefined;
  try {
    const parsed = JSON.parse(readFileSync(file, 'utf8'));
    return typeof parsed === 'object' && parsed !== null ? parsed : {};
  } catch {
    return {};
  }
}

/** @param {unknown} error */
function reasonOf(error) {
  return error instanceof Error && 'code' in error ? String(error.code) : String(error);
}
