import type { RigSpec } from '../book/rig-spec';
import type { SpecChange } from '../rules/loosening';
import { CAPACITOR_WORDS } from './words';

export interface FieldWords {
  readonly label: string;
  /** Empty where the field is no quantity. */
  readonly unit: string;
}

type Topology = RigSpec['topology'];

const PLAIN: Readonly<Record<string, readonly [label: string, unit: string]>> = {
  topology: ['Circuit', ''],
  'gap.gas': ['Gap gas', ''],
  'gap.electrodes': ['Gap electrodes', ''],
  'gap.radius_mm': ['Electrode radius', 'mm'],
  'gap.radius_known': ['Electrode radius is', ''],
  'gap.gap_mm': ['Gap', 'mm'],
  'gap.gap_error_mm': ['Setting error of the gap', 'mm'],
  'gap.irradiated': ['UV on the gap', ''],
  'gap.lowest_bar_g': ['Lowest working pressure', 'bar(g)'],
  'gap.highest_bar_g': ['Highest working pressure', 'bar(g)'],
  'gap.vessel': ['Vessel', ''],
  'gap.vessel.material': ['Vessel material', ''],
  'gap.vessel.rated_bar_g': ['Vessel rated for', 'bar(g)'],
  'gap.vessel.relief_bar_g': ['Relief valve', 'bar(g)'],
  'gap.vessel.regulator_max_bar_g': ['Regulator at most', 'bar(g)'],
  'gap.vessel.proof_date': ['Proof test', ''],
  'channel.length_mm': ['Channel length', 'mm'],
  'channel.spacing_a_mm': ['Channel spacing, A end', 'mm'],
  'channel.spacing_b_mm': ['Channel spacing, B end', 'mm'],
  'channel.gas': ['Channel gas', ''],
  'channel.across_kohm': ['Across the channel', 'kΩ'],
  'charging.supply_kV': ['Supply', 'kV'],
  'charging.supply_mA': ['Supply', 'mA'],
  'charging.ballast_Mohm': ['Ballast', 'MΩ'],
  'beam.pulse_energy_uJ': ['Pulse energy', 'µJ'],
  'beam.wavelength_nm': ['Wavelength', 'nm'],
  'model.gap_nH': ['Gap inductance', 'nH'],
  'model.channel_nH': ['Channel inductance', 'nH'],
  'model.known': ['Inductances are', ''],
  'envelope.max_kV': ['Envelope voltage', 'kV'],
  'envelope.max_bar_g': ['Envelope pressure', 'bar(g)'],
  'envelope.max_rate_Hz': ['Envelope rate', 'Hz'],
};

const OF_CAPACITOR: Readonly<Record<string, readonly [label: string, unit: string]>> = {
  kind: ['built as', ''],
  dielectric: ['dielectric', ''],
  eps_r: ['relative permittivity', ''],
  ply_um: ['ply', 'µm'],
  plies: ['plies', ''],
  plate_pairs: ['plate pairs', ''],
  length_mm: ['length', 'mm'],
  width_mm: ['width', 'mm'],
  strength_kV_mm: ['strength', 'kV/mm'],
  part: ['part', ''],
  capacitance_nF: ['capacitance', 'nF'],
  rated_kV: ['rated for', 'kV'],
};

const OF_NODE: Readonly<Record<string, readonly [label: string, unit: string]>> = {
  name: ['name', ''],
  holds: ['holds', ''],
  bleed_Mohm: ['bleed', 'MΩ'],
};

/** What a field of a rig is called. A field that is not known here keeps its own name rather than vanish. */
export function specFieldWords(field: string, topology: Topology): FieldWords {
  const plain = PLAIN[field];
  if (plain !== undefined) return { label: plain[0], unit: plain[1] };
  const [head = '', second = '', third = ''] = field.split('.');
  if (head === 'first' || head === 'second') {
    const [label, unit] = OF_CAPACITOR[second] ?? [second, ''];
    const name = CAPACITOR_WORDS[topology][head];
    return { label: `${name.charAt(0).toUpperCase()}${name.slice(1)}, ${label}`, unit };
  }
  if (head === 'nodes') {
    const [label, unit] = OF_NODE[third] ?? [third, ''];
    return { label: `Node ${Number(second) + 1}, ${label}`, unit };
  }
  if (head === 'shorting_points') return { label: `Shorting point ${Number(second) + 1}`, unit: '' };
  return { label: field, unit: '' };
}

export interface DifferenceWords {
  readonly label: string;
  readonly before: string;
  readonly after: string;
}

/** Both sides of a difference, as they were entered and never rounded. */
export function specDifference(change: SpecChange, topology: Topology): DifferenceWords {
  const { label, unit } = specFieldWords(change.field, topology);
  return { label, before: valueWords(change.before, unit), after: valueWords(change.after, unit) };
}

/** A change in words: "Envelope rate: 5 Hz, was 6 Hz". */
export function specChangeWords(change: SpecChange, topology: Topology): string {
  const { label, before, after } = specDifference(change, topology);
  return `${label}: ${after}, was ${before}`;
}

function valueWords(value: SpecChange['after'], unit: string): string {
  if (value === null) return 'not known';
  const text = typeof value === 'number' ? String(value).replace('-', '\u2212') : value;
  return unit === '' || text === '' ? text : `${text}\u2009${unit}`;
}
