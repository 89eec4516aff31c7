import { Caution } from '../../components/caution';
import { Choice } from '../../components/choice';
import { SaysBlock } from '../../components/says-block';
import { WordsField } from '../../components/words-field';
import { gasName } from '../../domain/book/bodies/fields';
import { permitWords, envelopeWords } from '../../domain/report/permit-words';
import { specChangeWords } from '../../domain/report/spec-words';
import { useNames } from './use-names';
import type { Revise } from './use-revise';

const GROUPS = [
  { value: 'gap', label: 'gap' },
  { value: 'envelope', label: 'envelope' },
  { value: 'charging', label: 'supply and bleeds' },
] as const;
const GASES = gasName.options.map((gas) => ({ value: gas, label: gas }));

/** What would change, what it costs, and why: all of it before anything is saved. */
export function ReviseFigure({ revise, zone }: { readonly revise: Revise; readonly zone: string }) {
  const { rig, before, draft, set } = revise;
  return (
    <div className="rig-page">
      <div className="rig-head">
        <h1>Revise {rig.name}</h1>
        <span className="muted">
          on revision {before.number}
          {revise.save === 'not-saved' ? ', draft not saved on this tablet' : ''}
        </span>
      </div>
      <Choice label="What to revise" options={GROUPS} value={revise.group} onChange={revise.chooseGroup} />
      {revise.group === 'gap' ? <GapChoices revise={revise} /> : null}
      <Changes revise={revise} />
      <Cost revise={revise} zone={zone} />
      <WordsField
        label="Why"
        hint="stands in the Book beside the revision"
        value={draft.why}
        onChange={(why) => set((now) => ({ ...now, why }))}
      />
    </div>
  );
}

function GapChoices({ revise }: { readonly revise: Revise }) {
  const { before, draft, set } = revise;
  return (
    <div>
      <p className="muted">Gas in the gap</p>
      <Choice
        label="Gas in the gap"
        options={GASES}
        value={draft.gas ?? before.spec.gap.gas}
        onChange={(gas) => set((now) => ({ ...now, gas: gas === before.spec.gap.gas ? null : gas }))}
      />
      <p className="muted">UV on the gap</p>
      <Choice
        label="UV on the gap"
        options={[
          { value: 'yes', label: 'reaches it' },
          { value: 'no', label: 'does not' },
        ]}
        value={(draft.irradiated ?? before.spec.gap.irradiated) ? 'yes' : 'no'}
        onChange={(said) => set((now) => ({ ...now, irradiated: said === 'yes' }))}
      />
    </div>
  );
}

function Changes({ revise }: { readonly revise: Revise }) {
  const { changes, spec, loosens } = revise.revision;
  if (changes.length === 0) {
    return <SaysBlock muted>Nothing has been changed yet. Choose a field beside, or a gas above.</SaysBlock>;
  }
  return (
    <section aria-label="Changes" aria-live="polite">
      <ul className="rig-list">
        {changes.map((change) => (
          <li key={change.field}>
            {specChangeWords(change, spec.topology)}
            {change.loosens ? <b> Loosens.</b> : null}
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

function Cost({ revise, zone }: { readonly revise: Revise; readonly zone: string }) {
  const nameOf = useNames();
  const { permit, check, parting } = revise.voided;
  const said = [
    permit === null
      ? 'There is no permit to lose; a new revision has none until a reviewer grants it.'
      : `${permitWords(permit, zone)} (${envelopeWords(permit.envelope)}, by ${nameOf(permit.by)}) is void with it.`,
    ...(check ? ['The before-firing check is void with it.'] : []),
    ...(parting ? ['Two revisions already stand against each other; this one does not settle them.'] : []),
  ];
  return <Caution>{said.join(' ')}</Caution>;
}
