import { CLOSED_FORM, PRACTICE, type Source, type Table } from './table';

const SETTING = [
  'g_left_mm',
  'g_right_mm',
  'x_left_mm',
  'x_right_mm',
  'target_mm',
  's1_mm',
  's2_mm',
  'pitch1_mm',
  'pitch2_mm',
];
const SAME_GAP = {
  g_left_mm: 2,
  g_right_mm: 2,
  x_left_mm: 0,
  x_right_mm: 300,
  target_mm: 3,
  s1_mm: 20,
  s2_mm: 280,
};
const METRIC: Source = {
  kind: 'standard',
  name: 'ISO 261 (1998), coarse and fine pitches',
  seen: 'from memory',
};
const UNIFIED: Source = {
  kind: 'standard',
  name: 'ASME B1.1 (2003), threads to an inch',
  seen: 'from memory',
};

export const ALIGNMENT_AND_CHARGING: readonly Table[] = [
  {
    family: 'alignment.turnsScrew1',
    source: CLOSED_FORM,
    columns: SETTING,
    rows: [
      [2.5, 2.1, 10, 290, 2.4, 0, 300, 0.5, 0.5, -0.228571],
      [3.1, 2.8, 0, 320, 3, 320, 0, 0.8, 0.8, 0.25],
    ],
    within: 2e-5,
    note: 'Two equations with two unknowns, solved apart.',
  },
  {
    family: 'alignment.turnsScrew1',
    source: METRIC,
    columns: ['pitch1_mm'],
    given: { ...SAME_GAP, pitch2_mm: 0.5 },
    rows: [
      [0.4, 2.5],
      [0.45, 2.2222],
      [0.35, 2.8571],
      [1.5, 0.66667],
      [1.75, 0.57143],
    ],
    within: 5e-5,
    own: true,
    note: 'M2, M2.5, M3 fine, M10 and M12: a millimetre needs one over the pitch.',
  },
  {
    family: 'alignment.turnsScrew2',
    source: UNIFIED,
    columns: ['pitch2_mm'],
    given: { ...SAME_GAP, pitch1_mm: 0.5 },
    rows: [
      [0.635, 1.5748],
      [0.79375, 1.2598],
      [0.90714, 1.1024],
    ],
    within: 1e-4,
    own: true,
    note: '40, 32 and 28 threads to an inch.',
  },
  {
    family: 'alignment.turnsScrew2',
    source: CLOSED_FORM,
    columns: SETTING,
    rows: [
      [2.5, 2.1, 10, 290, 2.4, 0, 300, 0.5, 0.5, 0.628571],
      [3.1, 2.8, 0, 320, 3, 320, 0, 0.8, 0.8, -0.125],
    ],
    within: 2e-5,
  },
  {
    family: 'alignment.wedge',
    source: CLOSED_FORM,
    columns: ['g_left_mm', 'g_right_mm', 'x_left_mm', 'x_right_mm'],
    rows: [[3, 3.12, 0, 250, 0.48]],
    within: 1e-6,
  },
  {
    family: 'alignment.breakdownSpread',
    source: CLOSED_FORM,
    columns: ['g_left_mm', 'g_right_mm', 'p_bar_abs'],
    rows: [
      [3, 3.1, 1.01325, 0.02735],
      [2.4, 2.2, 3, -0.076124],
    ],
    within: 1e-4,
  },
  {
    family: 'alignment.allowedMismatch',
    source: CLOSED_FORM,
    columns: ['g_mm', 'p_bar_abs', 'spread'],
    rows: [
      [3, 1.01325, 0.01, 36.003],
      [4, 2, 0.02, 90.689],
    ],
    within: 1e-4,
  },
  {
    family: 'alignment.bisection',
    source: PRACTICE,
    columns: ['first_step_turns', 'arc_side_sequence'],
    rows: [
      [0.25, 'LLR', 0.375],
      [0.25, 'LLLR', 0.625],
      [0.5, 'LRLR', 0.3125],
    ],
    within: 1e-12,
    note: 'The step halves at each change of side.',
  },
  {
    family: 'charging.repetitionRate',
    source: CLOSED_FORM,
    columns: ['R_ohm', 'C_F', 'Vs_V', 'Vb_V'],
    rows: [
      [2e7, 2e-9, 16_000, 12_000, 18.0337],
      [2.5e7, 5e-9, 25_000, 18_000, 6.28454],
    ],
    within: 1e-5,
    note: 'After one to five time constants: see the test of gas, room and bars.',
  },
  {
    family: 'charging.supplyPower',
    source: CLOSED_FORM,
    columns: ['C_F', 'Vb_V', 'f_Hz', 'Vs_V'],
    rows: [[2e-9, 12_000, 10, 16_000, 3.84]],
    within: 1e-9,
  },
  {
    family: 'circuit.ideal.transferPeak',
    source: CLOSED_FORM,
    columns: ['CD_F', 'CP_F', 'V0_V'],
    rows: [[3e-9, 1e-9, 16_000, 24_000]],
    within: 1e-9,
  },
  {
    family: 'circuit.ideal.transferEfficiency',
    source: CLOSED_FORM,
    columns: ['CD_F', 'CP_F'],
    rows: [
      [3e-9, 1e-9, 0.75],
      [2e-9, 2e-9, 1],
    ],
    within: 1e-9,
  },
  {
    family: 'circuit.ideal.transferHalfPeriod',
    source: CLOSED_FORM,
    columns: ['CD_F', 'CP_F', 'L_H'],
    rows: [[3e-9, 1e-9, 2e-8, 1.21673e-8]],
    within: 1e-5,
  },
  {
    family: 'circuit.ideal.inversionPeak',
    source: CLOSED_FORM,
    columns: ['V0_V'],
    rows: [[16_000, 32_000]],
    within: 1e-9,
  },
  {
    family: 'circuit.ideal.inversionHalfPeriod',
    source: CLOSED_FORM,
    columns: ['C1_F', 'L_H'],
    rows: [[2e-9, 2e-8, 1.98692e-8]],
    within: 1e-5,
  },
  {
    family: 'circuit.ideal.peakCurrent',
    source: CLOSED_FORM,
    columns: ['V0_V', 'Cser_F', 'L_H'],
    rows: [[16_000, 2e-9, 2e-8, 5059.64]],
    within: 1e-5,
  },
];
