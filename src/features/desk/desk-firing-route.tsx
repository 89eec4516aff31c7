import { useMemo, useState } from 'react';
import { useParams } from 'react-router-dom';
import { Caution } from '../../components/caution';
import { useLab } from '../../data/use-book';
import { standingReview } from '../../domain/book/documents/firing';
import { revisionById } from '../../domain/book/documents/rig';
import { firingAnswerSchema, type FiringAnswer } from '../../domain/report/desk-shapes';
import { firingRows, firingTotals } from '../../domain/report/firing-rows';
import { dayWords, momentWords } from '../../domain/report/time-words';
import { DeskScreen } from './desk-screen';
import { Fetched } from './fetched';
import { FiringActions } from './firing-actions';
import { FiringEntries } from './firing-entries';
import { FiringFigures } from './firing-figures';
import { FiringPlots } from './firing-plots';
import { ReadingsTable } from './readings-table';
import { revisionWords, spanWords, standingWords } from './firing-words';
import { useDeskQuery } from '../../data/desk/use-desk-query';

/** One firing, opened at full width below what waits. */
export function DeskFiringRoute() {
  const { firing = '' } = useParams();
  return (
    <DeskScreen chosen={firing}>
      <OpenedFiring key={firing} id={firing} />
    </DeskScreen>
  );
}

function OpenedFiring({ id }: { readonly id: string }) {
  const answer = useDeskQuery(`/api/desk/firings/${id}`, firingAnswerSchema);
  const zone = useLab()?.settings.zone ?? 'Etc/UTC';
  return (
    <>
      <Fetched answer={answer} quiet />
      {answer.data === undefined ? null : (
        <FiringReport answer={answer.data} zone={zone} refetch={answer.refetch} />
      )}
    </>
  );
}

interface ReportProps {
  readonly answer: FiringAnswer;
  readonly zone: string;
  readonly refetch: () => void;
}

function FiringReport({ answer, zone, refetch }: ReportProps) {
  const { firing, rig, readings, people, book } = answer;
  const spec = revisionById(rig, firing.rig_revision)?.spec;
  const rows = useMemo(() => (spec === undefined ? [] : firingRows(readings, spec)), [readings, spec]);
  const [counted, setCounted] = useState<readonly string[]>([]);
  // A reading that does not fit stays out of the calibration unless the reviewer says that it counts.
  const left_out = rows
    .filter((row) => !row.fits && !counted.includes(row.reading.id))
    .map((row) => row.reading.id);
  const by = firing.opened.by === null ? 'author open' : (people[firing.opened.by] ?? 'somebody');
  return (
    <article className="desk-firing">
      <header className="desk-title">
        <div>
          <h2>
            {rig.name}, firing of {dayWords(firing.opened.stamp.wall_ms, zone)}
          </h2>
          <p className="muted">
            {firing.number}, {by}, {spanWords(firing, zone)}, {revisionWords(answer)}, {standingWords(answer)}
          </p>
        </div>
        <FiringActions answer={answer} left_out={left_out} onLogged={refetch} />
      </header>
      <Reviews answer={answer} zone={zone} />
      {spec === undefined ? (
        <Caution>
          The rig revision that it was fired on is not in the Book, so nothing can be compared.
        </Caution>
      ) : (
        <div className="desk-plots">
          <FiringPlots rows={rows} spec={spec} />
          <FiringFigures firing={firing} totals={firingTotals(rows)} />
        </div>
      )}
      <ReadingsTable
        answer={answer}
        rows={rows}
        zone={zone}
        left_out={left_out}
        onCount={(id) =>
          setCounted((now) => (now.includes(id) ? now.filter((one) => one !== id) : [...now, id]))
        }
      />
      <FiringEntries answer={answer} zone={zone} />
      <p className="muted">
        Book at revision {book.revision}, hash <span className="desk-hash">{book.hash}</span>
      </p>
    </article>
  );
}

function Reviews({ answer, zone }: { readonly answer: FiringAnswer; readonly zone: string }) {
  const review = standingReview(answer.firing);
  if (review === null) return null;
  const by = review.by === null ? 'somebody' : (answer.people[review.by] ?? 'somebody');
  const said = review.verdict === 'reviewed' ? 'Reviewed' : 'Sent back';
  return (
    <p>
      <b>
        {said} by {by}
      </b>
      , {momentWords(review.stamp.wall_ms, zone)}
      {review.at === null ? '' : `, revision ${review.at}`}. {review.words}
    </p>
  );
}
