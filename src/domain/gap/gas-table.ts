/** Gases a gap may be filled with. Mixtures have no entry on purpose: no law here holds for them. */
export const GAS_NAMES = ['air', 'N2', 'SF6', 'CO2', 'H2', 'O2', 'Ar', 'Ne', 'He', 'H2O'] as const;
export type GasName = (typeof GAS_NAMES)[number];

export function isGasName(gas: unknown): gas is GasName {
  return GAS_NAMES.some((name) => name === gas);
}

/** Published minimum of the Paschen curve. All depend on the cathode: quote 10 %, hydrogen 20 %. */
export interface PaschenMinimum {
  readonly voltage_V: number;
  readonly pd_Torr_cm: number;
  readonly relative: number;
  readonly source: string;
}

const COBINE = 'classic handbook table (Cobine; Meek and Craggs; Naidu), from memory';

/** Gases with a published minimum, more than there are gap gases. */
export const PASCHEN_MINIMA = {
  air: {
    voltage_V: 327,
    pd_Torr_cm: 0.567,
    relative: 0.1,
    source: '327 V read in a public source; pd from memory',
  },
  N2: { voltage_V: 251, pd_Torr_cm: 0.67, relative: 0.1, source: COBINE },
  O2: { voltage_V: 450, pd_Torr_cm: 0.7, relative: 0.1, source: COBINE },
  H2: { voltage_V: 273, pd_Torr_cm: 1.15, relative: 0.2, source: COBINE },
  He: { voltage_V: 156, pd_Torr_cm: 4, relative: 0.1, source: COBINE },
  Ne: { voltage_V: 245, pd_Torr_cm: 4, relative: 0.3, source: COBINE },
  Ar: { voltage_V: 137, pd_Torr_cm: 0.9, relative: 0.3, source: COBINE },
  CO2: { voltage_V: 420, pd_Torr_cm: 0.51, relative: 0.1, source: COBINE },
  N2O: { voltage_V: 418, pd_Torr_cm: 0.5, relative: 0.1, source: COBINE },
  SO2: { voltage_V: 457, pd_Torr_cm: 0.33, relative: 0.1, source: COBINE },
  H2S: { voltage_V: 414, pd_Torr_cm: 0.6, relative: 0.1, source: COBINE },
  SF6: { voltage_V: 507, pd_Torr_cm: 0.26, relative: 0.15, source: 'Kuffel, from memory' },
} as const satisfies Record<string, PaschenMinimum>;

/** Constants of the Townsend form, each good only within its range of E/p. */
export interface TownsendConstants {
  readonly A_per_cm_Torr: number;
  readonly B_V_per_cm_Torr: number;
  readonly lowest_E_over_p: number;
  readonly highest_E_over_p: number;
  readonly source: string;
}

const NASSER = 'Nasser, as read in a public notebook; E/p range from memory (von Engel, Raizer)';
const VON_ENGEL = 'von Engel, from memory';

/** Oxygen and SF6 attach electrons, so they have no honest pair of constants and no row. */
export const TOWNSEND_CONSTANTS: Readonly<Record<string, TownsendConstants>> = {
  air: row(
    [15, 365],
    [100, 800],
    'Bazelyan, as read in a public note; E/p range from memory (von Engel, Raizer)',
  ),
  N2: row([12, 342], [100, 600], NASSER),
  H2: row([5, 130], [20, 600], NASSER),
  He: row([3, 34], [20, 150], `${NASSER}; another published pair differs by a factor of two`),
  Ne: row([4, 100], [100, 400], NASSER),
  Ar: row([12, 180], [100, 600], NASSER),
  CO2: row([20, 466], [500, 1000], VON_ENGEL),
  H2O: row([13, 290], [150, 1000], VON_ENGEL),
  Kr: row([17, 240], [100, 1000], NASSER),
  Xe: row([26, 350], [200, 800], NASSER),
};

type Pair = readonly [number, number];

function row(constants: Pair, range: Pair, source: string): TownsendConstants {
  return {
    A_per_cm_Torr: constants[0],
    B_V_per_cm_Torr: constants[1],
    lowest_E_over_p: range[0],
    highest_E_over_p: range[1],
    source,
  };
}
