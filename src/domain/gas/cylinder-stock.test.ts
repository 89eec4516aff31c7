import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { flowTime, freeVolumeReal } from './cylinder';
import { CYLINDER_GASES, orderPressure, usableGas, wholeGas } from './cylinder-stock';

const FULL = { volume_L: 50, pressure_bar_abs: 200, temperature_C: 20, gas: 'N2', rest_bar_abs: 5 };
const valueOf = <T extends { readonly value: number }>(result: { ok: true; value: T } | { ok: false }) =>
  result.ok ? result.value.value : Number.NaN;

describe('what a cylinder may still give', () => {
  // 50 L at 200 bar(abs) and 20 C hold 9.22 m3 at 15 C and 1 atm: physics G, from CoolProp 8.0.0.
  it('is 9.22 m3 for a full one of 50 L, all of it counted', () => {
    expect(valueOf(wholeGas(FULL)) / 1000).toBeCloseTo(9.22, 2);
  });

  it('leaves out what stays in it', () => {
    const rest = freeVolumeReal({ volume_L: 50, pressure_bar_abs: 5, temperature_C: 20 });
    expect(valueOf(usableGas(FULL))).toBeCloseTo(valueOf(wholeGas(FULL)) - valueOf(rest), 9);
  });

  it('feeds a flow as long as the plain law says', () => {
    const minutes = flowTime(FULL, { flow_L_min: 4, rest_bar_abs: 5 });
    expect(valueOf(usableGas(FULL)) / 4).toBeCloseTo(valueOf(minutes), 9);
  });

  // Helium at 200 bar and 20 C: Z about 1.1 (from memory), so the ideal gas says a tenth too much.
  it('holds helium as a real gas within its band', () => {
    const helium = wholeGas({ ...FULL, gas: 'He' });
    const real_L = valueOf(helium) / 1.1;
    expect(helium.ok && helium.value.band.low).toBeLessThan(real_L);
    expect(helium).toMatchObject({ value: { warnings: [{ type: 'ideal-only' }] } });
  });

  it.each(['CO2', 'SF6'])('is not told from the pressure of %s', (gas) => {
    expect(wholeGas({ ...FULL, gas })).toMatchObject({ refusal: { type: 'liquefied', field: 'gas' } });
  });

  it.each([
    [{ gas: 'butane' }, 'gas'],
    [{ rest_bar_abs: 201 }, 'rest_bar_abs'],
    [{ gas: 'Ar', pressure_bar_abs: 251 }, 'pressure'],
    [{ volume_L: 0 }, 'volume_L'],
    [{ temperature_C: Number.NaN }, 'temperature_C'],
  ])('refuses %j beside %s', (change, field) => {
    expect(usableGas({ ...FULL, ...change })).toMatchObject({ refusal: { field } });
  });
});

describe('the pressure to order at', () => {
  it('is where just that much is left, for every gas', () => {
    fc.assert(
      fc.property(
        fc.constantFrom(...CYLINDER_GASES),
        fc.double({ min: 1, max: 6000, noNaN: true }),
        (...of) => {
          const [gas, needed] = of;
          const at = orderPressure({ ...FULL, gas }, needed);
          if (!at.ok || at.value === null) return false;
          const left = valueOf(usableGas({ ...FULL, gas, pressure_bar_abs: at.value }));
          return left >= needed && left < needed + 1e-6;
        },
      ),
      { numRuns: 60, seed: 4 },
    );
  });

  it('is none where no cylinder of that size holds so much, and the rest itself for nothing', () => {
    expect(orderPressure(FULL, 1e6)).toEqual({ ok: true, value: null });
    expect(orderPressure(FULL, 0)).toEqual({ ok: true, value: 5 });
  });
});
