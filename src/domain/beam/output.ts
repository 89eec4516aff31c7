import type { Answer, Warning } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { computed } from '../units/computed';
import type { Result } from '../units/result';
import { WAVELENGTH_RULE } from './photon';

const BOTH_ENDS: Warning = { type: 'both-ends', words: 'From each end: both ends emit.' };

/** Light over stored energy: a poor rig, a typical one, and the one to plan hazards with; from memory. */
const EFFICIENCY = { poor: 5e-5, typical: 2e-4, hazard: 1e-3 };

/**
 * Pulse energy to plan hazards with, uJ: a thousandth of the stored energy, from each end. Poor rigs give 5e-5, typical
 * ones 2e-4 (from memory; one point read: 0.1 J gave 11 uJ in air and 23 uJ in nitrogen). Not a forecast of output.
 */
export function hazardOutput(stored_J: number): Result<Answer> {
  return computed(
    [checkNumber(stored_J, { field: 'stored_J', name: 'Stored energy', unit: 'J', min: 0, max: 1e5 })],
    () => ({
      value: EFFICIENCY.hazard * stored_J * 1e6,
      unit: '\u00b5J',
      model: 'A thousandth of the stored energy',
      valid: 'for hazards only; the band begins at what poor rigs give. Round it up',
      relative: { below: 1 - EFFICIENCY.poor / EFFICIENCY.hazard, above: 0 },
      warnings: [BOTH_ENDS],
    }),
  );
}

/** Full divergence that a channel's aperture sets, mrad: width over length. */
export function apertureDivergence(width_mm: number, length_mm: number): Result<Answer> {
  return computed(
    [
      checkNumber(width_mm, { field: 'width_mm', name: 'Channel width', unit: 'mm', min: 0.001, max: 1000 }),
      checkNumber(length_mm, { field: 'length_mm', name: 'Channel length', unit: 'mm', min: 1, max: 1e5 }),
    ],
    () => ({
      value: (1000 * width_mm) / length_mm,
      unit: 'mrad',
      model: 'Width over length',
      valid: 'no mirror; with one about half of it',
      relative: { below: 0.5, above: 0.5 },
      warnings: [BOTH_ENDS],
    }),
  );
}

/**
 * Dye light to plan hazards with, uJ: one photon out for every photon in, so pump energy times pump over dye wavelength.
 * An upper bound by conservation of energy; transverse pumping gives a twentieth to a fifth of it (from memory).
 */
export function dyeHazardOutput(dye: {
  readonly pump_uJ: number;
  readonly pump_nm: number;
  readonly dye_nm: number;
}): Result<Answer> {
  return computed(
    [
      checkNumber(dye.pump_uJ, { field: 'pump_uJ', name: 'Pump energy', unit: '\u00b5J', min: 0, max: 1e9 }),
      checkNumber(dye.pump_nm, { ...WAVELENGTH_RULE, field: 'pump_nm', name: 'Pump wavelength' }),
      checkNumber(dye.dye_nm, {
        ...WAVELENGTH_RULE,
        field: 'dye_nm',
        name: 'Dye wavelength',
        min: dye.pump_nm,
        minReason: 'a dye emits beyond its pump\u2019s wavelength',
      }),
    ],
    () => ({
      value: (dye.pump_uJ * dye.pump_nm) / dye.dye_nm,
      unit: '\u00b5J',
      model: 'One photon out for each photon in',
      valid: 'an upper bound for hazards, not a forecast. Round it up',
      relative: { below: 0.95, above: 0 },
      warnings: [
        {
          type: 'visible-beam',
          words:
            'Visible dye pulses pass their limit at 77\u2009nJ into the eye: any dye beam does. UV glasses do not stop it.',
        },
      ],
    }),
  );
}
