import { Table, type Column } from '../../components/table';
import { useOwnEntries } from '../../data/use-book';
import { entryRow, type EntryRow } from './entry-row';

const SHOWN = 60;

const COLUMNS: readonly Column<EntryRow>[] = [
  { key: 'seq', head: 'No.', cell: (row) => row.seq },
  { key: 'when', head: 'logged', cell: (row) => row.when, align: 'start' },
  {
    key: 'what',
    head: 'entry',
    align: 'start',
    cell: (row) => (
      <>
        {row.kind}
        {row.substance === '' ? null : <span className="muted"> {row.substance}</span>}
        {row.reason === '' ? null : (
          <>
            <br />
            <b>{row.reason}</b>
          </>
        )}
      </>
    ),
  },
  {
    key: 'where',
    head: 'where',
    align: 'start',
    cell: (row) => (
      <>
        {row.place}
        <br />
        <span className="muted">{row.verdict}</span>
      </>
    ),
  },
];

/** This tablet's own entries, newest first: each says where it is, so that nobody has to believe a count. */
export function EntryList({ zone }: { readonly zone: string }) {
  const rows = useOwnEntries(SHOWN).map((own) => entryRow(own, zone));
  return (
    <section>
      <h2>Entries of this tablet</h2>
      {rows.length === 0 ? (
        <p className="muted">Nothing has been logged on this tablet yet.</p>
      ) : (
        <div className="handover-table">
          <Table
            caption="Entries of this tablet, newest first"
            columns={COLUMNS}
            rows={rows}
            rowKey={(row) => row.id}
            foot={rows.length === SHOWN ? `The newest ${SHOWN}` : `${rows.length} in all`}
          />
        </div>
      )}
    </section>
  );
}
