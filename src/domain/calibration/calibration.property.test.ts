import fc from 'fast-check';
import { describe, it } from 'vitest';
import { describeSoundness, type Draw, type Probes } from '../../../tests/support/sound-results';
import type { GapInput } from '../gap/gap-input';
import * as drift from './drift';
import type { SelfBreakReading } from './fit-kept';
import * as plausibility from './plausibility';
import * as law from './rig-law';
import * as fit from './self-break-fit';

const RIG: law.RigGap = { gas: 'air', electrodes: { shape: 'plane' }, irradiated: true };
const gapOf = ([a, b, c]: Draw): GapInput => ({
  ...RIG,
  gap_mm: a,
  u_gap_mm: 0.05,
  pressure: { bar_abs: b },
  u_pressure_bar: 0.02,
  temperature_C: c,
  u_temperature_C: 3,
});
const readingsOf = (draw: Draw): readonly SelfBreakReading[] =>
  [1, 1.02, 0.98, 1.01, 0.99].map((scatter, index) => ({
    name: `A-${String(index)}`,
    shot: draw[4] * index,
    gap_mm: 1 + Math.abs(draw[0] % 5) + index,
    pressure_bar_abs: draw[1] / 10 + 0.5,
    temperature_C: draw[2],
    voltage_kV: draw[3] * scatter,
  }));

const PROBES: Probes = {
  testDrift: ([a, b, c, d, e, f, g, h]) =>
    drift.testDrift(
      [a, b, c, d, e, f, g, h].map((residual, index) => ({
        shot: index,
        residual: Math.abs(residual) <= 1e3 ? residual : 0,
      })),
    ),
  plausibility: (draw) =>
    plausibility.plausibility({
      gap: gapOf(draw),
      how: draw[4] > 5 ? 'held' : 'self-break',
      voltage_kV: Number.isFinite(draw[3]) ? draw[3] : 1,
      broke: draw[5] > 1,
      before: [2.5, -1],
    }),
  rigLaw: (draw) => law.rigLaw(RIG)({ gap_mm: draw[0], pressure_bar_abs: draw[1], temperature_C: draw[2] }),
  fitSelfBreak: (draw) => fit.fitSelfBreak(RIG, readingsOf(draw)),
  calibratedSelfBreak: (draw) => {
    const fitted = fit.fitSelfBreak(RIG, readingsOf(draw));
    if (!fitted.ok) return fitted;
    return fit.calibratedSelfBreak(fitted.value, { gap_mm: 3, pressure_bar_abs: draw[5], temperature_C: 20 });
  },
};

describeSoundness('calibration', PROBES, [drift, plausibility, law, fit]);

describe('a rig\u2019s own fit', () => {
  const exact = (scale: number) =>
    [2, 3, 4, 5, 6, 7].map((gap_mm, index): SelfBreakReading => {
      const setting = { gap_mm, pressure_bar_abs: 1.2, temperature_C: 20 };
      const expected = law.rigLaw(RIG)(setting);
      return {
        ...setting,
        name: String(index),
        shot: index,
        voltage_kV:
          scale * (expected.ok ? expected.value : Number.NaN) * (1 + (index % 2 === 0 ? 1e-3 : -1e-3)),
      };
    });

  it('finds the scale that the readings were made with, and gives the readings back', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.8, max: 1.2, noNaN: true }), (scale) => {
        const readings = exact(scale);
        const fitted = fit.fitSelfBreak(RIG, readings);
        if (!fitted.ok) return false;
        const again = fit.calibratedSelfBreak(fitted.value, {
          gap_mm: 4,
          pressure_bar_abs: 1.2,
          temperature_C: 20,
        });
        const read = readings[2]?.voltage_kV ?? Number.NaN;
        return (
          fitted.value.scale.low <= scale &&
          fitted.value.scale.high >= scale &&
          again.ok &&
          Math.abs(again.value.value / read - 1) < 3e-3
        );
      }),
      { numRuns: 30 },
    );
  });

  it('does not mind the order of the readings', () => {
    fc.assert(
      fc.property(fc.shuffledSubarray(exact(1.05), { minLength: 6, maxLength: 6 }), (readings) => {
        const [one, other] = [fit.fitSelfBreak(RIG, exact(1.05)), fit.fitSelfBreak(RIG, readings)];
        return one.ok && other.ok && Math.abs(one.value.scale.value - other.value.scale.value) < 1e-9;
      }),
      { numRuns: 20 },
    );
  });
});

describe('drift', () => {
  it('changes its sign with the residuals and stays as sure', () => {
    const residuals = fc.array(fc.double({ min: -0.05, max: 0.05, noNaN: true }), {
      minLength: 6,
      maxLength: 20,
    });
    fc.assert(
      fc.property(residuals, (list) => {
        const of = (sign: number) =>
          drift.testDrift(list.map((residual, shot) => ({ shot, residual: sign * residual })));
        const [up, down] = [of(1), of(-1)];
        if (up.type === 'too-few' || down.type === 'too-few') return up.type === down.type;
        return (
          Math.abs(up.per1000.value + down.per1000.value) < 1e-9 && Math.abs(up.chance - down.chance) < 1e-9
        );
      }),
    );
  });
});
