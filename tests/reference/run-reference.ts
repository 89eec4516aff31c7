import { readFileSync } from 'node:fs';
import { readChecks } from './checks-file';
import { reportOn } from './report';

const USAGE = 'usage: npm run reference -- [--strict] FILE';
const FAILED = 1;
const UNREADABLE = 2;

function main(args: readonly string[]): number {
  const strict = args.includes('--strict');
  const [file, ...rest] = args.filter((arg) => arg !== '--strict');
  if (file === undefined || rest.length > 0 || file.startsWith('--')) return complain(USAGE);
  const text = readText(file);
  if (text === undefined) return complain(`cannot read ${file}`);
  const checks = readChecks(text);
  if (!checks.ok) return complain(`${file}: ${checks.refusal.words}`);
  const { lines, failed, skipped } = reportOn(checks.value);
  process.stdout.write(`${lines.join('\n')}\n`);
  return failed > 0 || (strict && skipped > 0) ? FAILED : 0;
}

function readText(file: string): string | undefined {
  try {
    return readFileSync(file, 'utf8');
  } catch {
    return undefined;
  }
}

function complain(words: string): number {
  process.stderr.write(`${words}\n`);
  return UNREADABLE;
}

process.exitCode = main(process.argv.slice(2));
