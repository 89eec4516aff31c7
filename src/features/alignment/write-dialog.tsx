import { useState } from 'react';
import { Dialog } from '../../components/dialog';
import { HoldButton } from '../../components/hold-button';
import type { HoldOutcome } from '../../components/hold';
import { WordsField } from '../../components/words-field';
import { useAppend } from '../../data/use-append';
import { useDraft } from '../../data/use-draft';
import { useNow } from '../../data/use-now';
import { voidedWords } from '../../domain/rules/voided-by';
import { formatQuantity } from '../../domain/units/format-quantity';
import { alignedSpec } from './alignment-plan';
import type { Measurement } from './alignment-history';
import type { AlignmentScreen } from './use-alignment-screen';

interface Props {
  readonly screen: AlignmentScreen;
  readonly measured: Measurement;
  readonly onClose: () => void;
}

/** The result becomes the rig's numbers: a revision, with what it voids said before. */
export function WriteDialog({ screen, measured, onClose }: Props) {
  const { rig, revision } = screen;
  const append = useAppend();
  const { best_ms } = useNow(60_000);
  const why = useDraft<string>(`alignment-why/${rig.id}`, 'Aligned; spacings as measured.');
  const [failed, setFailed] = useState<string | null>(null);
  const next = alignedSpec(revision.spec, measured.body);
  const refuse = (words: string): HoldOutcome => {
    setFailed(words);
    return { type: 'failed', words };
  };
  const write = async (): Promise<HoldOutcome> => {
    if (!next.ok) return refuse(next.refusal.words);
    if (why.value.trim() === '') return refuse('Say why the rig is revised.');
    const outcome = await append({
      kind: 'rig.revised',
      subject: rig.id,
      body: { based_on: revision.entry, spec: next.value, why: why.value.trim() },
    });
    if (outcome.type !== 'logged') return refuse(outcome.words);
    why.clear();
    onClose();
    return { type: 'settled' };
  };
  return (
    <Dialog
      title={`Write to ${rig.name}`}
      closeLabel="Leave the rig as it is"
      onClose={onClose}
      actions={
        <HoldButton
          label="Hold to revise"
          hold="second"
          holdLabel={`Hold: revise ${rig.name}`}
          main
          disabled={!next.ok}
          onComplete={write}
        />
      }
    >
      {next.ok ? (
        <p>
          Channel spacing, A end {mm(revision.spec.channel.spacing_a_mm)} →{' '}
          <b>{mm(next.value.channel.spacing_a_mm)}</b>; B end {mm(revision.spec.channel.spacing_b_mm)} →{' '}
          <b>{mm(next.value.channel.spacing_b_mm)}</b>
        </p>
      ) : (
        <p role="alert">{next.refusal.words}</p>
      )}
      {voidedWords(rig, best_ms).map((words) => (
        <p key={words}>{words}</p>
      ))}
      <WordsField label="Why" rows={1} value={why.value} onChange={why.set} />
      {failed === null ? null : <p role="alert">{failed}</p>}
    </Dialog>
  );
}

function mm(value_mm: number): string {
  return formatQuantity(value_mm, 'mm', { digits: { decimals: 2 }, rounding: 'nearest' });
}
