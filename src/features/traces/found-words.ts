import type { TraceSurvey } from '../../domain/oscillogram/survey';
import { formatSi } from '../../domain/units/format-si';

const SEPARATOR_WORDS = {
  ',': 'commas',
  ';': 'semicolons',
  '\t': 'tabs',
  '|': 'bars',
  space: 'blanks',
} as const;

/** What was found in a file, a sentence each: how it is written, its time, and what was left out. */
export function foundWords(survey: TraceSurvey): readonly string[] {
  const { points, layout, time, channels, skipped, overrange } = survey;
  const header = layout.firstLine - 1;
  const decimal = layout.decimal === ',' ? 'decimal commas' : 'decimal points';
  const first = `${count(points)} points in ${channels.length === 1 ? 'one channel' : `${channels.length} channels`}; separated by ${SEPARATOR_WORDS[layout.separator]}, ${decimal}, ${header === 0 ? 'no header' : `${header} header ${header === 1 ? 'line' : 'lines'}`}.`;
  return [
    first,
    timeWords(time),
    ...(time.words === '' ? [] : [time.words]),
    ...(skipped.count === 0 ? [] : [skippedWords(skipped)]),
    ...(overrange === 0
      ? []
      : [
          `${count(overrange)} ${overrange === 1 ? 'line' : 'lines'} beyond the instrument’s range left out.`,
        ]),
  ];
}

function timeWords({ type, column, unit_s, from_s, to_s }: TraceSurvey['time']): string {
  if (type === 'none') return 'No time column.';
  const span = formatSi(to_s - from_s, 's', { significant: 3, rounding: 'nearest' });
  if (type === 'interval') return `Time by the header’s interval, ${span} in all.`;
  return unit_s === null
    ? `Time in column ${String((column ?? 0) + 1)}.`
    : `Time in column ${String((column ?? 0) + 1)}, ${span} in all.`;
}

function skippedWords({ count: lines, lines: named }: TraceSurvey['skipped']): string {
  const some = named.slice(0, 5).join(', ');
  const more = lines > Math.min(5, named.length) ? ' and more' : '';
  return lines === 1
    ? `Line ${some} holds no figures and was left out.`
    : `${count(lines)} lines hold no figures and were left out: ${some}${more}.`;
}

function count(value: number): string {
  return value.toLocaleString('en-GB');
}
