import { CLOSED_FORM, PRACTICE, type Source, type Table } from './table';

const COBINE: Source = {
  kind: 'handbook',
  name: 'least sparking potentials: J. D. Cobine, Gaseous Conductors; J. M. Meek and J. D. Craggs; M. S. Naidu and V. Kamaraju',
  seen: 'from memory',
};
const LIEBERMAN: Source = {
  kind: 'handbook',
  name: 'M. A. Lieberman and A. J. Lichtenberg, Principles of Plasma Discharges, 2nd ed. (2005), table 14.1: constants A and B',
  seen: 'read in quotation',
};
const KUFFEL: Source = {
  kind: 'handbook',
  name: 'E. Kuffel, W. S. Zaengl and J. Kuffel, High Voltage Engineering Fundamentals, uniform field',
  seen: 'from memory',
};

export const UNIFORM_GAP: readonly Table[] = [
  {
    family: 'gap.paschenMinimum.voltage',
    source: COBINE,
    columns: ['gas'],
    rows: [
      ['air', 327],
      ['N2', 251],
      ['O2', 450],
      ['H2', 273],
      ['He', 156],
      ['Ar', 137],
      ['CO2', 420],
      ['N2O', 418],
      ['SO2', 457],
      ['H2S', 414],
    ],
    within: 0.005,
    note: '327 V for air was read in two public notes. Another table has 352, 240 and 230 for air, nitrogen and hydrogen.',
  },
  {
    family: 'gap.paschenMinimum.pd',
    source: COBINE,
    columns: ['gas'],
    rows: [
      ['air', 0.567],
      ['N2', 0.67],
      ['O2', 0.7],
      ['H2', 1.15],
      ['He', 4],
      ['Ar', 0.9],
      ['CO2', 0.51],
    ],
    within: 0.01,
  },
  {
    family: 'gap.townsend.voltage',
    source: LIEBERMAN,
    columns: ['gas', 'A', 'B', 'gamma', 'pd_Torrcm'],
    rows: [
      ['N2', 11.8, 325, 0.01, 5, 637.7],
      ['Ar', 11.5, 176, 0.01, 10, 547.33],
    ],
    within: 1e-4,
    note: 'The constants are theirs; the figures are worked out from them.',
  },
  {
    family: 'gap.townsend.voltage',
    source: {
      kind: 'public note',
      name: 'A 15, B 365 and gamma 0.01 for air, after Bazelyan and Raizer; the book was not seen',
      seen: 'read',
    },
    columns: ['gas', 'A', 'B', 'gamma', 'pd_Torrcm'],
    rows: [['air', 15, 365, 0.01, 10, 1048.46]],
    within: 1e-4,
  },
  {
    family: 'gap.townsend.gammaFromMinimum',
    source: CLOSED_FORM,
    columns: ['gas', 'A', 'B', 'V_min_V'],
    rows: [
      ['air', 15, 365, 327, 0.00717939],
      ['H2', 5, 130, 273, 0.0214614],
    ],
    within: 1e-4,
  },
  {
    family: 'gap.townsend.pdMinFromGamma',
    source: CLOSED_FORM,
    columns: ['gas', 'A', 'B', 'V_min_V'],
    rows: [
      ['air', 15, 365, 327, 0.89589],
      ['He', 3, 34, 156, 4.58824],
    ],
    within: 1e-4,
  },
  {
    family: 'gap.townsend.forcedB',
    source: CLOSED_FORM,
    columns: ['gas', 'V_min_V', 'pd_min_Torrcm'],
    rows: [['N2', 251, 0.67, 374.627]],
    within: 1e-5,
  },
  {
    family: 'gap.townsend.overshoot',
    source: CLOSED_FORM,
    columns: ['p_bar_abs', 'd_cm'],
    rows: [[3, 0.5, 0.11802]],
    within: 2e-3,
  },
  {
    family: 'gap.uniform.air',
    source: KUFFEL,
    columns: ['p_bar_abs', 'd_cm', 'T_C'],
    rows: [
      [1.01325, 0.5, 20, 17.1245],
      [2, 0.3, 20, 19.8213],
      [3, 0.5, 30, 43.4281],
    ],
    within: 1e-4,
    note: 'The constants 24.36 and 6.72 are theirs; the figures are worked out from them.',
  },
  {
    family: 'gap.uniform.airSibling',
    source: {
      kind: 'public note',
      name: '24.22 x + 6.08 sqrt(x), after Naidu and Kamaraju and F. M. Bruce (1947); neither was seen',
      seen: 'read',
    },
    columns: ['x_atm_cm_at_293K'],
    rows: [
      [1, 30.3],
      [0.5, 16.4092],
    ],
    within: 1e-4,
  },
  {
    family: 'gap.uniform.airFromGauge',
    source: CLOSED_FORM,
    columns: ['p_bar_gauge', 'ambient_bar', 'd_cm'],
    rows: [[1.2, 1, 0.3, 21.537]],
    within: 1e-4,
  },
  {
    family: 'gap.uniform.gaugeMistakeRatio',
    source: CLOSED_FORM,
    columns: ['p_bar_gauge', 'ambient_bar', 'd_cm'],
    rows: [[1.2, 1, 0.3, 0.594402]],
    within: 1e-5,
  },
  {
    family: 'gap.uniform.N2',
    source: {
      kind: 'handbook',
      name: 'G. G. Raju, Dielectrics in Electric Fields: about 30.4 kV for 1 cm at 101.3 kPa',
      seen: 'abstract read',
    },
    columns: ['p_bar_abs', 'd_cm', 'T_C'],
    rows: [[1.01325, 1, 20, 30.4]],
    within: 0.002,
  },
  {
    family: 'gap.uniform.SF6',
    source: {
      kind: 'paper',
      name: 'N. H. Malik and A. H. Qureshi, IEEE Trans. Electr. Insul. 13 (1978) 135: 88.5 kV/(cm bar)',
      seen: 'from memory',
    },
    columns: ['p_bar_abs', 'd_cm', 'T_C'],
    rows: [[2, 0.2, 20, 35.78]],
    within: 1e-4,
  },
  {
    family: 'gap.nitrogenToAirRatio',
    source: PRACTICE,
    columns: ['x_bar_cm'],
    rows: [
      [0.5, 0.967],
      [2.5, 0.94195],
    ],
    within: 1e-5,
    note: 'Own integral over recalled ionisation data, anchored at 30.4 kV.',
  },
  {
    family: 'gap.uniform.lowPd',
    source: PRACTICE,
    columns: ['pd_Torrcm'],
    rows: [
      [1, 349],
      [2, 440],
      [3, 533],
      [5, 711],
      [7.5, 915],
    ],
    within: 0.002,
    note: 'Own interpolation; another published pair of constants gives 3 to 9 % less.',
  },
  {
    family: 'gap.uniform.isMonotone',
    source: PRACTICE,
    columns: ['gas'],
    rows: [
      ['air', true],
      ['N2', true],
      ['SF6', true],
    ],
    within: 0,
  },
  {
    family: 'gap.uniform.pressureForVoltage',
    source: CLOSED_FORM,
    columns: ['V_kV', 'd_cm'],
    rows: [
      [15, 0.3, 1.44675],
      [25, 0.5, 1.56456],
    ],
    within: 1e-5,
  },
  {
    family: 'gap.uniform.sensitivity',
    source: CLOSED_FORM,
    columns: ['p_bar_abs', 'd_cm'],
    rows: [
      [1.01325, 0.1, 0.767862],
      [1.5, 0.4, 0.868694],
    ],
    within: 1e-5,
  },
];
