import { FieldColumn } from './field-column';
import { FieldRow } from './field-row';
import type { FigureSpec } from './figure-form';
import { Keypad, type KeypadWords } from './keypad';
import { QuantityField } from './quantity-field';
import type { FigureFormHandle } from './use-figure-form';

interface Props {
  readonly label: string;
  readonly form: FigureFormHandle;
}

/** Some figures: the chosen one with its steps, the others a touch away. */
export function FigureFields({ label, form }: Props) {
  return (
    <FieldColumn label={label}>
      {form.specs.map((spec) => (
        <FigureField key={spec.key} spec={spec} form={form} />
      ))}
    </FieldColumn>
  );
}

function FigureField({ spec, form }: { readonly spec: FigureSpec; readonly form: FigureFormHandle }) {
  const text = form.textOf(spec).replace('-', '\u2212');
  const touched = form.isTouched(spec);
  const refusal = form.refusalOf(spec);
  const source = text === '' ? (spec.whenEmpty ?? spec.source ?? '') : touched ? '' : (spec.source ?? '');
  const common = {
    value: text === '' ? null : text,
    unit: spec.unit,
    carried: !touched,
    ...(source === '' ? {} : { source }),
    ...(refusal === undefined ? {} : { refusal }),
  };
  if (form.active?.key !== spec.key)
    return <FieldRow {...common} label={spec.short ?? spec.label} onPress={() => form.choose(spec.key)} />;
  const by = `${spec.step}${spec.unit === '' ? '' : ` ${spec.unit}`}`;
  return (
    <QuantityField
      {...common}
      label={spec.label}
      {...(source === '' ? { stepWords: `by ${spec.step}` } : {})}
      onStep={form.step}
      onOpen={form.open}
      lessLabel={`${spec.label} less by ${by}`}
      moreLabel={`${spec.label} more by ${by}`}
    />
  );
}

/** The keypad of the chosen figure, in the place of the drawing. */
export function FigureKeypad({
  form,
  words,
}: {
  readonly form: FigureFormHandle;
  readonly words: KeypadWords;
}) {
  const { active } = form;
  if (active === null) return null;
  const refusal = form.refusalOf(active);
  const label =
    active.whenEmpty === undefined ? active.label : `${active.label} (empty: ${active.whenEmpty})`;
  return (
    <Keypad
      key={active.key}
      label={label}
      initial={form.textOf(active)}
      units={[{ key: active.unit, label: active.unit }]}
      unit={active.unit}
      words={words}
      allowMinus={active.rule.min < 0}
      onText={form.type}
      onEnter={form.enter}
      onCancel={form.revert}
      {...(refusal === undefined ? {} : { refusal })}
    />
  );
}
