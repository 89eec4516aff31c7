import { readFigures, type FigureSpec, type FigureTexts } from '../../components/figure-form';
import type { KitItem, KitType } from '../../domain/book/bodies/kit-bodies';
import type { BodyOf } from '../../domain/book/kinds';
import { dueSpecs, readDue, type DueHow } from './due-entry';

type Gas = Extract<KitItem, { type: 'cylinder' }>['gas'];

export interface KitDraft {
  readonly type: KitType;
  readonly number: string;
  readonly name: string;
  readonly texts: FigureTexts;
  /** What a meter measures, or what a key opens. */
  readonly about: string;
  readonly gas: Gas;
  readonly due: DueHow;
  readonly note: string;
}

export const EMPTY_KIT: KitDraft = {
  type: 'eyewear',
  number: '',
  name: '',
  texts: {},
  about: '',
  gas: 'N2',
  due: 'months',
  note: '',
};

export const GASES: readonly Gas[] = ['N2', 'air', 'CO2', 'SF6', 'H2', 'O2', 'Ar', 'Ne', 'He'];

/** Lines of a lens's marking that the form takes; further ones go into a second entry of the note. */
const LINES = [1, 2, 3] as const;

interface Shape {
  readonly label: string;
  readonly unit: string;
  readonly step: number;
  readonly min: number;
  readonly max: number;
  readonly whenEmpty?: string;
  readonly initial?: string;
}

const SHAPES: Readonly<Record<string, Shape>> = {
  visible: { label: 'Lets through', unit: '% visible', step: 5, min: 0, max: 100, whenEmpty: 'not known' },
  resistor: { label: 'Resistor', unit: 'kΩ', step: 1, min: 0.001, max: 1e6, whenEmpty: 'not known' },
  rated: { label: 'Rated for', unit: 'kV', step: 5, min: 0.1, max: 200, whenEmpty: 'not known' },
  set: { label: 'Opens at', unit: 'bar(g)', step: 0.1, min: 0, max: 20 },
  most: { label: 'At most', unit: 'bar(g)', step: 0.5, min: 0, max: 20 },
  water: { label: 'Water volume', unit: 'L', step: 1, min: 0.1, max: 1000 },
  pressure: { label: 'Gauge reads', unit: 'bar(g)', step: 5, min: 0, max: 400 },
  count: { label: 'There are', unit: '', step: 1, min: 0, max: 100_000 },
  minimum: { label: 'At least', unit: '', step: 1, min: 0, max: 100_000, initial: '1' },
};

const BY_TYPE: Readonly<Record<KitType, readonly string[]>> = {
  eyewear: ['visible'],
  'shorting-stick': ['resistor', 'rated'],
  meter: ['rated'],
  'relief-valve': ['set'],
  regulator: ['most'],
  cylinder: ['water', 'pressure'],
  key: [],
  spare: ['count', 'minimum'],
};

/** Figures that a kind of kit has, in the order of the screen; the next date last. */
export function kitSpecs(type: KitType, due: DueHow): readonly FigureSpec[] {
  const lines = type === 'eyewear' ? LINES.flatMap(lineSpecs) : [];
  return [...lines, ...BY_TYPE[type].map(plainSpec), ...dueSpecs(due)];
}

export function plainSpec(key: string): FigureSpec {
  const shape = SHAPES[key];
  if (shape === undefined) throw new Error(`no figure ${key}`);
  const { label, unit, step, min, max, whenEmpty, initial = '' } = shape;
  return {
    key,
    label,
    unit,
    step,
    rule: { field: key, name: label, unit, min, max },
    initial,
    ...(whenEmpty === undefined ? {} : { whenEmpty }),
  };
}

