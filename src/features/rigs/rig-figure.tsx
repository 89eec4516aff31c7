import { Link } from 'react-router-dom';
import { Caution } from '../../components/caution';
import { TwoFaces } from '../../components/two-faces';
import { paths } from '../../config/paths';
import { useNow } from '../../data/use-now';
import { headRevisions, latestRevision, type RigDoc } from '../../domain/book/documents/rig';
import type { LabSettings, RigSpec } from '../../domain/book/rig-spec';
import { envelopeWords, permitOver, permitWords } from '../../domain/report/permit-words';
import { dayWords } from '../../domain/report/time-words';
import { TOPOLOGY_WORDS } from '../../domain/report/words';
import { standingPermit } from '../../domain/rules/readiness';
import type { RigView } from './figures-view';
import { Gas } from './gas';
import { NodeList } from './node-list';
import { RevisionList } from './revision-list';
import { RigCircuit } from './rig-circuit';
import { useNames } from '../../data/use-names';

interface Props {
  readonly rig: RigDoc;
  readonly view: RigView;
  readonly settings: LabSettings;
}

export function RigFigure({ rig, view, settings }: Props) {
  const { number, spec } = latestRevision(rig);
  const count = spec.nodes.length;
  const rings = count === 1 ? 'ring 1' : `rings 1 ${count === 2 ? 'and' : 'to'} ${count}`;
  return (
    <div className="rig-page">
      <div className="rig-head">
        <h1>
          {rig.name}, revision {number}
        </h1>
        <span className="muted">
          {TOPOLOGY_WORDS[spec.topology]}, gap in <Gas name={spec.gap.gas} />. Short {rings} each by itself.
        </span>
      </div>
      <Parting rig={rig} />
      <RigCircuit name={rig.name} spec={spec} view={view} />
      {view.hazard === null ? null : <Caution>Stored: {view.hazard}</Caution>}
      <div className="rig-columns">
        <SelfBreak spec={spec} view={view} settings={settings} />
        <PermitBlock rig={rig} zone={settings.zone} />
        <NodeList spec={spec} view={view} />
        <ShortingPoints spec={spec} />
      </div>
      <RevisionList rig={rig} zone={settings.zone} />
    </div>
  );
}

function Parting({ rig }: { readonly rig: RigDoc }) {
  const heads = headRevisions(rig);
  if (heads.length < 2) return null;
  return (
    <Caution>
      Revisions {heads.map((head) => head.number).join(' and ')} stand against each other. The stricter limit
      of each pair rules, and nobody may fire until a reviewer settles it.{' '}
      <Link to={paths.deskRig(rig.id)}>To the Desk</Link>
    </Caution>
  );
}

function SelfBreak({ spec, view, settings }: { readonly spec: RigSpec } & Omit<Props, 'rig'>) {
  const at = `${spec.gap.highest_bar_g}\u2009bar(g)`;
  if (!view.sides.ok) {
    return (
      <section>
        <h2>Self-break at {at}</h2>
        <p>{view.sides.words}</p>
      </section>
    );
  }
  const { low, law, high, warnings } = view.sides.value;
  return (
    <section>
      <h2>Self-break at {at}, the highest</h2>
      <TwoFaces
        label={`Nothing fires below ${low} kV, the law says ${law}, it may hold up to ${high} kV`}
        low={low}
        middle={law}
        high={high}
        unit="kV"
        size="read"
      />
      <p className="muted">
        Nothing fires below, law, may hold up to. Ambient {settings.ambient_bar_abs}
        {'\u2009'}bar(abs), {settings.ambient_C}
        {'\u2009'}°C, {spec.gap.irradiated ? 'with UV on the gap' : 'without UV on the gap'}.
      </p>
      {view.may_sit_charged === null ? null : <Caution>{view.may_sit_charged}</Caution>}
      {warnings.map((words) => (
        <Caution key={words}>{words}</Caution>
      ))}
    </section>
  );
}

function PermitBlock({ rig, zone }: { readonly rig: RigDoc; readonly zone: string }) {
  const { best_ms } = useNow(60_000);
  const nameOf = useNames();
  const { spec } = latestRevision(rig);
  const permit = standingPermit(rig, best_ms);
  const last = rig.permits.at(-1);
  return (
    <section>
      <h2>{permit === null ? 'No permit rules' : permitWords(permit, zone)}</h2>
      {permit !== null ? (
        <p>
          {envelopeWords(permit.envelope)}, by {nameOf(permit.by)}
        </p>
      ) : null}
      {permit === null && last !== undefined ? (
        <p className="muted">
          The last one, to {dayWords(last.until_ms, zone)}: {permitOver(last, rig, best_ms) ?? 'not ruling'}.
        </p>
      ) : null}
      <p>
        <span className="muted">Envelope of the rig</span>
        <br />
        {envelopeWords(spec.envelope)}
      </p>
      <p>
        <Link to={paths.deskRig(rig.id)} className="underline">
          Permit and stand-downs at the Desk
        </Link>
      </p>
    </section>
  );
}

function ShortingPoints({ spec }: { readonly spec: RigSpec }) {
  return (
    <section>
      <h2>Short each by itself</h2>
      <ul className="rig-list">
        {spec.shorting_points.map((point) => (
          <li key={point}>{point}</li>
        ))}
      </ul>
    </section>
  );
}
