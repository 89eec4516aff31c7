import { useState } from 'react';
import { useNavigate } from 'react-router-dom';
import { paths } from '../../config/paths';
import type { PersonHere } from '../../data/session/session-types';
import { useSessionActions } from '../../data/use-session';
import { PinPad } from './pin-pad';

/** Who has signed in on this tablet: a touch and a PIN change the person, without a network. */
export function PeopleHere({
  people,
  onOpened,
}: {
  readonly people: readonly PersonHere[];
  readonly onOpened?: () => void;
}) {
  const { unlock } = useSessionActions();
  const navigate = useNavigate();
  const [chosen, setChosen] = useState<string | null>(people.length === 1 ? (people[0]?.id ?? null) : null);
  const person = people.find((one) => one.id === chosen);
  const open = async (pin: string) => {
    if (person === undefined) return null;
    const outcome = await unlock(person.id, pin);
    if (outcome.type !== 'right') return outcome.words;
    if (onOpened === undefined) void navigate(paths.bench());
    else onOpened();
    return null;
  };
  return (
    <section className="people-here" aria-label="People on this tablet">
      <div className="people-list" role="radiogroup" aria-label="Person">
        {people.map((one) => (
          <button
            key={one.id}
            type="button"
            role="radio"
            aria-checked={one.id === chosen}
            className="person-choice"
            onClick={() => setChosen(one.id)}
          >
            {one.name}
          </button>
        ))}
      </div>
      {person === undefined ? (
        <p className="muted">Choose who you are.</p>
      ) : (
        <PersonPin key={person.id} person={person} open={open} />
      )}
    </section>
  );
}

function PersonPin({
  person,
  open,
}: {
  readonly person: PersonHere;
  readonly open: (pin: string) => Promise<string | null>;
}) {
  if (person.needs_sign_in)
    return <p>{person.name} has to sign in with e-mail and password on this tablet.</p>;
  return <PinPad label={`PIN of ${person.name}`} onPin={open} />;
}
