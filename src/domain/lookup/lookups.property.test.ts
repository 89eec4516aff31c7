import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { HERON_SPEC } from '../../../seeds/rigs/heron';
import { DEMO_LAB_SETTINGS } from '../../../seeds/lab';
import { fieldOf, shownFields } from './fields';
import type { Field, Lookup, LookupAnswer, Values } from './lookup';
import { LOOKUPS } from './lookups';

const INPUTS = 5000;
/** A lookup that takes longer than a frame is asked less often here; its own tests ask more. */
const SLOW_INPUTS = 200;
/** The machine may be busy; the number of inputs decides, not the time. */
const LONG_MS = 120_000;
const SEED = 20261201;

const WORDS = [
  '',
  ' ',
  'C16H17NO2',
  '(',
  '2,5 nF',
  '50 psig',
  '1.2 bar(g)',
  '\u2212',
  '1e999 V',
  '\u{1F525}',
];

/** Anything that a hand, a slider or a broken draft may put there, mostly within the field's range. */
function valueFor(field: Field): fc.Arbitrary<Values[string]> {
  if (field.kind === 'choice') {
    const known = fc.constantFrom(...field.options.map(({ value }) => value));
    return fc.oneof(
      { weight: 20, arbitrary: known },
      { weight: 1, arbitrary: fc.constantFrom('', 'x', null, 3) },
    );
  }
  if (field.kind === 'text') {
    return fc.oneof(fc.constantFrom(...WORDS), fc.string({ maxLength: 300 }), fc.constant(null));
  }
  const { min, max, slide } = field;
  const between = (from: number, to: number) => fc.double({ min: from, max: to, noNaN: true });
  const ratio = slide.from > 0 ? between(0, 1).map((t) => slide.from * (slide.to / slide.from) ** t) : null;
  return fc.oneof(
    { weight: 12, arbitrary: ratio ?? between(slide.from, slide.to) },
    { weight: 6, arbitrary: between(min, max) },
    { weight: 2, arbitrary: fc.constantFrom(min, max, slide.from, slide.to) },
    {
      weight: 1,
      arbitrary: fc.constantFrom(null, Number.NaN, Infinity, -Infinity, 0, -1, 1e308, 5e-324, '3'),
    },
  );
}

const AROUND: Readonly<Record<string, Values[string]>> = { supply_kV: 16, supply_mA: 1 };

function inputsFor(lookup: Lookup): fc.Arbitrary<Values> {
  const own = Object.fromEntries(lookup.fields.map((field) => [field.key, valueFor(field)]));
  const { values } = lookup.start({ spec: HERON_SPEC, settings: DEMO_LAB_SETTINGS });
  // A few fields at a time around the rig reach deep; all at once reach everywhere.
  return fc.oneof(
    fc.record(own),
    fc.record(own, { requiredKeys: [] }).map((some) => ({ ...values, ...AROUND, ...some })),
  );
}

function strangeNumbers(answer: LookupAnswer): readonly string[] {
  const strange: string[] = [];
  const walk = (value: unknown, path: string): void => {
    if (typeof value === 'number' && !Number.isFinite(value)) strange.push(`${path} is ${String(value)}`);
    else if (typeof value === 'string' && /NaN|Infinity|undefined/.test(value))
      strange.push(`${path}: ${value}`);
    else if (typeof value === 'object' && value !== null) {
      for (const [key, inside] of Object.entries(value)) walk(inside, `${path}.${key}`);
    }
  };
  walk(answer, 'answer');
  return strange;
}

