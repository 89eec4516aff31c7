import type { Answer } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { computed } from '../units/computed';
import type { Result } from '../units/result';

const CONCENTRATION_RULE = {
  field: 'concentration_M',
  name: 'Concentration',
  unit: 'mol/L',
  min: 0,
  max: 20,
} as const;
const VOLUME_RULE = { field: 'volume_L', name: 'Volume', unit: 'L', min: 0, max: 1000 } as const;
/** Decadic, as tables give it. */
const ABSORPTION_RULE = {
  field: 'absorption_L_mol_cm',
  name: 'Absorption coefficient',
  unit: 'L/(mol cm)',
  min: 0,
  max: 1e7,
} as const;

/** Dye to weigh, g: concentration times volume times molar mass. Most dyes are taken for toxic: gloves, no dust. */
export function dyeMass(solution: {
  readonly concentration_M: number;
  readonly volume_L: number;
  readonly molarMass_g_mol: number;
}): Result<Answer> {
  return computed(
    [
      checkNumber(solution.concentration_M, CONCENTRATION_RULE),
      checkNumber(solution.volume_L, VOLUME_RULE),
      checkNumber(solution.molarMass_g_mol, {
        field: 'molarMass_g_mol',
        name: 'Molar mass',
        unit: 'g/mol',
        min: 1,
        max: 1e5,
      }),
    ],
    () => ({
      value: solution.concentration_M * solution.volume_L * solution.molarMass_g_mol,
      unit: 'g',
      model: 'Concentration times volume times molar mass',
      valid: 'pure dye; a purity on the label divides it. Fill up to the volume, do not add it',
      relative: 0.01,
    }),
  );
}

/** Stock solution to take, L, for a thinner one: c V/c0. Fill up to the volume with solvent. */
export function stockVolume(dilution: {
  readonly stock_M: number;
  readonly concentration_M: number;
  readonly volume_L: number;
}): Result<Answer> {
  const { stock_M, concentration_M, volume_L } = dilution;
  return computed(
    [
      checkNumber(stock_M, {
        ...CONCENTRATION_RULE,
        field: 'stock_M',
        name: 'Stock concentration',
        min: 1e-12,
      }),
      checkNumber(concentration_M, { ...CONCENTRATION_RULE, max: stock_M, maxReason: 'the stock itself' }),
      checkNumber(volume_L, VOLUME_RULE),
    ],
    () => ({
      value: (concentration_M * volume_L) / stock_M,
      unit: 'L',
      model: 'Same amount of dye in a larger volume',
      valid: 'one solvent, one temperature',
      relative: 0.02,
    }),
  );
}

/** Depth at which pump light has fallen to 1/e, um: 1/(ln 10 eps c). Transverse pumping wants 100 to 300 (from memory). */
export function penetrationDepth(absorption_L_mol_cm: number, concentration_M: number): Result<Answer> {
  return computed(
    [
      checkNumber(absorption_L_mol_cm, { ...ABSORPTION_RULE, min: 1 }),
      checkNumber(concentration_M, { ...CONCENTRATION_RULE, min: 1e-9 }),
    ],
    () => ({
      value: 1e4 / (Math.LN10 * absorption_L_mol_cm * concentration_M),
      unit: '\u00b5m',
      model: 'Beer and Lambert, decadic coefficient',
      valid: 'the coefficient at the pump\u2019s wavelength, not at its maximum; no bleaching',
      relative: 0.1,
    }),
  );
}

/** Share of light absorbed on a way through a solution: 1 - 10^(-eps c l). */
export function absorbedFraction(cell: {
  readonly absorption_L_mol_cm: number;
  readonly concentration_M: number;
  readonly length_cm: number;
}): Result<Answer> {
  return computed(
    [
      checkNumber(cell.absorption_L_mol_cm, ABSORPTION_RULE),
      checkNumber(cell.concentration_M, CONCENTRATION_RULE),
      checkNumber(cell.length_cm, { field: 'length_cm', name: 'Length', unit: 'cm', min: 0, max: 1000 }),
    ],
    () => {
      const value = -Math.expm1(
        -Math.LN10 * cell.absorption_L_mol_cm * cell.concentration_M * cell.length_cm,
      );
      return {
        value,
        unit: '1',
        model: 'Beer and Lambert, decadic coefficient',
        valid: 'no bleaching, no scattering',
        relative: { below: 0.1, above: value === 0 ? 0 : Math.min(0.1, 1 / value - 1) },
      };
    },
  );
}
