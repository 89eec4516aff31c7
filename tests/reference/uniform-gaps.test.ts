import { describe, expect, it } from 'vitest';
import { airDensity } from '../../src/domain/gap/gas-density';
import { lowPdVoltage } from '../../src/domain/gap/low-pd';
import { airSibling, uniformBreakdown } from '../../src/domain/gap/uniform-law';
import { off, valueOf } from './answer-value';

const ATM_BAR = 1.01325;
const inAir = (gap_cm: number) =>
  uniformBreakdown('air', { gap_cm, pressure_bar_abs: ATM_BAR, temperature_C: 20 });

describe('uniform gaps in air', () => {
  // Ritz (1932) at 20 C and 760 Torr, d in cm: 24.55 d + 6.66 sqrt(d) kV, as Meek and Craggs, Electrical Breakdown of
  // Gases, give it; from memory.
  it.each([0.1, 0.2, 0.5, 1, 2, 4])('%d cm within 2 per cent of Ritz', (gap_cm) => {
    expect(off(inAir(gap_cm), 24.55 * gap_cm + 6.66 * Math.sqrt(gap_cm))).toBeLessThan(0.02);
  });

  // Bruce (1947), Journal of the IEE 94: 24.22 d + 6.08 sqrt(d) at 25 C and 760 Torr; from memory. The two
  // schools of laws differ by up to 4.5 per cent.
  it.each([0.2, 0.5, 1, 2, 4])('%d cm at 25 C within 4.5 per cent of Bruce, and above it', (gap_cm) => {
    const warm = uniformBreakdown('air', { gap_cm, pressure_bar_abs: ATM_BAR, temperature_C: 25 });
    const share = valueOf(warm) / (24.22 * gap_cm + 6.08 * Math.sqrt(gap_cm)) - 1;
    expect(share).toBeGreaterThan(0);
    expect(share).toBeLessThan(0.045);
    expect(off(airSibling(gap_cm), 24.22 * gap_cm + 6.08 * Math.sqrt(gap_cm))).toBeLessThan(1e-9);
  });

  // About 30 kV/cm at 1 cm: Kuffel, Zaengl and Kuffel, High Voltage Engineering, from memory.
  it('1 cm stands 30 to 32 kV', () => {
    expect(valueOf(inAir(1))).toBeGreaterThan(30);
    expect(valueOf(inAir(1))).toBeLessThan(32);
  });
});

describe('the low side of pressure times gap', () => {
  // No gap in air breaks below 327 V: Cobine, Gaseous Conductors, from memory.
  it.each([0.3, 0.5, 0.567, 0.7, 1, 2, 5])('air at %d Torr cm stands at least 327 V', (pd_Torr_cm) => {
    expect(valueOf(lowPdVoltage('air', pd_Torr_cm))).toBeGreaterThanOrEqual(326.9);
  });
});

describe('density of air against the standard atmosphere', () => {
  // U.S. Standard Atmosphere 1976, height, kPa, C and kg/m3 (from memory), over 1.2041 kg/m3 at 20 C and 101.325 kPa.
  it.each([
    [0, 101.325, 15, 1.225],
    [500, 95.461, 11.75, 1.1673],
    [1000, 89.875, 8.5, 1.1116],
    [2000, 79.495, 2, 1.0065],
    [3000, 70.109, -4.5, 0.9091],
  ])('%d m: %d kPa and %d C are %d kg/m3', (...[_height, kPa, C, kg_m3]) => {
    expect(off(airDensity(kPa, C), kg_m3 / 1.2041)).toBeLessThan(5e-4);
  });
});
