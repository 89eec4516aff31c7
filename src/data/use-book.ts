import { useMemo, useSyncExternalStore } from 'react';
import type { About } from '../domain/book/bodies/note-bodies';
import type { AlignmentDoc } from '../domain/book/documents/alignment';
import type { CheckDoc } from '../domain/book/documents/check';
import type { DocKind, DocOf } from '../domain/book/documents/document';
import type { FiringDoc } from '../domain/book/documents/firing';
import type { HeldDoc } from '../domain/book/documents/held';
import type { IncidentDoc } from '../domain/book/documents/incident';
import type { KitDoc } from '../domain/book/documents/kit';
import type { LabDoc } from '../domain/book/documents/lab';
import type { LookupDoc } from '../domain/book/documents/lookup';
import type { NoteDoc, PhotoDoc, TraceDoc } from '../domain/book/documents/note';
import type { PartDoc } from '../domain/book/documents/part';
import type { PersonDoc } from '../domain/book/documents/person';
import type { ReadingDoc } from '../domain/book/documents/reading';
import type { Guest, RigDoc } from '../domain/book/documents/rig';
import type { SheetDoc } from '../domain/book/documents/sheet';
import type { Trace } from '../domain/book/documents/trace';
import { listenToNothing, useMaybeLab } from './client-context';
import { entriesWords } from './handover/handover-status';
import type { Children } from './view/document-cache';
import type { EntryState, OwnEntry } from './view/entry-states';

const NONE: readonly never[] = [];
const NOTHING = { state: 'loading', documents: NONE } as const;

export function useRigs(): readonly RigDoc[] {
  const rigs = useList('rig');
  return useMemo(() => rigs.toSorted((a, b) => a.name.localeCompare(b.name)), [rigs]);
}

export function useRig(id: string): RigDoc | undefined {
  return useDoc('rig', id);
}

/** Newest first. */
export function useFirings(rig: string): readonly FiringDoc[] {
  const { documents } = useChildren('firing', rig);
  return useMemo(() => documents.toSorted((a, b) => newestFirst(a.opened, b.opened)), [documents]);
}

export function useFiring(id: string): FiringDoc | undefined {
  return useDoc('firing', id);
}

export interface Readings {
  readonly state: 'loading' | 'ready';
  readonly readings: readonly ReadingDoc[];
}

export function useReadings(firing: string): Readings {
  const { state, documents } = useChildren('reading', firing);
  return useMemo(() => ({ state, readings: documents.toSorted((a, b) => a.no - b.no) }), [state, documents]);
}

/** Sheets that a new check may be opened on. */
export function useSheets(): readonly SheetDoc[] {
  const sheets = useList('sheet');
  return useMemo(
    () =>
      sheets
        .filter((sheet) => sheet.retired === null)
        .sort((a, b) => a.spec.title.localeCompare(b.spec.title)),
    [sheets],
  );
}

export function useSheet(id: string): SheetDoc | undefined {
  return useDoc('sheet', id);
}

/** Newest first. */
export function useChecks(rig: string): readonly CheckDoc[] {
  const { documents } = useChildren('check', rig);
  return useMemo(() => documents.toSorted((a, b) => newestFirst(a.opened, b.opened)), [documents]);
}

export function useCheck(id: string): CheckDoc | undefined {
  return useDoc('check', id);
}

export function useIncidents(rig: string): readonly IncidentDoc[] {
  const { documents } = useChildren('incident', rig);
  return useMemo(() => documents.toSorted((a, b) => newestFirst(a.reported, b.reported)), [documents]);
}

export function useLookups(rig: string): readonly LookupDoc[] {
  const { documents } = useChildren('lookup', rig);
  return useMemo(() => documents.toSorted((a, b) => newestFirst(a.trace, b.trace)), [documents]);
}

/** The register without what was taken out of it, by number. */
export function useKit(): readonly KitDoc[] {
  const kit = useList('kit');
  return useMemo(
    () =>
      kit
        .filter((one) => one.state !== 'retired')
        .sort((a, b) => a.number.localeCompare(b.number, 'en', { numeric: true })),
    [kit],
  );
}

/** Parts of a rig, retired ones too, newest first. */
export function useParts(rig: string): readonly PartDoc[] {
  const { documents } = useChildren('part', rig);
  return useMemo(() => documents.toSorted((a, b) => newestFirst(a.trace, b.trace)), [documents]);
}

export interface AlignmentHistory {
  readonly state: 'loading' | 'ready';
  /** Oldest first, struck ones too. */
  readonly steps: readonly AlignmentDoc[];
}

export function useAlignment(rig: string): AlignmentHistory {
  const { state, documents } = useChildren('alignment', rig);
  return useMemo(
    () => ({ state, steps: documents.toSorted((a, b) => -newestFirst(a.logged, b.logged)) }),
    [state, documents],
  );
}

/** Who is checked in at a rig. */
export function useGuests(rig: string): readonly Guest[] {
  return useRig(rig)?.guests ?? NONE;
}

export interface Attached {
  readonly state: 'loading' | 'ready';
  readonly notes: readonly NoteDoc[];
  readonly photos: readonly PhotoDoc[];
  readonly traces: readonly TraceDoc[];
}

