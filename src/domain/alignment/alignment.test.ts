import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Answer } from '../units/answer';
import type { Result } from '../units/result';
import { bisectionTurns, searchByArcs } from './bisection';
import { allowedMismatch, breakdownSpread, gapAlong, wedge, type MeasuredGap } from './gap-line';
import { planScrews, screwTurns, type TwoScrews } from './screws';

const value = (result: Result<Answer>) => (result.ok ? result.value.value : Number.NaN);
const GAP: MeasuredGap = { left_mm: 2.5, right_mm: 2.1, leftPlace_mm: 10, rightPlace_mm: 290 };
const SETTING: TwoScrews = {
  gap: GAP,
  target_mm: 2.4,
  screws: [
    { place_mm: 0, pitch_mm: 0.5 },
    { place_mm: 300, pitch_mm: 0.5 },
  ],
};
const plan = (setting: TwoScrews, feeler_um = 15) => {
  const result = planScrews(setting, feeler_um);
  if (!result.ok) throw new Error(result.refusal.words);
  return result.value;
};

describe('the gap along the bars', () => {
  it('is a straight line, with the feeler\u2019s error least in the middle', () => {
    const at = (mm: number) => {
      const result = gapAlong(GAP, mm, 20);
      return result.ok ? result.value : undefined;
    };
    expect(at(10)?.value).toBe(2.5);
    expect(at(150)?.value).toBeCloseTo(2.3, 12);
    const width = (mm: number) => (at(mm)?.band.high ?? 0) - (at(mm)?.value ?? 0);
    expect(width(10)).toBeCloseTo(0.02, 12);
    expect(width(150)).toBeCloseTo(0.02 / Math.SQRT2, 12);
    expect(width(570)).toBeCloseTo(0.02 * Math.hypot(1, 2), 12);
  });

  it('warns where the line meets the other bar', () => {
    expect(gapAlong(GAP, 2000, 0)).toMatchObject({ value: { warnings: [{ type: 'bars-meet' }] } });
  });

  it('turns its sign when measured from the other side', () => {
    const mirrored = { left_mm: GAP.right_mm, right_mm: GAP.left_mm, leftPlace_mm: 10, rightPlace_mm: 290 };
    expect(value(wedge(mirrored))).toBeCloseTo(-value(wedge(GAP)), 12);
    expect(value(breakdownSpread(2.1, 2.5, 1))).toBeCloseTo(-value(breakdownSpread(2.5, 2.1, 1)), 12);
    const swapped = { left_mm: GAP.right_mm, right_mm: GAP.left_mm, leftPlace_mm: 290, rightPlace_mm: 10 };
    expect(value(wedge(swapped))).toBeCloseTo(value(wedge(GAP)), 12);
  });

  it('does not take a feeler\u2019s error for a wedge', () => {
    expect(wedge({ ...GAP, right_mm: 2.48 }, 15)).toMatchObject({
      value: { warnings: [{ type: 'within-feeler' }] },
    });
    expect(wedge(GAP, 15)).toMatchObject({ value: { warnings: [] } });
    const even = wedge({ ...GAP, right_mm: 2.5 }, 14);
    expect(even.ok && even.value.band.high).toBeCloseTo((Math.SQRT2 * 14) / 280, 12);
  });

  // 3 mm at 1 atm for 1 %: 36 um, by hand.
  it('may differ by 36 um at 3 mm for one per cent', () => {
    expect(value(allowedMismatch(3, 1.01325, 0.01))).toBeCloseTo(36, 0);
  });

  it.each<[Partial<MeasuredGap>, string]>([
    [{ left_mm: 0 }, 'left_mm'],
    [{ right_mm: Number.NaN }, 'right_mm'],
    [{ leftPlace_mm: Infinity }, 'leftPlace_mm'],
    [{ rightPlace_mm: 10 }, 'rightPlace_mm'],
  ])('refuses %j beside %s', (change, field) => {
    expect(wedge({ ...GAP, ...change })).toMatchObject({ refusal: { field } });
    expect(gapAlong({ ...GAP, ...change }, 0, 10)).toMatchObject({ refusal: { field } });
  });
});

