import { FieldColumn } from '../../components/field-column';
import { FieldRow } from '../../components/field-row';
import { QuantityField } from '../../components/quantity-field';
import type { ReviseField } from './revise-fields';
import type { Revise } from './use-revise';

/** What can be revised here: one chosen field with its steps, the others a touch away. */
export function ReviseFieldsColumn({ revise }: { readonly revise: Revise }) {
  return (
    <FieldColumn label="What to revise">
      {revise.shown.map((field) => (
        <Field key={field.key} field={field} revise={revise} />
      ))}
    </FieldColumn>
  );
}

function Field({ field, revise }: { readonly field: ReviseField; readonly revise: Revise }) {
  const { draft, before, revision } = revise;
  const refusal = revision.refusals[field.key];
  const text = draft.texts[field.key];
  const was = field.read(before.spec);
  const changed = text !== undefined && text !== String(was ?? '');
  const source = changed ? `was ${was === null ? 'not known' : String(was)}` : `rev ${before.number}`;
  const shown = revise.textOf(field.key).replace('-', '\u2212');
  const value = shown === '' ? null : shown;
  const known = value === null && field.mayBeUnknown ? 'not known' : source;
  const common = {
    value,
    unit: field.unit,
    carried: !changed,
    ...(refusal === undefined ? {} : { refusal }),
  };
  if (revise.field?.key !== field.key)
    return (
      <FieldRow
        {...common}
        label={field.short}
        source={[field.about, changed ? known : ''].filter((words) => words !== '').join(', ')}
        onPress={() => revise.choose(field.key)}
      />
    );
  return (
    <QuantityField
      {...common}
      label={field.label}
      source={known}
      {...(changed ? {} : { stepWords: `by ${field.step}` })}
      onStep={revise.step}
      onOpen={revise.openKeypad}
      lessLabel={`${field.label} less by ${field.step} ${field.unit}`}
      moreLabel={`${field.label} more by ${field.step} ${field.unit}`}
    />
  );
}
