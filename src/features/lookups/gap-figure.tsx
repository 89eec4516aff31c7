import { useState } from 'react';
import { Caution } from '../../components/caution';
import { Chart } from '../../components/chart/chart';
import type { ChartData, ChartWords, Slice } from '../../components/chart/types';
import { Dialog } from '../../components/dialog';
import { SaysBlock } from '../../components/says-block';
import { standingPermit } from '../../domain/rules/readiness';
import type { RigDoc } from '../../domain/book/documents/rig';
import { useNow } from '../../data/use-now';
import { highText, lawText, lowText, percentText } from './gap-words';
import type { GapLookup } from './use-gap-lookup';

const WORDS: ChartWords = {
  showTable: 'Table',
  showChart: 'Chart',
  low: 'nothing fires below, kV',
  high: 'may hold up to, kV',
  law: 'law, kV',
  own: 'own, kV',
  number: 'No.',
};

export function GapFigure({ rig, lookup }: { readonly rig: RigDoc; readonly lookup: GapLookup }) {
  const { view } = lookup;
  if (!view.ok) {
    return (
      <div className="gap-figure">
        <div className="gap-empty">
          <SaysBlock lead="No answer here.">{view.refusal.words}</SaysBlock>
        </div>
      </div>
    );
  }
  return (
    <div className="gap-figure">
      <GapChart rig={rig} lookup={lookup} />
      <div className="gap-notes">
        <GapModelWords lookup={lookup} />
        <GapCaution lookup={lookup} />
      </div>
    </div>
  );
}

function GapChart({ rig, lookup }: { readonly rig: RigDoc; readonly lookup: GapLookup }) {
  const { view, curves, form, range, revision, supply } = lookup;
  const { best_ms } = useNow(60_000);
  if (!view.ok || curves === null) return null;
  const { answer, input } = view.value;
  const ambient = form.values.ambient_bar_abs ?? 0;
  const x = input.pressure.bar_abs - ambient;
  const { vessel } = revision.spec.gap;
  const permit = standingPermit(rig, best_ms);
  const window =
    permit === null
      ? null
      : {
          min: Math.max(range.from_bar_g, revision.spec.gap.lowest_bar_g),
          max: Math.min(permit.envelope.max_bar_g, range.to_bar_g),
        };
  const data: ChartData = {
    x: { min: range.from_bar_g, max: range.to_bar_g, unit: 'bar(g)', decimals: 2 },
    y: { ...voltageSpan(curves, answer), unit: 'kV', decimals: 1 },
    band: { points: curves.band, above: 'breaks', below: 'holds' },
    law: curves.law,
    point: { x, low: answer.low_kV, high: answer.high_kV },
    ...(supply === null
      ? {}
      : { limit: { y: supply.reachable_kV, label: `supply ${lowText(supply.reachable_kV)}\u2009kV` } }),
    ...(vessel === null
      ? {}
      : { wall: { from: vessel.rated_bar_g, label: `vessel ${vessel.rated_bar_g.toFixed(1)}\u2009bar(g)` } }),
    ...(window === null || window.min >= window.max ? {} : { window }),
    ...(curves.notValidFrom === null
      ? {}
      : { notValid: { from: curves.notValidFrom, label: 'not valid here' } }),
  };
  const title = `Self-break voltage of the gap of ${rig.name} at ${x.toFixed(2)} bar gauge: nothing fires below ${lowText(answer.low_kV)} kV, law ${lawText(answer.law_kV)} kV, may hold up to ${highText(answer.high_kV)} kV`;
  return (
    <div className="gap-chart">
      <Chart title={title} data={data} words={WORDS} slice={sliceOf(lookup)} />
    </div>
  );
}

function sliceOf({ view, form }: GapLookup): Slice {
  if (!view.ok) throw new Error('a refused lookup has no slice');
  const { answer, solution } = view.value;
  return {
    high: {
      value: highText(answer.high_kV),
      unit: 'kV',
      words: 'may hold up to',
      note: form.irradiated ? 'with UV on the gap' : 'without UV on the gap',
    },
    low: {
      value: lowText(answer.low_kV),
      unit: 'kV',
      words: 'nothing fires below',
      note: `stand at most ${lowText(answer.stand_at_most_kV)}\u2009kV`,
    },
    middle: [{ label: 'law', value: lawText(answer.law_kV) }],
    lean: solution?.leansOn === 'low' ? 'low' : 'high',
  };
}

function GapModelWords({ lookup }: { readonly lookup: GapLookup }) {
  const { view, form } = lookup;
  if (!view.ok) return null;
  const { answer } = view.value;
  const ambient = form.values.ambient_bar_abs;
  return (
    <SaysBlock muted>
      {answer.model}, {percentText(answer.band.below)} to {percentText(answer.band.above)} % with the setting
      errors.
      {ambient === null ? null : <span className="nowrap"> Ambient {ambient.toFixed(3)}&nbsp;bar(abs).</span>}
    </SaysBlock>
  );
}

/** The first caution in full; the others, with where the model holds, one touch away. */
function GapCaution({ lookup }: { readonly lookup: GapLookup }) {
  const [open, setOpen] = useState(false);
  const cautions = cautionsOf(lookup);
  const [first] = cautions;
  if (first === undefined) return null;
  return (
    <Caution>
      {first}{' '}
      <button type="button" className="gap-more" onClick={() => setOpen(true)}>
        {cautions.length - 1} more, and where it holds
      </button>
      {open ? (
        <Dialog title="Before you trust this number" onClose={() => setOpen(false)} closeLabel="Done">
          <ul className="gap-cautions">
            {cautions.map((words) => (
              <li key={words}>{words}</li>
            ))}
          </ul>
        </Dialog>
      ) : null}
    </Caution>
  );
}

function cautionsOf({ view, supply }: GapLookup): readonly string[] {
  if (!view.ok) return [];
  const { answer } = view.value;
  return [
    ...(supply === null || supply.reach.type === 'reaches' ? [] : [supply.reach.words]),
    ...answer.warnings.map((warning) => warning.words),
    'With a person near, no gas gap is a barrier.',
    `The model holds ${answer.valid}.`,
  ];
}

function voltageSpan(
  curves: NonNullable<GapLookup['curves']>,
  { low_kV, high_kV }: { readonly low_kV: number; readonly high_kV: number },
) {
  const lows = curves.band.map((point) => point.low);
  const laws = curves.law.map((point) => point.y);
  const min = Math.max(0, Math.floor(Math.min(...lows, low_kV) - 1));
  const max = Math.ceil(Math.max(...laws, high_kV) * 1.12);
  return { min, max };
}
