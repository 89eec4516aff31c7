import { formatFigure } from '../units/format-quantity';
import type { CapacitorBody } from './capacitor-lookup-body';
import type { Entered } from './entered';
import { spread } from './figures';
import type { Plot } from './lookup';

const PIECES = 40;
/** Reflex line above 400 V (physics C, read). */
const REFLEX_J = 0.25;

/** Stress of a sheet, or energy of a bank, over voltage; with the supply, the limits and where it stands. */
export function capacitorPlot(input: Entered, body: CapacitorBody): Plot {
  const { plot, stored } = body;
  const x = input.number('voltage_kV');
  const supply_kV = input.maybe('supply_kV');
  const to = 1.2 * Math.max(x, supply_kV ?? 0);
  const yAt = (kV: number) =>
    plot.y === 'stress' ? plot.perKilovolt * kV : 0.5 * stored.value * (kV * 1000) ** 2;
  const points = spread({ from: 0, to }, PIECES).map((kV) => ({ x: kV, y: yAt(kV) }));
  const y = yAt(x);
  const limit =
    plot.y === 'stress'
      ? plot.limit
      : { y: REFLEX_J, label: 'a touch makes a person start', short: 'reflex' };
  const wall = wallAt(supply_kV, plot.rated_kV);
  const unit = plot.y === 'stress' ? 'kV/mm' : 'J';
  const what = plot.y === 'stress' ? 'Stress of the film' : 'Stored energy';
  const edges = plot.edgesFrom_kV;
  return {
    title: `${what} at ${figure(x, 'nearest')} kV: ${figure(y, 'up')} ${unit}`,
    x: { label: 'Voltage', unit: 'kV', min: 0, max: to, decimals: 1 },
    y: { label: what, unit, min: 0, max: 1.1 * Math.max(yAt(to), limitShown(limit?.y, yAt(to))) },
    curves: [{ label: what.toLowerCase(), points, weight: 'curve' }],
    point: { x, y, low: y, high: y },
    ...(limit === undefined ? {} : { limit }),
    ...(wall === undefined || wall.from >= to ? {} : { wall }),
    ...(edges === null || edges >= to
      ? {}
      : { spans: [{ from: edges, to, label: 'edges in air discharge' }] }),
  };
}

/** A limit far above everything would flatten the curve into the axis: it is then left out of the scale. */
function limitShown(limit: number | undefined, highest: number): number {
  return limit !== undefined && limit < 3 * highest ? limit : 0;
}

function wallAt(supply_kV: number | null, rated_kV: number | undefined): Plot['wall'] {
  const walls = [
    ...(supply_kV === null
      ? []
      : [{ from: supply_kV, label: `supply ${figure(supply_kV, 'down')}\u2009kV` }]),
    ...(rated_kV === undefined
      ? []
      : [{ from: rated_kV, label: `rated ${figure(rated_kV, 'down')}\u2009kV` }]),
  ];
  return walls.toSorted((one, other) => one.from - other.from)[0];
}

function figure(value: number, rounding: 'nearest' | 'up' | 'down'): string {
  return formatFigure(value, { digits: { significant: 3 }, rounding });
}
