import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { partWear } from './part-wear';

const LAW = { ratedShots: 100_000, exponent: 8 };
const wear = (endured: Parameters<typeof partWear>[1], planned = 1) => {
  const result = partWear(LAW, endured, planned);
  if (!result.ok) throw new Error(result.refusal.words);
  return result.value;
};

describe('partWear', () => {
  it('has all its life before the first shot', () => {
    expect(wear([])).toMatchObject({ used: 0, shots: 0, remaining: { value: 100_000 }, warnings: [] });
  });

  // By hand: half the rated shots at the rated stress, then 256 shots that count as one each at half of it.
  it('adds shots over expected shots', () => {
    const { used, shots, remaining, highestStress_ratio } = wear([
      { shots: 50_000, stress_ratio: 1 },
      { shots: 2_560_000, stress_ratio: 0.5 },
    ]);
    expect(used).toBeCloseTo(0.6, 12);
    expect(shots).toBe(2_610_000);
    expect(highestStress_ratio).toBe(1);
    expect(remaining.value).toBeCloseTo(40_000, 6);
  });

  it('has a low end that counts the law five times too long', () => {
    const { remaining } = wear([{ shots: 10_000, stress_ratio: 1 }]);
    expect(remaining.band.low).toBeCloseTo(10_000, 6);
    expect(remaining.band.high).toBeCloseTo(490_000, 6);
    expect(wear([{ shots: 30_000, stress_ratio: 1 }]).remaining.band.low).toBe(0);
  });

  it.each([
    [0.1, 1, []],
    [0.3, 1, ['life-in-band']],
    [1, 1, ['life-used']],
    [1, 1.1, ['life-used', 'over-stressed']],
  ])('at %d of the rated shots and %d of the stress it says %j', (...[share, stress_ratio, types]) => {
    const { warnings, remaining } = wear([{ shots: share * 100_000, stress_ratio }]);
    expect(warnings.map(({ type }) => type)).toEqual(types);
    // A figure that is shown alone says it too.
    expect(remaining.warnings).toEqual(expect.arrayContaining([...warnings]));
  });

  it('only loses with further shots, and holds its value within its band', () => {
    const run = fc.record({
      shots: fc.integer({ min: 0, max: 200_000 }),
      stress_ratio: fc.double({ min: 0.3, max: 1.5, noNaN: true }),
    });
    fc.assert(
      fc.property(fc.array(run, { maxLength: 5 }), run, (before, more) => {
        const [first, then] = [wear(before), wear([...before, more])];
        const { value, band } = then.remaining;
        return (
          then.used >= first.used && value <= first.remaining.value && band.low <= value && value <= band.high
        );
      }),
    );
  });

  it.each([
    [[{ shots: -1, stress_ratio: 1 }], 'shots'],
    [[{ shots: Number.NaN, stress_ratio: 1 }], 'shots'],
    [[{ shots: 1, stress_ratio: 0 }], 'stress_ratio'],
    [[{ shots: 1, stress_ratio: Infinity }], 'stress_ratio'],
  ])('refuses %j beside %s', (endured, field) => {
    expect(partWear(LAW, endured, 1)).toMatchObject({ refusal: { field } });
  });

  it('refuses a law that says nothing', () => {
    expect(partWear({ ratedShots: 0, exponent: 8 }, [], 1)).toMatchObject({
      refusal: { field: 'ratedShots' },
    });
    expect(partWear(LAW, [], Number.NaN)).toMatchObject({ refusal: { field: 'stress_ratio' } });
  });
});
