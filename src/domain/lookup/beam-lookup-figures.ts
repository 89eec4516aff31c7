import { singlePulseLimit, UVA_DAY_J_M2 } from '../beam/exposure-limit';
import { dayDoseShare, eyewearFor, timeToDayDose, type EyewearAdvice } from '../beam/eyewear';
import { diffuseViewingDistance } from '../beam/hazard-distance';
import { dyeHazardOutput } from '../beam/output';
import { peakPower, photonCount, photonEnergy } from '../beam/photon';
import type { Answer, Warning } from '../units/answer';
import { andThen, ok, type Result } from '../units/result';
import type { BeamInput } from './beam-lookup-input';
import { allOf, figureOf } from './figures';
import type { Figure } from './lookup';

/** Paper at its brightest, seen straight on: all light comes back. */
const REFLECTANCE = 1;

/** Density of one line, rounded up to a tenth as the maker states it. */
export function densityFigure(
  [key, label]: readonly [string, string],
  { lines }: EyewearAdvice,
  { weight, note }: Required<Pick<Figure, 'weight' | 'note'>>,
): Figure {
  const density = lines[0]?.density ?? 0;
  return {
    key,
    label,
    value: density,
    unit: '',
    rounding: 'up',
    digits: 2,
    weight,
    // Nought must not read as a word to take the glasses off.
    note: density === 0 ? 'one pulse asks for none; trains, lenses and hot spots do' : note,
  };
}

/** Dye light as an upper bound, with its own density and viewing distance. Nothing where no dye is pumped. */
export function dyeFigures(input: BeamInput): Result<{
  readonly figures: readonly Figure[];
  readonly answers: readonly { readonly warnings: readonly Warning[] }[];
}> {
  const { dye_nm, beam, wavelength_nm, pulse_s, rate_Hz, exposure_s } = input;
  if (dye_nm === null) return ok({ figures: [], answers: [] });
  const bound = dyeHazardOutput({ pump_uJ: beam.energy_J * 1e6, pump_nm: wavelength_nm, dye_nm });
  if (!bound.ok) return bound;
  const energy_J = bound.value.value * 1e-6;
  const parts = allOf({
    // A dye beam is thinner than the pupil: the aperture averages it.
    eyewear: eyewearFor([
      {
        name: 'Dye',
        wavelength_nm: dye_nm,
        energy_J,
        pulse_s,
        width_mm: 1,
        height_mm: 1,
        train: { rate_Hz, exposure_s },
      },
    ]),
    limit: singlePulseLimit(dye_nm, pulse_s),
  });
  if (!parts.ok) {
    const { type, words } = parts.refusal;
    return { ok: false, refusal: { type, field: 'dye_nm', words: `Dye laser: ${words}` } };
  }
  const view = diffuseViewingDistance({
    energy_J,
    limit_J_m2: parts.value.limit.value,
    reflectance: REFLECTANCE,
  });
  if (!view.ok) return view;
  return ok({
    figures: [
      densityFigure(
        ['od_dye', `eyewear density at ${dye_nm.toFixed(0)}\u2009nm, dye light`],
        parts.value.eyewear,
        {
          weight: 'main',
          note: 'an upper bound; one pair must meet both',
        },
      ),
      figureOf(['dye_energy', 'dye light at most'], bound.value, { rounding: 'up' }),
      figureOf(['diffuse_dye', 'dye spot on paper, seen from no nearer than'], view.value, {
        rounding: 'up',
      }),
    ],
    answers: [bound.value],
  });
}

/** The dose of a day, for ultraviolet only. Left out where it lies beyond what is counted. */
export function doseFigures(
  { wavelength_nm, rate_Hz, exposure_s }: BeamInput,
  exposure: Answer,
): readonly Figure[] {
  if (wavelength_nm < 315 || wavelength_nm >= 400) return [];
  const time = timeToDayDose({ exposure_J_m2: exposure.value, rate_Hz });
  const share = dayDoseShare(exposure.value, Math.max(1, rate_Hz * exposure_s));
  return [
    ...(time.ok
      ? [
          figureOf(['dose_time', 'day\u2019s dose used up at the aperture after'], time.value, {
            rounding: 'down',
          }),
        ]
      : []),
    ...(share.ok
      ? [
          figureOf(['dose_share', 'share of the day\u2019s dose for the time in the beam'], share.value, {
            rounding: 'up',
            times: 100,
            unit: '%',
          }),
        ]
      : []),
    {
      key: 'limit_day',
      label: 'ultraviolet dose of a day',
      value: UVA_DAY_J_M2,
      unit: 'J/m\u00b2',
      rounding: 'down',
      digits: 3,
      weight: 'side',
    },
  ];
}

/** What the pulse is, and how near a spot of it on paper may be looked at. */
export function pulseFigures(input: BeamInput, single: Answer): Result<readonly Figure[]> {
  const { beam, wavelength_nm, pulse_s } = input;
  const parts = allOf({
    view: diffuseViewingDistance({
      energy_J: beam.energy_J,
      limit_J_m2: single.value,
      reflectance: REFLECTANCE,
    }),
    power: peakPower(beam.energy_J, pulse_s),
    photon: photonEnergy(wavelength_nm),
    count: photonCount(wavelength_nm, beam.energy_J),
  });
  return andThen(parts, ({ view, power, photon, count }) =>
    ok([
      figureOf(['diffuse', 'spot on paper, seen from no nearer than'], view, { rounding: 'up' }),
      figureOf(['peak', 'peak power'], power, { rounding: 'up', times: 1e-3, unit: 'kW' }),
      figureOf(['photon', 'energy of a photon'], photon, { rounding: 'nearest', digits: 4, weight: 'side' }),
      figureOf(['photons', 'photons in a pulse'], count, { rounding: 'nearest', weight: 'side' }),
    ]),
  );
}
