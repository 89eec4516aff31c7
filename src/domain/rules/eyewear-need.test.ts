import { describe, expect, it } from 'vitest';
import { HERON } from '../../../seeds/rigs/heron';
import { KETTLE } from '../../../seeds/rigs/kettle';
import { WREN } from '../../../seeds/rigs/wren';
import { eyewearNeed, statedDensity, unmetLine } from './eyewear-need';
import { derivedFigure, rigDerived } from './rig-derived';

const SETTINGS = { discharged_below_V: 50, ambient_bar_abs: 0.966, ambient_C: 21 };

describe('eyewear that a rig asks for', () => {
  it('is the figure that the rig’s own screen shows', () => {
    for (const { spec } of [HERON, KETTLE, WREN]) {
      const derived = derivedFigure(rigDerived(spec, SETTINGS, { transient: false }), 'eyewear');
      const need = eyewearNeed(spec);
      expect(need.type === 'known' && need.lines[0]?.density).toBe(
        derived.figure.ok && derived.figure.value.value,
      );
    }
  });

  it('counts what the rig may emit where it is more than what was declared, and says so', () => {
    const faint = { ...KETTLE.spec, beam: { ...KETTLE.spec.beam, pulse_energy_uJ: 1 } };
    const need = eyewearNeed(faint);
    expect(need).toMatchObject({
      type: 'known',
      assumed: expect.arrayContaining(['pulse energy, a thousandth of what the rig stores']) as string[],
    });
    expect(need.type === 'known' && need.lines[0]?.density).toBeGreaterThan(1);
  });

  it('is not guessed at a wavelength without a limit', () => {
    const deep = { ...KETTLE.spec, beam: { ...KETTLE.spec.beam, wavelength_nm: 193 } };
    expect(eyewearNeed(deep)).toMatchObject({ type: 'not-known' });
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
