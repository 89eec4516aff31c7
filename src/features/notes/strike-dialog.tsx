import { useState } from 'react';
import { Dialog } from '../../components/dialog';
import type { HoldOutcome } from '../../components/hold';
import { HoldButton } from '../../components/hold-button';
import { WordsField } from '../../components/words-field';

interface Props {
  readonly title: string;
  readonly onStrike: (why: string) => Promise<HoldOutcome>;
  readonly onClose: () => void;
}

/** Nothing is erased: it stays readable, struck, with the reason. */
export function StrikeDialog({ title, onStrike, onClose }: Props) {
  const [why, setWhy] = useState('');
  return (
    <Dialog
      title={title}
      onClose={onClose}
      closeLabel="Leave it"
      actions={
        <HoldButton
          label="Hold to strike"
          hold="half-second"
          disabled={why.trim() === ''}
          {...(why.trim() === '' ? { reason: 'Say why first.' } : {})}
          onComplete={async () => {
            const outcome = await onStrike(why);
            if (outcome.type === 'settled') onClose();
            return outcome;
          }}
        />
      }
    >
      <p>It stays readable, with who struck it and why.</p>
      <WordsField label="Why" value={why} onChange={setWhy} />
    </Dialog>
  );
}
