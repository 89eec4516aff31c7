import type { Draft } from '../../data/use-append';
import type { About } from '../../domain/book/bodies/note-bodies';

/** What is typed on a notes screen; kept at every key. */
export interface NoteDraft {
  readonly words: string;
  /** The version that the words change; null for a new note. */
  readonly amends: { readonly note: string; readonly version: string } | null;
  readonly caption: string;
}

export const EMPTY_NOTE: NoteDraft = { words: '', amends: null, caption: '' };

/** The entry that the words make; null while there are none. */
export function noteEntry({ words, amends }: NoteDraft, about: About): Draft | null {
  const said = words.trim();
  if (said === '') return null;
  return amends === null
    ? { kind: 'note.written', body: { about, words: said } }
    : { kind: 'note.amended', subject: amends.note, body: { based_on: amends.version, words: said } };
}
