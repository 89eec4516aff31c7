import type { BandPoint, ChartData, ChartWords, Point } from '../../src/components/chart/types';
import type { Place } from '../../src/components/places-bar';

const XS = Array.from({ length: 41 }, (_, i) => i * 0.05);

/** A near-straight law through 18.8 at 1.00; only its look matters here. */
const law = (bar_g: number): number => 18.8 + (bar_g - 1) * 8.4 - 0.12 * (bar_g - 1) ** 2;

export const lawPoints: Point[] = XS.map((x) => ({ x, y: law(x) }));
export const bandPoints: BandPoint[] = XS.map((x) => ({ x, low: law(x) * 0.888, high: law(x) * 1.29 }));

export const gapChart: ChartData = {
  x: { min: 0, max: 2, unit: 'bar(g)', decimals: 2 },
  y: { min: 8, max: 32, unit: 'kV', decimals: 1 },
  band: { points: bandPoints, above: 'breaks', below: 'holds' },
  law: lawPoints,
  own: { points: lawPoints.filter(({ x }) => x > 0.78 && x < 1.22).map(({ x, y }) => ({ x, y: y * 1.005 })) },
  limit: { y: 23.5, label: 'supply 23.5\u2009kV', short: '23.5\u2009kV' },
  wall: { from: 2, label: 'vessel 2.0\u2009bar(g)' },
  point: { x: 1, low: 16.7, high: 24.3 },
  window: { min: 0.8, max: 1.2 },
};

export const calibrationChart: ChartData = {
  x: { min: 0.75, max: 1.25, unit: 'bar(g)', decimals: 2 },
  y: { min: 15, max: 22, unit: 'kV', decimals: 1 },
  band: {
    points: XS.filter((x) => x >= 0.74 && x <= 1.26).map((x) => ({
      x,
      low: law(x) - 0.9,
      high: law(x) + 0.9,
    })),
    above: '',
    below: '',
  },
  curves: [
    { points: XS.filter((x) => x >= 0.74 && x <= 1.26).map((x) => ({ x, y: law(x) })), weight: 'thin' },
  ],
  point: { x: 1.02, low: law(1.02) - 0.9, high: law(1.02) + 0.9, y: 18.9, bare: true },
  readings: Array.from({ length: 46 }, (_, i) => {
    const x = [0.8, 0.85, 0.9, 0.95, 1, 1.02, 1.05, 1.1, 1.2][i % 9] ?? 1;
    return { x: x + ((i * 7) % 5) * 0.001, y: law(x) + Math.sin(i * 2.3) * 0.45 };
  }).concat([{ x: 1, y: 17.6 }]),
};

export const deskChart: ChartData = {
  ...calibrationChart,
  band: { points: calibrationChart.band?.points ?? [], above: 'breaks', below: 'holds' },
  readings: (calibrationChart.readings ?? []).map((reading) =>
    reading.y === 17.6 ? { ...reading, odd: true, number: 'reading 22' } : reading,
  ),
};

export const chartWords: ChartWords = {
  showTable: 'Table',
  showChart: 'Chart',
  low: 'nothing fires below',
  high: 'may hold up to',
  law: 'law',
  own: 'own',
  number: 'No.',
};

export const places: Place[] = ['Bench', 'Firings', 'Lookups', 'Checks', 'Rigs', 'Kit', 'Notes'].map(
  (label) => ({
    key: label.toLowerCase(),
    label,
    href: `#${label.toLowerCase()}`,
  }),
);
