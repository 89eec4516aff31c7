/** Reads one figure out of bytes; `at` moves behind what was read. NaN where no figure stands. */
export interface Scan {
  readonly bytes: Uint8Array;
  at: number;
}

const NINE = 57;
const ZERO = 48;
const MOST_EXACT_DIGITS = 15;
const POWERS = Array.from({ length: 23 }, (_, i) => Number(`1e${String(i)}`));

/**
 * A figure up to the next byte that cannot belong to one. Up to 15 digits and 22 powers of ten are exact in a double,
 * so one product or quotient rounds as the language itself would; longer ones are handed to the language.
 */
export function scanFigure(scan: Scan, end: number, decimal: number): number {
  const { bytes } = scan;
  const start = scan.at;
  let at = start;
  let negative = false;
  if (bytes[at] === 45 || bytes[at] === 43) {
    negative = bytes[at] === 45;
    at++;
  }
  let mantissa = 0;
  let digits = 0;
  let seen = 0;
  let places = 0;
  let pointed = false;
  for (; at < end; at++) {
    const byte = bytes[at] ?? 0;
    if (byte >= ZERO && byte <= NINE) {
      seen++;
      if (digits > 0 || byte !== ZERO) digits++;
      mantissa = mantissa * 10 + (byte - ZERO);
      if (pointed) places++;
    } else if (byte === decimal && !pointed) pointed = true;
    else break;
  }
  if (seen === 0) return Number.NaN;
  let exponent = 0;
  if (at < end && ((bytes[at] ?? 0) | 32) === 101) {
    const read = scanExponent(scan, at + 1, end);
    if (read !== null) {
      exponent = read.exponent;
      at = read.at;
    }
  }
  scan.at = at;
  const power = exponent - places;
  if (digits > MOST_EXACT_DIGITS || Math.abs(power) > 22)
    return slowFigure(bytes.subarray(start, at), decimal);
  const size = power < 0 ? mantissa / (POWERS[-power] ?? 1) : mantissa * (POWERS[power] ?? 1);
  return negative ? -size : size;
}

function scanExponent({ bytes }: Scan, from: number, end: number): { exponent: number; at: number } | null {
  let at = from;
  let negative = false;
  if (bytes[at] === 45 || bytes[at] === 43) {
    negative = bytes[at] === 45;
    at++;
  }
  let exponent = 0;
  const first = at;
  for (; at < end; at++) {
    const byte = bytes[at] ?? 0;
    if (byte < ZERO || byte > NINE) break;
    exponent = Math.min(9999, exponent * 10 + (byte - ZERO));
  }
  return at === first ? null : { exponent: negative ? -exponent : exponent, at };
}

function slowFigure(bytes: Uint8Array, decimal: number): number {
  let text = '';
  for (const byte of bytes) text += byte === decimal ? '.' : String.fromCharCode(byte);
  return Number(text);
}
