import { headVersions, type NoteDoc, type NoteVersion } from '../../domain/book/documents/note';

/** A note as it is read: what stands, and what it said before. */
export interface NoteView {
  /** One, or those of a parting. */
  readonly standing: readonly NoteVersion[];
  /** Newest first. */
  readonly earlier: readonly NoteVersion[];
  readonly parted: boolean;
}

export function noteView(note: NoteDoc): NoteView {
  const standing = headVersions(note);
  const earlier = note.versions.filter((version) => !note.heads.includes(version.entry)).toReversed();
  return { standing, earlier, parted: standing.length > 1 };
}
