import { Choice } from '../../../components/choice';
import { WordsField } from '../../../components/words-field';
import { DIELECTRIC_OPTIONS, isMaterial } from './dielectric-choice';
import type { ChoiceEdit, DayEdit, EditField, NumberEdit, TextEdit } from './edit-field';
import { EditRow, sourceOf } from './edit-fields-column';
import type { RigEdit } from './use-rig-edit';

/** Fields in their order; numbers that follow each other stand side by side. */
export function EditFields({
  edit,
  fields,
}: {
  readonly edit: RigEdit;
  readonly fields: readonly EditField[];
}) {
  const runs: EditField[][] = [];
  for (const field of fields) {
    const last = runs.at(-1);
    if (last !== undefined && isKeyed(field) && last.every(isKeyed)) last.push(field);
    else runs.push([field]);
  }
  return runs.map((run) => {
    const [first] = run;
    if (first === undefined) return null;
    if (first.kind === 'choice') return <ChoiceField key={first.key} edit={edit} field={first} />;
    if (first.kind === 'text') return <TextField key={first.key} edit={edit} field={first} />;
    return (
      <div key={first.key} className="edit-numbers">
        {run.filter(isKeyed).map((field) => (
          <EditRow key={field.key} edit={edit} field={field} />
        ))}
      </div>
    );
  });
}

function isKeyed(field: EditField): field is NumberEdit | DayEdit {
  return field.kind === 'number' || field.kind === 'day';
}

function ChoiceField({ edit, field }: { readonly edit: RigEdit; readonly field: ChoiceEdit }) {
  const text = edit.state.textOf(field.key);
  const refusal = text === '' ? undefined : edit.state.refusals[field.key];
  const options =
    field.empty === 'absent' ? [...field.options, { value: '', label: 'not known' }] : field.options;
  return (
    <div className="edit-choice">
      <p className="m-0">
        {field.label}{' '}
        <span className="muted">
          {sourceOf(edit, field)}. {field.help}
        </span>
      </p>
      <Choice
        label={field.label}
        options={options}
        value={options.some((one) => one.value === text) ? text : null}
        onChange={(value) => edit.setText(field.key, value)}
      />
      {refusal === undefined ? null : (
        <p className="field-refusal m-0" role="alert">
          {refusal}
        </p>
      )}
    </div>
  );
}

function TextField({ edit, field }: { readonly edit: RigEdit; readonly field: TextEdit }) {
  const text = edit.state.textOf(field.key);
  const refusal = text === '' ? undefined : edit.state.refusals[field.key];
  const side =
    field.key === 'first.dielectric' ? 'first' : field.key === 'second.dielectric' ? 'second' : null;
  return (
    <div className="edit-choice">
      <WordsField
        label={field.label}
        hint={`${sourceOf(edit, field)}. ${field.help}`}
        rows={1}
        maxLength={field.maxLength}
        value={text}
        onChange={(next) => edit.setText(field.key, next.replaceAll('\n', ' '))}
        {...(refusal === undefined ? {} : { refusal })}
      />
      {side === null ? null : (
        <Choice
          label="Film of the table"
          options={DIELECTRIC_OPTIONS}
          value={isMaterial(text) ? text : null}
          onChange={(name) => edit.chooseDielectric(side, name)}
        />
      )}
    </div>
  );
}
