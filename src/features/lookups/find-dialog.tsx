import { Choice } from '../../components/choice';
import { Dialog } from '../../components/dialog';
import { figureAt } from '../../domain/lookup/solve';
import { chooseFind, withValue } from './lookup-form';
import { figureSentence, foundText, soughtFields } from './lookup-words';
import type { LookupView } from './use-lookup';

interface Props {
  readonly view: LookupView;
  readonly onClose: () => void;
}

const ANSWER = 'answer';

/** Which quantity is sought, and what for where that decides which side it leans on. */
export function FindDialog({ view, onClose }: Props) {
  const { lookup, form, change, solvable, answer } = view;
  const choose = (index: number | null) => {
    const pair = index === null ? undefined : lookup.solvable[index];
    const figure =
      pair === undefined ? undefined : answer === null ? undefined : figureAt(answer, pair.figure);
    change((now) => chooseFind(lookup, now, { solvable: index, figure }));
  };
  const pairs = lookup.solvable.flatMap((pair, index) =>
    pair.field === solvable?.field ? [{ pair, index }] : [],
  );
  return (
    <Dialog
      title="Find"
      onClose={onClose}
      closeLabel="Done"
      actions={<TakeIt view={view} onTaken={onClose} />}
    >
      <Choice
        label="Quantity"
        options={[
          { value: ANSWER, label: 'answer' },
          ...soughtFields(lookup).map((field) => ({ value: field.key, label: field.label.toLowerCase() })),
        ]}
        value={solvable?.field ?? ANSWER}
        onChange={(key) => {
          const index = lookup.solvable.findIndex((pair) => pair.field === key);
          choose(index < 0 ? null : index);
        }}
      />
      {pairs.length === 0 ? (
        <p className="muted">Every quantity stands as it is set, and the answer follows.</p>
      ) : (
        <>
          <p className="muted">{pairs.length > 1 ? 'What is it for?' : 'So that it meets:'}</p>
          <Choice
            label="Purpose"
            options={pairs.map(({ pair, index }) => ({
              value: String(index),
              label: pair.purpose ?? figureLabel(view, pair.figure),
            }))}
            value={String(form.find?.solvable ?? '')}
            onChange={(index) => choose(Number(index))}
          />
        </>
      )}
    </Dialog>
  );
}

/** Leaves the search with what it found, as a value like any other. */
function TakeIt({ view, onTaken }: { readonly view: LookupView; readonly onTaken: () => void }) {
  const { lookup, solvable, found, change } = view;
  const field = lookup.fields.find((each) => each.key === solvable?.field);
  if (solvable === null || found === null || field?.kind !== 'number') return null;
  const take = () => {
    change((now) => ({
      ...withValue(lookup, { ...now, find: null }, { key: solvable.field, value: found.value }),
      active: solvable.field,
    }));
    onTaken();
  };
  return (
    <button type="button" className="lookup-act" onClick={take}>
      Take {foundText(view, field)}
    </button>
  );
}

function figureLabel({ answer }: LookupView, key: string): string {
  const figure = answer === null ? undefined : answer.figures.find((each) => each.key === key);
  return figure === undefined ? key : `${figure.label}, now ${figureSentence(figure)}`;
}
