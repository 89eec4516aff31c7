import type { Field, Lookup, Values } from '../../src/domain/lookup/lookup';

/** Numbers from 0 to 1, the same for the same seed (mulberry32). */
export function seededRandom(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), 1 | state);
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed;
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4_294_967_296;
  };
}

const WRONG: readonly unknown[] = [
  null,
  undefined,
  '',
  ' ',
  'NaN',
  '12',
  '\u2212',
  '__proto__',
  'constructor',
  true,
  {},
  [],
  Number.NaN,
  Infinity,
  -Infinity,
  -0,
  Number.MAX_VALUE,
  -Number.MAX_VALUE,
  Number.MIN_VALUE,
  1e-300,
  1e300,
];

/**
 * Any values for a lookup's fields: mostly what a person could set, with one field in a few beyond its range, at an extreme or of
 * a wrong type. `start` fills what no field names, as what the rig says.
 */
export function randomValues(lookup: Lookup, start: Values, random: () => number): Values {
  const wild = random();
  // Most inputs have to reach the physics, so only some of them are wrong, and then mostly in one place.
  const wrongShare = wild < 0.6 ? 0 : wild < 0.9 ? 1.2 / lookup.fields.length : 0.6;
  const drawn = lookup.fields.map((field): [string, unknown] => {
    if (random() < wrongShare) return [field.key, pick(WRONG, random)];
    if (random() < 0.15) return [field.key, start[field.key] ?? null];
    return [field.key, sensible(field, random)];
  });
  return { ...start, ...Object.fromEntries(drawn) } as Values;
}

function sensible(field: Field, random: () => number): number | string | null {
  if (field.kind === 'choice')
    return (
      pick(
        field.options.map((option) => option.value),
        random,
      ) ?? null
    );
  if (field.kind === 'text')
    return pick(['', 'C8H12O2', 'H2O', 'NaCl', '((', 'Xx9', '\u00e9'], random) ?? null;
  const { min, max, slide, whole } = field;
  const kind = random();
  const value =
    kind < 0.06
      ? min
      : kind < 0.12
        ? max
        : kind < 0.2
          ? between(min, max, random)
          : slide.scale === 'log' && slide.from > 0
            ? slide.from * (slide.to / slide.from) ** random()
            : between(slide.from, slide.to, random);
  return whole === true ? Math.round(value) : value;
}

function between(from: number, to: number, random: () => number): number {
  return from + (to - from) * random();
}

function pick<T>(from: readonly T[], random: () => number): T | undefined {
  return from[Math.floor(random() * from.length)];
}