describe('two screws', () => {
  it('turn as worked by hand', () => {
    expect(value(screwTurns(SETTING, 0))).toBeCloseTo(-0.2286, 4);
    expect(value(screwTurns(SETTING, 1))).toBeCloseTo(0.6286, 4);
  });

  it('round to eighths and say what that gives', () => {
    const { rounded_turns, predicted } = plan(SETTING);
    expect(rounded_turns).toEqual([-0.25, 0.625]);
    expect(predicted.left_mm).toBeCloseTo(2.5 - 0.125 * (290 / 300) + 0.3125 * (10 / 300), 12);
    expect(predicted.right_mm).toBeCloseTo(2.1 - 0.125 * (10 / 300) + 0.3125 * (290 / 300), 12);
  });

  const screw = fc.record({
    pitch_mm: fc.double({ min: 0.2, max: 2, noNaN: true }),
    lever: fc.double({ min: 0.1, max: 5, noNaN: true }),
    sense: fc.constantFrom<1 | -1>(1, -1),
  });
  const gap = fc.double({ min: 1, max: 5, noNaN: true });

  it('bring both places to the target when turned exactly', () => {
    fc.assert(
      fc.property(screw, screw, gap, gap, (...[a, b, left_mm, right_mm]) => {
        const screws = [
          { ...a, place_mm: 20 },
          { ...b, place_mm: 270 },
        ] as const;
        const setting = { gap: { ...GAP, left_mm, right_mm }, target_mm: 3, screws };
        const moved = (index: 0 | 1) =>
          value(screwTurns(setting, index)) *
          screws[index].pitch_mm *
          screws[index].lever *
          screws[index].sense;
        const at = (place: number) => moved(0) * ((270 - place) / 250) + moved(1) * ((place - 20) / 250);
        return Math.abs(left_mm + at(10) - 3) < 1e-9 && Math.abs(right_mm + at(290) - 3) < 1e-9;
      }),
    );
  });

  it('end within what an eighth of a turn can do', () => {
    fc.assert(
      fc.property(gap, gap, (left_mm, right_mm) => {
        const { predicted } = plan({ ...SETTING, gap: { ...GAP, left_mm, right_mm } });
        // A sixteenth of 0.5 mm on either screw, no lever beyond them.
        return Math.max(Math.abs(predicted.left_mm - 2.4), Math.abs(predicted.right_mm - 2.4)) <= 0.03126;
      }),
    );
  });

  it('turn the other way where a screw closes, and less with a lever', () => {
    const closing = { ...SETTING, screws: [{ ...SETTING.screws[0], sense: -1 }, SETTING.screws[1]] } as const;
    expect(value(screwTurns(closing, 0))).toBeCloseTo(-value(screwTurns(SETTING, 0)), 12);
    const geared = { ...SETTING, screws: [SETTING.screws[0], { ...SETTING.screws[1], lever: 2 }] } as const;
    expect(value(screwTurns(geared, 1))).toBeCloseTo(value(screwTurns(SETTING, 1)) / 2, 12);
  });

  it('are the same setting when named in the other order', () => {
    const swapped = { ...SETTING, screws: [SETTING.screws[1], SETTING.screws[0]] } as const;
    expect(value(screwTurns(swapped, 0))).toBeCloseTo(value(screwTurns(SETTING, 1)), 12);
    expect(plan(swapped).predicted).toEqual(plan(SETTING).predicted);
  });

  it('are left alone when already right, and warn where a screw is coarse', () => {
    const right = { ...SETTING, gap: { ...GAP, left_mm: 2.4, right_mm: 2.4 } };
    expect(plan(right).rounded_turns).toEqual([0, 0]);
    expect(plan(right).warnings.map(({ type }) => type)).toEqual(['nothing-to-turn']);
    const coarse = { ...SETTING, screws: [{ place_mm: 0, pitch_mm: 8 }, SETTING.screws[1]] } as const;
    expect(plan(coarse).warnings.map(({ type }) => type)).toContain('coarse-screw');
  });

  it.each<[Partial<TwoScrews>, string]>([
    [{ target_mm: 0 }, 'target_mm'],
    [{ screws: [SETTING.screws[0], { place_mm: 0, pitch_mm: 0.5 }] }, 'screws'],
    [{ screws: [{ place_mm: 0, pitch_mm: 0 }, SETTING.screws[1]] }, 'screw1_pitch_mm'],
    [{ screws: [SETTING.screws[0], { place_mm: Number.NaN, pitch_mm: 0.5 }] }, 'screw2_place_mm'],
    [{ screws: [SETTING.screws[0], { place_mm: 300, pitch_mm: 0.5, lever: 0 }] }, 'screw2_lever'],
  ])('refuse %j beside %s', (change, field) => {
    expect(screwTurns({ ...SETTING, ...change }, 0)).toMatchObject({ refusal: { field } });
    expect(planScrews({ ...SETTING, ...change }, 10).ok).toBe(false);
  });

  it('refuse to bring the bars together', () => {
    const screws = [
      { place_mm: 0, pitch_mm: 20 },
      { place_mm: 300, pitch_mm: 20 },
    ] as const;
    const narrow = { gap: { ...GAP, left_mm: 2.4, right_mm: 2.4 }, target_mm: 0.05, screws };
    expect(planScrews(narrow, 10)).toMatchObject({ refusal: { type: 'bars-meet' } });
  });
});

