import { usePerson } from '../../data/use-book';
import { useSession } from '../../data/use-session';
import type { Kind } from '../../domain/book/kinds';
import { mayAppend } from '../../domain/rules/roles';

/** Whether the person who is open has a role for this kind, by the rule that the server asks too. */
export function useMay(): (kind: Kind) => boolean {
  const session = useSession();
  const me = usePerson(session.state === 'open' ? session.person.id : null);
  return (kind) => mayAppend(me?.role ?? null, kind);
}
