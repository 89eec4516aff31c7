import { useNavigate } from 'react-router-dom';
import { FacingPair } from '../../components/facing-pair';
import { SaysBlock } from '../../components/says-block';
import { useNow } from '../../data/use-now';
import { waitingAnswerSchema } from '../../domain/report/desk-shapes';
import { Fetched } from './fetched';
import { useDeskQuery } from '../../data/desk/use-desk-query';
import { inOrder, waitingPair } from './waiting-words';

const SHOWN = 12;

/** What waits for a reviewer, as a row of facing pairs; the one that is open stands solid. */
export function WaitingRow({ chosen }: { readonly chosen?: string }) {
  const navigate = useNavigate();
  const { best_ms } = useNow(60_000);
  const answer = useDeskQuery('/api/desk/waiting', waitingAnswerSchema);
  const waiting = answer.data === undefined ? [] : inOrder(answer.data.waiting);
  const people = answer.data?.people ?? {};
  return (
    <section aria-label="Waiting">
      {answer.data !== undefined && waiting.length === 0 ? (
        <SaysBlock lead="Nothing waits.">
          Firings, permits asked and incidents stand here as they come in.
        </SaysBlock>
      ) : null}
      <div className="desk-waiting">
        {waiting.slice(0, SHOWN).map((item) => {
          const pair = waitingPair(item, people, best_ms);
          return (
            <FacingPair
              key={pair.key}
              title={pair.title}
              foot={pair.by}
              footEnd={pair.age}
              chosen={chosen !== undefined && pair.href.endsWith(chosen)}
              onPress={() => void navigate(pair.href)}
            >
              {pair.substance}
            </FacingPair>
          );
        })}
      </div>
      {waiting.length > SHOWN ? (
        <p className="muted">{waiting.length - SHOWN} more wait after these.</p>
      ) : null}
      <Fetched answer={answer} />
    </section>
  );
}
