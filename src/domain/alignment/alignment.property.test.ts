import fc from 'fast-check';
import { describe, it } from 'vitest';
import { describeSoundness, type Draw, type Probes } from '../../../tests/support/sound-results';
import type { Answer } from '../units/answer';
import type { Result } from '../units/result';
import * as bisection from './bisection';
import * as line from './gap-line';
import * as screws from './screws';

const gapOf = ([a, b, c, d]: Draw): line.MeasuredGap => ({
  left_mm: a,
  right_mm: b,
  leftPlace_mm: c,
  rightPlace_mm: c + 10 * d,
});
const settingOf = (draw: Draw): screws.TwoScrews => ({
  gap: gapOf(draw),
  target_mm: draw[4],
  screws: [
    { place_mm: draw[2], pitch_mm: draw[5], lever: draw[6] },
    { place_mm: draw[7], pitch_mm: 0.5 },
  ],
});
const SIDES = ['', 'L', 'LRL', 'RRB', 'x'];
const sidesOf = (number: number) => SIDES[Math.abs(Math.trunc(number) || 0) % SIDES.length] ?? '';

const PROBES: Probes = {
  bisectionTurns: ([a, b]) => bisection.bisectionTurns(a, sidesOf(b)),
  searchByArcs: ([a, b, c, d]) =>
    bisection.searchByArcs({ firstStep_turns: a, sides: sidesOf(b) }, { pitch_mm: c, feeler_um: d }),
  gapRefusal: (draw) => line.gapRefusal(gapOf(draw)),
  gapAlong: (draw) => line.gapAlong(gapOf(draw), draw[4], draw[5]),
  wedge: (draw) => line.wedge(gapOf(draw), draw[4]),
  breakdownSpread: ([a, b, c]) => line.breakdownSpread(a, b, c / 10),
  allowedMismatch: ([a, b, c]) => line.allowedMismatch(a, b / 10, c / 100),
  screwTurns: (draw) => screws.screwTurns(settingOf(draw), draw[7] > 1 ? 1 : 0),
  planScrews: (draw) => screws.planScrews(settingOf(draw), draw[7]),
};

describeSoundness('alignment', PROBES, [bisection, line, screws], ['lineAt']);

const value = (result: Result<Answer>) => (result.ok ? result.value.value : Number.NaN);
const mm = fc.double({ min: 1, max: 6, noNaN: true });
const pitch = fc.constantFrom(0.35, 0.5, 0.7, 0.8, 1, 1.25);
const lever = fc.double({ min: 0.2, max: 3, noNaN: true });
const sense = fc.constantFrom<1 | -1>(1, -1);
const setting = fc.record({
  left_mm: mm,
  right_mm: mm,
  target_mm: mm,
  pitch,
  lever,
  sense,
  place: fc.double({ min: -20, max: 100, noNaN: true }),
});

const twoOf = (one: {
  readonly left_mm: number;
  readonly right_mm: number;
  readonly target_mm: number;
  readonly pitch: number;
  readonly lever: number;
  readonly sense: 1 | -1;
  readonly place: number;
}): screws.TwoScrews => ({
  gap: { left_mm: one.left_mm, right_mm: one.right_mm, leftPlace_mm: 0, rightPlace_mm: 300 },
  target_mm: one.target_mm,
  screws: [
    { place_mm: one.place, pitch_mm: one.pitch, lever: one.lever, sense: one.sense },
    { place_mm: 280, pitch_mm: 0.5 },
  ],
});

/** The line through both ends once the screws have been turned so far. */
function turned(setting: screws.TwoScrews, turns: readonly [number, number]): line.MeasuredGap {
  const [first, second] = setting.screws;
  const moved = [first, second].map(
    (screw, index) => (turns[index] ?? 0) * screw.pitch_mm * (screw.lever ?? 1) * (screw.sense ?? 1),
  );
  const at = (place: number) => {
    const t = (place - first.place_mm) / (second.place_mm - first.place_mm);
    return line.lineAt(setting.gap, place) + (moved[0] ?? 0) * (1 - t) + (moved[1] ?? 0) * t;
  };
  return { ...setting.gap, left_mm: at(0), right_mm: at(300) };
}

