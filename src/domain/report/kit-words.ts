import type { KitItem, KitType } from '../book/bodies/kit-bodies';
import type { BodyOf } from '../book/kinds';
import type { EntryOf } from '../book/read-body';
import { formatQuantity } from '../units/format-quantity';
import { dayWords } from './time-words';

export const KIT_TYPE_WORDS: Readonly<Record<KitType, { readonly one: string; readonly many: string }>> = {
  eyewear: { one: 'eyewear', many: 'Eyewear' },
  'shorting-stick': { one: 'shorting stick', many: 'Shorting sticks' },
  meter: { one: 'probe or meter', many: 'Probes and meters' },
  'relief-valve': { one: 'relief valve', many: 'Relief valves' },
  regulator: { one: 'regulator', many: 'Regulators' },
  cylinder: { one: 'cylinder', many: 'Cylinders' },
  key: { one: 'key', many: 'Keys' },
  spare: { one: 'spare', many: 'Spares' },
};

export const PART_PLACE_WORDS: Readonly<Record<BodyOf<'part.fitted'>['place'], string>> = {
  'spark-gap': 'spark gap',
  first: 'first capacitor',
  second: 'second capacitor',
  channel: 'laser channel',
  charging: 'charging',
  bleed: 'bleed and shorting',
  gas: 'gas',
  beam: 'beam',
  other: 'elsewhere',
};

export const ARC_WORDS: Readonly<Record<BodyOf<'alignment.arc-seen'>['where'], string>> = {
  even: 'even, no arcs',
  'a-end': 'arcs at the A end',
  mid: 'arcs in the middle',
  'b-end': 'arcs at the B end',
  'both-ends': 'arcs at both ends',
};

/** The figures of a piece of kit in one line; densities and limits as they are marked. */
export function itemWords(item: KitItem): string {
  switch (item.type) {
    case 'eyewear':
      return item.densities.map(densityWords).join(', ');
    case 'shorting-stick':
      return joined([
        item.resistor_kohm === null ? 'resistor not known' : figure(item.resistor_kohm, 'kΩ'),
        item.rated_kV === null ? null : `to ${figure(item.rated_kV, 'kV')}`,
      ]);
    case 'meter':
      return joined([item.measures, item.rated_kV === null ? null : `to ${figure(item.rated_kV, 'kV')}`]);
    case 'relief-valve':
      return `opens at ${figure(item.set_bar_g, 'bar(g)')}`;
    case 'regulator':
      return `${item.gas}, at most ${figure(item.max_bar_g, 'bar(g)')}`;
    case 'cylinder':
      return `${item.gas}, ${figure(item.water_L, 'L')}, ${figure(item.pressure_bar_g, 'bar(g)')}`;
    case 'key':
      return `opens ${item.opens}`;
    case 'spare':
      return `${figure(item.count, '')} there, at least ${figure(item.minimum, '')}`;
  }
}

/** "OD 6 at 190 to 375 nm". */
export function densityWords(line: {
  readonly from_nm: number;
  readonly to_nm: number;
  readonly density: number;
}): string {
  return `OD ${figure(line.density, '')} at ${figure(line.from_nm, '')} to ${figure(line.to_nm, 'nm')}`;
}

export function partWords({ what, place, where }: BodyOf<'part.fitted'>): string {
  return joined([what, where === '' ? PART_PLACE_WORDS[place] : where]);
}

export function kitWords(
  entry: EntryOf<'kit.added' | 'kit.inspected' | 'kit.issued' | 'kit.returned'>,
  zone: string,
): string {
  switch (entry.kind) {
    case 'kit.added':
      return `${entry.body.number}, ${entry.body.name}`;
    case 'kit.inspected': {
      const { outcome, due_ms, words } = entry.body;
      const next = due_ms === null || outcome !== 'passed' ? null : `next ${dayWords(due_ms, zone)}`;
      return joined([OUTCOME_WORDS[outcome], next, words]);
    }
    case 'kit.issued':
      return joined([counted(entry.body.count, 'taken') ?? `to a ${entry.body.to.type}`, entry.body.words]);
    case 'kit.returned':
      return joined([
        counted(entry.body.count, 'came back'),
        entry.body.condition === 'damaged' ? 'damaged' : null,
        entry.body.words,
      ]);
  }
}

export const OUTCOME_WORDS: Readonly<Record<BodyOf<'kit.inspected'>['outcome'], string>> = {
  passed: 'passed',
  failed: 'did not pass',
  retired: 'taken out of the register',
};

export function alignmentWords(
  entry: EntryOf<'alignment.measured' | 'alignment.adjusted' | 'alignment.arc-seen'>,
): string {
  switch (entry.kind) {
    case 'alignment.measured':
      return `A ${gap(entry.body.gap_a_mm)}, B ${gap(entry.body.gap_b_mm)}`;
    case 'alignment.adjusted':
      return entry.body.turns.map(turnWords).join(', ');
    case 'alignment.arc-seen':
      return ARC_WORDS[entry.body.where];
  }
}

/** "Screw A: 3/8 clockwise", "Screw B: leave". */
export function turnWords(turn: { readonly screw: string; readonly eighths_clockwise: number }): string {
  const { screw, eighths_clockwise } = turn;
  if (eighths_clockwise === 0) return `${screw}: leave`;
  const way = eighths_clockwise > 0 ? 'clockwise' : 'anticlockwise';
  return `${screw}: ${eighthsWords(Math.abs(eighths_clockwise))} ${way}`;
}

/** Turns in eighths as people say them: "1 3/8", "1/2", "2". */
export function eighthsWords(eighths: number): string {
  const whole = Math.floor(eighths / 8);
  const rest = eighths % 8;
  if (rest === 0) return `${whole}`;
  const by = rest % 4 === 0 ? 4 : rest % 2 === 0 ? 2 : 1;
  const part = `${rest / by}/${8 / by}`;
  return whole === 0 ? part : `${whole} ${part}`;
}

function counted(count: number | null, what: string): string | null {
  return count === null ? null : `${figure(count, '')} ${what}`;
}

function gap(value_mm: number): string {
  return formatQuantity(value_mm, 'mm', { digits: { decimals: 2 }, rounding: 'nearest' });
}

function figure(value: number, unit: string): string {
  const decimals = Math.min(6, `${value}`.split('.')[1]?.length ?? 0);
  return formatQuantity(value, unit, { digits: { decimals }, rounding: 'nearest' });
}

function joined(parts: readonly (string | null)[]): string {
  return parts.filter((part) => part !== null && part !== '').join(', ');
}
