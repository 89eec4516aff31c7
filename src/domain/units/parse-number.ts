import { checkNumber, type NumberRule } from './check-number';
import { andThen, ok, refused, type Result } from './result';

const NUMBER = /^[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d+)?$/i;

/**
 * Reads a typed number: point or comma as the decimal sign, either minus sign, spaces around it.
 * A comma is always the decimal sign and never a thousands sign, so two of them are refused.
 */
export function parseNumber(text: string, field: string, name: string): Result<number> {
  const plain = text
    .replace(/[\s\u00a0\u2009\u202f]/g, ' ')
    .trim()
    .replace(/^[\u2212\u2013]/, '-');
  if (plain === '') return refused({ type: 'empty', field, words: `${name}: enter a number.` });
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

function shorten(text: string): string {
  const plain = text.trim();
  return plain.length > 20 ? `${plain.slice(0, 20)}\u2026` : plain;
}
