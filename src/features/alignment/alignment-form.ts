import { readFigures, type FigureSpec, type FigureTexts } from '../../components/figure-form';
import type { ARC_PLACES } from '../../domain/book/bodies/alignment-bodies';
import type { AlignmentSetting } from './alignment-setting';

export type ArcPlace = (typeof ARC_PLACES)[number];
export type Mode = 'gaps' | 'turns' | 'arcs';

export interface AlignmentDraft {
  /** Null: what comes next by itself. */
  readonly mode: Mode | null;
  readonly texts: FigureTexts;
  readonly arcs: ArcPlace | null;
}

export const EMPTY_ALIGNMENT: AlignmentDraft = { mode: null, texts: {}, arcs: null };

/** Figures that go on from one measurement to the next. */
const KEPT: ReadonlySet<string> = new Set(['target', 'feeler']);

/** After something was logged: what belonged to it is empty again. */
export function afterLogging({ texts }: AlignmentDraft): AlignmentDraft {
  return {
    ...EMPTY_ALIGNMENT,
    texts: Object.fromEntries(Object.entries(texts).filter(([key]) => KEPT.has(key))),
  };
}

const MM = { unit: 'mm', step: 0.01 } as const;
const GAP = { unit: 'mm', min: 0.01, max: 100 } as const;

export function targetSpec(setting: AlignmentSetting): FigureSpec {
  return {
    ...MM,
    key: 'target',
    label: 'Target',
    rule: { ...GAP, field: 'target', name: 'Target' },
    initial: String(setting.target_mm),
    source: 'rig, mean',
  };
}

export function feelerSpec(setting: AlignmentSetting): FigureSpec {
  return {
    key: 'feeler',
    label: 'Feeler error',
    short: 'Feeler',
    unit: 'mm',
    step: 0.005,
    rule: { field: 'feeler', name: 'Feeler error', unit: 'mm', min: 0.001, max: 1 },
    initial: String(setting.feeler_mm),
    source: setting.feeler_assumed ? 'assumed' : 'rig',
  };
}

export function gapSpecs(setting: AlignmentSetting): readonly FigureSpec[] {
  const gap = (key: 'a' | 'b', place_mm: number): FigureSpec => {
    const end = key.toUpperCase();
    return {
      ...MM,
      key,
      label: `Gap at ${end}`,
      rule: { ...GAP, field: key, name: `Gap at ${end}` },
      initial: '',
      source: `feeler at ${place_mm}\u2009mm`,
    };
  };
  return [
    gap('a', setting.place_a_mm),
    gap('b', setting.place_b_mm),
    feelerSpec(setting),
    targetSpec(setting),
  ];
}

/** What was really turned; the recommendation stands there until somebody says otherwise. */
export function turnSpecs(
  setting: AlignmentSetting,
  recommended: readonly [number, number] | null,
): readonly FigureSpec[] {
  if (setting.screws === null) return [];
  return setting.screws.map((screw, at) => ({
    key: `turn${at}`,
    label: `${screw.name}, clockwise`,
    short: screw.name,
    unit: 'eighths',
    step: 1,
    rule: { field: `turn${at}`, name: screw.name, unit: 'eighths', min: -800, max: 800 },
    initial: String(recommended?.[at] ?? 0),
    source: recommended === null ? 'not turned' : 'as advised',
  }));
}

export const ARC_SPECS: readonly FigureSpec[] = [
  {
    key: 'shots',
    label: 'Shots looked at',
    unit: 'shots',
    step: 10,
    rule: { field: 'shots', name: 'Shots looked at', unit: '', min: 1, max: 10_000_000 },
    initial: '',
    whenEmpty: 'not counted',
  },
];

/** Turns in whole eighths, or the refusal in words. */
export function readTurns(
  specs: readonly FigureSpec[],
  texts: FigureTexts,
): readonly [number, number] | string {
  const { values, refusal } = readFigures(specs, texts);
  if (refusal !== null) return refusal;
  const [first, second] = [values['turn0'] ?? 0, values['turn1'] ?? 0];
  if (!Number.isInteger(first) || !Number.isInteger(second)) return 'Turns: whole eighths.';
  return first === 0 && second === 0 ? 'No screw was turned.' : [first, second];
}

/** The parts of the channel where arcs are drawn. */
export function arcParts(arcs: ArcPlace | null): readonly ('a' | 'mid' | 'b')[] {
  switch (arcs) {
    case 'a-end':
      return ['a'];
    case 'mid':
      return ['mid'];
    case 'b-end':
      return ['b'];
    case 'both-ends':
      return ['a', 'b'];
    default:
      return [];
  }
}

/** What a tap on a part of the channel makes of where arcs sit: both ends together, the middle alone. */
export function tapArc(arcs: ArcPlace | null, part: 'a' | 'mid' | 'b'): ArcPlace | null {
  if (part === 'mid') return arcs === 'mid' ? null : 'mid';
  const now = new Set(arcParts(arcs));
  now.delete('mid');
  if (now.has(part)) now.delete(part);
  else now.add(part);
  if (now.size === 2) return 'both-ends';
  if (now.has('a')) return 'a-end';
  return now.has('b') ? 'b-end' : null;
}
