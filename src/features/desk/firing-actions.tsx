import { useState } from 'react';
import { Dialog } from '../../components/dialog';
import { HoldButton } from '../../components/hold-button';
import { WordsField } from '../../components/words-field';
import { useDraft } from '../../data/use-draft';
import { usePerson } from '../../data/use-book';
import { useSession } from '../../data/use-session';
import { standingReview } from '../../domain/book/documents/firing';
import type { FiringAnswer } from '../../domain/report/desk-shapes';
import { mayAppend } from '../../domain/rules/roles';
import { ActOutcome, ForecastWords } from './act-outcome';
import { useAct, useForecast } from './use-act';

interface Props {
  readonly answer: FiringAnswer;
  readonly left_out: readonly string[];
  readonly onLogged: () => void;
}

/** Stands right of the title. Both are acts: they count once the server has applied them under this person's own session. */
export function FiringActions({ answer, left_out, onLogged }: Props) {
  const { firing, book } = answer;
  const session = useSession();
  const me = usePerson(session.state === 'open' ? session.person.id : null);
  const words = useDraft(`desk/firing/${firing.id}`, '');
  const [sending, setSending] = useState(false);
  const act = useAct(onLogged);
  const accepted = {
    kind: 'firing.reviewed',
    subject: firing.id,
    body: { words: '', left_out, seen_revision: book.revision, seen_hash: book.hash },
  } as const;
  const may = mayAppend(me?.role ?? null, 'firing.reviewed');
  const forecast = useForecast(
    may ? accepted : null,
    `${firing.id}/${firing.closed?.entry ?? 'open'}/${book.revision}`,
  );
  if (!may) return <p className="muted">Reviewing is for a reviewer or a lead.</p>;
  const hindrance =
    forecast.against?.words ??
    (standingReview(firing)?.verdict === 'reviewed' ? 'It was accepted before.' : null);
  return (
    <div className="desk-actions">
      <div className="desk-buttons">
        <HoldButton
          label="Send back"
          disabled={forecast.against !== null}
          onComplete={() => setSending(true)}
        />
        <span className="desk-apart">
          <HoldButton
            main
            label="Accept"
            hold="second"
            holdLabel={`Hold: accept ${firing.number}`}
            disabled={hindrance !== null}
            {...(hindrance === null ? {} : { reason: hindrance })}
            onComplete={() => act.log(accepted)}
          />
        </span>
      </div>
      <ForecastWords forecast={forecast} />
      {act.logged === null ? null : <ActOutcome entry={act.logged} />}
      {sending ? (
        <Dialog
          title={`Send ${firing.number} back`}
          closeLabel="Not yet"
          onClose={() => setSending(false)}
          actions={
            <HoldButton
              main
              label="Send back"
              hold="half-second"
              holdLabel={`Hold: send ${firing.number} back`}
              disabled={words.value.trim() === ''}
              {...(words.value.trim() === '' ? { reason: 'Say what has to be mended.' } : {})}
              onComplete={async () => {
                const outcome = await act.log({
                  kind: 'firing.sent-back',
                  subject: firing.id,
                  body: { words: words.value.trim() },
                });
                if (outcome.type === 'settled') {
                  words.clear();
                  setSending(false);
                }
                return outcome;
              }}
            />
          }
        >
          <WordsField
            label="What has to be mended"
            hint="the operator reads it"
            rows={3}
            value={words.value}
            onChange={(text) => words.set(text)}
          />
        </Dialog>
      ) : null}
    </div>
  );
}
