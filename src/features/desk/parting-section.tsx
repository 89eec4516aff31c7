import { useState } from 'react';
import { Choice } from '../../components/choice';
import { headRevisions, rulingEnvelope, type RigDoc } from '../../domain/book/documents/rig';
import { envelopeWords } from '../../domain/report/permit-words';
import { specDifference } from '../../domain/report/spec-words';
import { specChanges } from '../../domain/rules/loosening';
import { ActForm } from './act-form';
import { ActOutcome, ForecastWords } from './act-outcome';
import { useAct, useForecast } from './use-act';
import { useMay } from './use-may';
import { useNames } from '../../data/use-names';

/** Two revisions made apart from each other: both stand until somebody names both and keeps one. */
export function PartingSection({ rig }: { readonly rig: RigDoc }) {
  const heads = headRevisions(rig);
  const [keeps, setKeeps] = useState<string | null>(null);
  const nameOf = useNames();
  const may = useMay();
  const act = useAct();
  const settles = heads.map((head) => head.entry);
  const parted = heads.length > 1;
  const kept = heads.find((head) => head.entry === keeps);
  const forecast = useForecast(
    parted && kept !== undefined
      ? {
          kind: 'parting.settled',
          subject: rig.id,
          body: { settles, keeps: kept.entry, words: 'asked beforehand' },
        }
      : null,
    `${settles.join()}/${kept?.entry ?? ''}`,
  );
  const [first, ...others] = heads;
  if (!parted || first === undefined) return act.logged === null ? null : <ActOutcome entry={act.logged} />;
  return (
    <section className="desk-form" aria-label="Parting">
      <h3>Parting: revisions {heads.map((head) => head.number).join(' and ')} stand</h3>
      <p>
        Until it is settled the stricter limits rule: {envelopeWords(rulingEnvelope(rig))}. No permit rules.
      </p>
      <ul className="desk-list">
        {heads.map((head) => (
          <li key={head.entry}>
            <b>{head.number}</b> {nameOf(head.by)}: {head.why}
          </li>
        ))}
      </ul>
      {others.flatMap((other) =>
        specChanges(first.spec, other.spec).map((change) => {
          const { label, before, after } = specDifference(change, other.spec.topology);
          return (
            <p key={`${other.entry}${change.field}`}>
              <span className="muted">{label}</span> {first.number}: {before}, {other.number}: {after}
            </p>
          );
        }),
      )}
      {may('parting.settled') ? (
        <>
          <Choice
            label="Keep revision"
            options={heads.map((head) => ({ value: head.entry, label: `keep ${head.number}` }))}
            value={keeps}
            onChange={setKeeps}
          />
          <ActForm
            draft={`desk/parting/${rig.id}`}
            wordsLabel="Why this one"
            needed="Say why this one is kept."
            main
            label="Settle parting"
            holdLabel={`Hold: settle the parting of ${rig.name}`}
            hindrance={
              kept === undefined ? 'Choose the revision to keep.' : (forecast.against?.words ?? null)
            }
            onComplete={(words) =>
              kept === undefined
                ? Promise.resolve({ type: 'failed', words: 'Choose the revision to keep.' })
                : act.log({
                    kind: 'parting.settled',
                    subject: rig.id,
                    body: { settles, keeps: kept.entry, words },
                  })
            }
          >
            <ForecastWords forecast={forecast} />
          </ActForm>
        </>
      ) : (
        <p className="muted">Settling a parting is for a reviewer or a lead.</p>
      )}
      {act.logged === null ? null : <ActOutcome entry={act.logged} />}
    </section>
  );
}
