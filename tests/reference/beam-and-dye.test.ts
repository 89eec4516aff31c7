import { describe, expect, it } from 'vitest';
import { singlePulseLimit, visibleOldLimit } from '../../src/domain/beam/exposure-limit';
import { energyThroughAperture } from '../../src/domain/beam/eyewear';
import { photonEnergy } from '../../src/domain/beam/photon';
import { molarMass } from '../../src/domain/dye/molar-mass';
import { absorbedFraction } from '../../src/domain/dye/solution';
import { off, valueOf } from './answer-value';

const J_M2_PER_J_CM2 = 1e4;

/** Well-known laser lines, eV as textbooks print them (Svelto, Principles of Lasers; from memory). */
const LINES: readonly (readonly [laser: string, nm: number, eV: number])[] = [
  ['argon fluoride', 193.3, 6.414],
  ['krypton fluoride', 248.4, 4.991],
  ['frequency-tripled Nd:YAG', 354.7, 3.495],
  ['frequency-doubled Nd:YAG', 532, 2.331],
  ['helium-neon', 632.8, 1.959],
  ['Nd:YAG', 1064, 1.165],
  ['carbon dioxide', 10_600, 0.117],
];

/** Exposure limits as ANSI Z136.1 prints them, J/cm2 (from memory): 0.56 t^0.25 from 315 to 400 nm. */
const ULTRAVIOLET: readonly (readonly [nm: number, s: number, J_cm2: number])[] = [
  [337.1, 1e-8, 5.6e-3],
  [355, 1e-8, 5.6e-3],
  [351, 2e-8, 6.66e-3],
  [325, 0.25, 0.396],
  [325, 10, 0.996],
];

/** Published molar masses, g/mol: CRC Handbook of Chemistry and Physics (from memory). */
const MASSES: readonly (readonly [name: string, formula: string, g_mol: number])[] = [
  ['water', 'H2O', 18.015],
  ['ethanol', 'C2H5OH', 46.069],
  ['methanol', 'CH3OH', 32.042],
  ['dimethyl sulfoxide', '(CH3)2SO', 78.13],
  ['sodium chloride', 'NaCl', 58.44],
  ['potassium permanganate', 'KMnO4', 158.034],
  ['copper sulfate pentahydrate', 'CuSO4.5H2O', 249.685],
  ['sodium tetraborate decahydrate', 'Na2B4O7\u00b710H2O', 381.37],
  ['calcium hydroxide', 'Ca(OH)2', 74.093],
  ['potassium ferrocyanide', 'K4[Fe(CN)6]', 368.34],
  ['iodine', 'I2', 253.81],
  ['sulfur hexafluoride', 'SF6', 146.06],
];

describe('photon energy against textbooks', () => {
  it.each(LINES)('%s, %d nm: %d eV', (...[_laser, nm, eV]) => {
    expect(off(photonEnergy(nm), eV)).toBeLessThan(0.0006);
  });
});

describe('exposure limits against the American standard', () => {
  it.each(ULTRAVIOLET)('%d nm for %d s: %d J/cm2', (...[nm, s, J_cm2]) => {
    expect(off(singlePulseLimit(nm, s), J_cm2 * J_M2_PER_J_CM2)).toBeLessThan(0.003);
  });

  // ANSI Z136.1-2014: 2e-7 J/cm2 for visible nanosecond pulses; 5e-7 before it. From memory.
  it('doubled Nd:YAG, 10 ns: 0.2 uJ/cm2 now, 0.5 before', () => {
    expect(off(singlePulseLimit(532, 1e-8), 2e-7 * J_M2_PER_J_CM2)).toBeLessThan(1e-9);
    expect(off(visibleOldLimit(532, 1e-8), 5e-7 * J_M2_PER_J_CM2)).toBeLessThan(1e-9);
  });

  // 2.5 mW/cm2 in 0.25 s, which makes the 1 mW of class 2 through 7 mm: IEC 60825-1, from memory.
  it('a helium-neon beam for a blink: 1 mW through 7 mm', () => {
    const limit_J_m2 = valueOf(singlePulseLimit(632.8, 0.25));
    expect(off(energyThroughAperture(limit_J_m2, 7), 1e-3 * 0.25 * 1e9)).toBeLessThan(0.03);
  });

  // Class 1 of the old table for visible nanosecond pulses is 2e-7 J (IEC 60825-1, from memory).
  it('0.2 uJ through 7 mm by the old visible table', () => {
    expect(off(energyThroughAperture(valueOf(visibleOldLimit(532, 1e-8)), 7), 200)).toBeLessThan(0.05);
  });
});

describe('molar mass against the handbook', () => {
  it.each(MASSES)('%s, %s: %d g/mol', (...[_name, formula, g_mol]) => {
    expect(off(molarMass(formula), g_mol)).toBeLessThan(2e-4);
  });
});

describe('absorption by the definition of absorbance', () => {
  // Absorbance A lets 10^-A through: IUPAC Gold Book, "absorbance" (from memory).
  it.each([
    [1, 0.9],
    [2, 0.99],
    [0.3010299957, 0.5],
  ])('absorbance %d takes %d', (absorbance, share) => {
    const cell = { absorption_L_mol_cm: 1000 * absorbance, concentration_M: 1e-3, length_cm: 1 };
    expect(off(absorbedFraction(cell), share)).toBeLessThan(1e-9);
  });
});
