import { useParams } from 'react-router-dom';
import { Screen } from '../../components/frame';
import { SaysBlock } from '../../components/says-block';
import { ThumbDome } from '../../components/thumb-dome';
import { ThumbZone } from '../../components/thumb-zone';
import { useLab, useRig } from '../../data/use-book';
import type { RigDoc } from '../../domain/book/documents/rig';
import { ReviseFieldsColumn } from './revise-fields-column';
import { ReviseFigure } from './revise-figure';
import { ReviseKeypad } from './revise-keypad';
import { useRevise } from './use-revise';
import './rigs.css';

export function ReviseRigRoute() {
  const { rig: id = '' } = useParams();
  const rig = useRig(id);
  const lab = useLab();
  if (rig === undefined) {
    return (
      <Screen>
        <div className="rig-page">
          <SaysBlock lead="This rig is not in the tablet’s Book.">Nothing can be revised here.</SaysBlock>
        </div>
      </Screen>
    );
  }
  return <ReviseScreen key={rig.id} rig={rig} zone={lab?.settings.zone ?? 'Etc/UTC'} />;
}

function ReviseScreen({ rig, zone }: { readonly rig: RigDoc; readonly zone: string }) {
  const revise = useRevise(rig);
  const { hindrance } = revise.revision;
  const touched = Object.keys(revise.draft.texts).length > 0 || revise.revision.changes.length > 0;
  return (
    <Screen
      fields={<ReviseFieldsColumn revise={revise} />}
      thumbs={
        <ThumbZone
          label="Actions"
          main={
            <ThumbDome
              size="big"
              hold="second"
              critical
              label={'Hold\nto revise'}
              holdLabel={`Hold: revise ${rig.name}`}
              disabled={hindrance !== null}
              {...(hindrance === null ? {} : { reason: hindrance })}
              onComplete={revise.log}
            />
          }
          others={touched ? [<ThumbDome key="back" label="Back to the rig" onComplete={revise.clear} />] : []}
        />
      }
    >
      {revise.typing ? <ReviseKeypad revise={revise} /> : <ReviseFigure revise={revise} zone={zone} />}
    </Screen>
  );
}
