import { describe, expect, it } from 'vitest';
import { kettleLikeSpec, labSettings } from '../../src/domain/lookup/rig.fixture';
import { figureLine } from '../../src/domain/lookup/figure-text';
import { fieldOf } from '../../src/domain/lookup/fields';
import type { Figure, Lookup, LookupAnswer, Plot, Values } from '../../src/domain/lookup/lookup';
import { LOOKUPS } from '../../src/domain/lookup/lookups';
import { solveFor } from '../../src/domain/lookup/solve';
import type { Refusal } from '../../src/domain/units/result';
import { HERON_SPEC } from '../../seeds/rigs/heron';
import { KETTLE_SPEC } from '../../seeds/rigs/kettle';
import { randomValues, seededRandom } from './random-values';

/**
 * Any number typed or slid anywhere gives an answer or a refusal in words. 5,000 inputs a lookup; the slow ones take fewer
 * here and all of them by HOLDOFF_INPUTS=5000.
 */
const SEED = 20_261;
const INPUTS = 5000;
const SLOW_INPUTS = 250;
const SOLVES = 6;

const forced = Number(process.env['HOLDOFF_INPUTS'] ?? Number.NaN);
const countFor = (lookup: Lookup) =>
  Number.isFinite(forced) ? forced : lookup.slow === true ? SLOW_INPUTS : INPUTS;

const specs = [kettleLikeSpec, KETTLE_SPEC, HERON_SPEC, null];

describe.each(LOOKUPS.map((lookup) => [lookup.key, lookup] as const))('%s', (_, lookup) => {
  const starts = specs.map((spec) => lookup.start({ spec, settings: labSettings }));

  it('starts with a value or null for every field, and an answer or what is missing', () => {
    for (const settings of [labSettings, null]) {
      for (const spec of specs) {
        const { values } = lookup.start({ spec, settings });
        for (const field of lookup.fields) expect(values).toHaveProperty(field.key);
        const answer = lookup.answer(values);
        expect(answer.ok ? wrongInAnswer(answer.value) : wrongInRefusal(lookup, answer.refusal)).toEqual([]);
      }
    }
  });

  it('answers any input with finite figures or with words', () => {
    const random = seededRandom(SEED);
    let answered = 0;
    for (let i = 0; i < countFor(lookup); i += 1) {
      const start = starts[i % starts.length];
      if (start === undefined) throw new Error('no start');
      const values = randomValues(lookup, start.values, random);
      const answer = lookup.answer(values);
      const wrong = answer.ok ? wrongInAnswer(answer.value) : wrongInRefusal(lookup, answer.refusal);
      if (wrong.length > 0) expect.fail(`${JSON.stringify(values)}: ${wrong.join('; ')}`);
      if (answer.ok) answered += 1;
    }
    // A test that only ever meets refusals would show nothing.
    expect(answered).toBeGreaterThan(countFor(lookup) / 50);
  }, 300_000);

  it('gives the same answer twice and changes none of its inputs', () => {
    const random = seededRandom(SEED + 1);
    for (let i = 0; i < 20; i += 1) {
      const values = Object.freeze(randomValues(lookup, starts[0]?.values ?? {}, random));
      expect(lookup.answer(values)).toEqual(lookup.answer(values));
    }
  });

  it('finds inputs that meet a wanted figure, or says why there is none', () => {
    const random = seededRandom(SEED + 2);
    const rounds = lookup.slow === true ? 2 : SOLVES;
    for (const solvable of lookup.solvable) {
      expect(fieldOf(lookup, solvable.field)?.kind).toBe('number');
      for (let i = 0; i < rounds; i += 1) {
        const values = { ...starts[0]?.values, ...slidOnly(lookup, starts[0]?.values ?? {}, random) };
        const answer = lookup.answer(values, { plot: false });
        const figure = answer.ok ? figureOf(answer.value, solvable.figure) : undefined;
        if (figure === undefined) continue;
        const found = solveFor(lookup, values, { solvable, target: figure.value });
        if (!found.ok) {
          expect(found.refusal.words).toMatch(/\S/);
          continue;
        }
        const met = figureOf(found.value.answer, solvable.figure);
        expect(Number.isFinite(found.value.value)).toBe(true);
        expect(met === undefined || Number.isFinite(met.value)).toBe(true);
      }
    }
  }, 120_000);
});

