import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { integrate } from '../numerics/integrate';
import { formativeTime, rampBreakdownField } from './time-lag';

const AIR_G_CM3 = 0.0012;
const value = (result: ReturnType<typeof formativeTime>) => (result.ok ? result.value.value : Number.NaN);

describe('formativeTime', () => {
  // T. H. Martin 1989, from memory: air at 60 kV/cm and 1 atm, 5.6 ns.
  it('is 5.6 ns in air at 60 kV/cm', () => {
    expect(value(formativeTime(60, AIR_G_CM3)) * 1e9).toBeCloseTo(5.58, 2);
  });

  it('falls steeply with field: twice the field, a tenth of the time', () => {
    const ratio = value(formativeTime(60, AIR_G_CM3)) / value(formativeTime(120, AIR_G_CM3));
    expect(ratio).toBeCloseTo(2 ** 3.44, 8);
  });

  it.each([
    [0, 0.0012],
    [-1, 0.0012],
    [Number.NaN, 0.0012],
    [60, 0],
    [60, 1e9],
  ])('refuses %d kV/cm at %d g/cm3', (E, rho) => {
    expect(formativeTime(E, rho).ok).toBe(false);
  });
});

describe('rampBreakdownField', () => {
  it('is where the formative times along the ramp add up to one', () => {
    const ramp = 5e9;
    const field = value(rampBreakdownField(ramp, AIR_G_CM3));
    const sum = integrate(
      (E) => 1 / (ramp * value(formativeTime(E, AIR_G_CM3))),
      { low: 0.11, high: field },
      1e-9,
    );
    expect(sum).toBeCloseTo(1, 6);
    // Worked example: 70.6 kV/cm, 14 ns after the start.
    expect(field).toBeCloseTo(70.64, 2);
    expect((field / ramp) * 1e9).toBeCloseTo(14.1, 1);
  });

  it('rises with the ramp', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 1e3, max: 1e14, noNaN: true }),
        (ramp) =>
          value(rampBreakdownField(ramp * 1.1, AIR_G_CM3)) > value(rampBreakdownField(ramp, AIR_G_CM3)),
      ),
    );
  });

  it.each([0, -5, Number.NaN, Infinity])('refuses a ramp of %d', (ramp) => {
    expect(rampBreakdownField(ramp, AIR_G_CM3)).toMatchObject({ refusal: { field: 'ramp_kV_cm_s' } });
  });
});
