import { CLOSED_FORM, type Source, type Table } from './table';

const CLASSIC: Source = {
  kind: 'public note',
  name: '36/(1 + 12.8 p) ns, mirror of an encyclopedia; from the nitrogen laser literature (Godard 1974), not seen',
  seen: 'read',
};
const FLUORESCENCE: Source = {
  kind: 'paper',
  name: 'air fluorescence: S. Pancheshnyi and others (2000), F. Valk and others, J. Phys. D 43 (2010) 385202',
  seen: 'from memory',
};
const AIRFLY: Source = {
  kind: 'paper',
  name: 'M. Ave and others (AIRFLY), Astroparticle Physics 28 (2007) 41: 337 nm band in dry air quenched by half at 15.89 hPa',
  seen: 'from memory',
};

export const CHANNEL: readonly Table[] = [
  {
    family: 'channel.townsendUnit',
    source: CLOSED_FORM,
    columns: ['T_K'],
    rows: [[293.15, 0.247074]],
    within: 1e-5,
  },
  {
    family: 'channel.townsendUnit',
    source: {
      kind: 'standard',
      name: 'CODATA 2018, Loschmidt constant at 100 kPa: 2.651645804e25 1/m3',
      seen: 'from memory',
    },
    columns: ['T_K'],
    rows: [[273.15, 0.2651645804]],
    within: 1e-8,
    own: true,
  },
  {
    family: 'channel.reducedField',
    source: CLOSED_FORM,
    columns: ['V_V', 'd_cm', 'p_bar', 'T_K'],
    rows: [[18_000, 0.4, 1.01325, 293.15, 179.75]],
    within: 1e-5,
  },
  {
    family: 'channel.reducedFieldFromTorr',
    source: {
      kind: 'handbook',
      name: 'Y. P. Raizer, Gas Discharge Physics (1991): 2.83 Td at 0 C, 3.03 at 20 C',
      seen: 'from memory',
    },
    columns: ['E_over_p_V_cm_Torr', 'T_C'],
    rows: [
      [1, 0, 2.83],
      [1, 20, 3.03],
    ],
    within: 0.003,
  },
  {
    family: 'channel.upperStateLifetime',
    source: CLASSIC,
    columns: ['p_bar_N2'],
    rows: [
      [1, 2.6087],
      [0.2, 10.112],
      [0.0773, 18.1],
    ],
    within: 1e-3,
    note: '58 Torr halve it.',
  },
  {
    family: 'channel.upperStateLifetimeKinetic',
    source: FLUORESCENCE,
    columns: ['p_bar'],
    rows: [[1, 3.21376]],
    within: 1e-4,
    note: 'Radiative life 37 ns and quenching 1.15e-11 cm3/s. Valk\u2019s paper was found; its abstract names no figures.',
  },
  {
    family: 'channel.upperStateLifetimeAir',
    source: FLUORESCENCE,
    columns: ['p_bar'],
    rows: [[1, 0.553079]],
    within: 1e-4,
  },
  {
    family: 'channel.upperStateLifetimeAir',
    source: AIRFLY,
    columns: ['p_bar'],
    rows: [
      [0.1, 5.0783],
      [0.5, 1.1396],
      [1.01325, 0.57127],
    ],
    within: 0.06,
    own: true,
    note: 'A life of 37 ns over 1 + p/15.89 hPa. The paper was found, its abstract without the figure.',
  },
  {
    family: 'channel.upperStateLifetimeO2',
    source: FLUORESCENCE,
    columns: ['p_bar', 'x_O2'],
    rows: [
      [1, 0.001, 2.55921],
      [1, 0.01, 2.18601],
      [1, 0.21, 0.515491],
    ],
    within: 1e-4,
  },
  {
    family: 'channel.transitTime',
    source: {
      kind: 'standard',
      name: 'speed of light, SI brochure, 9th edition (2019)',
      seen: 'from memory',
    },
    columns: ['L_m', 'n'],
    rows: [
      [0.3, 1, 1.0006923],
      [0.299792458, 1.5, 1.5],
    ],
    within: 1e-7,
  },
  {
    family: 'channel.gasHeating',
    source: CLOSED_FORM,
    columns: ['E_J', 'V_cm3', 'p_bar', 'T_C'],
    rows: [[0.1, 2.7, 1.01325, 20, 30.58]],
    within: 1e-3,
  },
  {
    family: 'channel.preionisationMin',
    source: {
      kind: 'paper',
      name: 'A. J. Palmer, Appl. Phys. Lett. 25 (1974) 138: avalanche heads must overlap',
      seen: 'abstract read',
    },
    columns: ['D_cm2_s', 't_s'],
    rows: [
      [1000, 5e-9, 2.66911e6],
      [2000, 2e-9, 3.73019e6],
    ],
    within: 1e-4,
    note: 'The condition is Palmer\u2019s; the figures are worked out from it.',
  },
];
