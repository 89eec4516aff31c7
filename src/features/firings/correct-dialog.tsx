import { useMemo, useState } from 'react';
import { Choice } from '../../components/choice';
import { Dialog } from '../../components/dialog';
import { HoldButton } from '../../components/hold-button';
import type { HoldOutcome } from '../../components/hold';
import { SaysBlock } from '../../components/says-block';
import { useAppend } from '../../data/use-append';
import { useDraft } from '../../data/use-draft';
import { LOOKS } from '../../domain/book/bodies/firing-bodies';
import { standingReading, type ReadingDoc, type StandingReading } from '../../domain/book/documents/reading';
import { LOOK_WORDS } from '../../domain/report/words';
import { beyondEnvelope } from './beyond-envelope';
import { correctionBase, correctionRefusal, strikeRefusal } from './correction';
import { EMPTY_DRAFT, toCorrection, type ReadingDraft } from './reading-form';
import { ReadingFieldsColumn } from './reading-fields-column';
import { isPanelOpen, ReadingPanel } from './reading-panel';
import type { FiringFacts } from './use-firing-facts';
import { useReadingForm } from './use-reading-form';

interface CorrectDialogProps {
  readonly facts: FiringFacts;
  readonly reading: ReadingDoc;
  readonly onClose: () => void;
}

interface CorrectionDraft {
  readonly form: ReadingDraft;
  readonly why: string;
}

/** A reading is corrected by a whole new one, or struck; the one before stays readable. */
export function CorrectDialog({ facts, reading, onClose }: CorrectDialogProps) {
  const now = standingReading(reading);
  return (
    <Dialog title={`Reading ${reading.no}`} closeLabel="Leave as it is" onClose={onClose}>
      {now.type === 'struck' ? (
        <SaysBlock lead="Struck.">{reading.struck?.why ?? ''}</SaysBlock>
      ) : (
        <Correction facts={facts} reading={reading} now={now} onClose={onClose} />
      )}
    </Dialog>
  );
}

interface CorrectionProps extends CorrectDialogProps {
  readonly now: Exclude<StandingReading, { type: 'struck' }>;
}

function Correction({ facts, reading, now, onClose }: CorrectionProps) {
  const before = now.type === 'stands' ? now.values : reading.original;
  const draft = useDraft<CorrectionDraft>(`correction/${reading.id}`, {
    form: { ...EMPTY_DRAFT, note: before.note },
    why: '',
  });
  const base = useMemo(() => correctionBase(before), [before]);
  const form = useReadingForm(base, {
    value: draft.value.form,
    set: (next) => {
      draft.set((held) => ({ ...held, form: next({ ...EMPTY_DRAFT, ...held.form }) }));
    },
  });
  const append = useAppend();
  const [refusal, setRefusal] = useState<string | null>(null);
  const { why } = draft.value;
  const refuse = (words: string): HoldOutcome => {
    setRefusal(words);
    return { type: 'failed', words };
  };
  const settle = (): HoldOutcome => {
    draft.clear();
    onClose();
    return { type: 'settled' };
  };

  const correct = async (): Promise<HoldOutcome> => {
    if (now.type !== 'stands')
      return refuse('Two corrections stand against each other: strike the reading and log it again.');
    const missing = correctionRefusal(form.draft, before, why);
    if (missing !== null) return refuse(missing);
    const values = toCorrection(before, form.draft);
    if (!values.ok) return refuse(values.refusal.words);
    const body = { corrects: now.version, kind: 'firing.reading', body: values.value, why: why.trim() };
    const outcome = await append({ kind: 'entry.corrected', subject: facts.firing.id, body });
    return outcome.type === 'logged' ? settle() : refuse(outcome.words);
  };
  const strike = async (): Promise<HoldOutcome> => {
    const missing = strikeRefusal(why);
    if (missing !== null) return refuse(missing);
    const body = { strikes: reading.id, why: why.trim() };
    const outcome = await append({ kind: 'entry.struck', subject: facts.firing.id, body });
    return outcome.type === 'logged' ? settle() : refuse(outcome.words);
  };

  if (isPanelOpen(form)) return <ReadingPanel form={form} />;
  return (
    <>
      {now.type === 'parted' ? (
        <SaysBlock lead="Corrected twice, apart from each other.">
          {now.versions.map((version) => `${version.values.voltage_kV}\u2009kV: ${version.why}`).join(' / ')}
        </SaysBlock>
      ) : null}
      <div className="correct-columns">
        <ReadingFieldsColumn
          form={form}
          warnings={beyondEnvelope(form.values, facts.envelope)}
          withSummary={false}
        />
        <div className="correct-side">
          <Choice
            label="How it looked"
            options={LOOKS.map((value) => ({ value, label: LOOK_WORDS[value] }))}
            value={form.values.looked}
            onChange={(looked) => {
              form.pick('looked', looked);
            }}
          />
          <label className="firing-reason">
            <span>Reason</span>
            <textarea
              className="firing-words"
              rows={3}
              maxLength={2000}
              aria-invalid={refusal !== null}
              value={why}
              onChange={(event) => {
                const { value } = event.target;
                setRefusal(null);
                draft.set((held) => ({ ...held, why: value }));
              }}
            />
          </label>
          {refusal === null ? null : (
            <p className="field-refusal" role="alert">
              {refusal}
            </p>
          )}
          <div className="correct-acts">
            <HoldButton
              label="Hold to correct"
              holdLabel={`Hold: correct reading ${reading.no}`}
              hold="half-second"
              main
              onComplete={correct}
            />
            <HoldButton
              label="Hold to strike"
              holdLabel={`Hold: strike reading ${reading.no}`}
              hold="second"
              onComplete={strike}
            />
          </div>
        </div>
      </div>
    </>
  );
}
