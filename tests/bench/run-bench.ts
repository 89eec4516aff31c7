import { benchCircuit } from './bench-circuit';
import { benchGap } from './bench-gap';
import { benchLookups } from './bench-lookups';

const BENCHES: Readonly<Record<string, () => void | Promise<void>>> = {
  circuit: benchCircuit,
  gap: benchGap,
  lookups: benchLookups,
};

async function main(args: readonly string[]): Promise<number> {
  const [name, ...rest] = args;
  const bench = name !== undefined && Object.hasOwn(BENCHES, name) ? BENCHES[name] : undefined;
  if (bench === undefined || rest.length > 0) {
    process.stderr.write(`usage: npm run bench -- ${Object.keys(BENCHES).join(' | ')}\n`);
    return 2;
  }
  await bench();
  return 0;
}

void main(process.argv.slice(2)).then((code) => {
  process.exitCode = code;
});
