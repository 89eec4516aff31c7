import type { Circuit } from '../../src/domain/circuit/circuit-input';
import { solveTransient, type Transient } from '../../src/domain/circuit/transient';
import type { Fineness } from '../ngspice/netlist';
import { randomCircuit, seededRandom } from '../ngspice/random-circuits';
import { spiceFigures, spiceFiguresFired } from '../ngspice/spice-figures';
import { bestTime_ms } from './best-time';

const SEED = 5;
const COUNT = 12;
const EXACT = 1e-9;
/** Accuracies at which both are compared: the worst of all figures of a circuit, as a share. */
const LEVELS = [1e-3, 1e-4, 1e-5, 1e-6];
/** The solver as it is used, coarser, and finer. */
const TOLERANCES = [undefined, 3e-3, 1e-3, 3e-4, 1e-4, 5e-6];
const SPICE: readonly Fineness[] = [
  ...[125, 250, 500, 1000, 2000].map((points) => ({ stepShare: 1 / points, relativeTolerance: 1e-3 })),
  ...[125, 500, 1000, 2000, 4000, 16_000].map((points) => ({
    stepShare: 1 / points,
    relativeTolerance: 1e-5,
  })),
];
/** As many rounds for both, and each about as long, or a busy machine would favour the short one. */
const ROUNDS = 3;
const OWN_CALLS = 100;
const SPICE_RUNS = 4;
const WARM_CALLS = 100;
const LIMIT_MS = 5;
const AIM = 50;

/** One way to solve one circuit. */
interface Timing {
  readonly name: string;
  readonly deviation: number;
  readonly ms: number;
}

interface Row {
  readonly kind: string;
  readonly ours: readonly Timing[];
  readonly spice: readonly Timing[];
}

type Figures = Pick<Transient, 'peakVoltage_V' | 'rise_s' | 'peakGap_A' | 'peakChannel_A'>;

/**
 * Solves per second beside ngspice's own analysis time for the same circuits at the same accuracy. For either program and
 * each circuit the fastest of its settings counts that is as exact as the level asks. ngspice's start, its files and the
 * run that finds the breakdown are left out.
 */
export function benchCircuit(): void {
  const random = seededRandom(SEED);
  const drawn = Array.from({ length: COUNT }, (_, index) => randomCircuit(random, index));
  const circuits = drawn.filter((circuit) => !solved(circuit, EXACT).marginal);
  warmUp(circuits);
  const exact = circuits.map((circuit) => solved(circuit, EXACT));
  const ours = circuits.map((circuit, index) =>
    TOLERANCES.map((tolerance) => ownTiming(circuit, tolerance, exact[index])),
  );
  const rows = circuits.map((circuit, index): Row => ({
    kind: kindOf(circuit, exact[index]),
    ours: ours[index] ?? [],
    spice: SPICE.map((fineness) => spiceTiming(circuit, fineness, exact[index])),
  }));
  say(`${String(rows.length)} circuits from seed ${String(SEED)}; a deviation is the worst of all figures\n`);
  sayAsUsed(rows);
  for (const level of LEVELS) sayLevel(rows, level);
}

function sayAsUsed(rows: readonly Row[]): void {
  const used = rows.flatMap(({ ours }) => ours.slice(0, 1));
  const slowest = Math.max(...used.map(({ ms }) => ms));
  const mean = used.reduce((sum, { ms }) => sum + ms, 0) / used.length;
  const worst = Math.max(...used.map(({ deviation }) => deviation));
  say(
    `as used: ${(1000 / mean).toFixed(0)} solves a second, ${mean.toFixed(3)} ms in the mean, slowest ${slowest.toFixed(3)} ms ` +
      `(limit ${String(LIMIT_MS)} ms: ${slowest < LIMIT_MS ? 'kept' : 'MISSED'}), worst deviation ${worst.toExponential(1)}`,
  );
}

