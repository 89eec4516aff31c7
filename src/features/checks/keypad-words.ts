import type { KeypadWords } from '../../components/keypad';

export const CHECK_KEYPAD_WORDS: KeypadWords = {
  erase: 'Erase',
  clear: 'Clear',
  enter: 'Enter',
  cancel: 'Back',
  minus: 'minus',
  point: 'point',
  unit: 'Unit',
};
