import { Choice } from '../../components/choice';
import { WordsField } from '../../components/words-field';
import { usePeople, useRigs } from '../../data/use-book';
import type { Holder } from '../../domain/book/bodies/kit-bodies';
import type { KitDoc } from '../../domain/book/documents/kit';
import { DUE_HOW } from './due-entry';
import { deedsOf } from './kit-deed';
import type { KitDeed } from './use-kit-deed';

const OUTCOMES = [
  { value: 'passed', label: 'passed' },
  { value: 'failed', label: 'did not pass' },
  { value: 'retired', label: 'take out of the register' },
] as const;

const CONDITIONS = [
  { value: 'as-issued', label: 'as issued' },
  { value: 'damaged', label: 'damaged' },
] as const;

/** Issue, return or inspect, as the piece stands. */
export function DeedForm({ kit, deed }: { readonly kit: KitDoc; readonly deed: KitDeed }) {
  const { draft, change } = deed;
  const spare = kit.item.type === 'spare';
  return (
    <section className="kit-deed" aria-label="What happens to it">
      <Choice
        label="What happens to it"
        options={deedsOf(kit)}
        value={deed.deed}
        onChange={(next) => change({ deed: next })}
      />
      {deed.deed === 'issue' && !spare ? <HolderChoice kit={kit} deed={deed} /> : null}
      {deed.deed === 'return' ? (
        <Choice
          label="Condition"
          options={CONDITIONS}
          value={draft.condition}
          onChange={(condition) => change({ condition })}
        />
      ) : null}
      {deed.deed === 'inspect' && !spare ? (
        <>
          <Choice
            label="Outcome"
            options={OUTCOMES}
            value={draft.outcome}
            onChange={(outcome) => change({ outcome })}
          />
          {draft.outcome === 'failed' || draft.outcome === 'retired' ? null : (
            <Choice
              label="Next due"
              options={DUE_HOW}
              value={draft.due}
              onChange={(due) => change({ due })}
            />
          )}
        </>
      ) : null}
      <WordsField label="In words" rows={1} value={draft.words} onChange={(words) => change({ words })} />
    </section>
  );
}

function HolderChoice({ kit, deed }: { readonly kit: KitDoc; readonly deed: KitDeed }) {
  const people = usePeople().filter((person) => person.role !== null);
  const rigs = useRigs();
  const held = kit.holder?.id;
  const options = [
    ...people.map((person) => ({ value: person.id, label: person.name, disabled: person.id === held })),
    ...rigs.map((rig) => ({ value: rig.id, label: `with ${rig.name}`, disabled: rig.id === held })),
  ];
  const holderOf = (id: string): Holder =>
    rigs.some((rig) => rig.id === id) ? { type: 'rig', id } : { type: 'person', id };
  return (
    <Choice
      label="Who gets it"
      options={options}
      value={deed.draft.to?.id ?? null}
      onChange={(id) => deed.change({ to: holderOf(id) })}
    />
  );
}
