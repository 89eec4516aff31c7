import { useMemo } from 'react';
import { Chart } from '../../components/chart/chart';
import type { ChartWords } from '../../components/chart/types';
import { SaysBlock } from '../../components/says-block';
import type { RigSpec } from '../../domain/book/rig-spec';
import type { FiringRow } from '../../domain/report/firing-rows';
import { lawChart, residualChart } from './firing-charts';

const WORDS: ChartWords = {
  showTable: 'Table',
  showChart: 'Chart',
  low: 'nothing fires below',
  high: 'may hold up to',
  law: 'law',
  own: 'own',
  number: 'No.',
};

export function FiringPlots({ rows, spec }: { readonly rows: readonly FiringRow[]; readonly spec: RigSpec }) {
  const law = useMemo(() => lawChart(rows, spec), [rows, spec]);
  const residual = useMemo(() => residualChart(rows), [rows]);
  if (law === null || residual === null) {
    return (
      <SaysBlock lead="Nothing to plot.">
        No self-break was measured in this firing, so there is nothing to hold against the law.
      </SaysBlock>
    );
  }
  return (
    <>
      <div className="desk-plot">
        <Chart title="Self-breaks against the law" data={law} words={WORDS} />
      </div>
      <div className="desk-plot">
        <Chart title="Measured minus law over the shots of the firing" data={residual} words={WORDS} />
      </div>
    </>
  );
}
