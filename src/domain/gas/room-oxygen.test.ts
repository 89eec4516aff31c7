import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Answer } from '../units/answer';
import type { Result } from '../units/result';
import {
  oxygenAfterDumpDisplaced,
  oxygenAfterDumpMixed,
  oxygenSealed,
  oxygenTransient,
  oxygenVentilated,
  oxygenWords,
  roomForDump,
  timeToOxygenLimit,
} from './room-oxygen';

const value = (result: Result<Answer>) => (result.ok ? result.value.value : Number.NaN);
const LEAK = { flow_L_min: 5, room_m3: 30 };
const flow = fc.double({ min: 0.01, max: 1000, noNaN: true });
const room = fc.double({ min: 1, max: 1000, noNaN: true });
const minutes = fc.double({ min: 0, max: 1e5, noNaN: true });

describe('oxygen in a room', () => {
  // 5 L/min in 30 m3 sealed: 7.2 h to 19.5 %, by hand.
  it('lasts 7.2 h in a sealed room', () => {
    expect(value(timeToOxygenLimit(LEAK)) / 60).toBeCloseTo(7.17, 2);
    expect(value(oxygenSealed(LEAK, value(timeToOxygenLimit(LEAK))))).toBeCloseTo(19.5, 9);
  });

  it('stays at the limit in just the room that a release asks for', () => {
    const room_m3 = value(roomForDump(9.22));
    expect(room_m3).toBeCloseTo(133.2, 1);
    expect(value(oxygenAfterDumpDisplaced(9.22, room_m3))).toBeCloseTo(19.5, 9);
  });

  it('is plain air without gas and without time', () => {
    expect(value(oxygenSealed(LEAK, 0))).toBe(20.95);
    expect(value(oxygenVentilated({ flow_L_min: 0, room_m3: 30 }, 0))).toBe(20.95);
    expect(value(oxygenAfterDumpMixed(0, 30))).toBe(20.95);
    expect(value(oxygenAfterDumpDisplaced(0, 30))).toBe(20.95);
  });

  it('goes from air to the long run with time, and is the sealed room without air changes', () => {
    fc.assert(
      fc.property(flow, room, minutes, (...[flow_L_min, room_m3, time_min]) => {
        const leak = { flow_L_min, room_m3 };
        const now = value(oxygenTransient(leak, 1, time_min));
        const later = value(oxygenTransient(leak, 1, 2 * time_min));
        const end = value(oxygenVentilated(leak, 1));
        return (
          later <= now + 1e-9 &&
          now >= end - 1e-9 &&
          Math.abs(value(oxygenTransient(leak, 0, time_min)) - value(oxygenSealed(leak, time_min))) < 1e-9
        );
      }),
    );
    expect(value(oxygenTransient(LEAK, 2, 1e6))).toBeCloseTo(value(oxygenVentilated(LEAK, 2)), 9);
  });

  it('is never higher when the air is pushed out first', () => {
    fc.assert(
      fc.property(fc.double({ min: 0, max: 1e5, noNaN: true }), room, (gas_m3, room_m3) => {
        const displaced = value(oxygenAfterDumpDisplaced(gas_m3, room_m3));
        return displaced >= 0 && displaced <= value(oxygenAfterDumpMixed(gas_m3, room_m3)) + 1e-9;
      }),
    );
  });

  it('warns under 19.5 %, and never calls a room harmless', () => {
    expect(oxygenAfterDumpMixed(9.22, 30)).toMatchObject({
      value: { warnings: [{ type: 'oxygen-deficient' }] },
    });
    expect(oxygenSealed(LEAK, 1)).toMatchObject({ value: { warnings: [] } });
    for (const percent of [21, 19.4, 15, 8]) expect(oxygenWords(percent)).not.toMatch(/safe|harmless/i);
    expect(new Set([21, 19.4, 15, 8].map(oxygenWords)).size).toBe(4);
  });

  it.each([Number.NaN, Infinity, -1])('refuses %d', (bad) => {
    expect(oxygenSealed({ ...LEAK, flow_L_min: bad }, 1)).toMatchObject({ refusal: { field: 'flow_L_min' } });
    expect(oxygenVentilated({ ...LEAK, room_m3: bad }, 1)).toMatchObject({ refusal: { field: 'room_m3' } });
    expect(oxygenTransient(LEAK, bad, 1)).toMatchObject({ refusal: { field: 'airChanges_h' } });
    expect(oxygenSealed(LEAK, bad)).toMatchObject({ refusal: { field: 'time_min' } });
    expect(oxygenAfterDumpMixed(bad, 30)).toMatchObject({ refusal: { field: 'gas_m3' } });
  });
});
