import { perPulseLimit, singlePulseLimit } from '../beam/exposure-limit';
import { eyewearFor, type BeamLine } from '../beam/eyewear';
import { exposureAt, hazardDistanceRectangular } from '../beam/hazard-distance';
import { andThen, ok, type Result } from '../units/result';
import { BEAM_FIELDS } from './beam-lookup-fields';
import { densityFigure, doseFigures, dyeFigures, pulseFigures } from './beam-lookup-figures';
import { inputOf } from './beam-lookup-input';
import { beamPlot } from './beam-lookup-plot';
import { beamStart } from './beam-lookup-start';
import { beside, entered, type Entered } from './entered';
import { allOf, figureOf, warningsOf } from './figures';
import type { Lookup, LookupAnswer } from './lookup';

/** The beam as a hazard, from either end (physics H, O). */
export const BEAM_LOOKUP: Lookup = {
  key: 'beam',
  title: 'Beam',
  decides: 'How far the beam is a hazard, and which density eyewear must state at which wavelength.',
  fields: BEAM_FIELDS,
  start: beamStart,
  answer: (values) =>
    andThen(entered(BEAM_FIELDS, values), (input) => beside(answer(input), BEAM_FIELDS, FIELD_NAMES)),
  solvable: [
    {
      field: 'pulse_energy_uJ',
      figure: 'hazard_distance',
      purpose: 'reach at most',
      rounding: 'down',
    },
    { field: 'exposure_s', figure: 'dose_share', purpose: 'use at most', rounding: 'down' },
    { field: 'rate_Hz', figure: 'dose_share', purpose: 'use at most', rounding: 'down' },
  ],
};

const FIELD_NAMES: Readonly<Record<string, string>> = {
  energy_J: 'pulse_energy_uJ',
  pulse_s: 'pulse_ns',
  divergence_mrad: 'divergence_width_mrad',
  divergenceWidth_mrad: 'divergence_width_mrad',
  divergenceHeight_mrad: 'divergence_height_mrad',
  pump_nm: 'wavelength_nm',
};

function answer(entries: Entered): Result<LookupAnswer> {
  const input = inputOf(entries);
  const { beam, wavelength_nm, pulse_s, rate_Hz, exposure_s } = input;
  const limits = allOf({
    single: singlePulseLimit(wavelength_nm, pulse_s),
    train: perPulseLimit({ rate_Hz, pulse_s, exposure_s, wavelength_nm }),
    exposure: exposureAt(beam, 0, wavelength_nm),
  });
  if (!limits.ok) return limits;
  const { single, train, exposure } = limits.value;
  const line: BeamLine = { ...beam, name: 'Laser', wavelength_nm, pulse_s };
  const parts = allOf({
    distance: hazardDistanceRectangular(beam, train.value),
    onePulse: hazardDistanceRectangular(beam, single.value),
    eyewear: eyewearFor([line]),
    inTrain: eyewearFor([{ ...line, train: { rate_Hz, exposure_s } }]),
    dye: dyeFigures(input),
    pulse: pulseFigures(input, single),
  });
  if (!parts.ok) return parts;
  const { distance, onePulse, eyewear, inTrain, dye, pulse } = parts.value;
  return ok({
    figures: [
      figureOf(['hazard_distance', 'over the limit within'], distance, {
        rounding: 'up',
        weight: 'answer',
        note: 'from each end, for the time in the beam',
      }),
      densityFigure(['od', `eyewear density at ${nm(wavelength_nm)}`], inTrain, {
        weight: 'answer',
        note: 'for the time in the beam',
      }),
      densityFigure(['od_pulse', 'eyewear density, one pulse'], eyewear, {
        weight: 'main',
        note: 'for an eye that meets the beam once',
      }),
      ...dye.figures,
      figureOf(['distance_pulse', 'over the limit of one pulse within'], onePulse, { rounding: 'up' }),
      figureOf(['exposure', 'exposure a pulse at the aperture'], exposure, { rounding: 'up' }),
      figureOf(['limit_single', 'limit for one pulse'], single, { rounding: 'down' }),
      figureOf(['limit_train', 'limit for each pulse of the time in the beam'], train, {
        rounding: 'down',
        note: train.model.replace('Least of three rules: ', 'by the '),
      }),
      ...doseFigures(input, exposure),
      ...pulse,
    ],
    says: saysOf(exposure.value, single.value, train.value),
    model: `${distance.model}, exposure over section; limits of IEC 60825 and 2006/25/EC`,
    valid: `${distance.valid}; limits ${single.valid}`,
    warnings: warningsOf([distance, single, inTrain, ...dye.answers]),
    cautions: [
      'Both ends emit. Beam stops, enclosure and the local laser rules go before eyewear; the laser safety officer decides.',
      'Glasses must state their density at this very wavelength. A lens, a mirror or a hot spot changes every distance here.',
    ],
    plot: beamPlot(input, { single: single.value, train: train.value, distance_m: distance.value }),
  });
}

function nm(wavelength_nm: number): string {
  return `${wavelength_nm.toFixed(1).replace(/\.0$/, '')}\u2009nm`;
}

function saysOf(exposure: number, single: number, train: number): string {
  if (exposure > single) return 'One pulse at the aperture is over its limit already.';
  return exposure > train
    ? 'One pulse at the aperture is under its limit; the time in the beam is over it.'
    : 'Under these limits at the aperture. A lens or a mirror may bring it over them, and under a limit is not harmless.';
}
