import { useParams } from 'react-router-dom';
import { Reading } from '../../components/reading';
import { WideMark } from '../../components/wide-mark';
import { useAuthor } from '../../data/use-author';
import { useFirings, useLab, useReadings, useRig } from '../../data/use-book';
import { useNames } from '../../data/use-names';
import { useDeclared, useNow } from '../../data/use-now';
import { standingReading } from '../../domain/book/documents/reading';
import { latestRevision, type RigDoc } from '../../domain/book/documents/rig';
import type { LabSettings } from '../../domain/book/rig-spec';
import { ageWords, clockWords, dayWords } from '../../domain/report/time-words';
import { DECLARED_WORDS } from '../../domain/report/words';
import { energyText } from '../../domain/capacitor/energy-text';
import { rigFigures } from '../../domain/rules/rig-figures';
import { formatFigure } from '../../domain/units/format-quantity';
import { Screen } from '../../components/frame';
import type { DeclaredView } from '../../domain/rules/declared-view';
import { peopleWords } from './people-words';
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
  const by = useAuthor(rig, view.trace);
  const down = useAuthor(rig, view.stood_down[0] ?? null);
  const nameOf = useNames();
  const { stamp } = useNow(10_000);
  const drawn = stripState(view);
  const last = readings.at(-1);
  const now = last === undefined ? null : standingReading(last);
  const firing = view.state === 'firing' && open !== undefined;
  const figures = firing
    ? firingFigures(now?.type === 'stands' ? now.values : null, open.shots)
    : standingFigures(rig, settings, stamp.wall_ms);
  const age = view.age_ms === null ? '' : ageWords(view.age_ms);
  const detail = view.state === 'not-known' ? (view.why ?? '') : `${age}${by === '' ? '' : `, ${by}`}`;
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
              {DECLARED_WORDS[view.state]}
              {drawn.hatched ? <span className="bench-face-down">Stood down by {down}</span> : null}
            </p>
          }
        >
          {rig.hands.length + rig.guests.length === 0 ? null : (
            <p className="bench-face-people">
              <b>{peopleWords(rig, nameOf, stamp)}</b>
            </p>
          )}
        </WideMark>
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

  function standingFigures(doc: RigDoc, lab: LabSettings, now_ms: number): readonly FaceReading[] {
    const { spec } = latestRevision(doc);
    const derived = rigFigures(spec, lab);
    const stored = derived.ok ? energyText(derived.value.stored_J) : '\u2013';
    const wait =
      derived.ok && derived.value.wait.type === 'known' ? String(derived.value.wait.wait_s) : 'not known';
    return [
      { label: 'supply’s limit', value: String(spec.charging.supply_kV), unit: 'kV' },
      { label: 'stored at limit', value: stored, unit: 'J' },
      { label: 'wait at least', value: wait, unit: wait === 'not known' ? '' : 's' },
      {
        label: 'last declared short',
        value: lastShort(doc, lab.zone, now_ms),
        unit: '',
      },
    ];
  }
}

/** Clock time alone would pass for today's. */
function lastShort({ last_short }: RigDoc, zone: string, now_ms: number): string {
  if (last_short === null) return 'never';
  const { wall_ms } = last_short.stamp;
  return dayWords(wall_ms, zone) === dayWords(now_ms, zone)
    ? clockWords(wall_ms, zone)
    : dayWords(wall_ms, zone);
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
