import { useMemo } from 'react';
import { Chart } from '../../components/chart/chart';
import type { ChartData } from '../../components/chart/types';
import { Table, type Column } from '../../components/table';
import { useFirings, useParts } from '../../data/use-book';
import { FIRING_CHART_WORDS } from './firing-chart';
import {
  looksCounted,
  outputOverShots,
  summaryFigures,
  wearLines,
  type FiringPoint,
  type SummaryFigure,
  type WearLine,
} from './firing-summary';
import type { FiringFacts } from './use-firing-facts';

const FIGURES: readonly Column<SummaryFigure>[] = [
  { key: 'label', head: 'figure', align: 'start', cell: (row) => row.label },
  { key: 'words', head: 'value', cell: (row) => row.words },
];
const WEAR: readonly Column<WearLine>[] = [
  { key: 'part', head: 'part', align: 'start', cell: (row) => row.part },
  { key: 'words', head: 'endured', align: 'start', cell: (row) => row.words },
];

/** What came of a firing: figures, looks, wear, and how its output went over the shots. */
export function FiringSummary({ facts }: { readonly facts: FiringFacts }) {
  const { firing, rig, rows } = facts;
  const parts = useParts(rig.id);
  const firings = useFirings(rig.id);
  const wear = useMemo(() => wearLines(firing, rig, { parts, firings }), [firing, rig, parts, firings]);
  const looks = looksCounted(rows);
  const output = useMemo(() => overShotsChart([outputOverShots(rows)], 'µJ'), [rows]);
  return (
    <details className="firing-summary">
      <summary>Summary and wear</summary>
      <Table
        caption="Summary of the firing"
        columns={FIGURES}
        rows={summaryFigures(firing, rows)}
        rowKey={(row) => row.key}
        {...(looks.length === 0
          ? {}
          : { foot: `looked: ${looks.map(({ looked, times }) => `${looked} ${times} times`).join('; ')}` })}
      />
      {wear.length === 0 ? null : (
        <Table
          caption="Wear by this firing"
          columns={WEAR}
          rows={wear}
          rowKey={(row) => row.part + row.words}
        />
      )}
      {output === null ? null : (
        <div className="firing-chart calibration-chart">
          <Chart title="Output by meter over shots" data={output} words={FIRING_CHART_WORDS} />
        </div>
      )}
    </details>
  );
}

/** One or two runs over their own shots; null while no run has two points. */
export function overShotsChart(
  runs: readonly (readonly FiringPoint[])[],
  unit: string,
  labels: readonly string[] = [],
): ChartData | null {
  const points = runs.flat();
  if (!runs.some((run) => run.length > 1)) return null;
  const ys = points.map(({ y }) => y);
  const low = Math.min(...ys);
  const high = Math.max(...ys);
  const margin = Math.max(1, 0.1 * (high - low));
  return {
    x: { min: 0, max: Math.max(...points.map(({ x }) => x), 1), unit: 'shots', decimals: 0 },
    y: { min: Math.floor(low - margin), max: Math.ceil(high + margin), unit, decimals: 1 },
    curves: runs.map((run, i) => ({
      points: run,
      weight: i === 0 ? ('curve' as const) : ('thin' as const),
      ...(labels[i] === undefined ? {} : { label: labels[i] }),
    })),
  };
}
