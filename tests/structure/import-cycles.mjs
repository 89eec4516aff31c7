import { readFileSync, readdirSync } from 'node:fs';
import path from 'node:path';
import ts from 'typescript';

/**
 * For every source file under the given folders, the files that it imports and that import it back, over
 * however many steps. Imports of types alone are left out: they are gone when the program runs.
 * @param {readonly string[]} folders absolute
 * @returns {ReadonlyMap<string, ReadonlySet<string>>} absolute paths
 */
export function findImportCycles(folders) {
  const files = new Set(folders.flatMap(sourceFiles));
  const importsByFile = new Map([...files].map((file) => [file, importedFiles(file, files)]));
  const knots = knotNumbers(importsByFile);
  return new Map(
    [...importsByFile].map(([file, imports]) => [
      file,
      new Set(
        [...imports].filter((imported) => imported === file || knots.get(imported) === knots.get(file)),
      ),
    ]),
  );
}

/**
 * The file that a relative import means, among those known.
 * @param {string} fromFile absolute
 * @param {string} specifier
 * @param {{has: (file: string) => boolean}} files
 */
export function resolveImport(fromFile, specifier, files) {
  if (!specifier.startsWith('.')) return undefined;
  const base = path.resolve(path.dirname(fromFile), specifier);
  return [base, `${base}.ts`, `${base}.tsx`].find((candidate) => files.has(candidate));
}

/** @param {string} folder @returns {string[]} */
function sourceFiles(folder) {
  return readdirSync(folder, { withFileTypes: true, recursive: true })
    .filter((entry) => entry.isFile() && /(?<!\.d)\.(tsx?|mjs)$/.test(entry.name))
    .map((entry) => path.join(entry.parentPath, entry.name));
}

/** @param {string} file @param {ReadonlySet<string>} files */
function importedFiles(file, files) {
  const source = ts.createSourceFile(file, readFileSync(file, 'utf8'), ts.ScriptTarget.Latest);
  const imported = new Set();
  for (const statement of source.statements) {
    const specifier = runtimeSpecifier(statement);
    const target = specifier === undefined ? undefined : resolveImport(file, specifier, files);
    if (target !== undefined) imported.add(target);
  }
  return imported;
}

/** @param {ts.Statement} statement */
function runtimeSpecifier(statement) {
  if (ts.isImportDeclaration(statement)) {
    const isType = statement.importClause?.phaseModifier === ts.SyntaxKind.TypeKeyword;
    return isType || !ts.isStringLiteral(statement.moduleSpecifier)
      ? undefined
      : statement.moduleSpecifier.text;
  }
  if (ts.isExportDeclaration(statement) && !statement.isTypeOnly) {
    const { moduleSpecifier } = statement;
    return moduleSpecifier !== undefined && ts.isStringLiteral(moduleSpecifier)
      ? moduleSpecifier.text
      : undefined;
  }
  return undefined;
}

/**
 * Tarjan's strongly connected components: two files carry the same number when each reaches the other.
 * @param {ReadonlyMap<string, ReadonlySet<string>>} importsByFile
 */
function knotNumbers(importsByFile) {
  const numbers = new Map();
  const order = new Map();
  const lowest = new Map();
  /** @type {string[]} */
  const trail = [];
  let count = 0;

  /** @param {string} file */
  const visit = (file) => {
    order.set(file, order.size);
    lowest.set(file, order.get(file));
    trail.push(file);
    for (const imported of importsByFile.get(file) ?? []) {
      if (!order.has(imported)) visit(imported);
      if (!numbers.has(imported)) lowest.set(file, Math.min(lowest.get(file), lowest.get(imported)));
    }
    if (lowest.get(file) !== order.get(file)) return;
    for (let member = trail.pop(); member !== undefined; member = trail.pop()) {
      numbers.set(member, count);
      if (member === file) break;
    }
    count += 1;
  };

  for (const file of importsByFile.keys()) if (!order.has(file)) visit(file);
  return numbers;
}
