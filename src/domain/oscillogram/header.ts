import { cellsOf, isFigure, type Layout } from './layout';

export interface ColumnHead {
  readonly name: string;
  readonly unit: string;
}

/** Names and units of the columns with figures, from the lines over the table. */
export function headerOf(lines: readonly string[], layout: Layout): readonly ColumnHead[] {
  const above = lines
    .slice(0, layout.firstLine - 1)
    .map((line) => cellsOf(line, layout.separator))
    .filter((cells) => layout.columns.some((column) => isWord(cells[column], layout)))
    // A line about the file ("Model,X") is narrower than the table; one with a key beside the table is as wide.
    .filter((cells) => cells.length > (layout.columns.at(-1) ?? 0) || layout.columns.length === 1);
  const lastTwo = above.slice(-2);
  const unitLine = lastTwo.find(
    (cells, i) => i > 0 && layout.columns.every((column) => unitOf(cells[column] ?? '') !== ''),
  );
  const nameLine = unitLine === undefined ? lastTwo.at(-1) : lastTwo[0];
  return layout.columns.map((column, i) => {
    const cell = nameLine?.[column] ?? '';
    const { name, unit } = splitUnit(cell);
    const below = unitLine === undefined ? '' : unitOf(unitLine[column] ?? '');
    return { name: name === '' ? `Column ${String(i + 1)}` : name, unit: below === '' ? unit : below };
  });
}

function isWord(cell: string | undefined, { decimal }: Layout): boolean {
  return cell !== undefined && cell !== '' && !isFigure(cell, decimal);
}

/** "CH1 (V)", "Time [us]", "Channel A in mV". */
function splitUnit(cell: string): ColumnHead {
  const bracket = /^(.*?)\s*[([]\s*([^)\]]+?)\s*[)\]]\s*$/.exec(cell);
  if (bracket !== null) {
    const unit = unitOf(bracket[2] ?? '');
    if (unit !== '') return { name: (bracket[1] ?? '').trim(), unit };
  }
  const worded = /^(.*?)\s+(?:in\s+)?(\S+)$/.exec(cell);
  const unit = unitOf(worded?.[2] ?? '');
  if (worded !== null && unit !== '' && (worded[2] ?? '').length > 1)
    return { name: (worded[1] ?? '').trim(), unit };
  const alone = unitOf(cell);
  return alone === '' ? { name: cell, unit: '' } : { name: alone === 's' ? 'Time' : '', unit: alone };
}

const UNIT_WORDS: Readonly<Record<string, string>> = {
  s: 's',
  sec: 's',
  second: 's',
  seconds: 's',
  ms: 'ms',
  us: '\u00b5s',
  '\u00b5s': '\u00b5s',
  '\u03bcs': '\u00b5s',
  ns: 'ns',
  ps: 'ps',
  v: 'V',
  volt: 'V',
  volts: 'V',
  mv: 'mV',
  kv: 'kV',
  a: 'A',
  amp: 'A',
  ampere: 'A',
  amperes: 'A',
  ma: 'mA',
  ka: 'kA',
};

/** The unit in one spelling, or empty where the word is none. */
export function unitOf(word: string): string {
  const key = word
    .replace(/^[([]|[)\]]$/g, '')
    .trim()
    .toLowerCase();
  return Object.hasOwn(UNIT_WORDS, key) ? (UNIT_WORDS[key] ?? '') : '';
}
