import { describe, expect, it } from 'vitest';
import { sphereBreakdown } from './curved-gap';
import { martinPulseField, martinSpheres } from './martin';

describe('martinSpheres', () => {
  // Against the sphere-gap standard this form is off by 8.7 % at most and the streamer integral by 3.2 %.
  it.each([
    [2, 0.3],
    [5, 1],
    [10, 3],
    [25, 10],
  ])('stays near the streamer integral for D %d cm, d %d cm', (diameter_cm, gap_cm) => {
    const gap = { diameter_cm, gap_cm, pressure_bar_abs: 1.01325 };
    const martin = martinSpheres(gap);
    const streamer = sphereBreakdown({ ...gap, temperature_C: 20 });
    if (!martin.ok || !streamer.ok) throw new Error('refused');
    expect(Math.abs(martin.value.value / streamer.value.value - 1)).toBeLessThan(0.119);
  });

  it('is clipped at small gaps: there it becomes the uniform form', () => {
    const result = martinSpheres({ diameter_cm: 100, gap_cm: 0.1, pressure_bar_abs: 1.01325 });
    expect(result.ok && result.value.value).toBeCloseTo(
      (0.1 * (24.6 + 6.7 / Math.sqrt(0.1))) / (1 + 0.002 / 3),
      5,
    );
  });

  it.each([
    [{ diameter_cm: 0, gap_cm: 1, pressure_bar_abs: 1 }, 'diameter_cm'],
    [{ diameter_cm: 2, gap_cm: Number.NaN, pressure_bar_abs: 1 }, 'gap_cm'],
    [{ diameter_cm: 2, gap_cm: 1, pressure_bar_abs: -1 }, 'pressure'],
  ])('refuses %j beside %s', (gap, field) => {
    expect(martinSpheres(gap)).toMatchObject({ refusal: { field } });
  });
});

describe('martinPulseField', () => {
  it('is 22 kV/cm for 0.1 us, 10 cm and 1 atm, the constant itself', () => {
    const result = martinPulseField({ time_us: 0.1, gap_cm: 10, pressure_atm: 1 });
    expect(result.ok && result.value.value).toBeCloseTo(22, 12);
  });

  it('falls as the sixth root of time and rises as pressure to 0.6', () => {
    const at = (time_us: number, pressure_atm: number) => {
      const result = martinPulseField({ time_us, gap_cm: 10, pressure_atm });
      return result.ok ? result.value.value : Number.NaN;
    };
    expect(at(0.1, 1) / at(6.4, 1)).toBeCloseTo(2, 10);
    expect(at(0.1, 32) / at(0.1, 1)).toBeCloseTo(8, 10);
  });

  it('refuses gaps of millimetres, and says why', () => {
    const result = martinPulseField({ time_us: 0.1, gap_cm: 0.3, pressure_atm: 1 });
    expect(result).toMatchObject({ ok: false, refusal: { field: 'gap_cm' } });
    if (!result.ok) expect(result.refusal.words).toContain('long divergent gaps');
  });
});
