import { useState } from 'react';
import { Link, useNavigate, useParams } from 'react-router-dom';
import { Screen } from '../../components/frame';
import { SaysBlock } from '../../components/says-block';
import { Table, type Column } from '../../components/table';
import { ThumbDome } from '../../components/thumb-dome';
import { ThumbZone } from '../../components/thumb-zone';
import { paths } from '../../config/paths';
import { useFirings, useLab, usePeople, useRig } from '../../data/use-book';
import type { FiringDoc } from '../../domain/book/documents/firing';
import { momentWords } from '../../domain/report/time-words';
import { formatFigure } from '../../domain/units/format-quantity';
import { firingFlags, firingStateWords, nameIn } from './firing-state';
import './firings.css';

/** More at once nobody reads; the button below brings the next. */
const PAGE = 100;

/** Every firing of a rig, newest first. */
export function FiringsRoute() {
  const { rig: id = '' } = useParams();
  const rig = useRig(id);
  const firings = useFirings(id);
  const [most, setMost] = useState(PAGE);
  const navigate = useNavigate();
  const open = firings.find((firing) => firing.closed === null);
  return (
    <Screen
      thumbs={
        <ThumbZone
          label="Actions"
          main={
            open === undefined ? (
              <ThumbDome
                size="big"
                label={'Open\nfiring'}
                onComplete={() => void navigate(paths.openFiring(id))}
              />
            ) : (
              <ThumbDome
                size="big"
                label={`Go on\nwith ${open.number}`}
                onComplete={() => void navigate(paths.firing(open.id))}
              />
            )
          }
        />
      }
    >
      <div className="firing-figure">
        <h1 className="firing-title">Firings{rig === undefined ? '' : ` of ${rig.name}`}</h1>
        <Link className="firing-more" to={paths.calibration(id)}>
          Own curve, from measured self-breaks
        </Link>
        {firings.length === 0 ? (
          <SaysBlock lead="No firing yet.">
            Open one: readiness says what is missing before the first shot.
          </SaysBlock>
        ) : (
          <FiringsTable firings={firings.slice(0, most)} total={firings.length} />
        )}
        {firings.length > most ? (
          <button
            type="button"
            className="firing-more"
            onClick={() => {
              setMost(most + PAGE);
            }}
          >
            Show {Math.min(PAGE, firings.length - most)} more
          </button>
        ) : null}
      </div>
    </Screen>
  );
}

interface FiringsTableProps {
  readonly firings: readonly FiringDoc[];
  readonly total: number;
}

function FiringsTable({ firings, total }: FiringsTableProps) {
  const nameOf = nameIn(usePeople());
  const zone = useLab()?.settings.zone ?? 'Etc/UTC';
  const columns: Column<FiringDoc>[] = [
    {
      key: 'number',
      head: 'Firing',
      align: 'start',
      cell: (row) => (
        <Link className="reading-open" to={paths.firing(row.id)}>
          {row.number}
        </Link>
      ),
    },
    {
      key: 'opened',
      head: 'opened',
      align: 'start',
      cell: (row) => <span className="nowrap">{momentWords(row.opened.stamp.wall_ms, zone)}</span>,
    },
    { key: 'by', head: 'by', align: 'start', cell: (row) => nameOf(row.opened.by) },
    {
      key: 'shots',
      head: 'shots',
      cell: (row) => formatFigure(row.shots, { digits: { decimals: 0 }, rounding: 'nearest' }),
    },
    {
      key: 'state',
      head: 'state',
      align: 'start',
      cell: (row) => [firingStateWords(row, nameOf), ...firingFlags(row)].join(', '),
    },
  ];
  return (
    <Table
      caption="Firings, newest first"
      columns={columns}
      rows={firings}
      rowKey={(row) => row.id}
      foot={`${firings.length} of ${total}`}
    />
  );
}
