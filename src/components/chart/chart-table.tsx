import { memo } from 'react';
import { formatFigure, type Rounding } from '../../domain/units/format-quantity';
import { Table, type Column } from '../table';
import { cursorStops, labelledCurves, valuesAt } from './chart-paths';
import type { ChartData, ChartReading, ChartWords, CursorValues } from './types';

export interface ChartTableProps {
  readonly title: string;
  readonly data: ChartData;
  readonly words: ChartWords;
}

/** A curve has many points; a table that is read aloud has to end. */
const MOST_ROWS = 40;

/** The chart's figures. The low side is rounded down and the high side up, as everywhere. */
export const ChartTable = memo(function ChartTable({ title, data: whole, words }: ChartTableProps) {
  const data = upToWall(whole);
  const stops = cursorStops(data);
  const every = Math.max(1, Math.ceil(stops.length / MOST_ROWS));
  const shown = stops.filter((_, i) => i % every === 0 || i === stops.length - 1);
  const rows = shown.map((x, i) => withExtremes(data, valuesAt(data, x), shown[i + 1] ?? Infinity));
  const xDecimals = data.x.decimals ?? 2;
  const yDecimals = data.y.decimals ?? 1;
  const column = (
    key: 'low' | 'high' | 'law' | 'own',
    head: string,
    rounding: Rounding,
  ): Column<CursorValues> => ({
    key,
    head: `${head}, ${data.y.unit}`,
    cell: (row) => {
      const value = row[key];
      return value === undefined
        ? '\u2013'
        : formatFigure(value, { digits: { decimals: yDecimals }, rounding });
    },
  });
  const columns: Column<CursorValues>[] = [
    {
      key: 'x',
      head: data.x.unit,
      cell: (row) => formatFigure(row.x, { digits: { decimals: xDecimals }, rounding: 'nearest' }),
    },
    ...(data.band === undefined ? [] : [column('low', words.low, 'down'), column('high', words.high, 'up')]),
    ...(data.law === undefined ? [] : [column('law', words.law, 'nearest')]),
    ...(data.own === undefined ? [] : [column('own', words.own, 'nearest')]),
    ...labelledCurves(data).map(({ label }, i): Column<CursorValues> => ({
      key: `curve${String(i)}`,
      head: `${label}, ${data.y.unit}`,
      cell: ({ curves }) => {
        const value = curves?.[i]?.value ?? null;
        return value === null
          ? '\u2013'
          : formatFigure(value, { digits: { decimals: yDecimals }, rounding: 'nearest' });
      },
    })),
  ];
  return (
    <>
      <Table caption={title} columns={columns} rows={rows} rowKey={(row) => String(row.x)} />
      {data.readings === undefined || data.readings.length === 0 ? null : (
        <Table
          caption={title}
          columns={readingColumns(data, words)}
          rows={data.readings.map((reading, i) => ({ ...reading, key: String(i) }))}
          rowKey={(row) => row.key}
        />
      )}
    </>
  );
});

/** A row of an envelope stands for all of its points up to the next row. */
function withExtremes({ band }: ChartData, row: CursorValues, until: number): CursorValues {
  if (band?.extremes !== true) return row;
  const inside = band.points.filter(({ x }) => x >= row.x && x < until);
  if (inside.length === 0) return row;
  return {
    ...row,
    low: Math.min(...inside.map((point) => point.low)),
    high: Math.max(...inside.map((point) => point.high)),
  };
}

/** Nothing is said of what lies beyond a wall. */
function upToWall(data: ChartData): ChartData {
  if (data.wall === undefined) return data;
  return { ...data, x: { ...data.x, max: Math.min(data.x.max, data.wall.from) } };
}

function readingColumns(
  data: ChartData,
  words: ChartWords,
): Column<ChartReading & { readonly key: string }>[] {
  const write = (value: number, decimals: number): string =>
    formatFigure(value, { digits: { decimals }, rounding: 'nearest' });
  return [
    { key: 'number', head: words.number, cell: (row) => row.number ?? '' },
    { key: 'x', head: data.x.unit, cell: (row) => write(row.x, data.x.decimals ?? 2) },
    { key: 'y', head: data.y.unit, cell: (row) => write(row.y, data.y.decimals ?? 1) },
  ];
}
