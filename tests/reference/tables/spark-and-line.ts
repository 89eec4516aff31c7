import { distributedHalfPeriod } from '../../../src/domain/line/distributed';
import { mapResult } from '../../../src/domain/units/result';
import { CLOSED_FORM, PRACTICE, type Source, type Table } from './table';

const MARTIN: Source = {
  kind: 'paper',
  name: 'J. C. Martin, AWRE notes, in J. C. Martin on Pulsed Power (Plenum, 1996)',
  seen: 'from memory',
};

export const SPARK_AND_LINE: readonly Table[] = [
  {
    family: 'spark.resistivePhase',
    source: MARTIN,
    columns: ['Z_ohm', 'E_MV_per_m', 'rho_ratio'],
    rows: [
      [1, 3.7, 1, 15.377],
      [2, 3.49, 1, 13.194],
      [2, 13.8, 3.95, 4.194],
      [8, 5, 2, 7.278],
    ],
    within: 5e-4,
    note: 'The formula is Martin\u2019s; the figures are worked out from it. No readable copy of the note was found.',
  },
  {
    family: 'spark.riseTime',
    source: PRACTICE,
    columns: ['Z_ohm', 'E_MV_per_m', 'rho_ratio', 'L_nH'],
    rows: [
      [1, 3.7, 1, 10, 55.83],
      [2, 6, 2, 5, 25.432],
    ],
    within: 1e-4,
    note: '2.2 times both e-folding times together.',
  },
  {
    family: 'spark.inductance',
    source: CLOSED_FORM,
    columns: ['l_cm', 'a_cm', 'b_cm'],
    rows: [
      [0.4, 0.02, 1, 3.1296],
      [1, 0.03, 2, 8.3994],
    ],
    within: 1e-4,
  },
  {
    family: 'spark.rompeWeizel',
    source: {
      kind: 'paper',
      name: 'R. Rompe and W. Weizel, Zeitschrift f\u00fcr Physik 122 (1944) 636; constant 0.8 to 1.2: G. A. Mesyats',
      seen: 'from memory',
    },
    columns: ['d_cm', 'p_atm', 'a_cm2_atm_per_V2s', 'S_A2s'],
    rows: [
      [0.4, 1, 0.8, 2e-4, 22.361],
      [0.25, 3, 1, 1e-3, 9.6825],
    ],
    within: 1e-4,
    note: 'The law is theirs; the figures are worked out from it. That it orders energies in air was read: arXiv 2509.05791.',
  },
  {
    family: 'spark.toepler',
    source: {
      kind: 'public note',
      name: 'Toepler\u2019s law with 0.4e-4 V s/cm, encyclopedia; no paper found',
      seen: 'read',
    },
    columns: ['d_cm', 'kT_Vs_per_cm', 'Q_C'],
    rows: [[0.4, 0.8e-4, 1e-5, 3.2]],
    within: 1e-9,
  },
  {
    family: 'line.stripImpedance',
    source: CLOSED_FORM,
    columns: ['h_m', 'w_m', 'eps_r'],
    rows: [
      [0.00025, 0.3, 3.2, 0.1755],
      [0.0005, 0.1, 2.25, 1.2558],
    ],
    within: 1e-4,
  },
  {
    family: 'line.sheetInductance',
    source: CLOSED_FORM,
    columns: ['h_m', 'l_m', 'w_m'],
    rows: [
      [0.00025, 0.3, 0.3, 0.31416],
      [0.0005, 0.4, 0.1, 2.5133],
    ],
    within: 1e-4,
  },
  {
    family: 'line.transitTime',
    source: CLOSED_FORM,
    columns: ['L_m', 'eps_r'],
    rows: [
      [0.3, 3.2, 1.7901],
      [0.5, 2.25, 2.5017],
    ],
    within: 1e-4,
  },
  {
    family: 'line.pairAirImpedance',
    source: {
      kind: 'paper',
      name: 'E. Hammerstad and O. Jensen, IEEE MTT-S Digest (1980) 407, on two equal strips',
      seen: 'from memory',
    },
    columns: ['w_m', 's_m'],
    rows: [
      [0.02, 0.01, 115.44],
      [0.05, 0.01, 58.042],
      [0.01, 0.02, 252.85],
    ],
    within: 1e-4,
    note: 'Own boundary elements agree to 1e-4.',
  },
  {
    family: 'line.rectLoopInductance',
    source: {
      kind: 'handbook',
      name: 'F. W. Grover, Inductance Calculations (1946), rectangle of round wire',
      seen: 'from memory',
    },
    columns: ['W_m', 'H_m', 'a_m'],
    rows: [
      [0.06, 0.04, 0.001, 124.02],
      [0.2, 0.1, 0.002, 412.22],
    ],
    within: 1e-4,
    note: 'The formula is Grover\u2019s; the figures are worked out from it.',
  },
  {
    family: 'line.spreadInductance',
    source: CLOSED_FORM,
    columns: ['h_m', 'r1_m', 'r2_m'],
    rows: [[0.0005, 0.01, 0.2, 0.29957]],
    within: 1e-4,
  },
  {
    family: 'line.channelLoopInductance',
    source: CLOSED_FORM,
    columns: ['S_m2', 'l_m'],
    rows: [[3e-4, 0.4, 0.94248]],
    within: 1e-4,
  },
  {
    family: 'line.blumleinLoadVoltage',
    source: CLOSED_FORM,
    columns: ['V0_V', 'R_ohm', 'Z0_ohm'],
    rows: [
      [15_000, 0.4, 0.15, 17_142.9],
      [15_000, 0.3, 0.15, 15_000],
    ],
    within: 1e-5,
  },
  {
    family: 'line.distributedHalfPeriod',
    source: {
      kind: 'handbook',
      name: 'F. P. Incropera and D. P. DeWitt, Fundamentals of Heat and Mass Transfer, table 5.1, plane wall: x tan x = Bi',
      seen: 'from memory',
    },
    columns: ['Bi'],
    rows: [
      [0.02, 0.141],
      [0.04, 0.1987],
      [0.06, 0.2425],
      [0.08, 0.2791],
      [0.3, 0.5218],
      [0.4, 0.5932],
      [0.6, 0.7051],
      [0.7, 0.7506],
      [0.8, 0.791],
      [0.9, 0.8274],
      [3, 1.1925],
      [4, 1.2646],
      [6, 1.3496],
      [7, 1.3766],
      [8, 1.3978],
      [9, 1.4149],
      [20, 1.4961],
      [30, 1.5202],
      [40, 1.5325],
      [50, 1.54],
    ],
    within: 0,
    rounded: 6e-5,
    own: true,
    note: 'The same equation as a sheet on its gap: Bi is the ratio of the inductances, x the printed root.',
    ask: (i) => {
      const ratio = i.number('Bi');
      const half = distributedHalfPeriod({ gap_H: 1e-8, sheet_H: ratio * 1e-8, capacitance_F: 1e-9 });
      return mapResult(half, ({ value }) => (Math.PI * Math.sqrt(ratio * 1e-17)) / value);
    },
  },
];
