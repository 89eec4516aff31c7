import fc from 'fast-check';
import { describe, it } from 'vitest';
import { describeSoundness, type Draw, type Probes } from '../../../tests/support/sound-results';
import type { Answer } from '../units/answer';
import type { Result } from '../units/result';
import * as area from './averaging-area';
import * as limit from './exposure-limit';
import * as eyewear from './eyewear';
import * as distance from './hazard-distance';
import * as output from './output';
import * as photon from './photon';
import * as visible from './visible-sum';

const wavelengthOf = (number: number) =>
  Number.isFinite(number) && Math.abs(number) <= 1000 ? 315 + ((37 * Math.abs(number)) % 385) : number;
const beamOf = ([a, b, c, d, e]: Draw): distance.RectangularBeam => ({
  energy_J: a * 1e-6,
  width_mm: b,
  height_mm: c,
  divergenceWidth_mrad: d,
  divergenceHeight_mrad: e,
});

const PROBES: Probes = {
  singlePulseLimit: ([a, b]) => limit.singlePulseLimit(wavelengthOf(a), b * 1e-9),
  visibleOldLimit: ([a, b]) => limit.visibleOldLimit(wavelengthOf(a), b * 1e-6),
  cumulativeLimit: ([a, b]) => limit.cumulativeLimit(wavelengthOf(a), b),
  dailyUvaLimit: ([a, b]) => limit.dailyUvaLimit(wavelengthOf(a), b),
  trainLimit: ([a, b, c]) => limit.trainLimit(a, b * 1e-9, wavelengthOf(c)),
  perPulseLimit: ([a, b, c, d]) =>
    limit.perPulseLimit({ rate_Hz: a, pulse_s: b * 1e-9, exposure_s: c, wavelength_nm: wavelengthOf(d) }),
  visibleSumLimit: ([a, b]) => visible.visibleSumLimit(wavelengthOf(a), b),
  energyThroughAperture: ([a, b]) => eyewear.energyThroughAperture(a, b),
  opticalDensity: ([a, b, c]) =>
    eyewear.opticalDensity({ energy_J: a * 1e-6, area_m2: b * 1e-6, limit_J_m2: c }),
  averagingArea: ([a, b, c]) =>
    area.averagingArea({ width_mm: a, height_mm: b, wavelength_nm: wavelengthOf(c) }),
  eyewearFor: ([a, b, c, d, e, f]) =>
    eyewear.eyewearFor([
      {
        name: 'line',
        wavelength_nm: wavelengthOf(a),
        energy_J: b * 1e-6,
        pulse_s: c * 1e-9,
        width_mm: d,
        height_mm: e,
        ...(f > 5 ? {} : { train: { rate_Hz: f, exposure_s: 10 } }),
      },
    ]),
  timeToDayDose: ([a, b]) => eyewear.timeToDayDose({ exposure_J_m2: a, rate_Hz: b }),
  dayDoseShare: ([a, b]) => eyewear.dayDoseShare(a, b),
  hazardDistanceRound: ([a, b, c, d]) =>
    distance.hazardDistanceRound({ energy_J: a * 1e-6, diameter_mm: b, divergence_mrad: c, limit_J_m2: d }),
  hazardDistanceRectangular: (draw) => distance.hazardDistanceRectangular(beamOf(draw), draw[5]),
  hazardDistancePulse: (draw) =>
    distance.hazardDistancePulse(beamOf(draw), draw[5] * 1e-9, wavelengthOf(draw[6])),
  hazardDistanceTrain: (draw) =>
    distance.hazardDistanceTrain(beamOf(draw), {
      rate_Hz: draw[5],
      pulse_s: draw[6] * 1e-9,
      exposure_s: draw[7],
    }),
  diffuseViewingDistance: ([a, b, c]) =>
    distance.diffuseViewingDistance({ energy_J: a * 1e-6, limit_J_m2: b, reflectance: c / 10 }),
  exposureAt: (draw) => distance.exposureAt(beamOf(draw), draw[5], wavelengthOf(draw[6])),
  hazardOutput: ([a]) => output.hazardOutput(a),
  apertureDivergence: ([a, b]) => output.apertureDivergence(a, 10 * b),
  dyeHazardOutput: ([a, b, c]) =>
    output.dyeHazardOutput({ pump_uJ: a, pump_nm: wavelengthOf(b), dye_nm: wavelengthOf(c) }),
  photonEnergy: ([a]) => photon.photonEnergy(100 + a),
  photonCount: ([a, b]) => photon.photonCount(100 + a, b * 1e-6),
  peakPower: ([a, b]) => photon.peakPower(a * 1e-6, b * 1e-9),
};

describeSoundness('beam', PROBES, [area, limit, eyewear, distance, output, photon, visible], ['circle_m2']);

const value = (result: Result<Answer>) => (result.ok ? result.value.value : Number.NaN);
const near = (a: number, b: number, tolerance = 1e-6) => Math.abs(a / b - 1) < tolerance;
const more = fc.double({ min: 1.01, max: 5, noNaN: true });
const nm = fc.constantFrom(315, 337.1, 380, 400, 440, 460, 532, 600, 632.8);
const exposure = fc.double({ min: -3, max: 3.7, noNaN: true }).map((power) => 10 ** power);

