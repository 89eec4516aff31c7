import fc from 'fast-check';
import { describe, it } from 'vitest';
import { describeSoundness, type Probes } from '../../../tests/support/sound-results';
import type { Answer } from '../units/answer';
import type { Result } from '../units/result';
import * as bleed from './bleed';
import * as capacitance from './capacitance';
import * as dielectrics from './dielectrics';
import * as edge from './edge';
import * as energy from './energy';
import * as fringe from './fringe';
import * as hazard from './hazard';
import * as life from './life';
import * as parts from './parts';
import * as puncture from './puncture';
import * as stress from './stress';
import * as touch from './touch';

const NANO = 1e-9;
const names = [...dielectrics.MATERIALS, 'unobtainium'];
const materialOf = (number: number) => names[Math.abs(Math.trunc(number) || 0) % names.length] ?? 'PET';
const partOf = (number: number) =>
  parts.PART_CLASSES[Math.abs(Math.trunc(number) || 0) % parts.PART_CLASSES.length] ?? 'mica';

const PROBES: Probes = {
  bleedTime: ([a, b, c, d]) => bleed.bleedTime({ resistance_ohm: a * 1e6, capacitance_F: b * NANO }, c, d),
  bleedPower: ([a, b]) => bleed.bleedPower(a * 1e6, b),
  bleedWait: ([a, b, c, d, e]) =>
    bleed.bleedWait(
      [
        { name: 'one', capacitance_F: a * NANO, bleed_ohm: b * 1e6 },
        { name: 'two', capacitance_F: c * NANO, bleed_ohm: d > 5 ? null : d * 1e6 },
      ],
      { supply_V: 1000 * e, discharged_below_V: 50 },
    ),
  inversionNodes: ([a, b]) => {
    const [first, second, both] = bleed.inversionNodes(
      { name: 'one', capacitance_F: NANO, bleed_ohm: Math.abs(a) <= 1e9 ? a : null },
      { name: 'two', capacitance_F: NANO, bleed_ohm: Math.abs(b) <= 1e9 ? b : null },
    );
    return [first.bleed_ohm, second.bleed_ohm, both.bleed_ohm];
  },
  sheetCapacitance: ([a, b, c, d]) =>
    capacitance.sheetCapacitance({ eps_r: 1 + a, area_m2: b, thickness_m: c * 1e-3, layers: 1 + d }),
  plyThickness_m: ([a, b]) => capacitance.plyThickness_m(a, b),
  bankCapacitance: ([a, b, c]) =>
    capacitance.bankCapacitance([{ part_F: a * NANO, in_series: 1 + b, in_parallel: 1 + c }]),
  relativePermittivity: ([a]) => dielectrics.relativePermittivity(materialOf(a)),
  minimumStrength: ([a, b]) => dielectrics.minimumStrength(materialOf(a), b),
  reboundVoltage: ([a, b]) => dielectrics.reboundVoltage(materialOf(a), b),
  edgeDischargeInception: ([a, b]) => edge.edgeDischargeInception(a, 1 + b),
  slidingDischargeInception: ([a, b]) => edge.slidingDischargeInception(a, 1 + b),
  edgeMargin: ([a]) => edge.edgeMargin(a),
  storedEnergy: ([a, b]) => energy.storedEnergy(a * NANO, b),
  shotCharge: ([a, b, c]) => energy.shotCharge(a * NANO, b, c / 10),
  fringeExcess: ([a, b]) => fringe.fringeExcess(a, b / 10),
  sheetWithAirFilm: ([a, b, c, d, e]) =>
    fringe.sheetWithAirFilm({
      eps_r: 1 + a,
      area_m2: b,
      thickness_m: c * 1e-3,
      air_m: d * 1e-6,
      layers: 1 + e,
    }),
  reflexThreshold: ([a]) => hazard.reflexThreshold(1000 * a),
  shockThreshold: ([a]) => hazard.shockThreshold(1000 * a),
  arcThreshold: ([a]) => hazard.arcThreshold(1000 * a),
  heatThreshold: ([a]) => hazard.heatThreshold(a),
  hazardBand: ([a, b, c]) => hazard.hazardBand(a * NANO, { kV: b, mA: c }),
  lifeShots: ([a, b, c]) => life.lifeShots({ ratedShots: 1 + a, exponent: 1 + b }, c),
  lifeStressRatio: ([a, b, c, d]) =>
    life.lifeStressRatio({ voltage_V: a, reversal: b / 10, rated_V: 1 + c, ratedReversal: d / 10 }),
  capacitanceAtVoltage: ([a, b, c, d]) =>
    parts.capacitanceAtVoltage({ part: partOf(a), nominal_F: b * NANO, rated_V: 1 + c + d, voltage_V: c }),
  energyAtVoltage: ([a, b, c, d]) =>
    parts.energyAtVoltage({ part: partOf(a), nominal_F: b * NANO, rated_V: 1 + c + d, voltage_V: c }),
  areaStrengthRatio: ([a, b]) => puncture.areaStrengthRatio(a, 1 + b),
  punctureProbability: ([a, b, c]) =>
    puncture.punctureProbability({ stress_over_E63: a, area_ratio: b, beta: 1 + c }),
  sheetPuncture: ([a, b, c, d]) =>
    puncture.sheetPuncture({ material: materialOf(a), thickness_mm: b, area_cm2: c, voltage_V: d }),
  dielectricStress: ([a, b]) => stress.dielectricStress(a, b * 1e-3),
  stressMargin: ([a, b, c]) => stress.stressMargin(a, b * 1e-3, c),
  airFilmField: ([a, b, c, d]) =>
    stress.airFilmField({ voltage_V: a, thickness_um: b, eps_r: 1 + c, air_um: d }),
  petMinimumStrength: ([a]) => stress.petMinimumStrength(75 + a),
  touchVerdict: ([a, b]) => touch.touchVerdict(a * NANO, 1000 * b),
  exceedsTouchLimit: ([a, b]) => touch.exceedsTouchLimit(a * NANO, 1000 * b),
};

