import fc from 'fast-check';
import { describe, it } from 'vitest';
import { describeSoundness, type Probes } from '../../../tests/support/sound-results';
import * as wear from './part-wear';

const PROBES: Probes = {
  partWear: ([a, b, c, d, e, f, g]) =>
    wear.partWear(
      { ratedShots: 1 + 1e4 * a, exponent: 1 + b },
      [
        { shots: c, stress_ratio: d },
        { shots: e, stress_ratio: f },
      ],
      g,
    ),
};

describeSoundness('wear', PROBES, [wear]);

const LAW = { ratedShots: 1e6, exponent: 8 };
const endured = fc.array(
  fc.record({
    shots: fc.integer({ min: 0, max: 100_000 }),
    stress_ratio: fc.double({ min: 0.2, max: 1.2, noNaN: true }),
  }),
  { maxLength: 8 },
);
const usedBy = (history: readonly wear.EnduredShots[]) => {
  const worn = wear.partWear(LAW, history, 1);
  return worn.ok ? worn.value : undefined;
};

describe('wear', () => {
  it('adds up, whatever the order', () => {
    fc.assert(
      fc.property(endured, endured, (one, other) => {
        const [a, b, both, turned] = [one, other, [...one, ...other], [...other, ...one]].map(usedBy);
        if (!a || !b || !both || !turned) return false;
        return (
          Math.abs(a.used + b.used - both.used) < 1e-9 * Math.max(1, both.used) &&
          Math.abs(both.used - turned.used) < 1e-9 * Math.max(1, both.used) &&
          both.shots === turned.shots
        );
      }),
    );
  });

  it('leaves no more shots after more shots, nor at more stress', () => {
    fc.assert(
      fc.property(endured, fc.integer({ min: 1, max: 100_000 }), (history, shots) => {
        const before = usedBy(history);
        const after = usedBy([...history, { shots, stress_ratio: 1 }]);
        const harder = wear.partWear(LAW, history, 1.1);
        if (!before || !after || !harder.ok) return false;
        return (
          after.remaining.value <= before.remaining.value &&
          after.remaining.band.low <= before.remaining.band.low &&
          harder.value.remaining.value <= before.remaining.value
        );
      }),
    );
  });

  it('of a part at its rated stress is shots over rated shots: the inverse', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 1_000_000 }), (shots) => {
        const worn = usedBy([{ shots, stress_ratio: 1 }]);
        return worn !== undefined && Math.abs(worn.remaining.value + shots - 1e6) < 1e-3;
      }),
    );
  });
});