describe('exposure limits', () => {
  it('of a sum never fall as the exposure goes on, and of a pulse in a train never grow', () => {
    fc.assert(
      fc.property(nm, exposure, more, (wavelength_nm, s, by) => {
        const sum = (t: number) =>
          value(
            wavelength_nm < 400
              ? limit.cumulativeLimit(wavelength_nm, t)
              : visible.visibleSumLimit(wavelength_nm, t),
          );
        const pulse = (t: number) =>
          value(limit.perPulseLimit({ rate_Hz: 20, pulse_s: 1e-9, exposure_s: t, wavelength_nm }));
        // The two blue rules meet at 10 s, where the sum steps down by a hundredth.
        return sum(by * s) >= 0.98 * sum(s) && pulse(by * s) <= 1.02 * pulse(s);
      }),
    );
  });

  it('of a train never rise with its rate', () => {
    fc.assert(
      fc.property(nm, exposure, more, (wavelength_nm, exposure_s, by) => {
        const at = (rate_Hz: number) =>
          value(limit.perPulseLimit({ rate_Hz, pulse_s: 1e-9, exposure_s, wavelength_nm }));
        return at(20 * by) <= at(20) * (1 + 1e-12);
      }),
    );
  });

  it('are asked of the eyewear: behind it the exposure is at the limit', () => {
    fc.assert(
      fc.property(fc.double({ min: 1e-7, max: 1e-2, noNaN: true }), more, (energy_J, size) => {
        const pulse = { energy_J, area_m2: size * 1e-5, limit_J_m2: 30 };
        const density = value(eyewear.opticalDensity(pulse));
        return near(energy_J / pulse.area_m2 / 10 ** density, 30);
      }),
    );
  });

  it('let through an aperture what its area takes', () => {
    fc.assert(
      fc.property(more, more, (J_m2, mm) =>
        near(
          value(eyewear.energyThroughAperture(J_m2, 2 * mm)),
          4 * value(eyewear.energyThroughAperture(J_m2, mm)),
        ),
      ),
    );
  });
});

describe('hazard distances', () => {
  const beam = fc.record({
    energy_J: fc.double({ min: 1e-4, max: 1, noNaN: true }),
    width_mm: fc.double({ min: 0.1, max: 3, noNaN: true }),
    height_mm: fc.double({ min: 0.1, max: 3, noNaN: true }),
    divergenceWidth_mrad: fc.double({ min: 0.5, max: 20, noNaN: true }),
    divergenceHeight_mrad: fc.double({ min: 0.5, max: 20, noNaN: true }),
  });

  it('are where the spread beam has come down to the limit: the inverse', () => {
    fc.assert(
      fc.property(beam, (one) => {
        const r = value(distance.hazardDistanceRectangular(one, 10));
        const wide = (one.width_mm + one.divergenceWidth_mrad * r) / 1000;
        const high = (one.height_mm + one.divergenceHeight_mrad * r) / 1000;
        return near(one.energy_J / (wide * high), 10);
      }),
    );
  });

  it('do not mind which side of the beam is called its width', () => {
    fc.assert(
      fc.property(beam, (one) => {
        const turned = {
          ...one,
          width_mm: one.height_mm,
          height_mm: one.width_mm,
          divergenceWidth_mrad: one.divergenceHeight_mrad,
          divergenceHeight_mrad: one.divergenceWidth_mrad,
        };
        return near(
          value(distance.hazardDistanceRectangular(one, 10)),
          value(distance.hazardDistanceRectangular(turned, 10)),
        );
      }),
    );
  });

  it('grow with energy and shrink with divergence, and of a train are never under one pulse', () => {
    fc.assert(
      fc.property(beam, more, (one, by) => {
        const at = (change: Partial<distance.RectangularBeam>) =>
          value(distance.hazardDistanceRectangular({ ...one, ...change }, 10));
        const train = { rate_Hz: 20, pulse_s: 1e-9, exposure_s: 10 };
        return (
          at({ energy_J: by * one.energy_J }) > at({}) &&
          at({ divergenceWidth_mrad: by * one.divergenceWidth_mrad }) < at({}) &&
          value(distance.hazardDistanceTrain(one, train)) >= value(distance.hazardDistancePulse(one, 1e-9))
        );
      }),
    );
  });
});

describe('photons', () => {
  it('carry the pulse: number times energy', () => {
    fc.assert(
      fc.property(fc.double({ min: 200, max: 2000, noNaN: true }), more, (wavelength, J) => {
        const sum_J =
          value(photon.photonCount(wavelength, J)) * value(photon.photonEnergy(wavelength)) * 1.602176634e-19;
        return near(sum_J, J);
      }),
    );
  });

  it('of a dye are never more than those of its pump', () => {
    fc.assert(
      fc.property(fc.double({ min: 340, max: 700, noNaN: true }), more, (dye_nm, pump_uJ) => {
        const out_J = value(output.dyeHazardOutput({ pump_uJ, pump_nm: 337.1, dye_nm })) * 1e-6;
        return near(
          value(photon.photonCount(dye_nm, out_J)),
          value(photon.photonCount(337.1, pump_uJ * 1e-6)),
        );
      }),
    );
  });
});
