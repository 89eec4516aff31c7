import { useState } from 'react';
import { Dialog } from '../../components/dialog';
import type { HoldKind, HoldOutcome } from '../../components/hold';
import { HoldButton } from '../../components/hold-button';

interface ReasonDialogProps {
  readonly title: string;
  readonly label: string;
  readonly words: string;
  readonly onWords: (words: string) => void;
  readonly act: string;
  readonly hold: HoldKind;
  readonly onAct: () => Promise<HoldOutcome>;
  readonly onClose: () => void;
}

/** Words first, then the hold: nothing is left out or given up without saying why. */
export function ReasonDialog({ title, label, words, onWords, act, hold, onAct, onClose }: ReasonDialogProps) {
  const [refusal, setRefusal] = useState<string | null>(null);
  return (
    <Dialog
      title={title}
      closeLabel="Leave as it is"
      onClose={onClose}
      actions={
        <HoldButton
          label={act}
          hold={hold}
          main
          onComplete={async () => {
            const outcome = await onAct();
            if (outcome.type === 'failed') setRefusal(outcome.words);
            else onClose();
            return outcome;
          }}
        />
      }
    >
      <label className="check-words-label">
        <span>{label}</span>
        <textarea
          className="check-words"
          rows={3}
          maxLength={2000}
          aria-invalid={refusal !== null}
          value={words}
          onChange={(event) => {
            setRefusal(null);
            onWords(event.target.value);
          }}
        />
      </label>
      {refusal === null ? null : (
        <p className="field-refusal" role="alert">
          {refusal}
        </p>
      )}
    </Dialog>
  );
}
