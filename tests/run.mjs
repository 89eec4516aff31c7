import process from 'node:process';
import { fileURLToPath } from 'node:url';
import { chromiumNeed, ensureDebianPackages, mariaDbNeed, ngspiceNeed } from '../server/launch/debian.mjs';
import { checkNode, ensurePackages } from '../server/launch/packages.mjs';
import { Refusal } from '../server/launch/refusal.mjs';
import { createProcessKeeper } from './runner/processes.mjs';
import { stages } from './runner/stages.mjs';

const root = fileURLToPath(new URL('..', import.meta.url)).replace(/\/$/, '');
const wanted = process.argv.slice(2).filter((argument) => argument !== '--');
const keeper = createProcessKeeper();

let stopping = false;
for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) {
  // Ctrl-C comes twice, from the terminal and from npm: the second one must not cut the first one short.
  process.on(signal, () => {
    if (stopping) return;
    stopping = true;
    console.log(`\n${signal}: stopping everything that this run started.`);
    void keeper.close().then(() => process.exit(130));
  });
}

const exitCode = await main();
await keeper.close();
if (!stopping) process.exit(exitCode);

async function main() {
  const unknown = wanted.filter((name) => !stages.some((stage) => stage.name === name));
  if (unknown.length > 0) {
    console.error(
      `No such stage: ${unknown.join(', ')}. There are: ${stages.map((stage) => stage.name).join(', ')}.`,
    );
    return 2;
  }
  const chosen = wanted.length === 0 ? stages : stages.filter((stage) => wanted.includes(stage.name));
  try {
    await prepare(chosen);
  } catch (error) {
    if (!(error instanceof Refusal)) throw error;
    console.error(`\n${error.message}\n`);
    console.log('0 passed, 1 failed');
    return 1;
  }
  return runStages(chosen);
}

/** @param {readonly import('./runner/stages.mjs').Stage[]} chosen */
async function prepare(chosen) {
  const say = (/** @type {string} */ line) => console.log(line);
  checkNode();
  const needs = [
    ...(chosen.some((stage) => stage.needs?.includes('mariadb')) ? [mariaDbNeed] : []),
    ...(chosen.some((stage) => stage.needs?.includes('chromium')) ? [chromiumNeed] : []),
    ...(chosen.some((stage) => stage.needs?.includes('ngspice')) ? [ngspiceNeed] : []),
  ];
  await ensureDebianPackages(needs, say);
  await ensurePackages(root, say);
}

/** @param {readonly import('./runner/stages.mjs').Stage[]} chosen */
async function runStages(chosen) {
  const results = new Map();
  for (const stage of chosen) {
    if (stopping) break;
    const blocked = stage.after?.find((name) => results.get(name)?.failed > 0);
    console.log(`\n── ${stage.name}: ${stage.says}`);
    const started = performance.now();
    const result =
      blocked === undefined
        ? await stage.run({ root, keeper })
        : { passed: 0, failed: 1, note: `cannot run, because ${blocked} failed` };
    const left = await keeper.stopAll();
    for (const line of left) console.log(`   still running after the stage, stopped: ${line}`);
    results.set(stage.name, result);
    const seconds = ((performance.now() - started) / 1000).toFixed(1);
    console.log(
      `   ${stage.name}: ${tally(result)} in ${seconds} s${result.note === undefined ? '' : ` · ${result.note}`}`,
    );
  }
  return summarise(results);
}

/** @param {Map<string, import('./runner/stages.mjs').Result>} results */
function summarise(results) {
  console.log('\n── in all');
  let passed = 0;
  let failed = 0;
  for (const [name, result] of results) {
    passed += result.passed;
    failed += result.failed;
    console.log(`   ${result.failed > 0 ? 'FAILED' : 'passed'}  ${name.padEnd(10)} ${tally(result)}`);
  }
  console.log(`\n${passed} passed, ${failed} failed`);
  return failed > 0 || passed === 0 ? 1 : 0;
}

/** @param {import('./runner/stages.mjs').Result} result */
function tally({ passed, failed, skipped = 0 }) {
  return `${passed} passed, ${failed} failed${skipped > 0 ? `, ${skipped} skipped` : ''}`;
}
