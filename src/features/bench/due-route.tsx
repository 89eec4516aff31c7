import { Link, useParams } from 'react-router-dom';
import { Screen } from '../../components/frame';
import { SaysBlock } from '../../components/says-block';
import { useRig } from '../../data/use-book';
import { useDeclared } from '../../data/use-now';
import type { RigDoc } from '../../domain/book/documents/rig';
import type { DeclaredView } from '../../domain/rules/declared-view';
import type { DueItem } from '../../domain/rules/due';
import { leadPath, leftWords } from './due-lead';
import { useDueItems } from './use-due-items';
import './bench.css';

/** All that is due at a rig, with why; each line leads to where it is mended. */
export function DueRoute() {
  const { rig: id = '' } = useParams();
  const rig = useRig(id);
  const view = useDeclared(id);
  return (
    <Screen>
      <div className="bench-page">
        {rig === undefined || view === undefined ? (
          <SaysBlock lead="This rig is not in the tablet’s Book.">It may still be filling.</SaysBlock>
        ) : (
          <Due rig={rig} view={view} />
        )}
      </div>
    </Screen>
  );
}

function Due({ rig, view }: { readonly rig: RigDoc; readonly view: DeclaredView }) {
  const items = useDueItems(rig, view);
  return (
    <>
      <h1>Due at {rig.name}</h1>
      {items.length === 0 ? (
        <SaysBlock lead="Nothing is due.">
          What lapses, expires or wears stands here when its time comes near.
        </SaysBlock>
      ) : (
        <ol className="bench-rows" aria-label="Due, the soonest first">
          {items.map((item) => (
            <li key={item.key}>
              <DueRow item={item} rig={rig.id} />
            </li>
          ))}
        </ol>
      )}
    </>
  );
}

function DueRow({ item, rig }: { readonly item: DueItem; readonly rig: string }) {
  return (
    <Link to={leadPath(item.lead, rig)} className="bench-row">
      <span>
        <b>{item.title}</b>
        <br />
        <span className="muted">{item.why}</span>
      </span>
      <b className="nowrap">{leftWords(item)}</b>
    </Link>
  );
}
