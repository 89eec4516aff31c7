import { useParams } from 'react-router-dom';
import { Reading } from '../../components/reading';
import { WideMark } from '../../components/wide-mark';
import { useFirings, useLab, usePerson, useReadings, useRig } from '../../data/use-book';
import { useDeclared } from '../../data/use-now';
import { standingReading } from '../../domain/book/documents/reading';
import { latestRevision, type RigDoc } from '../../domain/book/documents/rig';
import type { LabSettings } from '../../domain/book/rig-spec';
import { ageWords, clockWords } from '../../domain/report/time-words';
import { DECLARED_WORDS } from '../../domain/report/words';
import { rigFigures } from '../../domain/rules/rig-figures';
import { formatFigure } from '../../domain/units/format-quantity';
import { Screen } from '../../components/frame';
import type { DeclaredView } from '../../domain/rules/declared-view';
import { stripState } from './strip-state';

interface FaceReading {
  readonly label: string;
  readonly value: string;
  readonly unit: string;
}

/** The state word legible at three metres, with the four numbers that matter now. */
export function BenchFaceRoute() {
  const { rig: id } = useParams();
  const rig = useRig(id ?? '');
  const view = useDeclared(id ?? '');
  const lab = useLab();
  if (rig === undefined || view === undefined || lab === undefined) return <Screen>{null}</Screen>;
  return <Face rig={rig} view={view} settings={lab.settings} />;
}

function Face({
  rig,
  view,
  settings,
}: {
  readonly rig: RigDoc;
  readonly view: DeclaredView;
  readonly settings: LabSettings;
}) {
  const firings = useFirings(rig.id);
  const open = firings.find((firing) => rig.open_firings.includes(firing.id));
  const { readings } = useReadings(open?.id ?? '');
  const by = usePerson(view.trace?.by ?? null);
  const drawn = stripState(view);
  const last = readings.at(-1);
  const now = last === undefined ? null : standingReading(last);
  const firing = view.state === 'firing' && open !== undefined;
  const figures = firing
    ? firingFigures(now?.type === 'stands' ? now.values : null, open.shots)
    : standingFigures(rig, settings);
  const age = view.age_ms === null ? '' : ageWords(view.age_ms);
  const detail =
    view.state === 'not-known' ? (view.why ?? '') : `${age}${by === undefined ? '' : `, ${by.name}`}`;
  return (
    <Screen>
      <div className="bench-face">
        <p className="bench-face-head">
          <b>{rig.name}</b>
          <span className="muted">{detail}</span>
        </p>
        <WideMark
          state={drawn.mark}
          hatched={drawn.hatched}
          solid={firing}
          title={
            <p className="bench-face-words" role="status">
              {drawn.hatched ? `${DECLARED_WORDS[view.state]}. Stood down` : DECLARED_WORDS[view.state]}
            </p>
          }
        />
        <dl className="bench-face-readings">
          {figures.map((one) => (
            <div key={one.label}>
              <dt className="muted">{one.label}</dt>
              <dd>
                <Reading value={one.value} unit={one.unit} size="pin" />
              </dd>
            </div>
          ))}
        </dl>
      </div>
    </Screen>
  );

  function standingFigures(doc: RigDoc, lab: LabSettings): readonly FaceReading[] {
    const { spec } = latestRevision(doc);
    const derived = rigFigures(spec, lab);
    const stored = derived.ok
      ? formatFigure(derived.value.stored_J, { digits: { decimals: 2 }, rounding: 'up' })
      : '\u2013';
    const wait =
      derived.ok && derived.value.wait.type === 'known' ? String(derived.value.wait.wait_s) : 'not known';
    return [
      { label: 'supply’s limit', value: String(spec.charging.supply_kV), unit: 'kV' },
      { label: 'stored at limit', value: stored, unit: 'J' },
      { label: 'wait at least', value: wait, unit: wait === 'not known' ? '' : 's' },
      {
        label: 'last declared short',
        value: doc.last_short === null ? '\u2013' : clockWords(doc.last_short.stamp.wall_ms, lab.zone),
        unit: '',
      },
    ];
  }
}

function firingFigures(
  values: {
    readonly voltage_kV: number;
    readonly pressure_bar_g: number;
    readonly rate_Hz: number | null;
  } | null,
  shots: number,
): readonly FaceReading[] {
  const figure = (value: number | null | undefined, decimals: number) =>
    value === null || value === undefined
      ? '\u2013'
      : formatFigure(value, { digits: { decimals }, rounding: 'nearest' });
  return [
    { label: 'last voltage', value: figure(values?.voltage_kV, 1), unit: 'kV' },
    { label: 'pressure', value: figure(values?.pressure_bar_g, 2), unit: 'bar(g)' },
    { label: 'rate', value: figure(values?.rate_Hz, 1), unit: 'Hz' },
    { label: 'shots', value: figure(shots, 0), unit: '' },
  ];
}
