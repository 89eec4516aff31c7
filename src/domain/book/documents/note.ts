import type { About } from '../bodies/note-bodies';
import type { BodyOf } from '../kinds';
import type { EntryOf } from '../read-body';
import { getDoc, putDoc, type Effect } from './effect';
import { traceOf, type Standing, type Trace } from './trace';
import type { Corrected } from './versions';

export interface NoteVersion extends Trace {
  readonly words: string;
  readonly based_on: string | null;
}

/** A note with all its versions; two heads are a parting (protocol 1.6). */
export interface NoteDoc {
  readonly kind: 'note';
  readonly id: string;
  /** Id of what it is about. */
  readonly parent: string;
  readonly about: About;
  readonly versions: readonly NoteVersion[];
  readonly heads: readonly string[];
  readonly struck: (Trace & { readonly why: string }) | null;
}

export interface PhotoDoc extends Corrected<BodyOf<'photo.attached'>> {
  readonly kind: 'photo';
  readonly parent: string;
  readonly attached: Trace;
}

/** A file of an oscilloscope. */
export interface TraceDoc extends Corrected<BodyOf<'trace.attached'>> {
  readonly kind: 'trace';
  readonly parent: string;
  readonly attached: Trace;
}

type NoteEntry = EntryOf<'note.written' | 'note.amended' | 'photo.attached' | 'trace.attached'>;

export function* foldNote(entry: NoteEntry, standing: Standing): Effect {
  const trace = traceOf(entry.meta, standing);
  if (entry.kind === 'note.amended') {
    yield* amend(entry, trace);
    return;
  }
  const { id } = entry.meta;
  const parent = entry.body.about.id;
  if (entry.kind === 'note.written') {
    const { about, words } = entry.body;
    const versions = [{ ...trace, words, based_on: null }];
    yield* putDoc({ kind: 'note', id, parent, about, versions, heads: [id], struck: null });
    return;
  }
  const whole = { id, parent, attached: trace, corrections: [], struck: null };
  yield* putDoc(
    entry.kind === 'photo.attached'
      ? { kind: 'photo', original: entry.body, ...whole }
      : { kind: 'trace', original: entry.body, ...whole },
  );
}

function* amend(entry: EntryOf<'note.amended'>, trace: Trace): Effect {
  const note = yield* getDoc('note', entry.meta.subject);
  if (note === undefined) return;
  const { based_on, words } = entry.body;
  yield* putDoc({
    ...note,
    versions: [...note.versions, { ...trace, words, based_on }],
    heads: [...note.heads.filter((head) => head !== based_on), trace.entry],
  });
}

/** Settles a parting of a note's versions; false where the subject is no note. */
export function* settleNote(entry: EntryOf<'parting.settled'>): Effect<boolean> {
  const note = yield* getDoc('note', entry.meta.subject);
  if (note === undefined) return false;
  const { settles, keeps } = entry.body;
  yield* putDoc({ ...note, heads: [...note.heads.filter((head) => !settles.includes(head)), keeps] });
  return true;
}

/** The versions that stand: one, or those of a parting. */
export function headVersions(note: NoteDoc): readonly NoteVersion[] {
  return note.versions.filter((version) => note.heads.includes(version.entry));
}
