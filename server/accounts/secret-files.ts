import { linkSync, mkdirSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { randomUUID } from 'node:crypto';

/** Reads a secret of this folder, making it first when there is none. Two servers that start at once agree on one. */
export function readOrMakeSecret(folder: string, name: string, make: () => string): string {
  const file = path.join(folder, name);
  const found = readIfThere(file);
  if (found !== undefined) return found;
  mkdirSync(folder, { recursive: true, mode: 0o700 });
  const aside = `${file}.${randomUUID()}`;
  writeFileSync(aside, make(), { mode: 0o600 });
  try {
    linkSync(aside, file);
  } catch (error) {
    if (codeOf(error) !== 'EEXIST') throw error;
  } finally {
    rmSync(aside, { force: true });
  }
  return readFileSync(file, 'utf8');
}

export function listSecrets(folder: string, ending: string): readonly string[] {
  try {
    return readdirSync(folder).filter((name) => name.endsWith(ending));
  } catch (error) {
    if (codeOf(error) === 'ENOENT') return [];
    throw error;
  }
}

function readIfThere(file: string): string | undefined {
  try {
    return readFileSync(file, 'utf8');
  } catch (error) {
    if (codeOf(error) === 'ENOENT') return undefined;
    throw error;
  }
}

function codeOf(error: unknown): unknown {
  return error instanceof Error && 'code' in error ? error.code : undefined;
}
