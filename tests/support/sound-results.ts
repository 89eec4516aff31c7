import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

/** Numbers for one call, scaled by the probe to what it takes. */
export type Draw = readonly [number, number, number, number, number, number, number, number];
/** One call of a public function. */
export type Probe = (draw: Draw) => unknown;
export type Probes = Readonly<Record<string, Probe>>;

const tame = fc.oneof(
  fc.double({ min: -3, max: 3, noNaN: true }).map((power) => 10 ** power),
  fc.double({ min: 0, max: 10, noNaN: true }),
  fc.constantFrom(0, 1, 2, 10),
);
/** Every finite double, its corners, and what is none. */
const wild = fc.oneof(
  fc.double({ noDefaultInfinity: true, noNaN: true }),
  fc.constantFrom(
    -1,
    5e-324,
    1.7976931348623157e308,
    -1.7976931348623157e308,
    Number.NaN,
    Infinity,
    -Infinity,
  ),
);
const tameDraw = fc.tuple(tame, tame, tame, tame, tame, tame, tame, tame);
const mixed = fc.oneof({ arbitrary: tame, weight: 4 }, { arbitrary: wild, weight: 1 });
const anyDraw = fc.tuple(mixed, mixed, mixed, mixed, mixed, mixed, mixed, mixed);
const wildDraw = fc.tuple(wild, wild, wild, wild, wild, wild, wild, wild);

/**
 * Asks every exported function of a folder for any input: none throws, none gives a number that is not finite, every answer
 * lies within its own band and names its law, every refusal has words; and each function answers some of the draws.
 * `modules` are the folder's files, so that a new function without a probe is a failure; `unchecked` names those that say
 * in their own words that they check nothing.
 */
export function describeSoundness(
  folder: string,
  probes: Probes,
  modules: readonly Readonly<Record<string, unknown>>[],
  unchecked: readonly string[] = [],
): void {
  describe(`any input to ${folder}`, () => {
    it.each(Object.entries(probes))('%s', (_name, probe) => {
      let answered = 0;
      const asked = (draw: Draw): void => {
        const result = probe(draw);
        expect(unsound(result)).toBeUndefined();
        if (!isRefusal(result)) answered += 1;
      };
      fc.assert(fc.property(tameDraw, asked), { numRuns: 120 });
      fc.assert(fc.property(anyDraw, asked), { numRuns: 60 });
      fc.assert(fc.property(wildDraw, asked), { numRuns: 30 });
      expect(answered).toBeGreaterThan(0);
    });

    it('asks every exported function', () => {
      const exported = modules.flatMap((file) =>
        Object.entries(file).flatMap(([name, value]) => (typeof value === 'function' ? [name] : [])),
      );
      expect(exported.length).toBeGreaterThan(0);
      expect(exported.filter((name) => !Object.hasOwn(probes, name) && !unchecked.includes(name))).toEqual(
        [],
      );
    });
  });
}

function isRefusal(value: unknown): boolean {
  return isRecord(value) && value['ok'] === false;
}

/** What is wrong with a result, or nothing. */
export function unsound(value: unknown, path = 'result'): string | undefined {
  if (typeof value === 'number') return Number.isFinite(value) ? undefined : `${path} is ${String(value)}`;
  if (Array.isArray(value))
    return firstOf(value.map((one, index) => unsound(one, `${path}[${String(index)}]`)));
  if (!isRecord(value)) return undefined;
  if (value['ok'] === false) return refusalProblem(value['refusal'], path);
  return (
    firstOf(Object.entries(value).map(([name, one]) => unsound(one, `${path}.${name}`))) ??
    ('band' in value ? answerProblem(value, path) : undefined)
  );
}

function refusalProblem(refusal: unknown, path: string): string | undefined {
  const said = isRecord(refusal) ? [refusal['type'], refusal['words']] : [];
  return said.length === 2 && said.every((one) => typeof one === 'string' && one.length > 0)
    ? undefined
    : `${path} is refused without words`;
}

const DUST = 1e-9;

function answerProblem(value: Readonly<Record<string, unknown>>, path: string): string | undefined {
  const { value: figure, band, unit, model, valid } = value;
  if (typeof figure !== 'number' || !isRecord(band)) return `${path} has no figure`;
  const { low, high } = band;
  const slack = DUST * Math.abs(figure);
  if (!(
    typeof low === 'number' &&
    typeof high === 'number' &&
    low <= figure + slack &&
    high >= figure - slack
  )) {
    return `${path}: ${String(figure)} is outside ${String(low)} to ${String(high)}`;
  }
  const named = [unit, model, valid].every((one) => typeof one === 'string' && one !== '');
  return named ? undefined : `${path} does not name its unit, law and range`;
}

function firstOf(problems: readonly (string | undefined)[]): string | undefined {
  return problems.find((one) => one !== undefined);
}

function isRecord(value: unknown): value is Readonly<Record<string, unknown>> {
  return typeof value === 'object' && value !== null;
}
