import type { ReadingValues } from '../../domain/book/bodies/firing-bodies';
import type { FiringDoc } from '../../domain/book/documents/firing';
import type { ReadingDoc } from '../../domain/book/documents/reading';
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

export const READING: ReadingValues = {
  voltage_kV: 18.9,
  how: 'self-break',
  pressure_bar_g: 1.02,
  gas: 'N2',
  flow_L_min: 3,
  rate_Hz: 2,
  shots: 40,
  looked: 'even',
  output_uJ: 150,
  ambient_bar_abs: 0.966,
  temperature_C: 21,
  humidity_pct: null,
  note: '',
  carried_over: [],
};

export const IDS = {
  rig: '00000000-0000-4000-8000-000000000001',
  revision: '00000000-0000-4000-8000-000000000002',
  firing: '00000000-0000-4000-8000-000000000003',
  permit: '00000000-0000-4000-8000-000000000004',
  device: '00000000-0000-4000-8000-000000000005',
  person: '00000000-0000-4000-8000-000000000006',
  life: '00000000-0000-4000-8000-000000000007',
} as const;

export function trace(entry: string, minutes = 0): Trace {
  return {
    entry,
    by: IDS.person,
    device: IDS.device,
    stamp: {
      wall_ms: 1_796_000_000_000 + minutes * 60_000,
      offset_min: 0,
      zone: 'Etc/UTC',
      page_life: IDS.life,
      monotonic_ms: minutes * 60_000,
      time_uncertain: false,
    },
    at: null,
  };
}

export function readingDoc(no: number, values: Partial<ReadingValues> = {}): ReadingDoc {
  const id = `00000000-0000-4000-8000-1${String(no).padStart(11, '0')}`;
  return {
    kind: 'reading',
    id,
    parent: IDS.firing,
    rig: IDS.rig,
    no,
    original: { ...READING, ...values },
    logged: trace(id, no),
    irregular: null,
    corrections: [],
    struck: null,
  };
}

export const FIRING: FiringDoc = {
  kind: 'firing',
  id: IDS.firing,
  parent: IDS.rig,
  number: 'A-119',
  rig_revision: IDS.revision,
  check: null,
  permit: IDS.permit,
  unready: null,
  opened: trace(IDS.firing),
  opened_irregular: null,
  readings: 0,
  irregular_readings: 0,
  shots: 0,
  last_reading: null,
  closed: null,
  reviews: [],
};

export const RIG: RigDoc = {
  kind: 'rig',
  id: IDS.rig,
  parent: null,
  name: 'Kettle',
  revisions: [{ ...trace(IDS.revision), number: '7A', spec: SPEC, based_on: null, why: 'Created' }],
  heads: [IDS.revision],
  declared: null,
  last_short: null,
  stand_downs: [],
  hands: [],
  guests: [],
  kit: [],
  permits: [
    {
      ...trace(IDS.permit),
      rig_revision: IDS.revision,
      envelope: { max_kV: 22, max_bar_g: 1.2, max_rate_Hz: 3 },
      until_ms: 1_797_000_000_000,
      withdrawn: null,
    },
  ],
  permits_asked: [],
  ready_check: null,
  open_checks: [],
  open_firings: [IDS.firing],
  last_firing: IDS.firing,
  holder: IDS.device,
  gas_changed: null,
  needs_newer_app: false,
};
