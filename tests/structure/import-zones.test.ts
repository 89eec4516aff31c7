import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { ESLint } from 'eslint';
import tseslint from 'typescript-eslint';
import { beforeAll, describe, expect, it, vi } from 'vitest';

// The files named here do not exist: what is checked is that the project's own lint configuration, as it
// stands, refuses them. Rules that ask the compiler need real files and are left out.

const root = fileURLToPath(new URL('../..', import.meta.url));
const withoutTypes = [
  { files: ['**/*.{ts,tsx}'], ...tseslint.configs.disableTypeChecked },
  { files: ['**/*.{ts,tsx}'], languageOptions: { parserOptions: { project: null } } },
];
let eslint: ESLint;

// The first file of a kind loads its rules.
vi.setConfig({ testTimeout: 60_000 });

beforeAll(() => {
  eslint = new ESLint({ cwd: root, overrideConfig: withoutTypes });
});

async function rulesBroken(file: string, text: string): Promise<readonly string[]> {
  const [result] = await eslint.lintText(text, { filePath: path.join(root, file) });
  return (result?.messages ?? []).map((message) => message.ruleId ?? `parse: ${message.message}`);
}

function importing(specifier: string): string {
  return `import { thing } from '${specifier}';\n\nexport const other = thing;\n`;
}

describe('the import table, by lint', () => {
  it.each([
    ['units building on numerics', 'src/domain/units/x.ts', '../numerics/y'],
    ['physics reaching into the Book', 'src/domain/gap/x.ts', '../book/y'],
    ['physics asking a rule', 'src/domain/spark/x.ts', '../rules/y'],
    ['physics building on what stands behind it', 'src/domain/gap/x.ts', '../spark/y'],
    ['new physics building on other new physics', 'src/domain/newest/x.ts', '../newer/y'],
    ['listed physics building on new physics', 'src/domain/calibration/x.ts', '../newest/y'],
    ['the Book asking a rule', 'src/domain/book/documents/x.ts', '../../rules/y'],
    ['the Book asking physics', 'src/domain/book/x.ts', '../gap/y'],
    ['a rule knowing the wire', 'src/domain/rules/x.ts', '../handover/y'],
    ['the domain knowing data', 'src/domain/report/x.ts', '../../data/y'],
    ['the domain using a package', 'src/domain/gap/x.ts', 'react'],
    ['the domain using Node', 'src/domain/gap/x.ts', 'node:fs'],
    ['a component knowing data', 'src/components/x.tsx', '../data/y'],
    ['a component knowing the Book', 'src/components/chart/x.tsx', '../../domain/book/y'],
    ['a component knowing a feature', 'src/components/x.tsx', '../features/bench/y'],
    ['a component using the browser database', 'src/components/x.tsx', 'dexie'],
    ['data knowing a component', 'src/data/x.ts', '../components/y'],
    ['data knowing a feature', 'src/data/x.ts', '../features/bench/y'],
    ['data using React outside a hook', 'src/data/x.ts', 'react'],
    ['a feature knowing another', 'src/features/bench/x.tsx', '../desk/y'],
    ['a feature of tomorrow knowing another', 'src/features/tomorrow/x.tsx', '../bench/y'],
    ['a feature knowing app', 'src/features/bench/x.tsx', '../../app/y'],
    ['a feature using Node', 'src/features/bench/x.tsx', 'node:path'],
    ['config knowing data', 'src/config/x.ts', '../data/y'],
    ['app knowing the server', 'src/app/x.tsx', '../../server/config'],
    ['a folder of src that has no row', 'src/novelty/x.ts', '../domain/units/y'],
    ['http knowing a server feature', 'server/http/x.ts', '../accounts/y'],
    ['db knowing a server feature', 'server/db/x.ts', '../handover/y'],
    ['a server feature knowing another', 'server/crew/x.ts', '../accounts/y'],
    ["a server feature knowing a port's store", 'server/crew/x.ts', '../mail/mail-store'],
    ['a server feature knowing the composition root', 'server/crew/x.ts', '../context'],
    ['a server feature knowing the client', 'server/crew/x.ts', '../../src/data/y'],
    ['a server feature knowing migrations', 'server/crew/x.ts', '../../migrations/y'],
    ['the server using React', 'server/crew/x.ts', 'react'],
    ['the settings knowing the server', 'server/config.ts', './http/y'],
    ['a start script knowing the server', 'server/launch/x.mjs', '../config'],
    ['the server knowing a start script', 'server/crew/x.ts', '../launch/y.mjs'],
    ['a migration knowing the domain', 'migrations/20260101000000_make_x.ts', '../src/domain/units/y'],
    ['a migration using a package', 'migrations/20260101000000_make_x.ts', 'zod'],
    ['seeds knowing data', 'seeds/x.ts', '../src/data/y'],
    ['anything knowing tests', 'src/data/x.ts', '../../tests/support/y'],
    ['anything knowing a test beside it', 'server/crew/x.ts', './y.test'],
  ])('refuses %s', async (_what, file, specifier) => {
    expect(await rulesBroken(file, importing(specifier))).toEqual(['holdoff/import-zones']);
  });

  it.each([
    ['a type', "export type Other = import('../desk/y').Thing;\n"],
    ['a lazy import', "export const load = () => import('../desk/y');\n"],
    ['a type-only import', "import type { Thing } from '../desk/y';\n\nexport type Other = Thing;\n"],
  ])('is not evaded by %s', async (_what, text) => {
    expect(await rulesBroken('src/features/bench/x.ts', text)).toContain('holdoff/import-zones');
  });

  it.each([
    ['numerics building on units', 'src/domain/numerics/x.ts', '../units/y'],
    ['physics building on what stands before it', 'src/domain/spark/x.ts', '../gap/y'],
    ['new physics building on listed physics', 'src/domain/newest/x.ts', '../gap/y'],
    ['the Book building on units', 'src/domain/book/documents/x.ts', '../../units/y'],
    ['a rule asking physics', 'src/domain/rules/x.ts', '../charging/y'],
    ['the wire knowing the Book', 'src/domain/handover/x.ts', '../book/y'],
    ['the domain using zod', 'src/domain/book/x.ts', 'zod/mini'],
    ['the domain hashing', 'src/domain/book/x.ts', '@noble/hashes/sha2.js'],
    ['a component speaking in units', 'src/components/x.tsx', '../domain/units/y'],
    ['data knowing the domain', 'src/data/x.ts', '../domain/book/y'],
    ['a live-query hook using React', 'src/data/use-rigs.ts', 'react'],
    ['a feature using a component', 'src/features/tomorrow/x.tsx', '../../components/y'],
    ['a feature using its own files', 'src/features/tomorrow/x.tsx', './y'],
    ['app composing features', 'src/app/x.tsx', '../features/bench/y'],
    ['the entry knowing app', 'src/main.tsx', './app/y'],
    ['a server feature using the domain', 'server/crew/x.ts', '../../src/domain/book/y'],
    ['a server feature using db', 'server/crew/x.ts', '../db/y'],
    ['a server feature sending mail', 'server/crew/x.ts', '../mail/mail-port'],
    ['the composition root assembling', 'server/context.ts', './crew/y'],
    ['maintenance knowing migrations', 'server/maintenance/x.ts', '../../migrations/y'],
    ['seeds knowing the domain', 'seeds/x.ts', '../src/domain/book/y'],
    ['a test beside the code knowing tests', 'server/crew/x.api.test.ts', '../../tests/support/y'],
  ])('lets %s pass', async (_what, file, specifier) => {
    expect(await rulesBroken(file, importing(specifier))).toEqual([]);
  });
});

