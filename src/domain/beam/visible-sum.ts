import { answer, type Answer } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { ok, type Result } from '../units/result';
import { PULSE_TIME_RULE, WAVELENGTH_RULE } from './photon';

const FROM_NM = 400;
const TO_NM = 700;
const BLUE_TO_NM = 600;
const THERMAL_FROM_S = 5e-6;
const PHOTOCHEMICAL_FROM_S = 10;
const PHOTOCHEMICAL_LEVEL_S = 100;

/**
 * Limit on what all visible pulses of an exposure add up to at the eye, J/m2, 400 to 700 nm: 2e-3 up to 5 us, 18 T^0.75 up
 * to 10 s, 10 W/m2 beyond; from 10 s on up to 600 nm also 100 C_B J/m2 and from 100 s 1 C_B W/m2, whichever is less.
 * Directive 2006/25/EC, tables 2.2, 2.3 and 2.5, with the shorter thermal start of ICNIRP 2013 (from memory).
 */
export function visibleSumLimit(wavelength_nm: number, exposure_s: number): Result<Answer> {
  const wavelength = checkNumber(wavelength_nm, { ...WAVELENGTH_RULE, min: FROM_NM, max: TO_NM });
  if (!wavelength.ok) return wavelength;
  const exposure = checkNumber(exposure_s, {
    ...PULSE_TIME_RULE,
    field: 'exposure_s',
    name: 'Exposure',
    min: 1e-11,
  });
  if (!exposure.ok) return exposure;
  return ok(
    answer({
      value: Math.min(thermal(exposure.value), photochemical(wavelength.value, exposure.value)),
      unit: 'J/m\u00b2',
      model: 'Visible, sum of an exposure',
      valid: 'a small source looked at directly, averaged over 7\u2009mm; round it down',
      relative: 0,
    }),
  );
}

function thermal(s: number): number {
  if (s <= THERMAL_FROM_S) return 2e-3;
  return s <= PHOTOCHEMICAL_FROM_S ? 18 * s ** 0.75 : 10 * s;
}

function photochemical(nm: number, s: number): number {
  if (s < PHOTOCHEMICAL_FROM_S || nm > BLUE_TO_NM) return Infinity;
  const blue = nm <= 450 ? 1 : 10 ** (0.02 * (nm - 450));
  return 100 * blue * Math.max(1, s / PHOTOCHEMICAL_LEVEL_S);
}
