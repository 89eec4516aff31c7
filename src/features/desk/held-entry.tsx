import { HoldButton } from '../../components/hold-button';
import { usePerson, useRig } from '../../data/use-book';
import { useSession } from '../../data/use-session';
import type { HeldDoc } from '../../domain/book/documents/held';
import { entryFields, entrySubstance, kindWords } from '../../domain/report/entry-words';
import { momentWords } from '../../domain/report/time-words';
import { heldOptions } from '../../domain/rules/held-options';
import { ActForm } from './act-form';
import { ActOutcome, ForecastWords } from './act-outcome';
import { reasonWords } from '../../domain/report/reason-words';
import { useAct, useForecast } from './use-act';
import { useNames } from '../../data/use-names';

export function HeldEntry({ held, zone }: { readonly held: HeldDoc; readonly zone: string }) {
  const nameOf = useNames();
  const { entry, reason, at } = held;
  const rig = useRig(entry.subject);
  return (
    <section className="desk-held" aria-label={`${kindWords(entry.kind)}, held back`}>
      <h3>
        {kindWords(entry.kind)}
        {rig === undefined ? '' : `, ${rig.name}`}
      </h3>
      <p>
        <b>{reasonWords(reason)}</b>
      </p>
      <p>{entrySubstance(entry, zone)}</p>
      <p className="muted">
        {nameOf(entry.author)}, {momentWords(entry.stamp.wall_ms, zone)}
        {at === null ? '' : `, revision ${at}`}, hash {entry.entry_sha.slice(0, 16)}
      </p>
      <details>
        <summary>The whole text</summary>
        <dl className="desk-facts">
          {entryFields(entry).map(({ field, value }) => (
            <div key={field}>
              <dt>{field}</dt>
              <dd>{value}</dd>
            </div>
          ))}
        </dl>
      </details>
      <HeldActions held={held} />
    </section>
  );
}

function HeldActions({ held }: { readonly held: HeldDoc }) {
  const session = useSession();
  const me = usePerson(session.state === 'open' ? session.person.id : null);
  const { adopt, dismiss } = heldOptions(held, me ?? null);
  const act = useAct();
  const adoption = {
    kind: 'entry.adopted',
    subject: held.entry.subject,
    body: { adopts: [held.id] },
  } as const;
  const forecast = useForecast(adopt.may ? adoption : null, held.id);
  const confirms = held.reason.cause === 'confirm';
  return (
    <div className="desk-form">
      <p className="muted">
        {adopt.words} {dismiss.words}
      </p>
      {adopt.may ? (
        <>
          <ForecastWords forecast={forecast} />
          <div className="desk-buttons">
            <HoldButton
              main
              label={confirms ? 'Confirm' : 'Adopt'}
              hold="second"
              holdLabel={`Hold: ${confirms ? 'confirm' : 'adopt'} the held-back entry`}
              disabled={forecast.against !== null}
              {...(forecast.against === null ? {} : { reason: forecast.against.words })}
              onComplete={() => act.log(adoption)}
            />
          </div>
        </>
      ) : null}
      {dismiss.may ? (
        <ActForm
          draft={`desk/dismiss/${held.id}`}
          wordsLabel="Why it is dismissed"
          needed="Say why it is dismissed."
          label="Dismiss"
          holdLabel="Hold: dismiss the held-back entry"
          hindrance={null}
          onComplete={(why) =>
            act.log({ kind: 'entry.struck', subject: held.entry.subject, body: { strikes: held.id, why } })
          }
        />
      ) : null}
      {act.logged === null ? null : <ActOutcome entry={act.logged} />}
    </div>
  );
}
