import { useState } from 'react';
import { SaysBlock } from '../../components/says-block';
import { useSessionActions } from '../../data/use-session';
import { PinPad } from './pin-pad';

/** Chosen twice, so that a slip does not lock its owner out. */
export function PinNew({ name, onDone }: { readonly name: string; readonly onDone: () => void }) {
  const { setPin } = useSessionActions();
  const [first, setFirst] = useState<string | null>(null);
  const [refusal, setRefusal] = useState<string | null>(null);
  const startAgain = (words: string): string => {
    setFirst(null);
    setRefusal(words);
    return words;
  };
  const take = async (pin: string): Promise<string | null> => {
    if (first === null) {
      if (pin.length < 6) return 'A PIN has at least 6 figures.';
      setFirst(pin);
      return null;
    }
    if (pin !== first) {
      return startAgain('The two were not the same. Choose again.');
    }
    const outcome = await setPin(pin);
    if (outcome.type === 'set') {
      onDone();
      return null;
    }
    return startAgain(outcome.words);
  };
  return (
    <div className="account">
      <SaysBlock lead={`${name}, choose a PIN for this tablet.`}>
        It opens the Book without a network. It says who you are; it keeps no secret from whoever copies the
        disk, so rely on the tablet’s own disk encryption for that.
      </SaysBlock>
      <PinPad
        key={first === null ? 'first' : 'again'}
        label={first === null ? 'New PIN, at least 6 figures' : 'The same PIN again'}
        enterLabel="Next"
        saysFirst={first === null ? refusal : null}
        onPin={take}
      />
    </div>
  );
}
