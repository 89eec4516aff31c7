import type { ChartLayout } from './chart-layout';
import type { Plot } from './chart-paths';
import { ticks, type Tick } from './ticks';
import type { ChartData } from './types';

export interface ChartAxesProps {
  readonly data: ChartData;
  readonly layout: ChartLayout;
  readonly plot: Plot;
  readonly font: number;
}

/** Ticks are 8 and 14 px; the unit takes the place of the last figure. */
const SHORT_PX = 8;
const LONG_PX = 14;

export function ChartAxes({ data, layout, plot, font }: ChartAxesProps) {
  const { left, right, top, bottom } = layout;
  const most = { x: (right - left) / (font * 4), y: (bottom - top) / (font * 2.4) };
  const xTicks = ticks(data.x, most.x);
  const yTicks = ticks(data.y, most.y);
  const yEdge = left - font * 0.55;
  const xEdge = bottom + font * 0.64;
  const labelGap = Math.max(font * 0.95, LONG_PX + 6);
  const unitWidth = data.x.unit.length * font * 0.52;
  const xEnd = Math.min(layout.width, right + layout.wall + (layout.wall > 0 ? 0 : font * 0.3));
  return (
    <g className="chart-axes">
      <path
        className="chart-ticks"
        d={marks(yTicks, (at, long) => `M${yEdge} ${plot.y.at(at)}h${-(long ? LONG_PX : SHORT_PX)}`)}
      />
      <path
        className="chart-ticks"
        d={marks(xTicks, (at, long) => `M${plot.x.at(at)} ${xEdge}v${long ? LONG_PX + 2 : SHORT_PX}`)}
      />
      {yTicks.map((tick) =>
        tick.label !== null && plot.y.at(tick.value) > top + font * 1.25 ? (
          <text
            key={tick.value}
            className="muted-text"
            textAnchor="end"
            x={yEdge - labelGap}
            y={plot.y.at(tick.value) + font * 0.35}
          >
            {tick.label}
          </text>
        ) : null,
      )}
      <text textAnchor="end" x={yEdge - labelGap} y={top + font * 0.35}>
        {data.y.unit}
      </text>
      {xTicks.map((tick) =>
        tick.label !== null &&
        plot.x.at(tick.value) + tick.label.length * font * 0.3 < xEnd - unitWidth - font * 0.4 ? (
          <text
            key={tick.value}
            className="muted-text"
            textAnchor="middle"
            x={plot.x.at(tick.value)}
            y={xEdge + font * 1.75}
          >
            {tick.label}
          </text>
        ) : null,
      )}
      <text textAnchor="end" x={xEnd} y={xEdge + font * 1.75}>
        {data.x.unit}
      </text>
      {data.window === undefined ? null : (
        <path className="chart-window" d={windowBars(plot, data.window, bottom + 2)} />
      )}
    </g>
  );
}

function marks(all: readonly Tick[], draw: (value: number, long: boolean) => string): string {
  return all.map((tick) => draw(tick.value, tick.long)).join('');
}

/** What is allowed is the void between two bars. */
function windowBars(
  plot: Plot,
  { min, max }: { readonly min: number; readonly max: number },
  y: number,
): string {
  const from = Math.max(plot.left, Math.min(plot.right, plot.x.at(min)));
  const to = Math.max(from, Math.min(plot.right, plot.x.at(max)));
  return `M${plot.left} ${y}H${from}v8H${plot.left}ZM${plot.right} ${y}H${to}v8H${plot.right}Z`;
}
