import { HoldButton } from '../../components/hold-button';
import { useKit } from '../../data/use-book';
import type { RigDoc } from '../../domain/book/documents/rig';
import type { StampPoint } from '../../domain/book/stamp';
import { isCompany } from '../../domain/rules/company';
import { guestName, heldFor } from './people-words';
import type { PeopleActs } from './use-people-acts';

interface Props {
  readonly rig: RigDoc;
  readonly acts: PeopleActs;
  readonly nameOf: (id: string | null) => string;
  readonly now: StampPoint;
}

/** Who is at the rig beside the person who works it: briefed by whom, for how long, and whether it counts as company. */
export function GuestList({ rig, acts, nameOf, now }: Props) {
  const kit = useKit();
  const eyewear = (id: string | null) => {
    const piece = kit.find((one) => one.id === id);
    return piece === undefined ? '' : `, eyewear ${piece.number}`;
  };
  return (
    <section aria-label="Guests">
      <h2>Guests</h2>
      {rig.guests.length === 0 ? (
        <p className="muted">Nobody is checked in.</p>
      ) : (
        <ul className="bench-rows">
          {rig.guests.map((guest) => (
            <li key={guest.entry} className="bench-row">
              <span>
                <b>{guestName(guest, nameOf)}</b>
                {eyewear(guest.eyewear)}
                <br />
                <span className="muted">
                  {heldFor(guest.stamp, now)}, briefed by {nameOf(guest.by)},{' '}
                  {guest.knows_isolator ? 'knows the isolator' : 'was not shown the isolator'}
                  {isCompany(guest, now) ? '' : ', does not count as company'}
                </span>
              </span>
              <HoldButton
                label={`Check ${guestName(guest, nameOf)} out`}
                hold="half-second"
                onComplete={() => acts.guestOut(guest.entry)}
              />
            </li>
          ))}
        </ul>
      )}
    </section>
  );
}
