import { useMemo } from 'react';
import { useNavigate, useParams } from 'react-router-dom';
import { Chart } from '../../components/chart/chart';
import { Choice } from '../../components/choice';
import { Screen } from '../../components/frame';
import { SaysBlock } from '../../components/says-block';
import { Table, type Column } from '../../components/table';
import { ThumbDome } from '../../components/thumb-dome';
import { ThumbZone } from '../../components/thumb-zone';
import { paths } from '../../config/paths';
import { useFirings } from '../../data/use-book';
import { comparedRows, sharesOfExpected, type ComparedRow } from './compare';
import { FIRING_CHART_WORDS } from './firing-chart';
import { outputOverShots } from './firing-summary';
import { overShotsChart } from './firing-summary-view';
import { useFiringFacts, type FiringFacts } from './use-firing-facts';
import './firings.css';

/** More to choose from nobody looks through beside a rig. */
const MOST_OTHERS = 8;

/** Two firings of a rig side by side: their figures, their self-breaks against the law, their output. */
export function CompareRoute() {
  const { a = '', b = '' } = useParams();
  const first = useFiringFacts(a);
  const second = useFiringFacts(b);
  const navigate = useNavigate();
  return (
    <Screen
      thumbs={
        <ThumbZone
          label="Actions"
          main={
            <ThumbDome
              size="big"
              label={'Back\nto firing'}
              onComplete={() => void navigate(paths.firing(a))}
            />
          }
        />
      }
    >
      <div className="firing-figure">
        {first === undefined || second === undefined ? (
          <SaysBlock lead="One of the two is not in the tablet’s Book.">
            The Book may still be filling.
          </SaysBlock>
        ) : (
          <Compared first={first} second={second} />
        )}
      </div>
    </Screen>
  );
}

interface ComparedProps {
  readonly first: FiringFacts;
  readonly second: FiringFacts;
}

function Compared({ first, second }: ComparedProps) {
  const navigate = useNavigate();
  const others = useFirings(first.rig.id).filter((one) => one.id !== first.firing.id);
  const labels = [first.firing.number, second.firing.number];
  const columns: readonly Column<ComparedRow>[] = [
    { key: 'label', head: 'figure', align: 'start', cell: (row) => row.label },
    { key: 'a', head: first.firing.number, cell: (row) => row.a },
    { key: 'b', head: second.firing.number, cell: (row) => row.b },
  ];
  const breaks = useMemo(
    () =>
      overShotsChart(
        [
          sharesOfExpected(first.revision.spec, first.rows),
          sharesOfExpected(second.revision.spec, second.rows),
        ],
        '%',
        [first.firing.number, second.firing.number],
      ),
    [first, second],
  );
  const output = useMemo(
    () =>
      overShotsChart([outputOverShots(first.rows), outputOverShots(second.rows)], 'µJ', [
        first.firing.number,
        second.firing.number,
      ]),
    [first, second],
  );
  return (
    <>
      <h1 className="firing-title">{labels.join(' beside ')}</h1>
      <Choice
        label={`Beside ${first.firing.number}`}
        options={others.slice(0, MOST_OTHERS).map((one) => ({ value: one.id, label: one.number }))}
        value={second.firing.id}
        onChange={(other) => void navigate(paths.compareFirings(first.firing.id, other), { replace: true })}
      />
      <Table
        caption={labels.join(' beside ')}
        columns={columns}
        rows={comparedRows(first, second)}
        rowKey={(row) => row.key}
      />
      {breaks === null ? null : (
        <>
          <p className="muted">Self-breaks, percent above the law at their own setting</p>
          <div className="firing-chart calibration-chart">
            <Chart title="Self-breaks against the law over shots" data={breaks} words={FIRING_CHART_WORDS} />
          </div>
        </>
      )}
      {output === null ? null : (
        <>
          <p className="muted">Output by meter</p>
          <div className="firing-chart calibration-chart">
            <Chart title="Output by meter over shots" data={output} words={FIRING_CHART_WORDS} />
          </div>
        </>
      )}
    </>
  );
}
