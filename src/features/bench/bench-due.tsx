import { Link } from 'react-router-dom';
import type { RigDoc } from '../../domain/book/documents/rig';
import type { DeclaredView } from '../../domain/rules/declared-view';
import { besides, leadPath, leftWords } from './due-lead';
import type { DueNext } from './due-next';
import { useDueItems } from './use-due-items';

/** As many as the column holds beside what was last and what waits; the list's head leads to all of them. */
const SHOWN = 1;

interface Props {
  readonly rig: RigDoc;
  readonly view: DeclaredView;
  readonly primary: DueNext;
}

/** What is due besides the next step, the soonest first. */
export function BenchDue({ rig, view, primary }: Props) {
  const items = besides(useDueItems(rig, view), primary);
  if (items.length === 0) return null;
  return (
    <ul className="bench-due" aria-label="Due besides">
      {items.slice(0, SHOWN).map((item) => (
        <li key={item.key}>
          <Link to={leadPath(item.lead, rig.id)}>
            <b>{item.title}</b> <span className="muted nowrap">{leftWords(item)}</span>
          </Link>
        </li>
      ))}
    </ul>
  );
}
