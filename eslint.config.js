import reactHooks from 'eslint-plugin-react-hooks';
import { defineConfig } from 'eslint/config';
import tseslint from 'typescript-eslint';
import { holdoffRules } from './tests/structure/lint-rules.mjs';

const noDefaultExport = {
  selector: 'ExportDefaultDeclaration',
  message: 'Named exports only; a default only where a tool demands it.',
};

const everywhere = [noDefaultExport];

const inClient = [
  {
    selector: 'ExportAllDeclaration, ExportNamedDeclaration[source]',
    message: 'No barrels: import the module that owns the thing.',
  },
  {
    selector:
      'Program > VariableDeclaration[kind="let"], Program > ExportNamedDeclaration > VariableDeclaration[kind="let"]',
    message: 'No module-level mutable state: build it in a factory and pass it.',
  },
  {
    selector:
      ':matches(JSXElement, JSXFragment) > JSXExpressionContainer > LogicalExpression[operator="&&"]:not([left.type="BinaryExpression"]):not([left.type="UnaryExpression"])',
    message: '`n && ...` prints 0 and NaN: write a ternary or an explicit test.',
  },
];

const inDomain = [
  {
    selector:
      'CallExpression[callee.object.name="Date"][callee.property.name="now"], NewExpression[callee.name="Date"][arguments.length=0], CallExpression[callee.name="Date"]',
    message: 'The domain has no clock: take the time as an argument.',
  },
  {
    selector: 'MemberExpression[object.name="Math"][property.name="random"]',
    message: 'The domain has no dice: take the random source as an argument.',
  },
  {
    selector: 'MemberExpression[object.name=/^(crypto|performance)$/]',
    message: 'The domain has no clock and no dice: take what it needs as an argument.',
  },
];

const typeScript = ['**/*.{ts,tsx}'];
const tests = ['**/*.test.{ts,tsx}', '**/*.e2e.ts', 'tests/**/*.ts'];

export default defineConfig(
  {
    ignores: [
      'dist/**',
      'dev-dist/**',
      'coverage/**',
      '.holdoff/**',
      'node_modules/**',
      // Wrong on purpose: a test looks whether lint says so.
      'tests/fixtures/import-cycle/**',
    ],
  },
  { linterOptions: { reportUnusedDisableDirectives: 'error', reportUnusedInlineConfigs: 'error' } },
  {
    files: ['**/*.{js,mjs,ts,tsx}'],
    plugins: { holdoff: holdoffRules },
    rules: {
      'holdoff/import-zones': 'error',
      'holdoff/kebab-case-file': 'error',
      'holdoff/no-import-cycle': 'error',
      'no-restricted-syntax': ['error', ...everywhere],
      eqeqeq: 'error',
      'no-var': 'error',
      'prefer-const': 'error',
      'no-warning-comments': ['error', { terms: ['fixme', 'xxx', 'hack'], location: 'start' }],
      'max-params': ['error', 3],
      'max-lines': ['error', { max: 400, skipBlankLines: false, skipComments: false }],
      'no-console': 'error',
    },
  },
  {
    files: typeScript,
    extends: [tseslint.configs.strictTypeChecked],
    languageOptions: {
      parserOptions: { project: ['./tsconfig.json'], tsconfigRootDir: import.meta.dirname },
    },
    rules: {
      '@typescript-eslint/consistent-type-imports': 'error',
      '@typescript-eslint/consistent-type-exports': 'error',
      '@typescript-eslint/require-array-sort-compare': 'error',
      '@typescript-eslint/switch-exhaustiveness-check': [
        'error',
        { considerDefaultExhaustiveForUnions: true },
      ],
      '@typescript-eslint/restrict-template-expressions': [
        'error',
        { allowNumber: true, allowBoolean: true },
      ],
      '@typescript-eslint/no-confusing-void-expression': ['error', { ignoreArrowShorthand: true }],
      // TypeScript itself says so, with the same marks.
      '@typescript-eslint/no-unused-vars': 'off',
    },
  },
  {
    files: ['src/**/*.{ts,tsx}'],
    rules: { 'no-restricted-syntax': ['error', ...everywhere, ...inClient] },
  },
  {
    // These run a compiler over every file: only where React can be.
    files: ['src/**/*.tsx', 'src/**/use-*.ts'],
    ignores: ['src/domain/**'],
    extends: [reactHooks.configs.flat.recommended],
  },
  {
    files: ['src/domain/**/*.ts'],
    rules: { 'no-restricted-syntax': ['error', ...everywhere, ...inClient, ...inDomain] },
  },
  {
    // In a test a wrong guess about a type shows as a failure; only a forgotten promise passes in silence.
    files: tests,
    rules: {
      ...tseslint.configs.disableTypeChecked.rules,
      '@typescript-eslint/no-floating-promises': 'error',
      '@typescript-eslint/await-thenable': 'error',
      '@typescript-eslint/no-misused-promises': 'error',
      '@typescript-eslint/no-non-null-assertion': 'off',
      'no-restricted-syntax': ['error', ...everywhere],
      'max-lines': 'off',
      // The columns of a table of cases.
      'max-params': 'off',
    },
  },
  {
    files: [
      'server/start.mjs',
      'server/launch/**/*.mjs',
      'server/maintenance/**/*.ts',
      'tests/run.mjs',
      'tests/runner/**/*.mjs',
      'tests/reference/**/*.ts',
    ],
    rules: { 'no-console': 'off' },
  },
  {
    files: ['eslint.config.js', '**/vite.config.ts'],
    rules: { 'no-restricted-syntax': 'off' },
  },
);
