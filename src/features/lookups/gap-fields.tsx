import { useState } from 'react';
import { FieldColumn } from '../../components/field-column';
import { FieldRow } from '../../components/field-row';
import { QuantityField } from '../../components/quantity-field';
import { revisionSource, fieldText, solvedText } from './gap-words';
import { fieldTraits, stepField, type GapField } from './gap-form';
import { FindDialog } from './find-dialog';
import { GasDialog } from './gas-dialog';
import { Gas } from './gas';
import type { GapLookup } from './use-gap-lookup';

const FIND_WORDS = { voltage: 'voltage', pressure: 'pressure', gap: 'gap' } as const;

/** What goes in: one chosen field with its steps, the others a touch away. */
export function GapFields({ lookup }: { readonly lookup: GapLookup }) {
  const [dialog, setDialog] = useState<'find' | 'gas' | null>(null);
  const { form, change, revision } = lookup;
  return (
    <FieldColumn label="Inputs">
      <FieldRow
        label="Find"
        source={purposeSource(lookup)}
        value={FIND_WORDS[form.find]}
        onPress={() => setDialog('find')}
      />
      <FieldRow
        label="Gas"
        source={`${form.irradiated ? 'with UV' : 'no UV'}, ${revisionSource(form.known.gas, revision)}`}
        value={<Gas name={form.gas} />}
        onPress={() => setDialog('gas')}
      />
      {fieldsOf(lookup).map((field) => (
        <Field key={field} field={field} lookup={lookup} />
      ))}
      {dialog === 'find' ? <FindDialog form={form} change={change} onClose={() => setDialog(null)} /> : null}
      {dialog === 'gas' ? <GasDialog form={form} change={change} onClose={() => setDialog(null)} /> : null}
    </FieldColumn>
  );
}

/** What is found stands on top, then the voltage that is wanted, then what may be set. */
function fieldsOf({ form }: GapLookup): readonly GapField[] {
  const found: readonly GapField[] =
    form.find === 'voltage' ? [] : [form.find === 'gap' ? 'gap_mm' : 'pressure', 'voltage_kV'];
  const radius: readonly GapField[] = form.values.radius_mm === null ? [] : ['radius_mm'];
  const settable: readonly GapField[] = ['gap_mm', 'pressure', 'temperature_C', 'ambient_bar_abs', ...radius];
  return [...found, ...settable.filter((field) => !found.includes(field))];
}

function purposeSource({ form }: GapLookup): string {
  if (form.find === 'voltage') return 'both sides';
  return form.purpose === 'hold-off-at-least' ? 'to hold off at least' : 'to break at most';
}

function Field({ field, lookup }: { readonly field: GapField; readonly lookup: GapLookup }) {
  const { form, change, revision, view } = lookup;
  const traits = fieldTraits(form, field);
  const solved =
    (form.find === 'pressure' && field === 'pressure') || (form.find === 'gap' && field === 'gap_mm');
  if (solved)
    return <FieldRow label={traits.label} source="found" value={solvedText(lookup)} unit={traits.unit} />;
  const refusal = refusalFor(field, lookup);
  const value = fieldText(form.values[field], traits.decimals);
  const source = sourceOf(field, lookup);
  const open = () =>
    change((now) => ({
      ...now,
      active: field,
      refusal: null,
      typing: form.values[field] === null ? '' : String(form.values[field]),
    }));
  if (form.active !== field) {
    return (
      <FieldRow
        label={traits.label}
        source={source}
        value={value}
        unit={traits.unit}
        onPress={() => change((now) => ({ ...now, active: field, refusal: null }))}
        {...(refusal === undefined ? {} : { refusal })}
      />
    );
  }
  return (
    <QuantityField
      label={traits.label}
      source={source}
      stepWords={`by ${traits.step}`}
      value={value}
      unit={traits.unit}
      onStep={(direction) => change((now) => stepField(now, field, direction))}
      onOpen={open}
      lessLabel={`${traits.label} less by ${traits.step} ${traits.unit}`}
      moreLabel={`${traits.label} more by ${traits.step} ${traits.unit}`}
      {...(refusal === undefined ? {} : { refusal })}
    />
  );

  function refusalFor(which: GapField, { form: now }: GapLookup): string | undefined {
    if (now.active === which && now.refusal !== null) return now.refusal;
    return !view.ok && view.refusal.field === which ? view.refusal.words : undefined;
  }

  function sourceOf(which: GapField, { form: now }: GapLookup): string {
    if (which === 'radius_mm' && now.known.radius_mm === 'rig') return revision.spec.gap.radius_known;
    return revisionSource(now.known[which], revision);
  }
}
