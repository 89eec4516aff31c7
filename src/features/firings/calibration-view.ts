import type { ChartData } from '../../components/chart/types';
import type { RigSpec } from '../../domain/book/rig-spec';
import { calibratedSelfBreak } from '../../domain/calibration/self-break-fit';
import { gapCurve } from '../../domain/gap/gap-curve';
import type { CalibrationPoint, LeftOut, RigCalibration } from '../../domain/rules/rig-calibration';
import { gapSetupOf } from '../../domain/rules/rig-gap';
import { formatFigure } from '../../domain/units/format-quantity';

const CURVE_POINTS = 40;
/** Drawn to either side of what was read, as a share of its span. */
const MARGIN = 0.15;
const LEAST_SPAN_BAR = 0.3;

export const LEFT_OUT_WORDS: Readonly<Record<LeftOut, string>> = {
  'not-self-break': 'not measured at self-break',
  struck: 'struck or corrected twice, apart',
  irregular: 'irregular',
  unready: 'of firings recorded as unready',
  'left-out': 'left out by the reviewer',
  'sent-back': 'of firings sent back',
  'other-gap': 'of other electrodes or another gas',
};

/** "12 irregular, 3 left out by the reviewer"; empty when every reading was used. */
export function leftOutWords(left_out: RigCalibration['left_out']): string {
  return (Object.keys(LEFT_OUT_WORDS) as LeftOut[])
    .filter((why) => left_out[why] > 0)
    .map((why) => `${left_out[why]} ${LEFT_OUT_WORDS[why]}`)
    .join(', ');
}

export interface FitFigure {
  readonly label: string;
  /** With its interval at 95 %. */
  readonly words: string;
}

/** The fitted numbers, each with what it may be. */
export function fitFigures({ fit }: RigCalibration, spec: RigSpec): readonly FitFigure[] {
  const { scale, offset_mm, scatter, used, read } = fit;
  const percent = (share: number) => plain(100 * share, 1);
  const figures: FitFigure[] = [];
  if (offset_mm !== null) {
    const gap = spec.gap.gap_mm;
    figures.push({
      label: `Effective gap, set to ${plain(gap, 2)}\u2009mm`,
      words: `${plain(gap + offset_mm.value, 2)}\u2009mm (${plain(gap + offset_mm.low, 2)} to ${plain(gap + offset_mm.high, 2)})`,
    });
  }
  figures.push(
    {
      label: 'Scale, own over law',
      words: `${plain(scale.value, 3)} (${plain(scale.low, 3)} to ${plain(scale.high, 3)})`,
    },
    { label: 'Scatter of single shots', words: `${percent(scatter)}\u2009%, one sigma` },
    {
      label: 'Self-breaks used',
      words: `${used}, at ${plain(read.pressure_bar_abs[0], 2)} to ${plain(read.pressure_bar_abs[1], 2)}\u2009bar(abs)`,
    },
  );
  return figures;
}

export interface Residual {
  readonly point: CalibrationPoint;
  /** Relative, positive where it broke above the own curve. */
  readonly residual: number;
}

/** Residuals of the readings that the fit kept, by shots. */
export function residualsOf({ fit, points }: RigCalibration): readonly Residual[] {
  const out = new Set(fit.outliers.map(({ name }) => name));
  return points
    .filter(({ name }) => !out.has(name))
    .map((point, i) => ({ point, residual: fit.residuals[i] ?? 0 }));
}

/**
 * Law and own curve over absolute pressure at the gap of this revision, with the self-breaks read at it. The two sides
 * are the law's: the own curve says when it fires, never what it holds off. Null where the law has no answer.
 */
export function calibrationChart(calibration: RigCalibration, spec: RigSpec): ChartData | null {
  const { fit, points } = calibration;
  const here = points.filter(({ gap_mm }) => gap_mm === spec.gap.gap_mm);
  const temperature_C = points.reduce((sum, one) => sum + one.temperature_C, 0) / points.length;
  const [from, to] = fit.read.pressure_bar_abs;
  const margin = MARGIN * Math.max(to - from, LEAST_SPAN_BAR);
  const min = Math.max(0.05, from - margin);
  const at = Array.from(
    { length: CURVE_POINTS + 1 },
    (_, i) => min + ((to + margin - min) * i) / CURVE_POINTS,
  );
  const curve = gapCurve(gapSetupOf(spec, temperature_C), at);
  if (!curve.ok) return null;
  const law = curve.value.flatMap((one) => (one.valid ? [one] : []));
  const [first] = law;
  const last = law.at(-1);
  if (first === undefined || last === undefined) return null;
  const own = at
    .filter((p) => p >= from - 1e-9 && p <= to + 1e-9)
    .flatMap((pressure_bar_abs) => {
      const one = calibratedSelfBreak(fit, { gap_mm: spec.gap.gap_mm, pressure_bar_abs, temperature_C });
      return one.ok ? [{ x: pressure_bar_abs, y: one.value.value }] : [];
    });
  const kV = [first.low_kV, last.high_kV, ...here.map(({ voltage_kV }) => voltage_kV)];
  const out = new Set(fit.outliers.map(({ name }) => name));
  return {
    x: { min, max: to + margin, unit: 'bar(abs)', decimals: 2 },
    y: {
      min: Math.max(0, Math.floor(Math.min(...kV)) - 1),
      max: Math.ceil(Math.max(...kV)) + 1,
      unit: 'kV',
      decimals: 1,
    },
    band: {
      points: law.map((one) => ({ x: one.pressure_bar_abs, low: one.low_kV, high: one.high_kV })),
      above: 'breaks',
      below: 'holds',
    },
    law: law.map((one) => ({ x: one.pressure_bar_abs, y: one.law_kV })),
    ...(own.length < 2 ? {} : { own: { points: own, label: 'own' } }),
    readings: here.map((one) => ({
      x: one.pressure_bar_abs,
      y: one.voltage_kV,
      number: one.name,
      ...(out.has(one.name) ? { odd: true } : {}),
    })),
  };
}

/** Residuals over shots, in percent of the own curve. Null with fewer than two. */
export function residualChart(calibration: RigCalibration): ChartData | null {
  const residuals = residualsOf(calibration);
  const shots = residuals.map(({ point }) => point.shot);
  const most = Math.max(1, ...residuals.map(({ residual }) => Math.abs(100 * residual)));
  const [min, max] = [Math.min(...shots), Math.max(...shots)];
  if (residuals.length < 2 || min === max) return null;
  const limit = Math.ceil(most);
  return {
    x: { min, max, unit: 'shots', decimals: 0 },
    y: { min: -limit, max: limit, unit: '%', decimals: 1 },
    law: [
      { x: min, y: 0 },
      { x: max, y: 0 },
    ],
    readings: residuals.map(({ point, residual }) => ({ x: point.shot, y: 100 * residual })),
  };
}

function plain(value: number, decimals: number): string {
  return formatFigure(value, { digits: { decimals }, rounding: 'nearest' });
}
