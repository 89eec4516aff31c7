import { useMemo, useState } from 'react';
import { Chart } from '../../components/chart/chart';
import type { ChartWords } from '../../components/chart/types';
import { Choice } from '../../components/choice';
import { Dialog } from '../../components/dialog';
import { SaysBlock } from '../../components/says-block';
import type { LookupAsk } from '../../data/lookup/lookup-protocol';
import { shownFields } from '../../domain/lookup/fields';
import { planSweep, sweepChart, toggleFigure, type SweepPlan } from './sweep-plan';
import { useComputed } from './use-lookup-answer';
import type { LookupView } from './use-lookup';

const WORDS: ChartWords = {
  showTable: 'Table',
  showChart: 'Chart',
  low: 'low',
  high: 'high',
  law: 'law',
  own: 'own',
  number: 'No.',
};

/** One input against one figure or more; the other fields hold still, and may be changed all the while. */
export function SweepFigure({ view }: { readonly view: LookupView }) {
  const { lookup, form, values, answer, refusal } = view;
  const plan = useMemo(
    () => (answer === null ? null : planSweep({ lookup, form, values, answer })),
    [lookup, form, values, answer],
  );
  const ask = useMemo(
    (): LookupAsk | null =>
      plan === null
        ? null
        : {
            kind: 'sweep',
            values,
            field: plan.field.key,
            figures: plan.figures.map((figure) => figure.key),
            xs: plan.xs,
          },
    [plan, values],
  );
  const { reply, computing } = useComputed(lookup, ask);
  if (plan === null || refusal !== null) {
    return (
      <div className="lookup-empty">
        <SaysBlock lead="Nothing to sweep here.">{refusal?.words ?? ''}</SaysBlock>
      </div>
    );
  }
  const rows = reply?.ok === true && reply.value.kind === 'sweep' ? reply.value.rows : null;
  const data = rows === null ? null : sweepChart(plan, rows, values);
  return (
    <div className="lookup-sweep">
      <SweepHead view={view} plan={plan} />
      {data !== null ? (
        <div className="lookup-plot">
          <Chart title={titleOf(plan, view)} data={data} words={WORDS} />
        </div>
      ) : rows !== null ? (
        <SaysBlock lead="No answer in this range.">{rows[0]?.refusal ?? ''}</SaysBlock>
      ) : reply?.ok === false ? (
        <SaysBlock lead="No answer here.">{reply.refusal.words}</SaysBlock>
      ) : null}
      {computing ? <p className="muted">Computing</p> : null}
    </div>
  );
}

function titleOf({ field, figures }: SweepPlan, { lookup }: LookupView): string {
  return `${lookup.title}: ${figures.map((figure) => figure.label).join(' and ')} against ${field.label.toLowerCase()}`;
}

function SweepHead({ view, plan }: { readonly view: LookupView; readonly plan: SweepPlan }) {
  const [open, setOpen] = useState(false);
  return (
    <div className="lookup-sweep-head">
      <b>{plan.figures.map((figure) => figure.label).join(' and ')}</b> against{' '}
      <b>{plan.field.label.toLowerCase()}</b>{' '}
      <button type="button" className="lookup-act" onClick={() => setOpen(true)}>
        Change
      </button>
      {open ? <SweepDialog view={view} plan={plan} onClose={() => setOpen(false)} /> : null}
    </div>
  );
}

function SweepDialog({
  view,
  plan,
  onClose,
}: {
  readonly view: LookupView;
  readonly plan: SweepPlan;
  readonly onClose: () => void;
}) {
  const { lookup, values, change } = view;
  const inputs = shownFields(lookup, values).filter((field) => field.kind === 'number');
  const chosen = new Set(plan.figures.map((figure) => figure.key));
  return (
    <Dialog title="Sweep" onClose={onClose} closeLabel="Done">
      <p className="muted">Which input?</p>
      <Choice
        label="Input"
        options={inputs.map((field) => ({ value: field.key, label: field.label.toLowerCase() }))}
        value={plan.field.key}
        onChange={(field) => change((now) => ({ ...now, sweep: { ...now.sweep, field } }))}
      />
      <p className="muted">Against which figures? Curves share one axis, so they share a unit.</p>
      <div className="choice" role="group" aria-label="Figures">
        {plan.candidates.map((figure) => (
          <button
            key={figure.key}
            type="button"
            role="checkbox"
            aria-checked={chosen.has(figure.key)}
            onClick={() =>
              change((now) => ({
                ...now,
                sweep: { field: now.sweep.field ?? plan.field.key, figures: toggleFigure(plan, figure.key) },
              }))
            }
          >
            {figure.label}
            {figure.unit === '' ? '' : `, ${figure.unit}`}
          </button>
        ))}
      </div>
    </Dialog>
  );
}
