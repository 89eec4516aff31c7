import { Link } from 'react-router-dom';
import { paths } from '../../config/paths';
import { useNow } from '../../data/use-now';
import { latestRevision, type RigDoc } from '../../domain/book/documents/rig';
import type { LabSettings, RigSpec } from '../../domain/book/rig-spec';
import { envelopeWords, permitOver, permitWords } from '../../domain/report/permit-words';
import { dayWords } from '../../domain/report/time-words';
import { TOPOLOGY_WORDS } from '../../domain/report/words';
import { standingPermit } from '../../domain/rules/readiness';
import { DerivedBlock, Hazard, Wave } from './derived-block';
import { Gas } from './gas';
import { PartingView } from './parting-view';
import { RevisionList } from './revision-list';
import { RigCircuit } from './rig-circuit';
import type { RigDerivedView } from './use-rig-derived';
import { useNames } from '../../data/use-names';

interface Props {
  readonly rig: RigDoc;
  readonly view: RigDerivedView;
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
      <PartingView rig={rig} zone={settings.zone} />
      <RigCircuit name={rig.name} spec={spec} derived={view.derived} />
      <div className="rig-wave">
        <Wave view={view} />
        <div>
          <PermitBlock rig={rig} zone={settings.zone} />
          <p>
            <Link to={paths.rigParts(rig.id)} className="rig-link">
              Parts and wear
            </Link>
          </p>
          <p>
            <Link to={paths.notesOf('rig', rig.id)} className="rig-link">
              Notes and photos
            </Link>
          </p>
          <ShortingPoints spec={spec} />
        </div>
      </div>
      <Hazard view={view} />
      <DerivedBlock spec={spec} settings={settings} view={view} />
      <RevisionList rig={rig} zone={settings.zone} />
    </div>
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
