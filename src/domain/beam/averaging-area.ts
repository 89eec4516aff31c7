import type { Answer } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { computed } from '../units/computed';
import type { Result } from '../units/result';
import { WAVELENGTH_RULE } from './photon';

/** Areas over which exposure is averaged, mm across: 1 for UV up to 0.35 s, 7 for visible; from memory. */
export const APERTURE_MM = { uv: 1, visible: 7 } as const;
const UV_BELOW_NM = 400;

/** Area over which a beam's exposure counts, m2: the beam, and never less than the aperture would average over. */
export function averagingArea(beam: {
  readonly width_mm: number;
  readonly height_mm: number;
  readonly wavelength_nm: number;
}): Result<Answer> {
  const size = { unit: 'mm', min: 1e-3, max: 1e4 };
  return computed(
    [
      checkNumber(beam.width_mm, { field: 'width_mm', name: 'Beam width', ...size }),
      checkNumber(beam.height_mm, { field: 'height_mm', name: 'Beam height', ...size }),
      checkNumber(beam.wavelength_nm, WAVELENGTH_RULE),
    ],
    () => ({
      value: Math.max(
        beam.width_mm * beam.height_mm * 1e-6,
        circle_m2(beam.wavelength_nm < UV_BELOW_NM ? APERTURE_MM.uv : APERTURE_MM.visible),
      ),
      unit: 'm\u00b2',
      model: 'The larger of beam and limiting aperture',
      valid: 'pulses up to 0.35 s',
      relative: 0.1,
    }),
  );
}

export function circle_m2(diameter_mm: number): number {
  return (Math.PI / 4) * (diameter_mm / 1000) ** 2;
}
