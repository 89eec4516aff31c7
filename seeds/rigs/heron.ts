import type { RigSpec } from '../../src/domain/book/rig-spec';
import type { DemoRig } from './demo-rig';
import { namedId } from '../named-id';

const sheet = {
  kind: 'sheet',
  dielectric: 'PET film',
  eps_r: 3.2,
  ply_um: 175,
  plies: 4,
  plate_pairs: 1,
  length_mm: 300,
  strength_kV_mm: 80,
} as const;

/** An LC inversion with two sheet capacitors under one channel: the rig as it stands today. */
export const HERON_SPEC: RigSpec = {
  topology: 'lc-inversion',
  gap: {
    gas: 'N2',
    electrodes: 'domed',
    radius_mm: 12,
    radius_known: 'assumed',
    gap_mm: 2.6,
    gap_error_mm: 0.05,
    irradiated: true,
    lowest_bar_g: 0.2,
    highest_bar_g: 0.8,
    vessel: {
      material: 'Polyacetal body, steel end plates, steel guard',
      rated_bar_g: 2,
      relief_bar_g: 1,
      regulator_max_bar_g: 1.5,
      proof_date: null,
    },
  },
  first: { ...sheet, width_mm: 320 },
  second: { ...sheet, width_mm: 260 },
  channel: {
    length_mm: 240,
    spacing_a_mm: 2.5,
    spacing_b_mm: 2.5,
    gas: 'N2',
    across_kohm: 5,
    screws: [
      { name: 'Screw A', position_mm: -15, pitch_mm: 0.5, lever: 1, closes: 'clockwise' },
      { name: 'Screw B', position_mm: 255, pitch_mm: 0.5, lever: 1, closes: 'clockwise' },
    ],
    feeler_a_mm: 10,
    feeler_b_mm: 230,
    feeler_error_mm: 0.015,
  },
  charging: { supply_kV: 16, supply_mA: 1, ballast_Mohm: 20 },
  nodes: [
    { name: 'C1, gap side', holds: 'first', bleed_Mohm: 500 },
    { name: 'C2, channel side', holds: 'second', bleed_Mohm: 500 },
  ],
  shorting_points: ['C1', 'C2', 'Middle plate', 'Across the channel', 'Gap and supply node'],
  beam: { pulse_energy_uJ: 60, wavelength_nm: 337.1, pulse_ns: 6, width_mm: 6, height_mm: 2.5 },
  model: { gap_nH: 25, channel_nH: 5, known: 'assumed' },
  envelope: { max_kV: 16, max_bar_g: 0.8, max_rate_Hz: 4 },
};

const threePlies: RigSpec = {
  ...HERON_SPEC,
  first: { ...sheet, width_mm: 320, plies: 3 },
  second: { ...sheet, width_mm: 260, plies: 3 },
  channel: { ...HERON_SPEC.channel, across_kohm: 10 },
};
const fourPlies: RigSpec = { ...HERON_SPEC, channel: { ...HERON_SPEC.channel, across_kohm: 10 } };

export const HERON: DemoRig = {
  id: namedId('rig/heron'),
  name: 'Heron',
  sheet: 'make-safe-lc-inversion',
  spec: HERON_SPEC,
  revisions: [
    { spec: threePlies, why: 'Created' },
    {
      spec: fourPlies,
      why: 'A fourth ply in both sheets after the flashover along an edge: stress at the supply’s limit falls from 30.5 to 22.9 kV/mm.',
    },
    {
      spec: HERON_SPEC,
      why: '5 instead of 10 kΩ across the channel, so that it rests at zero before each shot.',
    },
  ],
  permits: [
    { max_kV: 15, max_bar_g: 0.6, max_rate_Hz: 3 },
    { max_kV: 15, max_bar_g: 0.6, max_rate_Hz: 3 },
    { max_kV: 15, max_bar_g: 0.6, max_rate_Hz: 3 },
  ],
  character: { ratio: 0.996, scatter_kV: 0.25, working_bar_g: 0.4, rate_Hz: [1, 2, 2.5], flow_L_min: 3 },
};
