import { existsSync } from 'node:fs';
import path from 'node:path';
import { findImportCycles, resolveImport } from './import-cycles.mjs';
import { judgeImport } from './import-zones.mjs';

const kebabFile = /^\.?[a-z0-9]+(-[a-z0-9]+)*(\.[a-z0-9]+(-[a-z0-9]+)*)*$/;
const migrationFile = /^\d{14}_[a-z0-9]+(_[a-z0-9]+)*\.ts$/;

/** @param {import('eslint').Rule.RuleContext} context */
function projectPath(context) {
  return path.relative(context.cwd, context.filename).split(path.sep).join('/');
}

/** @type {import('eslint').Rule.RuleModule} */
const importZones = {
  meta: { type: 'problem', schema: [], docs: { description: 'Hold the import table' } },
  create(context) {
    const file = projectPath(context);
    /** @param {import('estree').Node | null | undefined} source */
    const judge = (source) => {
      if (source?.type !== 'Literal' || typeof source.value !== 'string') return;
      const message = judgeImport(file, source.value);
      if (message !== undefined) context.report({ node: source, message });
    };
    return {
      ImportDeclaration: (node) => judge(node.source),
      ImportExpression: (node) => judge(node.source),
      ExportNamedDeclaration: (node) => judge(node.source),
      ExportAllDeclaration: (node) => judge(node.source),
      TSImportType: (/** @type {any} */ node) => judge(node.source ?? node.argument?.literal),
    };
  },
};

/** @type {import('eslint').Rule.RuleModule} */
const kebabCaseFile = {
  meta: { type: 'problem', schema: [], docs: { description: 'Files and folders are named in kebab-case' } },
  create(context) {
    return {
      Program(node) {
        const file = projectPath(context);
        const parts = file.split('/');
        const isMigration = parts[0] === 'migrations' && migrationFile.test(parts.at(-1) ?? '');
        const wrong = isMigration ? undefined : parts.find((part) => part !== '..' && !kebabFile.test(part));
        if (wrong !== undefined) context.report({ node, message: `"${wrong}" is not kebab-case` });
      },
    };
  },
};

const sourceFolders = ['src', 'server', 'migrations', 'seeds', 'tests'];

/** Read once for a whole run: an editor that keeps lint running sees a new cycle after a restart. */
function createCycleFinder() {
  /** @type {ReturnType<typeof findImportCycles> | undefined} */
  let cycles;
  return (/** @type {string} */ root) => {
    cycles ??= findImportCycles(
      sourceFolders.map((folder) => path.join(root, folder)).filter((place) => existsSync(place)),
    );
    return cycles;
  };
}

const cyclesOf = createCycleFinder();

/** @type {import('eslint').Rule.RuleModule} */
const noImportCycle = {
  meta: { type: 'problem', schema: [], docs: { description: 'No file imports itself over others' } },
  create(context) {
    const circular = cyclesOf(context.cwd).get(context.filename);
    if (circular === undefined || circular.size === 0) return {};
    /** @param {any} node */
    const judge = (node) => {
      const target = resolveImport(context.filename, String(node.source?.value ?? ''), circular);
      if (target === undefined || (node.importKind ?? node.exportKind) === 'type') return;
      context.report({ node, message: `${path.relative(context.cwd, target)} imports this file back` });
    };
    return { ImportDeclaration: judge, ExportNamedDeclaration: judge, ExportAllDeclaration: judge };
  },
};

/** Rules that no package offers in the shape that this project needs. */
export const holdoffRules = {
  rules: { 'import-zones': importZones, 'kebab-case-file': kebabCaseFile, 'no-import-cycle': noImportCycle },
};
