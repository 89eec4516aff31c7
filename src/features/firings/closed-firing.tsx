import { useMemo, useState } from 'react';
import { useNavigate } from 'react-router-dom';
import { Chart } from '../../components/chart/chart';
import { Screen } from '../../components/frame';
import { SaysBlock } from '../../components/says-block';
import { ThumbDome } from '../../components/thumb-dome';
import { ThumbZone } from '../../components/thumb-zone';
import { paths } from '../../config/paths';
import { useEntryState, usePeople } from '../../data/use-book';
import { standingReview } from '../../domain/book/documents/firing';
import type { ReadingDoc } from '../../domain/book/documents/reading';
import { momentWords } from '../../domain/report/time-words';
import { CorrectDialog } from './correct-dialog';
import { FIRING_CHART_WORDS, firingChart } from './firing-chart';
import { limitWords, permitWords, ShotsTotal } from './firing-head';
import { firingFlags, firingStateWords, nameIn } from './firing-state';
import { FiringLinks } from './firing-links';
import { FitSays } from './fit-says';
import { fitOf, sigmasOf } from './reading-fit';
import { firstBase, nextBase } from './reading-form';
import { ReadingsTable } from './readings-table';
import type { FiringFacts } from './use-firing-facts';

interface ClosedFiringProps {
  readonly facts: FiringFacts;
  /** A reader looks and corrects nothing. */
  readonly mayCorrect: boolean;
}

const FIRST_ROWS = 40;

/** A firing as it stands in the Book: what was logged, what came of it, and where its entries are. */
export function ClosedFiring({ facts, mayCorrect }: ClosedFiringProps) {
  const { firing, readings, rows, revision } = facts;
  const [picked, setPicked] = useState<ReadingDoc | null>(null);
  const [most, setMost] = useState(FIRST_ROWS);
  const navigate = useNavigate();
  const shown = picked ?? rows.at(-1)?.reading;
  const fit = useMemo(
    () => (shown === undefined ? null : fitOf(revision.spec, rows, shown.id)),
    [revision.spec, rows, shown],
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
        <div className="firing-past">
          <div className="firing-table">
            {readings.length === 0 && !facts.loading ? (
              <SaysBlock muted>No reading was logged in this firing.</SaysBlock>
            ) : (
              <ReadingsTable
                readings={readings}
                picked={shown?.id}
                onPick={setPicked}
                withPlaces
                most={most}
              />
            )}
            {readings.length > most ? (
              <button
                type="button"
                className="firing-more"
                onClick={() => {
                  setMost(readings.length);
                }}
              >
                Show all {readings.length} readings
              </button>
            ) : null}
          </div>
          <ClosedChart facts={facts} />
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

function ClosedChart({ facts }: { readonly facts: FiringFacts }) {
  const { revision, rows, settings, firing } = facts;
  const chart = useMemo(() => {
    const last = rows.at(-1)?.values;
    const base = last === undefined ? firstBase(revision.spec, revision.number, settings) : nextBase(last);
    return firingChart({
      spec: revision.spec,
      values: base.values,
      rows,
      sigmas: sigmasOf(revision.spec, rows),
    });
  }, [revision, rows, settings]);
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
