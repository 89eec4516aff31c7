import { ThumbDome } from '../../components/thumb-dome';
import type { Step } from '../../domain/book/sheet-spec';
import { StepFrame } from './step-frame';
import { StepNote } from './step-note';
import type { CheckWalk } from './use-check-walk';

interface ConfirmStepProps {
  readonly walk: CheckWalk;
  readonly step: Extract<Step, { type: 'confirm' }>;
}

export function ConfirmStep({ walk, step }: ConfirmStepProps) {
  return (
    <StepFrame
      walk={walk}
      main={
        <ThumbDome
          size="big"
          label={'Hold\nto confirm'}
          hold="half-second"
          holdLabel={`Hold: ${step.title}`}
          onComplete={() => walk.done(step, { type: 'confirm' })}
        />
      }
    >
      <StepNote walk={walk} step={step.key} />
    </StepFrame>
  );
}
