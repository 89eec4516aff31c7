import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { cylinderProfile, fieldFactorOf, sphereProfiles } from './field-geometry';

describe('fieldFactorOf', () => {
  // Image series and bispherical coordinates agree to 1e-9 on these; cylinders in closed form.
  it.each([
    [0.1, 1.033558, 1.033568, 1.067575, 1.016612, 1.033116],
    [0.5, 1.172614, 1.199062, 1.358996, 1.082021, 1.161686],
    [1, 1.358996, 1.51698, 1.770281, 1.161686, 1.315191],
    [2, 1.770281, 2.338442, 2.677705, 1.315191, 1.604556],
    [4, 2.677705, 4.200923, 4.604439, 1.604556, 2.137023],
  ])('at gap over radius %d', (...[x, symmetric, earthed, spherePlane, cylinders, cylinderPlane]) => {
    expect(fieldFactorOf('spheres_sym', x)).toBeCloseTo(symmetric, 5);
    expect(fieldFactorOf('spheres_ground', x)).toBeCloseTo(earthed, 5);
    expect(fieldFactorOf('sphere_plane', x)).toBeCloseTo(spherePlane, 5);
    expect(fieldFactorOf('cylinders', x)).toBeCloseTo(cylinders, 5);
    expect(fieldFactorOf('cylinder_plane', x)).toBeCloseTo(cylinderPlane, 5);
  });

  it.each([
    ['spheres_sym', 1 / 3],
    ['spheres_ground', 1 / 3],
    ['sphere_plane', 2 / 3],
    ['cylinders', 1 / 6],
    ['cylinder_plane', 1 / 3],
  ] as const)('starts for %s as 1 + %d x', (geometry, slope) => {
    for (const x of [1e-8, 1e-6, 1e-4, 1e-3]) {
      expect(Math.abs((fieldFactorOf(geometry, x) - 1) / x - slope)).toBeLessThan(x < 1e-6 ? 1e-6 : 1e-3);
    }
  });

  it('grows for a lone small sphere like gap over radius', () => {
    // A unit sphere far from an earthed one: E = V/R, so f tends to x.
    expect(fieldFactorOf('spheres_ground', 1000) / 1000).toBeCloseTo(1, 2);
    expect(fieldFactorOf('spheres_sym', 1000) / 500).toBeCloseTo(1, 2);
  });

  it('grows with x for every geometry', () => {
    const x = fc.double({ min: 1e-4, max: 500, noNaN: true });
    fc.assert(
      fc.property(fc.constantFrom('spheres_sym', 'spheres_ground', 'cylinders'), x, (geometry, at) => {
        const f = fieldFactorOf(geometry, at);
        return f > 1 && fieldFactorOf(geometry, at * 1.01) > f;
      }),
      { numRuns: 60 },
    );
  });
});

describe('axial profiles', () => {
  const profiles = (x: number) => [
    sphereProfiles(x).symmetric,
    sphereProfiles(x).oneEarthed,
    cylinderProfile(x),
  ];

  it.each([1e-6, 0.001, 0.1, 1, 3, 10])('carry exactly the voltage across the gap at x = %d', (x) => {
    for (const { fields, weights } of profiles(x)) {
      const mean = fields.reduce((sum, field, index) => sum + field * (weights[index] ?? 0), 0);
      expect(mean).toBeCloseTo(1, 9);
    }
  });

  it.each([0.1, 1, 10])('peak at the electrode at x = %d', (x) => {
    for (const { fields, fieldFactor } of profiles(x)) {
      const largest = Math.max(...fields);
      expect(largest).toBeLessThanOrEqual(fieldFactor);
      expect(largest / fieldFactor).toBeGreaterThan(0.99);
    }
  });

  it('mirror about the middle, save with one sphere earthed', () => {
    const ends = ({ fields }: { readonly fields: Float64Array }) =>
      [fields[0] ?? 0, fields.at(-1) ?? 0] as const;
    for (const profile of [sphereProfiles(1).symmetric, cylinderProfile(1)]) {
      const [first, last] = ends(profile);
      expect(first).toBeCloseTo(last, 10);
    }
    const [live, earthed] = ends(sphereProfiles(1).oneEarthed);
    expect(live).toBeGreaterThan(1.2 * earthed);
  });
});
