import { Choice } from '../../components/choice';
import { Dialog } from '../../components/dialog';
import { WordsField } from '../../components/words-field';
import { textAt } from '../../domain/lookup/fields';
import type { Field, NumberField } from '../../domain/lookup/lookup';
import { withValue } from './lookup-form';
import type { LookupView } from './use-lookup';

interface Props {
  readonly view: LookupView;
  readonly field: Exclude<Field, NumberField>;
  readonly onClose: () => void;
}

/** A choice, or words. What it is stands under it. */
export function ChoiceDialog({ view, field, onClose }: Props) {
  const { lookup, form, change } = view;
  const set = (value: string) => change((now) => withValue(lookup, now, { key: field.key, value }));
  return (
    <Dialog title={field.label} onClose={onClose} closeLabel="Done">
      {field.kind === 'choice' ? (
        <Choice
          label={field.label}
          options={field.options}
          value={textAt(form.values, field.key)}
          onChange={set}
        />
      ) : (
        <WordsField
          label={field.label}
          value={textAt(form.values, field.key) ?? ''}
          onChange={set}
          maxLength={200}
        />
      )}
      <p className="muted">{field.help}</p>
    </Dialog>
  );
}
