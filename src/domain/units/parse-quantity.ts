import { parseNumber } from './parse-number';
import { ok, refused, type Result } from './result';
import { BASE_UNITS, PLAIN_UNITS, PREFIXED, SI_PREFIXES, type Dimension } from './unit-table';

/** What a pressure is counted from. */
export type PressureReference = 'gauge' | 'absolute';

/** A typed quantity in its base unit. `reference` is there for pressures only. */
export interface ParsedQuantity {
  readonly value: number;
  readonly unit: (typeof BASE_UNITS)[Dimension];
  readonly reference?: PressureReference;
}

interface Wanted {
  readonly dimension: Dimension;
  readonly field: string;
  readonly name: string;
}

/**
 * Reads a typed quantity with its unit: "2,5 nF", "15kV", "0.125 in", "1.2 bar(g)", "50 psig", "760 Torr abs". Decimal point
 * or comma; "15,000 V" is refused, since it can be read two ways. A pressure must say gauge or absolute (psig and psia
 * do); it is never guessed. Torr, atm and Pa without a word are refused like bar.
 */
export function parseWithUnit(text: string, { dimension, field, name }: Wanted): Result<ParsedQuantity> {
  const plain = text.replace(/[\u00a0\u2009\u202f]/g, ' ').trim();
  const split = /^([+\-\u2212\u2013]?\s?[\d.,]+(?:[eE][+\-\u2212]?\d+)?)\s*(.*)$/.exec(plain);
  if (split === null) return refused({ type: 'not-a-number', field, words: `${name}: begin with a number.` });
  const number = parseNumber((split[1] ?? '').replace(/\u2212/g, '-').replace(/\s/g, ''), field, name);
  if (!number.ok) return number;
  const unitText = (split[2] ?? '').trim();
  if (unitText === '') {
    return refused({ type: 'no-unit', field, words: `${name}: add the unit, as ${exampleOf(dimension)}.` });
  }
  const { unit, reference } =
    dimension === 'pressure' ? splitReference(unitText) : { unit: unitText, reference: undefined };
  const size = sizeOf(unit, dimension);
  if (size === undefined) {
    return refused({
      type: 'unit-unknown',
      field,
      words: `${name}: "${unitText}" is no unit for it; write ${exampleOf(dimension)}.`,
    });
  }
  if (dimension === 'pressure' && reference === undefined) {
    return refused({
      type: 'gauge-or-absolute',
      field,
      words: `${name}: say whether it is gauge or absolute, as bar(g) or bar(abs).`,
    });
  }
  const value = number.value * size;
  if (!Number.isFinite(value))
    return refused({ type: 'not-finite', field, words: `${name}: the number is too large.` });
  const parsed = { value, unit: BASE_UNITS[dimension] };
  return ok(reference === undefined ? parsed : { ...parsed, reference });
}

function splitReference(text: string): {
  readonly unit: string;
  readonly reference: PressureReference | undefined;
} {
  const compact = text.replace(/\s/g, '');
  const found = /^(.*?)\(?(gauge|absolute|abs|g|a)\)?$/i.exec(compact);
  const unit = found?.[1] ?? '';
  // "pa" ends in a letter that is not a reference.
  if (found === null || !Object.hasOwn(PLAIN_UNITS, unit.toLowerCase()))
    return { unit: compact, reference: undefined };
  return { unit, reference: /^g/i.test(found[2] ?? '') ? 'gauge' : 'absolute' };
}

function sizeOf(unit: string, dimension: Dimension): number | undefined {
  // Lower case would make megapascal of millipascal.
  const lower = unit === 'mPa' ? unit : unit.toLowerCase();
  const plain = Object.hasOwn(PLAIN_UNITS, lower) ? PLAIN_UNITS[lower] : undefined;
  if (plain !== undefined && plain.dimension === dimension) return plain.size;
  for (const [sign, of] of Object.entries(PREFIXED)) {
    if (of !== dimension || !unit.endsWith(sign)) continue;
    const prefix = unit.slice(0, unit.length - sign.length);
    const power = Object.hasOwn(SI_PREFIXES, prefix) ? SI_PREFIXES[prefix] : undefined;
    if (power !== undefined) return Number(`1e${String(power)}`);
  }
  return undefined;
}

const EXAMPLES: Readonly<Record<Dimension, string>> = {
  voltage: '15 kV',
  current: '1.5 mA',
  capacitance: '2.5 nF',
  inductance: '20 nH',
  resistance: '20 M\u2126',
  energy: '0.4 J',
  power: '5 W',
  time: '5 ns',
  frequency: '10 Hz',
  charge: '45 \u00b5C',
  length: '3.2 mm',
  pressure: '1.2 bar(g)',
};

function exampleOf(dimension: Dimension): string {
  return EXAMPLES[dimension];
}
