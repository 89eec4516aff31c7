import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Answer } from '../units/answer';
import type { Result } from '../units/result';
import { gasHeating, preionisationMinimum, renewalFlow, transitTime } from './discharge';
import { gainWindow, type GainInput } from './gain-window';
import { reducedField, townsendUnit } from './reduced-field';
import {
  upperStateLifetime,
  upperStateLifetimeAir,
  upperStateLifetimeKinetic,
  upperStateLifetimeWithOxygen,
} from './upper-state';

const value = (result: Result<Answer>) => (result.ok ? result.value.value : Number.NaN);

describe('reduced field', () => {
  it('is the field over the unit', () => {
    const at = { voltage_V: 15_000, gap_cm: 0.3, pressure_bar_abs: 1, temperature_K: 293.15 };
    expect(value(reducedField(at))).toBeCloseTo(50 / value(townsendUnit(293.15)), 9);
    expect(reducedField({ ...at, gap_cm: 0 })).toMatchObject({ refusal: { field: 'gap_cm' } });
    expect(reducedField({ ...at, temperature_K: 20 })).toMatchObject({ refusal: { field: 'temperature_K' } });
  });
});

describe('the upper level', () => {
  it('lives 2.6 ns at 1 bar, and a fifth longer by kinetics', () => {
    expect(value(upperStateLifetime(1))).toBeCloseTo(2.61, 2);
    expect(value(upperStateLifetimeKinetic(1, 20)) / value(upperStateLifetime(1))).toBeCloseTo(1.23, 1);
  });

  it.each([
    [0.001, 0.02],
    [0.01, 0.16],
    [0.21, 0.8],
  ])('loses to %d of oxygen about %d of its life at 1 atm', (oxygen_share, lost) => {
    const pure = value(upperStateLifetime(1.01325));
    const mixed = value(
      upperStateLifetimeWithOxygen({ pressure_bar_abs: 1.01325, oxygen_share, temperature_C: 20 }),
    );
    expect(1 - mixed / pure).toBeCloseTo(lost, 1);
  });

  it('falls with pressure and with oxygen, in air shortest of all', () => {
    const bar = fc.double({ min: 0.001, max: 10, noNaN: true });
    fc.assert(
      fc.property(
        bar,
        bar,
        (a, b) => value(upperStateLifetime(Math.max(a, b))) <= value(upperStateLifetime(Math.min(a, b))),
      ),
    );
    expect(value(upperStateLifetimeAir(1, 20))).toBeLessThan(value(upperStateLifetimeKinetic(1, 20)));
    expect(
      upperStateLifetimeWithOxygen({ pressure_bar_abs: 1, oxygen_share: 1.1, temperature_C: 20 }),
    ).toMatchObject({
      refusal: { field: 'oxygen_share' },
    });
  });
});

describe('the discharge', () => {
  it('crosses 30 cm in a nanosecond', () => {
    expect(value(transitTime(0.3, 1))).toBeCloseTo(1.0007, 4);
    expect(transitTime(0.3, 0.9)).toMatchObject({ refusal: { field: 'refractiveIndex' } });
  });

  it('warms its gas by 31 K with 0.1 J, which the next shot notices', () => {
    const shot = { energy_J: 0.1, volume_cm3: 2.7, pressure_bar_abs: 1.01325, temperature_C: 20 };
    expect(gasHeating(shot)).toMatchObject({ value: { warnings: [{ type: 'thin-gas' }] } });
    expect(gasHeating({ ...shot, volume_cm3: 27 })).toMatchObject({ value: { warnings: [] } });
  });

  it('renews and preionises as worked by hand', () => {
    expect(value(renewalFlow({ volume_cm3: 10, rate_Hz: 20, renewals: 2 }))).toBeCloseTo(24, 12);
    expect(value(preionisationMinimum(1200, 5e-9))).toBeCloseTo(2.03e6, -4);
  });
});

const GOOD: GainInput = {
  currentRise_ns: 2,
  peak_kV: 20,
  staticBreak_kV: 13,
  gap_cm: 0.35,
  pressure_bar_abs: 1,
  temperature_C: 20,
  oxygen_share: 0.001,
};
const score = (change: Partial<GainInput>) => {
  const verdict = gainWindow({ ...GOOD, ...change });
  return verdict.ok ? verdict.value.score : Number.NaN;
};

describe('gainWindow', () => {
  it('is full where everything is as wanted, and promises nothing', () => {
    const verdict = gainWindow(GOOD);
    if (!verdict.ok) throw new Error('refused');
    expect(verdict.value.score).toBeGreaterThan(90);
    expect(verdict.value.words).toContain('No promise');
    expect(verdict.value.reasons).toHaveLength(4);
  });

  it.each<[string, Partial<GainInput>, string]>([
    ['a slow current', { currentRise_ns: 40 }, 'rise'],
    ['no over-voltage', { peak_kV: 14, gap_cm: 0.25 }, 'over-voltage'],
    ['a low field', { gap_cm: 0.55 }, 'field'],
    ['air', { oxygen_share: 0.21, currentRise_ns: 0.3 }, 'oxygen'],
  ])('falls with %s, and names it first', (_name, change, type) => {
    const verdict = gainWindow({ ...GOOD, ...change });
    expect(score(change)).toBeLessThan(score({}));
    expect(verdict).toMatchObject({ value: { reasons: [{ type }, {}, {}, {}] } });
  });

  it('is nothing without over-voltage at all', () => {
    expect(score({ peak_kV: 12 })).toBe(0);
  });

  it('stays from 0 to 100 for any input that it takes', () => {
    fc.assert(
      fc.property(
        fc.double(),
        fc.double(),
        fc.double(),
        fc.double(),
        (...[currentRise_ns, peak_kV, oxygen_share, gap_cm]) => {
          const verdict = gainWindow({ ...GOOD, currentRise_ns, peak_kV, oxygen_share, gap_cm });
          return !verdict.ok || (verdict.value.score >= 0 && verdict.value.score <= 100);
        },
      ),
    );
  });

  it.each<[Partial<GainInput>, string]>([
    [{ currentRise_ns: 0 }, 'currentRise_ns'],
    [{ staticBreak_kV: Number.NaN }, 'staticBreak_kV'],
    [{ pressure_bar_abs: -1 }, 'pressure'],
    [{ temperature_C: Infinity }, 'temperature_C'],
  ])('refuses %j beside %s', (change, field) => {
    expect(gainWindow({ ...GOOD, ...change })).toMatchObject({ refusal: { field } });
  });
});
