import { Reading } from '../../components/reading';
import type { FiringDoc } from '../../domain/book/documents/firing';
import type { FiringTotals } from '../../domain/report/firing-rows';
import { formatFigure } from '../../domain/units/format-quantity';

/** The figures that a reviewer looks at first. */
export function FiringFigures({
  firing,
  totals,
}: {
  readonly firing: FiringDoc;
  readonly totals: FiringTotals;
}) {
  const { mean_kV, scatter_kV, output_uJ, not_fitting, irregular, self_breaks } = totals;
  return (
    <div className="desk-figures">
      <Figure value={figure(firing.shots, 0)} unit="" label="shots" />
      <Figure value={figure(mean_kV, 1)} unit="kV" label={`mean of ${self_breaks} self-breaks`} />
      <Figure value={figure(scatter_kV, 2)} unit="kV" label="scatter about the law, 1 σ" />
      <Figure value={figure(output_uJ, 0)} unit="µJ" label="output, meter" />
      <Figure value={String(not_fitting)} unit={`of ${totals.readings}`} label="did not fit" />
      {irregular === 0 ? null : (
        <Figure value={String(irregular)} unit={`of ${totals.readings}`} label="irregular" />
      )}
    </div>
  );
}

function Figure({
  value,
  unit,
  label,
}: {
  readonly value: string;
  readonly unit: string;
  readonly label: string;
}) {
  return (
    <p>
      <Reading value={value} size="answer" unit={value === '\u2013' ? '' : unit} />
      <br />
      <span className="muted">{label}</span>
    </p>
  );
}

function figure(value: number | null, decimals: number): string {
  return value === null ? '\u2013' : formatFigure(value, { digits: { decimals }, rounding: 'nearest' });
}
