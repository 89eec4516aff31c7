import { useNow } from '../../data/use-now';
import { agoWords } from '../../domain/report/time-words';
import type { DeskAnswer } from '../../data/desk/use-desk-query';

interface FetchedProps {
  readonly answer: DeskAnswer<unknown>;
  /** Why the server did not answer is said once on a page; below it the age alone. */
  readonly quiet?: boolean;
}

/** Silent while answers come in; without a network it says what this is and how old. */
export function Fetched({ answer, quiet = false }: FetchedProps) {
  const { stamp } = useNow(10_000);
  if (answer.words === null) {
    return answer.data === undefined ? <p className="muted">Asking the server.</p> : null;
  }
  const age =
    answer.fetched_ms === 0
      ? 'Nothing was fetched on this tablet before.'
      : `What stands here was fetched ${agoWords(Math.max(0, stamp.wall_ms - answer.fetched_ms))}.`;
  if (quiet && answer.data !== undefined) return <p className="muted">{age}</p>;
  return (
    <p role="status">
      {answer.words} <span className="muted">{age}</span>{' '}
      <button type="button" className="underline" onClick={answer.refetch}>
        Ask again
      </button>
    </p>
  );
}
