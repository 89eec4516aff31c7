import type { Answer } from '../units/answer';
import { computed } from '../units/computed';
import { ok, refused, type Result } from '../units/result';

/** Abridged standard atomic weights, g/mol: IUPAC 2021, from memory. */
const ATOMIC_WEIGHTS: Readonly<Record<string, number>> = {
  H: 1.008,
  Li: 6.94,
  B: 10.81,
  C: 12.011,
  N: 14.007,
  O: 15.999,
  F: 18.998,
  Na: 22.99,
  Mg: 24.305,
  Al: 26.982,
  Si: 28.085,
  P: 30.974,
  S: 32.06,
  Cl: 35.45,
  K: 39.098,
  Ca: 40.078,
  Mn: 54.938,
  Fe: 55.845,
  Co: 58.933,
  Ni: 58.693,
  Cu: 63.546,
  Zn: 65.38,
  Br: 79.904,
  Ru: 101.07,
  Ag: 107.87,
  I: 126.9,
  Cs: 132.91,
};

const LONGEST = 200;
const MOST_ATOMS = 100_000;
const DEEPEST = 20;

/**
 * Molar mass from a formula, g/mol, as "C28H31ClN2O3", with brackets and with solvate parts after a point, as
 * "C8H10N4O2.H2O". Refused where an element is not in the table. Counter-ion and water belong to the formula: the label's
 * own figure goes before this one.
 */
export function molarMass(formula: string): Result<Answer> {
  const mass = massOf(formula);
  return mass.ok
    ? computed([], () => ({
        value: mass.value,
        unit: 'g/mol',
        model: 'Sum of standard atomic weights',
        valid: 'natural isotopes; salt and water as written',
        relative: 1e-4,
      }))
    : mass;
}

function massOf(formula: string): Result<number> {
  const plain = formula.replace(/\s/g, '').replace(/[\u00b7\u2022*]/g, '.');
  if (plain === '')
    return refused({ type: 'empty', field: 'formula', words: 'Formula: enter one, as C16H17NO2.' });
  if (plain.length > LONGEST) return bad('is too long');
  let sum = 0;
  for (const part of plain.split('.')) {
    const lead = /^(\d*)(.*)$/.exec(part);
    const reader: Reader = { text: lead?.[2] ?? '', at: 0 };
    const mass = readGroup(reader, 0);
    if (!mass.ok) return mass;
    if (reader.at < reader.text.length) return bad('has a bracket that does not open');
    sum += mass.value * (lead?.[1] === undefined || lead[1] === '' ? 1 : Number(lead[1]));
  }
  return Number.isFinite(sum) && sum > 0 ? ok(sum) : bad('has no atoms in it');
}

interface Reader {
  readonly text: string;
  at: number;
}

function readGroup(reader: Reader, depth: number): Result<number> {
  if (depth > DEEPEST) return bad('is nested too deeply');
  let sum = 0;
  while (reader.at < reader.text.length) {
    const sign = reader.text.charAt(reader.at);
    if (sign === ')' || sign === ']') break;
    const item = sign === '(' || sign === '[' ? readBracket(reader, depth) : readElement(reader);
    if (!item.ok) return item;
    const count = readCount(reader);
    if (!(count <= MOST_ATOMS)) return bad('counts more atoms than a molecule has');
    sum += item.value * count;
  }
  return ok(sum);
}

function readBracket(reader: Reader, depth: number): Result<number> {
  const closing = reader.text.charAt(reader.at) === '(' ? ')' : ']';
  reader.at += 1;
  const inside = readGroup(reader, depth + 1);
  if (!inside.ok) return inside;
  if (reader.text.charAt(reader.at) !== closing) return bad('has a bracket that does not close');
  reader.at += 1;
  return inside;
}

function readElement(reader: Reader): Result<number> {
  const symbol = /^[A-Z][a-z]?/.exec(reader.text.slice(reader.at))?.[0];
  if (symbol === undefined)
    return bad(`cannot be read from "${reader.text.slice(reader.at, reader.at + 8)}"`);
  const weight = Object.hasOwn(ATOMIC_WEIGHTS, symbol) ? ATOMIC_WEIGHTS[symbol] : undefined;
  if (weight === undefined) return bad(`names ${symbol}, which is not in the table of elements kept here`);
  reader.at += symbol.length;
  return ok(weight);
}

function readCount(reader: Reader): number {
  const digits = /^\d+/.exec(reader.text.slice(reader.at))?.[0] ?? '';
  reader.at += digits.length;
  return digits === '' ? 1 : Number(digits);
}

function bad(why: string): Result<number> {
  return refused({ type: 'formula-unreadable', field: 'formula', words: `Formula: ${why}.` });
}
