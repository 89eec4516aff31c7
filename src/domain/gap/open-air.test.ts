import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { bareClearance, voltageForClearance } from './clearance';
import { airPenalty, standardAtmosphere, waterVapour_g_m3 } from './open-air';

const valueOf = (result: { ok: true; value: { value: number } } | { ok: false }) =>
  result.ok ? result.value.value : Number.NaN;
const AIR = { ambient_bar_abs: 1.01325, temperature_C: 25, humidity_percent: null };

describe('air at the bench', () => {
  it('counts as the table\u2019s own at 25 C and 1 atm', () => {
    expect(valueOf(airPenalty(AIR))).toBeCloseTo(1, 9);
  });

  it('asks for more when thin and gives nothing back when dense', () => {
    // By hand: (1.01325 / 0.8) (293 / 298) at 20 C.
    const thin = valueOf(airPenalty({ ...AIR, ambient_bar_abs: 0.8, temperature_C: 20 }));
    expect(thin).toBeCloseTo((1.01325 / 0.8) * (293 / 298), 6);
    expect(valueOf(airPenalty({ ...AIR, ambient_bar_abs: 1.05, temperature_C: 0 }))).toBe(1);
  });

  it('asks for more when dry and gives nothing back when damp', () => {
    // Points under direct voltage at 1 g/m3: 1 - 0.14 - 0.022, IEC 60060-1, from memory.
    expect(valueOf(airPenalty({ ...AIR, humidity_percent: 0 }))).toBeCloseTo(1 / 0.838, 6);
    expect(valueOf(airPenalty({ ...AIR, humidity_percent: 90 }))).toBe(1);
    expect(airPenalty({ ...AIR, humidity_percent: 90 })).toMatchObject({
      value: { warnings: [{ type: 'damp' }] },
    });
  });

  // Saturated air: 17.3 g/m3 at 20 C, 4.85 at 0 C (steam tables, from memory).
  it.each([
    [20, 17.3],
    [0, 4.85],
  ])('holds at %d C at most %d g/m3 of water', (celsius, grams) => {
    expect(Math.abs(waterVapour_g_m3(100, celsius) / grams - 1)).toBeLessThan(0.01);
  });

  // ICAO standard atmosphere, from memory: 0.8988 bar at 1,000 m, 0.7012 bar at 3,000 m.
  it.each([
    [0, 1.01325],
    [1000, 0.8988],
    [3000, 0.7012],
  ])('stands at %d m under %d bar', (altitude, bar) => {
    expect(valueOf(standardAtmosphere(altitude))).toBeCloseTo(bar, 3);
  });

  it.each([[{ ambient_bar_abs: -1 }], [{ temperature_C: Number.NaN }], [{ humidity_percent: 101 }]])(
    'refuses %j',
    (change) => {
      expect(airPenalty({ ...AIR, ...change }).ok).toBe(false);
    },
  );
});

describe('the voltage for a clearance', () => {
  // AIEE table, read: 20 kV is 1.75 cm between points, so bare parts stand 52.5 mm apart.
  it('is 20 kV at 52.5 mm', () => {
    expect(valueOf(bareClearance(20))).toBeCloseTo(52.5, 9);
    expect(valueOf(voltageForClearance(52.5))).toBeCloseTo(20, 6);
  });

  it('asks back for no more than the distance that there is', () => {
    fc.assert(
      fc.property(fc.double({ min: 12.6, max: 300, noNaN: true }), (distance_mm) => {
        const needed = valueOf(bareClearance(valueOf(voltageForClearance(distance_mm))));
        return needed <= distance_mm + 1e-8;
      }),
      { seed: 4 },
    );
  });

  it('never goes beyond the table', () => {
    expect(valueOf(voltageForClearance(1000))).toBe(40);
    expect(voltageForClearance(12.5)).toMatchObject({ refusal: { field: 'distance_mm' } });
    expect(bareClearance(40.1)).toMatchObject({ refusal: { field: 'voltage_kV' } });
  });
});
