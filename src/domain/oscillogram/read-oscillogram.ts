import { ok, refused, type Result } from '../units/result';
import { findLayout, type Layout } from './layout';
import { scanFigure, type Scan } from './figure-scan';
import { headerOf, type ColumnHead } from './header';
import { plainBytes, textOf } from './text-of';
import { findTime, type TimeBase } from './time-base';

/** One column of the file as it stands in it: before any probe ratio. */
export interface Channel {
  readonly name: string;
  /** As the header says; empty where it says nothing. */
  readonly unit: string;
  readonly values: Float64Array;
}

/** What an oscilloscope's text table holds. */
export interface Oscillogram {
  readonly points: number;
  readonly time: TimeBase;
  readonly channels: readonly Channel[];
  readonly layout: Layout;
  /** Lines that could not be read as figures and were left out: how many, and the first of them. */
  readonly skipped: { readonly count: number; readonly lines: readonly number[] };
  /** Figures of 1e30 and more, by which instruments mark what left the screen; their lines are left out too. */
  readonly overrange: number;
}

const HEAD_BYTES = 64 * 1024;
const MOST_BYTES = 400 * 1024 * 1024;
const OVERRANGE = 1e30;
const NAMED_LINES = 20;

/**
 * Reads an oscilloscope's table: any separator, decimal point or comma, a header of any length, several channels, columns
 * in any order. Every readable line is kept, none is averaged. Refused in words for an empty or foreign file.
 */
export function readOscillogram(file: Uint8Array): Result<Oscillogram> {
  if (file.length === 0) return refused({ type: 'empty', field: 'file', words: 'The file is empty.' });
  if (file.length > MOST_BYTES) {
    return refused({
      type: 'too-large',
      field: 'file',
      words: 'The file is larger than 400 MB. Save fewer points.',
    });
  }
  const bytes = plainBytes(file);
  const head = textOf(bytes.subarray(0, HEAD_BYTES));
  if (head.includes('\u0000')) return refused(BINARY);
  const lines = head.split('\n');
  if (bytes.length > HEAD_BYTES) lines.pop();
  const layout = findLayout(lines);
  if (!layout.ok) return layout;
  const table = readTable(bytes, layout.value);
  if (table.points < 2) {
    return refused({
      type: 'too-short',
      field: 'file',
      words: 'Fewer than two lines of this file hold figures.',
    });
  }
  const heads = headerOf(lines, layout.value);
  return ok(oscillogramOf(table, { heads, layout: layout.value, lines }));
}

const BINARY = {
  type: 'not-text',
  field: 'file',
  words: 'This is no text table. Save the trace as CSV on the oscilloscope, not in its own format.',
} as const;

interface Table {
  readonly points: number;
  readonly columns: readonly Float64Array[];
  readonly skipped: { readonly count: number; readonly lines: readonly number[] };
  readonly overrange: number;
}

function oscillogramOf(
  table: Table,
  of: { readonly heads: readonly ColumnHead[]; readonly layout: Layout; readonly lines: readonly string[] },
): Oscillogram {
  const time = findTime(table.columns, of);
  const channels = table.columns.flatMap((values, i) => {
    const { name = `Column ${String(i + 1)}`, unit = '' } = of.heads[i] ?? {};
    return time.column === i ? [] : [{ name, unit, values }];
  });
  return {
    points: table.points,
    time,
    channels,
    layout: of.layout,
    skipped: table.skipped,
    overrange: table.overrange,
  };
}

function readTable(bytes: Uint8Array, layout: Layout): Table {
  const size = countLines(bytes) - layout.firstLine + 2;
  const wanted = layout.columns;
  const columns = wanted.map(() => new Float64Array(Math.max(0, size)));
  const row = new Float64Array(wanted.length);
  const scan: Scan = { bytes, at: 0 };
  const lines: number[] = [];
  let points = 0;
  let skipped = 0;
  let overrange = 0;
  let number = 0;
  for (let from = 0; from < bytes.length;) {
    const found = bytes.indexOf(10, from);
    const end = found === -1 ? bytes.length : found;
    number++;
    if (number >= layout.firstLine) {
      const read = readRow(scan, { from, end, layout, row });
      if (read === 'figures') {
        for (let i = 0; i < row.length; i++) {
          const column = columns[i];
          if (column !== undefined) column[points] = row[i] ?? 0;
        }
        points++;
      } else if (read === 'overrange') overrange++;
      else if (read === 'unreadable') {
        skipped++;
        if (lines.length < NAMED_LINES) lines.push(number);
      }
    }
    from = end + 1;
  }
  return {
    points,
    columns: columns.map((column) => (column.length === points ? column : column.slice(0, points))),
    skipped: { count: skipped, lines },
    overrange,
  };
}

interface RowPlace {
  readonly from: number;
  readonly end: number;
  readonly layout: Layout;
  readonly row: Float64Array;
}

function readRow(
  scan: Scan,
  { from, end, layout, row }: RowPlace,
): 'figures' | 'overrange' | 'unreadable' | 'blank' {
  const { bytes } = scan;
  const separator = SEPARATOR_BYTE[layout.separator];
  const decimal = layout.decimal === '.' ? 46 : 44;
  const bySpace = layout.separator === 'space';
  let at = from;
  let cell = 0;
  let taken = 0;
  let over = false;
  let blank = true;
  for (;;) {
    while (at < end && isBlank(bytes[at] ?? 0, separator)) at++;
    if (at < end) blank = false;
    if (layout.columns[taken] === cell) {
      scan.at = at;
      const value = scanFigure(scan, end, decimal);
      if (Number.isNaN(value)) return blank ? 'blank' : 'unreadable';
      at = scan.at;
      while (at < end && isBlank(bytes[at] ?? 0, separator)) at++;
      if (!bySpace && at < end && bytes[at] !== separator) return 'unreadable';
      over ||= Math.abs(value) >= OVERRANGE;
      row[taken] = value;
      taken++;
      if (taken === layout.columns.length) return over ? 'overrange' : 'figures';
    } else if (bySpace) while (at < end && !isBlank(bytes[at] ?? 0, separator)) at++;
    if (!bySpace) {
      while (at < end && bytes[at] !== separator) at++;
      if (at === end) return blank ? 'blank' : 'unreadable';
      at++;
    } else if (at >= end) return blank ? 'blank' : 'unreadable';
    cell++;
  }
}

const SEPARATOR_BYTE: Readonly<Record<Layout['separator'], number>> = {
  ',': 44,
  ';': 59,
  '\t': 9,
  '|': 124,
  space: 32,
};

/** Blanks, carriage returns and quotation marks stand around figures; a tab that separates is none of them. */
function isBlank(byte: number, separator: number): boolean {
  return byte === 32 || byte === 13 || byte === 34 || (byte === 9 && separator !== 9);
}

function countLines(bytes: Uint8Array): number {
  let lines = 1;
  for (let at = bytes.indexOf(10); at !== -1; at = bytes.indexOf(10, at + 1)) lines++;
  return lines;
}
