import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Answer } from '../units/answer';
import type { Result } from '../units/result';
import { DIELECTRICS, MATERIALS, minimumStrength, reboundVoltage, relativePermittivity } from './dielectrics';
import { edgeDischargeInception, edgeMargin, slidingDischargeInception } from './edge';
import { fringeExcess, sheetWithAirFilm } from './fringe';
import { lifeShots, lifeStressRatio } from './life';
import { capacitanceAtVoltage, energyAtVoltage } from './parts';
import { areaStrengthRatio, punctureProbability, sheetPuncture } from './puncture';

const value = (result: Result<Answer>) => (result.ok ? result.value.value : Number.NaN);
const BAD = [Number.NaN, Infinity, -Infinity, -1] as const;

describe('the table of dielectrics', () => {
  it.each(MATERIALS)('%s names its source and stands in order', (material) => {
    const { eps_r, source, strength } = DIELECTRICS[material];
    expect(eps_r.low).toBeLessThanOrEqual(eps_r.value);
    expect(eps_r.high).toBeGreaterThanOrEqual(eps_r.value);
    expect(strength.kV_mm).toBeGreaterThan(0);
    expect(source).toMatch(/read|memory/);
  });

  it('knows trade names and small letters', () => {
    expect(value(relativePermittivity('Mylar'))).toBe(3.2);
    expect(value(relativePermittivity(' ptfe '))).toBe(2.1);
    expect(relativePermittivity('toString')).toMatchObject({ refusal: { type: 'material-unknown' } });
    expect(relativePermittivity('paper')).toMatchObject({ refusal: { field: 'material' } });
  });

  it.each(MATERIALS)('%s never gets stronger per millimetre when thicker', (material) => {
    const thickness = fc.double({ min: 0.001, max: 100, noNaN: true });
    fc.assert(
      fc.property(thickness, thickness, (a, b) => {
        return (
          value(minimumStrength(material, Math.max(a, b))) <=
          (1 + 1e-9) * value(minimumStrength(material, Math.min(a, b)))
        );
      }),
      { numRuns: 60 },
    );
  });

  it('warns far from the tested thickness', () => {
    expect(minimumStrength('FR4', 3)).toMatchObject({ value: { warnings: [{ type: 'extrapolated' }] } });
    expect(minimumStrength('FR4', 0.2)).toMatchObject({ value: { warnings: [] } });
  });

  it('lets 20 kV come back as a kilovolt on PET and as 20 V on polypropylene', () => {
    expect(value(reboundVoltage('PET', 20_000))).toBeCloseTo(1000, 9);
    expect(value(reboundVoltage('polypropylene', 20_000))).toBeCloseTo(20, 9);
  });
});

describe('edges and air films', () => {
  it('start to discharge at a kilovolt or two', () => {
    expect(value(edgeDischargeInception(125, 3.2))).toBeCloseTo(1060, -2);
  });

  it('rise with thickness and fall with permittivity', () => {
    expect(value(edgeDischargeInception(250, 3.2))).toBeGreaterThan(value(edgeDischargeInception(125, 3.2)));
    expect(value(edgeDischargeInception(125, 4.5))).toBeLessThan(value(edgeDischargeInception(125, 2.2)));
    expect(value(slidingDischargeInception(250, 3.2))).toBeGreaterThan(
      value(slidingDischargeInception(125, 3.2)),
    );
  });

  it('want 3 mm a kilovolt', () => {
    expect(value(edgeMargin(15))).toBe(45);
  });

  it('add less to a wider strip', () => {
    expect(value(fringeExcess(0.1, 1e-3))).toBeLessThan(value(fringeExcess(0.05, 1e-3)));
    expect(fringeExcess(1e-3, 0.5e-3)).toMatchObject({ value: { warnings: [{ type: 'narrow-strip' }] } });
    expect(fringeExcess(1e-3, 2e-3)).toMatchObject({ refusal: { field: 'width_m' } });
  });

  it.each(BAD)('refuse %d', (bad) => {
    expect(edgeDischargeInception(bad, 3).ok).toBe(false);
    expect(slidingDischargeInception(100, bad).ok).toBe(false);
    expect(edgeMargin(bad).ok).toBe(false);
    expect(fringeExcess(0.1, bad).ok).toBe(false);
    expect(sheetWithAirFilm({ eps_r: 3, area_m2: 0.1, thickness_m: 1e-4, air_m: bad, layers: 1 }).ok).toBe(
      false,
    );
  });
});

