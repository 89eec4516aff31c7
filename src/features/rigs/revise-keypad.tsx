import { Keypad, type KeypadWords } from '../../components/keypad';
import type { Revise } from './use-revise';

const WORDS: KeypadWords = {
  erase: 'Erase',
  clear: 'Clear',
  enter: 'Enter',
  cancel: 'Leave as it was',
  minus: 'Minus',
  point: 'Point',
  unit: 'Unit',
};

export function ReviseKeypad({ revise }: { readonly revise: Revise }) {
  const { field, revision } = revise;
  if (field === null) return null;
  const refusal = revision.refusals[field.key];
  return (
    <Keypad
      key={field.key}
      label={field.mayBeUnknown ? `${field.label} (empty: not known)` : field.label}
      initial={revise.textOf(field.key)}
      units={[{ key: field.unit, label: field.unit }]}
      unit={field.unit}
      words={WORDS}
      allowMinus={field.allowMinus}
      onText={revise.type}
      onEnter={revise.enter}
      onCancel={() => {
        revise.revert(field.key);
        revise.closeKeypad();
      }}
      {...(refusal === undefined ? {} : { refusal })}
    />
  );
}
