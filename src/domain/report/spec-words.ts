import type { RigSpec } from '../book/rig-spec';
import type { SpecChange } from '../rules/loosening';
import { CAPACITOR_WORDS } from './words';

export interface FieldWords {
  readonly label: string;
  /** Empty where the field is no quantity. */
  readonly unit: string;
}

type Topology = RigSpec['topology'];

type Labels = Readonly<Record<string, readonly [label: string, unit: string]>>;

const PLAIN: Labels = {
  topology: ['Circuit', ''],
  'gap.gas': ['Gap gas', ''],
  'gap.electrodes': ['Gap electrodes', ''],
  'gap.radius_mm': ['Electrode radius', 'mm'],
  'gap.radius_known': ['Electrode radius is', ''],
  'gap.gap_mm': ['Gap', 'mm'],
  'gap.gap_error_mm': ['Setting error of the gap', 'mm'],
  'gap.rod_length_mm': ['Straight part of the rods', 'mm'],
  'gap.flats_mm': ['Bars across the flats', 'mm'],
  'gap.corner_mm': ['Edge radius of the bars', 'mm'],
  'gap.facing': ['What faces the gap', ''],
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
  'channel.profile': ['Channel electrodes', ''],
  'channel.edge_mm': ['Edge radius, channel', 'mm'],
  'channel.width_mm': ['Discharge width', 'mm'],
  'channel.flow_L_min': ['Channel flow', 'L/min'],
  'channel.screws': ['Screws', ''],
  'channel.feeler_a_mm': ['Feeler, A side at', 'mm'],
  'channel.feeler_b_mm': ['Feeler, B side at', 'mm'],
  'channel.feeler_error_mm': ['Feeler error', 'mm'],
  'charging.supply_kV': ['Supply voltage', 'kV'],
  'charging.supply_mA': ['Supply current', 'mA'],
  'charging.ballast_Mohm': ['Ballast', 'MΩ'],
  'charging.inductor_uH': ['Charging inductor', 'µH'],
  'charging.inductor_ohm': ['Inductor resistance', 'Ω'],
  'beam.pulse_energy_uJ': ['Pulse energy', 'µJ'],
  'beam.wavelength_nm': ['Wavelength', 'nm'],
  'beam.pulse_ns': ['Pulse length', 'ns'],
  'beam.width_mm': ['Beam width', 'mm'],
  'beam.height_mm': ['Beam height', 'mm'],
  'beam.divergence_width_mrad': ['Divergence, width', 'mrad'],
  'beam.divergence_height_mrad': ['Divergence, height', 'mrad'],
  'beam.stop': ['Beam stop', ''],
  'model.gap_nH': ['Gap inductance', 'nH'],
  'model.channel_nH': ['Channel inductance', 'nH'],
  'model.known': ['Inductances are', ''],
  'model.gap_law': ['Gap resistance law', ''],
  'model.gap_law.law': ['Gap resistance law', ''],
  'model.gap_law.end_ohm': ['Gap, last resistance', 'Ω'],
  'model.gap_law.start_ohm': ['Gap, first resistance', 'Ω'],
  'model.gap_law.fall_ns': ['Gap, fall time', 'ns'],
  'model.gap_law.constant_cm2_atm_V2s': ['Gap, constant', 'cm² atm/(V² s)'],
  'model.gap_law.known': ['Gap law is', ''],
  'model.channel_law': ['Channel law', ''],
  'model.channel_law.over_static': ['Channel breaks at, of static', ''],
  'model.channel_law.end_ohm': ['Channel, last resistance', 'Ω'],
  'model.channel_law.start_ohm': ['Channel, first resistance', 'Ω'],
  'model.channel_law.fall_ns': ['Channel, fall time', 'ns'],
  'model.channel_law.known': ['Channel law is', ''],
  'envelope.max_kV': ['Envelope voltage', 'kV'],
  'envelope.max_bar_g': ['Envelope pressure', 'bar(g)'],
  'envelope.max_rate_Hz': ['Envelope rate', 'Hz'],
};

const OF_CAPACITOR: Labels = {
  kind: ['built as', ''],
  dielectric: ['dielectric', ''],
  eps_r: ['relative permittivity', ''],
  ply_um: ['one ply', 'µm'],
  plies: ['plies between two foils', ''],
  plate_pairs: ['active plate pairs', ''],
  length_mm: ['length', 'mm'],
  width_mm: ['width', 'mm'],
  strength_kV_mm: ['strength', 'kV/mm'],
  part: ['part', ''],
  capacitance_nF: ['capacitance', 'nF'],
  rated_kV: ['rated for', 'kV'],
  parts: ['parts in parallel', ''],
  catalogue: ['class of part', ''],
};

const OF_NODE: Labels = { name: ['name', ''], holds: ['holds', ''], bleed_Mohm: ['bleed', 'MΩ'] };

const OF_SCREW: Labels = {
  name: ['name', ''],
  position_mm: ['from the A end', 'mm'],
  pitch_mm: ['pitch', 'mm'],
  lever: ['lever', ''],
  closes: ['closes', ''],
};

/** Codes of a rig as words; what is not here is a word already. */
const VALUES: Readonly<Record<string, string>> = {
  'lc-inversion': 'LC inversion',
  'charge-transfer': 'charge transfer',
  domed: 'domed',
  'capped-rods': 'capped rods',
  'hex-bars': 'hexagonal bars',
  'rompe-weizel': 'after Rompe and Weizel',
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
  if (field.startsWith('channel.screws.')) {
    const [, , at = '', part = ''] = field.split('.');
    const [label, unit] = OF_SCREW[part] ?? [part, ''];
    return { label: `Screw ${Number(at) + 1}, ${label}`, unit };
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
  const said = (value: SpecChange['after']): string => valueWords(value, change.field, unit);
  return { label, before: said(change.before), after: said(change.after) };
}

/** A change in words: "Envelope rate: 5 Hz, was 6 Hz". */
export function specChangeWords(change: SpecChange, topology: Topology): string {
  const { label, before, after } = specDifference(change, topology);
  return `${label}: ${after}, was ${before}`;
}

/** A value of a field as words, never rounded. */
export function specValueWords(value: SpecChange['after'], field: string, topology: Topology): string {
  return valueWords(value, field, specFieldWords(field, topology).unit);
}

/** Where nothing stands, a thing that may be there or not is absent, and a figure is not known. */
const THINGS = /^(gap\.vessel|beam\.stop|channel\.screws\.\d+\.name|nodes\.\d+\.name|shorting_points\.\d+)$/;

function valueWords(value: SpecChange['after'], field: string, unit: string): string {
  if (value === null) return THINGS.test(field) ? 'none' : 'not known';
  const text = typeof value === 'number' ? String(value).replace('-', '\u2212') : (VALUES[value] ?? value);
  return unit === '' || text === '' ? text : `${text}\u2009${unit}`;
}
