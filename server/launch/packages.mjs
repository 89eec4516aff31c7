import { createHash } from 'node:crypto';
import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { findProgram, lastLines, run } from './programs.mjs';
import { Refusal } from './refusal.mjs';

const leastNode = [20, 19];

/** Refuses a Node that the packages do not run on. */
export function checkNode() {
  const [major = 0, minor = 0] = process.versions.node.split('.').map(Number);
  const [leastMajor = 0, leastMinor = 0] = leastNode;
  if (major > leastMajor || (major === leastMajor && minor >= leastMinor)) return;
  throw new Refusal(
    `This is Node ${process.versions.node}; Holdoff needs Node ${leastNode.join('.')} or newer. Install it, then start again.`,
  );
}

/**
 * Runs `npm ci` when the installed packages are not those of the lock file and of this Node.
 * @param {string} root
 * @param {(line: string) => void} say
 */
export async function ensurePackages(root, say) {
  const stampFile = path.join(root, 'node_modules', '.holdoff-stamp');
  const stamp = createHash('sha256')
    .update(readFileSync(path.join(root, 'package-lock.json')))
    .update(process.version)
    .digest('hex');
  if (existsSync(stampFile) && readFileSync(stampFile, 'utf8') === stamp) return;
  say('Installing the packages of package-lock.json with npm ci; this takes about a minute.');
  const npm = npmCommand();
  const answer = await run(npm.command, [...npm.args, 'ci', '--include=dev', '--no-audit', '--no-fund'], {
    cwd: root,
    env: withoutNpm(process.env),
  });
  if (!answer.ok) {
    throw new Refusal(`npm ci failed. Its last words:\n${lastLines(answer.output, 15)}`);
  }
  writeFileSync(stampFile, stamp);
}

function npmCommand() {
  const script = process.env['npm_execpath'];
  if (script !== undefined && /\.[cm]?js$/.test(script) && existsSync(script)) {
    return { command: process.execPath, args: [script] };
  }
  const npm = findProgram('npm');
  if (npm === undefined) throw new Refusal('npm was not found beside Node. Install it, then start again.');
  return { command: npm, args: [] };
}

/**
 * The outer npm hands its settings down in the environment, where an inner one would obey them.
 * @param {NodeJS.ProcessEnv} environment
 */
export function withoutNpm(environment) {
  return Object.fromEntries(
    Object.entries(environment).filter(([name]) => !/^npm_/i.test(name) && name !== 'NODE_ENV'),
  );
}