describe('two screws', () => {
  it('turned exactly bring both ends to the target: the inverse of turning', () => {
    fc.assert(
      fc.property(setting, (one) => {
        const two = twoOf(one);
        const after = turned(two, [value(screws.screwTurns(two, 0)), value(screws.screwTurns(two, 1))]);
        return (
          Math.abs(after.left_mm / two.target_mm - 1) < 1e-6 &&
          Math.abs(after.right_mm / two.target_mm - 1) < 1e-6
        );
      }),
    );
  });

  it('turned as planned give the gaps that the plan says, each within its band', () => {
    fc.assert(
      fc.property(setting, (one) => {
        const two = twoOf(one);
        const plan = screws.planScrews(two, 20);
        if (!plan.ok) return plan.refusal.type === 'bars-meet';
        const { rounded_turns, predicted, ends } = plan.value;
        const after = turned(two, rounded_turns);
        return (
          Math.abs(after.left_mm - predicted.left_mm) < 1e-9 &&
          Math.abs(after.right_mm - predicted.right_mm) < 1e-9 &&
          ends.left.value === predicted.left_mm &&
          ends.right.band.low <= predicted.right_mm
        );
      }),
    );
  });

  it('turn the other way where the sense is the other one', () => {
    fc.assert(
      fc.property(setting, (one) => {
        const here = value(screws.screwTurns(twoOf(one), 0));
        const there = value(screws.screwTurns(twoOf({ ...one, sense: one.sense === 1 ? -1 : 1 }), 0));
        return Math.abs(here + there) < 1e-9 * Math.max(1, Math.abs(here));
      }),
    );
  });
});

describe('a gap along its bars', () => {
  const gap = fc.record({ left_mm: mm, right_mm: mm });
  it('is the same line seen from the other end', () => {
    fc.assert(
      fc.property(gap, fc.double({ min: 0, max: 300, noNaN: true }), ({ left_mm, right_mm }, place) => {
        const one = { left_mm, right_mm, leftPlace_mm: 0, rightPlace_mm: 300 };
        const mirrored = { ...one, left_mm: right_mm, right_mm: left_mm };
        return (
          Math.abs(value(line.gapAlong(one, place, 20)) - value(line.gapAlong(mirrored, 300 - place, 20))) <
          1e-9
        );
      }),
    );
  });

  it('changes the sign of wedge and spread when its ends are exchanged', () => {
    fc.assert(
      fc.property(gap, ({ left_mm, right_mm }) => {
        const one = { left_mm, right_mm, leftPlace_mm: 0, rightPlace_mm: 300 };
        const mirrored = { ...one, left_mm: right_mm, right_mm: left_mm };
        return (
          Math.abs(value(line.wedge(one)) + value(line.wedge(mirrored))) < 1e-9 &&
          Math.abs(
            value(line.breakdownSpread(left_mm, right_mm, 1)) +
              value(line.breakdownSpread(right_mm, left_mm, 1)),
          ) < 1e-12
        );
      }),
    );
  });

  it('may be off by what is allowed and then spreads by that much, for small spreads', () => {
    fc.assert(
      fc.property(mm, fc.double({ min: 0.5, max: 4, noNaN: true }), (gap_mm, bar) => {
        const off_mm = value(line.allowedMismatch(gap_mm, bar, 0.005)) / 1000;
        const spread = value(line.breakdownSpread(gap_mm - off_mm / 2, gap_mm + off_mm / 2, bar));
        return Math.abs(spread / 0.005 - 1) < 1e-3;
      }),
    );
  });

  it('is known best between the places where it was measured', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0, max: 300, noNaN: true }),
        fc.double({ min: 1, max: 300, noNaN: true }),
        (inside, beyond) => {
          const one = { left_mm: 3, right_mm: 3, leftPlace_mm: 0, rightPlace_mm: 300 };
          const width = (place: number) => {
            const along = line.gapAlong(one, place, 20);
            return along.ok ? along.value.band.high - along.value.band.low : Number.NaN;
          };
          return width(inside) <= width(300 + beyond);
        },
      ),
    );
  });
});
