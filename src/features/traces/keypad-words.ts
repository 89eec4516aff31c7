import type { KeypadWords } from '../../components/keypad';

export const TRACE_KEYPAD_WORDS: KeypadWords = {
  erase: 'Erase',
  clear: 'Clear',
  enter: 'Enter',
  cancel: 'Leave as it was',
  minus: 'Minus',
  point: 'Point',
  unit: 'Unit',
};
