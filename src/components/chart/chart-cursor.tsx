import type { KeyboardEvent, PointerEvent } from 'react';
import { formatFigure } from '../../domain/units/format-quantity';
import type { ChartLayout } from './chart-layout';
import { nearest, valuesAt, type Plot } from './chart-paths';
import type { ChartData, CursorValues } from './types';

export interface ChartCursorProps {
  readonly label: string;
  readonly data: ChartData;
  readonly layout: ChartLayout;
  readonly plot: Plot;
  readonly stops: readonly number[];
  readonly at: number | null;
  readonly onMove: (x: number | null) => void;
  readonly describe: (values: CursorValues) => string;
}

/** Reads the curves off at one x: by a finger along the plot, or by the arrow keys from one computed point to the next. */
export function ChartCursor({ label, data, layout, plot, stops, at, onMove, describe }: ChartCursorProps) {
  const { left, right, top, bottom } = layout;
  const values = at === null ? null : valuesAt(data, at);
  const follow = (event: PointerEvent<HTMLDivElement>): void => {
    const box = event.currentTarget.getBoundingClientRect();
    const x = nearest(stops, plot.x.valueAt(left + event.clientX - box.left));
    if (x !== undefined) onMove(x);
  };
  const keys = (event: KeyboardEvent): void => {
    const next = stopAfterKey(event.key, stops, at);
    if (next === undefined) return;
    event.preventDefault();
    onMove(next);
  };
  return (
    <>
      {values === null ? null : (
        <svg className="chart-cursor" aria-hidden="true">
          <path d={`M${plot.x.at(values.x)} ${top}V${bottom}`} />
          {[values.low, values.high, values.law, values.own, ...curvesOf(values)].map((y, i) =>
            y === undefined ? null : <circle key={i} cx={plot.x.at(values.x)} cy={plot.y.at(y)} r="5" />,
          )}
        </svg>
      )}
      {values === null ? null : (
        <output className="chart-says" aria-hidden="true" style={{ height: top }}>
          {describe(values)}
        </output>
      )}
      <div
        className="chart-reader"
        role="slider"
        tabIndex={0}
        aria-label={label}
        aria-valuemin={data.x.min}
        aria-valuemax={data.x.max}
        aria-valuenow={at ?? data.point?.x ?? data.x.min}
        aria-valuetext={describe(valuesAt(data, at ?? data.point?.x ?? stops[0] ?? data.x.min))}
        style={{ left, top, width: right - left, height: bottom - top }}
        onPointerDown={(event) => {
          event.currentTarget.setPointerCapture(event.pointerId);
          follow(event);
        }}
        onPointerMove={(event) => {
          if (event.buttons > 0) follow(event);
        }}
        onKeyDown={keys}
        onBlur={() => onMove(null)}
      />
    </>
  );
}

function stopAfterKey(key: string, stops: readonly number[], at: number | null): number | null | undefined {
  if (key === 'Escape') return null;
  if (key === 'Home') return stops[0];
  if (key === 'End') return stops.at(-1);
  const step =
    key === 'ArrowRight' || key === 'ArrowUp' ? 1 : key === 'ArrowLeft' || key === 'ArrowDown' ? -1 : 0;
  if (step === 0) return undefined;
  const here = at === null ? (step > 0 ? -1 : stops.length) : stops.indexOf(at);
  return stops[Math.max(0, Math.min(stops.length - 1, here + step))];
}

function curvesOf({ curves = [] }: CursorValues): readonly (number | undefined)[] {
  return curves.map(({ value }) => value ?? undefined);
}

/** What is read off, when the screen has no words of its own for it. */
export function plainWords(data: ChartData, values: CursorValues): string {
  const write = (value: number, decimals = 1): string =>
    formatFigure(value, { digits: { decimals }, rounding: 'nearest' });
  const x = `${write(values.x, data.x.decimals ?? 2)}\u2009${data.x.unit}`;
  const { low, high } = values;
  const decimals = data.y.decimals ?? 1;
  const interval =
    low === undefined || high === undefined
      ? []
      : [
          `${formatFigure(low, { digits: { decimals }, rounding: 'down' })} to ${formatFigure(high, { digits: { decimals }, rounding: 'up' })}`,
        ];
  const single = [values.law, values.own].flatMap((value) =>
    value === undefined ? [] : [write(value, decimals)],
  );
  const curves = (values.curves ?? []).flatMap(({ label, value }) =>
    value === null ? [] : [`${label} ${write(value, decimals)}`],
  );
  return `${x}: ${[...interval, ...single, ...curves].join(', ')}\u2009${data.y.unit}`;
}
