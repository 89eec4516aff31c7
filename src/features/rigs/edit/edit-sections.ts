import type { RigSpec } from '../../../domain/book/rig-spec';
import { CAPACITOR_WORDS } from '../../../domain/report/words';
import { beamFields, channelFields, envelopeFields, modelFields, screwFields } from './channel-fields';
import type { EditField } from './edit-field';
import { capacitorFields, chargingFields, circuitFields, gapFields, vesselFields } from './gap-fields';
import { nodeFields, shortingFields } from './node-fields';
import type { TextOf } from './spec-texts';

/** What stands together on one screen, in the order in which a new rig is built. */
export const SECTIONS = [
  'circuit',
  'gap',
  'vessel',
  'first',
  'second',
  'channel',
  'charging',
  'nodes',
  'shorting',
  'model',
  'envelope',
  'beam',
  'screws',
] as const;
export type Section = (typeof SECTIONS)[number];

const FIELDS: Readonly<Record<Section, (textOf: TextOf) => readonly EditField[]>> = {
  circuit: circuitFields,
  gap: gapFields,
  vessel: vesselFields,
  first: (textOf) => capacitorFields('first', textOf),
  second: (textOf) => capacitorFields('second', textOf),
  channel: channelFields,
  charging: chargingFields,
  nodes: nodeFields,
  shorting: shortingFields,
  model: modelFields,
  envelope: envelopeFields,
  beam: beamFields,
  screws: screwFields,
};

/** The fields of a section that have a meaning as things stand. */
export function sectionFields(section: Section, textOf: TextOf): readonly EditField[] {
  return FIELDS[section](textOf);
}

export function allFields(textOf: TextOf): readonly EditField[] {
  return SECTIONS.flatMap((section) => sectionFields(section, textOf));
}

/** Where a field stands, so that a refusal can say where to go. Null for one that no section has. */
export function sectionOf(key: string): Section | null {
  if (key === 'topology') return 'circuit';
  if (key.startsWith('gap.vessel')) return 'vessel';
  if (key.startsWith('channel.screws') || key.startsWith('channel.feeler')) return 'screws';
  const [head = ''] = key.split('.');
  if (head === 'shorting_points') return 'shorting';
  return SECTIONS.find((section) => section === head) ?? null;
}

export function topologyOf(textOf: TextOf): RigSpec['topology'] {
  return textOf('topology') === 'charge-transfer' ? 'charge-transfer' : 'lc-inversion';
}

const TITLES: Readonly<Record<Exclude<Section, 'first' | 'second'>, string>> = {
  circuit: 'Circuit',
  gap: 'Spark gap',
  vessel: 'Vessel',
  channel: 'Laser channel',
  charging: 'Supply and charging',
  nodes: 'Charged nodes and bleeds',
  shorting: 'Shorting points',
  model: 'Model',
  envelope: 'Envelope',
  beam: 'Beam',
  screws: 'Screws and feelers',
};

/** As it stands over the section; the capacitors are called as their circuit calls them. */
export function sectionTitle(section: Section, textOf: TextOf): string {
  if (section !== 'first' && section !== 'second') return TITLES[section];
  const name = CAPACITOR_WORDS[topologyOf(textOf)][section];
  return `${name.charAt(0).toUpperCase()}${name.slice(1)}`;
}
