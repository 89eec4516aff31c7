import { createHash } from 'node:crypto';
import { existsSync, readFileSync, readdirSync, rmSync, statSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { lastLines, run } from './programs.mjs';
import { Refusal } from './refusal.mjs';
import { withoutNpm } from './packages.mjs';

const inputs = [
  'index.html',
  'vite.config.ts',
  'tsconfig.json',
  'package.json',
  'package-lock.json',
  'src',
  'public',
];

/**
 * Builds the client into dist/, unless the one there was made from the same files.
 * @param {string} root
 * @param {{say: (line: string) => void, force?: boolean}} options
 * @returns {Promise<'built' | 'unchanged'>}
 */
export async function ensureClient(root, { say, force = false }) {
  const stampFile = path.join(root, 'dist', '.holdoff-stamp');
  const stamp = fingerprint(root);
  if (!force && existsSync(stampFile) && readFileSync(stampFile, 'utf8') === stamp) return 'unchanged';
  say('Building the client.');
  // A build that is broken off must not look like a finished one.
  rmSync(stampFile, { force: true });
  const vite = path.join(root, 'node_modules', 'vite', 'bin', 'vite.js');
  const answer = await run(process.execPath, [vite, 'build'], {
    cwd: root,
    env: { ...withoutNpm(process.env), NO_COLOR: '1' },
  });
  if (!answer.ok)
    throw new Refusal(`The client could not be built. Vite's last words:\n${lastLines(answer.output, 25)}`);
  writeFileSync(stampFile, stamp);
  return 'built';
}

/** @param {string} root */
function fingerprint(root) {
  const hash = createHash('sha256').update(process.version);
  for (const input of inputs) {
    for (const file of filesUnder(path.join(root, input))) {
      hash.update(path.relative(root, file)).update('\0').update(readFileSync(file)).update('\0');
    }
  }
  return hash.digest('hex');
}

/** @param {string} place @returns {string[]} */
function filesUnder(place) {
  if (!existsSync(place)) return [];
  if (statSync(place).isFile()) return /\.test\.tsx?$/.test(place) ? [] : [place];
  return readdirSync(place)
    .sort()
    .flatMap((name) => filesUnder(path.join(place, name)));
}
