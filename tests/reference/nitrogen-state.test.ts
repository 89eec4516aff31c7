import { describe, expect, it } from 'vitest';
import { gasHeating } from '../../src/domain/channel/discharge';
import { freeVolumeReal } from '../../src/domain/gas/cylinder';
import { nitrogenCompressibility } from '../../src/domain/gas/nitrogen-state';
import { off, valueOf } from './answer-value';

/** Z of nitrogen by an independent program: CoolProp 8.0.0, which holds all 36 terms of Span and others (2000). */
const Z: readonly (readonly [C: number, bar: number, Z: number])[] = [
  [-40, 20, 0.97882],
  [-40, 80, 0.936647],
  [-40, 350, 1.175424],
  [-20, 150, 0.976336],
  [-20, 250, 1.058301],
  [0, 80, 0.982668],
  [0, 200, 1.033838],
  [15, 20, 0.9952],
  [15, 300, 1.137742],
  [40, 80, 1.006656],
  [40, 200, 1.065171],
  [60, 150, 1.04452],
  [60, 350, 1.198567],
  [100, 20, 1.004567],
  [100, 300, 1.159556],
];

/** Free volume, L at 15 C and 1 atm, by densities of the same program. */
const FREE_VOLUMES: readonly (readonly [L: number, bar: number, C: number, free_L: number])[] = [
  [50, 230, 15, 10_588.7],
  [10, 150, 0, 1558.34],
  [20, 60, 30, 1126.87],
  [50, 300, 20, 12_760.1],
];

describe('nitrogen against an independent program', () => {
  it.each(Z)('%d C and %d bar: Z is %d', (...[C, bar, expected]) => {
    expect(off(nitrogenCompressibility(bar, C), expected)).toBeLessThan(2e-4);
  });

  it.each(FREE_VOLUMES)(
    '%d L at %d bar and %d C hold %d L',
    (...[volume_L, pressure_bar_abs, temperature_C, L]) => {
      expect(off(freeVolumeReal({ volume_L, pressure_bar_abs, temperature_C }), L)).toBeLessThan(5e-4);
    },
  );
});

describe('nitrogen against handbooks', () => {
  // Second virial coefficient -4.5 cm3/mol at 300 K: Dymond and Smith, The Virial Coefficients (1980), from memory.
  it('starts to depart from 1 as the second virial coefficient says', () => {
    const bar = 5;
    const slope = (valueOf(nitrogenCompressibility(bar, 26.85)) - 1) / bar;
    const virial_cm3_mol = slope * 83.14462618 * 300;
    expect(Math.abs(virial_cm3_mol + 4.5)).toBeLessThan(0.4);
  });

  // Boyle temperature 327 K (54 C): textbooks of physical chemistry, from memory.
  it('is ideal to first order at the Boyle temperature', () => {
    expect(Math.abs(valueOf(nitrogenCompressibility(2, 54)) - 1)).toBeLessThan(5e-5);
    expect(valueOf(nitrogenCompressibility(2, 20))).toBeLessThan(1);
  });

  // Density 1.1648 kg/m3 and specific heat 1041 J/(kg K) at 20 C and 1 atm: CoolProp 8.0.0.
  it('warms a litre by 0.825 K a joule', () => {
    const shot = { energy_J: 1, volume_cm3: 1000, pressure_bar_abs: 1.01325, temperature_C: 20 };
    expect(off(gasHeating(shot), 1000 / (1.1648 * 1041.3))).toBeLessThan(0.003);
  });
});
