import { useIncidents } from '../../data/use-book';
import type { IncidentDoc } from '../../domain/book/documents/incident';
import type { RigDoc } from '../../domain/book/documents/rig';
import { momentWords } from '../../domain/report/time-words';
import { ActForm } from './act-form';
import { ActOutcome } from './act-outcome';
import { useAct } from './use-act';
import { useMay } from './use-may';
import { useNames } from '../../data/use-names';

/** Incidents of the rig, the open ones first with what can be answered. */
export function IncidentSection({ rig, zone }: { readonly rig: RigDoc; readonly zone: string }) {
  const incidents = useIncidents(rig.id);
  const open = incidents.filter((one) => one.closed === null);
  const closed = incidents.filter((one) => one.closed !== null);
  if (incidents.length === 0) return null;
  return (
    <section className="desk-form" aria-label="Incidents">
      <h3>{open.length === 0 ? 'No open incident' : 'Open incidents'}</h3>
      {open.map((incident) => (
        <OpenIncident key={incident.id} incident={incident} zone={zone} />
      ))}
      {closed.length === 0 ? null : (
        <details>
          <summary>{closed.length} closed before</summary>
          {closed.map((incident) => (
            <Told key={incident.id} incident={incident} zone={zone} />
          ))}
        </details>
      )}
    </section>
  );
}

function OpenIncident({ incident, zone }: { readonly incident: IncidentDoc; readonly zone: string }) {
  const may = useMay();
  const act = useAct();
  return (
    <div className="desk-form">
      <Told incident={incident} zone={zone} />
      {may('incident.answered') ? (
        <>
          <ActForm
            draft={`desk/answer/${incident.id}`}
            wordsLabel="Answer"
            needed="Write the answer first."
            hold="half-second"
            label="Answer"
            holdLabel="Hold: answer the incident"
            hindrance={null}
            onComplete={(words) =>
              act.log({ kind: 'incident.answered', subject: incident.id, body: { words } })
            }
          />
          <ActForm
            draft={`desk/close/${incident.id}`}
            wordsLabel="What came of it"
            hint="closing does not return the rig"
            needed="Say what came of it."
            label="Close incident"
            holdLabel="Hold: close the incident"
            hindrance={null}
            onComplete={(words) =>
              act.log({ kind: 'incident.closed', subject: incident.id, body: { words } })
            }
          />
        </>
      ) : (
        <p className="muted">Answering is for a reviewer or a lead.</p>
      )}
      {act.logged === null ? null : <ActOutcome entry={act.logged} />}
    </div>
  );
}

function Told({ incident, zone }: { readonly incident: IncidentDoc; readonly zone: string }) {
  const nameOf = useNames();
  const { what, near, made_safe, reported, answers, closed } = incident;
  const said = [...answers, ...(closed === null ? [] : [closed])];
  return (
    <div>
      <p>
        <b>{what}</b>{' '}
        <span className="muted">
          {nameOf(reported.by)}, {momentWords(reported.stamp.wall_ms, zone)}
        </span>
      </p>
      {near === '' ? null : <p>Near: {near}</p>}
      {made_safe === '' ? null : <p>Made safe: {made_safe}</p>}
      {said.map((one) => (
        <p key={one.entry}>
          {one === closed ? 'Closed: ' : ''}
          {one.words}{' '}
          <span className="muted">
            {nameOf(one.by)}, {momentWords(one.stamp.wall_ms, zone)}
          </span>
        </p>
      ))}
    </div>
  );
}
