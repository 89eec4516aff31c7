import { useMemo } from 'react';
import { Link, useNavigate, useParams } from 'react-router-dom';
import { Caution } from '../../components/caution';
import { Chart } from '../../components/chart/chart';
import type { ChartWords } from '../../components/chart/types';
import { FieldRow } from '../../components/field-row';
import { Screen } from '../../components/frame';
import { SaysBlock } from '../../components/says-block';
import { ThumbDome } from '../../components/thumb-dome';
import { ThumbZone } from '../../components/thumb-zone';
import { paths } from '../../config/paths';
import { useRig } from '../../data/use-book';
import { latestRevision, type RigDoc } from '../../domain/book/documents/rig';
import type { RigCalibration } from '../../domain/rules/rig-calibration';
import { calibrationChart, fitFigures, leftOutWords, residualChart } from './calibration-view';
import { FIRING_CHART_WORDS } from './firing-chart';
import { useRigCalibration } from '../../data/use-rig-calibration';
import './firings.css';

const RESIDUAL_WORDS: ChartWords = { ...FIRING_CHART_WORDS, law: 'own curve' };

/** A rig's own self-break curve: from which readings, how sure, what did not fit, and whether it moves. */
export function CalibrationRoute() {
  const { rig: id = '' } = useParams();
  const rig = useRig(id);
  const navigate = useNavigate();
  return (
    <Screen
      thumbs={
        <ThumbZone
          label="Actions"
          main={
            <ThumbDome
              size="big"
              label={'All\nfirings'}
              onComplete={() => void navigate(paths.firings(id))}
            />
          }
        />
      }
    >
      <div className="firing-figure">
        {rig === undefined ? (
          <SaysBlock lead="This rig is not in the tablet’s Book.">The Book may still be filling.</SaysBlock>
        ) : (
          <Calibration rig={rig} />
        )}
      </div>
    </Screen>
  );
}

function Calibration({ rig }: { readonly rig: RigDoc }) {
  const calibration = useRigCalibration(rig);
  return (
    <>
      <h1 className="firing-title">Own curve of {rig.name}</h1>
      {calibration === undefined ? (
        <SaysBlock muted>The readings of this rig are being fetched.</SaysBlock>
      ) : calibration.ok ? (
        <Fitted rig={rig} calibration={calibration.value} />
      ) : (
        <SaysBlock lead="No curve of its own yet.">
          {calibration.refusal.words} Until then every reading is held against the law.
        </SaysBlock>
      )}
    </>
  );
}

interface FittedProps {
  readonly rig: RigDoc;
  readonly calibration: RigCalibration;
}

function Fitted({ rig, calibration }: FittedProps) {
  const { spec } = latestRevision(rig);
  const { fit, left_out } = calibration;
  const chart = useMemo(() => calibrationChart(calibration, spec), [calibration, spec]);
  const residuals = useMemo(() => residualChart(calibration), [calibration]);
  const out = leftOutWords(left_out);
  return (
    <>
      <Caution>
        The own curve says at which voltage this gap fires. What it holds off stays with the law’s low side.
      </Caution>
      <div className="firing-fit-figures" role="group" aria-label="Fit">
        {fitFigures(calibration, spec).map(({ label, words }) => (
          <FieldRow key={label} label={label} value={<span className="firing-choice">{words}</span>} />
        ))}
      </div>
      <SaysBlock lead={fit.drift.type === 'rising' || fit.drift.type === 'falling' ? 'Drift:' : ''}>
        {fit.drift.words}
      </SaysBlock>
      {fit.type === 'scale-alone' ? (
        <SaysBlock muted>
          These readings cannot tell a wrong gap from a wrong scale: read at two gaps or more.
        </SaysBlock>
      ) : null}
      <Outliers calibration={calibration} />
      {out === '' ? null : <SaysBlock lead="Not used:">{out}.</SaysBlock>}
      {chart === null ? null : (
        <div className="firing-chart calibration-chart">
          <Chart
            title={`Self-breaks of ${rig.name}, its own curve and the law`}
            data={chart}
            words={FIRING_CHART_WORDS}
          />
        </div>
      )}
      {residuals === null ? null : (
        <div className="firing-chart calibration-chart">
          <Chart title="Residuals over shots, percent" data={residuals} words={RESIDUAL_WORDS} />
        </div>
      )}
      <p className="muted">
        {fit.model}. Intervals at 95 %. Valid for {fit.valid}.
      </p>
    </>
  );
}

function Outliers({ calibration }: { readonly calibration: RigCalibration }) {
  const { fit, points } = calibration;
  if (fit.outliers.length === 0) return <SaysBlock muted>No reading lies out of the family.</SaysBlock>;
  return (
    <ul className="calibration-outliers" aria-label="Out of the family">
      {fit.outliers.map(({ name, words }) => {
        const firing = points.find((point) => point.name === name)?.firing;
        return (
          <li key={name}>{firing === undefined ? words : <Link to={paths.firing(firing)}>{words}</Link>}</li>
        );
      })}
    </ul>
  );
}
