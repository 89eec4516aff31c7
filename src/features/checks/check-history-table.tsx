import { useState } from 'react';
import { Link } from 'react-router-dom';
import { SaysBlock } from '../../components/says-block';
import { Table, type Column } from '../../components/table';
import { paths } from '../../config/paths';
import { useBookState, usePeople } from '../../data/use-book';
import { useNow } from '../../data/use-now';
import type { CheckDoc } from '../../domain/book/documents/check';
import type { RigDoc } from '../../domain/book/documents/rig';
import { PURPOSE_WORDS } from '../../domain/report/words';
import { checkAge, checkWorth } from './check-history';

interface CheckHistoryProps {
  readonly rig: RigDoc;
  readonly checks: readonly CheckDoc[];
}

const PAGE = 30;

/** Earlier checks: how they ended, how old they are, and what made them lapse. */
export function CheckHistory({ rig, checks }: CheckHistoryProps) {
  const { device } = useBookState();
  const { stamp } = useNow(10_000);
  const people = usePeople();
  const [most, setMost] = useState(PAGE);
  if (checks.length === 0) return <SaysBlock muted>No check has been walked on {rig.name} yet.</SaysBlock>;
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
    <section aria-label="Earlier checks">
      <Table
        caption="Earlier checks, newest first"
        columns={columns}
        rows={checks.slice(0, most)}
        rowKey={(row) => row.id}
      />
      {checks.length > most ? (
        <button
          type="button"
          className="check-more"
          onClick={() => {
            setMost(most + PAGE);
          }}
        >
          Show {Math.min(PAGE, checks.length - most)} more
        </button>
      ) : null}
    </section>
  );
}
