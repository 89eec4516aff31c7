import { describe, expect, it } from 'vitest';
import { DEMO_LAB_SETTINGS } from '../../../seeds/lab';
import { HERON_SPEC } from '../../../seeds/rigs/heron';
import { KETTLE_SPEC } from '../../../seeds/rigs/kettle';
import { ALIGNMENT_LOOKUP as ALIGNMENT } from './alignment-lookup';
import { createAsked } from './asked.fixture';
import type { Values } from './lookup';
import { solveFor } from './solve';

const { asked, figure, refusal } = createAsked(ALIGNMENT, { spec: HERON_SPEC, settings: DEMO_LAB_SETTINGS });

/** Bars of 240 mm, feeler and screws at both ends, 0.5 mm a turn, closing clockwise. */
const WEDGED = {
  gap_a_mm: 2.6,
  gap_b_mm: 2.35,
  target_mm: 2.5,
  feeler_mm: 0.015,
  length_mm: 240,
  place_a_mm: 0,
  place_b_mm: 240,
  screw1_name: 'Screw A',
  screw1_place_mm: 0,
  screw1_pitch_mm: 0.5,
  screw1_lever: 1,
  screw1_closes: 'clockwise',
  screw2_name: 'Screw B',
  screw2_place_mm: 240,
  screw2_pitch_mm: 0.5,
  screw2_lever: 1,
  screw2_closes: 'clockwise',
};

describe('the alignment lookup', () => {
  it('turns each screw as worked by hand, and says which way', () => {
    // 0.1 mm to close at A and 0.15 mm to open at B are 0.2 and 0.3 turns: a quarter each.
    expect(figure('screw1', WEDGED)).toMatchObject({
      value: 0.25,
      label: 'Screw A, clockwise',
      note: 'closes the gap',
    });
    expect(figure('screw2', WEDGED)).toMatchObject({
      value: 0.25,
      label: 'Screw B, anticlockwise',
      note: 'opens the gap',
    });
    expect(figure('gap_a_then', WEDGED).value).toBeCloseTo(2.475, 9);
    expect(figure('gap_b_then', WEDGED).value).toBeCloseTo(2.475, 9);
    expect(asked(WEDGED).says).toBe(
      'Turn Screw A by 1/4 turn clockwise (closes the gap), then Screw B by 1/4 turn anticlockwise (opens the gap). Then measure again.',
    );
  });

  it('turns the other way where the screw closes the other way, and by more where its lever is short', () => {
    const other = { ...WEDGED, screw1_closes: 'anticlockwise', screw2_lever: 0.5 };
    expect(figure('screw1', other).label).toBe('Screw A, anticlockwise');
    expect(figure('screw1', other).note).toBe('closes the gap');
    expect(figure('screw2', other).value).toBe(0.625);
  });

  it('names the tight end, and leaves parallel bars alone', () => {
    expect(asked(WEDGED).warnings.map(({ words }) => words)).toContain(
      'The B end is the tight one: arcs will sit there.',
    );
    const even = asked({ ...WEDGED, gap_a_mm: 2.5, gap_b_mm: 2.5 });
    expect(even.says).toMatch(/^Leave both screws/);
    expect(even.figures.find(({ key }) => key === 'spread')).toMatchObject({ value: 0 });
  });

  it('carries the feeler to the ends of the discharge, where it is worse than at the places', () => {
    const inset = { ...WEDGED, place_a_mm: 60, place_b_mm: 180 };
    const width = (change: Values) => {
      const { low = 0, high = 0 } = figure('spread', change);
      return high - low;
    };
    expect(width(inset)).toBeGreaterThan(1.8 * width({ ...WEDGED }));
    expect(figure('spread', { ...WEDGED, feeler_mm: 0 }).low).toBeGreaterThan(-10);
  });

  // 3 mm at 1 atm for 1 %: 36 um, by hand (physics F).
  it('allows 36 um at 3 mm and 1 atm for one per cent', () => {
    const at = { target_mm: 3, allowed_percent: 1, ambient_bar_abs: 1.01325 };
    expect(figure('allowed', at).value).toBeCloseTo(36, 0);
  });

  it('finds the gap at B that breaks with A', () => {
    const solvable = ALIGNMENT.solvable.find(({ field }) => field === 'gap_b_mm');
    const { values } = ALIGNMENT.start({ spec: KETTLE_SPEC, settings: null });
    const found = solveFor(
      ALIGNMENT,
      { ...values, ambient_bar_abs: 0.966, gap_a_mm: 3.9 },
      { solvable: solvable!, target: 0 },
    );
    expect(found.ok && found.value.value).toBeCloseTo(3.9, 3);
  });

  it.each([
    [{ ambient_bar_abs: null }, 'ambient_bar_abs'],
    [{ gap_a_mm: 0 }, 'gap_a_mm'],
    [{ place_b_mm: 0 }, 'place_b_mm'],
    [{ screw2_place_mm: 0 }, 'screw2_place_mm'],
    [{ screw1_closes: 'left' }, 'screw1_closes'],
    [{ gap_a_mm: 0.02, gap_b_mm: 2, place_a_mm: 100 }, 'gap_a_mm'],
  ])('refuses %j beside %s', (change, field) => {
    expect(refusal({ ...WEDGED, ...change })).toMatchObject({ field });
  });
});
