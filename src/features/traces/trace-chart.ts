import type { BandPoint, ChartData, ChartWords, Point } from '../../components/chart/types';
import type { Envelope } from '../../domain/oscillogram/extremes';
import type { Measured } from './trace-figures';

export const TRACE_CHART_WORDS: ChartWords = {
  showTable: 'Table',
  showChart: 'Trace',
  low: 'lowest',
  high: 'highest',
  law: 'simulated',
  own: 'simulated',
  number: 'No.',
};

interface TimeAxis {
  readonly unit: string;
  readonly size_s: number;
}

const TIME_AXES: readonly TimeAxis[] = [
  { unit: 's', size_s: 1 },
  { unit: 'ms', size_s: 1e-3 },
  { unit: '\u00b5s', size_s: 1e-6 },
  { unit: 'ns', size_s: 1e-9 },
];
/** A span is written in the largest unit of which it holds so many. */
const LEAST_OF_UNIT = 2;

function timeAxisOf(span_s: number): TimeAxis {
  const last = { unit: 'ns', size_s: 1e-9 };
  return TIME_AXES.find(({ size_s }) => span_s >= LEAST_OF_UNIT * size_s) ?? last;
}

/** An envelope in the unit of its channel, over what the solver says, as the chart takes it. */
export function traceChart(
  envelope: Envelope,
  { unit }: Pick<Measured, 'unit'>,
  simulated: readonly Point[] | null,
): ChartData {
  const span_s = envelope.to_s - envelope.from_s;
  const axis = timeAxisOf(span_s);
  const points = envelopePoints(envelope, axis);
  const over = (simulated ?? [])
    .filter(({ x }) => x >= envelope.from_s && x <= envelope.to_s)
    .map(({ x, y }) => ({ x: x / axis.size_s, y }));
  const all = [...points.flatMap(({ low, high }) => [low, high]), ...over.map(({ y }) => y)];
  const low = Math.min(0, ...all);
  const high = Math.max(0, ...all);
  const room = (high - low || 1) * 0.08;
  return {
    x: {
      min: envelope.from_s / axis.size_s,
      max: envelope.to_s / axis.size_s,
      unit: axis.unit,
      decimals: decimalsFor(span_s / axis.size_s),
    },
    y: { min: low - room, max: high + room, unit, decimals: decimalsFor(high - low) },
    band: { points, above: '', below: '', extremes: true },
    ...(over.length < 2 ? {} : { law: over }),
  };
}

/** Slices without a point are left out, so that the line goes on from one point to the next when looking far in. */
function envelopePoints({ from_s, to_s, low, high }: Envelope, { size_s }: TimeAxis): readonly BandPoint[] {
  const slice_s = (to_s - from_s) / low.length;
  const points: BandPoint[] = [];
  for (const [i, lowest] of low.entries()) {
    const highest = high[i] ?? Number.NaN;
    if (Number.isNaN(lowest) || Number.isNaN(highest)) continue;
    points.push({ x: (from_s + i * slice_s) / size_s, low: lowest, high: highest });
  }
  return points;
}

/** Digits after the point that tell a thousandth of the span. */
function decimalsFor(span: number): number {
  if (!(span > 0)) return 1;
  return Math.min(6, Math.max(0, 3 - Math.floor(Math.log10(span)) - 1));
}
