import { randomInt } from 'node:crypto';
import { parseArgs } from 'node:util';
import { compare, type Comparison } from './compare';
import type { Fineness } from './netlist';
import { randomCircuit, seededRandom } from './random-circuits';

const USAGE = 'usage: npm run ngspice -- [--seed N] [--count M]';
const DEFAULT_COUNT = 40;
const WORST_DEVIATION = 0.005;
const WORST_AUDIT = 1e-4;
const MOST_MARGINAL = 0.1;
const FINENESS: Fineness = { stepShare: 1 / 8000, relativeTolerance: 1e-6 };

function main(): number {
  const options = readOptions();
  if (options === undefined) {
    process.stderr.write(`${USAGE}\n`);
    return 2;
  }
  const { seed, count } = options;
  const random = seededRandom(seed);
  const circuits = Array.from({ length: count }, (_, index) => randomCircuit(random, index));
  const compared = circuits.map((circuit) => compare(circuit, FINENESS));
  say(`seed ${String(seed)}, ${String(count)} circuits against ngspice`);
  const apart = compared.filter((one) => one.marginal);
  const judged = compared.filter((one) => !one.marginal);
  const bad = judged.filter((one) => !holds(one));
  summarise(judged);
  for (const one of apart) say(`marginal  ${nameOf(one, compared)}  ${figures(one)}`);
  for (const one of bad)
    say(`FAILED    ${nameOf(one, compared)}  ${figures(one)}\n${JSON.stringify(one.circuit)}`);
  const crowded = apart.length > MOST_MARGINAL * count;
  if (crowded)
    say(`FAILED    ${String(apart.length)} of ${String(count)} are marginal, at most one in ten may be`);
  say(
    `${String(judged.length - bad.length)} hold, ${String(bad.length)} do not, ${String(apart.length)} marginal and apart`,
  );
  return bad.length > 0 || crowded || judged.length === 0 ? 1 : 0;
}

function readOptions(): { readonly seed: number; readonly count: number } | undefined {
  try {
    const { values } = parseArgs({ options: { seed: { type: 'string' }, count: { type: 'string' } } });
    const seed = values.seed === undefined ? randomInt(2 ** 31) : Number(values.seed);
    const count = values.count === undefined ? DEFAULT_COUNT : Number(values.count);
    return Number.isSafeInteger(seed) && Number.isSafeInteger(count) && count > 0
      ? { seed, count }
      : undefined;
  } catch {
    return undefined;
  }
}

function holds(one: Comparison): boolean {
  return (
    one.agreeOnFiring &&
    [one.peakVoltage, one.rise, one.peakGap, one.peakChannel ?? 0].every(
      (off) => Math.abs(off) < WORST_DEVIATION,
    ) &&
    Math.abs(one.audit) < WORST_AUDIT
  );
}

function summarise(judged: readonly Comparison[]): void {
  const worst = (read: (one: Comparison) => number | null) =>
    Math.max(0, ...judged.map((one) => Math.abs(read(one) ?? 0))).toExponential(1);
  say(
    `worst deviation: peak voltage ${worst((one) => one.peakVoltage)}, rise ${worst((one) => one.rise)}, ` +
      `gap current ${worst((one) => one.peakGap)}, channel current ${worst((one) => one.peakChannel)}; ` +
      `energy residual ${worst((one) => one.audit)}`,
  );
  const kinds = new Map<string, number>();
  for (const one of judged) {
    const fired = one.peakChannel === null ? 'dark' : 'fired';
    const kind = `${one.circuit.topology}, ${one.circuit.gap.law}, ${fired}`;
    kinds.set(kind, (kinds.get(kind) ?? 0) + 1);
  }
  for (const [kind, number] of [...kinds].sort()) say(`  ${String(number).padStart(3)} ${kind}`);
}

function nameOf(one: Comparison, all: readonly Comparison[]): string {
  return `#${String(all.indexOf(one))} ${one.circuit.topology} ${one.circuit.gap.law}`;
}

function figures(one: Comparison): string {
  const share = (off: number | null) => (off === null ? '\u2013' : off.toExponential(1));
  const firing = one.agreeOnFiring ? '' : ', not one about firing';
  return `voltage ${share(one.peakVoltage)}, rise ${share(one.rise)}, gap ${share(one.peakGap)}, channel ${share(one.peakChannel)}, energy ${share(one.audit)}${firing}`;
}

function say(line: string): void {
  process.stdout.write(`${line}\n`);
}

process.exitCode = main();
