import { paths } from '../../config/paths';
import type { About } from '../../domain/book/bodies/note-bodies';
import type { DocOf } from '../../domain/book/documents/document';
import { PURPOSE_WORDS } from '../../domain/report/words';
import { momentWords } from '../../domain/report/time-words';

export type AboutType = About['type'];

const TYPES: readonly AboutType[] = ['rig', 'firing', 'part', 'check', 'kit', 'incident'];

export function isAboutType(text: string): text is AboutType {
  return (TYPES as readonly string[]).includes(text);
}

/** What the notes are about, as a title: "Firing B-41". */
export function aboutWords(doc: DocOf<AboutType>, zone: string): string {
  switch (doc.kind) {
    case 'rig':
      return doc.name;
    case 'firing':
      return `Firing ${doc.number}`;
    case 'part':
      return doc.fitted.what;
    case 'check':
      return `Check ${PURPOSE_WORDS[doc.purpose]}, ${momentWords(doc.opened.stamp.wall_ms, zone)}`;
    case 'kit':
      return `${doc.number}, ${doc.name}`;
    case 'incident':
      return `Incident of ${momentWords(doc.reported.stamp.wall_ms, zone)}`;
  }
}

/** The screen of the thing itself, to go back to. */
export function aboutPath(doc: DocOf<AboutType>): string {
  switch (doc.kind) {
    case 'rig':
      return paths.rig(doc.id);
    case 'firing':
      return paths.firing(doc.id);
    case 'part':
      return paths.rigParts(doc.parent);
    case 'check':
      return paths.check(doc.id);
    case 'kit':
      return paths.kitPiece(doc.id);
    case 'incident':
      return paths.benchOf(doc.parent);
  }
}
