import { Caution } from '../../../components/caution';
import { FieldRow } from '../../../components/field-row';
import { SaysBlock } from '../../../components/says-block';
import { WordsField } from '../../../components/words-field';
import { useNow } from '../../../data/use-now';
import type { RigDoc } from '../../../domain/book/documents/rig';
import { envelopeWords, permitWords } from '../../../domain/report/permit-words';
import { ChangeRow } from '../change-row';
import { voidedBy } from '../voided-by';
import { useNames } from '../../../data/use-names';
import { sectionOf, sectionTitle, topologyOf } from './edit-sections';
import type { RigEdit } from './use-rig-edit';

/** What would be written, what it costs, and why: all of it before the hold. */
export function EditReview({ edit }: { readonly edit: RigEdit }) {
  const { rig, draft, state } = edit;
  return (
    <div className="edit-section">
      {rig === null ? (
        <WordsField
          label="Name of the rig"
          hint="as people call it at the bench"
          rows={1}
          maxLength={60}
          value={draft.name}
          onChange={(name) => edit.setName(name.replaceAll('\n', ' '))}
        />
      ) : (
        <WordsField
          label="Why"
          hint="stands in the Book beside the revision"
          value={draft.why}
          onChange={edit.setWhy}
        />
      )}
      <Standing edit={edit} />
      {rig === null ? null : <Changes edit={edit} />}
      {state.cautions.map((one) => (
        <Caution key={`${one.type} ${one.field}`}>{one.words}</Caution>
      ))}
      {rig === null ? (
        <p className="muted m-0">
          A new rig has no permit. A reviewer grants one for this very revision before anybody may fire.
        </p>
      ) : (
        <Cost rig={rig} zone={edit.settings?.zone ?? 'Etc/UTC'} />
      )}
    </div>
  );
}

/** What stands against saving, each with the way to where it is mended. */
function Standing({ edit }: { readonly edit: RigEdit }) {
  const { state } = edit;
  const refusals = Object.entries(state.refusals);
  const suggested = state.sections.filter((one) => one.suggested > 0);
  if (refusals.length === 0 && suggested.length === 0) return null;
  return (
    <section aria-label="What is still open">
      <h2>What is still open</h2>
      {refusals.map(([key, words]) => {
        const section = sectionOf(key);
        return (
          <FieldRow
            key={key}
            label={words}
            source={section === null ? '' : `under ${sectionTitle(section, state.textOf)}`}
            value=""
            onPress={() => edit.goTo(key)}
          />
        );
      })}
      {suggested.map(({ section, suggested: count }) => (
        <FieldRow
          key={section}
          label={`${count === 1 ? 'One value is' : `${count} values are`} suggested alone.`}
          source={`under ${sectionTitle(section, state.textOf)}`}
          value=""
          onPress={() => edit.go(section)}
        />
      ))}
    </section>
  );
}

function Changes({ edit }: { readonly edit: RigEdit }) {
  const { changes, spec, textOf } = edit.state;
  if (spec === null) return null;
  if (changes.length === 0) return <SaysBlock muted>Nothing has been changed yet.</SaysBlock>;
  const loosens = changes.some((change) => change.loosens);
  return (
    <section aria-label="Changes" aria-live="polite">
      <h2>{changes.length === 1 ? 'One change' : `${changes.length} changes`}</h2>
      <ul className="rig-list">
        {changes.map((change) => (
          <li key={change.field}>
            <ChangeRow change={change} topology={topologyOf(textOf)} />
          </li>
        ))}
      </ul>
      {loosens ? (
        <Caution>
          This raises a limit or takes a protection away. It has no effect until the server has applied it,
          and it is sent only while you are signed in yourself.
        </Caution>
      ) : (
        <p className="muted">It rules on this tablet at once.</p>
      )}
    </section>
  );
}

function Cost({ rig, zone }: { readonly rig: RigDoc; readonly zone: string }) {
  const { best_ms } = useNow(60_000);
  const nameOf = useNames();
  const { permit, check, open_checks, parting } = voidedBy(rig, best_ms);
  const said = [
    permit === null
      ? 'There is no permit to lose; a new revision has none until a reviewer grants it.'
      : `${permitWords(permit, zone)} (${envelopeWords(permit.envelope)}, by ${nameOf(permit.by)}) is void with it.`,
    ...(check ? ['The before-firing check is void with it.'] : []),
    ...(open_checks > 0
      ? [
          open_checks === 1
            ? 'A check is open on the rig: it was begun on this revision and has to be walked again.'
            : `${open_checks} checks are open on the rig: they were begun on this revision and have to be walked again.`,
        ]
      : []),
    ...(parting ? ['Two revisions already stand against each other; this one does not settle them.'] : []),
  ];
  return <Caution>{said.join(' ')}</Caution>;
}
