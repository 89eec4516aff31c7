import { useMemo } from 'react';
import type { Column } from '../../components/table';
import { WindowedTable } from '../../components/windowed-table';
import { useEntryState } from '../../data/use-book';
import { standingReading, type ReadingDoc } from '../../domain/book/documents/reading';
import { LOOK_WORDS } from '../../domain/report/words';
import { shownQuantity } from './reading-fields';

interface ReadingsTableProps {
  readonly readings: readonly ReadingDoc[];
  /** Reading whose comparison is shown. */
  readonly picked?: string | undefined;
  readonly onPick: (reading: ReadingDoc) => void;
  /** With where each entry is: on this tablet, sent, backed up. */
  readonly withPlaces?: boolean;
}

/** Readings, newest first; a touch on one opens it for correcting or striking. */
export function ReadingsTable({ readings, picked, onPick, withPlaces = false }: ReadingsTableProps) {
  const rows = useMemo(() => readings.toReversed(), [readings]);
  const columns: Column<ReadingDoc>[] = [
    {
      key: 'no',
      head: 'No.',
      cell: (row) => (
        <button
          type="button"
          className="reading-open"
          aria-label={`Reading ${row.no}: correct or strike`}
          onClick={() => {
            onPick(row);
          }}
        >
          {row.no}
        </button>
      ),
    },
    { key: 'kV', head: 'kV', cell: (row) => quantityCell(row, 'voltage_kV') },
    { key: 'bar', head: 'bar(g)', cell: (row) => quantityCell(row, 'pressure_bar_g') },
    { key: 'shots', head: 'shots', cell: (row) => quantityCell(row, 'shots') },
    { key: 'looked', head: 'looked', align: 'start', cell: lookedCell },
  ];
  if (withPlaces)
    columns.push({
      key: 'place',
      head: 'entry',
      align: 'start',
      cell: (row) => <EntryPlace id={row.logged.entry} />,
    });
  return (
    <WindowedTable
      className="firing-table"
      caption="Readings, newest first"
      columns={columns}
      rows={rows}
      rowKey={(row) => row.id}
      {...(picked === undefined ? {} : { picked })}
    />
  );
}

function quantityCell(row: ReadingDoc, key: 'voltage_kV' | 'pressure_bar_g' | 'shots') {
  const now = standingReading(row);
  if (now.type === 'stands') return shownQuantity(now.values[key], key);
  const text = shownQuantity(row.original[key], key);
  return now.type === 'struck' ? <s className="muted">{text}</s> : text;
}

function lookedCell(row: ReadingDoc) {
  const now = standingReading(row);
  if (now.type === 'struck') return <span className="muted">struck</span>;
  if (now.type === 'parted') return <b>corrected twice, apart</b>;
  const also = [now.corrected ? 'corrected' : '', row.irregular === null ? '' : 'irregular'].filter(
    (word) => word !== '',
  );
  return [LOOK_WORDS[now.values.looked], ...also].join(', ');
}

function EntryPlace({ id }: { readonly id: string }) {
  const state = useEntryState(id);
  if (state === undefined) return null;
  const { verdict, place } = state;
  return verdict === 'held-back' || verdict === 'altered' ? (
    <b className="nowrap">{verdict === 'altered' ? 'altered' : 'held back'}</b>
  ) : (
    <span className="nowrap">{place}</span>
  );
}
