import { useMemo, useState } from 'react';
import { Chart } from '../../components/chart/chart';
import { Screen } from '../../components/frame';
import { SaysBlock } from '../../components/says-block';
import { ThumbDome } from '../../components/thumb-dome';
import { ThumbZone } from '../../components/thumb-zone';
import { useBookState } from '../../data/use-book';
import { useDisplay } from '../../data/use-display';
import { useDraft } from '../../data/use-draft';
import { useResume } from '../../data/use-resume';
import type { ReadingValues } from '../../domain/book/bodies/firing-bodies';
import type { ReadingDoc } from '../../domain/book/documents/reading';
import type { RigCalibration } from '../../domain/rules/rig-calibration';
import { beyondEnvelope } from './beyond-envelope';
import type { BurstView } from './burst';
import { CorrectDialog } from './correct-dialog';
import { FIRING_CHART_WORDS, firingChart } from './firing-chart';
import { FiringHead } from './firing-head';
import { FiringLinks } from './firing-links';
import { FitSays } from './fit-says';
import { LookedChoice } from './looked-choice';
import { fitOf, sigmasOf } from './reading-fit';
import { ReadingFieldsColumn } from './reading-fields-column';
import { EMPTY_DRAFT, firstBase, nextBase, type Base } from './reading-form';
import { footKeysOf } from './foot-key';
import { isPanelOpen, ReadingPanel } from './reading-panel';
import { ReadingsTable } from './readings-table';
import { useBurst } from './use-burst';
import type { FiringFacts } from './use-firing-facts';
import { useFiringLog, type Said } from './use-firing-log';
import { useFootKey } from './use-foot-key';
import { useCalibrationBefore } from '../../data/use-rig-calibration';
import { useReadingForm, type ReadingForm } from './use-reading-form';

const BURST_DOME: Readonly<Record<BurstView['type'], string>> = {
  none: 'Start burst',
  running: 'Stop burst',
  interrupted: 'Count burst',
};

/** A firing that goes on: log, look, log again. */
export function OpenFiring({ facts }: { readonly facts: FiringFacts }) {
  const { firing } = facts;
  const draft = useDraft(`reading/${firing.id}`, EMPTY_DRAFT);
  const resume = useResume();
  const { base, noteLogged } = useBase(facts);
  const form = useReadingForm(base, {
    value: draft.value,
    set: (next) => {
      draft.set((now) => {
        const changed = next({ ...EMPTY_DRAFT, ...now });
        resume.field(`reading/${changed.field}`, changed.typing?.length ?? null);
        return changed;
      });
    },
  });
  const log = useFiringLog({ facts, form, onLogged: noteLogged });
  const [correcting, setCorrecting] = useState<ReadingDoc | null>(null);
  const own = useCalibrationBefore(facts.rig, firing);
  const burst = useBurst({ firing, form, onSaid: log.say });
  const { foot_key, foot_does } = useDisplay().settings;
  useFootKey({
    enabled: true,
    keys: footKeysOf(foot_key),
    onLog: () => void (foot_does === 'burst' ? burst.toggle() : log.log()),
    onStandDown: () => void log.standDown(),
  });

  return (
    <Screen
      fields={
        <ReadingFieldsColumn form={form} warnings={beyondEnvelope(form.values, facts.envelope)} withSummary />
      }
      thumbs={
        <ThumbZone
          label="Actions"
          main={
            <ThumbDome
              size="big"
              label={'Hold\nto log'}
              hold="half-second"
              holdLabel="Hold: log reading"
              onComplete={log.log}
            />
          }
          others={[
            <ThumbDome
              key="close"
              critical
              label="Close firing"
              hold="second"
              holdLabel="Hold: close firing"
              onComplete={log.close}
            />,
            <ThumbDome
              key="burst"
              label={BURST_DOME[burst.view.type]}
              hold="half-second"
              onComplete={burst.toggle}
            />,
          ]}
        />
      }
    >
      {isPanelOpen(form) ? (
        <ReadingPanel form={form} />
      ) : (
        <OpenFigure
          facts={facts}
          form={form}
          said={log.said}
          burst={burst.view}
          own={own}
          onPick={setCorrecting}
        />
      )}
      {correcting === null ? null : (
        <CorrectDialog
          facts={facts}
          reading={correcting}
          onClose={() => {
            setCorrecting(null);
          }}
        />
      )}
    </Screen>
  );
}

