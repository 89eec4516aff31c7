import type { Scale } from './scale';
import type { BandPoint, ChartData, CursorValues, Point } from './types';

export interface Plot {
  readonly x: Scale;
  readonly y: Scale;
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly bottom: number;
}

/** A line through its points; where one has no finite figure the line is broken, not drawn across. */
export function linePath(points: readonly Point[], plot: Plot): string {
  let path = '';
  let pen = 'M';
  for (const { x, y } of points) {
    if (!Number.isFinite(x) || !Number.isFinite(y)) {
      pen = 'M';
      continue;
    }
    path += `${pen}${tenth(plot.x.at(x))} ${tenth(plot.y.at(y))}`;
    pen = 'L';
  }
  return path;
}

/** The solid bodies above and below: they end square where the points end, and the rest of the axis stays bare. */
export function bandPaths(
  points: readonly BandPoint[],
  plot: Plot,
): { readonly above: string; readonly below: string; readonly highLine: string; readonly lowLine: string } {
  const highLine = linePath(
    points.map(({ x, high }) => ({ x, y: high })),
    plot,
  );
  const lowLine = linePath(
    points.map(({ x, low }) => ({ x, y: low })),
    plot,
  );
  const first = points[0];
  const last = points.at(-1);
  if (first === undefined || last === undefined) return { above: '', below: '', highLine: '', lowLine: '' };
  const from = tenth(plot.x.at(first.x));
  const to = tenth(plot.x.at(last.x));
  // A curve that leaves through the top must not close its body across the void, so the body closes above the plot.
  const top = tenth(Math.min(plot.top, plot.y.at(last.high), plot.y.at(first.high)));
  return {
    above: `${highLine}L${to} ${top}H${from}Z`,
    below: `${lowLine}L${to} ${tenth(plot.bottom)}H${from}Z`,
    highLine,
    lowLine,
  };
}

/** Every x at which something was computed, once each, inside the axis. */
export function cursorStops(data: ChartData): readonly number[] {
  const all = [
    ...(data.band?.points ?? []),
    ...(data.law ?? []),
    ...(data.own?.points ?? []),
    ...(data.curves ?? []).flatMap((curve) => curve.points),
  ].map((point) => point.x);
  const inside = all.filter((x) => x >= data.x.min && x <= data.x.max);
  return [...new Set(inside)].sort((a, b) => a - b);
}

export function nearest(stops: readonly number[], x: number): number | undefined {
  let best: number | undefined;
  for (const stop of stops) if (best === undefined || Math.abs(stop - x) < Math.abs(best - x)) best = stop;
  return best;
}

/** What the curves say at x, between their points by a straight line, and nothing outside their range. */
export function valuesAt(data: ChartData, x: number): CursorValues {
  const low = between(
    (data.band?.points ?? []).map((p) => ({ x: p.x, y: p.low })),
    x,
  );
  const high = between(
    (data.band?.points ?? []).map((p) => ({ x: p.x, y: p.high })),
    x,
  );
  const law = between(data.law ?? [], x);
  const own = between(data.own?.points ?? [], x);
  const curves = labelledCurves(data).map(({ label, points }) => ({
    label,
    value: between(points, x) ?? null,
  }));
  return {
    x,
    ...(low === undefined ? {} : { low }),
    ...(high === undefined ? {} : { high }),
    ...(law === undefined ? {} : { law }),
    ...(own === undefined ? {} : { own }),
    ...(curves.length === 0 ? {} : { curves }),
  };
}

/** Curves that have a name: each is a column of the table. */
export function labelledCurves(
  data: ChartData,
): readonly { readonly label: string; readonly points: readonly Point[] }[] {
  return (data.curves ?? []).flatMap(({ label, points }) => (label === undefined ? [] : [{ label, points }]));
}

function between(points: readonly Point[], x: number): number | undefined {
  for (const [i, point] of points.entries()) {
    if (point.x === x) return Number.isFinite(point.y) ? point.y : undefined;
    const next = points[i + 1];
    if (next !== undefined && point.x < x && x < next.x) {
      const y = point.y + ((next.y - point.y) * (x - point.x)) / (next.x - point.x);
      return Number.isFinite(y) ? y : undefined;
    }
  }
  return undefined;
}

function tenth(value: number): number {
  return Math.round(value * 10) / 10;
}
