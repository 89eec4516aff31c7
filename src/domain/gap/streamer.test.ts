import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { integrate } from '../numerics/integrate';
import { cylinderProfile, sphereProfiles } from './field-geometry';
import { streamerVoltage_kV } from './streamer';
import { AIR_CRITERION, SF6_CRITERION, uniformVoltage_kV } from './streamer-criterion';

const x = fc.double({ min: 0.013, max: 20, noNaN: true });
const shape = fc.double({ min: 0.001, max: 10, noNaN: true });

describe('streamerVoltage_kV', () => {
  it.each([AIR_CRITERION, SF6_CRITERION])('is the uniform law in a uniform field %j', (criterion) => {
    for (const at of [0.013, 0.3, 1, 5]) {
      expect(streamerVoltage_kV(criterion, at, undefined)).toBe(uniformVoltage_kV(criterion, at));
      expect(streamerVoltage_kV(criterion, at, sphereProfiles(1e-6).symmetric)).toBeCloseTo(
        uniformVoltage_kV(criterion, at),
        9,
      );
    }
  });

  it('fulfils its own integral, taken by another method on parallel cylinders', () => {
    // R = 1 cm, d = 0.5 cm, 1 bar: the field on the axis in closed form, integrated adaptively.
    const d = 0.5;
    const V = streamerVoltage_kV(AIR_CRITERION, d, cylinderProfile(d));
    const a = Math.sqrt(d * d * 0.25 + d);
    const field = (z: number) => (V * a) / (Math.acosh(1 + d / 2) * (a * a - z * z));
    const K = integrate((z) => Math.max(field(z) - 24.36, 0) ** 2, { low: -d / 2, high: d / 2 }, 1e-9);
    expect(K / 6.72 ** 2).toBeCloseTo(1, 7);
  });

  it('fulfils it for SF6 too, where the criterion is linear', () => {
    const d = 0.5;
    const V = streamerVoltage_kV(SF6_CRITERION, d, cylinderProfile(d));
    const a = Math.sqrt(d * d * 0.25 + d);
    const field = (z: number) => (V * a) / (Math.acosh(1 + d / 2) * (a * a - z * z));
    const K = integrate((z) => Math.max(field(z) - 88.5, 0), { low: -d / 2, high: d / 2 }, 1e-9);
    expect(Math.abs(K / 0.38 - 1)).toBeLessThan(2e-3);
  });

  it('never exceeds the uniform law, since curving the field only helps the streamer', () => {
    fc.assert(
      fc.property(x, shape, (at, r) => {
        const uniform = uniformVoltage_kV(AIR_CRITERION, at) * (1 + 1e-9);
        const { symmetric, oneEarthed } = sphereProfiles(r);
        return [symmetric, oneEarthed, cylinderProfile(r)].every(
          (p) => streamerVoltage_kV(AIR_CRITERION, at, p) <= uniform,
        );
      }),
      { numRuns: 60 },
    );
  });

  it('rises with pressure for every shape and both criteria', () => {
    fc.assert(
      fc.property(x, shape, fc.constantFrom(AIR_CRITERION, SF6_CRITERION), (at, r, criterion) => {
        const { symmetric } = sphereProfiles(r);
        const low = streamerVoltage_kV(criterion, at, symmetric);
        return Number.isFinite(low) && low > 0 && streamerVoltage_kV(criterion, at * 1.001, symmetric) > low;
      }),
      { numRuns: 60 },
    );
  });
});
