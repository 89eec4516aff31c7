import { checkNumber, type NumberRule } from './check-number';
import { andThen, ok, refused, type Result } from './result';

const NUMBER = /^[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d+)?$/i;

/** "15,000": fifteen thousand on a screen, fifteen to somebody who writes a decimal comma. "0,125" can only be a decimal. */
const READ_TWO_WAYS = /^([+-]?)([1-9]\d{0,2}),(\d{3})(e[+-]?\d+)?$/i;

/** Thousands in groups, as the screens print them: "1,234.5", "1,234,567". */
const GROUPED = /^[+-]?[1-9]\d{0,2}(,\d{3})+(\.\d*)?(e[+-]?\d+)?$/i;

/**
 * Reads a typed number: point or comma as the decimal sign, either minus sign, spaces around it. Thousands are never
 * grouped: a text that could be read both ways is refused with both readings, since a limit that is a thousand times
 * too small or too large looks just as plausible.
 */
export function parseNumber(text: string, field: string, name: string): Result<number> {
  const plain = text
    .replace(/[\s\u00a0\u2009\u202f]/g, ' ')
    .trim()
    .replace(/^[\u2212\u2013]/, '-');
  if (plain === '') return refused({ type: 'empty', field, words: `${name}: enter a number.` });
  const twice = readings(plain);
  if (twice !== undefined) {
    return refused({
      type: 'ambiguous-comma',
      field,
      words: `${name}: "${shorten(text)}" can be read two ways: write ${twice.whole} or ${twice.decimal}.`,
    });
  }
  if (GROUPED.test(plain)) {
    return refused({
      type: 'not-a-number',
      field,
      words: `${name}: "${shorten(text)}": leave the commas out, as ${plain.replaceAll(',', '')}.`,
    });
  }
  const pointed = plain.replace(',', '.');
  if (!NUMBER.test(pointed)) {
    return refused({ type: 'not-a-number', field, words: `${name}: "${shorten(text)}" is not a number.` });
  }
  const value = Number(pointed);
  return Number.isFinite(value)
    ? ok(value)
    : refused({ type: 'not-finite', field, words: `${name}: the number is too large.` });
}

/** Reads a typed number and holds it to its rule. */
export function parseQuantity(text: string, rule: NumberRule): Result<number> {
  return andThen(parseNumber(text, rule.field, rule.name), (value) => checkNumber(value, rule));
}

function readings(plain: string): { readonly whole: string; readonly decimal: string } | undefined {
  const found = READ_TWO_WAYS.exec(plain);
  if (found === null) return undefined;
  const [, sign = '', lead = '', rest = '', power = ''] = found;
  const decimals = rest.replace(/0{1,2}$/, '');
  const shownSign = sign.replace('-', '\u2212');
  return {
    whole: `${shownSign}${lead}${rest}${power}`,
    decimal: `${shownSign}${lead}.${decimals}${power}`,
  };
}

function shorten(text: string): string {
  const plain = text.trim();
  return plain.length > 20 ? `${plain.slice(0, 20)}\u2026` : plain;
}
