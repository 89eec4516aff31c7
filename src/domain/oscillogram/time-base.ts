import { cellsOf, isFigure, type Layout } from './layout';
import { unitOf, type ColumnHead } from './header';

/** Where the time of a point comes from. */
export interface TimeBase {
  readonly type: 'column' | 'interval' | 'none';
  /** Which of the table's columns it is; null where the header gives an interval, or nobody says. */
  readonly column: number | null;
  /** By point, in seconds from the instrument's own zero; points themselves where nobody says. */
  readonly seconds: Float64Array;
  /** Seconds for one of the column, or between two points; null where nobody says and one is assumed. */
  readonly unit_s: number | null;
  /** Said beside the plot where something had to be assumed. */
  readonly words: string;
}

const SIZE: Readonly<Record<string, number>> = { s: 1, ms: 1e-3, '\u00b5s': 1e-6, ns: 1e-9, ps: 1e-12 };

/** Time is the column that is called so, or the one that rises all the way; else the interval of the header. */
export function findTime(
  columns: readonly Float64Array[],
  {
    heads,
    lines,
    layout,
  }: { readonly heads: readonly ColumnHead[]; readonly lines: readonly string[]; readonly layout: Layout },
): TimeBase {
  const rising = columns.flatMap((values, i) => (rises(values) ? [i] : []));
  const named = rising.find((i) => isTime(heads[i]));
  const column = columns.length > 1 ? (named ?? rising[0]) : named;
  const values = column === undefined ? undefined : columns[column];
  if (column !== undefined && values !== undefined) {
    const unit = heads[column]?.unit ?? '';
    const size = SIZE[unit];
    return {
      type: 'column',
      column,
      seconds: size === 1 ? values : values.map((value) => value * (size ?? 1)),
      unit_s: size ?? null,
      words: size === undefined ? 'The file does not say the unit of its time; seconds are assumed.' : '',
    };
  }
  const count = columns[0]?.length ?? 0;
  const interval_s = intervalOf(lines, layout);
  if (interval_s !== null) {
    return {
      type: 'interval',
      column: null,
      seconds: Float64Array.from({ length: count }, (_, i) => i * interval_s),
      unit_s: interval_s,
      words: '',
    };
  }
  return {
    type: 'none',
    column: null,
    seconds: Float64Array.from({ length: count }, (_, i) => i),
    unit_s: null,
    words: 'The file has no time: enter the time between two points.',
  };
}

function isTime(head: ColumnHead | undefined): boolean {
  if (head === undefined) return false;
  return Object.hasOwn(SIZE, head.unit) || /^(time|t|x|x-axis|zeit|temps|tiempo|second)\b/i.test(head.name);
}

/** Equal neighbours are let in, since instruments round their time. */
function rises(values: Float64Array): boolean {
  const last = values.length - 1;
  if (!((values[last] ?? 0) > (values[0] ?? 0))) return false;
  for (let i = 1; i <= last; i++) if ((values[i] ?? 0) < (values[i - 1] ?? 0)) return false;
  return true;
}

function intervalOf(lines: readonly string[], layout: Layout): number | null {
  for (const line of lines.slice(0, layout.firstLine + 20)) {
    const cells = cellsOf(line, layout.separator).flatMap((cell) => cell.split(/\s*[:=]\s*/));
    const at = cells.findIndex((cell) =>
      /(sample|sampling|time|x)?[ _-]?(interval|increment|incr|period|step)/i.test(cell),
    );
    if (at === -1) continue;
    const figure = cells.slice(at + 1).find((cell) => isFigure(cell, layout.decimal));
    if (figure === undefined) continue;
    const unit = cells
      .slice(at)
      .map(unitOf)
      .find((found) => Object.hasOwn(SIZE, found));
    const value = Number(figure.replace(',', '.')) * (unit === undefined ? 1 : (SIZE[unit] ?? 1));
    if (value > 0) return value;
  }
  return null;
}
