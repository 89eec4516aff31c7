import { existsSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { ensureClient } from '../../server/launch/client-build.mjs';
import { Refusal } from '../../server/launch/refusal.mjs';
import { measureCriticalPath } from './bundle-size.mjs';

/**
 * @typedef {{passed: number, failed: number, skipped?: number, note?: string}} Result
 * @typedef {{root: string, keeper: ReturnType<typeof import('./processes.mjs').createProcessKeeper>}} Tools
 * @typedef {{
 *   name: string, says: string, needs?: readonly ('mariadb' | 'chromium' | 'ngspice')[], after?: readonly string[],
 *   run: (tools: Tools) => Promise<Result>,
 * }} Stage
 */

/** @type {readonly Stage[]} */
export const stages = [
  {
    name: 'format',
    says: 'is every file as prettier writes it',
    run: command([
      'node_modules/prettier/bin/prettier.cjs',
      '--check',
      '--log-level',
      'warn',
      '--cache',
      '.',
    ]),
  },
  {
    name: 'lint',
    says: 'the import table, cycles, types in use, hooks',
    run: command(['node_modules/eslint/bin/eslint.js', '--max-warnings', '0', '.']),
  },
  {
    name: 'types',
    says: 'the whole project, then the domain with nothing but the language',
    run: command(
      ['node_modules/ts7/bin/tsc', '-p', '.', '--noEmit'],
      ['node_modules/ts7/bin/tsc', '-p', 'src/domain', '--noEmit'],
    ),
  },
  {
    name: 'unit',
    says: 'domain, client and server by themselves',
    run: vitest('domain', 'unit', 'unit-dom'),
  },
  {
    name: 'ngspice',
    says: 'the circuit solver against another one, on circuits from a fixed seed',
    needs: ['ngspice'],
    run: command(['--import', 'tsx', 'tests/ngspice/run-ngspice.ts', '--seed', '20261', '--count', '40']),
  },
  { name: 'api', says: 'routes and stores on a real MariaDB', needs: ['mariadb'], run: vitest('api') },
  {
    name: 'build',
    says: 'the client as it is served',
    run: async ({ root }) => {
      try {
        await ensureClient(root, { say: (line) => console.log(`   ${line}`), force: true });
        return { passed: 1, failed: 0 };
      } catch (error) {
        if (!(error instanceof Refusal)) throw error;
        console.log(error.message);
        return { passed: 0, failed: 1 };
      }
    },
  },
  {
    name: 'size',
    says: 'JavaScript on the critical path of the Bench',
    after: ['build'],
    run: async ({ root }) => measureCriticalPath(root),
  },
  {
    name: 'e2e',
    says: 'a browser, the server and the database as real processes',
    needs: ['mariadb', 'chromium'],
    after: ['build'],
    run: vitest('e2e'),
  },
];

/** @param {...readonly string[]} commands @returns {Stage['run']} */
function command(...commands) {
  return async ({ root, keeper }) => {
    let passed = 0;
    for (const args of commands) {
      if ((await keeper.node(args, { cwd: root })) === 0) passed += 1;
    }
    return { passed, failed: commands.length - passed };
  };
}

/** @param {...string} projects @returns {Stage['run']} */
function vitest(...projects) {
  return async ({ root, keeper }) => {
    const report = path.join(keeper.folder, `report-${projects.join('-')}.json`);
    const code = await keeper.node(
      [
        'node_modules/vitest/vitest.mjs',
        'run',
        ...projects.flatMap((project) => ['--project', project]),
        '--reporter=default',
        '--reporter=json',
        `--outputFile.json=${report}`,
      ],
      { cwd: root },
    );
    return readReport(report, code);
  };
}

/** @param {string} file @param {number} code @returns {Result} */
function readReport(file, code) {
  if (!existsSync(file)) return { passed: 0, failed: 1, note: `no report; exit code ${code}` };
  const report = JSON.parse(readFileSync(file, 'utf8'));
  // A file that does not even load holds no failed test, and is a failure all the same.
  const broken = report.testResults.filter(
    (/** @type {any} */ result) =>
      result.status === 'failed' &&
      !result.assertionResults.some((/** @type {any} */ test) => test.status === 'failed'),
  ).length;
  const failed = report.numFailedTests + broken;
  const unexplained = code !== 0 && failed === 0;
  return {
    passed: report.numPassedTests,
    failed: failed + (unexplained ? 1 : 0),
    skipped: report.numPendingTests + report.numTodoTests,
    ...(unexplained ? { note: `exit code ${code} without a failed test: read the output above` } : {}),
  };
}
