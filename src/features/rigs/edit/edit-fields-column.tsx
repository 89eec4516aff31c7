import { FieldColumn } from '../../../components/field-column';
import { FieldRow } from '../../../components/field-row';
import { QuantityField } from '../../../components/quantity-field';
import type { DayEdit, NumberEdit } from './edit-field';
import { isSuggested } from './edit-state';
import { readTyped } from './edit-units';
import type { RigEdit } from './use-rig-edit';

/** The chosen number with its steps and what it means; below it what comes out. */
export function EditFieldsColumn({
  edit,
  children,
}: {
  readonly edit: RigEdit;
  readonly children: React.ReactNode;
}) {
  const { field } = edit;
  return (
    <>
      {field === null ? null : (
        <FieldColumn label="Chosen number">
          {field.kind === 'number' ? (
            <ChosenNumber edit={edit} field={field} />
          ) : (
            <EditRow edit={edit} field={field} />
          )}
        </FieldColumn>
      )}
      {children}
    </>
  );
}

function ChosenNumber({ edit, field }: { readonly edit: RigEdit; readonly field: NumberEdit }) {
  const { value, unit } = shownOf(edit, field);
  const refusal = refusalOf(edit, field.key);
  return (
    <>
      <QuantityField
        label={field.label}
        source={sourceOf(edit, field)}
        value={value}
        unit={unit}
        stepWords={`by ${field.step}`}
        carried={isSuggested(field.key, edit.draft)}
        onStep={edit.step}
        onOpen={edit.openKeypad}
        lessLabel={`${field.label} less by ${field.step} ${field.unit}`}
        moreLabel={`${field.label} more by ${field.step} ${field.unit}`}
        {...(refusal === undefined ? {} : { refusal })}
      />
      <p className="edit-help muted">{field.help}</p>
    </>
  );
}

/** A number at rest: a touch chooses it and opens the keypad. */
export function EditRow({ edit, field }: { readonly edit: RigEdit; readonly field: NumberEdit | DayEdit }) {
  const { value, unit } = shownOf(edit, field);
  const refusal = refusalOf(edit, field.key);
  return (
    <FieldRow
      label={field.label}
      source={sourceOf(edit, field)}
      value={value}
      unit={unit}
      carried={isSuggested(field.key, edit.draft)}
      onPress={() => {
        edit.choose(field.key);
        edit.openKeypad();
      }}
      {...(refusal === undefined ? {} : { refusal })}
    />
  );
}

function shownOf(edit: RigEdit, field: NumberEdit | DayEdit) {
  const text = edit.state.textOf(field.key).trim();
  if (field.kind === 'day') return { value: text === '' ? null : text, unit: '' };
  const typed = readTyped(text);
  return {
    value: typed.number === '' ? null : typed.number.replace('-', '\u2212'),
    unit: typed.unit ?? field.unit,
  };
}

/** An open field is said to be open by its source; a refusal is for what somebody entered. */
function refusalOf({ state }: RigEdit, key: string): string | undefined {
  return state.textOf(key).trim() === '' ? undefined : state.refusals[key];
}

/** Where the value comes from: it stands under the label. */
export function sourceOf(
  { draft, state, underneath, rig }: RigEdit,
  field: { readonly key: string; readonly empty: string },
): string {
  const text = state.textOf(field.key).trim();
  if (isSuggested(field.key, draft)) return 'suggested';
  if (text === '') return field.empty === 'refused' ? 'open' : 'not known';
  const was = state.base[field.key] ?? '';
  if (underneath === null) return 'entered';
  if (text === was) return rig === null ? 'copied' : `rev ${underneath.number}`;
  return `was ${was === '' ? 'not known' : was.replace('-', '\u2212')}`;
}
