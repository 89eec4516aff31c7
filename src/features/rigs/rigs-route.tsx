import { Screen } from '../../components/frame';
import { SaysBlock } from '../../components/says-block';
import { useRigs } from '../../data/use-book';
import { RigChoice } from './rig-choice';
import './rigs.css';

/** Every rig of the lab; choosing one takes it in hand. */
export function RigsRoute() {
  const rigs = useRigs();
  return (
    <Screen>
      <div className="rig-page">
        <h1 className="text-lead leading-tight m-0">Rigs</h1>
        {rigs.length === 0 ? (
          <SaysBlock lead="No rig in this tablet’s Book yet.">
            It fills as soon as the server answers.
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
