import { describe, expect, it } from 'vitest';
import { sphereBreakdown } from '../../src/domain/gap/curved-gap';

interface Row {
  readonly diameter_cm: number;
  readonly gap_cm: number;
  readonly kV_peak: number;
}

const row = (diameter_cm: number, gap_cm: number, kV_peak: number): Row => ({ diameter_cm, gap_cm, kV_peak });

/**
 * Sphere gaps, one sphere earthed, 20 C and 101.3 kPa. IEC 52:1960 and IEC 60052:2002 (also BS 358, IEEE Std 4), from
 * memory. The standard claims 3 % up to half a diameter.
 */
const STANDARD: readonly Row[] = [
  row(2, 0.1, 4.7),
  row(2, 0.3, 11.2),
  row(2, 0.7, 23.2),
  row(2, 1, 30.7),
  row(5, 0.4, 14.3),
  row(5, 0.8, 26.3),
  row(5, 1.5, 45.5),
  row(5, 2.4, 65.5),
  row(6.25, 0.5, 17.2),
  row(6.25, 2, 58.5),
  row(10, 0.5, 16.8),
  row(10, 2, 59),
  row(10, 5, 123),
  row(12.5, 1, 31.7),
  row(12.5, 4, 108),
  row(15, 5, 133),
  row(25, 1, 31.7),
  row(25, 4, 112),
  row(25, 10, 244),
];

/** The same standard in brackets, gaps over half a diameter: 5 % claimed. From memory. */
const STANDARD_WIDE: readonly Row[] = [row(2, 1.5, 40), row(5, 3, 75.5), row(5, 4, 88.5), row(10, 6, 138)];

/** AIEE spark-gap table, 25 C and 1 atm, read in a public reprint. Its entries below 5 mm are not to be used. */
const AIEE: readonly Row[] = [
  row(2.5, 0.95, 30),
  row(5, 1.3, 40),
  row(10, 1.65, 50),
  row(25, 3.49, 100),
  row(25, 10.3, 250),
];

const share = ({ kV_peak, ...gap }: Row, air: { readonly bar: number; readonly C: number }): number => {
  const result = sphereBreakdown({ ...gap, pressure_bar_abs: air.bar, temperature_C: air.C });
  return result.ok ? result.value.value / kV_peak - 1 : Number.NaN;
};
const IEC_AIR = { bar: 1.013, C: 20 };
const AIEE_AIR = { bar: 1.01325, C: 25 };

describe('spheres against the standard', () => {
  it.each(STANDARD)('D $diameter_cm cm, d $gap_cm cm: $kV_peak kV within 3.5 %', (gap) => {
    expect(Math.abs(share(gap, IEC_AIR))).toBeLessThan(0.035);
  });

  it('is 1.7 % off in the mean square and leans low by less than 2 %', () => {
    const shares = STANDARD.map((gap) => share(gap, IEC_AIR));
    const mean = shares.reduce((sum, one) => sum + one, 0) / shares.length;
    const rms = Math.sqrt(shares.reduce((sum, one) => sum + one * one, 0) / shares.length);
    expect(rms).toBeLessThan(0.017);
    expect(mean).toBeGreaterThan(-0.02);
    expect(mean).toBeLessThan(0.005);
  });

  it.each(STANDARD_WIDE)('D $diameter_cm cm, d $gap_cm cm, wide: ($kV_peak kV) within 6 %', (gap) => {
    expect(Math.abs(share(gap, IEC_AIR))).toBeLessThan(0.06);
  });

  it.each(AIEE)('AIEE D $diameter_cm cm, d $gap_cm cm: $kV_peak kV within 5 %', (gap) => {
    expect(Math.abs(share(gap, AIEE_AIR))).toBeLessThan(0.05);
  });

  it('would not be met by the uniform law over the field factor: D 2 cm, d 1 cm reads a fifth low', () => {
    const x = 1.013;
    const naive = (24.36 * x + 6.72 * Math.sqrt(x)) / 1.358996;
    expect(naive / 30.7 - 1).toBeLessThan(-0.2);
    expect(Math.abs(share(row(2, 1, 30.7), IEC_AIR))).toBeLessThan(0.03);
  });
});
