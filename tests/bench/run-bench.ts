import { benchCircuit } from './bench-circuit';
import { benchGap } from './bench-gap';

const BENCHES: Readonly<Record<string, () => void>> = { circuit: benchCircuit, gap: benchGap };

function main(args: readonly string[]): number {
  const [name, ...rest] = args;
  const bench = name !== undefined && Object.hasOwn(BENCHES, name) ? BENCHES[name] : undefined;
  if (bench === undefined || rest.length > 0) {
    process.stderr.write(`usage: npm run bench -- ${Object.keys(BENCHES).join(' | ')}\n`);
    return 2;
  }
  bench();
  return 0;
}

process.exitCode = main(process.argv.slice(2));
