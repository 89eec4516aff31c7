import { parseWithUnit } from '../units/parse-quantity';
import { formatFigure } from '../units/format-quantity';
import { andThen, ok, refused, type Result } from '../units/result';
import { AMBIENT_FIELD, labAir } from './ambient-field';
import { entered, type Entered } from './entered';
import { textAt } from './fields';
import { choice, linear, number } from './field-forms';
import type { Field, Figure, Lookup, LookupAnswer, Start, StartFrom, Values } from './lookup';
import { QUANTITIES, type ListedUnit, type Quantity } from './units-lookup-table';

function quantityOf(values: Values): Quantity | undefined {
  return QUANTITIES.find(({ key }) => key === textAt(values, 'quantity'));
}

function takesText(values: Values): boolean {
  return quantityOf(values)?.dimension !== undefined;
}

function isTyped(values: Values): boolean {
  return takesText(values) && (textAt(values, 'typed') ?? '').trim() !== '';
}

const FIELDS: readonly Field[] = [
  choice('quantity', 'Quantity', {
    options: QUANTITIES.map(({ key, label }) => [key, label] as const),
    help: 'What the number is of.',
  }),
  number('value', 'Number', {
    unit: '',
    min: -1e30,
    max: 1e30,
    step: 1,
    decimals: 2,
    slide: linear(0, 100),
    help: 'In the unit chosen below it.',
    shownFor: (values) => !isTyped(values),
  }),
  ...QUANTITIES.map((quantity) =>
    choice(unitKey(quantity), 'Unit', {
      options: quantity.units.map(({ label }) => [label, label] as const),
      help: 'The unit that the number is in. A pressure says whether it counts from the air outside (g) or from vacuum (abs).',
      shownFor: (values) => !isTyped(values) && quantityOf(values) === quantity,
    }),
  ),
  {
    kind: 'text',
    key: 'typed',
    label: 'Or typed with its unit',
    help: 'As 2,5 nF or 50 psig or 0.125 in. It counts instead of number and unit; empty it to go back to them.',
    shownFor: takesText,
  },
  {
    ...AMBIENT_FIELD,
    optional: true,
    shownFor: (values) => quantityOf(values)?.key === 'pressure',
  },
];

/** One quantity in every unit that the bench meets. Gauge and absolute are never taken for each other. */
export const UNITS_LOOKUP: Lookup = {
  key: 'units',
  title: 'Units',
  decides: 'The same quantity in every other unit, gauge and absolute said out loud.',
  fields: FIELDS,
  first: 'value',
  start,
  answer: (values) =>
    andThen(entered(FIELDS, values), (input) => {
      const quantity = quantityOf(values);
      return quantity === undefined ? refused(NO_QUANTITY) : answer(input, quantity);
    }),
  solvable: [],
};

const NO_QUANTITY = {
  type: 'unknown-choice',
  field: 'quantity',
  words: 'Quantity: choose one of the list.',
};

function unitKey({ key }: Pick<Quantity, 'key'>): string {
  return `unit_${key}`;
}

function start(from: StartFrom): Start {
  const air = labAir(from);
  return {
    values: {
      quantity: 'pressure',
      value: 1,
      typed: '',
      ...Object.fromEntries(
        QUANTITIES.map((quantity) => [unitKey(quantity), quantity.units[0]?.label ?? '']),
      ),
      ambient_bar_abs: air.values.ambient_bar_abs,
    },
    known: {
      ...Object.fromEntries(FIELDS.map(({ key }) => [key, 'assumed' as const])),
      ambient_bar_abs: air.known.ambient_bar_abs,
    },
  };
}

/** A quantity in the base unit of its kind, and for a pressure what it is counted from. */
interface Read {
  readonly base: number;
  readonly reference?: 'gauge' | 'absolute';
  /** The field that it was entered in. */
  readonly field: 'value' | 'typed';
}

