import type { ReactNode } from 'react';
import { HoldButton } from '../../components/hold-button';
import type { HoldKind, HoldOutcome } from '../../components/hold';
import { WordsField } from '../../components/words-field';
import { useDraft } from '../../data/use-draft';

interface Props {
  /** Keeps the words as a draft under this key. */
  readonly draft: string;
  readonly wordsLabel: string;
  readonly hint?: string;
  /** Said when nothing was written; without it the words may stay empty. */
  readonly needed?: string;
  readonly label: string;
  readonly holdLabel: string;
  readonly hold?: HoldKind;
  /** Why it cannot be done at all; null when it can. */
  readonly hindrance: string | null;
  readonly main?: boolean;
  readonly children?: ReactNode;
  readonly onComplete: (words: string) => Promise<HoldOutcome>;
}

/** Words and the hold that logs them: the shape of every answer given at the Desk. */
export function ActForm(props: Props) {
  const { draft, wordsLabel, hint, needed, label, holdLabel, hold = 'second', main = false } = props;
  const words = useDraft(draft, '');
  const empty = needed !== undefined && words.value.trim() === '' ? needed : null;
  const hindrance = props.hindrance ?? empty;
  return (
    <div className="desk-form">
      <WordsField
        label={wordsLabel}
        value={words.value}
        onChange={(text) => words.set(text)}
        {...(hint === undefined ? {} : { hint })}
      />
      {props.children}
      <div className="desk-buttons">
        <HoldButton
          label={label}
          hold={hold}
          holdLabel={holdLabel}
          main={main}
          disabled={hindrance !== null}
          {...(hindrance === null ? {} : { reason: hindrance })}
          onComplete={async () => {
            const outcome = await props.onComplete(words.value.trim());
            if (outcome.type === 'settled') words.clear();
            return outcome;
          }}
        />
      </div>
      {props.hindrance === null ? null : <p className="muted">{props.hindrance}</p>}
    </div>
  );
}
