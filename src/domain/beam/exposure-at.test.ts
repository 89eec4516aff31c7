import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { exposureAt, hazardDistanceRectangular } from './hazard-distance';

const valueOf = (result: { ok: true; value: { value: number } } | { ok: false }) =>
  result.ok ? result.value.value : Number.NaN;
const BEAM = {
  energy_J: 1e-3,
  width_mm: 1,
  height_mm: 5,
  divergenceWidth_mrad: 2,
  divergenceHeight_mrad: 6,
};

describe('exposure along a beam', () => {
  // Physics H, worked: 1 mJ through 1 x 5 mm is 200 J/m2 at the aperture.
  it('is 200 J/m2 at the aperture of the worked beam', () => {
    expect(valueOf(exposureAt(BEAM, 0))).toBeCloseTo(200, 9);
  });

  it('meets its limit at the hazard distance where the beam is wider than the aperture', () => {
    fc.assert(
      fc.property(fc.double({ min: 1, max: 190, noNaN: true }), (limit) => {
        const distance = valueOf(hazardDistanceRectangular(BEAM, limit));
        return Math.abs(valueOf(exposureAt(BEAM, distance)) / limit - 1) < 1e-9;
      }),
      { seed: 4 },
    );
  });

  it('is averaged over the aperture for a beam that is thinner, and over 7 mm for visible light', () => {
    const thin = { ...BEAM, width_mm: 0.1, height_mm: 0.1 };
    expect(valueOf(exposureAt(thin, 0))).toBeCloseTo(1e-3 / (Math.PI * 0.25e-6), 6);
    expect(valueOf(exposureAt(thin, 0, 460))).toBeCloseTo(1e-3 / (Math.PI * 3.5e-3 ** 2), 6);
  });

  it.each([
    [{ energy_J: Number.NaN }, 0],
    [{ divergenceWidth_mrad: 0 }, 0],
    [{}, -1],
    [{ width_mm: 0 }, 0],
  ])('refuses %j at %d m', (change, distance) => {
    expect(exposureAt({ ...BEAM, ...change }, distance).ok).toBe(false);
  });
});