describeSoundness('capacitor', PROBES, [
  bleed,
  capacitance,
  dielectrics,
  edge,
  energy,
  fringe,
  hazard,
  life,
  parts,
  puncture,
  stress,
  touch,
]);

const value = (result: Result<Answer>) => (result.ok ? result.value.value : Number.NaN);
const near = (a: number, b: number, tolerance = 1e-9) => Math.abs(a / b - 1) < tolerance;
const more = fc.double({ min: 1.01, max: 5, noNaN: true });
const volts = fc.double({ min: 1e3, max: 5e4, noNaN: true });
const material = fc.constantFrom(...dielectrics.MATERIALS);

describe('bleeding', () => {
  it('ends at the voltage that it was asked for: the inverse of the exponential', () => {
    fc.assert(
      fc.property(volts, more, fc.double({ min: 0.1, max: 1000, noNaN: true }), (from_V, by, Mohm) => {
        const to_V = from_V / by;
        const s = value(bleed.bleedTime({ resistance_ohm: Mohm * 1e6, capacitance_F: 2e-9 }, from_V, to_V));
        return near(from_V * Math.exp(-s / (Mohm * 1e6 * 2e-9)), to_V, 1e-6);
      }),
    );
  });

  it('never takes less for more capacitance, resistance or voltage, and a wait never less than a minute', () => {
    const wait = (farad: number, ohm: number, supply_V: number) => {
      const node = { name: 'dump', capacitance_F: farad, bleed_ohm: ohm };
      const answer = bleed.bleedWait([node], { supply_V, discharged_below_V: 50 });
      return answer.ok && answer.value.type === 'known' ? answer.value.wait_s : Number.NaN;
    };
    fc.assert(
      fc.property(volts, more, (V, by) => {
        const here = wait(2e-9, 5e9, V);
        return (
          here >= 60 &&
          wait(by * 2e-9, 5e9, V) >= here &&
          wait(2e-9, by * 5e9, V) >= here &&
          wait(2e-9, 5e9, by * V) >= here
        );
      }),
    );
  });

  it('does not mind the order of its nodes', () => {
    const nodes = [
      { name: 'one', capacitance_F: 2e-9, bleed_ohm: 3e9 },
      { name: 'two', capacitance_F: 5e-9, bleed_ohm: 8e9 },
      { name: 'three', capacitance_F: 1e-9, bleed_ohm: 2e9 },
    ];
    fc.assert(
      fc.property(fc.shuffledSubarray(nodes, { minLength: 3, maxLength: 3 }), (order) => {
        const answer = bleed.bleedWait(order, { supply_V: 2e4, discharged_below_V: 50 });
        return answer.ok && answer.value.type === 'known' && answer.value.slowest === 'two';
      }),
    );
  });
});

