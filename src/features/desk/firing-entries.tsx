import { Table, type Column } from '../../components/table';
import type { FiringAnswer, FiringEntry } from '../../domain/report/desk-shapes';
import { kindWords } from '../../domain/report/entry-words';
import { momentWords } from '../../domain/report/time-words';
import { VERDICT_WORDS } from '../../domain/report/words';
import { reasonWords } from '../../domain/report/reason-words';

/** Enough of a hash to tell two apart at a glance; the whole stands in the tooltip and in exports. */
const HASH_SHOWN = 16;

/** Where each entry of the firing stands in the Book. */
export function FiringEntries({ answer, zone }: { readonly answer: FiringAnswer; readonly zone: string }) {
  const columns: readonly Column<FiringEntry>[] = [
    { key: 'rev', head: 'rev.', cell: (row) => row.revision },
    { key: 'from', head: 'tablet', cell: (row) => `${row.letter} ${row.seq}`, align: 'start' },
    { key: 'kind', head: 'entry', cell: (row) => kindWords(row.kind), align: 'start' },
    {
      key: 'verdict',
      head: 'verdict',
      align: 'start',
      cell: (row) => (
        <>
          {VERDICT_WORDS[row.verdict]}
          {row.reason === null ? null : <b>: {reasonWords(row.reason)}</b>}
        </>
      ),
    },
    { key: 'received', head: 'received', align: 'start', cell: (row) => momentWords(row.received_ms, zone) },
    { key: 'hash', head: 'hash of the entry', align: 'start', cell: (row) => <Hash value={row.entry_sha} /> },
    {
      key: 'chain',
      head: 'hash of the chain',
      align: 'start',
      cell: (row) => <Hash value={row.chain_hash} />,
    },
  ];
  return (
    <details className="desk-entries">
      <summary>{answer.entries.length} entries with revision and hash</summary>
      <div className="desk-scroll">
        <Table
          caption="Entries of this firing"
          columns={columns}
          rows={answer.entries}
          rowKey={(row) => row.id}
        />
      </div>
    </details>
  );
}

function Hash({ value }: { readonly value: string }) {
  return <span title={value}>{value.slice(0, HASH_SHOWN)}</span>;
}
