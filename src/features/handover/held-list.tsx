import { Link } from 'react-router-dom';
import { paths } from '../../config/paths';
import { useHeldBack, usePerson } from '../../data/use-book';
import { useSession } from '../../data/use-session';
import { entrySubstance, kindWords } from '../../domain/report/entry-words';
import { heldOptions } from '../../domain/rules/held-options';
import { reasonWords } from '../../domain/report/reason-words';

/** What the server did not apply: never lost, always with its reason and with what can be done. */
export function HeldList({ zone }: { readonly zone: string }) {
  const held = useHeldBack().filter((one) => one.mine);
  const session = useSession();
  const me = usePerson(session.state === 'open' ? session.person.id : null);
  if (held.length === 0) return null;
  return (
    <section>
      <h2>Held back</h2>
      <ul className="handover-list">
        {held.map(({ doc }) => {
          const { adopt, dismiss } = heldOptions(doc, me === undefined ? null : me);
          return (
            <li key={doc.id}>
              <p>
                <b>{kindWords(doc.entry.kind)}</b> {entrySubstance(doc.entry, zone)}
              </p>
              <p>{reasonWords(doc.reason)}</p>
              <p className="muted">
                {adopt.words} {dismiss.words}{' '}
                <Link to={paths.deskHeld()} className="underline">
                  What can be done
                </Link>
              </p>
            </li>
          );
        })}
      </ul>
    </section>
  );
}
