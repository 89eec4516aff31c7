import type { RigDoc } from '../../domain/book/documents/rig';
import type { RigSpec } from '../../domain/book/rig-spec';

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

/** The two rigs of the demo lab that differ most, as the tests of this folder take them. */
export const HERON: RigSpec = {
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
      material: 'Polyacetal',
      rated_bar_g: 2,
      relief_bar_g: 1,
      regulator_max_bar_g: 1.5,
      proof_date: null,
    },
  },
  first: { ...sheet, width_mm: 320 },
  second: { ...sheet, width_mm: 260 },
  channel: { length_mm: 240, spacing_a_mm: 2.5, spacing_b_mm: 2.5, gas: 'N2', across_kohm: 5 },
  charging: { supply_kV: 16, supply_mA: 1, ballast_Mohm: 20 },
  nodes: [
    { name: 'C1, gap side', holds: 'first', bleed_Mohm: 500 },
    { name: 'C2, channel side', holds: 'second', bleed_Mohm: 500 },
  ],
  shorting_points: ['C1', 'C2', 'Middle plate', 'Across the channel', 'Gap and supply node'],
  beam: { pulse_energy_uJ: 60, wavelength_nm: 337.1 },
  model: { gap_nH: 25, channel_nH: 5, known: 'assumed' },
  envelope: { max_kV: 16, max_bar_g: 0.8, max_rate_Hz: 4 },
};

export const KETTLE: RigSpec = {
  ...HERON,
  topology: 'charge-transfer',
  gap: {
    ...HERON.gap,
    gap_mm: 3,
    lowest_bar_g: 0.8,
    highest_bar_g: 1.2,
    vessel: {
      material: 'Glass-fibre epoxy tube',
      rated_bar_g: 3,
      relief_bar_g: 1.5,
      regulator_max_bar_g: 2,
      proof_date: null,
    },
  },
  first: { kind: 'bank', part: 'Ceramic, five of 1.0 nF, 30 kV', capacitance_nF: 5, rated_kV: 30 },
  second: { kind: 'bank', part: 'Ceramic, two of 0.7 nF, 30 kV', capacitance_nF: 1.4, rated_kV: 30 },
  charging: { supply_kV: 25, supply_mA: 1.5, ballast_Mohm: 25 },
  nodes: [
    { name: 'Dump capacitor', holds: 'first', bleed_Mohm: 400 },
    { name: 'Peaking capacitor', holds: 'second', bleed_Mohm: 0.05 },
  ],
  shorting_points: ['Dump capacitor', 'Peaking capacitor', 'Gap and supply node'],
  envelope: { max_kV: 23, max_bar_g: 1.2, max_rate_Hz: 5 },
};

const trace = {
  entry: 'rev-1',
  by: 'ada',
  device: 'tablet-a',
  stamp: {
    wall_ms: 0,
    offset_min: 0,
    zone: 'Europe/London',
    page_life: 'life-1',
    monotonic_ms: 0,
    time_uncertain: false,
  },
  at: 1,
} as const;

export const HERON_RIG: RigDoc = {
  kind: 'rig',
  id: 'heron',
  parent: null,
  name: 'Heron',
  revisions: [{ ...trace, number: '4A', spec: HERON, based_on: null, why: 'Created' }],
  heads: ['rev-1'],
  declared: null,
  last_short: null,
  stand_downs: [],
  hands: [],
  guests: [],
  kit: [],
  permits: [],
  permits_asked: [],
  ready_check: null,
  open_checks: [],
  open_firings: [],
  last_firing: null,
  holder: null,
  gas_changed: null,
  needs_newer_app: false,
};
