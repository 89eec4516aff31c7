import { useNavigate } from 'react-router-dom';
import { Screen } from '../../components/frame';
import { SaysBlock } from '../../components/says-block';
import { ThumbDome } from '../../components/thumb-dome';
import { ThumbZone } from '../../components/thumb-zone';
import { paths } from '../../config/paths';
import { useRigs } from '../../data/use-book';
import { RigChoice } from './rig-choice';
import { useMay } from './use-may';
import './rigs.css';

/** Every rig of the lab; choosing one takes it in hand. */
export function RigsRoute() {
  const rigs = useRigs();
  const navigate = useNavigate();
  const allowed = useMay()('rig.created');
  return (
    <Screen
      fields={<span />}
      thumbs={
        <ThumbZone
          label="Actions"
          main={
            <ThumbDome
              size="big"
              label="New rig"
              disabled={!allowed}
              {...(allowed ? {} : { reason: 'A new rig is for operators, reviewers and leads.' })}
              onComplete={() => void navigate(paths.newRig())}
            />
          }
        />
      }
    >
      <div className="rig-page">
        <h1 className="text-lead leading-tight m-0">Rigs</h1>
        {rigs.length === 0 ? (
          <SaysBlock lead="No rig in this tablet’s Book yet.">
            It fills as soon as the server answers. A new one begins with a touch.
          </SaysBlock>
        ) : (
          <ul className="rig-list">
            {rigs.map((rig) => (
              <li key={rig.id}>
                <RigChoice id={rig.id} />
              </li>
            ))}
          </ul>
        )}
        <p className="muted">What stands here was declared by people. Nothing of it was measured.</p>
      </div>
    </Screen>
  );
}
