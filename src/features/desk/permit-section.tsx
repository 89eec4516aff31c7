import { useNow } from '../../data/use-now';
import { revisionById, latestRevision, type RigDoc } from '../../domain/book/documents/rig';
import { specChangeWords } from '../../domain/report/spec-words';
import { envelopeWords, permitOver, permitWords } from '../../domain/report/permit-words';
import { momentWords } from '../../domain/report/time-words';
import { specChanges } from '../../domain/rules/loosening';
import { standingPermit } from '../../domain/rules/readiness';
import { ActForm } from './act-form';
import { ActOutcome } from './act-outcome';
import { PermitGrant } from './permit-grant';
import { useAct } from './use-act';
import { useMay } from './use-may';
import { useNames } from '../../data/use-names';

interface Props {
  readonly rig: RigDoc;
  readonly zone: string;
}

export function PermitSection({ rig, zone }: Props) {
  const { best_ms } = useNow(60_000);
  const permit = standingPermit(rig, best_ms);
  const may = useMay();
  const nameOf = useNames();
  return (
    <section className="desk-column" aria-label="Permit">
      <h3>{permit === null ? 'No permit rules' : permitWords(permit, zone)}</h3>
      <Asked rig={rig} zone={zone} />
      {permit === null ? (
        <LastPermit rig={rig} now_ms={best_ms} zone={zone} />
      ) : (
        <p>
          {envelopeWords(permit.envelope)}, by {nameOf(permit.by)}
        </p>
      )}
      {may('permit.granted') ? (
        <PermitGrant rig={rig} zone={zone} />
      ) : (
        <p className="muted">Granting a permit is for a reviewer or a lead.</p>
      )}
    </section>
  );
}

function Asked({ rig, zone }: Props) {
  const nameOf = useNames();
  const asked = rig.permits_asked.filter((one) => !one.answered && rig.heads.includes(one.rig_revision));
  return asked.map((one) => (
    <p key={one.entry}>
      <b>Asked by {nameOf(one.by)}</b>, {momentWords(one.stamp.wall_ms, zone)}
      {one.words === '' ? '' : `: ${one.words}`}
    </p>
  ));
}

function LastPermit({ rig, now_ms, zone }: Props & { readonly now_ms: number }) {
  const last = rig.permits.at(-1);
  if (last === undefined) return <p className="muted">This rig never had one.</p>;
  const latest = latestRevision(rig);
  const before = revisionById(rig, last.rig_revision);
  const changes = before === undefined ? [] : specChanges(before.spec, latest.spec);
  return (
    <div>
      <p className="muted">
        The last one, {envelopeWords(last.envelope)} to {momentWords(last.until_ms, zone)}:{' '}
        {permitOver(last, rig, now_ms) ?? 'not ruling while a parting stands'}.
      </p>
      {changes.length === 0 ? null : (
        <ul className="desk-list" aria-label="Changed since that permit">
          {changes.map((change) => (
            <li key={change.field}>
              {specChangeWords(change, latest.spec.topology)}
              {change.loosens ? <b> Loosens.</b> : null}
            </li>
          ))}
        </ul>
      )}
    </div>
  );
}

/** Taking a permit back rules on this tablet at once, before the server has heard of it. */
export function WithdrawSection({ rig }: { readonly rig: RigDoc }) {
  const { best_ms } = useNow(60_000);
  const may = useMay();
  const act = useAct();
  const permit = standingPermit(rig, best_ms);
  const said = act.logged === null ? null : <ActOutcome entry={act.logged} />;
  if (permit === null || !may('permit.withdrawn')) return said;
  return (
    <section className="desk-form" aria-label="Withdraw the permit">
      <h3>Withdraw the permit</h3>
      <ActForm
        draft={`desk/withdraw/${permit.entry}`}
        wordsLabel="Why it is withdrawn"
        needed="Say why it is withdrawn."
        label="Withdraw permit"
        holdLabel={`Hold: withdraw the permit of ${rig.name}`}
        hindrance={null}
        onComplete={(why) =>
          act.log({ kind: 'permit.withdrawn', subject: rig.id, body: { permit: permit.entry, why } })
        }
      />
      {said}
    </section>
  );
}
