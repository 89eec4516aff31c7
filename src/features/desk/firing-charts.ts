import type { ChartData, ChartReading } from '../../components/chart/types';
import type { RigSpec } from '../../domain/book/rig-spec';
import { gapCurve } from '../../domain/gap/gap-curve';
import { gapSetupOf } from '../../domain/rules/rig-gap';
import type { FiringRow } from '../../domain/report/firing-rows';

const CURVE_POINTS = 41;
/** The plausibility speaks at three sigma; the band is drawn there. */
const BAND_SIGMA = 3;

/** Measured self-breaks against the law's two sides over gauge pressure; null where nothing was measured. */
export function lawChart(rows: readonly FiringRow[], spec: RigSpec): ChartData | null {
  const breaks = measured(rows);
  const [first] = breaks;
  if (first === undefined) return null;
  const { ambient_bar_abs, temperature_C } = first.values;
  const pressures = breaks.map((row) => row.values.pressure_bar_g);
  const from = Math.min(...pressures, spec.gap.lowest_bar_g);
  const to = Math.max(...pressures, spec.gap.highest_bar_g);
  const margin = Math.max(0.05, (to - from) * 0.12);
  const x = { min: from - margin, max: to + margin, unit: 'bar(g)', decimals: 2 };
  const at = Array.from(
    { length: CURVE_POINTS },
    (_, i) => x.min + ((x.max - x.min) * i) / (CURVE_POINTS - 1),
  );
  const curve = gapCurve(
    gapSetupOf(spec, temperature_C),
    at.map((bar_g) => bar_g + ambient_bar_abs),
  );
  const points = curve.ok ? curve.value.flatMap((point) => (point.valid ? [point] : [])) : [];
  const heights = [
    ...points.flatMap((one) => [one.low_kV, one.high_kV]),
    ...breaks.map((row) => row.values.voltage_kV),
  ];
  return {
    x,
    y: { ...spanOf(heights), unit: 'kV', decimals: 1 },
    band: {
      points: points.map((one) => ({
        x: one.pressure_bar_abs - ambient_bar_abs,
        low: one.low_kV,
        high: one.high_kV,
      })),
      above: 'breaks',
      below: 'holds',
    },
    law: points.map((one) => ({ x: one.pressure_bar_abs - ambient_bar_abs, y: one.law_kV })),
    readings: breaks.map((row) => dot(row, row.values.pressure_bar_g, row.values.voltage_kV)),
  };
}

/** Measured minus law over the shots of the firing; null where nothing was measured. */
export function residualChart(rows: readonly FiringRow[]): ChartData | null {
  const breaks = measured(rows).flatMap((row) =>
    row.expected_kV === null || row.sigma_kV === null
      ? []
      : [{ row, residual: row.values.voltage_kV - row.expected_kV, sigma_kV: row.sigma_kV }],
  );
  if (breaks.length === 0) return null;
  const shots = Math.max(...breaks.map(({ row }) => row.shots_so_far));
  const most = Math.max(
    ...breaks.map(({ residual, sigma_kV }) => Math.max(Math.abs(residual), BAND_SIGMA * sigma_kV)),
  );
  const height = most * 1.25;
  const max = Math.max(10, shots * 1.04);
  const sigma_kV = breaks.reduce((sum, one) => sum + one.sigma_kV, 0) / breaks.length;
  const band = BAND_SIGMA * sigma_kV;
  return {
    x: { min: 0, max, unit: 'shots', decimals: 0 },
    y: { min: -height, max: height, unit: 'kV', decimals: 1 },
    band: {
      points: [0, max].map((x) => ({ x, low: -band, high: band })),
      above: 'measured minus law',
      below: '',
    },
    law: [
      { x: 0, y: 0 },
      { x: max, y: 0 },
    ],
    readings: breaks.map(({ row, residual }) => dot(row, row.shots_so_far, residual)),
  };
}

/** Struck and parted readings stay in the table; a plot shows only what stands. */
function measured(rows: readonly FiringRow[]): readonly FiringRow[] {
  return rows.filter(
    (row) =>
      (row.state === 'stands' || row.state === 'corrected') &&
      row.values.how === 'self-break' &&
      row.values.looked !== 'gap-dark',
  );
}

function dot(row: FiringRow, x: number, y: number): ChartReading {
  const odd = !row.fits || row.irregular;
  return odd ? { x, y, odd, number: `reading ${row.no}` } : { x, y };
}

function spanOf(heights: readonly number[]): { readonly min: number; readonly max: number } {
  const low = Math.min(...heights);
  const high = Math.max(...heights);
  const margin = Math.max(0.5, (high - low) * 0.1);
  return { min: Math.max(0, Math.floor(low - margin)), max: Math.ceil(high + margin) };
}
