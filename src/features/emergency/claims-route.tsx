import { useState } from 'react';
import type { HoldOutcome } from '../../components/hold';
import { HoldButton } from '../../components/hold-button';
import { Screen } from '../../components/frame';
import { SaysBlock } from '../../components/says-block';
import { useAppend } from '../../data/use-append';
import { useCheck, useIncidents, useLab, useRig } from '../../data/use-book';
import { useOpenAuthor } from '../../data/use-claims';
import { useSession } from '../../data/use-session';
import { entrySubstance, kindWords } from '../../domain/report/entry-words';
import { momentWords } from '../../domain/report/time-words';
import { openGroups, type OpenGroup } from './open-groups';
import './emergency.css';

/** What was written on this tablet before a PIN: whoever did it says so afterwards; nothing of it is changed by that. */
export function ClaimsRoute() {
  const groups = openGroups(useOpenAuthor());
  const session = useSession();
  const zone = useLab()?.settings.zone ?? 'Etc/UTC';
  const name = session.state === 'open' ? session.person.name : '';
  return (
    <Screen>
      <div className="emergency">
        <h1>Entries without an author</h1>
        {groups.length === 0 ? (
          <SaysBlock lead="Every entry of this tablet has its author.">
            What is written from the emergency card before a PIN stands here until somebody claims it.
          </SaysBlock>
        ) : (
          <>
            <p className="muted">
              Claim only what your own hands did. What is not yours stays for whoever it was.
            </p>
            <ul className="emergency-claims">
              {groups.map((group) => (
                <Group key={group.key} group={group} zone={zone} name={name} />
              ))}
            </ul>
          </>
        )}
      </div>
    </Screen>
  );
}

interface GroupProps {
  readonly group: OpenGroup;
  readonly zone: string;
  readonly name: string;
}

function Group({ group, zone, name }: GroupProps) {
  const append = useAppend();
  const [refusal, setRefusal] = useState<string | null>(null);
  const about = useAbout(group.subject);
  const { entries } = group;
  const claim = async (): Promise<HoldOutcome> => {
    for (const entry of entries) {
      const outcome = await append({
        kind: 'entry.claimed',
        subject: entry.subject,
        body: { claims: entry.id },
      });
      if (outcome.type === 'logged') continue;
      setRefusal(outcome.words);
      return { type: 'failed', words: outcome.words };
    }
    return { type: 'settled' };
  };
  return (
    <li>
      <div>
        <h2>{about}</h2>
        <ul>
          {entries.map((entry) => (
            <li key={entry.id}>
              {kindWords(entry.kind)}{' '}
              <span className="muted">
                {[entrySubstance(entry, zone), momentWords(entry.stamp.wall_ms, zone)]
                  .filter((words) => words !== '')
                  .join(', ')}
              </span>
            </li>
          ))}
        </ul>
        {refusal === null ? null : (
          <p role="alert" className="field-refusal">
            {refusal}
          </p>
        )}
      </div>
      <HoldButton
        main
        hold="half-second"
        label={entries.length === 1 ? 'Hold: I did this' : `Hold: I did these ${entries.length}`}
        holdLabel={`Hold: claim for ${name}`}
        onComplete={claim}
      />
    </li>
  );
}

/** What the entries are about, in the words of the Book. */
function useAbout(subject: string): string {
  const check = useCheck(subject);
  const rig = useRig(check?.parent ?? subject);
  const incidents = useIncidents(rig?.id ?? '');
  if (rig === undefined) return 'An earlier entry';
  if (check !== undefined) return `${rig.name}, ${check.purpose === 'make-safe' ? 'make safe' : 'check'}`;
  return incidents.some((one) => one.id === subject) ? `${rig.name}, incident` : rig.name;
}
