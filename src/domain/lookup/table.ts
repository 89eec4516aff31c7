import { numberAt, numberFieldOf, shownFields, valueText } from './fields';
import { bandText, figureLine } from './figure-text';
import type { Figure, Known, Lookup, LookupAnswer, NumberField, Values } from './lookup';
import { roundXs, sweepAt, type SweepAsk, type SweepRow } from './sweep';

/** Text in rows, as a screen, a clipboard and a printer take it. */
export interface TextTable {
  readonly title: string;
  readonly head: readonly string[];
  readonly rows: readonly (readonly string[])[];
}

export interface TableParts {
  readonly lookup: Lookup;
  readonly values: Values;
  readonly known: Readonly<Record<string, Known>>;
  readonly answer: LookupAnswer;
  /** What it is about, as "Kettle, revision 7". */
  readonly about: string;
}

const KNOWN_WORDS: Readonly<Record<Known, string>> = {
  rig: 'from the rig',
  lab: 'from the lab',
  assumed: 'assumed',
  'what-if': 'what if',
};

/** The whole answer as rows: what went in and where it came from, what came out with its band. */
export function answerTable({ lookup, values, known, answer, about }: TableParts): TextTable {
  const inputs = shownFields(lookup, values).map((field) => [
    field.label,
    valueText(field, values) ?? '',
    field.kind === 'number' ? field.unit : '',
    '',
    '',
    KNOWN_WORDS[known[field.key] ?? 'assumed'],
  ]);
  const figures = answer.figures.map((figure) =>
    figure.words === undefined
      ? [
          figure.label,
          figureLine(figure),
          figure.unit,
          figure.low === undefined ? '' : figureLine(figure, figure.low, 'down'),
          figure.high === undefined ? '' : figureLine(figure, figure.high, 'up'),
          'computed',
        ]
      : [figure.label, figure.words, '', '', '', 'computed'],
  );
  return {
    title: `${lookup.title}, ${about}`,
    head: ['Quantity', 'Value', 'Unit', 'Low', 'High', 'Source'],
    rows: [
      ...inputs,
      ...figures,
      ['Model', answer.model, '', '', '', ''],
      ['Valid', answer.valid, '', '', '', ''],
    ],
  };
}

/** A sweep as rows: the input, then each figure with its unit in the head. Where there is no answer the cells are empty. */
export function sweepTable(
  lookup: Lookup,
  rows: readonly SweepRow[],
  of: { readonly field: string; readonly figures: readonly Figure[] },
): TextTable {
  const field = numberFieldOf(lookup, of.field);
  const decimals = field === undefined ? 2 : decimalsFor(field, rows);
  return {
    title: `${lookup.title} against ${(field?.label ?? of.field).toLowerCase()}`,
    head: [
      withUnit(field?.label ?? of.field, field?.unit ?? ''),
      ...of.figures.flatMap((figure) => {
        const head = withUnit(figure.label, figure.unit);
        return hasBand(figure, rows) ? [head, `${head}, low`, `${head}, high`] : [head];
      }),
    ],
    rows: rows.map(({ x, at }) => [
      figureLine({ value: x, digits: 6, decimals, rounding: 'nearest' }),
      ...of.figures.flatMap((figure) => {
        const there = at[figure.key] ?? null;
        const cells = there === null ? [''] : [figureLine(figure, there.value)];
        if (!hasBand(figure, rows)) return cells;
        if (there?.low === undefined || there.high === undefined) return [...cells, '', ''];
        return [...cells, figureLine(figure, there.low, 'down'), figureLine(figure, there.high, 'up')];
      }),
    ]),
  };
}

/** As many as one sheet holds in a size that is read from a step away. */
export const WALL_ROWS = 21;

/** What a bench table for the wall shows: one input in round steps against the large and main figures. */
export function wallTable(
  lookup: Lookup,
  values: Values,
  of: {
    readonly range: Pick<SweepAsk, 'field' | 'from' | 'to' | 'scale'>;
    readonly figures: readonly Figure[];
  },
): TextTable {
  const { range, figures } = of;
  const field = numberFieldOf(lookup, range.field);
  const xs = field === undefined ? [] : roundXs(field, range, WALL_ROWS);
  const rows = sweepAt(lookup, values, { field: range.field, figures: figures.map(({ key }) => key), xs });
  return sweepTable(lookup, rows, { field: range.field, figures });
}

/** The inputs that a table on the wall holds still, in one line each: "Gap 3.00 mm (from the rig)". */
export function heldStill(
  parts: Pick<TableParts, 'lookup' | 'values' | 'known'>,
  swept: string | null,
): readonly string[] {
  return shownFields(parts.lookup, parts.values).flatMap((field) => {
    const text = valueText(field, parts.values);
    if (field.key === swept || text === null) return [];
    const unit = field.kind === 'number' && field.unit !== '' ? `\u2009${field.unit}` : '';
    return [`${field.label} ${text}${unit} (${KNOWN_WORDS[parts.known[field.key] ?? 'assumed']})`];
  });
}

const PLAIN_NUMBER = /^-?\d+(\.\d+)?(e-?\d+)?$/;
const STARTS_FORMULA = /^[=+\-@\t\r]/;

/**
 * A table for the clipboard: tabs between cells, a line a row. Numbers are plain, so that a spreadsheet reads them; any other text
 * that it could take for a formula gets an apostrophe in front.
 */
export function tabText({ title, head, rows }: TextTable): string {
  return [[title], head, ...rows].map((cells) => cells.map(cellText).join('\t')).join('\n');
}

function cellText(text: string): string {
  const flat = text.replace(/[\t\r\n]+/g, ' ');
  const plain = flat.replaceAll('\u2212', '-').replaceAll(/(?<=\d),(?=\d{3})/g, '');
  if (PLAIN_NUMBER.test(plain)) return plain;
  return STARTS_FORMULA.test(text) || STARTS_FORMULA.test(flat.trimStart()) ? `'${flat}` : flat;
}

function withUnit(label: string, unit: string): string {
  return unit === '' ? label : `${label}, ${unit}`;
}

function hasBand(figure: Figure, rows: readonly SweepRow[]): boolean {
  return bandText(figure) !== null || rows.some(({ at }) => at[figure.key]?.low !== undefined);
}

function decimalsFor(field: NumberField, rows: readonly SweepRow[]): number {
  const steps = rows.slice(1).map(({ x }, i) => Math.abs(x - (rows[i]?.x ?? x)));
  const least = Math.min(...steps.filter((step) => step > 0), field.slide.to);
  if (!Number.isFinite(least) || least <= 0) return field.decimals;
  return Math.max(field.whole === true ? 0 : field.decimals, Math.min(6, Math.ceil(-Math.log10(least))));
}

/** The input that a sweep or a wall table offers first: the one that is chosen, else the first number that has a value. */
export function sweptField(lookup: Lookup, values: Values, active: string): NumberField | undefined {
  const numbers = shownFields(lookup, values).filter((field) => field.kind === 'number');
  return (
    numbers.find((field) => field.key === active) ??
    numbers.find((field) => numberAt(values, field.key) !== null) ??
    numbers[0]
  );
}
