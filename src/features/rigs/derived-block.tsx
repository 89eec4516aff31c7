import { Caution } from '../../components/caution';
import { Chart } from '../../components/chart/chart';
import type { ChartWords } from '../../components/chart/types';
import { SaysBlock } from '../../components/says-block';
import type { LabSettings, RigSpec } from '../../domain/book/rig-spec';
import type { RigTransient } from '../../domain/rules/rig-circuit';
import { breakChart } from './break-chart';
import { DerivedRows } from './derived-rows';
import { derivedRows } from '../../domain/report/derived-rows';
import { GainBars } from './gain-bars';
import type { RigDerivedView } from './use-rig-derived';
import { WaitList } from './wait-list';
import { waveChart, waveWords } from './wave-chart';

const WORDS: ChartWords = {
  showTable: 'Table',
  showChart: 'Chart',
  low: 'nothing fires below, kV',
  high: 'may hold up to, kV',
  law: 'law, kV',
  own: 'own, kV',
  number: 'No.',
};

interface Props {
  readonly spec: RigSpec;
  readonly settings: LabSettings;
  readonly view: RigDerivedView;
}

/** Everything else that the numbers give: self-break over pressure, figures with what they are worth, waits. */
export function DerivedBlock({ spec, settings, view }: Props) {
  const { derived } = view;
  const curve = breakChart(spec, settings, derived);
  return (
    <>
      <section className="derived-chart" aria-label="Self-break against pressure">
        <h2>Self-break against pressure</h2>
        {curve.ok ? (
          <Chart title="Self-break against pressure" data={curve.value} words={WORDS} height_mm={52} />
        ) : (
          <SaysBlock muted>{curve.refusal.words}</SaysBlock>
        )}
        {derived.reach.ok && derived.reach.value.type !== 'reaches' ? (
          <Caution>{derived.reach.value.words}</Caution>
        ) : null}
      </section>
      <div className="rig-columns">
        <section>
          <h2>Figures</h2>
          <DerivedRows label="Derived figures" rows={derivedRows(derived)} />
        </section>
        <WaitList wait={derived.wait} />
      </div>
    </>
  );
}

/** What the stored energy can do, with the supply beside it. */
export function Hazard({ view }: { readonly view: RigDerivedView }) {
  const { hazard } = view.derived;
  return hazard.ok ? <Caution>Stored: {hazard.value.words}</Caution> : null;
}

/** The simulated wave shape; what it was simulated with stands under it. */
export function Wave({ view }: { readonly view: RigDerivedView }) {
  const { transient } = view.derived;
  return (
    <section className="derived-chart" aria-label="Simulated waveform" aria-busy={view.solving}>
      <h2>
        Simulated waveform <span className="muted">{view.solving ? 'being solved' : 'not measured'}</span>
      </h2>
      {transient.ok ? (
        <Shape transient={transient.value} />
      ) : (
        <SaysBlock muted>{transient.refusal.words}</SaysBlock>
      )}
    </section>
  );
}

function Shape({ transient }: { readonly transient: RigTransient }) {
  return (
    <>
      <p className="m-0">{waveWords(transient)}</p>
      <Chart title="Simulated waveform" data={waveChart(transient)} words={WORDS} height_mm={44} />
      <GainBars transient={transient} />
      {transient.assumed.length === 0 ? null : (
        <p className="muted m-0">Assumed: {transient.assumed.join('; ')}.</p>
      )}
      {transient.answer.warnings.map((warning) => (
        <Caution key={warning.words}>{warning.words}</Caution>
      ))}
    </>
  );
}
