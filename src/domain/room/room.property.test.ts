import fc from 'fast-check';
import { describe, it } from 'vitest';
import { describeSoundness, type Probes } from '../../../tests/support/sound-results';
import type { Answer } from '../units/answer';
import type { Result } from '../units/result';
import * as air from './air-quality';
import * as pick from './pick-up';
import * as sound from './sound';

const PROBES: Probes = {
  ozoneLevel: ([a, b, c, d, e]) =>
    air.ozoneLevel({ power_W: a, yield_g_kWh: b, decay_per_h: c }, { room_m3: d, airChanges_h: e }),
  nitrogenOxideLevel: ([a, b, c, d]) =>
    air.nitrogenOxideLevel({ power_W: a, molecules_per_J: b * 1e16 }, { room_m3: c, airChanges_h: d }),
  inducedVoltage: ([a, b, c]) => pick.inducedVoltage({ area_cm2: a, distance_m: b, slope_A_s: c * 1e9 }),
  radiatedField: ([a, b, c, d]) =>
    pick.radiatedField({ area_cm2: a, distance_m: b, current_A: c, quarter_s: d * 1e-9 }),
  peakSoundLevel: ([a, b]) => sound.peakSoundLevel(a, b),
  hearingDistance: ([a]) => sound.hearingDistance(a),
};

describeSoundness('room', PROBES, [air, pick, sound]);

const value = (result: Result<Answer>) => (result.ok ? result.value.value : Number.NaN);
const near = (a: number, b: number, tolerance = 1e-9) => Math.abs(a / b - 1) < tolerance;
const positive = fc.double({ min: 0.1, max: 100, noNaN: true });
const more = fc.double({ min: 1.01, max: 5, noNaN: true });

describe('the air of a room', () => {
  it('gets worse with power and yield, and better with room, air and decay', () => {
    fc.assert(
      fc.property(positive, positive, more, (power_W, room_m3, by) => {
        const at = (W: number, m3: number, changes: number) =>
          value(
            air.ozoneLevel(
              { power_W: W, yield_g_kWh: 50, decay_per_h: 2 },
              { room_m3: m3, airChanges_h: changes },
            ),
          );
        const here = at(power_W, room_m3, 1);
        return (
          at(by * power_W, room_m3, 1) > here &&
          at(power_W, by * room_m3, 1) < here &&
          at(power_W, room_m3, by) < here
        );
      }),
    );
  });

  it('warns of nitrogen oxides no later at a higher level', () => {
    const worry = (power_W: number) => {
      const level = air.nitrogenOxideLevel(
        { power_W, molecules_per_J: 7e16 },
        { room_m3: 30, airChanges_h: 1 },
      );
      const types = level.ok ? level.value.warnings.map(({ type }) => type) : [];
      return types.includes('over-limit') ? 2 : types.includes('near-limit') ? 1 : 0;
    };
    fc.assert(fc.property(positive, more, (W, by) => worry(by * W) >= worry(W)));
  });
});

describe('sound', () => {
  it('is 140 dB at the distance given for it: the inverse', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.01, max: 1e4, noNaN: true }), (energy_J) => {
        return near(value(sound.peakSoundLevel(energy_J, value(sound.hearingDistance(energy_J)))), 140, 1e-6);
      }),
    );
  });

  it('falls by 6 dB at twice the distance and rises by 2 dB for twice the energy', () => {
    fc.assert(
      fc.property(positive, positive, (energy_J, distance_m) => {
        const here = value(sound.peakSoundLevel(energy_J, distance_m));
        return (
          Math.abs(here - value(sound.peakSoundLevel(energy_J, 2 * distance_m)) - 6.0206) < 1e-3 &&
          Math.abs(value(sound.peakSoundLevel(2 * energy_J, distance_m)) - here - 2.0069) < 1e-3
        );
      }),
    );
  });
});

describe('pick-up', () => {
  it('goes with area and slope and falls with distance', () => {
    fc.assert(
      fc.property(positive, positive, more, (area_cm2, distance_m, by) => {
        const V = (A: number, r: number, s: number) =>
          value(pick.inducedVoltage({ area_cm2: A, distance_m: r, slope_A_s: s }));
        const here = V(area_cm2, distance_m, 1e12);
        return (
          near(V(by * area_cm2, distance_m, 1e12), by * here) &&
          near(V(area_cm2, distance_m, by * 1e12), by * here) &&
          near(V(area_cm2, by * distance_m, 1e12), here / by)
        );
      }),
    );
  });

  it('radiates with the square of the frequency', () => {
    fc.assert(
      fc.property(positive, more, (ns, by) => {
        const at = (quarter_s: number) =>
          value(pick.radiatedField({ area_cm2: 5, distance_m: 3, current_A: 5000, quarter_s }));
        return near(at(by * ns * 1e-9), at(ns * 1e-9) / by ** 2);
      }),
    );
  });
});
