import type { Circuit } from '../../src/domain/circuit/circuit-input';
import { solveTransient, type Transient } from '../../src/domain/circuit/transient';
import type { Fineness } from '../ngspice/netlist';
import { randomCircuit, seededRandom } from '../ngspice/random-circuits';
import { spiceFigures } from '../ngspice/spice-figures';
import { bestTime_ms } from './best-time';

const SEED = 5;
const COUNT = 12;
const EXACT = 1e-8;
/** The solver as it is used, and coarser, to compare where ngspice is at its best. */
const TOLERANCES = [undefined, 1e-3] as const;
const SPICE: readonly Fineness[] = [500, 1000, 2000, 4000, 16_000].flatMap((points) =>
  [1e-3, 1e-5].map((relativeTolerance) => ({ stepShare: 1 / points, relativeTolerance })),
);
/** As many rounds for both, and each long enough to be disturbed alike, or a busy machine would favour the short one. */
const ROUNDS = 3;
const OWN_CALLS = 30;

interface Setting {
  readonly name: string;
  /** Worst relative deviation of any figure of any circuit from the exact solution. */
  readonly worst: number;
  readonly ms: number;
}

type Figures = Pick<Transient, 'peakVoltage_V' | 'rise_s' | 'peakGap_A' | 'peakChannel_A'>;

/**
 * Solves per second beside ngspice's own analysis time for the same circuits at the same accuracy. ngspice's start, its
 * files and the run that finds the breakdown are left out; of all its settings the fastest one that is as exact counts.
 */
export function benchCircuit(): void {
  const random = seededRandom(SEED);
  const drawn = Array.from({ length: COUNT }, (_, index) => randomCircuit(random, index));
  const circuits = drawn.filter((circuit) => !exact(circuit).marginal);
  const references = circuits.map(exact);
  const spice = SPICE.map((fineness) => spiceSetting(fineness, circuits, references));
  say(
    `${String(circuits.length)} circuits from seed ${String(SEED)}; a deviation is the worst of all figures`,
  );
  for (const setting of spice) say(`  ngspice ${row(setting)}`);
  for (const tolerance of TOLERANCES) {
    const ours = ownSetting(tolerance, circuits, references);
    say(`  holdoff ${row(ours)}  ${(1000 / ours.ms).toFixed(0)} solves/s`);
    say(`    ${verdict(ours, spice)}`);
  }
}

function verdict(ours: Setting, spice: readonly Setting[]): string {
  const equal = spice.filter((setting) => setting.worst <= ours.worst);
  const [fastest] = [...equal].sort((one, other) => one.ms - other.ms);
  if (fastest !== undefined) {
    return `${(fastest.ms / ours.ms).toFixed(0)} times ngspice at the same accuracy (${fastest.name})`;
  }
  const [closest] = [...spice].sort((one, other) => one.worst - other.worst);
  if (closest === undefined) return 'no ngspice to compare with';
  return `more than ${(closest.ms / ours.ms).toFixed(0)} times ngspice, which is not as exact at its finest (${closest.name})`;
}

function ownSetting(
  tolerance: number | undefined,
  circuits: readonly Circuit[],
  references: readonly Figures[],
): Setting {
  const options = { samples: 0, ...(tolerance === undefined ? {} : { tolerance }) };
  const worst = Math.max(
    ...circuits.map((circuit, index) => deviation(solved(circuit, options), references[index])),
  );
  for (let warm = 0; warm < OWN_CALLS; warm += 1)
    for (const circuit of circuits) solveTransient(circuit, options);
  const all_ms = bestTime_ms(
    () => {
      for (const circuit of circuits) solveTransient(circuit, options);
    },
    { rounds: ROUNDS, calls: OWN_CALLS },
  );
  const name = tolerance === undefined ? 'as used' : `tolerance ${String(tolerance)}`;
  return { name, worst, ms: all_ms / circuits.length };
}

function spiceSetting(
  fineness: Fineness,
  circuits: readonly Circuit[],
  references: readonly Figures[],
): Setting {
  let worst = 0;
  let all_ms = 0;
  circuits.forEach((circuit, index) => {
    const rounds = Array.from({ length: ROUNDS }, () => spiceFigures(circuit, fineness));
    all_ms += 1000 * Math.min(...rounds.map((figures) => figures.analysis_s));
    worst = Math.max(worst, ...rounds.map((figures) => deviation(figures, references[index])));
  });
  const name = `${String(1 / fineness.stepShare)} steps, reltol ${String(fineness.relativeTolerance)}`;
  return { name, worst, ms: all_ms / circuits.length };
}

function deviation(got: Figures, exact: Figures | undefined): number {
  if (exact === undefined) return Infinity;
  const off = (key: keyof Figures) => {
    const wanted = exact[key];
    return wanted === null ? 0 : Math.abs((got[key] ?? Infinity) / wanted - 1);
  };
  return Math.max(off('peakVoltage_V'), off('rise_s'), off('peakGap_A'), off('peakChannel_A'));
}

function exact(circuit: Circuit): Transient {
  return solved(circuit, { samples: 0, tolerance: EXACT });
}

function solved(circuit: Circuit, options: Parameters<typeof solveTransient>[1]): Transient {
  const result = solveTransient(circuit, options);
  if (!result.ok) throw new Error(result.refusal.words);
  return result.value;
}

function row({ name, worst, ms }: Setting): string {
  return `${name.padEnd(28)} worst ${worst.toExponential(1).padStart(8)}  ${ms.toFixed(3).padStart(9)} ms a solve`;
}

function say(line: string): void {
  process.stdout.write(`${line}\n`);
}
