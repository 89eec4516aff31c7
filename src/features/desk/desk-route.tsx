import { Link } from 'react-router-dom';
import { Table, type Column } from '../../components/table';
import { paths } from '../../config/paths';
import { useHeldBack, useLab, useRigs } from '../../data/use-book';
import { standingReview } from '../../domain/book/documents/firing';
import { firingListSchema, type FiringList } from '../../domain/report/desk-shapes';
import { momentWords } from '../../domain/report/time-words';
import { formatFigure } from '../../domain/units/format-quantity';
import { DeskScreen } from './desk-screen';
import { Fetched } from './fetched';
import { useDeskQuery } from '../../data/desk/use-desk-query';

const WHOLE = { digits: { decimals: 0 }, rounding: 'nearest' } as const;

/** What waits, and what was fired last. */
export function DeskRoute() {
  return (
    <DeskScreen>
      <DeskPlaces />
      <LastFirings />
    </DeskScreen>
  );
}

function DeskPlaces() {
  const rigs = useRigs();
  const held = useHeldBack().length;
  return (
    <nav className="desk-places" aria-label="At the Desk">
      {rigs.map((rig) => (
        <Link key={rig.id} to={paths.deskRig(rig.id)}>
          {rig.name}: permit, stand-downs
        </Link>
      ))}
      <Link to={paths.deskHeld()}>Held back{held === 0 ? '' : `, ${held}`}</Link>
      <Link to={paths.crew()}>Crew</Link>
    </nav>
  );
}

type Row = FiringList['firings'][number];

function LastFirings() {
  const answer = useDeskQuery('/api/desk/firings?limit=40', firingListSchema);
  const zone = useLab()?.settings.zone ?? 'Etc/UTC';
  const people = answer.data?.people ?? {};
  const columns: readonly Column<Row>[] = [
    {
      key: 'no',
      head: 'firing',
      align: 'start',
      cell: ({ firing }) => (
        <Link to={paths.deskFiring(firing.id)} className="underline">
          {firing.number}
        </Link>
      ),
    },
    { key: 'rig', head: 'rig', align: 'start', cell: (row) => row.rig_name },
    {
      key: 'when',
      head: 'opened',
      align: 'start',
      cell: ({ firing }) => <span className="nowrap">{momentWords(firing.opened.stamp.wall_ms, zone)}</span>,
    },
    {
      key: 'by',
      head: 'by',
      align: 'start',
      cell: ({ firing }) => (
        <span className="nowrap">
          {firing.opened.by === null ? 'author open' : (people[firing.opened.by] ?? '')}
        </span>
      ),
    },
    { key: 'readings', head: 'readings', cell: ({ firing }) => formatFigure(firing.readings, WHOLE) },
    { key: 'shots', head: 'shots', cell: ({ firing }) => formatFigure(firing.shots, WHOLE) },
    { key: 'state', head: 'state', align: 'start', cell: ({ firing }) => stateWords(firing) },
    { key: 'revision', head: 'rev.', cell: (row) => formatFigure(row.revision, WHOLE) },
    { key: 'hash', head: 'hash', align: 'start', cell: (row) => row.chain_hash.slice(0, 12) },
  ];
  return (
    <section className="desk-scroll">
      <h2>Firings</h2>
      <Fetched answer={answer} quiet />
      {answer.data === undefined ? null : (
        <Table
          caption="The last firings"
          columns={columns}
          rows={answer.data.firings}
          rowKey={(row) => row.firing.id}
          foot={`The last ${answer.data.firings.length}`}
        />
      )}
    </section>
  );
}

function stateWords(firing: Row['firing']): string {
  const review = standingReview(firing);
  const unready = firing.unready === null ? '' : ', unready';
  const irregular = firing.irregular_readings === 0 ? '' : `, ${firing.irregular_readings} irregular`;
  if (review !== null)
    return (review.verdict === 'reviewed' ? 'reviewed' : 'sent back') + unready + irregular;
  return (firing.closed === null ? 'open' : 'to review') + unready + irregular;
}