describe('sheets', () => {
  it('with no air film are the plain sheet, and with one are always less', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 1e-5, max: 1e-3, noNaN: true }),
        fc.double({ min: 1e-7, max: 1e-4, noNaN: true }),
        (thickness_m, air_m) => {
          const sheet = { eps_r: 3.2, area_m2: 0.09, thickness_m, layers: 1 };
          const plain = value(capacitance.sheetCapacitance(sheet));
          return (
            near(value(fringe.sheetWithAirFilm({ ...sheet, air_m: 0 })), plain) &&
            value(fringe.sheetWithAirFilm({ ...sheet, air_m })) < plain
          );
        },
      ),
    );
  });

  it('strengthen with less area, as the inverse of more area weakens them', () => {
    fc.assert(
      fc.property(more, fc.double({ min: 2, max: 20, noNaN: true }), (ratio, beta) =>
        near(
          value(puncture.areaStrengthRatio(ratio, beta)) * value(puncture.areaStrengthRatio(1 / ratio, beta)),
          1,
        ),
      ),
    );
  });

  it('puncture more often with stress and area, and never above 1', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.05, max: 0.9, noNaN: true }), more, (stress_over_E63, by) => {
        const at = (E: number, area_ratio: number) =>
          value(puncture.punctureProbability({ stress_over_E63: E, area_ratio, beta: 10 }));
        const here = at(stress_over_E63, 1);
        return at(by * stress_over_E63, 1) >= here && at(stress_over_E63, by) >= here && at(by, by) <= 1;
      }),
    );
  });

  it('of every material weaken as they thicken, but stand a higher voltage', () => {
    fc.assert(
      fc.property(material, fc.double({ min: 0.02, max: 5, noNaN: true }), more, (name, mm, by) => {
        const at = (thickness: number) => value(dielectrics.minimumStrength(name, thickness));
        return at(by * mm) <= at(mm) * (1 + 1e-12) && at(by * mm) * by * mm >= at(mm) * mm;
      }),
    );
  });

  it('discharge at their edges later with thickness and sooner with permittivity', () => {
    fc.assert(
      fc.property(fc.double({ min: 10, max: 1000, noNaN: true }), more, (um, by) => {
        const at = (t: number, eps: number) => value(edge.edgeDischargeInception(t, eps));
        return at(by * um, 3) > at(um, 3) && at(um, 3 * by) < at(um, 3);
      }),
      { numRuns: 30 },
    );
  });

  it('carry more field in an air film than in the film itself', () => {
    fc.assert(
      fc.property(volts, fc.double({ min: 10, max: 1000, noNaN: true }), (voltage_V, thickness_um) => {
        const air = value(stress.airFilmField({ voltage_V, thickness_um, eps_r: 3.2, air_um: 1 }));
        return air > value(stress.dielectricStress(voltage_V, thickness_um * 1e-6));
      }),
    );
  });
});

describe('energy and hazard', () => {
  const ranks = ['below-reflex', 'reflex', 'serious-injury', 'may-kill', 'blast'];

  it('never fall into a milder band with more voltage or capacitance', () => {
    fc.assert(
      fc.property(volts, more, fc.double({ min: 1e-10, max: 1e-5, noNaN: true }), (V, by, farad) => {
        const at = (F: number, kV: number) => {
          const band = hazard.hazardBand(F, { kV, mA: 1 });
          return band.ok ? ranks.indexOf(band.value.type) : Number.NaN;
        };
        const here = at(farad, V / 1000);
        return at(by * farad, V / 1000) >= here && at(farad, (by * V) / 1000) >= here;
      }),
    );
  });

  it('over the touch limit stays over it with more capacitance', () => {
    fc.assert(
      fc.property(volts, more, fc.double({ min: 1e-10, max: 1e-6, noNaN: true }), (V, by, farad) => {
        const at = (F: number) => touch.exceedsTouchLimit(F, V);
        const [here, above] = [at(farad), at(by * farad)];
        return here.ok && above.ok && (!here.value || above.value);
      }),
    );
  });

  it('of a part that loses capacitance is never more than of one that does not', () => {
    fc.assert(
      fc.property(
        fc.constantFrom(...parts.PART_CLASSES),
        fc.double({ min: 0.01, max: 1, noNaN: true }),
        (part, share) => {
          const at = { part, nominal_F: 1e-9, rated_V: 3e4, voltage_V: 3e4 * share };
          return (
            value(parts.energyAtVoltage(at)) <= value(energy.storedEnergy(1e-9, at.voltage_V)) * (1 + 1e-12)
          );
        },
      ),
    );
  });

  it('wear a part faster with stress: the life law inverts', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.3, max: 2, noNaN: true }),
        fc.double({ min: 5, max: 12, noNaN: true }),
        (ratio, exponent) => {
          const shots = value(life.lifeShots({ ratedShots: 1e6, exponent }, ratio));
          return near((1e6 / shots) ** (1 / exponent), ratio, 1e-6);
        },
      ),
    );
  });
});
