import type { RigSpec } from '../../src/domain/book/rig-spec';
import type { DemoRig } from './demo-rig';
import { namedId } from '../named-id';

/** A miniature charge transfer with an open gap in air: the rig as it stands today. */
export const WREN_SPEC: RigSpec = {
  topology: 'charge-transfer',
  gap: {
    gas: 'air',
    electrodes: 'domed',
    radius_mm: 5,
    radius_known: 'assumed',
    gap_mm: 1.6,
    gap_error_mm: 0.03,
    irradiated: true,
    lowest_bar_g: 0,
    highest_bar_g: 0,
    vessel: null,
  },
  first: { kind: 'bank', part: 'Ceramic, four of 0.22 nF, 15 kV', capacitance_nF: 0.88, rated_kV: 15 },
  second: { kind: 'bank', part: 'Ceramic, three of 0.1 nF, 15 kV', capacitance_nF: 0.3, rated_kV: 15 },
  channel: {
    length_mm: 50,
    spacing_a_mm: 0.9,
    spacing_b_mm: 0.9,
    gas: 'N2',
    across_kohm: 200,
    screws: [
      { name: 'Screw A', position_mm: -8, pitch_mm: 0.35, lever: 1, closes: 'clockwise' },
      { name: 'Screw B', position_mm: 58, pitch_mm: 0.35, lever: 1, closes: 'clockwise' },
    ],
    feeler_a_mm: 3,
    feeler_b_mm: 47,
    feeler_error_mm: 0.01,
  },
  charging: { supply_kV: 10, supply_mA: 0.5, ballast_Mohm: 100 },
  nodes: [
    { name: 'Dump capacitor', holds: 'first', bleed_Mohm: 1000 },
    // The resistor across the channel is what bleeds the peaking capacitor.
    { name: 'Peaking capacitor', holds: 'second', bleed_Mohm: 0.2 },
  ],
  shorting_points: ['Dump capacitor', 'Peaking capacitor', 'Gap and supply node'],
  beam: { pulse_energy_uJ: 1, wavelength_nm: 337.1, pulse_ns: 4, width_mm: 2, height_mm: 0.9 },
  model: { gap_nH: 12, channel_nH: 3, known: 'assumed' },
  envelope: { max_kV: 8, max_bar_g: 0, max_rate_Hz: 10 },
};

const third: RigSpec = { ...WREN_SPEC, gap: { ...WREN_SPEC.gap, gap_error_mm: 0.05 } };
const second: RigSpec = {
  ...third,
  channel: { ...third.channel, across_kohm: 500 },
  nodes: withPeakingBleed(0.5),
};
const first: RigSpec = {
  ...second,
  second: { kind: 'bank', part: 'Ceramic, two of 0.1 nF, 15 kV', capacitance_nF: 0.2, rated_kV: 15 },
};

export const WREN: DemoRig = {
  id: namedId('rig/wren'),
  name: 'Wren',
  sheet: 'make-safe-charge-transfer',
  spec: WREN_SPEC,
  revisions: [
    { spec: first, why: 'Created' },
    { spec: second, why: '0.3 instead of 0.2 nF of peaking capacitor: the channel lit at one end only.' },
    { spec: third, why: '200 instead of 500 kΩ across the channel: it lit before the gap.' },
    { spec: WREN_SPEC, why: 'Electrodes polished and the gap set again under the microscope, to 0.03 mm.' },
  ],
  permits: Array.from({ length: 4 }, () => ({ max_kV: 7.5, max_bar_g: 0, max_rate_Hz: 8 })),
  character: { ratio: 1.01, scatter_kV: 0.12, working_bar_g: 0, rate_Hz: [2, 5, 8], flow_L_min: 0.5 },
};

function withPeakingBleed(bleed_Mohm: number): RigSpec['nodes'] {
  return WREN_SPEC.nodes.map((node) => (node.holds === 'second' ? { ...node, bleed_Mohm } : node));
}
