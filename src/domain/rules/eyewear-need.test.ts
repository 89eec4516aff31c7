import { describe, expect, it } from 'vitest';
import { testSpec } from '../../../tests/support/test-lab';
import { eyewearNeed, statedDensity, unmetLine } from './eyewear-need';

describe('eyewear that a rig asks for', () => {
  it('is not guessed where the beam is not known', () => {
    expect(eyewearNeed(testSpec)).toMatchObject({
      type: 'not-known',
      words: 'Not known: the rig’s numbers lack pulse length, beam width, beam height.',
    });
  });

  // By hand: 5600 t^(1/4) J/m2 (thermal limit from 315 to 400 nm, from memory) is 47.1 J/m2 at 5 ns. 150 uJ over 8 mm2 is
  // 18.8 J/m2, under it; over the 1 mm aperture it is 191 J/m2, a factor of 4.06 and a density of 0.61.
  it.each([
    [2, 4, 0],
    [0.5, 1, 0.7],
  ])('of a beam of %d by %d mm is a density of %d, rounded up to tenths', (width_mm, height_mm, density) => {
    const beam = { ...testSpec.beam, pulse_ns: 5, width_mm, height_mm };
    expect(eyewearNeed({ ...testSpec, beam })).toMatchObject({
      type: 'known',
      lines: [{ wavelength_nm: 337.1, density }],
    });
  });
});

describe('what a pair promises', () => {
  const densities = [
    { from_nm: 190, to_nm: 375, density: 6 },
    { from_nm: 300, to_nm: 400, density: 4 },
  ];
  const line = (wavelength_nm: number, density: number) => ({ name: '', wavelength_nm, density });

  it('is its highest line at that wavelength, and nothing beside them', () => {
    expect(statedDensity(densities, 337.1)).toBe(6);
    expect(statedDensity(densities, 390)).toBe(4);
    expect(statedDensity(densities, 532)).toBeNull();
  });

  it('meets every line or names the first that it does not', () => {
    expect(unmetLine(densities, [line(337.1, 5.2), line(390, 4)])).toBeNull();
    expect(unmetLine(densities, [line(337.1, 5.2), line(390, 4.1)])).toMatchObject({ wavelength_nm: 390 });
    // A line of density 0 still has to be stated: glasses against one do not stop another.
    expect(unmetLine(densities, [line(532, 0)])).toMatchObject({ wavelength_nm: 532 });
  });
});
