import { Link, useParams } from 'react-router-dom';
import { SaysBlock } from '../../components/says-block';
import { paths } from '../../config/paths';
import { useLab, useRig } from '../../data/use-book';
import { latestRevision } from '../../domain/book/documents/rig';
import { envelopeWords } from '../../domain/report/permit-words';
import { momentWords } from '../../domain/report/time-words';
import { DeskScreen } from './desk-screen';
import { IncidentSection } from './incident-section';
import { PaperSection } from './paper-section';
import { PartingSection } from './parting-section';
import { PermitSection, WithdrawSection } from './permit-section';
import { StandDownSection } from './stand-down-section';
import { useNames } from '../../data/use-names';

/** What a reviewer decides about one rig: permit, stand-downs, incidents, partings. */
export function DeskRigRoute() {
  const { rig = '' } = useParams();
  return (
    <DeskScreen chosen={rig}>
      <OpenedRig key={rig} id={rig} />
    </DeskScreen>
  );
}

function OpenedRig({ id }: { readonly id: string }) {
  const rig = useRig(id);
  const zone = useLab()?.settings.zone ?? 'Etc/UTC';
  const nameOf = useNames();
  if (rig === undefined)
    return <SaysBlock lead="This rig is not in the tablet’s Book.">It may still be filling.</SaysBlock>;
  const latest = latestRevision(rig);
  return (
    <article className="desk-firing">
      <header>
        <h2>
          {rig.name}, revision {latest.number}
        </h2>
        <p className="muted">
          {nameOf(latest.by)}, {momentWords(latest.stamp.wall_ms, zone)}: {latest.why.replace(/\.$/, '')}.
          Envelope {envelopeWords(latest.spec.envelope)}.{' '}
          <Link to={paths.rig(rig.id)} className="underline">
            The whole rig
          </Link>
        </p>
      </header>
      <PartingSection rig={rig} />
      <div className="desk-columns">
        <PermitSection rig={rig} zone={zone} />
        <div className="desk-column">
          <StandDownSection rig={rig} zone={zone} />
          <WithdrawSection rig={rig} />
          <IncidentSection rig={rig} zone={zone} />
        </div>
      </div>
      <PaperSection rig={rig.id} />
    </article>
  );
}
