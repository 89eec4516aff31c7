export type KeypadKey =
  '0' | '1' | '2' | '3' | '4' | '5' | '6' | '7' | '8' | '9' | '.' | '-' | 'erase' | 'clear';

/** More figures than any gauge shows; it also keeps the text inside the display. */
const MAX_LENGTH = 9;

/** What a key does to the typed text. The text always uses a point and a plain minus, whatever the screen shows. */
export function typeKey(text: string, key: KeypadKey): string {
  switch (key) {
    case 'clear':
      return '';
    case 'erase':
      return text.slice(0, -1) === '-' ? '' : text.slice(0, -1);
    case '-':
      return text.startsWith('-') ? text.slice(1) : `-${text}`;
    case '.':
      if (text.includes('.') || text.length >= MAX_LENGTH) return text;
      return text === '' || text === '-' ? `${text}0.` : `${text}.`;
    default:
      if (text === '0') return key;
      if (text === '-0') return `-${key}`;
      return text.length >= MAX_LENGTH ? text : text + key;
  }
}

/** More digits than any PIN that a person keeps in mind. */
const MAX_SECRET_LENGTH = 12;

/** The same for a PIN: digits alone, and a zero in front counts. */
export function typeSecretKey(text: string, key: KeypadKey): string {
  if (key === 'clear') return '';
  if (key === 'erase') return text.slice(0, -1);
  if (key === '.' || key === '-' || text.length >= MAX_SECRET_LENGTH) return text;
  return text + key;
}

/** The key that a hardware keyboard means; null for keys that are not the keypad's. */
export function keyOfKeyboard(key: string): KeypadKey | null {
  if (/^[0-9]$/.test(key)) return key as KeypadKey;
  switch (key) {
    case '.':
    case ',':
    case 'Decimal':
      return '.';
    case '-':
    case '\u2212':
      return '-';
    case 'Backspace':
      return 'erase';
    case 'Delete':
      return 'clear';
    default:
      return null;
  }
}

/** The text as it is shown: true minus and the reader's decimal sign. */
export function shownText(text: string, decimal: '.' | ','): string {
  return text.replace('-', '\u2212').replace('.', decimal);
}
