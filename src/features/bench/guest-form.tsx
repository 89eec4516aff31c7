import { Choice } from '../../components/choice';
import { WordsField } from '../../components/words-field';
import { useKit, usePeople } from '../../data/use-book';
import type { GuestDraft, PeopleActs } from './use-people-acts';

const NONE = 'none';

/** Who comes in, whether they were shown the isolator, and the eyewear that they were lent. */
export function GuestForm({ acts, me }: { readonly acts: PeopleActs; readonly me: string | null }) {
  const { guest } = acts;
  const people = usePeople().filter((one) => one.id !== me && one.role !== null);
  const eyewear = useKit().filter((one) => one.item.type === 'eyewear' && one.state === 'fit');
  const draft = guest.value;
  const change = (part: Partial<GuestDraft>) => guest.set((now) => ({ ...now, ...part }));
  return (
    <section className="bench-form" aria-label="Check a guest in">
      <h1>Check a guest in</h1>
      <Choice
        label="Who"
        value={draft.who}
        onChange={(who) => change({ who })}
        options={[
          { value: 'outside', label: 'From outside' },
          { value: 'member', label: 'Of this lab' },
        ]}
      />
      {draft.who === 'outside' ? (
        <WordsField
          label="Name"
          rows={1}
          maxLength={120}
          value={draft.name}
          onChange={(name) => change({ name })}
        />
      ) : null}
      {draft.who === 'member' ? (
        <Choice
          label="Who of the lab"
          value={draft.person}
          onChange={(person) => change({ person })}
          options={people.map((one) => ({ value: one.id, label: one.name }))}
        />
      ) : null}
      <p>Shown the isolator, and how to call help?</p>
      <Choice
        label="Shown the isolator"
        value={draft.knows_isolator}
        onChange={(knows_isolator) => change({ knows_isolator })}
        options={[
          { value: 'yes', label: 'Shown' },
          { value: 'no', label: 'Not shown' },
        ]}
      />
      {eyewear.length === 0 ? null : (
        <>
          <p>Eyewear lent</p>
          <Choice
            label="Eyewear lent"
            value={draft.eyewear ?? NONE}
            onChange={(id) => change({ eyewear: id === NONE ? null : id })}
            options={[
              { value: NONE, label: 'None' },
              ...eyewear.map((one) => ({ value: one.id, label: one.number })),
            ]}
          />
        </>
      )}
      <WordsField
        label="What they were told"
        hint="may be left out"
        value={draft.words}
        onChange={(words) => change({ words })}
      />
      <p className="muted">
        Only somebody who knows the isolator counts as company, and only for 12 h. Whoever is open on this
        tablet is written down as having briefed them.
      </p>
    </section>
  );
}