function lineSpecs(no: number): readonly FigureSpec[] {
  const more = no === 1 ? {} : { whenEmpty: 'no further line' };
  const spec = (key: string, label: string, shape: Shape): FigureSpec => ({
    key: `${key}${no}`,
    label: `${label}, line ${no}`,
    unit: shape.unit,
    step: shape.step,
    rule: {
      field: `${key}${no}`,
      name: `${label}, line ${no}`,
      unit: shape.unit,
      min: shape.min,
      max: shape.max,
    },
    initial: '',
    ...more,
  });
  const nm = { label: '', unit: 'nm', step: 5, min: 100, max: 20_000 };
  return [
    spec('density', 'Density', { ...nm, unit: 'OD', step: 1, min: 0, max: 12 }),
    spec('from', 'From', nm),
    spec('to', 'To', nm),
  ];
}

export type KitRead =
  | { readonly type: 'ready'; readonly body: BodyOf<'kit.added'> }
  | { readonly type: 'refused'; readonly words: string };

interface Context {
  readonly now_ms: number;
  readonly zone: string;
  /** Numbers that the register has already. */
  readonly taken: readonly string[];
}

/** What would be written, or the first thing that is missing. */
export function readKit(draft: KitDraft, context: Context): KitRead {
  const number = draft.number.trim();
  const name = draft.name.trim();
  if (number === '') return refuse('Number: as it is marked on the piece.');
  if (context.taken.includes(number)) return refuse(`Number: ${number} is in the register already.`);
  if (name === '') return refuse('Name: say what it is.');
  const { values, refusal } = readFigures(kitSpecs(draft.type, draft.due), draft.texts);
  if (refusal !== null) return refuse(refusal);
  const item = itemOf(draft, values);
  if (typeof item === 'string') return refuse(item);
  const due = readDue(draft.due, draft.texts, context);
  if (due.type === 'refused') return due;
  return {
    type: 'ready',
    body: { number: cut(number), name: cut(name), item, due_ms: due.due_ms, note: draft.note.trim() },
  };
}

function itemOf(draft: KitDraft, values: Readonly<Record<string, number | null>>): KitItem | string {
  const value = (key: string): number => values[key] ?? 0;
  const known = (key: string): number | null => values[key] ?? null;
  const { type } = draft;
  switch (type) {
    case 'eyewear':
      return eyewear(values);
    case 'shorting-stick':
      return { type, resistor_kohm: known('resistor'), rated_kV: known('rated') };
    case 'meter':
      return named(draft.about, 'Measures: say what.', (measures) => ({
        type,
        measures,
        rated_kV: known('rated'),
      }));
    case 'relief-valve':
      return { type, set_bar_g: value('set') };
    case 'regulator':
      return { type, gas: draft.gas, max_bar_g: value('most') };
    case 'cylinder':
      return { type, gas: draft.gas, water_L: value('water'), pressure_bar_g: value('pressure') };
    case 'key':
      return named(draft.about, 'Opens: say what.', (opens) => ({ type, opens }));
    case 'spare': {
      const [count, minimum] = [value('count'), value('minimum')];
      if (!Number.isInteger(count) || !Number.isInteger(minimum)) return 'Spares: whole numbers.';
      return { type, count, minimum, catalogue: null };
    }
  }
}

function eyewear(values: Readonly<Record<string, number | null>>): KitItem | string {
  const densities = [];
  for (const no of LINES) {
    const [density, from_nm, to_nm] = ['density', 'from', 'to'].map((key) => values[`${key}${no}`] ?? null);
    if (density === null && from_nm === null && to_nm === null) continue;
    if (!isGiven(density) || !isGiven(from_nm) || !isGiven(to_nm))
      return `Line ${no}: density and both wavelengths, or none of them.`;
    if (from_nm > to_nm) return `Line ${no}: from the shorter to the longer wavelength.`;
    densities.push({ from_nm, to_nm, density });
  }
  return { type: 'eyewear', densities, visible_transmission_pct: values['visible'] ?? null };
}

function isGiven(value: number | null | undefined): value is number {
  return value !== null && value !== undefined;
}

function named(words: string, refusal: string, make: (words: string) => KitItem): KitItem | string {
  const plain = words.trim();
  return plain === '' ? refusal : make(cut(plain));
}

function cut(text: string): string {
  return text.slice(0, 120);
}

function refuse(words: string): KitRead {
  return { type: 'refused', words };
}
