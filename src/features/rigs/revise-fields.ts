import type { RigSpec } from '../../domain/book/rig-spec';
import { specFieldWords } from '../../domain/report/spec-words';
import type { NumberRule } from '../../domain/units/check-number';

/** What stands together on the screen, so that nothing hides below its edge. */
export type ReviseGroup = 'gap' | 'envelope' | 'charging';

/** A number of a rig that can be revised by keypad. */
export interface ReviseField {
  /** Path in the spec, as `specChanges` names it. */
  readonly key: string;
  readonly label: string;
  /** For the narrow row: two short lines in place of the label. */
  readonly short: string;
  readonly about: string;
  readonly group: ReviseGroup;
  readonly unit: string;
  readonly step: number;
  readonly allowMinus: boolean;
  /** An emptied field then means "not known". */
  readonly mayBeUnknown: boolean;
  readonly rule: NumberRule;
  readonly read: (spec: RigSpec) => number | null;
  readonly write: (spec: RigSpec, value: number | null) => RigSpec;
}

interface Numeric {
  readonly group: ReviseGroup;
  readonly short: string;
  readonly about: string;
  readonly step: number;
  readonly min: number;
  readonly max: number;
  readonly read: (spec: RigSpec) => number;
  readonly write: (spec: RigSpec, value: number) => RigSpec;
}

const NUMBERS: Readonly<Record<string, Numeric>> = {
  'gap.gap_mm': {
    group: 'gap',
    short: 'Gap',
    about: '',
    step: 0.1,
    min: 0.01,
    max: 500,
    read: (spec) => spec.gap.gap_mm,
    write: (spec, gap_mm) => ({ ...spec, gap: { ...spec.gap, gap_mm } }),
  },
  'gap.highest_bar_g': {
    group: 'gap',
    short: 'Works up to',
    about: '',
    step: 0.05,
    min: -1.1,
    max: 20,
    read: (spec) => spec.gap.highest_bar_g,
    write: (spec, highest_bar_g) => ({ ...spec, gap: { ...spec.gap, highest_bar_g } }),
  },
  'envelope.max_kV': {
    group: 'envelope',
    short: 'Envelope',
    about: 'voltage',
    step: 0.5,
    min: 0.1,
    max: 200,
    read: (spec) => spec.envelope.max_kV,
    write: (spec, max_kV) => ({ ...spec, envelope: { ...spec.envelope, max_kV } }),
  },
  'envelope.max_bar_g': {
    group: 'envelope',
    short: 'Envelope',
    about: 'pressure',
    step: 0.05,
    min: -1.1,
    max: 20,
    read: (spec) => spec.envelope.max_bar_g,
    write: (spec, max_bar_g) => ({ ...spec, envelope: { ...spec.envelope, max_bar_g } }),
  },
  'envelope.max_rate_Hz': {
    group: 'envelope',
    short: 'Envelope',
    about: 'rate',
    step: 0.5,
    min: 0.001,
    max: 1000,
    read: (spec) => spec.envelope.max_rate_Hz,
    write: (spec, max_rate_Hz) => ({ ...spec, envelope: { ...spec.envelope, max_rate_Hz } }),
  },
  'charging.supply_kV': {
    group: 'charging',
    short: 'Supply',
    about: 'voltage',
    step: 0.5,
    min: 0.1,
    max: 200,
    read: (spec) => spec.charging.supply_kV,
    write: (spec, supply_kV) => ({ ...spec, charging: { ...spec.charging, supply_kV } }),
  },
  'charging.supply_mA': {
    group: 'charging',
    short: 'Supply',
    about: 'current',
    step: 0.1,
    min: 0.001,
    max: 10_000,
    read: (spec) => spec.charging.supply_mA,
    write: (spec, supply_mA) => ({ ...spec, charging: { ...spec.charging, supply_mA } }),
  },
};

/** What this version revises, in the order of the screen; the bleeds follow the rig's own nodes. */
export function reviseFields(spec: RigSpec): readonly ReviseField[] {
  const numbers = Object.entries(NUMBERS).map(([key, one]): ReviseField => {
    const { label, unit } = labelled(key, spec);
    return {
      key,
      label,
      short: one.short,
      about: one.about,
      group: one.group,
      unit,
      step: one.step,
      allowMinus: one.min < 0,
      mayBeUnknown: false,
      rule: { field: key, name: label, unit, min: one.min, max: one.max },
      read: one.read,
      write: (before, value) => (value === null ? before : one.write(before, value)),
    };
  });
  return [...numbers, ...spec.nodes.map((_, i) => bleedField(spec, i))];
}

/** "Supply" alone names two fields: here they stand beside each other. */
function labelled(key: string, spec: RigSpec) {
  const { label, unit } = specFieldWords(key, spec.topology);
  return { label: label === 'Supply' ? (unit === 'kV' ? 'Supply voltage' : 'Supply current') : label, unit };
}

function bleedField(spec: RigSpec, at: number): ReviseField {
  const key = `nodes.${at}.bleed_Mohm`;
  const label = `Bleed, ${spec.nodes[at]?.name ?? `node ${at + 1}`}`;
  const bleed = spec.nodes[at]?.bleed_Mohm ?? 100;
  return {
    key,
    label,
    short: 'Bleed',
    about: spec.nodes[at]?.name ?? '',
    group: 'charging',
    unit: 'MΩ',
    step: bleed < 1 ? 0.01 : 10,
    allowMinus: false,
    mayBeUnknown: true,
    rule: { field: key, name: label, unit: 'MΩ', min: 0.001, max: 1_000_000 },
    read: (one) => one.nodes[at]?.bleed_Mohm ?? null,
    write: (before, bleed_Mohm) => ({
      ...before,
      nodes: before.nodes.map((node, i) => (i === at ? { ...node, bleed_Mohm } : node)),
    }),
  };
}
