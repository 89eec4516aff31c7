import type { ReactNode } from 'react';
import { FieldRow } from '../../components/field-row';
import { QuantityField } from '../../components/quantity-field';
import { HOW_WORDS } from '../../domain/report/words';
import { QUANTITY_TRAITS, shownQuantity, type QuantityKey } from './reading-fields';
import { isCarried, sourceWords } from './reading-form';
import type { ReadingForm } from './use-reading-form';

interface QuantityProps {
  readonly field: QuantityKey;
  readonly form: ReadingForm;
  readonly warning?: string | undefined;
}

/** One number: with its steps while it is in hand, a row otherwise. */
export function Quantity({ field, form, warning }: QuantityProps) {
  const { draft, values, base } = form;
  const { label, unit, step } = QUANTITY_TRAITS[field];
  const refusal = form.refusal?.field === field ? form.refusal.words : warning;
  const value = shownQuantity(values[field], field);
  const shared = {
    label: field === 'shots' ? 'Shots in burst' : label,
    source: gaugeSource(field, sourceWords(base, draft, field)),
    value,
    unit,
    carried: isCarried(draft, field),
    ...(refusal === undefined ? {} : { refusal }),
  };
  if (draft.field !== field) {
    return (
      <FieldRow
        {...shared}
        onPress={() => {
          form.select(field);
        }}
      />
    );
  }
  const stepName = `by ${step}${unit === '' ? '' : ` ${unit}`}`;
  return (
    <QuantityField
      {...shared}
      source={
        field === 'voltage_kV' && values.how !== null ? HOW_WORDS[values.how] : shortSource(shared.source)
      }
      stepWords={`by ${step}`}
      onStep={form.step}
      onOpen={() => {
        form.open(field);
      }}
      lessLabel={`${label} less ${stepName}`}
      moreLabel={`${label} more ${stepName}`}
    />
  );
}

interface ChoiceRowProps {
  readonly field: 'how' | 'gas' | 'output_eye' | 'channel_gas' | 'dye_batch';
  readonly label: string;
  readonly form: ReadingForm;
  /** Null while nothing is chosen. */
  readonly value: ReactNode;
}

export function ChoiceRow({ field, label, form, value }: ChoiceRowProps) {
  return (
    <FieldRow
      label={label}
      source={sourceWords(form.base, form.draft, field)}
      value={value === null ? null : <span className="firing-choice">{value}</span>}
      {...(form.refusal?.field === field ? { refusal: form.refusal.words } : {})}
      carried={isCarried(form.draft, field)}
      onPress={() => {
        form.open(field);
      }}
    />
  );
}

interface WordsRowProps {
  readonly field: 'note' | 'summary';
  readonly label: string;
  readonly form: ReadingForm;
}

export function WordsRow({ field, label, form }: WordsRowProps) {
  const words = form.draft[field].trim();
  return (
    <FieldRow
      label={label}
      source={words === '' ? 'none' : shortened(words)}
      value={<span className="firing-write">{words === '' ? 'Write' : 'Change'}</span>}
      onPress={() => {
        form.open(field);
      }}
    />
  );
}

/** Gauge or absolute is said by the unit; that it was read off the gauge is said here. */
function gaugeSource(field: QuantityKey, source: string): string {
  return field === 'pressure_bar_g' && source === 'entered' ? 'gauge' : source;
}

/** Beside the step there is room for less. */
function shortSource(source: string): string {
  return source === 'carried over' ? 'carried' : source;
}

/** A row shows how a note begins; the whole of it stands where it is written. */
function shortened(words: string): string {
  return words.length > 40 ? `${words.slice(0, 39)}…` : words;
}
