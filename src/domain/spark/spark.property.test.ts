import fc from 'fast-check';
import { describe, it } from 'vitest';
import { describeSoundness, type Probes } from '../../../tests/support/sound-results';
import type { Answer } from '../units/answer';
import type { Result } from '../units/result';
import * as phase from './resistive-phase';
import * as inductance from './spark-inductance';
import * as resistance from './spark-resistance';

const PROBES: Probes = {
  resistivePhase: ([a, b, c, d]) =>
    phase.resistivePhase({ drive_ohm: a, field_MV_m: b, densityRatio: c, channels: 1 + d }),
  sparkRiseTime: ([a, b, c, d]) =>
    phase.sparkRiseTime({ drive_ohm: a, field_MV_m: b, densityRatio: c, inductance_nH: d }),
  sparkInductance: ([a, b, c]) =>
    inductance.sparkInductance({ length_cm: a, radius_cm: b, return_cm: b + c }),
  rompeWeizelResistance: ([a, b, c, d]) =>
    resistance.rompeWeizelResistance({
      gap_cm: a,
      pressure_atm_abs: b,
      constant_cm2_atm_V2s: c,
      action_A2s: d,
    }),
  toeplerResistance: ([a, b, c]) =>
    resistance.toeplerResistance({ gap_cm: a, constant_Vs_cm: b * 1e-4, charge_C: c * 1e-6 }),
};

describeSoundness('spark', PROBES, [phase, inductance, resistance]);

const value = (result: Result<Answer>) => (result.ok ? result.value.value : Number.NaN);
const field = fc.double({ min: 0.5, max: 20, noNaN: true });
const more = fc.double({ min: 1.001, max: 5, noNaN: true });

describe('the speed of a spark', () => {
  it('grows with field and drive, and falls with density', () => {
    fc.assert(
      fc.property(field, more, fc.double({ min: 0.1, max: 50, noNaN: true }), (MV_m, by, ohm) => {
        const gap = { drive_ohm: ohm, field_MV_m: MV_m, densityRatio: 1 };
        const phase_ns = value(phase.resistivePhase(gap));
        return (
          value(phase.resistivePhase({ ...gap, field_MV_m: by * MV_m })) < phase_ns &&
          value(phase.resistivePhase({ ...gap, drive_ohm: by * ohm })) < phase_ns &&
          value(phase.resistivePhase({ ...gap, densityRatio: by })) > phase_ns
        );
      }),
    );
  });

  it('counts N channels as N times the impedance', () => {
    fc.assert(
      fc.property(field, fc.integer({ min: 1, max: 20 }), (MV_m, channels) => {
        const gap = { drive_ohm: 1, field_MV_m: MV_m, densityRatio: 1 };
        const many = value(phase.resistivePhase({ ...gap, channels }));
        const stiff = value(phase.resistivePhase({ ...gap, drive_ohm: channels }));
        return Math.abs(many / stiff - 1) < 1e-12;
      }),
    );
  });

  it('is never faster than its resistive phase alone', () => {
    fc.assert(
      fc.property(field, fc.double({ min: 0, max: 100, noNaN: true }), (MV_m, inductance_nH) => {
        const gap = { drive_ohm: 1, field_MV_m: MV_m, densityRatio: 1 };
        return (
          value(phase.sparkRiseTime({ ...gap, inductance_nH })) >=
          2.2 * value(phase.resistivePhase(gap)) * (1 - 1e-12)
        );
      }),
    );
  });
});

describe('the resistance of a spark', () => {
  it('falls as current or charge has passed, and grows with the gap', () => {
    fc.assert(
      fc.property(more, fc.double({ min: 1e-9, max: 1e-3, noNaN: true }), (by, passed) => {
        const rw = { gap_cm: 0.3, pressure_atm_abs: 1, constant_cm2_atm_V2s: 0.8, action_A2s: passed };
        const toepler = { gap_cm: 0.3, constant_Vs_cm: 1e-4, charge_C: passed };
        return (
          value(resistance.rompeWeizelResistance({ ...rw, action_A2s: by * passed })) <
            value(resistance.rompeWeizelResistance(rw)) &&
          value(resistance.rompeWeizelResistance({ ...rw, gap_cm: 0.3 * by })) >
            value(resistance.rompeWeizelResistance(rw)) &&
          value(resistance.toeplerResistance({ ...toepler, charge_C: by * passed })) <
            value(resistance.toeplerResistance(toepler))
        );
      }),
    );
  });
});
