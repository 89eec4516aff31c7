import { gapCurve } from '../../src/domain/gap/gap-curve';
import type { GapInput } from '../../src/domain/gap/gap-input';
import { gapFor, pressureFor, type GapTarget } from '../../src/domain/gap/gap-solve';
import { selfBreak } from '../../src/domain/gap/self-break';
import { uniformBreakdown } from '../../src/domain/gap/uniform-law';
import type { Result } from '../../src/domain/units/result';
import { bestTime_ms } from './best-time';

const GAP: GapInput = {
  gas: 'air',
  electrodes: { shape: 'domed', radius_mm: 12 },
  gap_mm: 3,
  u_gap_mm: 0.05,
  pressure: { bar_abs: 1.966 },
  u_pressure_bar: 0.02,
  temperature_C: 20,
  u_temperature_C: 3,
  irradiated: false,
};
const CYLINDERS: GapInput = { ...GAP, electrodes: { shape: 'cylinder', radius_mm: 6 } };
const TARGET: GapTarget = { purpose: 'hold-off-at-least', voltage_kV: 15 };
const CURVE_POINTS = 200;
const CURVE_LIMIT_MS = 8;
const PRESSURES = Array.from({ length: CURVE_POINTS }, (_, index) => 1 + (3 * index) / (CURVE_POINTS - 1));

/** Forward and inverse evaluations of the gap per second, and the curve that a chart asks for. */
export function benchGap(): void {
  rate('uniform law, forward', () =>
    uniformBreakdown('air', { gap_cm: 0.3, pressure_bar_abs: 1.966, temperature_C: 20 }),
  );
  for (const [name, gap] of [
    ['spheres', GAP],
    ['cylinders', CYLINDERS],
  ] as const) {
    rate(`${name}, both sides, forward`, () => selfBreak(gap));
    rate(`${name}, pressure for a voltage`, () => pressureFor(gap, TARGET));
    rate(`${name}, gap for a voltage`, () => gapFor(gap, TARGET));
    const ms = timed(() => gapCurve(gap, PRESSURES), 1);
    say(
      `${name}, curve of ${String(CURVE_POINTS)} points`,
      `${ms.toFixed(2)} ms (limit ${String(CURVE_LIMIT_MS)} ms: ${ms < CURVE_LIMIT_MS ? 'kept' : 'MISSED'})`,
    );
  }
}

function rate(name: string, call: () => Result<unknown>): void {
  const ms = timed(call, 5);
  say(name, `${(1000 / ms).toFixed(0)} a second (${(1000 * ms).toFixed(1)} \u00b5s)`);
}

function timed(call: () => Result<unknown>, calls: number): number {
  const once = call();
  if (!once.ok) throw new Error(once.refusal.words);
  return bestTime_ms(call, { rounds: 60, calls });
}

function say(name: string, figure: string): void {
  process.stdout.write(`${name.padEnd(34)} ${figure}\n`);
}
