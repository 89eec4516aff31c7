import { withBand, type Answer, type Basis } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { computed } from '../units/computed';
import { mapResult, ok, refused, type Result } from '../units/result';
import { perPulseLimit, singlePulseLimit, UVA_DAY_J_M2 } from './exposure-limit';
import { averagingArea, circle_m2 } from './averaging-area';
import { LIMIT_RULE } from './hazard-distance';
import { PULSE_ENERGY_RULE } from './photon';

const AREA_RULE = { field: 'area_m2', name: 'Beam area', unit: 'm\u00b2', min: 1e-12, max: 100 } as const;

/** Energy that an exposure limit lets through an aperture, nJ. 77 nJ for visible pulses through 7 mm. */
export function energyThroughAperture(limit_J_m2: number, aperture_mm: number): Result<Answer> {
  return computed(
    [
      checkNumber(limit_J_m2, LIMIT_RULE),
      checkNumber(aperture_mm, { field: 'aperture_mm', name: 'Aperture', unit: 'mm', min: 0.01, max: 1000 }),
    ],
    () => ({
      value: limit_J_m2 * circle_m2(aperture_mm) * 1e9,
      unit: 'nJ',
      model: 'Limit times aperture',
      valid: 'round it down',
      relative: 0,
    }),
  );
}

/** Optical density that brings a pulse down to its limit: log10(Q/A/MPE). Under 0 none is asked for by this sum. */
export function opticalDensity(pulse: {
  readonly energy_J: number;
  readonly area_m2: number;
  readonly limit_J_m2: number;
}): Result<Answer> {
  return computed(
    [
      checkNumber(pulse.energy_J, { ...PULSE_ENERGY_RULE, min: 1e-15 }),
      checkNumber(pulse.area_m2, AREA_RULE),
      checkNumber(pulse.limit_J_m2, LIMIT_RULE),
    ],
    () => {
      const value = Math.log10(pulse.energy_J / pulse.area_m2 / pulse.limit_J_m2);
      return {
        value,
        unit: '1',
        model: 'Exposure over limit, decades',
        valid: 'a stated optical density at this very wavelength; round it up',
        relative: 0,
        warnings:
          value <= 0
            ? [
                {
                  type: 'no-density-asked',
                  words:
                    'Under the single-pulse limit: trains, focusing and the day\u2019s dose may still be over theirs.',
                },
              ]
            : [],
      };
    },
  );
}

/** Light of one wavelength that a rig gives out. */
export interface BeamLine {
  readonly name: string;
  readonly wavelength_nm: number;
  readonly energy_J: number;
  readonly pulse_s: number;
  readonly width_mm: number;
  readonly height_mm: number;
  /** Where a person may stand in it for more than one pulse. */
  readonly train?: { readonly rate_Hz: number; readonly exposure_s: number };
}

/** What eyewear must do at one wavelength. `density` is rounded up to a tenth and never below 0. */
export interface EyewearLine {
  readonly name: string;
  readonly wavelength_nm: number;
  readonly density: number;
  /** What the sum asks for before rounding, with the limit it was held against as its law. */
  readonly asked: Answer;
}

/** Optical densities for every line that is present. */
export interface EyewearAdvice extends Basis {
  readonly lines: readonly EyewearLine[];
}

/**
 * Optical density asked for at every wavelength present: glasses against one do not stop another. A line with a train is
 * held against the limit for each of its pulses. Refused as a whole when one line has no limit, since a list with a hole
 * would be read as complete.
 */
export function eyewearFor(lines: readonly BeamLine[]): Result<EyewearAdvice> {
  if (lines.length === 0) {
    return refused({ type: 'empty', field: 'lines', words: 'Wavelengths: name every one that is present.' });
  }
  const done: EyewearLine[] = [];
  for (const line of lines) {
    const density = densityOf(line);
    if (!density.ok) return refused({ ...density.refusal, words: `${line.name}: ${density.refusal.words}` });
    const asked = density.value;
    const tenths = Math.ceil(Number((10 * Math.max(0, asked.value)).toPrecision(12)));
    done.push({ name: line.name, wavelength_nm: line.wavelength_nm, density: tenths / 10, asked });
  }
  return ok({
    lines: done,
    model: 'Exposure over limit at each wavelength',
    valid:
      'densities stated by the maker at these very wavelengths; a beam spread evenly, hot spots ask for more',
    warnings: [
      {
        type: 'every-wavelength',
        words:
          'One pair must meet every line, with a density stated at each wavelength. Clear plastic stops no dye light.',
      },
    ],
  });
}

function densityOf(line: BeamLine): Result<Answer> {
  const { pulse_s, wavelength_nm, train } = line;
  const limit =
    train === undefined
      ? singlePulseLimit(wavelength_nm, pulse_s)
      : perPulseLimit({ ...train, pulse_s, wavelength_nm });
  if (!limit.ok) return limit;
  const area = averagingArea(line);
  if (!area.ok) return area;
  const density = opticalDensity({
    energy_J: line.energy_J,
    area_m2: area.value.value,
    limit_J_m2: limit.value.value,
  });
  return mapResult(density, (one) =>
    // Hot spots reach three times the mean, as a hazard distance allows for.
    withBand(
      { ...one, model: limit.value.model },
      { low: one.value, high: one.value + Math.log10(HOT_SPOT) },
    ),
  );
}

const HOT_SPOT = 3;

/** A UV beam that falls on a person again and again. */
export interface DayExposure {
  readonly exposure_J_m2: number;
  readonly rate_Hz: number;
}

/** Time until the UV-A dose of a day is used up, s: 1e4 J/m2 over exposure a shot and rate. Round it down. */
export function timeToDayDose({ exposure_J_m2, rate_Hz }: DayExposure): Result<Answer> {
  return computed(
    [
      checkNumber(exposure_J_m2, {
        field: 'exposure_J_m2',
        name: 'Exposure a shot',
        unit: 'J/m\u00b2',
        min: 1e-6,
        max: 1e6,
      }),
      checkNumber(rate_Hz, { field: 'rate_Hz', name: 'Rate', unit: 'Hz', min: 1e-6, max: 1e6 }),
    ],
    () => ({
      value: UVA_DAY_J_M2 / (exposure_J_m2 * rate_Hz),
      unit: 's',
      model: 'Dose of a day over dose a second',
      valid: '315 to 400 nm, eye and skin; all UV-A of the day counts',
      relative: 0,
    }),
  );
}

/** Share of the day's UV-A dose that so many shots use, as a number; over 1 is over the dose. Round it up. */
export function dayDoseShare(exposure_J_m2: number, shots: number): Result<Answer> {
  return computed(
    [
      checkNumber(exposure_J_m2, {
        field: 'exposure_J_m2',
        name: 'Exposure a shot',
        unit: 'J/m\u00b2',
        min: 0,
        max: 1e6,
      }),
      checkNumber(shots, { field: 'shots', name: 'Shots', unit: '', min: 0, max: 1e9 }),
    ],
    () => {
      const value = (exposure_J_m2 * shots) / UVA_DAY_J_M2;
      return {
        value,
        unit: '1',
        model: 'Shots times exposure over the dose of a day',
        valid: '315 to 400 nm',
        relative: 0,
        warnings:
          value > 1 ? [{ type: 'over-day-dose', words: 'Over the dose of a day: stop, or cover up.' }] : [],
      };
    },
  );
}
