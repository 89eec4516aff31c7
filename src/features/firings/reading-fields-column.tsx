import { FieldColumn } from '../../components/field-column';
import { HOW_WORDS } from '../../domain/report/words';
import { GasLetters } from './gas-letters';
import { ChoiceRow, Quantity, WordsRow } from './reading-field';
import type { QuantityKey } from './reading-fields';
import { ReadingGroups } from './reading-groups';
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
        <ReadingGroups form={form} />
        <WordsRow field="note" label="Note" form={form} />
        {withSummary ? <WordsRow field="summary" label="Words for closing" form={form} /> : null}
      </FieldColumn>
    </div>
  );
}
