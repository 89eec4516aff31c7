import type { ChartData } from '../../components/chart/types';
import type { LabSettings, RigSpec } from '../../domain/book/rig-spec';
import { gapCurve } from '../../domain/gap/gap-curve';
import type { RigDerived } from '../../domain/rules/rig-derived';
import { gapSetupOf } from '../../domain/rules/rig-gap';
import { mapResult, type Result } from '../../domain/units/result';

const POINTS = 48;
/** How far past the working pressures the curve goes, as a share of their span, and at least this much in bar. */
const PAST = 0.5;
const LEAST_BAR = 0.2;

/** Self-break against gauge pressure with its two sides, the supply's reach, the working pressures and the vessel's wall. */
export function breakChart(spec: RigSpec, settings: LabSettings, derived: RigDerived): Result<ChartData> {
  const { lowest_bar_g, highest_bar_g, vessel } = spec.gap;
  const { ambient_bar_abs, ambient_C } = settings;
  const past = Math.max(LEAST_BAR, PAST * (highest_bar_g - lowest_bar_g));
  const from = Math.max(lowest_bar_g - past, 0.1 - ambient_bar_abs);
  const to = highest_bar_g + past;
  const pressures = Array.from({ length: POINTS + 1 }, (_, i) => from + ((to - from) * i) / POINTS);
  const curve = gapCurve(
    gapSetupOf(spec, ambient_C),
    pressures.map((bar_g) => bar_g + ambient_bar_abs),
  );
  return mapResult(curve, (found): ChartData => {
    const points = found.flatMap((point) =>
      point.valid ? [{ ...point, x: point.pressure_bar_abs - ambient_bar_abs }] : [],
    );
    const reach = derived.reach.ok ? derived.reach.value.reachable_kV : null;
    const most = Math.max(1, ...points.map((point) => point.high_kV), reach ?? 0);
    const { selfBreak, at } = derived;
    return {
      x: { min: from, max: to, unit: 'bar(g)', decimals: 2 },
      y: { min: 0, max: 1.08 * most, unit: 'kV', decimals: 1 },
      band: {
        points: points.map(({ x, low_kV, high_kV }) => ({ x, low: low_kV, high: high_kV })),
        above: 'breaks',
        below: 'holds',
      },
      law: points.map(({ x, law_kV }) => ({ x, y: law_kV })),
      window: { min: lowest_bar_g, max: highest_bar_g },
      ...(reach === null ? {} : { limit: { y: reach, label: 'the supply reaches', short: 'supply' } }),
      ...(vessel !== null && vessel.relief_bar_g < to
        ? { wall: { from: vessel.relief_bar_g, label: 'relief' } }
        : {}),
      ...(selfBreak.ok
        ? {
            point: {
              x: at.pressure_bar_g,
              low: selfBreak.value.low_kV,
              high: selfBreak.value.high_kV,
              y: selfBreak.value.law_kV,
            },
          }
        : {}),
    };
  });
}
