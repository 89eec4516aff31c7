import fc from 'fast-check';
import { describe, it } from 'vitest';
import { describeSoundness, type Draw, type Probes } from '../../../tests/support/sound-results';
import type { Answer } from '../units/answer';
import type { Result } from '../units/result';
import * as limits from './rate-limits';
import * as relaxation from './relaxation';
import * as reach from './supply-reach';

const chargingOf = ([a, b, c, d, e, , broken]: Draw): reach.Charging => ({
  supply_kV: a + 2 * broken,
  supply_mA: b,
  ballast_Mohm: c,
  bleed_Mohm: d > 5 ? null : d,
  ...(e > 5 ? {} : { supply_W: e }),
});

const PROBES: Probes = {
  repetitionRate: ([a, b, c, d]) =>
    relaxation.repetitionRate({
      ballast_ohm: a * 1e6,
      capacitance_F: b * 1e-9,
      supply_V: 1000 * (c + d),
      break_V: 1000 * c,
    }),
  supplyPower: ([a, b, c, d]) =>
    relaxation.supplyPower({ capacitance_F: a * 1e-9, break_V: b, supply_V: c, rate_Hz: d }),
  ballastHeat: ([a, b, c, d]) =>
    relaxation.ballastHeat({ capacitance_F: a * 1e-9, break_V: b, supply_V: b + c, rate_Hz: d }),
  reachableVoltage: (draw) => reach.reachableVoltage(chargingOf(draw)),
  supplyReach: (draw) => reach.supplyReach(chargingOf(draw), { law_kV: draw[5], high_kV: draw[6] }),
  relaxedRate: (draw) =>
    reach.relaxedRate(chargingOf(draw), { capacitance_F: draw[5] * 1e-9, break_kV: draw[6] }),
  highestRate: (draw) =>
    reach.highestRate(chargingOf(draw), { capacitance_F: draw[5] * 1e-9, break_kV: draw[6] }),
  timeToSelfBreak: (draw) =>
    limits.timeToSelfBreak(chargingOf(draw), { capacitance_F: draw[5] * 1e-9, break_kV: draw[6] }),
  planRate: (draw) =>
    limits.planRate(chargingOf(draw), {
      capacitance_F: draw[5] * 1e-9,
      break_kV: draw[6],
      blown: draw[7] > 1,
      purge: { flow_L_min: draw[7], volume_cm3: draw[3] },
    }),
};

describeSoundness('charging', PROBES, [limits, relaxation, reach], ['currentRate_Hz', 'powerRate_Hz']);

const value = (result: Result<Answer>) => (result.ok ? result.value.value : Number.NaN);
const share = fc.double({ min: 0.05, max: 0.95, noNaN: true });
const more = fc.double({ min: 1.01, max: 5, noNaN: true });

describe('the rate of a free-running gap', () => {
  const at = (ballast_ohm: number, capacitance_F: number, broken: number) =>
    value(relaxation.repetitionRate({ ballast_ohm, capacitance_F, supply_V: 2e4, break_V: 2e4 * broken }));

  it('falls with ballast, capacitance and voltage', () => {
    fc.assert(
      fc.property(share, more, (broken, by) => {
        const here = at(1e7, 2e-9, broken);
        return (
          at(by * 1e7, 2e-9, broken) < here &&
          at(1e7, by * 2e-9, broken) < here &&
          at(1e7, 2e-9, broken + 0.5 * (0.99 - broken)) < here
        );
      }),
    );
  });

  it('charges to the break in its own period: the inverse of the exponential', () => {
    fc.assert(
      fc.property(share, (broken) => {
        const period = 1 / at(1e7, 2e-9, broken);
        return Math.abs(-Math.expm1(-period / (1e7 * 2e-9)) / broken - 1) < 1e-6;
      }),
    );
  });
});

const supply: reach.Charging = { supply_kV: 20, supply_mA: 1, ballast_Mohm: 20, bleed_Mohm: 500 };
const gap = (broken: number) => ({ capacitance_F: 2e-9, break_kV: 19 * broken, blown: false });

describe('the rate to plan with', () => {
  it('is the least of its limits and never above what charging allows', () => {
    fc.assert(
      fc.property(share, fc.double({ min: 0.01, max: 50, noNaN: true }), (broken, supply_W) => {
        const plan = limits.planRate({ ...supply, supply_W }, gap(broken));
        if (!plan.ok) return false;
        const rates = plan.value.limits.map(({ rate }) => rate.value);
        const highest = value(reach.highestRate({ ...supply, supply_W }, gap(broken)));
        return plan.value.rate.value === Math.min(...rates) && plan.value.rate.value <= highest;
      }),
    );
  });

  it('never grows as the supply shrinks', () => {
    fc.assert(
      fc.property(share, more, (broken, by) => {
        const weak = limits.planRate({ ...supply, supply_mA: supply.supply_mA / (10 * by) }, gap(broken));
        const strong = limits.planRate(supply, gap(broken));
        return weak.ok && strong.ok && weak.value.rate.value <= strong.value.rate.value;
      }),
    );
  });

  it('takes time to self-break as one over the rate', () => {
    fc.assert(
      fc.property(share, (broken) => {
        const product =
          value(limits.timeToSelfBreak(supply, gap(broken))) * value(reach.highestRate(supply, gap(broken)));
        return Math.abs(product - 1) < 1e-9;
      }),
    );
  });
});

describe('what the supply reaches', () => {
  it('is never more than the supply, and grows with the bleed', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.1, max: 1e4, noNaN: true }), more, (bleed_Mohm, by) => {
        const at = (bleed: number | null) => value(reach.reachableVoltage({ ...supply, bleed_Mohm: bleed }));
        return at(bleed_Mohm) <= at(by * bleed_Mohm) && at(by * bleed_Mohm) <= at(null) && at(null) <= 20;
      }),
    );
  });

  it('never gets worse with a stronger supply', () => {
    const rank = { 'never-fires': 0, 'may-not-fire': 1, reaches: 2 };
    fc.assert(
      fc.property(share, more, more, (broken, wide, by) => {
        const sides = { law_kV: 20 * broken, high_kV: 20 * broken * wide };
        const at = (supply_kV: number) => reach.supplyReach({ ...supply, supply_kV }, sides);
        const [weak, strong] = [at(20), at(20 * by)];
        return weak.ok && strong.ok && rank[weak.value.type] <= rank[strong.value.type];
      }),
    );
  });
});
