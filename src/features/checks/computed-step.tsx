import { Caution } from '../../components/caution';
import { ThumbDome } from '../../components/thumb-dome';
import { useNow } from '../../data/use-now';
import { computedShown, shownText, type ComputedStep as Computed } from './computed-shown';
import { StepFrame } from './step-frame';
import { StepNote } from './step-note';
import type { CheckWalk } from './use-check-walk';

/** Figures pulled from the rig, read and confirmed; where there are none, nothing can be confirmed. */
export function ComputedStep({ walk, step }: { readonly walk: CheckWalk; readonly step: Computed }) {
  const { rig, revision, settings } = walk;
  const { best_ms } = useNow(10_000);
  const shown = computedShown(step, { rig, revision, settings, now_ms: best_ms });
  return (
    <StepFrame
      walk={walk}
      main={
        <ThumbDome
          size="big"
          label={'Hold\nto confirm'}
          hold="half-second"
          holdLabel={`Hold: ${step.title}`}
          disabled={!shown.ok}
          {...(shown.ok ? {} : { reason: shown.refusal.words })}
          onComplete={() =>
            shown.ok
              ? walk.done(step, { type: 'computed', shown: shownText(shown.value) })
              : { type: 'failed', words: shown.refusal.words }
          }
        />
      }
    >
      {shown.ok ? (
        <div className="check-computed">
          {shown.value.lines.map((line) => (
            <p key={line}>{line}</p>
          ))}
        </div>
      ) : (
        <Caution>{shown.refusal.words}</Caution>
      )}
      <StepNote walk={walk} step={step.key} />
    </StepFrame>
  );
}
