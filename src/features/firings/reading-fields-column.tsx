import type { ReactNode } from 'react';
import { FieldColumn } from '../../components/field-column';
import { FieldRow } from '../../components/field-row';
import { QuantityField } from '../../components/quantity-field';
import { HOW_WORDS } from '../../domain/report/words';
import { GasLetters } from './gas-letters';
import { QUANTITY_TRAITS, shownQuantity, type QuantityKey } from './reading-fields';
import { isCarried, sourceWords } from './reading-form';
import type { ReadingForm } from './use-reading-form';

export interface ReadingFieldsProps {
  readonly form: ReadingForm;
  /** Said beside a field before logging, such as a value beyond the permit. */
  readonly warnings: Partial<Record<QuantityKey, string>>;
  /** The words for closing belong to the firing, not to a reading. */
  readonly withSummary: boolean;
}

/** One reading, field by field: the one in hand with its steps, what was carried over grey. */
export function ReadingFieldsColumn({ form, warnings, withSummary }: ReadingFieldsProps) {
  const quantity = (key: QuantityKey) => (
    <Quantity key={key} field={key} form={form} warning={warnings[key]} />
  );
  return (
    <div className="firing-fields">
      <FieldColumn label="Reading">
        {quantity('voltage_kV')}
        {quantity('pressure_bar_g')}
        {quantity('output_uJ')}
        {quantity('shots')}
        <ChoiceRow
          field="how"
          label="Voltage was"
          form={form}
          value={form.values.how === null ? null : HOW_WORDS[form.values.how]}
        />
        {quantity('flow_L_min')}
        {quantity('rate_Hz')}
        <ChoiceRow field="gas" label="Gas" form={form} value={<GasLetters gas={form.values.gas} />} />
        {quantity('ambient_bar_abs')}
        {quantity('temperature_C')}
        {quantity('humidity_pct')}
        <WordsRow field="note" label="Note" form={form} />
        {withSummary ? <WordsRow field="summary" label="Words for closing" form={form} /> : null}
      </FieldColumn>
    </div>
  );
}

interface QuantityProps {
  readonly field: QuantityKey;
  readonly form: ReadingForm;
  readonly warning: string | undefined;
}

function Quantity({ field, form, warning }: QuantityProps) {
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
  readonly field: 'how' | 'gas';
  readonly label: string;
  readonly form: ReadingForm;
  readonly value: ReactNode;
}

function ChoiceRow({ field, label, form, value }: ChoiceRowProps) {
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

function WordsRow({ field, label, form }: WordsRowProps) {
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