interface OpenFigureProps {
  readonly facts: FiringFacts;
  readonly form: ReadingForm;
  readonly said: Said | null;
  readonly burst: BurstView;
  readonly own: RigCalibration | null;
  readonly onPick: (reading: ReadingDoc) => void;
}

function OpenFigure({ facts, form, said, burst, own, onPick }: OpenFigureProps) {
  const { revision, rows, readings } = facts;
  const { spec } = revision;
  const { values } = form;
  const last = rows.at(-1)?.reading;
  const against = useMemo(() => ({ spec, own }), [spec, own]);
  const sigmas = useMemo(() => sigmasOf(against, rows), [against, rows]);
  const fit = useMemo(
    () => (last === undefined ? null : fitOf(against, rows, last.id)),
    [against, rows, last],
  );
  // The draft is a new object at every key; the chart hangs on five of its figures only.
  const { voltage_kV, pressure_bar_g, ambient_bar_abs, temperature_C, gas } = values;
  const chart = useMemo(
    () =>
      firingChart({
        spec,
        values: { voltage_kV, pressure_bar_g, ambient_bar_abs, temperature_C, gas },
        rows,
        sigmas,
        own,
      }),
    [spec, voltage_kV, pressure_bar_g, ambient_bar_abs, temperature_C, gas, rows, sigmas, own],
  );
  return (
    <div className="firing-figure">
      <FiringHead facts={facts} form={form} said={said} burst={burst} />
      <OtherTablet facts={facts} />
      <FiringLinks firing={facts.firing.id} />
      <LookedChoice form={form} length_mm={spec.channel.length_mm} />
      {last === undefined || fit === null ? (
        <SaysBlock muted>
          {facts.loading ? '' : 'No reading yet. Each one is held against the law as soon as it is logged.'}
        </SaysBlock>
      ) : (
        <FitSays no={last.no} fit={fit} />
      )}
      <div className="firing-past">
        <ReadingsTable readings={readings} picked={last?.id} onPick={onPick} />
        <div className="firing-chart">
          {chart === null ? (
            <SaysBlock muted>No curve: enter ambient and temperature first.</SaysBlock>
          ) : (
            <Chart
              title={`Self-breaks of firing ${facts.firing.number} against the law`}
              data={chart}
              words={FIRING_CHART_WORDS}
            />
          )}
        </div>
      </div>
    </div>
  );
}

function OtherTablet({ facts }: { readonly facts: FiringFacts }) {
  const { device } = useBookState();
  if (facts.firing.opened.device === device) return null;
  return (
    <SaysBlock lead="Opened on another tablet.">
      What is logged here is kept; the rig’s state is known best over there.
    </SaysBlock>
  );
}

/**
 * The values that show through the form. A reading that has just been logged counts before the Book's list has come
 * round again, so that a quick second press repeats the right one.
 */
function useBase({ firing, revision, settings, rows, readings }: FiringFacts) {
  const [logged, setLogged] = useState<{ readonly id: string; readonly values: ReadingValues } | null>(null);
  const ahead =
    logged !== null && !readings.some((reading) => reading.id === logged.id) ? logged.values : null;
  const before = ahead ?? rows.at(-1)?.values ?? null;
  const base: Base = useMemo(
    () => (before === null ? firstBase(revision.spec, revision.number, settings) : nextBase(before)),
    [before, revision, settings],
  );
  return {
    base,
    firing,
    noteLogged: (id: string, values: ReadingValues) => {
      setLogged({ id, values });
    },
  };
}
