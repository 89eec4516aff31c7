import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { testDrift } from './drift';
import { rigLaw, type RigGap } from './rig-law';
import type { SelfBreakReading } from './fit-kept';
import { calibratedSelfBreak, fitSelfBreak } from './self-break-fit';

const RIG: RigGap = { gas: 'air', electrodes: { shape: 'sphere', radius_mm: 12 }, irradiated: true };

/** Numbers from 0 to 1 in a fixed order, for scatter that is the same in every run. */
function rolls(seed: number): () => number {
  let state = seed;
  const roll = () => {
    state = (state * 16_807) % 2_147_483_647;
    return state / 2_147_483_647;
  };
  // A small seed gives small first numbers.
  for (let index = 0; index < 10; index += 1) roll();
  return roll;
}

interface Truth {
  readonly scale: number;
  readonly offset_mm: number;
  readonly scatter: number;
  readonly per1000?: number;
  readonly gaps?: readonly number[];
  readonly count?: number;
  readonly seed?: number;
}

/** Readings of a rig whose gap and scale are known, with normal scatter. */
function readingsOf({
  scale,
  offset_mm,
  scatter,
  per1000 = 0,
  gaps = [2, 3, 4, 5],
  count = 24,
  seed = 7,
}: Truth) {
  const roll = rolls(seed);
  const law = rigLaw(RIG);
  return Array.from({ length: count }, (_, index): SelfBreakReading => {
    const gap_mm = gaps[index % gaps.length] ?? 3;
    const setting = { gap_mm, pressure_bar_abs: 1 + 0.1 * (index % 5), temperature_C: 20 };
    const expected = law({ ...setting, gap_mm: gap_mm + offset_mm });
    const normal = Math.sqrt(-2 * Math.log(roll())) * Math.cos(2 * Math.PI * roll());
    const shot = 100 * index;
    const voltage_kV =
      (expected.ok ? expected.value : Number.NaN) *
      scale *
      Math.exp(scatter * normal + (per1000 * shot) / 1000);
    return { ...setting, name: `A-${String(index + 1)}`, shot, voltage_kV };
  });
}

const fit = (readings: readonly SelfBreakReading[]) => {
  const result = fitSelfBreak(RIG, readings);
  if (!result.ok) throw new Error(result.refusal.words);
  return result.value;
};

describe('fitSelfBreak', () => {
  it('finds gap and scale again where nothing scatters', () => {
    const found = fit(readingsOf({ scale: 1.04, offset_mm: -0.12, scatter: 0 }));
    expect(found.type).toBe('gap-and-scale');
    expect(found.scale.value).toBeCloseTo(1.04, 6);
    expect(found.offset_mm?.value).toBeCloseTo(-0.12, 6);
    expect(found.outliers).toEqual([]);
    expect(found.drift.type).toBe('none');
  });

  it('holds the truth in its 95 % intervals in about 95 of 100 runs', () => {
    let held = 0;
    let both = 0;
    for (let seed = 1; seed <= 60; seed += 1) {
      const found = fit(readingsOf({ scale: 0.97, offset_mm: 0.1, scatter: 0.01, seed: 1000 * seed }));
      if (found.offset_mm === null) continue;
      both += 1;
      if (found.offset_mm.low <= 0.1 && found.offset_mm.high >= 0.1) held += 1;
    }
    expect(both).toBeGreaterThan(50);
    expect(held / both).toBeGreaterThan(0.86);
  });

  it('takes scale alone where all readings stand at one gap', () => {
    const found = fit(readingsOf({ scale: 1.05, offset_mm: 0, scatter: 0.01, gaps: [3] }));
    expect(found.type).toBe('scale-alone');
    expect(found.offset_mm).toBeNull();
    expect(found.scale.low).toBeLessThan(1.05);
    expect(found.scale.high).toBeGreaterThan(1.05);
    expect(found.warnings.map(({ type }) => type)).toContain('scale-alone');
  });

  it('takes scale alone where scatter hides the gap', () => {
    expect(fit(readingsOf({ scale: 1, offset_mm: 0, scatter: 0.08, gaps: [3, 3.2] })).type).toBe(
      'scale-alone',
    );
  });

  it('names the one reading that lies off, and fits the rest', () => {
    const readings = readingsOf({ scale: 1, offset_mm: 0, scatter: 0.01 }).map((one, index) =>
      index === 9 ? { ...one, voltage_kV: 0.7 * one.voltage_kV } : one,
    );
    const found = fit(readings);
    expect(found.outliers.map(({ name }) => name)).toEqual(['A-10']);
    expect(found.outliers[0]?.words).toContain('low');
    expect(found.used).toBe(readings.length - 1);
    expect(Math.abs(found.scale.value - 1)).toBeLessThan(0.03);
  });

  it('never leaves out more than a quarter', () => {
    const readings = readingsOf({ scale: 1, offset_mm: 0, scatter: 0.005, count: 8 }).map((one, index) =>
      index < 4 ? { ...one, voltage_kV: (0.5 + 0.1 * index) * one.voltage_kV } : one,
    );
    expect(fit(readings).outliers.length).toBeLessThanOrEqual(2);
  });

  it('tells a drift from scatter', () => {
    expect(fit(readingsOf({ scale: 1, offset_mm: 0, scatter: 0.01 })).drift.type).toBe('none');
    const falling = fit(readingsOf({ scale: 1, offset_mm: 0, scatter: 0.01, per1000: -0.03 }));
    expect(falling.drift).toMatchObject({ type: 'falling' });
    expect(falling.warnings.map(({ type }) => type)).toContain('drift');
  });

  it('is the same whatever the order of the readings', () => {
    const readings = readingsOf({ scale: 1.02, offset_mm: 0.05, scatter: 0.01 });
    const [forward, backward] = [fit(readings), fit(readings.toReversed())];
    expect(backward.scale.value).toBeCloseTo(forward.scale.value, 9);
    expect(backward.offset_mm?.value).toBeCloseTo(forward.offset_mm?.value ?? Number.NaN, 9);
  });

  it('carries a meter that reads wrong by a factor into the scale, and nowhere else', () => {
    const readings = readingsOf({ scale: 1, offset_mm: 0.1, scatter: 0.01 });
    const plain = fit(readings);
    fc.assert(
      fc.property(fc.double({ min: 0.5, max: 2, noNaN: true }), (factor) => {
        const found = fit(readings.map((one) => ({ ...one, voltage_kV: factor * one.voltage_kV })));
        const same = (got: number | undefined, wanted: number | undefined) =>
          Math.abs((got ?? Number.NaN) / (wanted ?? Number.NaN) - 1) < 1e-6;
        return (
          found.type === plain.type &&
          same(found.scale.value, factor * plain.scale.value) &&
          same(found.scale.high, factor * plain.scale.high) &&
          same(found.offset_mm?.value, plain.offset_mm?.value) &&
          same(found.scatter, plain.scatter)
        );
      }),
      { numRuns: 20 },
    );
  });

  it('refuses too few readings, and names the reading that is wrong', () => {
    const readings = readingsOf({ scale: 1, offset_mm: 0, scatter: 0.01 });
    expect(fitSelfBreak(RIG, readings.slice(0, 2))).toMatchObject({
      refusal: { type: 'number-of-readings' },
    });
    for (const change of [
      { voltage_kV: Number.NaN },
      { shot: -1 },
      { pressure_bar_abs: 9 },
      { gap_mm: 400 },
    ]) {
      const result = fitSelfBreak(
        RIG,
        readings.map((one, index) => (index === 3 ? { ...one, ...change } : one)),
      );
      expect(!result.ok && result.refusal.words).toMatch(/^A-4/);
    }
  });
});

