import type { Electrodes } from '../../src/domain/gap/electrodes';
import { gapCurve } from '../../src/domain/gap/gap-curve';
import type { GapInput } from '../../src/domain/gap/gap-input';
import { gapFor, pressureFor, type GapPurpose } from '../../src/domain/gap/gap-solve';
import { selfBreak } from '../../src/domain/gap/self-break';
import { uniformBreakdown } from '../../src/domain/gap/uniform-law';
import type { Result } from '../../src/domain/units/result';
import { bestCpuTime_ms } from './best-time';

const GAP: Omit<GapInput, 'electrodes'> = {
  gas: 'air',
  gap_mm: 3,
  u_gap_mm: 0.05,
  pressure: { bar_abs: 1.966 },
  u_pressure_bar: 0.02,
  temperature_C: 20,
  u_temperature_C: 3,
  irradiated: false,
};
const SHAPES: readonly (readonly [string, Electrodes])[] = [
  ['spheres', { shape: 'domed', radius_mm: 12 }],
  ['cylinders', { shape: 'cylinder', radius_mm: 6 }],
  ['capped rods', { shape: 'capped-rods', radius_mm: 6, rod_length_mm: 40 }],
  ['hexagonal bars, edges', { shape: 'hex-bars', flats_mm: 12, corner_mm: 0.5, facing: 'edges' }],
  ['hexagonal bars, flats', { shape: 'hex-bars', flats_mm: 12, corner_mm: 0.5, facing: 'flats' }],
];
const PURPOSES: readonly GapPurpose[] = ['hold-off-at-least', 'law', 'break-at-most'];
const CURVE_POINTS = 200;
const CURVE_LIMIT_MS = 8;
const SLIDER_LIMIT_MS = 40;
const ROUNDS = 40;
const PRESSURES = Array.from({ length: CURVE_POINTS }, (_, index) => 1 + (3 * index) / (CURVE_POINTS - 1));

/**
 * Forward and inverse evaluations of the gap per second, and the curve that a chart asks for. Fields are remembered, so
 * every round asks for a gap or a voltage that none before has asked for, and again for what it has just had.
 */
export function benchGap(): void {
  const uniform = times_ms((round) =>
    uniformBreakdown('air', { gap_cm: gapOf(round) / 10, pressure_bar_abs: 1.966, temperature_C: 20 }),
  );
  say('uniform law, forward', rate(uniform.fresh));
  for (const [name, electrodes] of SHAPES) {
    const at = (round: number): GapInput => ({ ...GAP, electrodes, gap_mm: gapOf(round) });
    const forward = times_ms((round) => selfBreak(at(round)));
    say(`\n${name}, both sides, new gap`, rate(forward.fresh));
    say(`${name}, both sides, gap as before`, rate(forward.again));
    const curve = times_ms((round) => gapCurve(at(ROUNDS + round), PRESSURES));
    say(`${name}, curve of ${String(CURVE_POINTS)}, new gap`, within(curve.fresh, CURVE_LIMIT_MS));
    say(`${name}, curve of ${String(CURVE_POINTS)}, gap as before`, within(curve.again, CURVE_LIMIT_MS));
    for (const purpose of PURPOSES) {
      const target = (round: number) => ({ purpose, voltage_kV: 14 + 4 * shareOf(round) });
      const pressure = times_ms((round) => pressureFor(at(2 * ROUNDS + round), target(round)));
      const gap = times_ms((round) => gapFor({ ...GAP, electrodes }, target(round)));
      say(`${name}, pressure to ${purpose}`, rate(pressure.fresh));
      say(`${name}, gap to ${purpose}`, `${rate(gap.fresh)}, ${within(gap.fresh, SLIDER_LIMIT_MS)}`);
    }
  }
}

/** No two rounds alike. */
function gapOf(round: number): number {
  return 2 + 2 * shareOf(round);
}

function shareOf(round: number): number {
  return (round * 0.618034) % 1;
}

interface Times {
  /** Mean over rounds of what was not asked for before, and of the same asked again. */
  readonly fresh: number;
  readonly again: number;
}

/** Time of the processor, since no round may be repeated and other work on the machine would count. */
function times_ms(call: (round: number) => Result<unknown>): Times {
  const pass = () =>
    bestCpuTime_ms(
      () => {
        for (let round = 0; round < ROUNDS; round += 1) {
          const result = call(round);
          if (!result.ok) throw new Error(result.refusal.words);
        }
      },
      { rounds: 1, calls: 1 },
    ) / ROUNDS;
  const fresh = pass();
  return { fresh, again: Math.min(pass(), pass(), pass()) };
}

function rate(ms: number): string {
  return `${(1000 / ms).toFixed(0)} a second (${ms.toFixed(3)} ms)`;
}

function within(ms: number, limit_ms: number): string {
  return `${ms.toFixed(2)} ms (limit ${String(limit_ms)} ms: ${ms < limit_ms ? 'kept' : 'MISSED'})`;
}

function say(name: string, figure: string): void {
  process.stdout.write(`${name.padEnd(56)} ${figure}\n`);
}
