import type { HeldDoc } from '../book/documents/held';
import type { Role } from '../book/bodies/people-bodies';
import { readEntry } from '../book/read-body';
import { isRole, mayAppend } from './roles';

/** What a person may do with a held-back entry, and why not where they may not. */
export interface HeldOptions {
  readonly adopt: { readonly may: boolean; readonly words: string };
  readonly dismiss: { readonly may: boolean; readonly words: string };
}

/** The same rules as the judge's, asked beforehand so that nobody is offered what would be held back again. */
export function heldOptions(
  held: HeldDoc,
  person: { readonly id: string; readonly role: Role | null } | null,
): HeldOptions {
  const own = person !== null && held.entry.author === person.id;
  return { adopt: adoption(held, person, own), dismiss: dismissal(person, own) };
}

function adoption(
  held: HeldDoc,
  person: { readonly role: Role | null } | null,
  own: boolean,
): HeldOptions['adopt'] {
  const outcome = readEntry(held.entry);
  if (outcome.type !== 'readable') return { may: false, words: 'Its text cannot be read by this version.' };
  if (own && held.reason.cause === 'confirm' && mayAppend(person?.role ?? null, 'entry.adopted')) {
    return { may: true, words: 'It only waits for you to confirm it.' };
  }
  if (isRole(person?.role ?? null, 'lead')) {
    return { may: true, words: 'Adopted, it counts from then on, if the rules as they stand now allow it.' };
  }
  const words =
    held.reason.cause === 'confirm'
      ? 'Its author can confirm it, or a lead adopt it.'
      : 'Only a lead may adopt it.';
  return { may: false, words };
}

function dismissal(person: { readonly role: Role | null } | null, own: boolean): HeldOptions['dismiss'] {
  if (!own) return { may: false, words: 'Only its author may dismiss it.' };
  return mayAppend(person?.role ?? null, 'entry.struck')
    ? { may: true, words: 'Dismissed, it stays readable and waits no longer.' }
    : { may: false, words: 'Your role does not include this.' };
}
