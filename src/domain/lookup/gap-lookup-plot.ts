import { gapCurve } from '../gap/gap-curve';
import type { GapInput } from '../gap/gap-input';
import type { GapAnswer } from '../gap/self-break';
import { formatFigure, type Rounding } from '../units/format-quantity';
import { numberAt } from './fields';
import { ownKey } from './gap-own';
import type { Plot, Values } from './lookup';

const CURVE_POINTS = 60;
const LEAST_SPAN_BAR = 0.5;

interface Parts {
  readonly values: Values;
  readonly input: GapInput;
  readonly ambient_bar_abs: number;
  readonly gap: GapAnswer;
  readonly reachable_kV: number | null;
}

/** Both sides over gauge pressure, with what the supply, the vessel and the permit allow. */
export function gapPlot({ values, input, ambient_bar_abs, gap, reachable_kV }: Parts): Plot {
  const x = Number((input.pressure.bar_abs - ambient_bar_abs).toFixed(9));
  const vessel = numberAt(values, 'vessel_bar_g');
  const from = Math.min(0, x);
  const drawn = vessel ?? numberAt(values, 'highest_bar_g') ?? 3;
  const to = Math.max(drawn, x, from + LEAST_SPAN_BAR);
  const { points, last } = curveOf(input, ambient_bar_abs, { from, to });
  const window = windowOf(values, { from, to });
  const kV = (value: number, rounding: Rounding) =>
    formatFigure(value, { digits: { decimals: 1 }, rounding });
  return {
    title: `Self-break voltage of the gap at ${x.toFixed(2)} bar gauge: nothing fires below ${kV(gap.low_kV, 'down')} kV, law ${kV(gap.law_kV, 'nearest')} kV, may hold up to ${kV(gap.high_kV, 'up')} kV`,
    x: { label: 'Pressure', unit: 'bar(g)', min: from, max: to, decimals: 2 },
    y: { label: 'Voltage', unit: 'kV', decimals: 1, ...voltageSpan(points, gap) },
    band: {
      points: points.map(({ x: at, low, high }) => ({ x: at, low, high })),
      above: 'breaks',
      below: 'holds',
    },
    law: points.map(({ x: at, law }) => ({ x: at, y: law })),
    ...ownOf({ values, input, ambient_bar_abs }, { from, to }),
    point: { x, low: gap.low_kV, high: gap.high_kV },
    ...(reachable_kV === null
      ? {}
      : { limit: { y: reachable_kV, label: `supply ${kV(reachable_kV, 'down')}\u2009kV` } }),
    ...(vessel === null ? {} : { wall: { from: vessel, label: `vessel ${vessel.toFixed(1)}\u2009bar(g)` } }),
    ...(window === null ? {} : { window }),
    ...(last >= to - 1e-9 ? {} : { notValid: { from: last, label: 'not valid here' } }),
  };
}

interface CurvePoint {
  readonly x: number;
  readonly low: number;
  readonly law: number;
  readonly high: number;
}

function curveOf(input: GapInput, ambient: number, range: { readonly from: number; readonly to: number }) {
  const gauge = Array.from(
    { length: CURVE_POINTS + 1 },
    (_, i) => range.from + ((range.to - range.from) * i) / CURVE_POINTS,
  );
  const curve = gapCurve(
    input,
    gauge.map((bar_g) => bar_g + ambient),
  );
  const points: CurvePoint[] = [];
  if (!curve.ok) return { points, last: range.to };
  for (const point of curve.value) {
    if (!point.valid) continue;
    const { pressure_bar_abs, low_kV, law_kV, high_kV } = point;
    points.push({ x: pressure_bar_abs - ambient, low: low_kV, law: law_kV, high: high_kV });
  }
  return { points, last: points.at(-1)?.x ?? range.to };
}

/**
 * The rig's own curve over the pressures that were read, at the gap as it stands here. It says when the gap fires; the two
 * sides stay the law's.
 */
function ownOf(
  { values, input, ambient_bar_abs }: Pick<Parts, 'values' | 'input' | 'ambient_bar_abs'>,
  range: { readonly from: number; readonly to: number },
): Pick<Plot, 'own'> {
  const [scale = null, offset_mm = null, low = null, high = null] = OWN_KEYS.map((key) =>
    numberAt(values, key),
  );
  if (scale === null || offset_mm === null || low === null || high === null) return {};
  if (values['own_of'] !== ownKey(values)) return {};
  const first = Math.max(low, range.from + ambient_bar_abs);
  const last = Math.min(high, range.to + ambient_bar_abs);
  if (first >= last) return {};
  const at = Array.from({ length: OWN_POINTS + 1 }, (_, i) => first + ((last - first) * i) / OWN_POINTS);
  const curve = gapCurve({ ...input, gap_mm: input.gap_mm + offset_mm }, at);
  if (!curve.ok) return {};
  const points = curve.value.flatMap((one) =>
    one.valid ? [{ x: one.pressure_bar_abs - ambient_bar_abs, y: scale * one.law_kV }] : [],
  );
  return points.length < 2 ? {} : { own: { points, label: 'own' } };
}

const OWN_KEYS = ['own_scale', 'own_offset_mm', 'own_from_bar_abs', 'own_to_bar_abs'] as const;
const OWN_POINTS = 24;

function windowOf(values: Values, range: { readonly from: number; readonly to: number }) {
  const from = numberAt(values, 'window_from_bar_g');
  const to = numberAt(values, 'window_to_bar_g');
  if (from === null || to === null) return null;
  const window = { min: Math.max(range.from, from), max: Math.min(to, range.to) };
  return window.min < window.max ? window : null;
}

function voltageSpan(points: readonly CurvePoint[], gap: GapAnswer) {
  const lows = points.map((point) => point.low);
  const laws = points.map((point) => point.law);
  return {
    min: Math.max(0, Math.floor(Math.min(...lows, gap.low_kV) - 1)),
    max: Math.ceil(Math.max(...laws, gap.high_kV) * 1.12),
  };
}
