import type { Holder, KitItem, KitType } from '../bodies/kit-bodies';
import type { BodyOf } from '../kinds';
import type { EntryOf } from '../read-body';
import { getDoc, putDoc, type Effect } from './effect';
import { traceOf, type Standing, type Trace } from './trace';

type KitEventKind = 'kit.inspected' | 'kit.issued' | 'kit.returned';

export type KitEvent = Trace & {
  readonly irregular: string | null;
} & { readonly [K in KitEventKind]: { readonly kind: K; readonly body: BodyOf<K> } }[KitEventKind];

export interface KitDoc {
  readonly kind: 'kit';
  readonly id: string;
  readonly parent: null;
  readonly number: string;
  readonly name: string;
  readonly note: string;
  /** As it is now: spares with their count, cylinders with what the gauge last read. */
  readonly item: KitItem;
  readonly added: Trace;
  readonly due_ms: number | null;
  /** `failed`: did not pass, or came back damaged, and has not passed since. */
  readonly state: 'fit' | 'failed' | 'retired';
  readonly holder: Holder | null;
  /** The entry that gave it to the holder. */
  readonly held: Trace | null;
  readonly history: readonly KitEvent[];
}

/** What whoever has a piece of kit carries of it in their own document, so that readiness asks for nothing more. */
export interface KitNote {
  readonly kit: string;
  readonly type: KitType;
  readonly number: string;
  readonly name: string;
  readonly due_ms: number | null;
  readonly failed: boolean;
}

export function* foldKit(entry: EntryOf<'kit.added' | KitEventKind>, standing: Standing): Effect {
  const trace = traceOf(entry.meta, standing);
  if (entry.kind === 'kit.added') {
    if (entry.meta.subject === entry.meta.id) yield* putDoc(newKit(entry.body, trace));
    return;
  }
  const before = yield* getDoc('kit', entry.meta.subject);
  if (before === undefined) return;
  const event = { ...trace, irregular: standing.irregular, kind: entry.kind, body: entry.body } as KitEvent;
  const noted = { ...before, history: [...before.history, event] };
  // Irregular never eases anything (protocol 1.2); that a piece failed counts whoever says it.
  const counts = standing.irregular === null || isWorse(entry);
  const after = counts ? happened(noted, entry, trace) : noted;
  yield* putDoc(after);
  yield* tellHolders(before, after);
}

export function kitNote({ id, item, number, name, due_ms, state }: KitDoc): KitNote {
  return { kit: id, type: item.type, number, name, due_ms, failed: state === 'failed' };
}

function newKit(body: BodyOf<'kit.added'>, trace: Trace): KitDoc {
  const { number, name, note, item, due_ms } = body;
  return {
    kind: 'kit',
    id: trace.entry,
    parent: null,
    number,
    name,
    note,
    item,
    added: trace,
    due_ms,
    state: 'fit',
    holder: null,
    held: null,
    history: [],
  };
}

function isWorse(entry: EntryOf<KitEventKind>): boolean {
  if (entry.kind === 'kit.inspected') return entry.body.outcome === 'failed';
  return entry.kind === 'kit.returned' && entry.body.condition === 'damaged';
}

function happened(kit: KitDoc, entry: EntryOf<KitEventKind>, trace: Trace): KitDoc {
  switch (entry.kind) {
    case 'kit.inspected':
      return inspected(kit, entry.body);
    case 'kit.issued':
      if (kit.item.type === 'spare') return withCount(kit, kit.item.count - (entry.body.count ?? 1));
      return { ...kit, holder: entry.body.to, held: trace };
    case 'kit.returned': {
      if (kit.item.type === 'spare') return withCount(kit, kit.item.count + (entry.body.count ?? 1));
      const state = entry.body.condition === 'damaged' ? 'failed' : kit.state;
      return { ...kit, holder: null, held: null, state };
    }
  }
}

function inspected(kit: KitDoc, body: BodyOf<'kit.inspected'>): KitDoc {
  if (body.outcome === 'retired') return { ...kit, state: 'retired', holder: null, held: null };
  const found = withFindings(kit, body);
  if (body.outcome === 'failed') return { ...found, state: 'failed' };
  return { ...found, state: 'fit', due_ms: body.due_ms };
}

function withFindings(kit: KitDoc, { count, pressure_bar_g }: BodyOf<'kit.inspected'>): KitDoc {
  if (kit.item.type === 'spare' && count !== null) return withCount(kit, count);
  if (kit.item.type === 'cylinder' && pressure_bar_g !== null)
    return { ...kit, item: { ...kit.item, pressure_bar_g } };
  return kit;
}

function withCount(kit: KitDoc, count: number): KitDoc {
  return kit.item.type === 'spare' ? { ...kit, item: { ...kit.item, count: Math.max(0, count) } } : kit;
}

function* tellHolders(before: KitDoc, after: KitDoc): Effect {
  const moved = before.holder?.id !== after.holder?.id;
  if (moved && before.holder !== null) yield* carry(before.holder, without(before.id));
  if (after.holder !== null) {
    const note = kitNote(after);
    yield* carry(after.holder, (notes) => [...without(after.id)(notes), note]);
  }
}

type Change = (notes: readonly KitNote[]) => readonly KitNote[];

function without(kit: string): Change {
  return (notes) => notes.filter((note) => note.kit !== kit);
}

function* carry(holder: Holder, change: Change): Effect {
  if (holder.type === 'rig') {
    const rig = yield* getDoc('rig', holder.id);
    if (rig !== undefined) yield* putDoc({ ...rig, kit: change(rig.kit) });
    return;
  }
  const person = yield* getDoc('person', holder.id);
  if (person !== undefined) yield* putDoc({ ...person, kit: change(person.kit) });
}
