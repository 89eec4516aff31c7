import { Link } from 'react-router-dom';
import { Reading } from '../../components/reading';
import { SaysBlock } from '../../components/says-block';
import { paths } from '../../config/paths';
import { usePending } from '../../data/use-book';
import type { HandoverStatus as Status } from '../../data/use-handover';
import { useNow } from '../../data/use-now';
import { agoWords, ageWords, momentWords } from '../../domain/report/time-words';

/** How much waits, for how long, and when the server last answered. Offline is normal and reads so. */
export function HandoverStatus({ handover, zone }: { readonly handover: Status; readonly zone: string }) {
  const pending = usePending();
  const { stamp } = useNow(10_000);
  const { last_exchange_ms, state, words, upgrade } = handover;
  const oldest =
    pending.oldest_wall_ms === null ? null : ageWords(Math.max(0, stamp.wall_ms - pending.oldest_wall_ms));
  return (
    <section aria-label="What waits">
      <h1>Handover</h1>
      <div className="handover-figures">
        <p>
          <Reading value={pending.count} size="answer" />
          <br />
          <span className="muted">{pending.count === 1 ? 'entry' : 'entries'} on this tablet only</span>
        </p>
        {oldest === null ? null : (
          <p>
            <Reading value={oldest} size="read" />
            <br />
            <span className="muted">age of the oldest</span>
          </p>
        )}
        <p>
          <Reading
            value={
              last_exchange_ms === null ? 'not yet' : agoWords(Math.max(0, stamp.wall_ms - last_exchange_ms))
            }
            size="read"
          />
          <br />
          <span className="muted">
            last handed over{last_exchange_ms === null ? '' : `, ${momentWords(last_exchange_ms, zone)}`}
          </span>
        </p>
      </div>
      <div role="status">
        <SaysBlock>{words}</SaysBlock>
        {upgrade ? (
          <SaysBlock>
            The server is newer than this app. Handing over goes on; load the new version when it is ready.
          </SaysBlock>
        ) : null}
      </div>
      {state === 'sign-in-to-send' ? (
        <p>
          <Link to={paths.signIn()} className="underline">
            Sign in to send
          </Link>
        </p>
      ) : null}
    </section>
  );
}
