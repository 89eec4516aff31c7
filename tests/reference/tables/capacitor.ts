import { bleedTime } from '../../../src/domain/capacitor/bleed';
import { heatThreshold } from '../../../src/domain/capacitor/hazard';
import { mapResult } from '../../../src/domain/units/result';
import { CLOSED_FORM, PRACTICE, type Source, type Table } from './table';

const PET: Source = {
  kind: 'data sheet',
  name: 'PET insulating film, 75 to 350 um, electrical strength by GB/T 1408.1-2006 (IEC 60243-1)',
  seen: 'read',
};
const POLYIMIDE: Source = {
  kind: 'data sheet',
  name: 'Polyimide film, general specifications GS-96-7: least strength by ASTM D149-94, highest permittivity by ASTM D150-94',
  seen: 'read',
};
const BERKELEY: Source = {
  kind: 'handbook',
  name: 'Berkeley Lab, Electrical Safety Manual, tables 2.2.13, 2.3.3 and 2.3.5: capacitors',
  seen: 'read',
};
const TOUCH: Source = { kind: 'standard', name: 'IEC 60335-1, 8.1.4', seen: 'read in quotation' };

export const CAPACITOR: readonly Table[] = [
  {
    family: 'capacitor.energy',
    source: CLOSED_FORM,
    columns: ['C_F', 'V_V'],
    rows: [[2e-9, 20_000, 0.4]],
    within: 1e-12,
  },
  {
    family: 'capacitor.sheet',
    source: CLOSED_FORM,
    columns: ['eps_r', 'area_m2', 't_m', 'n_parallel'],
    rows: [
      [3.2, 0.09, 125e-6, 1, 2.04e-8],
      [2.25, 0.04, 200e-6, 2, 7.9688e-9],
    ],
    within: 1e-4,
  },
  {
    family: 'capacitor.shotCharge',
    source: CLOSED_FORM,
    columns: ['C_F', 'V0_V', 'reversal'],
    rows: [[3e-9, 18_000, 0.5, 162]],
    within: 1e-9,
  },
  {
    family: 'capacitor.stress',
    source: CLOSED_FORM,
    columns: ['V_V', 't_m'],
    rows: [[15_000, 250e-6, 60]],
    within: 1e-9,
  },
  {
    family: 'capacitor.stressMargin',
    source: CLOSED_FORM,
    columns: ['V_V', 't_m', 'E_bd_kV_mm'],
    rows: [[15_000, 250e-6, 65, 1.08333]],
    within: 1e-5,
  },
  {
    family: 'capacitor.airFilmField',
    source: CLOSED_FORM,
    columns: ['V_V', 't_um', 'eps_r', 'g_um'],
    rows: [
      [15_000, 250, 3.2, 20, 152.87],
      [8000, 125, 3.2, 10, 163.06],
    ],
    within: 1e-4,
  },
  {
    family: 'capacitor.fringeExcess',
    source: {
      kind: 'handbook',
      name: 'Kirchhoff\u2019s and Palmer\u2019s edge of two thin strips',
      seen: 'from memory',
    },
    columns: ['w_m', 't_m'],
    rows: [
      [0.01, 0.001, 0.16363],
      [0.04, 0.001, 0.051938],
    ],
    within: 1e-4,
  },
  {
    family: 'capacitor.dielectric.petMinStrength',
    source: PET,
    columns: ['t_um'],
    rows: [
      [75, 115],
      [100, 100],
      [125, 90],
      [150, 85],
      [175, 80],
      [200, 70],
      [250, 65],
      [300, 60],
      [350, 55],
    ],
    within: 0.045,
    note: 'A power law through the sheet\u2019s least values.',
  },
  {
    family: 'capacitor.dielectric.petMinStrength',
    source: PET,
    columns: ['t_um'],
    rows: [[188, 76]],
    within: 0.02,
    own: true,
  },
  {
    family: 'capacitor.dielectric.strength',
    source: POLYIMIDE,
    columns: ['material', 'thickness_mm'],
    rows: [['polyimide', 0.127, 118]],
    within: 0.002,
  },
  {
    family: 'capacitor.dielectric.strength',
    source: POLYIMIDE,
    columns: ['material', 'thickness_mm'],
    rows: [
      ['polyimide', 0.0076, 118],
      ['polyimide', 0.0127, 118],
      ['polyimide', 0.0254, 236],
      ['polyimide', 0.0508, 197],
      ['polyimide', 0.0762, 177],
    ],
    within: 0.001,
    holds: 'at most',
    own: true,
    note: 'Thinner film is kept at the value of the thickest that was tested.',
  },
  {
    family: 'capacitor.dielectric.relativePermittivity',
    source: {
      kind: 'handbook',
      name: 'A. von Hippel, Dielectric Materials and Applications (1954), 1 MHz',
      seen: 'from memory',
    },
    columns: ['material'],
    rows: [
      ['LDPE', 2.26],
      ['PTFE', 2.1],
      ['polypropylene', 2.2],
      ['PMMA', 2.76],
      ['soda-lime glass', 6.9],
    ],
    within: 0,
    holds: 'in band',
    own: true,
  },
  {
    family: 'capacitor.dielectric.relativePermittivity',
    source: POLYIMIDE,
    columns: ['material'],
    rows: [['polyimide', 3.9]],
    within: 0,
    holds: 'at most',
    own: true,
  },
  {
    family: 'capacitor.dielectric.relativePermittivity',
    source: PET,
    columns: ['material'],
    rows: [
      ['PET', 2.9],
      ['PET', 3.4],
    ],
    within: 1e-9,
    holds: 'in band',
    own: true,
    note: 'Both ends of the range that the sheet gives at 50 Hz.',
  },
  {
    family: 'capacitor.pdInceptionMin',
    source: {
      kind: 'paper',
      name: '163 (t/eps_r)^0.46 V rms, t in um: inception law of dry insulation (T. W. Dakin)',
      seen: 'from memory',
    },
    columns: ['t_um', 'eps_r'],
    rows: [
      [50, 3.2, 820],
      [125, 3.2, 1240],
      [250, 3.2, 1710],
    ],
    within: 0.17,
    note: 'Peak. The model reads up to 15 % under it, which is the cautious side.',
  },
  {
    family: 'capacitor.areaStrengthRatio',
    source: CLOSED_FORM,
    columns: ['A_over_A0', 'beta'],
    rows: [
      [90, 10, 0.63764],
      [20, 12, 0.77908],
    ],
    within: 1e-4,
  },
  {
    family: 'capacitor.punctureProbability',
    source: {
      kind: 'standard',
      name: 'Weibull scale as IEC 62539 (2007) defines it: 63.2 % at E63',
      seen: 'from memory',
    },
    columns: ['E_over_E63', 'A_over_A0', 'beta'],
    rows: [
      [1, 1, 8, 0.632],
      [1, 1, 15, 0.632],
    ],
    within: 5e-4,
    own: true,
  },
  {
    family: 'capacitor.punctureProbability',
    source: CLOSED_FORM,
    columns: ['E_over_E63', 'A_over_A0', 'beta'],
    rows: [
      [0.25, 90, 10, 8.5827e-5],
      [0.6, 10, 10, 0.058674],
    ],
    within: 1e-4,
  },
  {
    family: 'capacitor.life',
    source: PRACTICE,
    columns: ['N0', 'E_over_E0', 'k'],
    rows: [
      [1e5, 0.7, 8, 1.73467e6],
      [1e6, 0.5, 7.5, 1.81019e8],
    ],
    within: 1e-5,
    note: 'Pulsed-power practice; J. C. Martin gives 8 for plastics, from memory.',
  },
  {
    family: 'capacitor.bleedTime',
    source: CLOSED_FORM,
    columns: ['R_ohm', 'C_F', 'V0_V', 'Vsafe_V'],
    rows: [[1e9, 2e-9, 16_000, 50, 11.5366]],
    within: 1e-5,
  },
  {
    family: 'capacitor.bleedTime',
    source: {
      kind: 'handbook',
      name: 'P. Horowitz and W. Hill, The Art of Electronics, chapter 1: per cent left after whole time constants',
      seen: 'from memory',
    },
    columns: ['percent'],
    rows: [
      [36.8, 1],
      [13.5, 2],
      [5, 3],
      [1.8, 4],
      [0.7, 5],
    ],
    within: 0.015,
    own: true,
    ask: (i) => {
      const node = { resistance_ohm: 1e9, capacitance_F: 1e-9 };
      return mapResult(bleedTime(node, 10_000, 100 * i.number('percent')), ({ value }) => value);
    },
  },
  {
    family: 'capacitor.bleedPower',
    source: CLOSED_FORM,
    columns: ['R_ohm', 'V0_V'],
    rows: [[1e9, 20_000, 0.4]],
    within: 1e-9,
  },
  {
    family: 'capacitor.hazard.exceedsTouchLimit',
    source: TOUCH,
    columns: ['C_F', 'V_V'],
    rows: [
      [44e-9, 1000, false],
      [46e-9, 1000, true],
      [2e-9, 20_000, true],
      [1.7e-9, 20_000, false],
    ],
    within: 0,
  },
  {
    family: 'capacitor.hazard.exceedsTouchLimit',
    source: TOUCH,
    columns: ['C_F', 'V_V'],
    rows: [
      [0.11e-6, 42, false],
      [0.11e-6, 43, true],
      [0.09e-6, 450, false],
      [0.11e-6, 450, true],
      [3.1e-9, 15_000, true],
      [2.9e-9, 15_000, false],
    ],
    within: 0,
    own: true,
  },
  {
    family: 'capacitor.hazard.reflexThreshold',
    source: {
      kind: 'standard',
      name: 'NFPA 70E (2018), article 360, and DOE-HDBK-1092-2013, appendix D: 0.25 J above 400 V',
      seen: 'read in quotation',
    },
    columns: ['V_V'],
    rows: [
      [401, 0.25],
      [20_000, 0.25],
    ],
    within: 0,
  },
  {
    family: 'capacitor.hazard.shockThreshold',
    source: BERKELEY,
    columns: ['V_V'],
    rows: [
      [100, 10],
      [20_000, 10],
    ],
    within: 0,
  },
  {
    family: 'capacitor.hazard.arcThreshold',
    source: BERKELEY,
    columns: ['V_V'],
    rows: [
      [100, 10_000],
      [20_000, 10_000],
    ],
    within: 0,
    own: true,
  },
  {
    family: 'capacitor.hazard.arcThreshold',
    source: BERKELEY,
    columns: ['V_V'],
    rows: [[99, 100]],
    within: 0,
    own: true,
    note: 'The line for heat, under 100 V.',
    ask: (i) => heatThreshold(i.number('V_V')),
  },
];
