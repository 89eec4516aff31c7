import { useState } from 'react';
import { Keypad, type KeypadWords } from '../../../components/keypad';
import { parseNumber } from '../../../domain/units/parse-number';
import { readField } from './edit-field';
import { fromOwn, readTyped, toOwn, typedText, unitsOf } from './edit-units';
import type { RigEdit } from './use-rig-edit';

export const KEYPAD_WORDS: KeypadWords = {
  erase: 'Erase',
  clear: 'Clear',
  enter: 'Enter',
  cancel: 'Leave as it was',
  minus: 'Minus',
  point: 'Point',
  unit: 'Unit',
};

export function EditKeypad({ edit }: { readonly edit: RigEdit }) {
  return edit.field === null ? null : <FieldKeypad key={edit.field.key} edit={edit} field={edit.field} />;
}

function FieldKeypad({
  edit,
  field,
}: {
  readonly edit: RigEdit;
  readonly field: NonNullable<RigEdit['field']>;
}) {
  const { ambient_bar_abs, state } = edit;
  const [before] = useState(() => edit.draft.texts[field.key]);
  const text = state.textOf(field.key);
  const own = field.kind === 'number' ? field.unit : '';
  const units = field.kind === 'number' ? unitsOf(own, ambient_bar_abs) : [{ key: own, label: own }];
  const typed = readTyped(text.trim());
  const [unit, setUnit] = useState(typed.unit ?? own);
  const keep = (number: string, unitKey: string): string =>
    typedText({ number, unit: unitKey === own ? null : unitKey });
  const refusal = text.trim() === '' ? undefined : state.refusals[field.key];
  return (
    <Keypad
      label={field.empty === 'refused' ? field.label : `${field.label} (empty: not known)`}
      initial={shownIn(unit)}
      units={units}
      unit={unit}
      words={KEYPAD_WORDS}
      allowMinus={field.kind === 'number' && field.min < 0}
      onText={(next) => edit.setText(field.key, keep(next, unit))}
      onUnit={(next) => {
        setUnit(next);
        // What is being typed stays and is read in the new unit; what stood there before is turned into it.
        if (typed.number !== '' && edit.draft.texts[field.key] !== before)
          edit.setText(field.key, keep(typed.number, next));
      }}
      onEnter={(next, unitKey) => {
        const entered = next.trim() === '' ? '' : keep(next, unitKey);
        if (entered !== keep(shownIn(unit), unit) || state.refusals[field.key] !== undefined)
          edit.setText(field.key, entered);
        if (readField(field, entered, ambient_bar_abs).ok) edit.enterNext(field.key);
      }}
      onCancel={() => {
        edit.revert(field.key, before);
        edit.closeKeypad();
      }}
      {...(refusal === undefined ? {} : { refusal })}
    />
  );

  /** The value as it stands, in the unit of the keypad. */
  function shownIn(unitKey: string): string {
    if (field.kind === 'day') return text.replaceAll('-', '');
    const from = units.find((one) => one.key === (typed.unit ?? own));
    const to = units.find((one) => one.key === unitKey);
    if (from === undefined || to === undefined || from.key === to.key || !('size' in from) || !('size' in to))
      return typed.number;
    const number = parseNumber(typed.number, field.key, field.label);
    return number.ok ? String(fromOwn(toOwn(number.value, from), to)) : typed.number;
  }
}
