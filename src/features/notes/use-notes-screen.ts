import { useState } from 'react';
import type { HoldOutcome } from '../../components/hold';
import { useLabClient } from '../../data/client-context';
import { shrinkPhoto, type ShrunkPhoto } from '../../data/photos/shrink-photo';
import { useAppend, type Draft } from '../../data/use-append';
import { useNotes, usePerson } from '../../data/use-book';
import { useDraft } from '../../data/use-draft';
import { useSession } from '../../data/use-session';
import type { About } from '../../domain/book/bodies/note-bodies';
import type { NoteVersion } from '../../domain/book/documents/note';
import { mayAppend } from '../../domain/rules/roles';
import { EMPTY_NOTE, noteEntry, type NoteDraft } from './note-draft';

/** Writing, amending and striking notes and photos about one thing. */
export function useNotesScreen(about: About) {
  const { photos } = useLabClient();
  const append = useAppend();
  const session = useSession();
  const person = usePerson(session.state === 'open' ? session.person.id : null);
  const attached = useNotes(about.id);
  const { value, set, clear, save } = useDraft<NoteDraft>(`note/${about.type}/${about.id}`, EMPTY_NOTE);
  const draft = { ...EMPTY_NOTE, ...value };
  const [photo, setPhoto] = useState<{ readonly name: string; readonly shrunk: ShrunkPhoto } | null>(null);
  const change = (part: Partial<NoteDraft>): void => set((now) => ({ ...EMPTY_NOTE, ...now, ...part }));

  const write = async (entry: Draft): Promise<HoldOutcome> => {
    const outcome = await append(entry);
    return outcome.type === 'logged' ? { type: 'settled' } : { type: 'failed', words: outcome.words };
  };
  const log = async (): Promise<HoldOutcome> => {
    const entry = noteEntry(draft, about);
    if (entry === null) return { type: 'failed', words: 'Write something first.' };
    const outcome = await write(entry);
    if (outcome.type === 'settled') {
      if (draft.caption === '') clear();
      else change({ words: '', amends: null });
    }
    return outcome;
  };
  const keepPhoto = async (): Promise<HoldOutcome> => {
    if (photo?.shrunk.type !== 'shrunk') return { type: 'failed', words: 'Take the photo first.' };
    const { bytes, canvas } = photo.shrunk;
    const kept = await photos.put(bytes);
    if (kept.type !== 'kept') return { type: 'failed', words: kept.words };
    const outcome = await write({
      kind: 'photo.attached',
      body: {
        about,
        sha256: kept.sha256,
        bytes: kept.bytes,
        name: photo.name,
        media_type: 'image/jpeg',
        caption: draft.caption.trim(),
        width_px: canvas.width,
        height_px: canvas.height,
      },
    });
    if (outcome.type === 'settled') {
      setPhoto(null);
      change({ caption: '' });
    }
    return outcome;
  };
  return {
    about,
    attached,
    draft,
    save,
    photo: photo?.shrunk ?? null,
    /** Anybody tells of an incident; everything else is written by who works there. */
    may: about.type === 'incident' || mayAppend(person?.role ?? null, 'note.amended'),
    mayAmend: mayAppend(person?.role ?? null, 'note.amended'),
    change,
    log,
    keepPhoto,
    /** A name of the file would tell nothing that the entry does not, and phones write places into it. */
    takePhoto: async (file: Blob): Promise<void> => {
      setPhoto({ name: 'photo.jpg', shrunk: await shrinkPhoto(file) });
    },
    dropPhoto: () => setPhoto(null),
    amend: (note: string, { entry, words }: NoteVersion) =>
      change({ words, amends: { note, version: entry } }),
    newNote: () => change({ words: '', amends: null }),
    strike: (id: string, why: string) =>
      write({ kind: 'entry.struck', subject: id, body: { strikes: id, why: why.trim() } }),
  };
}

export type NotesScreen = ReturnType<typeof useNotesScreen>;