describe('the other habits, by lint', () => {
  it.each([
    ['a clock in the domain', 'src/domain/gap/x.ts', 'export const now = () => Date.now();\n'],
    ['a clock in the domain, dressed up', 'src/domain/gap/x.ts', 'export const now = () => new Date();\n'],
    ['dice in the domain', 'src/domain/gap/x.ts', 'export const roll = () => Math.random();\n'],
    ['a random id in the domain', 'src/domain/book/x.ts', 'export const id = () => crypto.randomUUID();\n'],
    ['a default export', 'src/app/x.ts', 'export default 1;\n'],
    ['a barrel', 'src/components/index.ts', "export * from './y';\n"],
    ['a barrel of named things', 'src/components/index.ts', "export { y } from './y';\n"],
    ['module-level state', 'src/data/x.ts', 'let count = 0;\n\nexport const next = () => (count += 1);\n'],
    [
      'a number that leaks into the page',
      'src/features/bench/x.tsx',
      'export const List = ({ count }: { count: number }) => <p>{count && <b>some</b>}</p>;\n',
    ],
  ])('refuses %s', async (_what, file, text) => {
    expect(await rulesBroken(file, text)).toEqual(['no-restricted-syntax']);
  });

  it('wants files named in kebab-case', async () => {
    expect(await rulesBroken('src/features/bench/BenchFace.tsx', 'export const one = 1;\n')).toEqual([
      'holdoff/kebab-case-file',
    ]);
    expect(await rulesBroken('migrations/20260101000000_make_x.ts', 'export const one = 1;\n')).toEqual([]);
  });

  it('finds a cycle', async () => {
    const strict = new ESLint({
      cwd: root,
      overrideConfig: [...withoutTypes, { ignores: ['!tests/fixtures/import-cycle/**'] }],
    });
    const results = await strict.lintFiles('tests/fixtures/import-cycle/*.ts');
    const rules = results.flatMap((result) => result.messages.map((message) => message.ruleId));
    expect(rules).toEqual(['holdoff/no-import-cycle', 'holdoff/no-import-cycle']);
  });

  it('keeps no suppression that suppresses nothing', async () => {
    const [result] = await eslint.lintText('// eslint-disable-next-line eqeqeq\nexport const one = 1;\n', {
      filePath: path.join(root, 'src/app/x.ts'),
    });
    expect(result?.errorCount).toBe(1);
  });
});
