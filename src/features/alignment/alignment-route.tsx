import { useState } from 'react';
import { useParams } from 'react-router-dom';
import { Choice } from '../../components/choice';
import { FigureFields, FigureKeypad } from '../../components/figure-fields';
import { Screen } from '../../components/frame';
import { SaysBlock } from '../../components/says-block';
import { ThumbDome } from '../../components/thumb-dome';
import { ThumbZone } from '../../components/thumb-zone';
import { useLab, useRig } from '../../data/use-book';
import type { RigDoc } from '../../domain/book/documents/rig';
import { ARC_WORDS } from '../../domain/report/kit-words';
import type { ArcPlace, Mode } from './alignment-form';
import { ALIGNMENT_KEYPAD_WORDS } from './keypad-words';
import { gapsAfter } from './alignment-plan';
import { ChannelFigure } from './channel-figure';
import { ConvergenceSays } from './convergence-says';
import { HistoryTable } from './history-table';
import { Recommendation } from './recommendation';
import { useAlignmentLog } from './use-alignment-log';
import { useAlignmentScreen, type AlignmentScreen } from './use-alignment-screen';
import { WriteDialog } from './write-dialog';
import './alignment.css';

const MODES: readonly { readonly value: Mode; readonly label: string }[] = [
  { value: 'gaps', label: 'gaps' },
  { value: 'turns', label: 'turns' },
  { value: 'arcs', label: 'arcs' },
];

const LOG_LABELS: Readonly<Record<Mode, string>> = {
  gaps: 'Hold\nto log gaps',
  turns: 'Hold\nto log turns',
  arcs: 'Hold\nto log arcs',
};

const PLACES = (Object.keys(ARC_WORDS) as readonly ArcPlace[]).map((value) => ({
  value,
  label: { even: 'even', 'a-end': 'A end', mid: 'mid', 'b-end': 'B end', 'both-ends': 'both ends' }[value],
}));

export function AlignmentRoute() {
  const { rig: id = '' } = useParams();
  const rig = useRig(id);
  if (rig === undefined) {
    return (
      <Screen>
        <div className="align">
          <SaysBlock lead="This rig is not in the tablet’s Book.">Nothing can be aligned here.</SaysBlock>
        </div>
      </Screen>
    );
  }
  return <Alignment key={rig.id} rig={rig} />;
}

function Alignment({ rig }: { readonly rig: RigDoc }) {
  const screen = useAlignmentScreen(rig);
  const { hindrance, log } = useAlignmentLog(screen);
  const [writing, setWriting] = useState(false);
  const { figures, mode, last } = screen;
  const measured = last?.stands === true ? last.measured : null;
  return (
    <Screen
      fields={
        <>
          <Choice
            label="What is logged"
            options={MODES}
            value={mode}
            onChange={(next) => screen.set((now) => ({ ...now, mode: next }))}
          />
          <FigureFields label="Figures" form={figures} />
        </>
      }
      thumbs={
        figures.typing ? null : (
          <ThumbZone
            label="Actions"
            main={
              <ThumbDome
                size="big"
                hold="half-second"
                label={LOG_LABELS[mode]}
                disabled={hindrance !== null}
                {...(hindrance === null ? {} : { reason: hindrance })}
                onComplete={log}
              />
            }
            others={
              measured === null
                ? []
                : [<ThumbDome key="write" label="Write to the rig" onComplete={() => setWriting(true)} />]
            }
          />
        )
      }
    >
      {figures.typing ? (
        <FigureKeypad form={figures} words={ALIGNMENT_KEYPAD_WORDS} />
      ) : (
        <Figure screen={screen} hindrance={hindrance} />
      )}
      {writing && measured !== null ? (
        <WriteDialog screen={screen} measured={measured} onClose={() => setWriting(false)} />
      ) : null}
    </Screen>
  );
}

function Figure({
  screen,
  hindrance,
}: {
  readonly screen: AlignmentScreen;
  readonly hindrance: string | null;
}) {
  const { rig, revision, setting, draft, mode, advice, advised } = screen;
  const zone = useLab()?.settings.zone ?? 'Etc/UTC';
  const turned = typeof screen.turned === 'object' && screen.turned !== null ? screen.turned : advice;
  const after = advised === null || turned === null ? null : gapsAfter(advised, setting, turned);
  return (
    <div className="align">
      <div className="align-head">
        <h1>{rig.name}, alignment</h1>
        <p className="muted">revision {revision.number}. Short every node before hands go in.</p>
      </div>
      <ChannelFigure
        setting={setting}
        gaps={screen.shown}
        target_mm={screen.goal.target_mm}
        after={after}
        turns={advised === null ? null : turned}
        arcs={draft.arcs}
        onArcs={(arcs) => screen.set((now) => ({ ...now, mode: 'arcs', arcs }))}
      />
      {mode === 'arcs' ? (
        <Choice
          label="Where arcs sit"
          options={PLACES}
          value={draft.arcs}
          onChange={(arcs) => screen.set((now) => ({ ...now, arcs }))}
        />
      ) : (
        <Recommendation screen={screen} />
      )}
      <p role="status" className="muted">
        {hindrance ?? ''}
        {screen.save === 'not-saved' ? ' The draft could not be kept on this tablet.' : ''}
      </p>
      <ConvergenceSays convergence={screen.convergence} />
      {screen.state === 'loading' ? null : <HistoryTable lines={screen.lines} zone={zone} />}
    </div>
  );
}
