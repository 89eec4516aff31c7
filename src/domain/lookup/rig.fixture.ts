import type { LabSettings, RigSpec } from '../book/rig-spec';

export const labSettings: LabSettings = {
  name: 'Fixture lab',
  zone: 'Etc/UTC',
  ambient_bar_abs: 0.966,
  ambient_C: 21,
  discharged_below_V: 50,
  working_alone: 'forbidden',
  emergency: { isolator: 'by the door', ring: [], first_aid: '' },
};

export const kettleLikeSpec: RigSpec = {
  topology: 'charge-transfer',
  gap: {
    gas: 'N2',
    electrodes: 'domed',
    radius_mm: 12,
    radius_known: 'assumed',
    gap_mm: 3,
    gap_error_mm: 0.05,
    irradiated: true,
    lowest_bar_g: 0.8,
    highest_bar_g: 1.2,
    vessel: {
      material: 'polycarbonate',
      rated_bar_g: 2,
      relief_bar_g: 1.5,
      regulator_max_bar_g: 2,
      proof_date: null,
    },
  },
  first: { kind: 'bank', part: 'ceramic 30 kV', capacitance_nF: 5, rated_kV: 30 },
  second: { kind: 'bank', part: 'ceramic 30 kV', capacitance_nF: 1.4, rated_kV: 30 },
  channel: { length_mm: 280, spacing_a_mm: 4, spacing_b_mm: 4, gas: 'N2', across_kohm: 50 },
  charging: { supply_kV: 25, supply_mA: 1.5, ballast_Mohm: 25 },
  nodes: [{ name: 'dump capacitor', holds: 'first', bleed_Mohm: 400 }],
  shorting_points: ['dump capacitor'],
  beam: { pulse_energy_uJ: 150, wavelength_nm: 337.1 },
  model: { gap_nH: 28, channel_nH: 4, known: 'assumed' },
  envelope: { max_kV: 22, max_bar_g: 1.2, max_rate_Hz: 5 },
};
