import { memo, useCallback, useState } from 'react';
import { FieldColumn } from '../../components/field-column';
import { FieldRow } from '../../components/field-row';
import {
  shownFields,
  shownValue,
  unitDecimals,
  unitLabel,
  valueText,
  numberText,
} from '../../domain/lookup/fields';
import type { Field, NumberField } from '../../domain/lookup/lookup';
import { ActiveField } from './active-field';
import { ChoiceDialog } from './choice-dialog';
import { FindDialog } from './find-dialog';
import { GasName } from './gas-name';
import { HelpDialog } from './help-dialog';
import { chooseField, numberOf, wantedKey } from './lookup-form';
import { foundText, sourceWords } from './lookup-words';
import type { LookupView } from './use-lookup';

/** What goes in: one chosen field with its steps and slider, the others a touch away. */
export function LookupFields({ view }: { readonly view: LookupView }) {
  const [dialog, setDialog] = useState<Dialog | null>(null);
  const { lookup, form, change, solvable } = view;
  const open = useCallback(
    (field: Field) => {
      if (field.kind === 'number') change((now) => chooseField(now, field.key));
      else setDialog({ kind: 'choice', field });
    },
    [change],
  );
  return (
    <FieldColumn label="Inputs">
      {lookup.solvable.length === 0 ? null : (
        <FieldRow
          label="Find"
          source={solvable === null ? 'as it is set' : (solvable.purpose ?? 'as wanted')}
          value={<span className="lookup-choice">{soughtLabel(view)}</span>}
          onPress={() => setDialog({ kind: 'find' })}
        />
      )}
      {orderedFields(view).map((field) =>
        field.kind === 'number' && field.key === form.active && field.key !== solvable?.field ? (
          <ActiveField
            key={field.key}
            view={view}
            field={field}
            onHelp={() => setDialog({ kind: 'help', field })}
          />
        ) : (
          <RestingField key={field.key} {...restingProps(view, field)} field={field} onOpen={open} />
        ),
      )}
      {dialog?.kind === 'find' ? <FindDialog view={view} onClose={() => setDialog(null)} /> : null}
      {dialog?.kind === 'choice' ? (
        <ChoiceDialog view={view} field={dialog.field} onClose={() => setDialog(null)} />
      ) : null}
      {dialog?.kind === 'help' ? <HelpDialog field={dialog.field} onClose={() => setDialog(null)} /> : null}
    </FieldColumn>
  );
}

type Dialog =
  | { readonly kind: 'find' }
  | { readonly kind: 'choice'; readonly field: Exclude<Field, NumberField> }
  | { readonly kind: 'help'; readonly field: NumberField };

function soughtLabel({ lookup, solvable, form }: LookupView): string {
  if (solvable === null) return 'answer';
  return (numberOf(lookup, form, solvable.field)?.label ?? solvable.field).toLowerCase();
}

/** What is found stands on top, then the value that is wanted, then what may be set. */
function orderedFields({ lookup, form, solvable }: LookupView): readonly Field[] {
  const shown = shownFields(lookup, form.values);
  if (solvable === null) return shown;
  const first = [solvable.field, wantedKey(lookup, form.find) ?? ''].flatMap((key) => {
    const field = numberOf(lookup, form, key);
    return field === undefined ? [] : [field];
  });
  return [...first, ...shown.filter((field) => !first.includes(field as NumberField))];
}

interface RestingProps {
  readonly text: string | null;
  readonly unit: string;
  readonly source: string;
  readonly refusal: string | undefined;
}

function restingProps(view: LookupView, field: Field): RestingProps {
  const { form, solvable, refusal } = view;
  const words = refusal?.field === field.key ? refusal.words : undefined;
  if (field.kind !== 'number') {
    return {
      text: valueText(field, form.values),
      unit: '',
      source: sourceWords(form.known[field.key], view),
      refusal: words,
    };
  }
  const unitKey = form.units[field.key] ?? null;
  const unit = unitLabel(field, unitKey);
  if (field.key === solvable?.field)
    return { text: foundText(view, field), unit, source: 'found', refusal: words };
  const shown = shownValue(field, form.values, unitKey);
  return {
    text: shown === null ? null : numberText(shown, unitDecimals(field, unitKey)),
    unit,
    source: sourceWords(form.known[field.key], view),
    refusal: words,
  };
}

/** Nothing of it changes while another field is slid, so it is not drawn anew. */
const RestingField = memo(function RestingField({
  field,
  text,
  unit,
  source,
  refusal,
  onOpen,
}: RestingProps & { readonly field: Field; readonly onOpen: (field: Field) => void }) {
  const value =
    text === null ? null : field.kind === 'number' ? (
      text
    ) : (
      <span className="lookup-choice">{field.key === 'gas' ? <GasName name={text} /> : text}</span>
    );
  return (
    <FieldRow
      label={field.label}
      source={source}
      value={value}
      unit={unit}
      {...(source === 'found' ? {} : { onPress: () => onOpen(field) })}
      {...(refusal === undefined ? {} : { refusal })}
    />
  );
});
