import type { Role } from '../bodies/people-bodies';
import type { EntryOf } from '../read-body';
import { setCrewRole } from './crew';
import type { KitNote } from './kit';
import { getDoc, putDoc, type Effect } from './effect';
import { traceOf, type Standing, type Trace } from './trace';

export interface Authorisation extends Trace {
  readonly rig: string;
  readonly task: 'fire';
  readonly until_ms: number;
  readonly ended: Trace | null;
}

export interface PersonDoc {
  readonly kind: 'person';
  readonly id: string;
  readonly parent: null;
  readonly name: string;
  /** Null once removed from the lab. */
  readonly role: Role | null;
  readonly role_set: Trace;
  readonly authorisations: readonly Authorisation[];
  /** What the register has them holding. */
  readonly kit: readonly KitNote[];
}

type PersonEntry = EntryOf<
  'person.joined' | 'person.role-set' | 'person.removed' | 'person.authorised' | 'person.authorisation-ended'
>;

export function* foldPerson(entry: PersonEntry, standing: Standing): Effect {
  const trace = traceOf(entry.meta, standing);
  const id = entry.meta.subject;
  const person = yield* getDoc('person', id);
  if (entry.kind === 'person.joined') {
    const authorisations = person?.authorisations ?? [];
    const kit = person?.kit ?? [];
    const { name, role } = entry.body;
    yield* putDoc({ kind: 'person', id, parent: null, name, role, role_set: trace, authorisations, kit });
    yield* setCrewRole(entry.meta.lab, id, role);
    return;
  }
  if (person === undefined) return;
  const after = changed(person, entry, trace);
  yield* putDoc(after);
  if (after.role !== person.role) yield* setCrewRole(entry.meta.lab, id, after.role);
}

function changed(
  person: PersonDoc,
  entry: Exclude<PersonEntry, EntryOf<'person.joined'>>,
  trace: Trace,
): PersonDoc {
  switch (entry.kind) {
    case 'person.role-set':
      return { ...person, role: entry.body.role, role_set: trace };
    case 'person.removed':
      return { ...person, role: null, role_set: trace };
    case 'person.authorised': {
      const { rig, task, until_ms } = entry.body;
      return {
        ...person,
        authorisations: [...person.authorisations, { ...trace, rig, task, until_ms, ended: null }],
      };
    }
    case 'person.authorisation-ended': {
      const { authorisation } = entry.body;
      return {
        ...person,
        authorisations: person.authorisations.map((one) =>
          one.entry === authorisation ? { ...one, ended: trace } : one,
        ),
      };
    }
  }
}
