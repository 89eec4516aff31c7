import { visibleSumLimit } from '../../../src/domain/beam/visible-sum';
import { CLOSED_FORM, PRACTICE, type Source, type Table } from './table';

const IEC: Source = { kind: 'standard', name: 'IEC 60825-14 (2004), table of exposure limits', seen: 'read' };
const ANSI: Source = { kind: 'standard', name: 'ANSI Z136.1 (2014), 0.56 t^0.25 J/cm2', seen: 'from memory' };
const DIRECTIVE: Source = {
  kind: 'standard',
  name: 'Directive 2006/25/EC, annex II, table 2.6',
  seen: 'read',
};
const VISIBLE: Source = {
  kind: 'standard',
  name: 'Directive 2006/25/EC, annex II, tables 2.2 and 2.3, with C_B of table 2.5 as the Norwegian regulation prints it',
  seen: 'read in quotation',
};
const CODATA: Source = {
  kind: 'standard',
  name: 'CODATA 2018: h c is 1239.841984 eV nm',
  seen: 'from memory',
};
const CRC: Source = {
  kind: 'handbook',
  name: 'CRC Handbook of Chemistry and Physics, molar masses',
  seen: 'from memory',
};

export const BEAM_AND_DYE: readonly Table[] = [
  {
    family: 'beam.photonEnergy',
    source: CODATA,
    columns: ['lambda_nm'],
    rows: [
      [337.1, 3.67796],
      [460, 2.69531],
    ],
    within: 1e-5,
  },
  {
    family: 'beam.photonCount',
    source: CODATA,
    columns: ['lambda_nm', 'E_J'],
    rows: [[337.1, 1e-4, 1.697e14]],
    within: 1e-4,
  },
  {
    family: 'beam.exposureLimit.singlePulse',
    source: IEC,
    columns: ['lambda_nm', 't_s'],
    rows: [
      [337.1, 3e-9, 41.4446],
      [337.1, 0.5e-9, 15],
      [337.1, 10, 9958.36],
    ],
    within: 1e-5,
  },
  {
    family: 'beam.exposureLimit.singlePulse',
    source: ANSI,
    columns: ['lambda_nm', 't_s'],
    rows: [
      [355, 1e-8, 56],
      [351, 2e-8, 66.6],
      [325, 0.25, 3960],
    ],
    within: 1e-3,
    own: true,
  },
  {
    family: 'beam.exposureLimit.visibleOldTable',
    source: IEC,
    columns: ['lambda_nm', 't_s'],
    rows: [
      [532, 3e-9, 5e-3],
      [532, 0.25, 6.364],
    ],
    within: 1e-4,
  },
  {
    family: 'beam.exposureLimit.cumulative',
    source: VISIBLE,
    columns: ['lambda_nm', 'T_s'],
    rows: [
      [532, 0.25, 6.364],
      [632.8, 100, 1000],
      [440, 30, 100],
      [440, 1000, 1000],
      [480, 100, 398.1],
      [500, 10, 101.22],
      [460, 100, 158.49],
      [590, 100, 1000],
    ],
    within: 2e-4,
    own: true,
    note: 'Sums of visible light, which the family itself keeps for UV-A only.',
    ask: (i) => visibleSumLimit(i.number('lambda_nm'), i.number('T_s')),
  },
  {
    family: 'beam.exposureLimit.cumulative',
    source: IEC,
    columns: ['lambda_nm', 'T_s'],
    rows: [
      [337.1, 1, 5600],
      [337.1, 100, 10_000],
      [355, 1000, 10_000],
    ],
    within: 1e-5,
    own: true,
  },
  {
    family: 'beam.exposureLimit.dailyUVA',
    source: {
      kind: 'standard',
      name: 'ICNIRP, Guidelines on UV radiation (2004): 1e4 J/m2 in 8 h, 315 to 400 nm',
      seen: 'read in quotation',
    },
    columns: ['lambda_nm', 'T_s'],
    rows: [[337.1, 28_800, 10_000]],
    within: 1e-9,
  },
  {
    family: 'beam.exposureLimit.trainFactor',
    source: DIRECTIVE,
    columns: ['N', 't_s'],
    rows: [[100, 1e-8, 17.7088]],
    within: 1e-4,
  },
  {
    family: 'beam.exposureLimit.perPulse',
    source: DIRECTIVE,
    columns: ['f_Hz', 't_s', 'T_s'],
    rows: [
      [20, 5e-9, 100, 5],
      [10, 5e-9, 200, 5],
    ],
    within: 1e-5,
  },
  {
    family: 'beam.energyThroughAperture',
    source: CLOSED_FORM,
    columns: ['MPE_J_m2', 'aperture_mm'],
    rows: [[2e-3, 7, 76.969]],
    within: 1e-5,
  },
  {
    family: 'beam.hazardDistanceCircular',
    source: {
      kind: 'standard',
      name: 'form of ANSI Z136.1 and IEC 60825-14; figure worked out',
      seen: 'from memory',
    },
    columns: ['Q_J', 'a_mm', 'phi_mrad', 'MPE_J_m2'],
    rows: [[50e-6, 3, 5, 2e-3, 35.0825]],
    within: 1e-5,
  },
  {
    family: 'beam.hazardDistanceRectangular',
    source: CLOSED_FORM,
    columns: ['Q_J', 'a_mm', 'b_mm', 'div_a_mrad', 'div_b_mrad', 't_s'],
    rows: [[5e-4, 1, 4, 2, 8, 3e-9, 0.368342]],
    within: 1e-5,
  },
  {
    family: 'beam.diffuseViewingDistance',
    source: CLOSED_FORM,
    columns: ['Q_J', 'MPE_J_m2', 'reflectance'],
    rows: [
      [20e-6, 2e-3, 1, 5.6419],
      [1e-4, 18, 0.5, 0.0940316],
    ],
    within: 1e-5,
    note: 'Lambert\u2019s cosine.',
  },
  {
    family: 'beam.opticalDensity',
    source: CLOSED_FORM,
    columns: ['Q_J', 'A_m2', 'MPE_J_m2'],
    rows: [[20e-6, 3.848451e-5, 2e-3, 2.41471]],
    within: 1e-5,
  },
  {
    family: 'laser.outputRange.hazard',
    source: {
      kind: 'public note',
      name: 'one rig: 0.1 J stored gave 11 uJ in air and 23 uJ in nitrogen; no paper found',
      seen: 'read',
    },
    columns: ['E0_J'],
    rows: [
      [0.1, 11],
      [0.1, 23],
    ],
    within: 0,
    holds: 'in band',
    note: 'A thousandth of the stored energy is planned with; both measured points lie under it and within its band.',
  },
  {
    family: 'laser.divergenceAperture',
    source: PRACTICE,
    columns: ['w_mm', 'L_mm'],
    rows: [[3, 300, 10]],
    within: 1e-9,
  },
  {
    family: 'dye.molarMass',
    source: CRC,
    columns: ['formula'],
    rows: [
      ['C14H10', 178.23],
      ['C18H14', 230.3],
      ['C20H18N2O2', 318.37],
      ['C20H18N2O2S', 350.43],
      ['C32H30N2O3', 490.59],
      ['C8H10N4O2.H2O', 212.21],
      ['C2H6O2', 62.07],
    ],
    within: 1e-4,
    own: true,
    note: 'Anthracene, terphenyl, Nile red, coumarin 6, rhodamine 101, caffeine hydrate, glycol.',
  },
  {
    family: 'dye.mass',
    source: CLOSED_FORM,
    columns: ['c_mol_L', 'V_L', 'M_g_mol'],
    rows: [[0.002, 0.05, 231.29, 0.023129]],
    within: 1e-9,
  },
  {
    family: 'dye.penetrationDepth',
    source: CLOSED_FORM,
    columns: ['eps_L_mol_cm', 'c_mol_L'],
    rows: [[1.1e4, 5e-3, 78.9626]],
    within: 1e-5,
  },
  {
    family: 'dye.absorbedFraction',
    source: CLOSED_FORM,
    columns: ['eps_L_mol_cm', 'c_mol_L', 'l_cm'],
    rows: [[7000, 1e-4, 1, 0.800474]],
    within: 1e-5,
  },
];
