import { revisionById, type RigDoc, type RigRevision } from '../../domain/book/documents/rig';
import { momentWords } from '../../domain/report/time-words';
import { specChanges } from '../../domain/rules/loosening';
import { ChangeRow } from './change-row';
import { useNames } from '../../data/use-names';

/** Every revision, newest first, with what it changed and what it cost. */
export function RevisionList({ rig, zone }: { readonly rig: RigDoc; readonly zone: string }) {
  return (
    <section>
      <h2>Revisions</h2>
      <ol className="rig-list" reversed>
        {rig.revisions.toReversed().map((revision) => (
          <li key={revision.entry}>
            <Revision rig={rig} revision={revision} zone={zone} />
          </li>
        ))}
      </ol>
    </section>
  );
}

function Revision({
  rig,
  revision,
  zone,
}: {
  readonly rig: RigDoc;
  readonly revision: RigRevision;
  readonly zone: string;
}) {
  const nameOf = useNames();
  const before = revision.based_on === null ? undefined : revisionById(rig, revision.based_on);
  const changes = before === undefined ? [] : specChanges(before.spec, revision.spec);
  const lost =
    before === undefined ? undefined : rig.permits.findLast((one) => one.rig_revision === before.entry);
  return (
    <>
      <p>
        <b>{revision.number}</b>{' '}
        <span className="muted">
          {momentWords(revision.stamp.wall_ms, zone)}, {nameOf(revision.by)}
          {before === undefined ? '' : `, on ${before.number}`}
        </span>
      </p>
      <p>{revision.why}</p>
      {changes.map((change) => (
        <ChangeRow key={change.field} change={change} topology={revision.spec.topology} />
      ))}
      {lost === undefined || lost.withdrawn !== null || lost.until_ms <= revision.stamp.wall_ms ? null : (
        <p className="muted">It cost the permit granted by {nameOf(lost.by)}.</p>
      )}
    </>
  );
}
