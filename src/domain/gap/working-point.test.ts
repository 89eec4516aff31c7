import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { lagOvershoot, workingPoint, type GapCondition } from './working-point';

const at = (share: number, condition: GapCondition = 'pressurised-or-worn') => {
  const result = workingPoint({ voltage_kV: 20 * share, lowSide_kV: 20, condition });
  if (!result.ok) throw new Error(result.refusal.words);
  return result.value;
};

describe('workingPoint', () => {
  // By hand: 24 % of margin over 6 % of scatter are 4 sigma, over 2 % they are 12; 4 sigma is 3.17e-5 in any table.
  it('counts the margin with the widest scatter', () => {
    const { share, margin, earlyBreak } = at(0.76);
    expect(share.value).toBeCloseTo(0.76, 12);
    expect(margin.value).toBeCloseTo(4, 9);
    expect(margin.band.high).toBeCloseTo(12, 9);
    expect(earlyBreak.value / 3.167124e-5).toBeCloseTo(1, 5);
    expect(earlyBreak.band.high).toBe(earlyBreak.value);
    expect(earlyBreak.band.low).toBeLessThan(1e-30);
  });

  // 60 to 80 % of self-break and 4 sigma: common practice, no source.
  it.each<[number, GapCondition, readonly string[]]>([
    [0.7, 'pressurised-or-worn', []],
    [0.7, 'open-clean', []],
    [0.78, 'pressurised-or-worn', ['little-margin']],
    [0.85, 'open-clean', ['above-practice']],
    [0.9, 'open-clean', ['little-margin']],
    [0.5, 'open-clean', ['hard-to-trigger']],
    [1, 'open-clean', ['above-self-break']],
    [1.4, 'pressurised-or-worn', ['above-self-break']],
  ])('at %d of self-break, %s, it says %j on every figure', (share, condition, types) => {
    const point = at(share, condition);
    expect(point.warnings.map(({ type }) => type)).toEqual(types);
    for (const figure of [point.share, point.margin, point.earlyBreak]) {
      expect(figure.warnings).toEqual(expect.arrayContaining([...point.warnings]));
    }
  });

  it('breaks early more often the higher it is held, and stays within its bands', () => {
    const share = fc.double({ min: 0, max: 3, noNaN: true });
    const condition = fc.constantFrom<GapCondition>('open-clean', 'pressurised-or-worn');
    fc.assert(
      fc.property(share, share, condition, (one, other, of) => {
        const [less, more] = [at(Math.min(one, other), of), at(Math.max(one, other), of)];
        const held = [less.margin, less.earlyBreak].every(
          ({ value, band }) => band.low <= value && value <= band.high,
        );
        return held && less.earlyBreak.value <= more.earlyBreak.value;
      }),
    );
  });

  it.each([
    [{ voltage_kV: -1, lowSide_kV: 20 }, 'voltage_kV'],
    [{ voltage_kV: Number.NaN, lowSide_kV: 20 }, 'voltage_kV'],
    [{ voltage_kV: 10, lowSide_kV: 0 }, 'lowSide_kV'],
    [{ voltage_kV: 10, lowSide_kV: Infinity }, 'lowSide_kV'],
  ])('refuses %j beside %s', (voltages, field) => {
    expect(workingPoint({ ...voltages, condition: 'open-clean' })).toMatchObject({ refusal: { field } });
  });
});

describe('lagOvershoot', () => {
  it('is slope times lag: 15 kV in 0.1 s and 2 ms of waiting are 0.3 kV', () => {
    expect(lagOvershoot(150, 0.002)).toMatchObject({ value: { value: 0.3, unit: 'kV' } });
  });

  it.each([-1, Number.NaN, Infinity])('refuses a lag of %d', (lag_s) => {
    expect(lagOvershoot(150, lag_s)).toMatchObject({ refusal: { field: 'lag_s' } });
  });
});
