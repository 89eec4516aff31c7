import { Table, type Column } from '../../components/table';
import { usePeople } from '../../data/use-book';
import { ARC_WORDS, turnWords } from '../../domain/report/kit-words';
import { momentWords } from '../../domain/report/time-words';
import { formatFigure } from '../../domain/units/format-quantity';
import type { HistoryLine } from './alignment-history';

const SHOWN = 10;

/** What was measured, turned and seen, the newest on top. */
export function HistoryTable({
  lines,
  zone,
}: {
  readonly lines: readonly HistoryLine[];
  readonly zone: string;
}) {
  const names = new Map(usePeople().map((person) => [person.id, person.name]));
  const columns: readonly Column<HistoryLine>[] = [
    {
      key: 'when',
      head: 'when',
      align: 'start',
      cell: ({ doc }) => <span className="nowrap">{momentWords(doc.logged.stamp.wall_ms, zone)}</span>,
    },
    {
      key: 'what',
      head: 'what',
      align: 'start',
      cell: (line) => <span className="align-what">{whatWords(line)}</span>,
    },
    { key: 'a', head: 'A mm', cell: (line) => gapOf(line, 'gap_a_mm') },
    { key: 'b', head: 'B mm', cell: (line) => gapOf(line, 'gap_b_mm') },
    {
      key: 'by',
      head: 'by',
      align: 'start',
      cell: ({ doc }) => <span className="nowrap">{names.get(doc.logged.by ?? '') ?? 'not said'}</span>,
    },
  ];
  if (lines.length === 0) return <p className="muted">Nothing has been measured on this rig yet.</p>;
  return (
    <Table
      caption="Alignment so far"
      columns={columns}
      rows={lines.slice(-SHOWN).toReversed()}
      rowKey={({ doc }) => doc.id}
      {...(lines.length > SHOWN ? { foot: `the newest ${SHOWN} of ${lines.length}` } : {})}
    />
  );
}

function whatWords({ doc, values, corrected }: HistoryLine): string {
  if (values === null) return doc.struck === null ? 'two corrections stand against each other' : 'struck';
  const mark = corrected ? ', corrected' : doc.irregular === null ? '' : ', irregular';
  switch (values.kind) {
    case 'alignment.measured':
      return `measured${mark}`;
    case 'alignment.adjusted':
      return `${values.body.turns.map(turnWords).join('; ')}; predicted${mark}`;
    case 'alignment.arc-seen':
      return `${ARC_WORDS[values.body.where]}${values.body.shots === null ? '' : `, ${values.body.shots} shots`}${mark}`;
  }
}

function gapOf({ values }: HistoryLine, end: 'gap_a_mm' | 'gap_b_mm') {
  if (values === null) return '';
  if (values.kind === 'alignment.measured') return two(values.body[end]);
  if (values.kind === 'alignment.adjusted' && values.body.predicted !== null)
    return <span className="muted">{two(values.body.predicted[end])}</span>;
  return '';
}

function two(value_mm: number): string {
  return formatFigure(value_mm, { digits: { decimals: 2 }, rounding: 'nearest' });
}
