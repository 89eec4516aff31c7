import { Link } from 'react-router-dom';
import { paths } from '../../config/paths';
import type { KitDoc } from '../../domain/book/documents/kit';
import { itemWords } from '../../domain/report/kit-words';
import { DueMark } from './due-mark';
import { dueOf } from './kit-register';

interface Props {
  readonly kit: KitDoc;
  readonly holder: string;
  readonly now_ms: number;
  readonly zone: string;
}

/** One piece of the register: what it is, who has it, and when it is due, by words and shape. */
export function KitRow({ kit, holder, now_ms, zone }: Props) {
  const due = dueOf(kit, now_ms, zone);
  const spare = kit.item.type === 'spare';
  const short = kit.item.type === 'spare' && kit.item.count < kit.item.minimum;
  const heavy = due.state === 'overdue' || due.state === 'failed' || short;
  return (
    <Link className="kit-row" to={paths.kitPiece(kit.id)}>
      <b className="kit-number">{kit.number}</b>
      <span className="kit-what">
        <span>{kit.name}</span>
        <span className="muted">{itemWords(kit.item)}</span>
      </span>
      <span className="kit-holder">{spare ? '' : holder}</span>
      <span className="kit-due">
        {spare ? (
          short ? (
            <b>order</b>
          ) : (
            <span className="muted">enough</span>
          )
        ) : (
          <>
            <DueMark due={due} />
            {heavy ? (
              <b>{due.words}</b>
            ) : (
              <span className={due.state === 'soon' ? '' : 'muted'}>{due.words}</span>
            )}
          </>
        )}
      </span>
    </Link>
  );
}