function answer(input: Entered, quantity: Quantity): Result<LookupAnswer> {
  const read = readOf(input, quantity);
  if (!read.ok) return read;
  const ambient = input.maybe('ambient_bar_abs');
  const bad = lowest(read.value, quantity, ambient);
  if (bad !== undefined) return refused(bad);
  const missing = quantity.units.some(
    ({ reference }) => reference !== read.value.reference && ambient === null && reference !== undefined,
  );
  return ok({
    figures: quantity.units.flatMap((unit) => figureIn(unit, read.value, ambient)),
    ...saysOf(read.value, ambient),
    model: 'Definition of the units',
    valid:
      quantity.key === 'flow'
        ? 'the same gas at the same temperature and pressure: a flow counted at 15\u00a0\u00b0C and 1 atm stays so'
        : 'exact, as many digits as are shown',
    warnings: missing
      ? [
          {
            type: 'no-ambient',
            words: `Only ${read.value.reference ?? ''} units are shown: enter the ambient pressure to tell gauge from absolute. It has no default.`,
          },
        ]
      : [],
    cautions:
      quantity.key === 'pressure'
        ? [
            'A gauge counts from the air outside: 1 bar(g) is about 2 bar(abs). Taking one for the other halves a voltage.',
          ]
        : ['A converted number is no better than the one that was read.'],
  });
}

function readOf(input: Entered, quantity: Quantity): Result<Read> {
  const typed = quantity.dimension === undefined ? '' : input.text('typed').trim();
  if (typed !== '' && quantity.dimension !== undefined) {
    const parsed = parseWithUnit(typed, {
      dimension: quantity.dimension,
      field: 'typed',
      name: 'Typed',
    });
    return andThen(parsed, ({ value, reference }) =>
      ok({ base: value, field: 'typed', ...(reference === undefined ? {} : { reference }) } as const),
    );
  }
  const label = input.choice(unitKey(quantity));
  const unit = quantity.units.find((each) => each.label === label);
  if (unit === undefined) {
    return refused({
      type: 'unknown-choice',
      field: unitKey(quantity),
      words: 'Unit: choose one of the list.',
    });
  }
  const base = input.number('value') * unit.size + (unit.zero ?? 0);
  return ok({
    base,
    field: 'value',
    ...(unit.reference === undefined ? {} : { reference: unit.reference }),
  });
}

function lowest({ base, reference, field }: Read, quantity: Quantity, ambient: number | null) {
  if (quantity.least !== undefined && base < quantity.least - 1e-9) {
    return { type: 'too-small', field, words: 'Number: below absolute zero.' };
  }
  const bar_abs =
    reference === 'absolute' ? base : reference === 'gauge' && ambient !== null ? base + ambient : null;
  return bar_abs !== null && bar_abs < -1e-9
    ? { type: 'below-vacuum', field, words: 'Number: below absolute vacuum.' }
    : undefined;
}

function figureIn(unit: ListedUnit, read: Read, ambient: number | null): readonly Figure[] {
  const moved = movedTo(unit, read, ambient);
  if (moved === null) return [];
  const value = (moved - (unit.zero ?? 0)) / unit.size;
  if (!Number.isFinite(value)) return [];
  return [
    {
      key: unit.label,
      label: unit.label,
      // Sums and products of decimals leave dust in the last digits.
      value: Number(value.toPrecision(12)),
      unit: unit.label,
      rounding: 'nearest',
      digits: 6,
      weight: unit.answer === true ? 'answer' : 'main',
    },
  ];
}

/** Null where gauge and absolute cannot be told from each other without the ambient. */
function movedTo(unit: ListedUnit, { base, reference }: Read, ambient: number | null): number | null {
  if (unit.reference === undefined || unit.reference === reference) return base;
  if (ambient === null) return null;
  return unit.reference === 'gauge' ? base - ambient : base + ambient;
}

function saysOf({ reference }: Read, ambient: number | null): { readonly says?: string } {
  if (reference === undefined || ambient === null) return {};
  const bar = formatFigure(ambient, { digits: { decimals: 3 }, rounding: 'nearest' });
  return { says: `With ${bar}\u2009bar(abs) outside.` };
}