/** One number moved as a slider would. */
function slidOnly(lookup: Lookup, values: Values, random: () => number): Values {
  const numbers = lookup.fields.filter((field) => field.kind === 'number');
  const field = numbers[Math.floor(random() * numbers.length)];
  if (field === undefined) return values;
  const { from, to } = field.slide;
  const value = from + (to - from) * random();
  return { [field.key]: field.whole === true ? Math.round(value) : value };
}

function figureOf(answer: LookupAnswer, key: string): Figure | undefined {
  return answer.figures.find((figure) => figure.key === key && figure.words === undefined);
}

function wrongInRefusal(lookup: Lookup, { field, words }: Refusal): readonly string[] {
  return [
    ...(readable(words) ? [] : [`refusal reads "${words}"`]),
    ...(field === undefined || fieldOf(lookup, field) !== undefined
      ? []
      : [`refusal names ${field}, which is no field`]),
  ];
}

function wrongInAnswer(answer: LookupAnswer): readonly string[] {
  const texts = [
    answer.model,
    answer.valid,
    ...answer.warnings.map((warning) => warning.words),
    ...answer.cautions,
    ...(answer.says === undefined ? [] : [answer.says]),
  ];
  const large = answer.figures.filter((figure) => figure.weight === 'answer');
  return [
    ...texts.filter((text) => !readable(text)).map((text) => `reads "${text}"`),
    ...answer.figures.flatMap(wrongInFigure),
    ...(large.length > 2 ? ['more than two large figures'] : []),
    ...(answer.plot === undefined ? [] : wrongInPlot(answer.plot)),
  ];
}

function wrongInFigure(figure: Figure): readonly string[] {
  if (figure.words !== undefined)
    return readable(figure.words) ? [] : [`${figure.key} reads "${figure.words}"`];
  const { key, value, low, high } = figure;
  const found: string[] = [];
  if (!Number.isFinite(value)) found.push(`${key} is ${String(value)}`);
  // A hair of a double is not a wrong band.
  const hair = 1e-9 * Math.abs(value);
  if (low !== undefined && !(low <= value + hair))
    found.push(`${key}: low ${String(low)} over ${String(value)}`);
  if (high !== undefined && !(high >= value - hair))
    found.push(`${key}: high ${String(high)} under ${String(value)}`);
  if (low !== undefined && !Number.isFinite(low)) found.push(`${key} has no finite low`);
  if (high !== undefined && !Number.isFinite(high)) found.push(`${key} has no finite high`);
  if (!readable(figureLine(figure)) || figureLine(figure).includes('\u2013'))
    found.push(`${key} is not written`);
  return found;
}

function wrongInPlot(plot: Plot): readonly string[] {
  const found: string[] = [];
  for (const [name, axis] of [['x', plot.x] as const, ['y', plot.y] as const]) {
    if (!(axis.max > axis.min) || !Number.isFinite(axis.max - axis.min)) {
      found.push(`axis ${name} from ${String(axis.min)} to ${String(axis.max)}`);
    }
    if (axis.kind === 'log' && !(axis.min > 0)) found.push(`log axis ${name} from ${String(axis.min)}`);
  }
  const numbers = [
    ...(plot.band?.points ?? []).flatMap(({ x, low, high }) => [x, low, high]),
    ...[plot.law ?? [], plot.own?.points ?? [], ...(plot.curves ?? []).map(({ points }) => points)]
      .flat()
      .flatMap(({ x, y }) => [x, y]),
    ...(plot.point === undefined ? [] : [plot.point.x, plot.point.low, plot.point.high]),
    ...(plot.limit === undefined ? [] : [plot.limit.y]),
  ];
  if (!numbers.every(Number.isFinite)) found.push('a point of the plot is not finite');
  if (!readable(plot.title)) found.push(`plot reads "${plot.title}"`);
  return found;
}

function readable(words: string): boolean {
  return /\S/.test(words) && !/NaN|Infinity|undefined|null|\[object/.test(words);
}