describe('the search by arcs', () => {
  it.each([
    ['LLR', 0.375],
    ['LLLR', 0.625],
    ['', 0],
    ['R', -0.25],
    ['LRLR', 0.25 - 0.125 + 0.0625 - 0.03125],
  ])('%s has turned %d', (sides, turns) => {
    expect(value(bisectionTurns(0.25, sides))).toBeCloseTo(turns, 12);
  });

  it('is mirrored when the sides are', () => {
    fc.assert(
      fc.property(fc.stringMatching(/^[LR]{0,20}$/), (sides) => {
        const mirrored = [...sides].map((side) => (side === 'L' ? 'R' : 'L')).join('');
        return Math.abs(value(bisectionTurns(0.5, sides)) + value(bisectionTurns(0.5, mirrored))) < 1e-12;
      }),
    );
  });

  it('ends once a step is less than the feeler tells', () => {
    const screw = { pitch_mm: 0.5, feeler_um: 20 };
    expect(searchByArcs({ firstStep_turns: 0.25, sides: 'LL' }, screw)).toMatchObject({
      value: { done: false, next_turns: 0.25 },
    });
    expect(searchByArcs({ firstStep_turns: 0.25, sides: 'LRLRL' }, screw)).toMatchObject({
      value: { done: true, next_turns: 0 },
    });
  });

  it('ends where arcs sit on both sides alike, without turning for it', () => {
    const screw = { pitch_mm: 0.5, feeler_um: 20 };
    expect(searchByArcs({ firstStep_turns: 0.25, sides: 'LRB' }, screw)).toMatchObject({
      value: {
        done: true,
        next_turns: 0,
        turned_turns: 0.125,
        turned: { unit: 'turns', band: { low: 0, high: 0.25 } },
        words: 'Done: arcs sit on both sides alike.',
      },
    });
  });

  it.each(['X', 'LRX', 'l', 'L'.repeat(201)])('refuses %j', (sides) => {
    expect(bisectionTurns(0.25, sides)).toMatchObject({ refusal: { field: 'sides' } });
  });

  it.each([0, -1, Number.NaN, Infinity])('refuses a first step of %d', (step) => {
    expect(bisectionTurns(step, 'L')).toMatchObject({ refusal: { field: 'firstStep_turns' } });
  });
});
