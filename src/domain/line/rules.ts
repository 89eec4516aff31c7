import type { NumberRule } from '../units/check-number';

/** What a length in metres may be. */
export const LENGTH_RULE: NumberRule = { field: 'length_m', name: 'Length', unit: 'm', min: 1e-7, max: 100 };

export const WIDTH_RULE: NumberRule = { ...LENGTH_RULE, field: 'width_m', name: 'Width' };

/** Thickness of what lies between two conductors. */
export const SPACING_RULE: NumberRule = { ...LENGTH_RULE, field: 'spacing_m', name: 'Spacing' };

export const PERMITTIVITY_RULE: NumberRule = {
  field: 'eps_r',
  name: 'Relative permittivity',
  unit: '',
  min: 1,
  max: 1e5,
};

/** Inductance in henry. */
export const INDUCTANCE_RULE: NumberRule = {
  field: 'inductance_H',
  name: 'Inductance',
  unit: 'H',
  min: 1e-13,
  max: 100,
};

/** mu0 in H/m. Since 2019 it is measured, and 4 pi 1e-7 to 1e-9 of it. */
export const MU0_H_M = 4e-7 * Math.PI;

/** Speed of light in vacuum, m/s; exact by definition. */
export const LIGHT_M_S = 299_792_458;

/** Wave impedance of vacuum, ohm: mu0 c. */
export const VACUUM_OHM = MU0_H_M * LIGHT_M_S;
