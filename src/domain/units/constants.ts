/** Boltzmann, J/K; exact since 2019 (SI brochure, 9th edition). */
export const BOLTZMANN_J_K = 1.380649e-23;
/** Molar gas constant, J/(mol K); exact since 2019. */
export const GAS_CONSTANT_J_MOL_K = 8.31446261815324;
/** Planck, J s; exact since 2019. */
export const PLANCK_J_S = 6.62607015e-34;
/** Speed of light in vacuum, m/s; exact. */
export const SPEED_OF_LIGHT_M_S = 299_792_458;
/** Elementary charge, C; exact since 2019. */
export const ELEMENTARY_CHARGE_C = 1.602176634e-19;
/** Magnetic constant, H/m; CODATA 2018. */
export const MAGNETIC_CONSTANT_H_M = 1.25663706212e-6;

/** Molecules per cubic centimetre of an ideal gas. */
export function numberDensity_cm3(pressure_bar_abs: number, temperature_K: number): number {
  return (pressure_bar_abs * 1e5) / (BOLTZMANN_J_K * temperature_K) / 1e6;
}
