import { describe, expect, it } from 'vitest';
import { rodFieldFactor } from '../../src/domain/gap/capped-rods';
import { fieldFactorOf } from '../../src/domain/gap/field-geometry';
import { hexBarBreakdown, hexFieldFactor } from '../../src/domain/gap/hex-bars';
import { solvePanels } from '../../src/domain/gap/hex-field';
import { hexOutline, type HexOrientation } from '../../src/domain/gap/hex-outline';
import { cylinderBreakdown } from '../../src/domain/gap/curved-gap';
import { solveRodField } from '../../src/domain/gap/rod-field';
import { off, valueOf } from './answer-value';

/** Upper half of a round bar of radius 1, for the closed form of two cylinders. */
function roundOutline(gap: number, panels: number) {
  const point = (index: number) => {
    // Packed towards the front, where the charge is.
    const angle = Math.PI * (index / panels) ** 1.5;
    return { x: Math.cos(angle) - 1 - 0.5 * gap, y: Math.sin(angle) };
  };
  return Array.from({ length: panels }, (_, index) => {
    const [a, b] = [point(index), point(index + 1)];
    return { x0: a.x, y0: a.y, x1: b.x, y1: b.y };
  });
}

describe('boundary elements', () => {
  // Two parallel cylinders in closed form: any textbook on fields; Kuffel, Zaengl and Kuffel, from memory.
  it.each([0.2, 0.5, 1, 2, 4])('give two cylinders %d radii apart as the closed form does', (gap) => {
    const field = solvePanels(roundOutline(gap, 160), gap);
    expect(Math.abs((field?.fieldFactor ?? 0) / fieldFactorOf('cylinders', gap) - 1)).toBeLessThan(0.002);
  });

  // A corner of 120 degrees: the field grows as r^(-1/4), Jackson, Classical Electrodynamics, 2.11 (from memory).
  it('sharpen a rounded corner as theory says', () => {
    const at = (corner: number) =>
      valueOf(hexFieldFactor({ orientation: 'edge', cornerOverFlats: corner, gapOverFlats: 1 }));
    const power = Math.log(at(0.005) / at(0.01)) / Math.log(0.5);
    expect(power).toBeCloseTo(-0.25, 2);
  });
});

/** Own two-dimensional solution by another program, element means: orientation, corner and gap over flats. */
const OTHER_PROGRAM: readonly (readonly [HexOrientation, number, number, number])[] = [
  ['flat', 0.02, 0.1, 1.47],
  ['edge', 0.02, 0.1, 1.53],
  ['flat', 0.02, 0.3, 1.9],
  ['edge', 0.02, 0.3, 1.97],
  ['flat', 0.02, 0.5, 2.16],
  ['edge', 0.02, 0.5, 2.23],
  ['flat', 0.1, 0.3, 1.32],
  ['edge', 0.2, 0.5, 1.34],
];

describe('hexagonal bars', () => {
  it.each(OTHER_PROGRAM)(
    '%s, corner %d, gap %d: %d',
    (...[orientation, cornerOverFlats, gapOverFlats, expected]) => {
      expect(off(hexFieldFactor({ orientation, cornerOverFlats, gapOverFlats }), expected)).toBeLessThan(
        0.006,
      );
    },
  );

  it('stand closed around their corners', () => {
    for (const orientation of ['flat', 'edge'] as const) {
      const panels = hexOutline({ orientation, cornerOverFlats: 0.1, gapOverFlats: 0.3 });
      panels.slice(1).forEach((panel, index) => {
        expect(panel.x0).toBe(panels[index]?.x1);
        expect(panel.y0).toBe(panels[index]?.y1);
      });
      expect(panels[0]?.x0).toBeCloseTo(-0.15, 12);
      expect(Math.max(...panels.map(({ y1 }) => y1))).toBeCloseTo(
        orientation === 'edge' ? 0.5 : 0.4 / Math.cos(Math.PI / 6) + 0.1,
        2,
      );
    }
  });

  it.each(['flat', 'edge'] as const)(
    'break above cylinders of the corner radius and below the uniform law: %s',
    (orientation) => {
      const point = { gap_cm: 0.1, pressure_bar_abs: 1, temperature_C: 20 };
      const kV = valueOf(
        hexBarBreakdown({ orientation, acrossFlats_mm: 10, cornerRadius_mm: 0.5, ...point }),
      );
      expect(kV).toBeGreaterThan(valueOf(cylinderBreakdown({ radius_cm: 0.05, ...point })));
      expect(kV).toBeLessThan(1.001 * (24.36 * 0.1 + 6.72 * Math.sqrt(0.1)));
    },
  );

  it('plan with the edge-to-edge value from flat to flat too', () => {
    const bars = {
      acrossFlats_mm: 10,
      cornerRadius_mm: 0.2,
      gap_cm: 0.3,
      pressure_bar_abs: 3,
      temperature_C: 20,
    };
    const flat = hexBarBreakdown({ orientation: 'flat', ...bars });
    const edge = valueOf(hexBarBreakdown({ orientation: 'edge', ...bars }));
    expect(edge).toBeLessThan(valueOf(flat));
    expect(flat.ok && flat.value.band.low).toBeLessThan(edge);
  });
});

describe('round-ended rods', () => {
  // Rods without a straight part are spheres, whose image series is exact.
  it.each([0.1, 0.5, 1, 2, 4])('without a shaft are spheres %d radii apart', (gap) => {
    const field = solveRodField(gap, 2.0001);
    expect(Math.abs((field?.fieldFactor ?? 0) / fieldFactorOf('spheres_sym', gap) - 1)).toBeLessThan(2e-4);
    expect(field?.residual()).toBeLessThan(1e-4);
  });

  // Own ring-charge solution by another program, residual 6e-6.
  it.each([
    [0.5, 1.1726],
    [1, 1.3574],
    [2, 1.7493],
    [3, 2.1504],
    [4, 2.5513],
  ])('%d radii apart: %d', (gap, factor) => {
    expect(off(rodFieldFactor(gap, 20), factor)).toBeLessThan(3e-4);
  });

  it('crowd the field less than spheres, and less the longer they are', () => {
    expect(valueOf(rodFieldFactor(4, 20))).toBeLessThan(fieldFactorOf('spheres_sym', 4));
    expect(valueOf(rodFieldFactor(4, 40))).toBeLessThan(valueOf(rodFieldFactor(4, 20)));
  });
});
