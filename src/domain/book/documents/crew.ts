import type { Role } from '../bodies/people-bodies';
import { getDoc, putDoc, type Effect } from './effect';

/** Who is in the lab in which role, in one document, so that a rule can ask whether another reviewer exists. */
export interface CrewDoc {
  readonly kind: 'crew';
  /** Id of the lab. */
  readonly id: string;
  readonly parent: null;
  readonly roles: Readonly<Record<string, Role>>;
}

export function* setCrewRole(lab: string, person: string, role: Role | null): Effect {
  const crew = yield* getDoc('crew', lab);
  const { [person]: _before, ...others } = crew?.roles ?? {};
  yield* putDoc({
    kind: 'crew',
    id: lab,
    parent: null,
    roles: role === null ? others : { ...others, [person]: role },
  });
}
