import type { RigSpec } from '../../../domain/book/rig-spec';
import { textsOf, type Texts } from './spec-texts';

/**
 * A rig to start from where nothing is known yet: figures of the size that such rigs have, by common practice and no
 * source. They are suggestions alone: on screen they read "suggested" until somebody takes them for right. No bleed is
 * ever suggested, since a wait would be computed from it.
 */
const INVERSION: RigSpec = {
  topology: 'lc-inversion',
  gap: {
    gas: 'N2',
    electrodes: 'domed',
    radius_mm: 12,
    radius_known: 'assumed',
    gap_mm: 2.2,
    gap_error_mm: 0.05,
    rod_length_mm: 20,
    flats_mm: 13,
    corner_mm: 0.5,
    facing: 'flats',
    irradiated: false,
    lowest_bar_g: 0,
    highest_bar_g: 0.2,
    vessel: {
      material: 'Polyacetal',
      rated_bar_g: 2,
      relief_bar_g: 0.8,
      regulator_max_bar_g: 1.5,
      proof_date: null,
    },
  },
  first: sheet(320),
  second: sheet(260),
  channel: {
    length_mm: 240,
    spacing_a_mm: 2.5,
    spacing_b_mm: 2.5,
    gas: 'N2',
    across_kohm: 5,
    feeler_error_mm: 0.02,
    screws: [
      { name: 'A', position_mm: 20, pitch_mm: 0.5, lever: 1, closes: 'clockwise' },
      { name: 'B', position_mm: 220, pitch_mm: 0.5, lever: 1, closes: 'clockwise' },
    ],
  },
  charging: { supply_kV: 15, supply_mA: 1, ballast_Mohm: 20 },
  nodes: [
    { name: 'C1, gap side', holds: 'first', bleed_Mohm: null },
    { name: 'C2, channel side', holds: 'second', bleed_Mohm: null },
  ],
  shorting_points: ['C1', 'C2', 'Middle plate', 'Across the channel', 'Gap and supply node'],
  beam: { pulse_energy_uJ: 60, wavelength_nm: 337.1 },
  model: {
    gap_nH: 25,
    channel_nH: 5,
    known: 'assumed',
    gap_law: {
      law: 'exponential',
      end_ohm: 0.2,
      start_ohm: 500,
      fall_ns: 1,
      constant_cm2_atm_V2s: null,
      known: 'assumed',
    },
    channel_law: { over_static: 1.3, end_ohm: 0.3, start_ohm: 500, fall_ns: 0.8, known: 'assumed' },
  },
  envelope: { max_kV: 14, max_bar_g: 0.2, max_rate_Hz: 2 },
};

const TRANSFER: RigSpec = {
  ...INVERSION,
  topology: 'charge-transfer',
  first: { kind: 'bank', part: 'Ceramic', capacitance_nF: 3, rated_kV: 30 },
  second: { kind: 'bank', part: 'Ceramic', capacitance_nF: 0.9, rated_kV: 30 },
  channel: { ...INVERSION.channel, across_kohm: 50 },
  nodes: [
    { name: 'Dump capacitor', holds: 'first', bleed_Mohm: null },
    { name: 'Peaking capacitor', holds: 'second', bleed_Mohm: null },
  ],
  shorting_points: ['Dump capacitor', 'Peaking capacitor', 'Gap and supply node'],
};

/** By field, for the circuit that was chosen; a bank has its suggestions beside a sheet's. */
export function startingValues(topology: RigSpec['topology']): Texts {
  const own = topology === 'charge-transfer' ? TRANSFER : INVERSION;
  const other = topology === 'charge-transfer' ? INVERSION : TRANSFER;
  return {
    ...textsOf({ ...own, first: other.first, second: other.second }),
    ...textsOf(own),
    // Own figures for the laws are for those who measured them.
    'model.gap_law': 'usual',
    'model.channel_law': 'usual',
    'model.gap_law.constant_cm2_atm_V2s': '1',
    'channel.screws': '',
  };
}

function sheet(width_mm: number): RigSpec['first'] {
  return {
    kind: 'sheet',
    dielectric: 'PET',
    eps_r: 3.2,
    ply_um: 175,
    plies: 4,
    plate_pairs: 1,
    length_mm: 300,
    width_mm,
    strength_kV_mm: 80,
  };
}
