import { Fragment, lazy, Suspense, useMemo, type ReactNode } from 'react';
import { Reading } from '../../components/reading';
import { useLookups } from '../../data/use-book';
import type { LabSettings } from '../../domain/book/rig-spec';
import type { RigDoc, RigRevision } from '../../domain/book/documents/rig';
import { pinnedLookups } from '../../domain/lookup/pinned';
import { energyText } from '../../domain/capacitor/energy-text';
import { rigFigures, type RigFigures } from '../../domain/rules/rig-figures';
import { formatQuantity } from '../../domain/units/format-quantity';

interface Props {
  readonly rig: RigDoc;
  readonly revision: RigRevision;
  readonly settings: LabSettings;
}

const PLACES = 3;

// The physics of the gap arrives after the state has been drawn.
const GapPin = lazy(() => import('./gap-pin').then((m) => ({ default: m.GapPin })));
const WorkingEnergy = lazy(() => import('./gap-pin').then((m) => ({ default: m.WorkingEnergy })));
const PinnedLookups = lazy(() => import('./pinned-lookups').then((m) => ({ default: m.PinnedLookups })));

/** Three lookups prefilled from the rig: first what was pinned, then gap, stored energy and wait from the supply's limit. */
export function BenchPins({ rig, revision, settings }: Props) {
  const pinned = pinnedLookups(useLookups(rig.id)).slice(0, PLACES);
  const free = PLACES - pinned.length;
  const defaults = useDefaults({ rig, revision, settings }).filter(
    ({ key }) => !pinned.some(({ kept }) => kept.lookup === key),
  );
  return (
    <section className="bench-pins" aria-label="Pinned lookups">
      {pinned.length === 0 ? null : (
        <Suspense
          fallback={pinned.map((doc) => (
            <div key={doc.id} className="bench-pin" />
          ))}
        >
          <PinnedLookups rig={rig} settings={settings} docs={pinned} />
        </Suspense>
      )}
      {defaults.slice(0, free).map(({ key, pin }) => (
        <Fragment key={key}>{pin}</Fragment>
      ))}
    </section>
  );
}

function useDefaults(props: Props): readonly { readonly key: string; readonly pin: ReactNode }[] {
  const { revision, settings } = props;
  const figures = useMemo(() => rigFigures(revision.spec, settings), [revision.spec, settings]);
  const gap = {
    key: 'gap',
    pin: (
      <Suspense fallback={<div className="bench-pin" />}>
        <GapPin {...props} />
      </Suspense>
    ),
  };
  if (!figures.ok)
    return [gap, { key: 'figures', pin: <p className="bench-pin">{figures.refusal.words}</p> }];
  return [
    gap,
    { key: 'stored', pin: <StoredPin {...props} figures={figures.value} /> },
    { key: 'wait', pin: <WaitPin {...props} figures={figures.value} /> },
  ];
}

function StoredPin({ revision, settings, figures }: Omit<Props, 'rig'> & { readonly figures: RigFigures }) {
  const { supply_kV, supply_mA } = revision.spec.charging;
  return (
    <div className="bench-pin">
      <span className="muted">
        Stored at the supply’s limit, {supply_kV} kV and {supply_mA} mA
      </span>
      <span className="bench-pin-row">
        <Reading value={energyText(figures.stored_J)} unit="J" size="pin" />
        <Suspense fallback={null}>
          <WorkingEnergy revision={revision} settings={settings} />
        </Suspense>
      </span>
      <span className="bench-pin-caution">{sentence(figures.hazard.effect)}</span>
    </div>
  );
}

function WaitPin({ revision, settings, figures }: Omit<Props, 'rig'> & { readonly figures: RigFigures }) {
  const { wait } = figures;
  const title = `Bleed from ${revision.spec.charging.supply_kV} kV, every node to ${settings.discharged_below_V} V`;
  if (wait.type === 'unknown') {
    return (
      <div className="bench-pin">
        <span className="muted">{title}</span>
        <b>{wait.words}</b>
      </div>
    );
  }
  return (
    <div className="bench-pin">
      <span className="muted">{title}</span>
      <span className="bench-pin-row">
        <Reading value={String(wait.wait_s)} unit="s" size="pin" />
        <span className="muted">
          at least; computed{' '}
          {formatQuantity(wait.computed_s, 's', { digits: { decimals: 1 }, rounding: 'up' })}
        </span>
      </span>
    </div>
  );
}

function sentence(words: string): string {
  return words.charAt(0).toUpperCase() + words.slice(1);
}
