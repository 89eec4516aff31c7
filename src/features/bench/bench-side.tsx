import { Link } from 'react-router-dom';
import { Reading } from '../../components/reading';
import { paths } from '../../config/paths';
import { useFiring, usePending, usePerson, useReadings } from '../../data/use-book';
import { useHandover } from '../../data/use-handover';
import { useNow } from '../../data/use-now';
import { standingReading } from '../../domain/book/documents/reading';
import type { RigDoc } from '../../domain/book/documents/rig';
import { agoWords, dayWords } from '../../domain/report/time-words';
import { LOOK_WORDS } from '../../domain/report/words';
import type { DeclaredView } from '../../domain/rules/declared-view';
import { formatFigure } from '../../domain/units/format-quantity';
import { useDueNext } from './use-due-next';

interface Props {
  readonly rig: RigDoc;
  readonly view: DeclaredView;
  readonly zone: string;
}

/** What is due, what was last, what waits, and the way to the rooms behind the bench. */
export function BenchSide({ rig, view, zone }: Props) {
  const due = useDueNext(rig, view);
  return (
    <section className="bench-side" aria-label="Due next and last">
      <div>
        <p className="muted">Due next</p>
        <p>
          <b>{due.title}</b>
        </p>
        <p className="muted">{due.why}</p>
      </div>
      {rig.last_firing === null ? null : <LastFiring id={rig.last_firing} zone={zone} />}
      <HandoverLine />
      <nav className="bench-rooms" aria-label="Behind the bench">
        <Link to={paths.desk()}>Desk</Link>
        <Link to={paths.crew()}>Crew</Link>
        <Link to={paths.settings()}>Settings</Link>
        <Link to={paths.signIn()}>Person</Link>
      </nav>
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
        unit="shots"
      />
      <p>
        {by?.name}
        {now?.type === 'stands' ? `, ${LOOK_WORDS[now.values.looked]}` : ''}
      </p>
      {now?.type === 'stands' ? (
        <p className="nowrap">
          {formatFigure(now.values.voltage_kV, { digits: { decimals: 1 }, rounding: 'nearest' })} kV
          {now.values.output_uJ === null
            ? ''
            : `, ${formatFigure(now.values.output_uJ, { digits: { significant: 3 }, rounding: 'nearest' })} µJ`}
        </p>
      ) : null}
    </Link>
  );
}

function HandoverLine() {
  const { last_exchange_ms, state, words } = useHandover();
  const pending = usePending();
  const { stamp } = useNow(10_000);
  const title =
    last_exchange_ms === null
      ? 'Handover, not yet'
      : `Handover, ${agoWords(Math.max(0, stamp.wall_ms - last_exchange_ms))}`;
  return (
    <Link to={paths.handover()}>
      <p className="muted">{title}</p>
      <p>{pending.count > 0 ? pending.words : 'nothing waits here'}</p>
      {state === 'sign-in-to-send' || state === 'revoked' || state === 'trouble' ? <p>{words}</p> : null}
    </Link>
  );
}
