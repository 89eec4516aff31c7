import { getDoc, type Effect } from '../book/documents/effect';
import type { EntryOf } from '../book/read-body';
import { objection, type Objection } from './objection';
import { isRole } from './roles';

type NoteEntry = EntryOf<'note.written' | 'note.amended' | 'photo.attached' | 'trace.attached'>;

export function* noteObjection(entry: NoteEntry): Effect<Objection | null> {
  if (entry.kind === 'note.amended') return yield* amendObjection(entry);
  if (entry.meta.subject !== entry.meta.id) return objection('subject', 'It is its own subject.');
  const { about } = entry.body;
  if ((yield* getDoc(about.type, about.id)) === undefined)
    return objection('unknown-subject', 'What it is about is not in the Book.');
  if (entry.kind === 'trace.attached') return yield* readingObjection(entry);
  return about.type === 'incident' ? null : yield* benchObjection(entry);
}

/** Anybody, before a PIN too, may show or tell what happened; everything else is written by who works there. */
function* benchObjection(entry: EntryOf<'note.written' | 'photo.attached'>): Effect<Objection | null> {
  if (entry.meta.author === null) return objection('author-open', 'This needs an author.');
  const person = yield* getDoc('person', entry.meta.author);
  return isRole(person?.role ?? null, 'operator', 'reviewer', 'lead')
    ? null
    : objection('role', 'A reader writes about incidents alone.', person?.role_set.at ?? null);
}

function* readingObjection(entry: EntryOf<'trace.attached'>): Effect<Objection | null> {
  const { about, reading } = entry.body;
  if (reading === null) return null;
  const doc = yield* getDoc('reading', reading);
  return doc?.parent === about.id
    ? null
    : objection('unknown-reading', 'The reading that it belongs to is not in this firing.');
}

function* amendObjection(entry: EntryOf<'note.amended'>): Effect<Objection | null> {
  const note = yield* getDoc('note', entry.meta.subject);
  if (note === undefined) return objection('unknown-note', 'This note is not in the Book.');
  if (note.struck !== null) return objection('note-struck', 'This note was struck.', note.struck.at);
  return note.versions.some((version) => version.entry === entry.body.based_on)
    ? null
    : objection('unknown-version', 'The version that it is based on is not in the Book.');
}

/** The parting of a note's versions: all of them named, and one kept. */
export function* noteParting(entry: EntryOf<'parting.settled'>): Effect<Objection | null | 'not-a-note'> {
  const note = yield* getDoc('note', entry.meta.subject);
  if (note === undefined) return 'not-a-note';
  const { settles, keeps } = entry.body;
  if (note.heads.length < 2) return objection('no-parting', 'There is no parting to settle.');
  return note.heads.every((head) => settles.includes(head)) && settles.includes(keeps)
    ? null
    : objection('parting-not-named', 'It must name every version of the parting and keep one of them.');
}
