import { Caution } from '../../../components/caution';
import { SaysBlock } from '../../../components/says-block';
import { WordsField } from '../../../components/words-field';
import type { RigParts } from './use-rig-parts';

/** A part about to be retired: its ledger ends, and stays. */
export function RetirePart({ parts }: { readonly parts: RigParts }) {
  const { part, retire } = parts;
  if (part === null) return <SaysBlock muted>Choose the part in the list first.</SaysBlock>;
  return (
    <div className="edit-section">
      <p className="m-0">
        <b>{part.fitted.what}</b> is retired. What it has endured stays in the Book.
      </p>
      <Caution>A part that is retired voids the before-firing check: it has to be walked again.</Caution>
      <WordsField
        label="Why"
        hint="punctured, worn, replaced"
        value={retire.value.why}
        onChange={(why) => retire.set({ why })}
      />
    </div>
  );
}
