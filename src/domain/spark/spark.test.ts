import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { resistivePhase, sparkRiseTime } from './resistive-phase';
import { sparkInductance } from './spark-inductance';
import { rompeWeizelResistance, toeplerResistance } from './spark-resistance';

const value = (result: ReturnType<typeof resistivePhase>) => (result.ok ? result.value.value : Number.NaN);
const GAP = { drive_ohm: 1, field_MV_m: 3.7, densityRatio: 1 };

describe('resistivePhase', () => {
  // Worked from the law: 1 ohm, air at 1 atm, 3 mm.
  it('is 15.4 ns for a gap of 3 mm on 1 ohm', () => {
    expect(value(resistivePhase(GAP))).toBeCloseTo(15.4, 1);
  });

  it('is 21.5 times too fast for a field in kV/cm by mistake', () => {
    expect(value(resistivePhase(GAP)) / value(resistivePhase({ ...GAP, field_MV_m: 37 }))).toBeCloseTo(
      21.5,
      1,
    );
    expect(resistivePhase({ ...GAP, field_MV_m: 370 })).toMatchObject({
      refusal: { words: expect.stringContaining('not kV/cm') },
    });
  });

  it('shortens as pressure to the power -5/6 at a self-break voltage that stays', () => {
    const at = (bar: number) =>
      value(resistivePhase({ drive_ohm: 2, field_MV_m: 3.5 * bar, densityRatio: bar }));
    expect(Math.log(at(4) / at(1)) / Math.log(4)).toBeCloseTo(-5 / 6, 9);
  });

  it('shortens with channels side by side by their cube root', () => {
    expect(value(resistivePhase(GAP)) / value(resistivePhase({ ...GAP, channels: 8 }))).toBeCloseTo(2, 9);
  });
});

describe('sparkRiseTime', () => {
  it('is 2.2 times the resistive phase without inductance, and grows with it', () => {
    expect(value(sparkRiseTime({ ...GAP, inductance_nH: 0 })) / value(resistivePhase(GAP))).toBeCloseTo(
      2.2,
      9,
    );
    expect(
      value(sparkRiseTime({ ...GAP, inductance_nH: 10 })) -
        value(sparkRiseTime({ ...GAP, inductance_nH: 0 })),
    ).toBeCloseTo(22, 9);
  });
});

describe('sparkInductance', () => {
  it('is 10 to 15 nH for a centimetre of spark', () => {
    for (const [radius_cm, return_cm] of [
      [0.01, 2],
      [0.02, 4],
    ] as const) {
      const nH = value(sparkInductance({ length_cm: 1, radius_cm, return_cm }));
      expect(nH).toBeGreaterThan(10);
      expect(nH).toBeLessThan(15);
    }
  });

  it('refuses a return inside the spark', () => {
    expect(sparkInductance({ length_cm: 1, radius_cm: 0.1, return_cm: 0.1 })).toMatchObject({
      refusal: { field: 'return_cm' },
    });
  });
});

describe('spark resistance', () => {
  const RW = { gap_cm: 0.3, pressure_atm_abs: 2.5, constant_cm2_atm_V2s: 1, action_A2s: 1e-3 };
  const TOEPLER = { gap_cm: 0.3, constant_Vs_cm: 1e-4, charge_C: 2e-5 };

  it('carries the published range of its constant as its band', () => {
    expect(rompeWeizelResistance(RW)).toMatchObject({
      value: {
        value: expect.closeTo(10.6066, 4),
        band: { low: expect.closeTo(9.6825, 4), high: expect.closeTo(15, 4) },
      },
    });
    expect(toeplerResistance(TOEPLER)).toMatchObject({
      value: {
        value: expect.closeTo(1.5, 12),
        band: { low: expect.closeTo(0.6, 12), high: expect.closeTo(2.25, 12) },
      },
    });
  });

  it('says that it needs a start, and when its constant is unusual', () => {
    const types = (result: ReturnType<typeof toeplerResistance>) =>
      result.ok ? result.value.warnings.map((warning) => warning.type) : [];
    expect(types(rompeWeizelResistance(RW))).toEqual(['needs-a-start']);
    expect(types(rompeWeizelResistance({ ...RW, constant_cm2_atm_V2s: 3 }))).toContain('constant-unusual');
    expect(types(toeplerResistance({ ...TOEPLER, constant_Vs_cm: 4e-3 }))).toContain('constant-unusual');
  });

  it('has no value at the start', () => {
    expect(rompeWeizelResistance({ ...RW, action_A2s: 0 })).toMatchObject({
      refusal: { field: 'action_A2s' },
    });
    expect(toeplerResistance({ ...TOEPLER, charge_C: 0 })).toMatchObject({ refusal: { field: 'charge_C' } });
  });
});

it('every figure is finite or refused for any number', () => {
  const any = fc.double();
  fc.assert(
    fc.property(any, any, any, any, (x, y, z, u) =>
      [
        resistivePhase({ drive_ohm: x, field_MV_m: y, densityRatio: z, channels: u }),
        sparkRiseTime({ drive_ohm: x, field_MV_m: y, densityRatio: z, inductance_nH: u }),
        sparkInductance({ length_cm: x, radius_cm: y, return_cm: z }),
        rompeWeizelResistance({ gap_cm: x, pressure_atm_abs: y, constant_cm2_atm_V2s: z, action_A2s: u }),
        toeplerResistance({ gap_cm: x, constant_Vs_cm: y, charge_C: z }),
      ].every((result) => !result.ok || Number.isFinite(result.value.value)),
    ),
    { numRuns: 500 },
  );
});
