import type { Role } from '../book/bodies/people-bodies';
import type { Kind } from '../book/kinds';

export type EntryClass = 'observation' | 'act';

interface KindRule {
  /** Observations are never refused by a rule; acts are (protocol 1.2). */
  readonly class: EntryClass;
  readonly roles: readonly Role[];
  /** Whether the author may be left open before a PIN (protocol 4.2). */
  readonly openAuthor?: true;
}

const bench: readonly Role[] = ['operator', 'reviewer', 'lead'];
const review: readonly Role[] = ['reviewer', 'lead'];
const lead: readonly Role[] = ['lead'];
const everyone: readonly Role[] = ['operator', 'reviewer', 'lead', 'reader'];

/** Who may append what. A loosening `rig.revised` is an act as well: see `entryClass` in judge.ts. */
export const KIND_RULES: Readonly<Record<Kind, KindRule>> = {
  'rig.created': { class: 'observation', roles: bench },
  'rig.revised': { class: 'observation', roles: bench },
  'rig.declared': { class: 'observation', roles: bench },
  'rig.stood-down': { class: 'observation', roles: everyone, openAuthor: true },
  'rig.stand-down-retracted': { class: 'observation', roles: everyone },
  'rig.returned': { class: 'act', roles: review },
  'hands.in': { class: 'observation', roles: bench },
  'hands.out': { class: 'observation', roles: bench },
  'gas.changed': { class: 'observation', roles: bench },
  'guest.in': { class: 'observation', roles: bench },
  'guest.out': { class: 'observation', roles: bench },
  'part.fitted': { class: 'observation', roles: bench },
  'part.retired': { class: 'observation', roles: bench },
  'alignment.measured': { class: 'observation', roles: bench },
  'alignment.adjusted': { class: 'observation', roles: bench },
  'alignment.arc-seen': { class: 'observation', roles: bench },
  'kit.added': { class: 'observation', roles: bench },
  'kit.inspected': { class: 'observation', roles: bench },
  'kit.issued': { class: 'observation', roles: bench },
  'kit.returned': { class: 'observation', roles: bench },
  // Everyone, because of incidents: see `judge-notes.ts` for what else they may be about.
  'note.written': { class: 'observation', roles: everyone, openAuthor: true },
  'note.amended': { class: 'observation', roles: bench },
  'photo.attached': { class: 'observation', roles: everyone, openAuthor: true },
  'trace.attached': { class: 'observation', roles: bench },
  'permit.asked': { class: 'observation', roles: bench },
  'permit.granted': { class: 'act', roles: review },
  'permit.withdrawn': { class: 'observation', roles: review },
  'parting.settled': { class: 'act', roles: review },
  'sheet.published': { class: 'act', roles: review },
  'sheet.retired': { class: 'act', roles: review },
  'check.opened': { class: 'observation', roles: bench, openAuthor: true },
  'check.step-done': { class: 'observation', roles: bench, openAuthor: true },
  'check.step-waived': { class: 'observation', roles: bench },
  'check.closed': { class: 'observation', roles: bench, openAuthor: true },
  'check.abandoned': { class: 'observation', roles: bench, openAuthor: true },
  'firing.opened': { class: 'observation', roles: bench },
  'firing.reading': { class: 'observation', roles: bench },
  'firing.shots-counted': { class: 'observation', roles: bench },
  'firing.closed': { class: 'observation', roles: bench },
  'firing.reviewed': { class: 'act', roles: review },
  'firing.sent-back': { class: 'act', roles: review },
  'incident.reported': { class: 'observation', roles: everyone, openAuthor: true },
  'incident.answered': { class: 'act', roles: review },
  'incident.closed': { class: 'act', roles: review },
  'lab.set': { class: 'act', roles: lead },
  'person.joined': { class: 'act', roles: lead },
  'person.role-set': { class: 'act', roles: lead },
  'person.removed': { class: 'act', roles: lead },
  'person.authorised': { class: 'act', roles: review },
  'person.authorisation-ended': { class: 'observation', roles: review },
  'entry.corrected': { class: 'observation', roles: bench },
  'entry.struck': { class: 'observation', roles: bench },
  'entry.adopted': { class: 'act', roles: bench },
  'entry.claimed': { class: 'observation', roles: everyone },
  'lookup.kept': { class: 'observation', roles: everyone },
  'noise.counted': { class: 'observation', roles: everyone, openAuthor: true },
};

export function mayAppend(role: Role | null, kind: Kind): boolean {
  return role !== null && KIND_RULES[kind].roles.includes(role);
}

export function isRole(role: Role | null, ...among: readonly Role[]): boolean {
  return role !== null && among.includes(role);
}
