import type { LabSettings } from '../../domain/book/rig-spec';

/** What to do, in the order of doing it. Without the lab's settings the order stands all the same. */
export function EmergencyCard({ settings }: { readonly settings: LabSettings | null }) {
  const emergency = settings?.emergency;
  return (
    <ol className="emergency-steps" aria-label="What to do">
      <li>
        <h2>Switch off</h2>
        <p>
          {emergency?.isolator ??
            'The isolator of this lab is not known on this tablet: cut the supply at the wall, key out.'}
        </p>
      </li>
      <li>
        <h2>Short, and shout</h2>
        <p>
          Every charged node by itself with the shorting stick, and leave the shorts on. Touch nobody on the
          rig before. Treat as charged whatever a screen says.
        </p>
      </li>
      <li>
        <h2>Ring</h2>
        {emergency === undefined || emergency.ring.length === 0 ? (
          <p>No numbers are set for this lab. Ring the emergency number of the house.</p>
        ) : (
          <ul className="emergency-ring">
            {emergency.ring.map(({ who, number }) => (
              <li key={`${who} ${number}`}>
                <span>{who}</span>
                <a href={`tel:${number.replace(/[^+\d]/g, '')}`}>
                  <b className="nowrap">{number}</b>
                </a>
              </li>
            ))}
          </ul>
        )}
      </li>
      <li>
        <h2>First aid</h2>
        <p>{emergency?.first_aid ?? 'Isolate and short first, then help.'}</p>
      </li>
    </ol>
  );
}
