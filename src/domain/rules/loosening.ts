import type { CapacitorSpec, RigSpec } from '../book/rig-spec';

export interface SpecChange {
  readonly field: string;
  readonly before: number | string | null;
  readonly after: number | string | null;
  /** Touches what a permit was granted on. */
  readonly safety: boolean;
  /** Raises a limit or takes a protection away. */
  readonly loosens: boolean;
}

type Leaf = number | string | boolean | null;
const RISES_LOOSEN = new Set([
  'envelope.max_kV',
  'envelope.max_bar_g',
  'envelope.max_rate_Hz',
  'gap.highest_bar_g',
  'gap.vessel.rated_bar_g',
  'gap.vessel.relief_bar_g',
  'gap.vessel.regulator_max_bar_g',
  'charging.supply_kV',
  'charging.supply_mA',
  'first.rated_kV',
  'second.rated_kV',
  'first.strength_kV_mm',
  'second.strength_kV_mm',
]);
const HARMLESS = new Set(['beam.pulse_energy_uJ', 'model.known', 'gap.radius_known']);

/** Every field that differs between two revisions, with what it means for the permit. */
export function specChanges(before: RigSpec, after: RigSpec): readonly SpecChange[] {
  const old = flatten(before);
  const now = flatten(after);
  const fields = [...new Set([...old.keys(), ...now.keys()])];
  return fields.flatMap((field) => {
    const was = old.get(field) ?? null;
    const is = now.get(field) ?? null;
    return was === is ? [] : [change(field, was, is)];
  });
}

/** A revision that raises a limit or removes a protection needs its author's own session (protocol 1.2). */
export function isLoosening(before: RigSpec, after: RigSpec): boolean {
  return specChanges(before, after).some((one) => one.loosens);
}

function change(field: string, before: Leaf, after: Leaf): SpecChange {
  const rises = typeof before === 'number' && typeof after === 'number' && after > before;
  const protectionGone =
    (field.startsWith('nodes') || field.startsWith('shorting_points') || field.startsWith('gap.vessel')) &&
    after === null;
  return {
    field,
    before: plain(before),
    after: plain(after),
    safety: !HARMLESS.has(field),
    loosens: (rises && RISES_LOOSEN.has(field)) || protectionGone,
  };
}

function plain(leaf: Leaf): number | string | null {
  return typeof leaf === 'boolean' ? (leaf ? 'yes' : 'no') : leaf;
}

function flatten(spec: RigSpec): Map<string, Leaf> {
  const leaves = new Map<string, Leaf>();
  collect('', spec, leaves);
  return leaves;
}

function collect(
  prefix: string,
  value: RigSpec | CapacitorSpec | Leaf | object,
  leaves: Map<string, Leaf>,
): void {
  if (value === null || typeof value !== 'object') {
    leaves.set(prefix, value);
    return;
  }
  for (const [key, inner] of Object.entries(value) as [string, Leaf | object][]) {
    collect(prefix === '' ? key : `${prefix}.${key}`, inner, leaves);
  }
}
