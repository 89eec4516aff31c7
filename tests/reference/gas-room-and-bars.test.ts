import { describe, expect, it } from 'vitest';
import { screwTurns } from '../../src/domain/alignment/screws';
import { exceedsTouchLimit } from '../../src/domain/capacitor/touch';
import { timeToSelfBreak } from '../../src/domain/charging/rate-limits';
import { repetitionRate } from '../../src/domain/charging/relaxation';
import { oxygenAfterDumpDisplaced, oxygenSealed, timeToOxygenLimit } from '../../src/domain/gas/room-oxygen';
import { ozoneLevel } from '../../src/domain/room/air-quality';
import { off, valueOf } from './answer-value';

describe('oxygen in a room', () => {
  // 0.21 (V - v)/V after a release: EIGA Doc 44, Hazards of Oxygen-Deficient Atmospheres (from memory), which takes 21 %
  // for dry air where this project takes 20.95.
  it.each([
    [50, 10, 16.8],
    [100, 10, 18.9],
    [40, 4, 18.9],
    [30, 10, 14],
  ])('%d m3 after %d m3 of gas: %d per cent', (room_m3, gas_m3, percent) => {
    expect(off(oxygenAfterDumpDisplaced(gas_m3, room_m3), percent)).toBeLessThan(0.003);
  });

  // 19.5 % is the line of 29 CFR 1910.146; when it is crossed the level must be that.
  it.each([
    [5, 30],
    [20, 60],
  ])('is 19.5 per cent at the time given for it: %d L/min in %d m3', (flow_L_min, room_m3) => {
    const inflow = { flow_L_min, room_m3 };
    expect(off(oxygenSealed(inflow, valueOf(timeToOxygenLimit(inflow))), 19.5)).toBeLessThan(1e-9);
  });
});

describe('ozone', () => {
  // 1 ppm is 1.96 mg/m3 at 25 C: NIOSH Pocket Guide to Chemical Hazards (from memory); 1.993 at 20 C.
  it.each([
    [1000, 1, 100, 1],
    [100, 10, 50, 4],
  ])('%d W at %d g/kWh in %d m3 and %d an hour', (power_W, yield_g_kWh, room_m3, airChanges_h) => {
    const mg_m3 = (power_W * yield_g_kWh) / (room_m3 * airChanges_h);
    const ppm = mg_m3 / (1.96 * (298.15 / 293.15));
    const level = ozoneLevel({ power_W, yield_g_kWh, decay_per_h: 0 }, { room_m3, airChanges_h });
    expect(off(level, ppm)).toBeLessThan(0.003);
  });
});

describe('charging through a resistance', () => {
  // A capacitor stands at 63.2, 86.5, 95.0, 98.2 and 99.3 % after one to five time constants: Horowitz and Hill, The Art
  // of Electronics, chapter 1; from memory.
  it.each([
    [1, 63.2, 0.002],
    [2, 86.5, 0.002],
    [3, 95, 0.002],
    [4, 98.2, 0.005],
    [5, 99.3, 0.01],
  ])('%d time constants: %d per cent', (constants, percent, tolerance) => {
    const rate = repetitionRate({
      ballast_ohm: 1e7,
      capacitance_F: 1e-9,
      supply_V: 20_000,
      break_V: 200 * percent,
    });
    expect(off(rate, 1 / (constants * 0.01))).toBeLessThan(tolerance);
  });

  it('takes as long by the plan, where the supply has current enough', () => {
    const charging = { supply_kV: 20, supply_mA: 100, ballast_Mohm: 10, bleed_Mohm: null };
    expect(off(timeToSelfBreak(charging, { capacitance_F: 1e-9, break_kV: 12.64 }), 0.01)).toBeLessThan(
      0.002,
    );
  });
});

describe('screws', () => {
  // Pitch in mm. Coarse metric threads of ISO 261; ASME B1.1 for 10-32 and 1/4-20; both from memory. A bar 1 mm too
  // close at both ends needs one over the pitch in turns of each.
  it.each([
    ['M3', 0.5, 2],
    ['M4', 0.7, 1.4286],
    ['M5', 0.8, 1.25],
    ['M6', 1, 1],
    ['M8', 1.25, 0.8],
    ['10-32', 25.4 / 32, 1.2598],
    ['1/4-20', 25.4 / 20, 0.7874],
  ] as const)('%s, pitch %d mm: %d turns a millimetre', (_thread, pitch_mm, turns) => {
    const setting = {
      gap: { left_mm: 2, right_mm: 2, leftPlace_mm: 0, rightPlace_mm: 300 },
      target_mm: 3,
      screws: [
        { place_mm: 20, pitch_mm },
        { place_mm: 280, pitch_mm },
      ],
    } as const;
    expect(off(screwTurns(setting, 0), turns)).toBeLessThan(5e-5);
    expect(off(screwTurns(setting, 1), turns)).toBeLessThan(5e-5);
  });
});

describe('what may be touched', () => {
  // IEC 60335-1, 8.1.4: 45 uC from 450 V to 15 kV, 350 mJ above; read in quotation.
  it.each([
    [1000, 44e-9, false],
    [1000, 46e-9, true],
    [10_000, 4.4e-9, false],
    [10_000, 4.6e-9, true],
    [20_000, 1.7e-9, false],
    [20_000, 1.8e-9, true],
  ])('%d V on %d F is over the limit: %s', (voltage_V, capacitance_F, over) => {
    expect(exceedsTouchLimit(capacitance_F, voltage_V)).toEqual({ ok: true, value: over });
  });
});
