import { useState } from 'react';
import { Choice } from '../../components/choice';
import type { HoldOutcome } from '../../components/hold';
import { Keypad } from '../../components/keypad';
import { SaysBlock } from '../../components/says-block';
import { ThumbDome } from '../../components/thumb-dome';
import { useSession, useSessionActions } from '../../data/use-session';
import type { Step } from '../../domain/book/sheet-spec';
import { CHECK_KEYPAD_WORDS } from './keypad-words';
import { secondPeople } from './second-people';
import { StepFrame } from './step-frame';
import { StepNote } from './step-note';
import type { CheckWalk } from './use-check-walk';

interface SecondPersonStepProps {
  readonly walk: CheckWalk;
  readonly step: Extract<Step, { type: 'second-person' }>;
}

/** Somebody else, who has signed in on this tablet before, says it with their own PIN. The PIN is kept nowhere. */
export function SecondPersonStep({ walk, step }: SecondPersonStepProps) {
  const session = useSession();
  const { checkPin } = useSessionActions();
  const people = secondPeople(session);
  const [chosen, setChosen] = useState<string | null>(null);
  const [asking, setAsking] = useState(false);
  const [refusal, setRefusal] = useState<string | null>(null);
  const [tries, setTries] = useState(0);
  const second = people.find((one) => one.id === chosen);

  const enter = async (pin: string): Promise<void> => {
    if (second === undefined) return;
    const outcome = await checkPin(second.id, pin);
    if (outcome.type !== 'right') {
      setRefusal(outcome.words);
      // A new pad is an empty one.
      setTries((now) => now + 1);
      return;
    }
    const logged = await walk.done(step, { type: 'second-person' }, outcome.person.id);
    if (logged.type === 'failed') setRefusal(logged.words);
    else setAsking(false);
  };
  const ask = (): HoldOutcome => {
    if (second === undefined) {
      const words = 'Choose the second person first.';
      setRefusal(words);
      return { type: 'failed', words };
    }
    setRefusal(null);
    setAsking(true);
    return { type: 'settled' };
  };

  return (
    <StepFrame
      walk={walk}
      main={<ThumbDome size="big" label={'Enter\ntheir PIN'} onComplete={ask} />}
      panel={
        asking && second !== undefined ? (
          <Keypad
            key={`${second.id} ${tries}`}
            label={`PIN of ${second.name}`}
            initial=""
            secret
            units={[{ key: 'pin', label: '' }]}
            unit="pin"
            words={CHECK_KEYPAD_WORDS}
            {...(refusal === null ? {} : { refusal })}
            onEnter={(pin) => void enter(pin)}
            onCancel={() => {
              setAsking(false);
              setRefusal(null);
            }}
          />
        ) : null
      }
    >
      {people.length === 0 ? (
        <SaysBlock lead="Nobody else has signed in on this tablet.">
          A second person signs in here once with their password and sets a PIN; from then on it works without
          a network.
        </SaysBlock>
      ) : (
        <Choice
          label="Second person"
          options={people.map((one) => ({
            value: one.id,
            label: one.needs_sign_in ? `${one.name}, has to sign in first` : one.name,
            disabled: one.needs_sign_in,
          }))}
          value={chosen}
          onChange={(id) => {
            setChosen(id);
            setRefusal(null);
          }}
        />
      )}
      {refusal === null ? null : (
        <p className="field-refusal" role="alert">
          {refusal}
        </p>
      )}
      <StepNote walk={walk} step={step.key} />
    </StepFrame>
  );
}
