import type { Answer, Warning } from '../units/answer';
import { checkNumber, type NumberRule } from '../units/check-number';
import { computed } from '../units/computed';
import { firstRefusal, refused, type Result } from '../units/result';
import { averagingArea } from './averaging-area';
import { NITROGEN_LINE_NM, perPulseLimit, singlePulseLimit, type PulseTrain } from './exposure-limit';
import { PULSE_ENERGY_RULE } from './photon';

export const LIMIT_RULE: NumberRule = {
  field: 'limit_J_m2',
  name: 'Exposure limit',
  unit: 'J/m\u00b2',
  min: 1e-9,
  max: 1e9,
};
const WIDTH_RULE = { field: 'width_mm', name: 'Beam width', unit: 'mm', min: 0, max: 1000 } as const;
const DIVERGENCE_RULE = {
  field: 'divergence_mrad',
  name: 'Divergence',
  unit: 'mrad',
  min: 1e-3,
  max: 1000,
} as const;

const BOTH_ENDS: Warning = {
  type: 'both-ends',
  words: 'Both ends emit: this distance holds from each end, and a lens or a mirror changes it.',
};

/** Hazard distance of a round beam, m: (sqrt(4 Q/(pi MPE)) - a)/phi. 0 where the beam is under the limit at once. */
export function hazardDistanceRound(beam: {
  readonly energy_J: number;
  readonly diameter_mm: number;
  readonly divergence_mrad: number;
  readonly limit_J_m2: number;
}): Result<Answer> {
  return computed(
    [
      checkNumber(beam.energy_J, PULSE_ENERGY_RULE),
      checkNumber(beam.diameter_mm, { ...WIDTH_RULE, field: 'diameter_mm', name: 'Beam diameter' }),
      checkNumber(beam.divergence_mrad, DIVERGENCE_RULE),
      checkNumber(beam.limit_J_m2, LIMIT_RULE),
    ],
    () => {
      const wide_m = Math.sqrt((4 * beam.energy_J) / (Math.PI * beam.limit_J_m2));
      return distance(
        Math.max(0, (wide_m - beam.diameter_mm / 1000) / (beam.divergence_mrad / 1000)),
        'Round beam',
      );
    },
  );
}

/** A beam of rectangular section, as a discharge channel gives it. */
export interface RectangularBeam {
  readonly energy_J: number;
  readonly width_mm: number;
  readonly height_mm: number;
  readonly divergenceWidth_mrad: number;
  readonly divergenceHeight_mrad: number;
}

/** Hazard distance of a rectangular beam, m: (a + phi_a r)(b + phi_b r) = Q/MPE. */
export function hazardDistanceRectangular(beam: RectangularBeam, limit_J_m2: number): Result<Answer> {
  const { energy_J, width_mm, height_mm, divergenceWidth_mrad, divergenceHeight_mrad } = beam;
  return computed(
    [
      checkNumber(energy_J, PULSE_ENERGY_RULE),
      checkNumber(width_mm, WIDTH_RULE),
      checkNumber(height_mm, { ...WIDTH_RULE, field: 'height_mm', name: 'Beam height' }),
      checkNumber(divergenceWidth_mrad, { ...DIVERGENCE_RULE, field: 'divergenceWidth_mrad' }),
      checkNumber(divergenceHeight_mrad, { ...DIVERGENCE_RULE, field: 'divergenceHeight_mrad' }),
      checkNumber(limit_J_m2, LIMIT_RULE),
    ],
    () => {
      const [a, b] = [width_mm / 1000, height_mm / 1000];
      const [p, q] = [divergenceWidth_mrad / 1000, divergenceHeight_mrad / 1000];
      const short = energy_J / limit_J_m2 - a * b;
      // The stable form of the positive root of p q r^2 + (a q + b p) r - short = 0.
      const linear = a * q + b * p;
      const root = short <= 0 ? 0 : (2 * short) / (linear + Math.sqrt(linear ** 2 + 4 * p * q * short));
      return distance(root, 'Rectangular beam');
    },
  );
}

/**
 * Exposure at a distance from the aperture, J/m2: energy over the section there, averaged over no less than the limiting aperture.
 * The hazard distance does not average, so it is the longer of the two for a beam that is thinner than the aperture.
 */
export function exposureAt(
  beam: RectangularBeam,
  distance_m: number,
  wavelength_nm = NITROGEN_LINE_NM,
): Result<Answer> {
  const { energy_J, width_mm, height_mm, divergenceWidth_mrad, divergenceHeight_mrad } = beam;
  const bad = firstRefusal([
    checkNumber(energy_J, PULSE_ENERGY_RULE),
    checkNumber(divergenceWidth_mrad, { ...DIVERGENCE_RULE, field: 'divergenceWidth_mrad' }),
    checkNumber(divergenceHeight_mrad, { ...DIVERGENCE_RULE, field: 'divergenceHeight_mrad' }),
    checkNumber(distance_m, { field: 'distance_m', name: 'Distance', unit: 'm', min: 0, max: 1e4 }),
  ]);
  if (bad !== undefined) return refused(bad);
  // Millimetres a metre are milliradians.
  const area = averagingArea({
    width_mm: width_mm + divergenceWidth_mrad * distance_m,
    height_mm: height_mm + divergenceHeight_mrad * distance_m,
    wavelength_nm,
  });
  if (!area.ok) return area;
  return computed([], () => ({
    value: energy_J / area.value.value,
    unit: 'J/m\u00b2',
    model: 'Energy over the section of the beam',
    valid: 'an even beam; hot spots hold three times as much. Round it up',
    relative: { below: 0.3, above: 2 },
  }));
}

/** The same with the single-pulse limit of a pulse length; 337.1 nm unless another wavelength is named. */
export function hazardDistancePulse(
  beam: RectangularBeam,
  pulse_s: number,
  wavelength_nm = NITROGEN_LINE_NM,
): Result<Answer> {
  const limit = singlePulseLimit(wavelength_nm, pulse_s);
  return limit.ok ? hazardDistanceRectangular(beam, limit.value.value) : refused(limit.refusal);
}

/** The same for somebody in the beam of a train of pulses, by the limit that each of its pulses has. */
export function hazardDistanceTrain(beam: RectangularBeam, train: PulseTrain): Result<Answer> {
  const limit = perPulseLimit(train);
  return limit.ok ? hazardDistanceRectangular(beam, limit.value.value) : refused(limit.refusal);
}

/** Distance for looking at a spot on a matt surface, cm: sqrt(rho Q/(pi MPE)), straight on, the worst case. */
export function diffuseViewingDistance(spot: {
  readonly energy_J: number;
  readonly limit_J_m2: number;
  readonly reflectance: number;
}): Result<Answer> {
  return computed(
    [
      checkNumber(spot.energy_J, PULSE_ENERGY_RULE),
      checkNumber(spot.limit_J_m2, LIMIT_RULE),
      checkNumber(spot.reflectance, { field: 'reflectance', name: 'Reflectance', unit: '', min: 0, max: 1 }),
    ],
    () => ({
      value: 100 * Math.sqrt((spot.reflectance * spot.energy_J) / (Math.PI * spot.limit_J_m2)),
      unit: 'cm',
      model: 'Matt surface seen straight on',
      valid: 'a truly matt surface; paper is, metal and glass are not',
      relative: { below: 0.3, above: 0 },
    }),
  );
}

function distance(value: number, model: string) {
  return {
    value,
    unit: 'm',
    model,
    valid: 'an even beam; hot spots reach three times as far. Round it up',
    relative: { below: 0.3, above: 2 },
    warnings: [BOTH_ENDS],
  };
}