function faultsOf(lookup: Lookup, result: ReturnType<Lookup['answer']>): readonly string[] {
  if (!result.ok) {
    const { field, words } = result.refusal;
    const known = field === undefined || fieldOf(lookup, field) !== undefined;
    return [
      ...(known ? [] : [`refused beside ${String(field)}, which is no field`]),
      ...(words.length > 10 && !/NaN|Infinity|undefined/.test(words) ? [] : [`refused with "${words}"`]),
    ];
  }
  const { figures, plot } = result.value;
  const keys = figures.map(({ key }) => key);
  const answers = figures.filter(({ weight }) => weight === 'answer').length;
  return [
    ...strangeNumbers(result.value),
    ...(new Set(keys).size === keys.length ? [] : ['two figures of one key']),
    ...(answers >= 1 && answers <= 2 ? [] : [`${answers} large figures`]),
    ...figures.flatMap(({ key, value, low = value, high = value }) =>
      low <= value + 1e-9 * Math.abs(value) && high >= value - 1e-9 * Math.abs(value)
        ? []
        : [`${key}: ${value} outside ${low} to ${high}`],
    ),
    ...(plot === undefined || (plot.x.min < plot.x.max && plot.y.min < plot.y.max)
      ? []
      : ['a plot without room']),
    ...(plot?.y.kind === 'log' && !(plot.y.min > 0) ? ['a log scale from 0'] : []),
  ];
}

describe.each(LOOKUPS.map((lookup) => [lookup.key, lookup] as const))('any input of %s', (_, lookup) => {
  it(
    'is answered in numbers or refused in words beside a field',
    () => {
      let answered = 0;
      fc.assert(
        fc.property(inputsFor(lookup), (values) => {
          const result = lookup.answer(values);
          if (result.ok) answered += 1;
          expect(faultsOf(lookup, result)).toEqual([]);
        }),
        { numRuns: lookup.slow === true ? SLOW_INPUTS : INPUTS, seed: SEED },
      );
      // Were nearly all refused, nothing would have been tested.
      expect(answered).toBeGreaterThan(20);
    },
    LONG_MS,
  );

  it('has fields whose steps and sliders lie within their range, and help for each', () => {
    for (const field of lookup.fields) {
      expect(field.help.length, field.key).toBeGreaterThan(10);
      if (field.kind !== 'number') continue;
      const { min, max, slide, step } = field;
      expect(slide.from >= min && slide.to <= max && slide.from < slide.to && step > 0, field.key).toBe(true);
      expect(slide.scale === 'linear' || slide.from > 0, field.key).toBe(true);
    }
    expect(new Set(lookup.fields.map(({ key }) => key)).size).toBe(lookup.fields.length);
  });

  it('starts from nothing without a made-up ambient pressure', () => {
    const { values, known } = lookup.start({ spec: null, settings: null });
    expect(values['ambient_bar_abs'] ?? null).toBeNull();
    for (const field of lookup.fields) expect(known[field.key], field.key).toBe('assumed');
    expect(faultsOf(lookup, lookup.answer(values))).toEqual([]);
  });

  it('names only fields and figures that there are to solve for', () => {
    const seen = new Set<string>();
    const { values } = lookup.start({ spec: HERON_SPEC, settings: DEMO_LAB_SETTINGS });
    const choices = lookup.fields.filter((field) => field.kind === 'choice');
    const ways: Values[] = [
      values,
      ...choices.flatMap(({ key, options }) => options.map(({ value }) => ({ ...values, [key]: value }))),
      Object.fromEntries(
        Object.entries(values).map(([key, value]) => {
          const field = fieldOf(lookup, key);
          return [key, value === null && field?.kind === 'number' ? field.slide.to : value];
        }),
      ),
    ];
    for (const way of ways) {
      const result = lookup.answer(way);
      if (result.ok) for (const { key } of result.value.figures) seen.add(key);
      expect(shownFields(lookup, way).length).toBeGreaterThan(0);
    }
    for (const { field, figure, target } of lookup.solvable) {
      expect(fieldOf(lookup, field)?.kind, field).toBe('number');
      if (target !== undefined) expect(fieldOf(lookup, target)?.kind, target).toBe('number');
      expect([...seen], figure).toContain(figure);
    }
  });
});
