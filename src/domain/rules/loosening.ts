import type { RigSpec } from '../book/rig-spec';

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
/** What says how well a figure is known, what a thing is called, or where a feeler goes in: no permit leans on it. */
const HARMLESS = new Set([
  'gap.radius_known',
  'model.known',
  'model.gap_law.known',
  'model.channel_law.known',
  'channel.profile',
  'channel.feeler_a_mm',
  'channel.feeler_b_mm',
  'channel.feeler_error_mm',
]);
const HARMLESS_PARTS = [/^channel\.screws\.\d+\./, /^(first|second)\.(parts|catalogue)$/];
const PROTECTIONS = ['nodes', 'shorting_points', 'gap.vessel', 'beam.stop'];

/**
 * Every field that differs between two revisions, with what it means for the permit. Items of a list are held against
 * the one of the same name, so that taking the first out does not read as a change of all that follow.
 */
export function specChanges(before: RigSpec, after: RigSpec): readonly SpecChange[] {
  const old = flatten(before);
  const now = flatten(lined(before, after));
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
  const protectionGone = PROTECTIONS.some((one) => field.startsWith(one)) && after === null;
  return {
    field,
    before: plain(before),
    after: plain(after),
    safety: !HARMLESS.has(field) && !HARMLESS_PARTS.some((part) => part.test(field)),
    loosens: (rises && RISES_LOOSEN.has(field)) || protectionGone,
  };
}

function plain(leaf: Leaf): number | string | null {
  return typeof leaf === 'boolean' ? (leaf ? 'yes' : 'no') : leaf;
}

/** The later revision with its lists in the places of the earlier one; what was taken out leaves a hole. */
function lined(before: RigSpec, after: RigSpec): object {
  const screws = after.channel.screws;
  return {
    ...after,
    nodes: inPlaces(before.nodes, after.nodes, (node) => node.name),
    shorting_points: inPlaces(before.shorting_points, after.shorting_points, (point) => point),
    channel:
      screws === undefined
        ? after.channel
        : {
            ...after.channel,
            screws: inPlaces(before.channel.screws ?? [], screws, (screw) => screw.name),
          },
  };
}

/** Same name, same place; what is left over takes the free places in order, as a renamed item does. */
function inPlaces<T>(
  before: readonly T[],
  after: readonly T[],
  nameOf: (item: T) => string,
): readonly (T | undefined)[] {
  const left = [...after];
  const take = (name: string): T | undefined => {
    const at = left.findIndex((item) => nameOf(item) === name);
    return at < 0 ? undefined : left.splice(at, 1)[0];
  };
  const same = before.map((item) => take(nameOf(item)));
  return [...same.map((item) => item ?? left.shift()), ...left];
}

function flatten(spec: object): Map<string, Leaf> {
  const leaves = new Map<string, Leaf>();
  collect('', spec, leaves);
  return leaves;
}

function collect(prefix: string, value: Leaf | object | undefined, leaves: Map<string, Leaf>): void {
  if (value === undefined) return;
  if (value === null || typeof value !== 'object') {
    leaves.set(prefix, value);
    return;
  }
  for (const [key, inner] of Object.entries(value) as [string, Leaf | object | undefined][]) {
    collect(prefix === '' ? key : `${prefix}.${key}`, inner, leaves);
  }
}
