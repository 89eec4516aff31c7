import type { Reason } from '../book/entry';

/** A reason with whether the tablet could have known it when the entry was written (protocol 1.3); empty without one. */
export function reasonWords(reason: Reason | null): string {
  if (reason === null) return '';
  if (reason.knew === null) return reason.words;
  return `${reason.words} ${reason.knew ? 'The tablet knew.' : 'The tablet could not know.'}`;
}
