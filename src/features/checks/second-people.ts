import type { SessionView } from '../../data/session/session-types';

type PersonHere = Extract<SessionView, { state: 'open' }>['people'][number];

/** Everybody of this tablet but the one whose hands do the work; before a PIN that can be anybody. */
export function secondPeople(session: SessionView): readonly PersonHere[] {
  if (session.state === 'no-lab') return [];
  const self = session.state === 'open' ? session.person.id : null;
  return session.people.filter((one) => one.id !== self);
}
