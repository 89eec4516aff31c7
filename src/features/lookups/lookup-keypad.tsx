import { Keypad, type KeypadWords } from '../../components/keypad';
import { shownValue } from '../../domain/lookup/fields';
import type { NumberField } from '../../domain/lookup/lookup';
import { changeUnit, enterText, plainText, type LookupForm } from './lookup-form';
import type { LookupView } from './use-lookup';

const WORDS: KeypadWords = {
  erase: 'Erase',
  clear: 'Clear',
  enter: 'Enter',
  cancel: 'Back',
  minus: 'Minus',
  point: 'Point',
  unit: 'Unit',
};

/** Number entry in the figure's place. The text is kept at every key, so a kill loses nothing of it. */
export function LookupKeypad({ view, field }: { readonly view: LookupView; readonly field: NumberField }) {
  const { lookup, form, change } = view;
  const units = [{ key: field.unit, label: field.unit }, ...(field.units ?? [])];
  return (
    <Keypad
      label={field.label}
      initial={form.typing ?? ''}
      units={units.map(({ key, label }) => ({ key, label }))}
      unit={form.units[field.key] ?? field.unit}
      allowMinus={field.min < 0}
      words={WORDS}
      onUnit={(unit) => change((now) => inUnit(now, field, unit === field.unit ? null : unit))}
      onText={(typing) => change((now) => ({ ...now, typing, refusal: null }))}
      onEnter={(text) => change((now) => enterText(lookup, now, text))}
      onCancel={() => change((now) => ({ ...now, typing: null, refusal: null }))}
      {...(form.refusal === null ? {} : { refusal: form.refusal })}
    />
  );
}

/** Another unit: a value that nobody has typed over yet is converted, typed figures are taken as they stand. */
function inUnit(form: LookupForm, field: NumberField, unit: string | null): LookupForm {
  const before = shownValue(field, form.values, form.units[field.key] ?? null);
  const next = changeUnit(form, field.key, unit);
  if (before === null || form.typing !== plainText(before)) return next;
  const after = shownValue(field, form.values, unit);
  return after === null ? next : { ...next, typing: plainText(after) };
}
