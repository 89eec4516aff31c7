import { useMemo, useState } from 'react';
import { Link, useNavigate } from 'react-router-dom';
import { Chart } from '../../components/chart/chart';
import { Screen } from '../../components/frame';
import { SaysBlock } from '../../components/says-block';
import { ThumbDome } from '../../components/thumb-dome';
import { ThumbZone } from '../../components/thumb-zone';
import { paths } from '../../config/paths';
import { useEntryState, useFirings, usePeople } from '../../data/use-book';
import { standingReview } from '../../domain/book/documents/firing';
import type { ReadingDoc } from '../../domain/book/documents/reading';
import type { RigCalibration } from '../../domain/rules/rig-calibration';
import { momentWords } from '../../domain/report/time-words';
import { CorrectDialog } from './correct-dialog';
import { FIRING_CHART_WORDS, firingChart } from './firing-chart';
import { limitWords, permitWords, ShotsTotal } from './firing-head';
import { firingFlags, firingStateWords, nameIn } from './firing-state';
import { FiringSummary } from './firing-summary-view';
import { FiringLinks } from './firing-links';
import { FitSays } from './fit-says';
import { fitOf, sigmasOf } from './reading-fit';
import { firstBase, nextBase } from './reading-form';
import { ReadingsTable } from './readings-table';
import { useCalibrationBefore } from '../../data/use-rig-calibration';
import type { FiringFacts } from './use-firing-facts';

interface ClosedFiringProps {
  readonly facts: FiringFacts;
  /** A reader looks and corrects nothing. */
  readonly mayCorrect: boolean;
}

/** A firing as it stands in the Book: what was logged, what came of it, and where its entries are. */
export function ClosedFiring({ facts, mayCorrect }: ClosedFiringProps) {
  const { firing, readings, rows, revision } = facts;
  const [picked, setPicked] = useState<ReadingDoc | null>(null);
  const navigate = useNavigate();
  const shown = picked ?? rows.at(-1)?.reading;
  const own = useCalibrationBefore(facts.rig, firing);
  const fit = useMemo(
    () => (shown === undefined ? null : fitOf({ spec: revision.spec, own }, rows, shown.id)),
    [revision.spec, own, rows, shown],
  );
  return (
    <Screen
      thumbs={
        <ThumbZone
          label="Actions"
          main={
            <ThumbDome
              size="big"
              label={'All\nfirings'}
              onComplete={() => void navigate(paths.firings(firing.parent))}
            />
          }
        />
      }
    >
      <div className="firing-figure">
        <ClosedHead facts={facts} />
        {shown === undefined || fit === null ? null : <FitSays no={shown.no} fit={fit} />}
        <FiringSummary facts={facts} />
        <CompareLink facts={facts} />
        <div className="firing-past">
          {readings.length === 0 && !facts.loading ? (
            <SaysBlock muted>No reading was logged in this firing.</SaysBlock>
          ) : (
            <ReadingsTable readings={readings} picked={shown?.id} onPick={setPicked} withPlaces />
          )}
          <ClosedChart facts={facts} own={own} />
        </div>
      </div>
      {picked === null || !mayCorrect ? null : (
        <CorrectDialog
          facts={facts}
          reading={picked}
          onClose={() => {
            setPicked(null);
          }}
        />
      )}
    </Screen>
  );
}

/** To the firing before it on the same rig, or the one after the first. */
function CompareLink({ facts }: { readonly facts: FiringFacts }) {
  const { firing } = facts;
  const firings = useFirings(firing.parent);
  const at = firings.findIndex((one) => one.id === firing.id);
  const other = firings[at + 1] ?? firings[at - 1];
  if (at < 0 || other === undefined) return null;
  return (
    <Link className="firing-more" to={paths.compareFirings(firing.id, other.id)}>
      Compare with {other.number}
    </Link>
  );
}

function ClosedHead({ facts }: { readonly facts: FiringFacts }) {
  const { firing, zone } = facts;
  const nameOf = nameIn(usePeople());
  const opened = useEntryState(firing.opened.entry);
  const review = standingReview(firing);
  const { closed, unready } = firing;
  const until = closed === null ? 'not closed' : `closed ${momentWords(closed.stamp.wall_ms, zone)}`;
  return (
    <>
      <div className="firing-head">
        <ShotsTotal shots={firing.shots} />
        <div className="firing-head-words">
          <p>
            <b>
              Firing {firing.number}, {firingStateWords(firing, nameOf)}
            </b>
          </p>
          <p className="muted">
            {nameOf(firing.opened.by)}, {momentWords(firing.opened.stamp.wall_ms, zone)}, {until}
            {opened === undefined ? '' : `; ${opened.place}`}
          </p>
          <p className="muted">
            {permitWords(facts)}; {limitWords(facts)}
          </p>
        </div>
      </div>
      {review !== null && review.words !== '' ? (
        <SaysBlock lead={review.verdict === 'sent-back' ? 'Sent back:' : 'The reviewer:'}>
          {review.words}
        </SaysBlock>
      ) : null}
      {firingFlags(firing).length === 0 ? null : (
        <SaysBlock lead="Flagged:">{firingFlags(firing).join(', ')}.</SaysBlock>
      )}
      {unready === null ? null : (
        <>
          <SaysBlock lead="Fired unready:">{unready.why}</SaysBlock>
          <SaysBlock lead="Missing then:">{unready.missing.map((one) => one.words).join(' ')}</SaysBlock>
        </>
      )}
      <FiringLinks firing={firing.id} />
      {closed !== null && closed.summary !== '' ? (
        <SaysBlock lead="Closing words:">{closed.summary}</SaysBlock>
      ) : null}
    </>
  );
}

interface ClosedChartProps {
  readonly facts: FiringFacts;
  readonly own: RigCalibration | null;
}

function ClosedChart({ facts, own }: ClosedChartProps) {
  const { revision, rows, settings, firing } = facts;
  const chart = useMemo(() => {
    const last = rows.at(-1)?.values;
    const base = last === undefined ? firstBase(revision.spec, revision.number, settings) : nextBase(last);
    return firingChart({
      spec: revision.spec,
      values: base.values,
      rows,
      sigmas: sigmasOf({ spec: revision.spec, own }, rows),
      own,
    });
  }, [revision, rows, settings, own]);
  if (chart === null) return null;
  return (
    <div className="firing-chart">
      <Chart
        title={`Self-breaks of firing ${firing.number} against the law`}
        data={chart}
        words={FIRING_CHART_WORDS}
      />
    </div>
  );
}
