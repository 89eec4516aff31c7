import { useMemo } from 'react';
import { Chart } from '../../components/chart/chart';
import { Choice } from '../../components/choice';
import { SaysBlock } from '../../components/says-block';
import { Table } from '../../components/table';
import type { RigSpec } from '../../domain/book/rig-spec';
import { channelScale, scaledEnvelope, timeScale } from '../../domain/oscillogram/scaled';
import { ChannelChoice, ChannelSays } from './channel-choices';
import { comparison, type ComparisonRow } from './comparison';
import { foundWords } from './found-words';
import { laidOver, LOOP_WORDS, loopCapacitance_F, simulatedOf } from './simulated';
import { TRACE_CHART_WORDS, traceChart } from './trace-chart';
import { readingAs, shift_ns, type Loop, type TraceDraft } from './trace-draft';
import { measured, unitSize } from './trace-figures';
import type { SimulatedRig } from './use-simulated';
import type { TraceFile } from './use-trace-file';
import { around, type Window, type ZoomStep } from './zoom';

interface Props {
  readonly file: TraceFile;
  readonly draft: TraceDraft;
  readonly change: (part: Partial<TraceDraft>) => void;
  readonly spec: RigSpec;
  readonly rig: SimulatedRig;
  readonly look: (step: ZoomStep | Window) => void;
}

/** A trace as it was said to be read, over what the rig's circuit says. */
export function TraceView({ file, draft, change, spec, rig, look }: Props) {
  const { survey, envelopes } = file;
  const index = Math.min(draft.channel, survey.channels.length - 1);
  const reading = useMemo(() => readingAs(survey, draft), [survey, draft]);
  const loop_F = loopCapacitance_F(spec, draft.loop);
  const one = useMemo(() => measured(survey, reading, { index, loop_F }), [survey, reading, index, loop_F]);
  const channel = reading.channels[index];
  const envelope = envelopes[index];
  const simulated = useMemo(
    () => (rig.type !== 'solved' || channel === undefined ? null : simulatedOf(channel.shows, rig.transient)),
    [rig, channel],
  );
  const by_s = shift_ns(draft) * 1e-9;
  const chart = useMemo(() => {
    if (channel === undefined || envelope === undefined || one === null) return null;
    const stretch = timeScale(survey.time, reading.time_unit_s);
    const scaled = scaledEnvelope(envelope, channelScale(channel) / unitSize(channel.shows), stretch);
    return traceChart(scaled, one, simulated === null ? null : laidOver(simulated, one, by_s));
  }, [channel, envelope, one, survey, reading, simulated, by_s]);
  if (one === null || chart === null || channel === undefined) return null;
  const { pulse } = survey.channels[index] ?? {};
  return (
    <>
      <div className="trace-found">
        <h2>{file.name}</h2>
        <p className="muted">{foundWords(survey).join(' ')}</p>
      </div>
      <ChannelChoice survey={survey} change={change} index={index} />
      <div className="trace-chart">
        <Chart title={`Trace of ${channel.name}`} data={chart} words={TRACE_CHART_WORDS} />
      </div>
      <Zoom
        look={look}
        toPulse={
          pulse === undefined
            ? null
            : () =>
                look(
                  around(
                    survey.time,
                    pulse.peak_s,
                    Math.max(20 * (pulse.rise_s ?? 0), wholeOf(survey.time) / 50),
                  ),
                )
        }
      />
      {one.quiet ? (
        <SaysBlock lead="No pulse.">Nothing on this channel stands clear of its noise.</SaysBlock>
      ) : null}
      <SimulatedSays rig={rig} drawn={simulated !== null} />
      <div className="trace-table">
        <Table<ComparisonRow>
          caption={`Figures of ${channel.name}`}
          columns={COLUMNS}
          rows={comparison(one, simulated, spec)}
          rowKey={(row) => row.key}
        />
      </div>
      <p className="muted">
        An inductance from a ring holds for one lumped loop. A probe’s ground lead rings by itself and looks
        the same.
      </p>
      <ChannelSays survey={survey} draft={draft} change={change} index={index} />
      <div className="trace-choice">
        <h3>Capacitance that rings</h3>
        <Choice<Loop>
          label="Capacitance that rings"
          options={LOOPS}
          value={draft.loop}
          onChange={(loop) => change({ loop })}
        />
      </div>
    </>
  );
}

const LOOPS = (['first', 'second', 'series'] as const).map((value) => ({ value, label: LOOP_WORDS[value] }));

const COLUMNS = [
  { key: 'label', head: 'Figure', align: 'start', cell: (row: ComparisonRow) => row.label },
  { key: 'measured', head: 'measured', cell: (row: ComparisonRow) => row.measured },
  { key: 'simulated', head: 'simulated', cell: (row: ComparisonRow) => row.simulated },
] as const;

function wholeOf({ from_s, to_s }: Window): number {
  return to_s - from_s;
}

const STEPS: readonly (readonly [ZoomStep, string])[] = [
  ['in', 'Further in'],
  ['out', 'Further out'],
  ['earlier', 'Earlier'],
  ['later', 'Later'],
  ['whole', 'Whole trace'],
];

function Zoom({ look, toPulse }: Pick<Props, 'look'> & { readonly toPulse: (() => void) | null }) {
  return (
    <div className="trace-zoom" role="group" aria-label="Time shown">
      {STEPS.map(([step, label]) => (
        <button key={step} type="button" onClick={() => look(step)}>
          {label}
        </button>
      ))}
      {toPulse === null ? null : (
        <button type="button" onClick={toPulse}>
          To the pulse
        </button>
      )}
    </div>
  );
}

function SimulatedSays({ rig, drawn }: { readonly rig: SimulatedRig; readonly drawn: boolean }) {
  if (rig.type === 'refused') return <SaysBlock lead="Not simulated.">{rig.words}</SaysBlock>;
  if (rig.type === 'none')
    return (
      <SaysBlock muted>
        Name the reading that it was taken at, and the simulated wave shape is laid over it.
      </SaysBlock>
    );
  if (rig.type === 'solving') return <SaysBlock muted>The circuit is being solved.</SaysBlock>;
  if (!drawn) return <SaysBlock muted>The circuit gives no wave shape of what this channel shows.</SaysBlock>;
  const { assumed } = rig.transient;
  return (
    <SaysBlock muted>
      Dotted: simulated at the reading’s voltage, aligned where both pass 10 %.
      {assumed.length === 0 ? '' : ` Assumed: ${assumed.join(', ')}.`}
    </SaysBlock>
  );
}
