import { Fragment, lazy, Suspense, useMemo, type ReactNode } from 'react';
import { Link } from 'react-router-dom';
import { Reading } from '../../components/reading';
import { TwoFaces } from '../../components/two-faces';
import { paths } from '../../config/paths';
import { useLookups } from '../../data/use-book';
import type { LabSettings } from '../../domain/book/rig-spec';
import type { RigDoc, RigRevision } from '../../domain/book/documents/rig';
import { selfBreak } from '../../domain/gap/self-break';
import { pinnedLookups } from '../../domain/lookup/kept';
import { gapInputOf } from '../../domain/rules/rig-gap';
import { rigFigures, storedAt_J, type RigFigures } from '../../domain/rules/rig-figures';
import { formatFigure, formatQuantity } from '../../domain/units/format-quantity';

interface Props {
  readonly rig: RigDoc;
  readonly revision: RigRevision;
  readonly settings: LabSettings;
}

const PLACES = 3;

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
  const gap = { key: 'gap', pin: <GapPin {...props} /> };
  if (!figures.ok)
    return [gap, { key: 'figures', pin: <p className="bench-pin">{figures.refusal.words}</p> }];
  return [
    gap,
    { key: 'stored', pin: <StoredPin {...props} figures={figures.value} /> },
    { key: 'wait', pin: <WaitPin {...props} figures={figures.value} /> },
  ];
}

function GapPin({ rig, revision, settings }: Props) {
  const { lowest_bar_g, highest_bar_g } = revision.spec.gap;
  const pressure_bar_g = (lowest_bar_g + highest_bar_g) / 2;
  const answer = selfBreak(
    gapInputOf(revision.spec, {
      pressure_bar_g,
      ambient_bar_abs: settings.ambient_bar_abs,
      temperature_C: settings.ambient_C,
    }),
  );
  const at = `${formatFigure(pressure_bar_g, { digits: { decimals: 2 }, rounding: 'nearest' })} bar(g)`;
  return (
    <Link className="bench-pin" to={paths.gapLookup(rig.id)}>
      <span className="muted">Gap at {at}: breaks between</span>
      {answer.ok ? (
        <TwoFaces
          label={`Gap at ${at}`}
          low={one(answer.value.low_kV, 'down')}
          middle={one(answer.value.law_kV, 'nearest')}
          high={one(answer.value.high_kV, 'up')}
          unit="kV"
        />
      ) : (
        <span>{answer.refusal.words}</span>
      )}
    </Link>
  );
}

function StoredPin({ revision, settings, figures }: Omit<Props, 'rig'> & { readonly figures: RigFigures }) {
  const { supply_kV, supply_mA } = revision.spec.charging;
  const working = workingPoint_kV(revision, settings);
  const stored = working === null ? null : storedAt_J(revision.spec, working);
  return (
    <div className="bench-pin">
      <span className="muted">
        Stored at the supply’s limit, {supply_kV} kV and {supply_mA} mA
      </span>
      <span className="bench-pin-row">
        <Reading value={energy(figures.stored_J)} unit="J" size="pin" />
        {stored?.ok === true && working !== null ? (
          <span className="muted nowrap">
            {energy(stored.value)} J at {one(working, 'nearest')} kV
          </span>
        ) : null}
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

function workingPoint_kV(revision: RigRevision, settings: LabSettings): number | null {
  const { lowest_bar_g, highest_bar_g } = revision.spec.gap;
  const answer = selfBreak(
    gapInputOf(revision.spec, {
      pressure_bar_g: (lowest_bar_g + highest_bar_g) / 2,
      ambient_bar_abs: settings.ambient_bar_abs,
      temperature_C: settings.ambient_C,
    }),
  );
  return answer.ok ? answer.value.law_kV : null;
}

function one(value: number, rounding: 'up' | 'down' | 'nearest'): string {
  return formatFigure(value, { digits: { decimals: 1 }, rounding });
}

/** Energies round up: two decimals, three below a tenth of a joule. */
function energy(value_J: number): string {
  return formatFigure(value_J, { digits: { decimals: value_J < 0.1 ? 3 : 2 }, rounding: 'up' });
}

function sentence(words: string): string {
  return words.charAt(0).toUpperCase() + words.slice(1);
}
