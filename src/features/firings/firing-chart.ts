import type { ChartData, ChartReading, ChartWords } from '../../components/chart/types';
import type { RigSpec } from '../../domain/book/rig-spec';
import { gapCurve, type GapCurvePoint } from '../../domain/gap/gap-curve';
import { reachableVoltage } from '../../domain/charging/supply-reach';
import { chargingOf } from '../../domain/rules/rig-figures';
import { ownFor, type RigCalibration } from '../../domain/rules/rig-calibration';
import { gapSetupOf } from '../../domain/rules/rig-gap';
import type { FormValues } from './reading-form';
import { isSelfBreak, type StandingRow } from './reading-fit';

/** What of the form the chart hangs on. */
export type ChartedValues = Pick<
  FormValues,
  'voltage_kV' | 'pressure_bar_g' | 'ambient_bar_abs' | 'temperature_C' | 'gas'
>;

export interface FiringChartInput {
  readonly spec: RigSpec;
  readonly values: ChartedValues;
  readonly rows: readonly StandingRow[];
  readonly sigmas: ReadonlyMap<string, number>;
  /** The rig's own curve, drawn over the law where it was measured. */
  readonly own?: RigCalibration | null;
}

export const FIRING_CHART_WORDS: ChartWords = {
  showTable: 'Table',
  showChart: 'Curve',
  low: 'nothing fires below',
  high: 'may hold up to',
  law: 'law',
  own: 'own',
  number: 'No.',
};

const CURVE_POINTS = 40;
/** Margin around the allowed pressures, share of their span. */
const MARGIN = 0.25;
/** An open gap has no span of pressures: so much is drawn around ambient all the same. bar */
const LEAST_SPAN_BAR = 0.4;
/** Drawn as an open ring with its number from here on; the same three that make the sentence speak. */
const ODD_SIGMA = 3;

/**
 * The law between its two solid sides over gauge pressure at the ambient of the form, the self-breaks of this firing and
 * the working point. Null where the law has no answer; the words for that stand with the reading.
 */
export function firingChart({ spec, values, rows, sigmas, own = null }: FiringChartInput): ChartData | null {
  const { ambient_bar_abs, temperature_C, gas, pressure_bar_g } = values;
  if (ambient_bar_abs === null || temperature_C === null) return null;
  const selfBreaks = rows.filter((row) => isSelfBreak(row.values));
  const now = pressure_bar_g === null ? [] : [pressure_bar_g];
  const x = pressureRange(spec, [...selfBreaks.map((row) => row.values.pressure_bar_g), ...now]);
  const gauge = Array.from(
    { length: CURVE_POINTS + 1 },
    (_, i) => x.min + ((x.max - x.min) * i) / CURVE_POINTS,
  );
  const curve = gapCurve(
    { ...gapSetupOf(spec, temperature_C), gas },
    [...gauge, ...now].map((bar_g) => bar_g + ambient_bar_abs),
  );
  if (!curve.ok) return null;
  const points = curve.value.slice(0, gauge.length).flatMap((point) =>
    point.valid
      ? [
          {
            x: point.pressure_bar_abs - ambient_bar_abs,
            low: point.low_kV,
            high: point.high_kV,
            law: point.law_kV,
          },
        ]
      : [],
  );
  const [first] = points;
  const last = points.at(-1);
  if (first === undefined || last === undefined) return null;
  const y = voltageRange([first.low, last.high, ...selfBreaks.map((row) => row.values.voltage_kV)]);
  return {
    x: { ...x, unit: 'bar(g)', decimals: 2 },
    y: { ...y, unit: 'kV', decimals: 1 },
    band: { points, above: 'breaks', below: 'holds' },
    law: points.map((point) => ({ x: point.x, y: point.law })),
    ...ownCurve({ spec, values, own, gauge }),
    readings: selfBreaks.map((row) => dot(row, sigmas)),
    ...workingPoint(values, curve.value[gauge.length]),
    ...limitOf(spec, y.max),
    ...(last.x < x.max - 1e-9 ? { notValid: { from: last.x, label: 'not valid here' } } : {}),
  };
}

interface OwnInput {
  readonly spec: RigSpec;
  readonly values: ChartedValues;
  readonly own: RigCalibration | null;
  readonly gauge: readonly number[];
}

/** Over the pressures that were read and no further: beyond them nobody has measured this gap. */
function ownCurve({ spec, values, own, gauge }: OwnInput): Pick<ChartData, 'own'> {
  const { ambient_bar_abs, temperature_C, gas } = values;
  if (own === null || ambient_bar_abs === null || temperature_C === null) return {};
  const [from, to] = own.fit.read.pressure_bar_abs;
  const inside = [
    from,
    ...gauge.map((bar_g) => bar_g + ambient_bar_abs).filter((p) => p > from && p < to),
    to,
  ];
  const points = inside.flatMap((pressure_bar_abs) => {
    const pressure_bar_g = pressure_bar_abs - ambient_bar_abs;
    const at = ownFor(own.fit, spec, { gas, pressure_bar_g, ambient_bar_abs, temperature_C });
    return at === undefined || at.extrapolated ? [] : [{ x: pressure_bar_g, y: at.expected_kV }];
  });
  return points.length < 2 ? {} : { own: { points, label: 'own' } };
}

/** Where the form stands: between its two limits, with its voltage once there is one. */
function workingPoint(
  { pressure_bar_g, voltage_kV }: ChartedValues,
  at: GapCurvePoint | undefined,
): Pick<ChartData, 'point'> {
  if (at?.valid !== true || pressure_bar_g === null) return {};
  const point = { x: pressure_bar_g, low: at.low_kV, high: at.high_kV };
  return { point: voltage_kV === null ? point : { ...point, y: voltage_kV } };
}

function dot({ reading, values }: StandingRow, sigmas: ReadonlyMap<string, number>): ChartReading {
  const odd = Math.abs(sigmas.get(reading.id) ?? 0) >= ODD_SIGMA;
  return {
    x: values.pressure_bar_g,
    y: values.voltage_kV,
    number: String(reading.no),
    ...(odd ? { odd } : {}),
  };
}

function pressureRange(spec: RigSpec, at: readonly number[]): { readonly min: number; readonly max: number } {
  const { lowest_bar_g, highest_bar_g } = spec.gap;
  const span = Math.max(highest_bar_g - lowest_bar_g, LEAST_SPAN_BAR);
  const min = Math.min(lowest_bar_g - MARGIN * span, ...at);
  const max = Math.max(highest_bar_g + MARGIN * span, ...at);
  return { min: Math.floor(min * 20) / 20, max: Math.ceil(max * 20) / 20 };
}

function voltageRange(kV: readonly number[]): { readonly min: number; readonly max: number } {
  return { min: Math.max(0, Math.floor(Math.min(...kV)) - 1), max: Math.ceil(Math.max(...kV)) + 1 };
}

/** What the supply reaches through ballast and bleed, where it cuts through the drawn range. */
function limitOf(spec: RigSpec, top_kV: number): Pick<ChartData, 'limit'> {
  const reach = reachableVoltage(chargingOf(spec));
  if (!reach.ok || reach.value.value > top_kV) return {};
  const kV = Math.floor(reach.value.value * 10) / 10;
  return { limit: { y: kV, label: `supply ${kV}\u2009kV` } };
}
