import { purgeVolumes } from '../../../src/domain/gas/purge';
import { mapResult } from '../../../src/domain/units/result';
import { CLOSED_FORM, type Source, type Table } from './table';

const COOLPROP: Source = {
  kind: 'independent program',
  name: 'CoolProp 8.0.0: R. Span and others, J. Phys. Chem. Ref. Data 29 (2000) 1361',
  seen: 'worked out',
};
const BALANCE: Source = { ...CLOSED_FORM, name: 'mass balance, worked out in another language' };
const KINNEY: Source = {
  kind: 'handbook',
  name: 'G. F. Kinney and K. J. Graham, Explosive Shocks in Air (1985), overpressure of a chemical explosion',
  seen: 'from memory',
};
const CDC: Source = {
  kind: 'handbook',
  name: 'CDC, Guidelines for Environmental Infection Control (2003), table B.1: minutes to be rid of 99 and 99.9 %',
  seen: 'read',
};
const removalMinutes = (i: { number: (name: string) => number }) =>
  mapResult(purgeVolumes(1 - i.number('percent') / 100), ({ value }) => (60 * value) / i.number('ACH'));

export const GAS_AND_ROOM: readonly Table[] = [
  {
    family: 'gas.nitrogenCompressibility',
    source: COOLPROP,
    columns: ['p_bar', 'T_C'],
    rows: [
      [20, 15, 0.9952],
      [200, 0, 1.033838],
      [300, 15, 1.137742],
      [350, 60, 1.198567],
    ],
    within: 2e-4,
  },
  {
    family: 'gas.nitrogenCompressibility',
    source: {
      kind: 'handbook',
      name: 'Perry\u2019s Chemical Engineers\u2019 Handbook, compressibility factors of nitrogen, 300 K',
      seen: 'from memory',
    },
    columns: ['p_bar'],
    given: { T_C: 26.85 },
    rows: [
      [1, 0.9998],
      [5, 0.999],
      [10, 0.9983],
      [20, 0.9971],
      [40, 0.9964],
      [60, 0.9973],
      [80, 1],
      [100, 1.0052],
      [200, 1.0559],
      [300, 1.1422],
    ],
    within: 1e-3,
    own: true,
  },
  {
    family: 'gas.cylinderFreeVolumeIdeal',
    source: CLOSED_FORM,
    columns: ['V_L', 'p_bar_abs', 'T_C'],
    rows: [[10, 150, 20, 1455.14]],
    within: 1e-5,
  },
  {
    family: 'gas.cylinderFreeVolumeReal',
    source: COOLPROP,
    columns: ['V_L', 'p_bar_abs', 'T_C'],
    rows: [
      [50, 230, 15, 10_588.7],
      [20, 60, 30, 1126.87],
    ],
    within: 5e-4,
  },
  {
    family: 'gas.purgeResidual',
    source: CLOSED_FORM,
    columns: ['n_volumes'],
    rows: [
      [3, 0.0497871],
      [5, 0.00673795],
    ],
    within: 1e-5,
  },
  {
    family: 'gas.purgeResidual',
    source: CDC,
    columns: ['ACH', 'percent'],
    rows: [
      [2, 99, 138],
      [4, 99, 69],
      [6, 99, 46],
      [8, 99, 35],
      [10, 99, 28],
      [12, 99, 23],
      [15, 99, 18],
      [20, 99, 14],
      [50, 99, 6],
      [2, 99.9, 207],
      [4, 99.9, 104],
      [6, 99.9, 69],
      [8, 99.9, 52],
      [10, 99.9, 41],
      [12, 99.9, 35],
      [15, 99.9, 28],
      [20, 99.9, 21],
      [50, 99.9, 8],
    ],
    within: 0,
    rounded: 0.5,
    own: true,
    note: 'A room that is aired is a vessel that is purged.',
    ask: removalMinutes,
  },
  {
    family: 'gas.roomOxygenSealed',
    source: BALANCE,
    columns: ['Q_L_min', 'V_m3', 't_min'],
    rows: [[10, 30, 60, 20.5352]],
    within: 1e-5,
  },
  {
    family: 'gas.roomOxygenVentilated',
    source: BALANCE,
    columns: ['Q_L_min', 'V_m3', 'ACH'],
    rows: [[10, 20, 1, 20.3398]],
    within: 1e-5,
  },
  {
    family: 'gas.roomOxygenTransient',
    source: BALANCE,
    columns: ['Q_L_min', 'V_m3', 'ACH', 't_min'],
    rows: [[20, 30, 1, 30, 20.6233]],
    within: 1e-5,
  },
  {
    family: 'gas.timeToOxygenLimit',
    source: { kind: 'standard', name: '29 CFR 1910.146: oxygen-deficient below 19.5 %', seen: 'read' },
    columns: ['Q_L_min', 'V_m3'],
    rows: [[5, 30, 430.345]],
    within: 1e-5,
  },
  {
    family: 'gas.roomOxygenDumpMixed',
    source: BALANCE,
    columns: ['Vgas_m3', 'V_m3'],
    rows: [[5, 30, 17.7338]],
    within: 1e-5,
  },
  {
    family: 'gas.roomOxygenDumpDisplaced',
    source: BALANCE,
    columns: ['Vgas_m3', 'V_m3'],
    rows: [[5, 30, 17.4583]],
    within: 1e-5,
    note: 'Against EIGA Doc 44: see the test of gas, room and bars.',
  },
  {
    family: 'vessel.hoopStressThick',
    source: {
      kind: 'handbook',
      name: 'Roark\u2019s Formulas for Stress and Strain, thick cylinders: (k2 + 1)/(k2 - 1) times the pressure, k the ratio of radii',
      seen: 'from memory',
    },
    columns: ['r_o_mm'],
    given: { p_gauge_bar: 10, r_i_mm: 10 },
    rows: [
      [12, 5.5455],
      [15, 2.6],
      [20, 1.6667],
      [30, 1.25],
    ],
    within: 2e-5,
    own: true,
  },
  {
    family: 'vessel.storedEnergyBrode',
    source: {
      kind: 'paper',
      name: 'H. L. Brode, Physics of Fluids 2 (1959) 217: (p - p0) V/(gamma - 1)',
      seen: 'from memory',
    },
    columns: ['p_bar_abs', 'p0_bar', 'V_L'],
    rows: [[4, 1.01325, 0.1, 74.6687]],
    within: 1e-5,
  },
  {
    family: 'room.ozone',
    source: {
      kind: 'standard',
      name: 'mass balance at 1 ppm = 1.96 mg/m3 at 25 C (NIOSH Pocket Guide), taken to 20 C',
      seen: 'from memory',
    },
    columns: ['P_W', 'yield_g_kWh', 'V_m3', 'ACH', 'decay_per_h'],
    rows: [
      [1, 50, 30, 1, 2, 0.27868],
      [2, 20, 60, 3, 1, 0.083605],
    ],
    within: 2e-3,
  },
  {
    family: 'room.nox',
    source: {
      kind: 'paper',
      name: 'transient spark in air, 7e16 molecules a joule; authors from memory: M. Janda and others',
      seen: 'abstract read',
    },
    columns: ['P_W', 'molecules_per_J', 'V_m3', 'ACH'],
    rows: [[2, 7e16, 30, 1, 0.67107]],
    within: 1e-4,
  },
  {
    family: 'room.nox',
    source: {
      kind: 'paper',
      name: 'D. R. Cook and others, J. Geophys. Res. (2000), large spark generator: 1.1e16 molecules a joule, 22.5 mg of N a spark of 9.8e4 J',
      seen: 'abstract read',
    },
    columns: ['P_W', 'molecules_per_J', 'V_m3', 'ACH'],
    // 22.5 mg of N each hour into 1,000 m3 at one air change: 9.8e4 J an hour is 27.22 W.
    rows: [[27.222, 1.1e16, 1000, 1, 0.03864]],
    within: 0.12,
    own: true,
    note: 'Their mass of nitrogen against their molecules a joule; sparks of a metre give a sixth of short ones.',
  },
  {
    family: 'sound.peakUpper',
    source: KINNEY,
    columns: ['E_J', 'r_m'],
    rows: [
      [4.184e5, 46.416, 152.465],
      [4.184e5, 464.16, 132.448],
      [0.25, 2, 138.265],
    ],
    within: 5e-4,
    own: true,
    note: 'A hundred grams of TNT far off by their formula, and its limit for small energies.',
  },
  {
    family: 'sound.peakUpper',
    source: {
      kind: 'standard',
      name: 'Directive 2003/10/EC: a peak of 200 Pa is 140 dB; IEC 60942: 1 Pa is 94 dB, 10 Pa are 114 dB',
      seen: 'read in quotation',
    },
    columns: ['E_J', 'r_m'],
    rows: [
      [0.0568958, 1, 140],
      [7.11197e-9, 1, 94],
      [7.11197e-6, 1, 114],
    ],
    within: 3e-4,
    own: true,
    note: 'Energies whose bound is that pressure at a metre.',
  },
  {
    family: 'emi.inducedVoltage',
    source: CLOSED_FORM,
    columns: ['A_cm2', 'r_m', 'dIdt_A_s'],
    rows: [[10, 0.3, 1e12, 666.667]],
    within: 1e-5,
  },
  {
    family: 'emi.loopField',
    source: CLOSED_FORM,
    columns: ['A_cm2', 'r_m', 'I_A', 't_quarter_s'],
    rows: [[5, 3, 5000, 5e-9, 27.4345]],
    within: 1e-5,
  },
];