describe('calibratedSelfBreak', () => {
  it('gives the rig\u2019s own figure, with a band for single shots', () => {
    const found = fit(readingsOf({ scale: 1.04, offset_mm: -0.12, scatter: 0.01 }));
    const setting = { gap_mm: 3, pressure_bar_abs: 1.2, temperature_C: 20 };
    const law = rigLaw(RIG)({ ...setting, gap_mm: 2.88 });
    const result = calibratedSelfBreak(found, setting);
    if (!result.ok || !law.ok) throw new Error('refused');
    expect(result.value.value / (1.04 * law.value)).toBeCloseTo(1, 1);
    expect(result.value.band.high / result.value.value - 1).toBeGreaterThan(0.01);
    expect(result.value.band.low).toBeLessThan(result.value.value);
    expect(calibratedSelfBreak(found, { ...setting, pressure_bar_abs: Number.NaN }).ok).toBe(false);
  });

  // Read at 2 to 5 mm and 1 to 1.4 bar.
  it.each([
    [2, 1, false],
    [5.2, 1.4, false],
    [6, 1.2, true],
    [1.5, 1.2, true],
    [3, 2.5, true],
    [3, 0.8, true],
  ])('at %d mm and %d bar it is extrapolated: %s', (gap_mm, pressure_bar_abs, extrapolated) => {
    const found = fit(readingsOf({ scale: 1, offset_mm: 0, scatter: 0.01 }));
    const result = calibratedSelfBreak(found, { gap_mm, pressure_bar_abs, temperature_C: 20 });
    if (!result.ok) throw new Error(result.refusal.words);
    expect(result.value.warnings.some(({ type }) => type === 'extrapolated')).toBe(extrapolated);
  });
});

describe('testDrift', () => {
  it('wants six readings at different shots', () => {
    const flat = [1, 2, 3, 4, 5].map((shot) => ({ shot, residual: 0 }));
    expect(testDrift(flat).type).toBe('too-few');
    expect(testDrift(Array.from({ length: 8 }, () => ({ shot: 5, residual: 0.1 }))).type).toBe('too-few');
    expect(testDrift([...flat, { shot: 6, residual: 0 }])).toMatchObject({ type: 'none', chance: 1 });
  });

  it('speaks without cause in about one run in twenty', () => {
    let spoke = 0;
    for (let seed = 1; seed <= 400; seed += 1) {
      const roll = rolls(7919 * seed);
      const points = Array.from({ length: 12 }, (_, shot) => ({
        shot,
        residual: Math.sqrt(-2 * Math.log(roll())) * Math.cos(2 * Math.PI * roll()),
      }));
      if (testDrift(points).type !== 'none') spoke += 1;
    }
    expect(spoke).toBeGreaterThan(6);
    expect(spoke).toBeLessThan(36);
  });
});
