import type { CheckDoc, StepRecord } from '../../domain/book/documents/check';
import type { RigDoc } from '../../domain/book/documents/rig';
import type { Trace } from '../../domain/book/documents/trace';
import type { LabSettings, RigSpec } from '../../domain/book/rig-spec';

/** A charge transfer with a pressurised nitrogen gap, as rigs of this kind are built; for tests alone. */
export const SPEC: RigSpec = {
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
    vessel: null,
  },
  first: { kind: 'bank', part: 'Ceramic bank', capacitance_nF: 5, rated_kV: 30 },
  second: { kind: 'bank', part: 'Ceramic bank', capacitance_nF: 1.4, rated_kV: 30 },
  channel: { length_mm: 280, spacing_a_mm: 4, spacing_b_mm: 4, gas: 'N2', across_kohm: 50 },
  charging: { supply_kV: 25, supply_mA: 1.5, ballast_Mohm: 25 },
  nodes: [
    { name: 'Dump capacitor', holds: 'first', bleed_Mohm: 400 },
    { name: 'Peaking capacitor', holds: 'second', bleed_Mohm: 0.05 },
  ],
  shorting_points: ['Dump capacitor', 'Peaking capacitor'],
  beam: { pulse_energy_uJ: 150, wavelength_nm: 337.1 },
  model: { gap_nH: 28, channel_nH: 4, known: 'assumed' },
  envelope: { max_kV: 23, max_bar_g: 1.2, max_rate_Hz: 5 },
};

export const SETTINGS: LabSettings = {
  name: 'Test bench',
  zone: 'Etc/UTC',
  ambient_bar_abs: 0.966,
  ambient_C: 21,
  discharged_below_V: 50,
  working_alone: 'forbidden',
  emergency: { isolator: '', ring: [], first_aid: '' },
};

export const DEVICE = '00000000-0000-4000-8000-000000000005';

export function trace(entry: string, minutes = 0): Trace {
  return {
    entry,
    by: 'ada',
    device: DEVICE,
    stamp: {
      wall_ms: 1_796_000_000_000 + minutes * 60_000,
      offset_min: 0,
      zone: 'Etc/UTC',
      page_life: 'life',
      monotonic_ms: minutes * 60_000,
      time_uncertain: false,
    },
    at: null,
  };
}

export const RIG: RigDoc = {
  kind: 'rig',
  id: 'rig',
  parent: null,
  name: 'Kettle',
  revisions: [{ ...trace('revision'), number: '7A', spec: SPEC, based_on: null, why: 'Created' }],
  heads: ['revision'],
  declared: null,
  last_short: null,
  stand_downs: [],
  hands: [],
  guests: [],
  kit: [],
  permits: [
    {
      ...trace('permit'),
      rig_revision: 'revision',
      envelope: { max_kV: 22, max_bar_g: 1.2, max_rate_Hz: 3 },
      until_ms: Date.UTC(2026, 11, 18, 12),
      withdrawn: null,
    },
  ],
  permits_asked: [],
  ready_check: {
    check: 'check',
    rig_revision: 'revision',
    closed: trace('closing', 10),
    active: trace('closing', 10).stamp,
    voided: null,
    present: [],
    kit: [],
  },
  open_checks: [],
  open_firings: [],
  last_firing: null,
  holder: DEVICE,
  gas_changed: null,
  needs_newer_app: false,
};

export const CHECK: CheckDoc = {
  kind: 'check',
  id: 'check',
  parent: 'rig',
  rig_revision: 'revision',
  sheet: 'sheet',
  purpose: 'before-firing',
  opened: trace('check'),
  steps: {},
  ended: { ...trace('closing', 10), how: 'closed', irregular: null, words: '' },
};

export function stepRecord(parts: Partial<StepRecord>): StepRecord {
  return {
    ...trace('step'),
    state: 'done',
    result: null,
    words: '',
    witness: null,
    kit: [],
    irregular: null,
    ...parts,
  };
}