describe('puncture and life', () => {
  it('makes large areas weaker and small ones stronger', () => {
    expect(value(areaStrengthRatio(1, 10))).toBe(1);
    expect(value(areaStrengthRatio(90, 10))).toBeLessThan(1);
    expect(value(areaStrengthRatio(0.5, 10))).toBeGreaterThan(1);
  });

  it('keeps a chance between 0 and 1, rising with stress, and its band too', () => {
    const ratio = fc.double({ min: 0, max: 10, noNaN: true });
    fc.assert(
      fc.property(ratio, ratio, (a, b) => {
        const at = (stress_over_E63: number) =>
          punctureProbability({ stress_over_E63, area_ratio: 90, beta: 10 });
        const [low, high] = [at(Math.min(a, b)), at(Math.max(a, b))];
        if (!low.ok || !high.ok) return false;
        return (
          low.value.value <= high.value.value && high.value.band.high <= 1 + 1e-12 && low.value.band.low >= 0
        );
      }),
    );
  });

  it('keeps digits of a small chance', () => {
    expect(value(punctureProbability({ stress_over_E63: 0.01, area_ratio: 1, beta: 10 }))).toBeCloseTo(
      1e-20,
      32,
    );
  });

  it('lives longer under less stress', () => {
    const law = { ratedShots: 10_000, exponent: 8 };
    expect(value(lifeShots(law, 1))).toBe(10_000);
    expect(value(lifeShots(law, 0.5))).toBe(2_560_000);
    expect(lifeShots(law, 0)).toMatchObject({ refusal: { field: 'stress_ratio' } });
    expect(lifeShots(law, 0.1)).toMatchObject({ value: { warnings: [{ type: 'extrapolated' }] } });
  });

  it('counts full reversal as twice the stress', () => {
    expect(
      value(lifeStressRatio({ voltage_V: 10_000, reversal: 1, rated_V: 20_000, ratedReversal: 0 })),
    ).toBe(1);
  });
});

describe('bought parts', () => {
  const part = {
    part: 'high-permittivity ceramic',
    nominal_F: 2e-9,
    rated_V: 30_000,
    voltage_V: 30_000,
  } as const;

  it('lose 20 to 60 % at their rated voltage', () => {
    const at = capacitanceAtVoltage(part);
    if (!at.ok) throw new Error('refused');
    expect(at.value.band.low).toBeCloseTo(0.8e-9, 20);
    expect(at.value.band.high).toBeCloseTo(1.6e-9, 20);
    expect(value(capacitanceAtVoltage({ ...part, voltage_V: 0 }))).toBe(2e-9);
  });

  // By hand: C0 V^2 (1/2 - a/3), a from 0.2 to 0.6.
  it('hold the integral of V dQ, and never more than C V^2 / 2', () => {
    const at = energyAtVoltage(part);
    if (!at.ok) throw new Error('refused');
    expect(at.value.value).toBeCloseTo(1.8 * (0.5 - 0.4 / 3), 12);
    expect(at.value.band.high).toBeCloseTo(1.8 * (0.5 - 0.2 / 3), 12);
    expect(at.value.band.high).toBeLessThan(0.9);
  });

  it('are refused above their rating', () => {
    expect(energyAtVoltage({ ...part, voltage_V: 30_001 })).toMatchObject({
      refusal: { field: 'voltage_V' },
    });
    expect(capacitanceAtVoltage({ ...part, rated_V: Number.NaN }).ok).toBe(false);
  });
});

describe('a sheet of film at a voltage', () => {
  const sheet = { material: 'PET', thickness_mm: 0.25, area_cm2: 900, voltage_V: 15_000 };

  // 15 kV on 0.25 mm of PET, 60 of 65 kV/mm, punctures almost surely; a quarter of it gives about 1e-4 (physics N).
  it('punctures almost surely at its minimum strength and hardly ever at a quarter of it', () => {
    expect(value(sheetPuncture(sheet))).toBeGreaterThan(0.99);
    const quarter = value(sheetPuncture({ ...sheet, voltage_V: 15_000 / 4 }));
    expect(quarter).toBeGreaterThan(1e-5);
    expect(quarter).toBeLessThan(1e-3);
  });

  it('warns over a third of the strength and names what it is taken from', () => {
    const third = sheetPuncture(sheet);
    expect(third.ok && third.value.warnings.map(({ type }) => type)).toContain('little-margin');
    expect(third.ok && third.value.model).toContain('data sheet');
    expect(sheetPuncture({ ...sheet, material: 'paper' })).toMatchObject({ refusal: { field: 'material' } });
    expect(sheetPuncture({ ...sheet, area_cm2: 0 })).toMatchObject({ refusal: { field: 'area_cm2' } });
  });
});
