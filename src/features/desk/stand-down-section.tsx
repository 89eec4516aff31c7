import { useIncidents } from '../../data/use-book';
import { unliftedStandDowns, type RigDoc } from '../../domain/book/documents/rig';
import type { Trace } from '../../domain/book/documents/trace';
import { momentWords } from '../../domain/report/time-words';
import { ActForm } from './act-form';
import { ActOutcome, ForecastWords } from './act-outcome';
import { useAct, useForecast } from './use-act';
import { useMay } from './use-may';
import { useAuthor } from '../../data/use-author';

interface Props {
  readonly rig: RigDoc;
  readonly zone: string;
}

/** What stands the rig down, and returning it by naming every one of them. */
export function StandDownSection({ rig, zone }: Props) {
  const act = useAct();
  const standing = unliftedStandDowns(rig);
  return (
    <section className="desk-form" aria-label="Stand-downs">
      <h3>{standing.length === 0 ? 'Not stood down' : 'Stood down'}</h3>
      {standing.length === 0 ? null : <Return rig={rig} zone={zone} />}
      <ActForm
        draft={`desk/stand-down/${rig.id}`}
        wordsLabel={standing.length === 0 ? 'Why to stand it down' : 'Another reason to stand it down'}
        needed="Say why it is stood down."
        label="Stand rig down"
        holdLabel={`Hold: stand ${rig.name} down`}
        hindrance={null}
        onComplete={(why) => act.log({ kind: 'rig.stood-down', subject: rig.id, body: { why } })}
      />
      {act.logged === null ? null : <ActOutcome entry={act.logged} />}
    </section>
  );
}

function Return({ rig, zone }: Props) {
  const may = useMay();
  const act = useAct();
  const incidents = useIncidents(rig.id);
  const standing = unliftedStandDowns(rig);
  const lifts = standing.map((down) => down.entry);
  const allowed = may('rig.returned');
  const forecast = useForecast(
    allowed ? { kind: 'rig.returned', subject: rig.id, body: { lifts, words: 'asked beforehand' } } : null,
    lifts.join(),
  );
  return (
    <>
      <ul className="desk-list" aria-label="What stands">
        {standing.map((down) => (
          <li key={down.entry}>
            {incidents.some((one) => one.id === down.entry) ? <b>Incident: </b> : null}
            {down.why}
            <br />
            <span className="muted">
              <Author rig={rig} trace={down} />, {momentWords(down.stamp.wall_ms, zone)}
              {down.at === null ? ', not yet at the server' : `, revision ${down.at}`}
            </span>
          </li>
        ))}
      </ul>
      {allowed ? (
        <ActForm
          draft={`desk/return/${rig.id}`}
          wordsLabel="What was mended"
          needed="Say what was mended."
          main
          label={standing.length === 1 ? 'Return rig' : `Return rig, lift all ${standing.length}`}
          holdLabel={`Hold: return ${rig.name}`}
          hindrance={forecast.against?.words ?? null}
          onComplete={(words) => act.log({ kind: 'rig.returned', subject: rig.id, body: { lifts, words } })}
        >
          <p className="muted">
            It lifts what stands above and nothing else: a stand-down that comes in meanwhile goes on
            standing.
          </p>
          <ForecastWords forecast={forecast} />
        </ActForm>
      ) : (
        <p className="muted">Returning a rig is for a reviewer or a lead.</p>
      )}
      {act.logged === null ? null : <ActOutcome entry={act.logged} />}
    </>
  );
}

function Author({ rig, trace }: { readonly rig: RigDoc; readonly trace: Trace }) {
  return useAuthor(rig, trace);
}