/** Notes, photos and traces about one thing, newest first, struck ones too. */
export function useNotes(about: string): Attached {
  const notes = useChildren('note', about);
  const photos = useChildren('photo', about);
  const traces = useChildren('trace', about);
  return useMemo(
    () => ({
      state: [notes, photos, traces].every((one) => one.state === 'ready') ? 'ready' : 'loading',
      notes: notes.documents.toSorted((a, b) => newestFirst(written(a), written(b))),
      photos: photos.documents.toSorted((a, b) => newestFirst(a.attached, b.attached)),
      traces: traces.documents.toSorted((a, b) => newestFirst(a.attached, b.attached)),
    }),
    [notes, photos, traces],
  );
}

/** What a note, photo or trace is about. */
export function useAbout({ type, id }: About): DocOf<About['type']> | undefined {
  return useDoc(type, id);
}

export function usePerson(id: string | null): PersonDoc | undefined {
  return useDoc('person', id ?? '');
}

export function usePeople(): readonly PersonDoc[] {
  const people = useList('person');
  return useMemo(() => people.toSorted((a, b) => a.name.localeCompare(b.name)), [people]);
}

export function useLab(): LabDoc | undefined {
  return useDoc('lab', useMaybeLab()?.lab.id ?? '');
}

export interface HeldEntry {
  readonly doc: HeldDoc;
  /** Written on this tablet. */
  readonly mine: boolean;
}

/** Neither adopted nor dismissed, newest first. */
export function useHeldBack(): readonly HeldEntry[] {
  const held = useList('held');
  const device = useMaybeLab()?.device().id;
  return useMemo(
    () =>
      held
        .filter((doc) => doc.adopted === null && doc.dismissed === null)
        .sort((a, b) => (b.at ?? Infinity) - (a.at ?? Infinity))
        .map((doc) => ({ doc, mine: doc.entry.device === device })),
    [held, device],
  );
}

export interface Pending {
  readonly count: number;
  readonly oldest_wall_ms: number | null;
  readonly words: string;
}

const NOTHING_WAITS = { count: 0, oldest_wall_ms: null };

export function usePending(): Pending {
  const view = useMaybeLab()?.view;
  const waiting = useSyncExternalStore(
    view?.subscribe ?? listenToNothing,
    () => view?.waiting() ?? NOTHING_WAITS,
  );
  return useMemo(() => ({ ...waiting, words: entriesWords(waiting.count) }), [waiting]);
}

/** This tablet's entries, newest first. */
export function useOwnEntries(limit = 100): readonly OwnEntry[] {
  const states = useMaybeLab()?.states;
  return useSyncExternalStore(states?.subscribe ?? listenToNothing, () => states?.newestOwn(limit) ?? NONE);
}

/** Undefined while it is looked up. */
export function useEntryState(id: string): EntryState | undefined {
  const states = useMaybeLab()?.states;
  return useSyncExternalStore(states?.subscribe ?? listenToNothing, () => states?.get(id));
}

export interface BookState {
  /** A whole Book has not arrived yet: no rig is ready. */
  readonly filling: boolean;
  readonly revision: number;
  readonly hash: string;
  readonly epoch: string | null;
  readonly device: string;
  readonly letter: string;
}

export function useBookState(): BookState {
  const lab = useMaybeLab();
  const cursor = useSyncExternalStore(lab?.view.subscribe ?? listenToNothing, () => lab?.view.cursor());
  const filling = lab?.view.filling() ?? true;
  const { id: device = '', letter = '' } = lab?.device() ?? {};
  return useMemo(
    () => ({
      filling,
      revision: cursor?.revision ?? 0,
      hash: cursor?.hash ?? '',
      epoch: cursor?.epoch ?? null,
      device,
      letter,
    }),
    [filling, cursor, device, letter],
  );
}

function useDoc<K extends DocKind>(kind: K, id: string): DocOf<K> | undefined {
  const view = useMaybeLab()?.view;
  return useSyncExternalStore(view?.subscribe ?? listenToNothing, () => view?.doc(kind, id));
}

function useList<K extends DocKind>(kind: K): readonly DocOf<K>[] {
  const view = useMaybeLab()?.view;
  return useSyncExternalStore(view?.subscribe ?? listenToNothing, () => view?.list(kind) ?? NONE);
}

function useChildren<K extends DocKind>(kind: K, parent: string): Children<K> {
  const view = useMaybeLab()?.view;
  return useSyncExternalStore(
    view?.subscribe ?? listenToNothing,
    () => view?.children(kind, parent) ?? NOTHING,
  );
}

/** By revision; what has none yet was written here and is newer than all that has. */
function newestFirst(a: Trace, b: Trace): number {
  if (a.at !== null && b.at !== null) return b.at - a.at;
  if (a.at === null && b.at === null) return b.stamp.wall_ms - a.stamp.wall_ms;
  return a.at === null ? -1 : 1;
}

function written(note: NoteDoc): Trace {
  const [first] = note.versions;
  if (first === undefined) throw new Error(`note ${note.id} has no version`);
  return first;
}
