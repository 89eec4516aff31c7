import { describe, expect, it } from 'vitest';
import { GAP_LOOKUP } from './gap-lookup';
import { kettleLikeSpec, labSettings } from './rig.fixture';
import { figureAt, solveFor } from './solve';
import { toyLookup } from './toy-lookup.fixture';

const first = (lookup: ReturnType<typeof toyLookup>) => {
  const [solvable] = lookup.solvable;
  if (solvable === undefined) throw new Error('nothing to solve for');
  return solvable;
};
const solve = (lookup: ReturnType<typeof toyLookup>, target: number | null, x: number | null = 1) =>
  solveFor(lookup, { x }, { solvable: first(lookup), target });

describe('solving any lookup', () => {
  it('finds the input of a smooth curve', () => {
    const found = solve(
      toyLookup((x) => x * x),
      2,
    );
    if (!found.ok) throw new Error(found.refusal.words);
    expect(found.value.all).toHaveLength(1);
    expect(found.value.all[0]).toBeCloseTo(Math.SQRT2, 9);
  });

  it.each([
    ['up', 7.07, 7.08],
    ['down', 7.07, 7.07],
  ] as const)('rounds %s so that the target is still met, and verifies it there', (rounding, root, shown) => {
    const found = solve(
      toyLookup((x) => x * 2, { solvable: { rounding } }),
      2 * (root + 0.001),
    );
    if (!found.ok) throw new Error(found.refusal.words);
    expect(found.value.value).toBe(shown);
    const met = figureAt(found.value.answer, 'y')?.value ?? Number.NaN;
    expect(rounding === 'up' ? met >= 14.142 : met <= 14.142).toBe(true);
  });

  it('gives every root and takes the one nearest to the present value', () => {
    // Zeros of (x - 2)(x - 5)(x - 9), by hand.
    const lookup = toyLookup((x) => (x - 2) * (x - 5) * (x - 9));
    const found = solve(lookup, 0, 8);
    if (!found.ok) throw new Error(found.refusal.words);
    expect(found.value.all.map((x) => x.toFixed(6))).toEqual(['2.000000', '5.000000', '9.000000']);
    expect(found.value.value).toBe(9);
  });

  it('finds two roots that lie between two points of the scan', () => {
    const found = solve(
      toyLookup((x) => (x - 5.003) ** 2 - 1e-6),
      0,
    );
    if (!found.ok) throw new Error(found.refusal.words);
    expect(found.value.all).toHaveLength(2);
    expect(found.value.all[0]).toBeCloseTo(5.002, 6);
  });

  it('takes no pole for a root', () => {
    const found = solve(
      toyLookup((x) => (x === 5 ? null : 1 / (x - 5.0001))),
      0,
    );
    expect(found).toMatchObject({ ok: false, refusal: { type: 'not-reached', field: 'x' } });
  });

  it('invents nothing at a jump, but leans to the side that meets where a side is asked for', () => {
    const jump = (x: number) => (x < 3.21 ? 1 : 2);
    expect(solve(toyLookup(jump), 1.5)).toMatchObject({ ok: false });
    const up = solve(toyLookup(jump, { solvable: { rounding: 'up' } }), 1.5);
    if (!up.ok) throw new Error(up.refusal.words);
    expect(up.value.value).toBeCloseTo(3.21, 9);
    expect(figureAt(up.value.answer, 'y')?.value).toBe(2);
  });

  it('says in words what is reached when the target is not', () => {
    const refusal = solve(
      toyLookup((x) => 3 + x),
      100,
    );
    expect(refusal).toMatchObject({
      ok: false,
      refusal: {
        type: 'not-reached',
        words:
          'Input: none in range brings “output” to 100.0\u2009kV; it goes from 3.00 to 13.0\u2009kV there.',
      },
    });
  });

  it('searches across what is refused and reports a refusal that holds everywhere', () => {
    const found = solve(
      toyLookup((x) => (x < 4 ? null : x)),
      6,
    );
    expect(found).toMatchObject({ ok: true, value: { value: 6 } });
    expect(
      solve(
        toyLookup(() => null),
        6,
      ),
    ).toMatchObject({ ok: false, refusal: { words: 'Input: not there.' } });
  });

  it('asks for a target that is missing or no number', () => {
    for (const target of [null, Number.NaN, Infinity]) {
      expect(
        solve(
          toyLookup((x) => x),
          target,
        ),
      ).toMatchObject({ ok: false, refusal: { type: 'empty' } });
    }
  });

  it('gives whole numbers only where only they have a meaning', () => {
    const whole = { whole: true, min: 1, max: 100, decimals: 0 };
    const found = solve(
      toyLookup((n) => 2.5 * n, { x: whole, solvable: { rounding: 'up' } }),
      11,
    );
    expect(found).toMatchObject({ ok: true, value: { value: 5 } });
  });

  it('spans decades where the field does', () => {
    const log = { min: 1e-6, max: 1e6, decimals: 2, slide: { from: 1, to: 100, scale: 'log' as const } };
    const found = solve(
      toyLookup((x) => Math.log10(x), { x: log }),
      -4.5,
      null,
    );
    if (!found.ok) throw new Error(found.refusal.words);
    expect(found.value.value / 10 ** -4.5).toBeCloseTo(1, 2);
  });
});

describe('solving the gap', () => {
  const { values } = GAP_LOOKUP.start({ spec: kettleLikeSpec, settings: labSettings });

  it.each([0, 1, 2, 3])('meets a wanted voltage by the domain’s own inverse (pair %i)', (index) => {
    const solvable = GAP_LOOKUP.solvable[index];
    if (solvable === undefined) throw new Error('no such pair');
    for (const target of [9, 12.34, 17, 21.9]) {
      const found = solveFor(GAP_LOOKUP, values, { solvable, target });
      if (!found.ok) throw new Error(found.refusal.words);
      const met = figureAt(found.value.answer, solvable.figure)?.value ?? Number.NaN;
      const misses = solvable.rounding === 'up' ? target - met : met - target;
      expect(misses).toBeLessThanOrEqual(0);
      // Not more generous than two digits after the point have to be.
      expect(Math.abs(met - target)).toBeLessThan(0.35);
    }
  });

  it('agrees with the scan that any lookup has', () => {
    for (const solvable of GAP_LOOKUP.solvable) {
      const { exact: _, ...scanned } = solvable;
      const ask = { solvable, target: 15 };
      const exact = solveFor(GAP_LOOKUP, values, ask);
      const scan = solveFor(GAP_LOOKUP, values, { ...ask, solvable: scanned });
      if (!exact.ok || !scan.ok) throw new Error('both have an answer');
      expect(scan.value.value).toBeCloseTo(exact.value.value, 6);
    }
  });

  it('passes on why no pressure does, and what is missing', () => {
    const [solvable] = GAP_LOOKUP.solvable;
    if (solvable === undefined) throw new Error('no such pair');
    expect(solveFor(GAP_LOOKUP, values, { solvable, target: 199 })).toMatchObject({
      ok: false,
      refusal: { field: 'pressure', words: expect.stringContaining('No such pressure') as string },
    });
    expect(
      solveFor(GAP_LOOKUP, { ...values, ambient_bar_abs: null }, { solvable, target: 17 }),
    ).toMatchObject({ ok: false, refusal: { field: 'ambient_bar_abs' } });
  });
});
