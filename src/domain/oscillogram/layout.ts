import { refused, ok, type Result } from '../units/result';

/** How the figures of a file stand in its lines. */
export interface Layout {
  readonly separator: Separator;
  readonly decimal: '.' | ',';
  /** Lines before the first one with figures, counted from 1: its number. */
  readonly firstLine: number;
  /** Columns that hold figures, counted from 0 over all columns of the line. */
  readonly columns: readonly number[];
}
/** `space`: any run of blanks counts as one. */
export type Separator = ',' | ';' | '\t' | '|' | 'space';

const SEPARATORS: readonly Separator[] = ['\t', ';', '|', ',', 'space'];
const FIGURE = {
  '.': /^[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d+)?$/i,
  ',': /^[+-]?(\d+,?\d*|,\d+)(e[+-]?\d+)?$/i,
} as const;
/** Two lines with figures are a table already. */
const LEAST_LINES = 2;
/** Headers of a few dozen lines are known; beyond this the file is something else. */
const MOST_HEADER = 400;

/** Cells of one line, blanks and quotation marks taken off. */
export function cellsOf(line: string, separator: Separator): readonly string[] {
  const plain = line.replace(/\r$/, '');
  const cells = separator === 'space' ? plain.trim().split(/\s+/) : plain.split(separator);
  return cells.map((cell) =>
    cell
      .trim()
      .replace(/^"(.*)"$/, '$1')
      .trim(),
  );
}

export function isFigure(cell: string, decimal: '.' | ','): boolean {
  return FIGURE[decimal].test(cell.replace(/^\u2212/, '-'));
}

/**
 * Finds separator, decimal sign, header and columns from the first lines of a file, by trying every pair on the lines
 * furthest from the header and keeping the one that reads most of them as the most columns. The decimal comma is tried
 * only where the comma does not separate. Refused in words where no two lines read as a table.
 */
export function findLayout(lines: readonly string[]): Result<Layout> {
  const filled = lines.flatMap((line, index) => (line.trim() === '' ? [] : [index]));
  const sample = filled.slice(-Math.max(LEAST_LINES, Math.min(60, Math.ceil(filled.length / 8))));
  let best: { readonly score: number; readonly layout: Layout } | null = null;
  for (const separator of SEPARATORS) {
    for (const decimal of ['.', ','] as const) {
      if (separator === decimal) continue;
      const tried = tryLayout({ lines, sample }, { separator, decimal });
      if (tried !== null && (best === null || tried.score > best.score)) best = tried;
    }
  }
  return best === null ? refused(NO_TABLE) : ok(best.layout);
}

const NO_TABLE = {
  type: 'no-table',
  field: 'file',
  words:
    'No table of figures was found in this file. It takes the text table (CSV) that an oscilloscope writes: lines with a time and one or more voltages.',
} as const;

function tryLayout(
  of: { readonly lines: readonly string[]; readonly sample: readonly number[] },
  by: { readonly separator: Separator; readonly decimal: '.' | ',' },
) {
  const rows = of.sample.map((index) => cellsOf(of.lines[index] ?? '', by.separator));
  const width = Math.max(0, ...rows.map((row) => row.length));
  const columns = Array.from({ length: width }, (_, i) => i).filter(
    (column) =>
      rows.filter((row) => isFigure(row[column] ?? '', by.decimal)).length >=
      Math.max(LEAST_LINES, rows.length * 0.8),
  );
  if (columns.length === 0) return null;
  const full = (line: string) => {
    const cells = cellsOf(line, by.separator);
    return columns.every((column) => isFigure(cells[column] ?? '', by.decimal));
  };
  const first = firstOfTable(of.lines, full);
  if (first === null || first > MOST_HEADER) return null;
  const whole = rows.filter((row) =>
    columns.every((column) => isFigure(row[column] ?? '', by.decimal)),
  ).length;
  const strangers = rows.filter((row) => row.some((cell, i) => cell !== '' && !columns.includes(i))).length;
  // A single column of decimal commas also reads as two columns of whole numbers; a comma between them is then likelier.
  const score = whole * columns.length - strangers * 0.5;
  return { score, layout: { ...by, firstLine: first + 1, columns } };
}

/** The first line from which figures go on: a line of figures inside a header does not start the table. */
function firstOfTable(lines: readonly string[], full: (line: string) => boolean): number | null {
  for (let i = 0; i < lines.length; i++) {
    if (!full(lines[i] ?? '')) continue;
    const next = lines.slice(i + 1).find((line) => line.trim() !== '');
    if (next === undefined || full(next)) return i;
  }
  return null;
}
