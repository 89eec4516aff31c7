import fc from 'fast-check';
import { describe, expect, expectTypeOf, it } from 'vitest';
import {
  absToGauge,
  ambientBar,
  atmToBar,
  barToAtm,
  barToKilopascal,
  barToPsi,
  barToTorr,
  gaugeToAbs,
  kilopascalToBar,
  pressureAbsBar,
  pressureGaugeBar,
  psiToBar,
  torrToBar,
  type PressureAbsBar,
  type PressureGaugeBar,
} from './pressure';
import type { Result } from './result';

const must = <T>(result: Result<T>): T => {
  if (!result.ok) throw new Error(result.refusal.words);
  return result.value;
};

describe('gauge and absolute', () => {
  it('are different types, and neither is a bare number', () => {
    expectTypeOf<PressureAbsBar>().not.toExtend<PressureGaugeBar>();
    expectTypeOf<PressureGaugeBar>().not.toExtend<PressureAbsBar>();
    expectTypeOf<number>().not.toExtend<PressureAbsBar>();
  });

  it('convert with the ambient pressure, which has no default', () => {
    const ambient = must(ambientBar(0.966));
    expect(must(gaugeToAbs(must(pressureGaugeBar(1)), ambient))).toBeCloseTo(1.966, 12);
    expect(absToGauge(must(pressureAbsBar(1.966)), ambient)).toBeCloseTo(1, 12);
    expect(gaugeToAbs).toHaveLength(2);
  });

  it('refuse what lies below absolute vacuum', () => {
    const below = gaugeToAbs(must(pressureGaugeBar(-0.97)), must(ambientBar(0.966)));
    expect(below).toMatchObject({ ok: false, refusal: { type: 'below-vacuum', field: 'pressure' } });
    expect(pressureAbsBar(-0.001)).toMatchObject({ ok: false, refusal: { type: 'too-small' } });
    expect(must(gaugeToAbs(must(pressureGaugeBar(-0.966)), must(ambientBar(0.966))))).toBe(0);
  });

  it.each([Number.NaN, Infinity, -5, 1e9, '1'])('refuse %s by field', (value) => {
    expect(pressureGaugeBar(value, 'p')).toMatchObject({ ok: false, refusal: { field: 'p' } });
    expect(pressureAbsBar(value, 'p')).toMatchObject({ ok: false, refusal: { field: 'p' } });
    expect(ambientBar(value, 'p')).toMatchObject({ ok: false, refusal: { field: 'p' } });
  });

  it.each([0.49, 1.11, 101.3, 0])('refuse %d bar as ambient: it was typed in another unit', (value) => {
    expect(ambientBar(value).ok).toBe(false);
  });
});

describe('units of pressure', () => {
  // Definitions: 1 atm = 101,325 Pa = 760 Torr (SI brochure). The psi factor is the pound-force over the square inch.
  it('meet their definitions', () => {
    expect(atmToBar(1)).toBe(1.01325);
    expect(barToTorr(1.01325)).toBeCloseTo(760, 6);
    expect(barToKilopascal(1.01325)).toBeCloseTo(101.325, 12);
    expect(barToPsi(1.01325)).toBeCloseTo(14.6959, 4);
  });

  it('come back from every conversion', () => {
    fc.assert(
      fc.property(fc.double({ min: 1e-6, max: 1e3, noNaN: true }), (bar) =>
        [
          torrToBar(barToTorr(bar)),
          atmToBar(barToAtm(bar)),
          kilopascalToBar(barToKilopascal(bar)),
          psiToBar(barToPsi(bar)),
        ].every((back) => Math.abs(back / bar - 1) < 1e-12),
      ),
    );
  });
});