function sayLevel(rows: readonly Row[], level: number): void {
  const compared = rows.map(({ kind, ours, spice }) => {
    const own = fastest(ours, level);
    const other = fastest(spice, level);
    return { kind, own, other, ratio: other.timing.ms / own.timing.ms };
  });
  const ordered = [...compared].sort((one, other) => one.ratio - other.ratio);
  const [worst] = ordered;
  const middle = ordered[Math.floor(ordered.length / 2)];
  if (worst === undefined || middle === undefined) return;
  const median = middle.ratio;
  say(
    `\nboth within ${level.toExponential(0)}: median ${times(median)} ngspice (aim ${String(AIM)}: ${median >= AIM ? 'kept' : 'MISSED'}), worst ${times(worst.ratio)}`,
  );
  const short = compared.filter(({ other }) => !other.reached).length;
  if (short > 0)
    say(
      `  ngspice is not as exact at its finest for ${String(short)} of ${String(rows.length)}: counted at its closest`,
    );
  if (compared.some(({ own }) => !own.reached)) say('  holdoff is NOT as exact for some');
  for (const { kind, own, other, ratio } of ordered) {
    say(
      `  ${kind.padEnd(38)} ${ms(own.timing)} to ${ms(other.timing)}  ${times(ratio).padStart(10)}  ${own.timing.name}; ${other.timing.name}`,
    );
  }
}

function fastest(
  timings: readonly Timing[],
  level: number,
): { readonly timing: Timing; readonly reached: boolean } {
  const enough = timings
    .filter(({ deviation }) => deviation <= level)
    .sort((one, other) => one.ms - other.ms);
  const closest = [...timings].sort((one, other) => one.deviation - other.deviation);
  const timing = enough[0] ?? closest[0];
  if (timing === undefined) throw new Error('nothing was timed');
  return { timing, reached: enough.length > 0 };
}

function warmUp(circuits: readonly Circuit[]): void {
  for (let call = 0; call < WARM_CALLS; call += 1) {
    for (const circuit of circuits) for (const tolerance of TOLERANCES) solved(circuit, tolerance);
  }
}

function ownTiming(circuit: Circuit, tolerance: number | undefined, exact: Figures | undefined): Timing {
  const time_ms = bestTime_ms(() => void solved(circuit, tolerance), { rounds: ROUNDS, calls: OWN_CALLS });
  const name = tolerance === undefined ? 'as used' : `tolerance ${String(tolerance)}`;
  return { name, deviation: deviation(solved(circuit, tolerance), exact), ms: time_ms };
}

function spiceTiming(circuit: Circuit, fineness: Fineness, exact: Figures | undefined): Timing {
  const { fired_s } = spiceFigures(circuit, fineness);
  const rounds = Array.from({ length: ROUNDS }, () =>
    spiceFiguresFired(circuit, fineness, { fired_s, runs: SPICE_RUNS }),
  );
  return {
    name: `${String(1 / fineness.stepShare)} steps, reltol ${String(fineness.relativeTolerance)}`,
    deviation: Math.max(...rounds.map((figures) => deviation(figures, exact))),
    ms: 1000 * Math.min(...rounds.map((figures) => figures.analysis_s)),
  };
}

function deviation(got: Figures, exact: Figures | undefined): number {
  if (exact === undefined) return Infinity;
  const off = (key: keyof Figures) => {
    const wanted = exact[key];
    return wanted === null ? 0 : Math.abs((got[key] ?? Infinity) / wanted - 1);
  };
  return Math.max(off('peakVoltage_V'), off('rise_s'), off('peakGap_A'), off('peakChannel_A'));
}

function kindOf({ topology, gap }: Circuit, exact: Transient | undefined): string {
  return `${topology}, ${gap.law}, ${exact?.peakChannel_A === null ? 'dark' : 'fired'}`;
}

function solved(circuit: Circuit, tolerance: number | undefined): Transient {
  const result = solveTransient(circuit, { samples: 0, ...(tolerance === undefined ? {} : { tolerance }) });
  if (!result.ok) throw new Error(result.refusal.words);
  return result.value;
}

function ms(timing: Timing): string {
  return `${timing.ms.toFixed(3).padStart(8)} ms`;
}

function times(ratio: number): string {
  return `${ratio.toFixed(0)} times`;
}

function say(line: string): void {
  process.stdout.write(`${line}\n`);
}
