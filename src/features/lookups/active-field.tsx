import { QuantityField } from '../../components/quantity-field';
import { Slider } from '../../components/slider';
import {
  numberAt,
  numberText,
  shownValue,
  unitDecimals,
  unitLabel,
  unitOf,
} from '../../domain/lookup/fields';
import type { NumberField } from '../../domain/lookup/lookup';
import { plainText, slideField, stepField } from './lookup-form';
import { sourceWords } from './lookup-words';
import type { LookupView } from './use-lookup';

interface Props {
  readonly view: LookupView;
  readonly field: NumberField;
  readonly onHelp: () => void;
}

/** The chosen number: steps on both sides, the Keypad behind its value, and a slider under it. */
export function ActiveField({ view, field, onHelp }: Props) {
  const { lookup, form, change } = view;
  const unitKey = form.units[field.key] ?? null;
  const unit = unitLabel(field, unitKey);
  const decimals = unitDecimals(field, unitKey);
  const shown = shownValue(field, form.values, unitKey);
  const value = shown === null ? null : numberText(shown, decimals);
  const step = numberText(field.step, 0);
  const refusal =
    form.refusal ?? (view.refusal?.field === field.key ? view.refusal.words : undefined) ?? undefined;
  const { from, to, scale } = field.slide;
  const end = (own: number): string => {
    const there = unitOf(field, unitKey)?.fromOwn(own, form.values) ?? own;
    return numberText(there, 0);
  };
  return (
    <div className="lookup-active">
      <QuantityField
        label={field.label}
        source={sourceWords(form.known[field.key], view)}
        stepWords={`by ${step}`}
        value={value}
        unit={unit}
        onStep={(direction) => change((now) => stepField(lookup, now, direction))}
        onOpen={() =>
          change((now) => ({ ...now, refusal: null, typing: shown === null ? '' : plainText(shown) }))
        }
        onLabel={onHelp}
        lessLabel={`${field.label} less by ${step} ${field.unit}`}
        moreLabel={`${field.label} more by ${step} ${field.unit}`}
        {...(refusal === undefined ? {} : { refusal })}
      />
      <Slider
        label={`Slide ${field.label.toLowerCase()}`}
        range={{ from, to, scale, decimals: field.decimals, whole: field.whole === true }}
        value={numberAt(form.values, field.key)}
        valueText={value === null ? 'not entered' : `${value} ${unit}`}
        ends={[end(from), end(to)]}
        onSlide={(next) => change((now) => slideField(lookup, now, next))}
      />
    </div>
  );
}
