import { useState } from 'react';
import { Link } from 'react-router-dom';
import { Choice } from '../../components/choice';
import { SaysBlock } from '../../components/says-block';
import { Table, type Column } from '../../components/table';
import { paths } from '../../config/paths';
import { useBookState, usePeople } from '../../data/use-book';
import { useNow } from '../../data/use-now';
import type { CheckDoc } from '../../domain/book/documents/check';
import type { RigDoc } from '../../domain/book/documents/rig';
import { PURPOSES } from '../../domain/book/sheet-spec';
import { PURPOSE_WORDS } from '../../domain/report/words';
import { checkAge, checkWorth, filterChecks, type HistoryEnd, type HistoryFilter } from './check-history';

interface CheckHistoryProps {
  readonly rig: RigDoc;
  readonly checks: readonly CheckDoc[];
}

const PAGE = 30;
const ENDS: readonly { readonly value: HistoryEnd; readonly label: string }[] = [
  { value: 'all', label: 'ended' },
  { value: 'closed', label: 'closed' },
  { value: 'abandoned', label: 'abandoned' },
  { value: 'waived', label: 'with a step waived' },
];

/** Earlier checks: how they ended, how old they are, and what made them lapse. */
export function CheckHistory({ rig, checks }: CheckHistoryProps) {
  const { device } = useBookState();
  const { stamp } = useNow(10_000);
  const people = usePeople();
  const [most, setMost] = useState(PAGE);
  const [filter, setFilter] = useState<HistoryFilter>({ purpose: 'all', end: 'all' });
  if (checks.length === 0) return <SaysBlock muted>No check has been walked on {rig.name} yet.</SaysBlock>;
  const found = filterChecks(checks, filter);
  const purposes = PURPOSES.filter((purpose) => checks.some((check) => check.purpose === purpose));
  const columns: Column<CheckDoc>[] = [
    {
      key: 'sheet',
      head: 'Check',
      align: 'start',
      cell: (row) => (
        <Link className="check-open-row" to={paths.check(row.id)}>
          {PURPOSE_WORDS[row.purpose]}
        </Link>
      ),
    },
    {
      key: 'age',
      head: 'ended',
      align: 'start',
      cell: (row) => <span className="nowrap">{checkAge(row, stamp)}</span>,
    },
    {
      key: 'by',
      head: 'by',
      align: 'start',
      cell: (row) => people.find((one) => one.id === row.ended?.by)?.name ?? 'author open',
    },
    {
      key: 'worth',
      head: 'now',
      align: 'start',
      cell: (row) => checkWorth(row, { rig, device, now: stamp }),
    },
  ];
  return (
    <section aria-label="Earlier checks" className="check-history">
      {purposes.length < 2 ? null : (
        <Choice
          label="Show checks of"
          options={[
            { value: 'all', label: 'all' },
            ...purposes.map((value) => ({ value, label: PURPOSE_WORDS[value] })),
          ]}
          value={filter.purpose}
          onChange={(purpose) => setFilter({ ...filter, purpose })}
        />
      )}
      <Choice
        label="Show checks that were"
        options={ENDS}
        value={filter.end}
        onChange={(end) => setFilter({ ...filter, end })}
      />
      {found.length === 0 ? <SaysBlock muted>No earlier check is like that.</SaysBlock> : null}
      <Table
        caption="Earlier checks, newest first"
        columns={columns}
        rows={found.slice(0, most)}
        rowKey={(row) => row.id}
      />
      {found.length > most ? (
        <button
          type="button"
          className="check-more"
          onClick={() => {
            setMost(most + PAGE);
          }}
        >
          Show {Math.min(PAGE, found.length - most)} more
        </button>
      ) : null}
    </section>
  );
}
