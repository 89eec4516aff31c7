import { lazy, Suspense } from 'react';
import { Link } from 'react-router-dom';
import { Reading } from '../../components/reading';
import { paths } from '../../config/paths';
import { useFiring, useHeldBack, usePending, usePerson, useReadings } from '../../data/use-book';
import { useHandover } from '../../data/use-handover';
import { useNotices } from '../../data/use-notices';
import { useNow } from '../../data/use-now';
import { standingReading } from '../../domain/book/documents/reading';
import type { RigDoc } from '../../domain/book/documents/rig';
import { agoWords, dayWords } from '../../domain/report/time-words';
import type { DeclaredView } from '../../domain/rules/declared-view';
import { formatFigure } from '../../domain/units/format-quantity';
import { firingStateWords, outcomeWords } from './outcome-words';
import { useDueNext } from './use-due-next';

interface Props {
  readonly rig: RigDoc;
  readonly view: DeclaredView;
  readonly zone: string;
}

const BenchDue = lazy(() => import('./bench-due').then((m) => ({ default: m.BenchDue })));

/** What is due, what was last, and what waits. */
export function BenchSide({ rig, view, zone }: Props) {
  const due = useDueNext(rig, view);
  return (
    <section className="bench-side" aria-label="Due next and last">
      <div>
        <Link to={paths.due(rig.id)} className="bench-due-head">
          <span>Due next</span> <span>all, and why</span>
        </Link>
        <p>
          <b>{due.title}</b>
        </p>
        <p className="muted">{due.why}</p>
        <Suspense fallback={null}>
          <BenchDue rig={rig} view={view} primary={due} />
        </Suspense>
      </div>
      {rig.last_firing === null ? (
        <div>
          <p className="muted">Last firing</p>
          <p>none yet</p>
        </div>
      ) : (
        <LastFiring id={rig.last_firing} zone={zone} />
      )}
      <HandoverLine />
    </section>
  );
}

function LastFiring({ id, zone }: { readonly id: string; readonly zone: string }) {
  const firing = useFiring(id);
  const by = usePerson(firing?.opened.by ?? null);
  const { readings } = useReadings(id);
  if (firing === undefined) return null;
  const last = readings.at(-1);
  const now = last === undefined ? null : standingReading(last);
  return (
    <Link className="bench-last" to={paths.firing(id)}>
      <p className="muted">Last firing, {dayWords(firing.opened.stamp.wall_ms, zone)}</p>
      <Reading
        value={formatFigure(firing.shots, { digits: { decimals: 0 }, rounding: 'nearest' })}
        unit={firing.shots === 1 ? 'shot' : 'shots'}
      />
      <p>{outcomeWords(now?.type === 'stands' ? now.values : null)}</p>
      <p>
        {by?.name}, <span className="muted">{firingStateWords(firing)}</span>
      </p>
    </Link>
  );
}

function HandoverLine() {
  const { last_exchange_ms, state, words } = useHandover();
  const pending = usePending();
  const held = useHeldBack().filter((one) => one.mine).length;
  const { notices } = useNotices();
  const { stamp } = useNow(10_000);
  const last =
    last_exchange_ms === null
      ? 'Handover, not yet'
      : `Handed over ${agoWords(Math.max(0, stamp.wall_ms - last_exchange_ms))}`;
  return (
    <Link to={paths.handover()}>
      <p className="muted">{last}</p>
      <p>{pending.count > 0 ? pending.words : 'Nothing waits here'}</p>
      {held === 0 ? null : <b>{held} held back</b>}
      {notices.length === 0 ? null : <p>At the start of this tablet: {notices[0]}</p>}
      {state === 'sign-in-to-send' || state === 'revoked' || state === 'trouble' ? <p>{words}</p> : null}
    </Link>
  );
}
