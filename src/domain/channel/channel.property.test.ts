import fc from 'fast-check';
import { describe, it } from 'vitest';
import { describeSoundness, type Probes } from '../../../tests/support/sound-results';
import type { Answer } from '../units/answer';
import type { Result } from '../units/result';
import * as discharge from './discharge';
import * as gain from './gain-window';
import * as field from './reduced-field';
import * as upper from './upper-state';

const PROBES: Probes = {
  transitTime: ([a, b]) => discharge.transitTime(a, 1 + b / 10),
  gasHeating: ([a, b, c, d]) =>
    discharge.gasHeating({ energy_J: a, volume_cm3: b, pressure_bar_abs: c, temperature_C: d }),
  renewalFlow: ([a, b, c]) => discharge.renewalFlow({ volume_cm3: a, rate_Hz: b, renewals: c }),
  preionisationMinimum: ([a, b]) => discharge.preionisationMinimum(1 + a, b * 1e-9),
  gainWindow: ([a, b, c, d, e, f, g]) =>
    gain.gainWindow({
      currentRise_ns: a,
      peak_kV: b,
      staticBreak_kV: c,
      gap_cm: d,
      pressure_bar_abs: e,
      temperature_C: f,
      oxygen_share: g / 10,
    }),
  townsendUnit: ([a]) => field.townsendUnit(77 + a),
  reducedField: ([a, b, c, d]) =>
    field.reducedField({ voltage_V: a, gap_cm: b, pressure_bar_abs: c, temperature_K: 77 + d }),
  reducedFieldFromTorr: ([a, b]) => field.reducedFieldFromTorr(a, b),
  upperStateLifetime: ([a]) => upper.upperStateLifetime(a),
  upperStateLifetimeKinetic: ([a, b]) => upper.upperStateLifetimeKinetic(a, b),
  upperStateLifetimeAir: ([a, b]) => upper.upperStateLifetimeAir(a, b),
  upperStateLifetimeWithOxygen: ([a, b, c]) =>
    upper.upperStateLifetimeWithOxygen({ pressure_bar_abs: a, oxygen_share: b / 10, temperature_C: c }),
};

describeSoundness('channel', PROBES, [discharge, gain, field, upper]);

const value = (result: Result<Answer>) => (result.ok ? result.value.value : Number.NaN);
const bar = fc.double({ min: 0.02, max: 5, noNaN: true });
const more = fc.double({ min: 1.01, max: 5, noNaN: true });
const shareOfOxygen = fc.double({ min: 0, max: 0.2, noNaN: true });

describe('the upper level', () => {
  it('lives shorter with pressure and with oxygen', () => {
    fc.assert(
      fc.property(bar, more, shareOfOxygen, (pressure_bar_abs, by, oxygen_share) => {
        const at = (p: number, x: number) =>
          value(
            upper.upperStateLifetimeWithOxygen({ pressure_bar_abs: p, oxygen_share: x, temperature_C: 20 }),
          );
        const here = at(pressure_bar_abs, oxygen_share);
        return (
          at(by * pressure_bar_abs, oxygen_share) < here && at(pressure_bar_abs, oxygen_share + 0.01) < here
        );
      }),
    );
  });

  it('lives in clean nitrogen as the form without oxygen says', () => {
    fc.assert(
      fc.property(bar, (pressure_bar_abs) => {
        const clean = { pressure_bar_abs, oxygen_share: 0, temperature_C: 20 };
        return (
          Math.abs(
            value(upper.upperStateLifetimeWithOxygen(clean)) /
              value(upper.upperStateLifetime(pressure_bar_abs)) -
              1,
          ) < 1e-12
        );
      }),
    );
  });
});

describe('the reduced field', () => {
  it('is the voltage over the field of one townsend', () => {
    fc.assert(
      fc.property(bar, fc.double({ min: 200, max: 2000, noNaN: true }), (pressure_bar_abs, temperature_K) => {
        const Td = value(field.reducedField({ voltage_V: 3000, gap_cm: 1, pressure_bar_abs, temperature_K }));
        const one_kV_cm = value(field.townsendUnit(temperature_K)) * pressure_bar_abs;
        return Math.abs((Td * one_kV_cm) / 3 - 1) < 1e-9;
      }),
    );
  });
});

describe('the gain window', () => {
  const at = (change: Partial<gain.GainInput>) =>
    gain.gainWindow({
      currentRise_ns: 3,
      peak_kV: 14,
      staticBreak_kV: 9,
      gap_cm: 0.3,
      pressure_bar_abs: 1,
      temperature_C: 20,
      oxygen_share: 0.01,
      ...change,
    });
  const score = (change: Partial<gain.GainInput>) => {
    const verdict = at(change);
    return verdict.ok ? verdict.value.score : Number.NaN;
  };

  it('never scores a slower rise or more oxygen higher', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.1, max: 50, noNaN: true }),
        more,
        shareOfOxygen,
        (currentRise_ns, by, x) => {
          return (
            score({ currentRise_ns: by * currentRise_ns }) <= score({ currentRise_ns }) &&
            score({ oxygen_share: x + 0.01 }) <= score({ oxygen_share: x })
          );
        },
      ),
    );
  });

  it('scores from 0 to 100, inside its band, weakest reason first', () => {
    fc.assert(
      fc.property(bar, fc.double({ min: 1, max: 40, noNaN: true }), (pressure_bar_abs, peak_kV) => {
        const verdict = at({ pressure_bar_abs, peak_kV });
        if (!verdict.ok) return false;
        const { rating, reasons } = verdict.value;
        const marks = reasons.map(({ mark }) => mark);
        return (
          rating.band.low >= 0 &&
          rating.band.high <= 100 &&
          rating.value === verdict.value.score &&
          marks.every((mark, index) => index === 0 || mark >= (marks[index - 1] ?? 0))
        );
      }),
    );
  });
});

describe('heat and renewal', () => {
  it('warm in proportion to energy over gas, and renew in proportion to rate', () => {
    fc.assert(
      fc.property(bar, more, (pressure_bar_abs, by) => {
        const warm = (energy_J: number, p: number) =>
          value(discharge.gasHeating({ energy_J, volume_cm3: 3, pressure_bar_abs: p, temperature_C: 20 }));
        const flow = (rate_Hz: number) =>
          value(discharge.renewalFlow({ volume_cm3: 3, rate_Hz, renewals: 2 }));
        return (
          Math.abs(warm(by, by * pressure_bar_abs) / warm(1, pressure_bar_abs) - 1) < 1e-9 &&
          Math.abs(flow(by * 10) / flow(10) / by - 1) < 1e-9
        );
      }),
    );
  });

  it('ask for fewer starting electrons as more time is left', () => {
    fc.assert(
      fc.property(fc.double({ min: 1, max: 100, noNaN: true }), more, (ns, by) => {
        const at = (t: number) => value(discharge.preionisationMinimum(1500, t * 1e-9));
        return at(by * ns) < at(ns);
      }),
    );
  });
});
