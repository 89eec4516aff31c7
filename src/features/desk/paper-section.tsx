import { Table, type Column } from '../../components/table';
import { useDeskQuery } from '../../data/desk/use-desk-query';
import { rigReportSchema, type RigReportAnswer } from '../../domain/report/desk-shapes';
import { Fetched } from './fetched';

type Row = RigReportAnswer['rows'][number];

/** The rig as the server puts it on paper, with the place in the Book that it was taken from. */
export function PaperSection({ rig }: { readonly rig: string }) {
  const answer = useDeskQuery(`/api/desk/rigs/${rig}/report`, rigReportSchema);
  const report = answer.data;
  return (
    <section className="desk-section" aria-label="On paper">
      <h3>On paper</h3>
      <Fetched answer={answer} quiet />
      {report === undefined ? null : (
        <>
          <p>{gapWords(report)}</p>
          <Table
            caption={`Figures of revision ${report.revision.number}, computed by the server`}
            columns={COLUMNS}
            rows={report.rows}
            rowKey={(row) => row.key}
            foot={`The Book at revision ${String(report.book.revision)}, ${report.book.hash.slice(0, 12)}. Holdoff measures nothing and is no interlock.`}
          />
        </>
      )}
    </section>
  );
}

const COLUMNS: readonly Column<Row>[] = [
  { key: 'label', head: 'figure', align: 'start', cell: (row) => row.label },
  {
    key: 'value',
    head: 'value',
    cell: (row) => (row.value === null ? '\u2013' : `${row.value}\u2009${row.unit}`.trimEnd()),
  },
  { key: 'band', head: 'between', cell: (row) => row.band ?? '' },
  {
    key: 'words',
    head: 'taken at, and to read with it',
    align: 'start',
    cell: (row) => row.refusal ?? row.words,
  },
];

function gapWords({ gap }: RigReportAnswer): string {
  if (gap.refusal !== null) return gap.refusal;
  return `At ${gap.at_bar_g.toFixed(2)}\u00a0bar(g) nothing fires below ${gap.low ?? ''}\u00a0kV, the law says ${gap.law ?? ''}\u00a0kV, and the gap may hold up to ${gap.high ?? ''}\u00a0kV.`;
}
