import { Keypad, type KeypadWords } from '../../components/keypad';
import { changeReference, enterField, fieldTraits, type PressureReference } from './gap-form';
import type { GapLookup } from './use-gap-lookup';

const WORDS: KeypadWords = {
  erase: 'Erase',
  clear: 'Clear',
  enter: 'Enter',
  cancel: 'Back',
  minus: 'Minus',
  point: 'Point',
  unit: 'Unit',
};
const PRESSURE_UNITS = [
  { key: 'g', label: 'bar(g)' },
  { key: 'abs', label: 'bar(abs)' },
] as const;

/** Number entry in the figure's place. The text is kept at every key, so a kill loses nothing of it. */
export function GapKeypad({ lookup }: { readonly lookup: GapLookup }) {
  const { form, change } = lookup;
  const field = form.active;
  const traits = fieldTraits(form, field);
  const isPressure = field === 'pressure';
  return (
    <Keypad
      label={traits.label}
      initial={form.typing ?? ''}
      units={isPressure ? PRESSURE_UNITS : [{ key: traits.unit, label: traits.unit }]}
      unit={isPressure ? form.reference : traits.unit}
      allowMinus={isPressure || field === 'temperature_C'}
      words={WORDS}
      onUnit={(unit) =>
        change((now) => ({ ...changeReference(now, unit as PressureReference), refusal: null }))
      }
      onText={(typing) => change((now) => ({ ...now, typing, refusal: null }))}
      onEnter={(text) => change((now) => enterField(now, field, text))}
      onCancel={() => change((now) => ({ ...now, typing: null, refusal: null }))}
      {...(form.refusal === null ? {} : { refusal: form.refusal })}
    />
  );
}
