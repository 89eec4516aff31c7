import { readFigure, type FigureSpec, type FigureTexts } from '../../components/figure-form';
import type { Holder } from '../../domain/book/bodies/kit-bodies';
import type { KitDoc } from '../../domain/book/documents/kit';
import type { BodyOf } from '../../domain/book/kinds';
import { dueSpecs, readDue, type DueHow } from './due-entry';
import { plainSpec } from './kit-form';

export type Deed = 'inspect' | 'issue' | 'return';

export interface DeedDraft {
  readonly deed: Deed | null;
  readonly outcome: BodyOf<'kit.inspected'>['outcome'] | null;
  readonly due: DueHow;
  readonly to: Holder | null;
  readonly condition: BodyOf<'kit.returned'>['condition'] | null;
  readonly texts: FigureTexts;
  readonly words: string;
}

export const EMPTY_DEED: DeedDraft = {
  deed: null,
  outcome: null,
  due: 'months',
  to: null,
  condition: null,
  texts: {},
  words: '',
};

/** What may be done with it as it stands. A spare is taken and comes back by the piece. */
export function deedsOf(kit: KitDoc): readonly { readonly value: Deed; readonly label: string }[] {
  const spare = kit.item.type === 'spare';
  return [
    { value: 'issue', label: spare ? 'Take' : 'Issue' },
    ...(spare || kit.holder !== null ? [{ value: 'return' as const, label: 'Return' }] : []),
    { value: 'inspect', label: spare ? 'Count' : 'Inspect' },
  ];
}

/** The deed that comes up by itself: what is out comes back, everything else is handed out. */
export function deedOf(kit: KitDoc, draft: DeedDraft): Deed {
  const open = deedsOf(kit).map(({ value }) => value);
  if (draft.deed !== null && open.includes(draft.deed)) return draft.deed;
  return kit.holder === null ? 'issue' : 'return';
}

export function deedSpecs(kit: KitDoc, draft: DeedDraft): readonly FigureSpec[] {
  const { type } = kit.item;
  const deed = deedOf(kit, draft);
  if (deed !== 'inspect') return type === 'spare' ? [pieces(deed)] : [];
  const found =
    type === 'spare'
      ? [{ ...plainSpec('count'), initial: String(kit.item.count), source: 'as the Book has it' }]
      : type === 'cylinder'
        ? [{ ...plainSpec('pressure'), initial: String(kit.item.pressure_bar_g), source: 'as last read' }]
        : [];
  const passes = type !== 'spare' && (draft.outcome === 'passed' || draft.outcome === null);
  return [...found, ...(passes ? dueSpecs(draft.due) : [])];
}

function pieces(deed: Deed): FigureSpec {
  const label = deed === 'issue' ? 'Taken' : 'Came back';
  const rule = { field: 'pieces', name: label, unit: '', min: 1, max: 100_000 };
  return { key: 'pieces', label, unit: '', step: 1, rule, initial: '1' };
}

export type DeedEntry =
  | { readonly kind: 'kit.inspected'; readonly body: BodyOf<'kit.inspected'> }
  | { readonly kind: 'kit.issued'; readonly body: BodyOf<'kit.issued'> }
  | { readonly kind: 'kit.returned'; readonly body: BodyOf<'kit.returned'> };

export type DeedRead =
  | { readonly type: 'ready'; readonly entry: DeedEntry }
  | { readonly type: 'refused'; readonly words: string };

interface Context {
  readonly now_ms: number;
  readonly zone: string;
  /** Who takes spares, where nobody else is named. */
  readonly self: string | null;
}

export function readDeed(kit: KitDoc, draft: DeedDraft, context: Context): DeedRead {
  switch (deedOf(kit, draft)) {
    case 'inspect':
      return readInspection(kit, draft, context);
    case 'issue':
      return readIssue(kit, draft, context);
    case 'return':
      return readReturn(kit, draft);
  }
}

function readInspection(kit: KitDoc, draft: DeedDraft, context: Context): DeedRead {
  const spare = kit.item.type === 'spare';
  const outcome = draft.outcome ?? (spare ? 'passed' : null);
  if (outcome === null) return refuse('Say whether it passed.');
  const words = draft.words.trim();
  if (outcome !== 'passed' && words === '') return refuse('Say why, in words.');
  const found: Record<string, number> = {};
  for (const spec of deedSpecs(kit, draft)) {
    const read = readFigure(spec, draft.texts);
    if (read.type === 'refused') return read;
    if (read.type === 'value') found[spec.key] = read.value;
  }
  const count = found['count'] ?? null;
  if (count !== null && !Number.isInteger(count)) return refuse('There are: a whole number.');
  const due = readDue(spare || outcome !== 'passed' ? 'none' : draft.due, draft.texts, context);
  if (due.type === 'refused') return due;
  const body = { outcome, due_ms: due.due_ms, count, pressure_bar_g: found['pressure'] ?? null, words };
  return { type: 'ready', entry: { kind: 'kit.inspected', body } };
}

function readIssue(kit: KitDoc, draft: DeedDraft, { self }: Context): DeedRead {
  const spare = kit.item.type === 'spare';
  const to = draft.to ?? (spare && self !== null ? { type: 'person' as const, id: self } : null);
  if (to === null) return refuse('Say who gets it.');
  if (!spare && kit.holder?.id === to.id) return refuse('They have it already.');
  const count = spare ? readPieces(draft, 'issue') : null;
  if (typeof count === 'string') return refuse(count);
  const body = { to, count, words: draft.words.trim() };
  return { type: 'ready', entry: { kind: 'kit.issued', body } };
}

function readReturn(kit: KitDoc, draft: DeedDraft): DeedRead {
  if (draft.condition === null) return refuse('Say in which condition it came back.');
  const words = draft.words.trim();
  if (draft.condition === 'damaged' && words === '') return refuse('Say what is damaged.');
  const count = kit.item.type === 'spare' ? readPieces(draft, 'return') : null;
  if (typeof count === 'string') return refuse(count);
  return {
    type: 'ready',
    entry: { kind: 'kit.returned', body: { condition: draft.condition, count, words } },
  };
}

function readPieces(draft: DeedDraft, deed: Deed): number | string {
  const read = readFigure(pieces(deed), draft.texts);
  if (read.type === 'refused') return read.words;
  const value = read.type === 'value' ? read.value : 1;
  return Number.isInteger(value) ? value : 'A whole number of pieces.';
}

function refuse(words: string): DeedRead {
  return { type: 'refused', words };
}
