import type { RectangularBeam } from '../beam/hazard-distance';
import type { Entered } from './entered';

/** A beam with the train of pulses that somebody may stand in. */
export interface BeamInput {
  readonly beam: RectangularBeam;
  readonly wavelength_nm: number;
  readonly pulse_s: number;
  readonly rate_Hz: number;
  readonly exposure_s: number;
  readonly dye_nm: number | null;
}

export function inputOf(input: Entered): BeamInput {
  return {
    beam: {
      energy_J: input.number('pulse_energy_uJ') * 1e-6,
      width_mm: input.number('width_mm'),
      height_mm: input.number('height_mm'),
      divergenceWidth_mrad: input.number('divergence_width_mrad'),
      divergenceHeight_mrad: input.number('divergence_height_mrad'),
    },
    wavelength_nm: input.number('wavelength_nm'),
    pulse_s: input.number('pulse_ns') * 1e-9,
    rate_Hz: input.number('rate_Hz'),
    exposure_s: input.number('exposure_s'),
    dye_nm: input.maybe('dye_nm'),
  };
}
