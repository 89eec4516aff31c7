import { Link, useParams } from 'react-router-dom';
import { Screen } from '../../components/frame';
import { paths } from '../../config/paths';
import { useLab, useLookups, useRig } from '../../data/use-book';
import { useNow } from '../../data/use-now';
import type { LookupDoc } from '../../domain/book/documents/lookup';
import { figureLine } from '../../domain/lookup/figure-text';
import { readKept } from '../../domain/lookup/kept';
import type { Lookup } from '../../domain/lookup/lookup';
import { LOOKUPS } from '../../domain/lookup/lookups';
import { agoWords } from '../../domain/report/time-words';
import './lookup.css';

/** Every lookup for the rig in hand: what it decides, and what was kept of it last. */
export function LookupsRoute() {
  const { rig: id } = useParams();
  const rig = useRig(id ?? '');
  const kept = useLookups(rig?.id ?? '');
  const latest = new Map<string, LookupDoc>();
  for (const doc of kept) if (!latest.has(doc.kept.lookup)) latest.set(doc.kept.lookup, doc);
  return (
    <Screen>
      <div className="lookups-page">
        <h1 className="text-lead leading-tight m-0">
          Lookups {rig === undefined ? 'without a rig' : `for ${rig.name}`}
        </h1>
        <ul className="lookups-list">
          {LOOKUPS.map((lookup) => (
            <li key={lookup.key}>
              <Link
                className="lookups-link"
                to={rig === undefined ? paths.lookupWithoutRig(lookup.key) : paths.lookup(lookup.key, rig.id)}
              >
                <b>{lookup.title}</b>
                <span className="muted">{lookup.decides}</span>
                <LastKept lookup={lookup} doc={latest.get(lookup.key)} />
              </Link>
            </li>
          ))}
        </ul>
      </div>
    </Screen>
  );
}

function LastKept({ lookup, doc }: { readonly lookup: Lookup; readonly doc: LookupDoc | undefined }) {
  const { best_ms } = useNow(60_000);
  const lab = useLab();
  const kept = doc === undefined || lab === undefined ? null : readKept(doc.kept);
  if (doc === undefined || kept === null) return null;
  const figures = kept.figures.filter((figure) => figure.weight === 'answer');
  const words = figures.map((figure) => `${figure.label} ${figureLine(figure)}\u2009${figure.unit}`);
  return (
    <span className="muted">
      {kept.pinned ? 'Pinned' : 'Kept'} {agoWords(best_ms - doc.trace.stamp.wall_ms)}
      {words.length === 0 ? '' : `: ${words.join(', ')}`}
      <span className="heard-only">, {lookup.title}</span>
    </span>
  );
}
