import { getDoc, type Effect } from '../book/documents/effect';
import type { EntryOf } from '../book/read-body';
import type { JudgeContext } from './judge-context';
import { objection, type Objection } from './objection';

type PeopleEntry = EntryOf<
  | 'lab.set'
  | 'person.joined'
  | 'person.role-set'
  | 'person.removed'
  | 'person.authorised'
  | 'person.authorisation-ended'
>;

export function* peopleObjection(entry: PeopleEntry, context: JudgeContext): Effect<Objection | null> {
  if (entry.kind === 'lab.set')
    return entry.meta.subject === entry.meta.lab ? null : objection('subject', 'It names another lab.');
  if (entry.kind === 'person.joined') return null;
  const person = yield* getDoc('person', entry.meta.subject);
  if (person === undefined) return objection('unknown-person', 'This person is not in the Book.');
  switch (entry.kind) {
    case 'person.role-set':
      return entry.body.role === 'lead' ? null : yield* lastLeadObjection(entry.meta.lab, entry.meta.subject);
    case 'person.removed':
      return yield* lastLeadObjection(entry.meta.lab, entry.meta.subject);
    case 'person.authorised': {
      if ((yield* getDoc('rig', entry.body.rig)) === undefined)
        return objection('unknown-rig', 'This rig is not in the Book.');
      return entry.body.until_ms > context.now_ms
        ? null
        : objection('authorisation-over', 'The authorisation would already have expired.');
    }
    case 'person.authorisation-ended':
      return person.authorisations.some((one) => one.entry === entry.body.authorisation)
        ? null
        : objection('unknown-authorisation', 'This authorisation is not in the Book.');
  }
}

/** A lab without a lead could never be mended from inside. */
function* lastLeadObjection(lab: string, person: string): Effect<Objection | null> {
  const crew = yield* getDoc('crew', lab);
  const leads = Object.entries(crew?.roles ?? {}).filter(([, role]) => role === 'lead');
  return leads.length === 1 && leads[0]?.[0] === person
    ? objection('last-lead', 'A lab keeps at least one lead.')
    : null;
}
