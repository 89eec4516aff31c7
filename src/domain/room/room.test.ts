import { describe, expect, it } from 'vitest';
import type { Answer } from '../units/answer';
import type { Result } from '../units/result';
import { nitrogenOxideLevel, ozoneLevel } from './air-quality';
import { inducedVoltage, radiatedField } from './pick-up';
import { hearingDistance, peakSoundLevel } from './sound';

const value = (result: Result<Answer>) => (result.ok ? result.value.value : Number.NaN);
const types = (result: Result<Answer>) =>
  result.ok ? result.value.warnings.map(({ type }) => type) : ['refused'];
const ROOM = { room_m3: 30, airChanges_h: 1 };

describe('ozone', () => {
  const corona = { power_W: 1, yield_g_kWh: 50, decay_per_h: 2 };

  it('passes its limit from a watt of corona in a small room', () => {
    expect(value(ozoneLevel(corona, ROOM))).toBeCloseTo(0.278, 3);
    expect(types(ozoneLevel(corona, ROOM))).toEqual(['over-limit']);
  });

  it('warns within its own uncertainty, and is silent far below', () => {
    expect(types(ozoneLevel({ ...corona, power_W: 0.1 }, ROOM))).toEqual(['near-limit']);
    expect(types(ozoneLevel({ ...corona, power_W: 0.01 }, ROOM))).toEqual([]);
  });

  it('never settles without air changes and decay', () => {
    expect(ozoneLevel({ ...corona, decay_per_h: 0 }, { ...ROOM, airChanges_h: 0 })).toMatchObject({
      refusal: { field: 'airChanges_h' },
    });
    expect(ozoneLevel({ ...corona, power_W: Number.NaN }, ROOM)).toMatchObject({
      refusal: { field: 'power_W' },
    });
  });
});

describe('nitrogen oxides', () => {
  it('grow with power and fall with air changes', () => {
    const spark = { power_W: 2, molecules_per_J: 7e16 };
    expect(value(nitrogenOxideLevel(spark, ROOM))).toBeCloseTo(0.671, 3);
    expect(value(nitrogenOxideLevel(spark, { ...ROOM, airChanges_h: 2 }))).toBeCloseTo(0.3355, 3);
    expect(types(nitrogenOxideLevel({ ...spark, power_W: 20 }, ROOM))).toEqual(['over-limit']);
    expect(nitrogenOxideLevel(spark, { ...ROOM, airChanges_h: 0 })).toMatchObject({
      refusal: { field: 'airChanges_h' },
    });
  });
});

describe('sound', () => {
  it('falls 6 dB at twice the distance and grows 10 dB for a thousandfold square root of energy', () => {
    expect(value(peakSoundLevel(0.4, 1)) - value(peakSoundLevel(0.4, 2))).toBeCloseTo(6.02, 2);
    expect(value(peakSoundLevel(1, 1)) - value(peakSoundLevel(0.001, 1))).toBeCloseTo(20, 9);
  });

  it('meets 140 dB at the hearing distance', () => {
    const metres = value(hearingDistance(0.4));
    expect(metres).toBeCloseTo(2.6 * Math.cbrt(0.4), 2);
    expect(value(peakSoundLevel(0.4, metres))).toBeCloseTo(140, 9);
    expect(types(peakSoundLevel(0.4, 0.9 * metres))).toEqual(['hearing']);
    expect(types(peakSoundLevel(0.4, 1.1 * metres))).toEqual([]);
  });

  it.each([0, -1, Number.NaN, Infinity])('refuses %d J', (J) => {
    expect(peakSoundLevel(J, 1)).toMatchObject({ refusal: { field: 'energy_J' } });
    expect(hearingDistance(J).ok).toBe(false);
  });
});

describe('pick-up', () => {
  it('is 670 V in 10 cm2 at 0.3 m from 1e12 A/s', () => {
    expect(value(inducedVoltage({ area_cm2: 10, distance_m: 0.3, slope_A_s: 1e12 }))).toBeCloseTo(666.7, 1);
  });

  it('radiates with the square of the frequency, and says so where it is the near field', () => {
    const loop = { area_cm2: 5, distance_m: 3, current_A: 5000, quarter_s: 5e-9 };
    expect(value(radiatedField({ ...loop, quarter_s: 10e-9 })) * 4).toBeCloseTo(
      value(radiatedField(loop)),
      9,
    );
    expect(types(radiatedField(loop))).toEqual([]);
    expect(types(radiatedField({ ...loop, distance_m: 0.5 }))).toEqual(['near-field']);
  });

  it.each([-1, Number.NaN, Infinity])('refuses %d', (bad) => {
    expect(inducedVoltage({ area_cm2: bad, distance_m: 0.3, slope_A_s: 1 })).toMatchObject({
      refusal: { field: 'area_cm2' },
    });
    expect(radiatedField({ area_cm2: 1, distance_m: 1, current_A: 1, quarter_s: bad })).toMatchObject({
      refusal: { field: 'quarter_s' },
    });
  });
});
