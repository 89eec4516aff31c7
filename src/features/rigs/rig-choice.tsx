import { useNavigate } from 'react-router-dom';
import { GapMark, type GapState } from '../../components/gap-mark';
import { paths } from '../../config/paths';
import { useLab, useRig } from '../../data/use-book';
import { useDeclared, useNow } from '../../data/use-now';
import { headRevisions, latestRevision, type RigDoc } from '../../domain/book/documents/rig';
import { envelopeWords, permitWords } from '../../domain/report/permit-words';
import { agoWords, momentWords } from '../../domain/report/time-words';
import { DECLARED_WORDS, TOPOLOGY_WORDS } from '../../domain/report/words';
import type { DeclaredState, DeclaredView } from '../../domain/rules/declared-view';
import { standingPermit } from '../../domain/rules/readiness';
import { useNames } from '../../data/use-names';

const MARKS: Readonly<Record<DeclaredState, GapState>> = {
  shorted: 'bridged',
  'short-off': 'open',
  firing: 'jagged',
  'not-known': 'dashed',
};

/** One rig in the list: its mark, what was declared, its revision and permit. */
export function RigChoice({ id }: { readonly id: string }) {
  const rig = useRig(id);
  const view = useDeclared(id);
  const lab = useLab();
  const navigate = useNavigate();
  if (rig === undefined || view === undefined) return null;
  const zone = lab?.settings.zone ?? 'Etc/UTC';
  return (
    <button type="button" className="rig-choice" onClick={() => void navigate(paths.benchOf(rig.id))}>
      <GapMark state={MARKS[view.state]} hatched={view.stood_down.length > 0} />
      <span>
        <b className="name">{rig.name}</b>
        <br />
        <b>{DECLARED_WORDS[view.state]}</b> <Age view={view} zone={zone} />
        <StoodDown view={view} />
      </span>
      <RevisionAndPermit rig={rig} zone={zone} />
    </button>
  );
}

function Age({ view, zone }: { readonly view: DeclaredView; readonly zone: string }) {
  const nameOf = useNames();
  if (view.trace === null) return <span className="muted">nothing declared yet</span>;
  const when = view.age_ms === null ? momentWords(view.trace.stamp.wall_ms, zone) : agoWords(view.age_ms);
  const why = view.why === null ? '' : `${view.why}, `;
  return <span className="muted">{`${why}${when}, ${nameOf(view.trace.by)}`}</span>;
}

function StoodDown({ view }: { readonly view: DeclaredView }) {
  const nameOf = useNames();
  const [down] = view.stood_down;
  if (down === undefined) return null;
  return (
    <>
      <br />
      <b>Stood down</b> by {nameOf(down.by)}: {down.why}
    </>
  );
}

function RevisionAndPermit({ rig, zone }: { readonly rig: RigDoc; readonly zone: string }) {
  const { best_ms } = useNow(60_000);
  const latest = latestRevision(rig);
  const permit = standingPermit(rig, best_ms);
  const parted = headRevisions(rig).length > 1;
  return (
    <span>
      Revision {latest.number}, {TOPOLOGY_WORDS[latest.spec.topology]}
      <br />
      {parted ? <b>Two revisions stand against each other: nobody may fire.</b> : null}
      {!parted && permit !== null ? (
        <>
          {permitWords(permit, zone)}
          <br />
          <span className="muted">{envelopeWords(permit.envelope)}</span>
        </>
      ) : null}
      {!parted && permit === null ? <b>No permit</b> : null}
    </span>
  );
}
