import { describe, expect, it } from 'vitest';
import fc from 'fast-check';
import { judgeConvergence, type AlignmentGoal, type AlignmentStep, type ArcPlace } from './convergence';

const GOAL: AlignmentGoal = { target_mm: 4, allowed_mm: 0.05, place_a_mm: 10, place_b_mm: 270 };
const measured = (a_mm: number, b_mm: number, feeler_mm = 0.015): AlignmentStep => ({
  type: 'measured',
  gaps: { a_mm, b_mm, feeler_mm },
});
/** Screws at the very places of the feeler, so that each moves its own end alone. */
const turned = (a_mm: number, b_mm: number): AlignmentStep => ({
  type: 'turned',
  screws: [
    { name: 'Screw A', place_mm: 10, expected_mm: a_mm },
    { name: 'Screw B', place_mm: 270, expected_mm: b_mm },
  ],
});
const arcs = (where: ArcPlace): AlignmentStep => ({ type: 'arcs', where });
const judge = (...steps: AlignmentStep[]) => judgeConvergence(steps, GOAL);
const types = (...steps: AlignmentStep[]) => judge(...steps).reasons.map(({ type }) => type);

describe('whether an alignment converges', () => {
  it('asks for a measurement first, and for a second after the first', () => {
    expect(judge().state).toBe('nothing-measured');
    expect(judge(arcs('a-end')).state).toBe('nothing-measured');
    expect(judge(measured(4.3, 3.8))).toMatchObject({ state: 'first', reasons: [] });
  });

  it('converges by the farther end, and ends even within what the feeler tells', () => {
    const steps = [measured(4.4, 3.8), turned(-0.4, 0.2), measured(4.1, 3.95)];
    expect(judge(...steps)).toMatchObject({ state: 'converging' });
    expect(judge(...steps).errors_mm.map((error) => Math.round(error * 100))).toEqual([40, 10]);
    const more = [...steps, turned(-0.1, 0.05), measured(4.01, 3.99)];
    expect(judge(...more)).toMatchObject({ state: 'even', reasons: [] });
  });

  it('finds a screw whose sense is entered the wrong way round', () => {
    const steps = [measured(4.4, 4), turned(-0.4, 0), measured(4.8, 4)];
    expect(judge(...steps)).toMatchObject({ state: 'stuck' });
    expect(types(...steps)).toEqual(['screw-reversed']);
    expect(judge(...steps).reasons[0]?.words).toContain('Screw A');
  });

  it('finds a screw that the bar does not follow, one that moves otherwise, and a bar that moves by itself', () => {
    expect(types(measured(4.4, 4), turned(-0.4, 0), measured(4.4, 4))).toEqual(['screw-stuck']);
    expect(types(measured(4.6, 4), turned(-0.6, 0), measured(4.3, 4))).toEqual(['moved-otherwise']);
    expect(judge(measured(4.6, 4), turned(-0.6, 0), measured(4.3, 4)).reasons[0]?.words).toContain('50 %');
    expect(types(measured(4.4, 4), turned(-0.4, 0), measured(4, 4.2))).toEqual(['moved-untouched']);
  });

  it('reads the movement at the screws, not at the feeler', () => {
    // Screws at the ends of a 280 mm bar, feeler 10 mm inside: 0.28 mm at screw A is 0.27 and 0.01 at the feeler.
    const step: AlignmentStep = {
      type: 'turned',
      screws: [
        { name: 'Screw A', place_mm: 0, expected_mm: -0.28 },
        { name: 'Screw B', place_mm: 280, expected_mm: 0 },
      ],
    };
    expect(types(measured(4.3, 4), step, measured(4.03, 3.99))).toEqual([]);
  });

  it('adds up turnings between two measurements', () => {
    expect(types(measured(4.4, 4), turned(-0.2, 0), turned(-0.2, 0), measured(4, 4))).toEqual([]);
  });

  it('holds arcs against the gaps', () => {
    expect(types(measured(3.9, 4.1), arcs('a-end'))).toEqual([]);
    expect(types(measured(3.9, 4.1), arcs('b-end'))).toEqual(['arcs-contradict']);
    expect(judge(measured(4, 4), arcs('mid'))).toMatchObject({
      state: 'stuck',
      reasons: [{ type: 'bowed' }],
    });
    expect(types(measured(4, 4), arcs('both-ends'))).toEqual(['bowed']);
    expect(types(measured(4, 4), arcs('even'))).toEqual([]);
    // Arcs from before the turning say nothing about what is now.
    expect(types(measured(4.1, 3.9), arcs('b-end'), turned(-0.1, 0), measured(4, 3.9))).not.toContain(
      'arcs-contradict',
    );
  });

  it('says where the feeler is coarser than what is left', () => {
    expect(types(measured(4.05, 3.98, 0.03))).toEqual(['feeler-coarse']);
    expect(types(measured(4.2, 3.8, 0.03))).toEqual([]);
  });

  it('finds gaps that do not repeat, and turns that led no nearer', () => {
    expect(types(measured(4.3, 4), measured(4, 4.3))).toEqual(['not-repeated']);
    expect(types(measured(4.3, 4), arcs('even'), measured(4.31, 4))).toEqual(['turned-away']);
    const away = judge(measured(4.2, 4), turned(0.2, 0), measured(4.4, 4));
    expect(away).toMatchObject({ state: 'stuck', reasons: [{ type: 'turned-away' }] });
  });

  it('finds somebody who overshoots to and fro', () => {
    expect(types(measured(4.3, 4), measured(4, 4.3), measured(4.3, 4))).toContain('swings');
    expect(types(measured(4.3, 4), measured(4, 4.1), measured(4.1, 4))).not.toContain('swings');
  });

  it('is mirrored with the ends', () => {
    const gap = fc.double({ min: 3, max: 5, noNaN: true });
    const step = fc.oneof(
      fc.tuple(gap, gap).map(([a, b]) => measured(a, b)),
      fc.tuple(gap, gap).map(([a, b]) => turned(a - 4, b - 4)),
    );
    const swap = (one: AlignmentStep): AlignmentStep => {
      if (one.type === 'measured') return measured(one.gaps.b_mm, one.gaps.a_mm);
      if (one.type !== 'turned') return one;
      const [a, b] = one.screws;
      return turned(b?.expected_mm ?? 0, a?.expected_mm ?? 0);
    };
    fc.assert(
      fc.property(fc.array(step, { maxLength: 8 }), (steps) => {
        const one = judge(...steps);
        const other = judge(...steps.map(swap));
        expect(other.state).toBe(one.state);
        expect(other.reasons.map(({ type }) => type).sort()).toEqual(
          one.reasons.map(({ type }) => type).sort(),
        );
      }),
      { seed: 20261201 },
    );
  });
});
