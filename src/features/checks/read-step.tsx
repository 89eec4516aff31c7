import { SaysBlock } from '../../components/says-block';
import { ThumbDome } from '../../components/thumb-dome';
import type { StepProgress } from '../../domain/rules/check-progress';
import { StepFrame } from './step-frame';
import { recordWords, STATE_WORDS } from './step-words';
import type { CheckWalk } from './use-check-walk';

/** A step that is not the one to be done now: readable, and an earlier one may be done again. */
export function ReadStep({ walk, shown }: { readonly walk: CheckWalk; readonly shown: StepProgress }) {
  const { change, nameOf, check, progress } = walk;
  const open = check.ended === null;
  const goOn = (): void => {
    change((now) => ({ ...now, viewed: null, again: null, list: false }));
  };
  return (
    <StepFrame
      walk={walk}
      main={
        <ThumbDome
          size="big"
          label={open ? 'Back to\nthe walk' : 'Show\nthe list'}
          onComplete={open ? goOn : openList}
        />
      }
      also={
        open && shown.record !== null ? (
          <ThumbDome
            key="again"
            label="Do it again"
            onComplete={() => {
              change((now) => ({ ...now, again: shown.step.key }));
            }}
          />
        ) : undefined
      }
    >
      <SaysBlock lead={`${STATE_WORDS[shown.state]}:`}>{recordWords(shown, nameOf)}</SaysBlock>
      {shown.record === null && progress.next !== null && open ? (
        <SaysBlock muted>Its turn comes after “{progress.next.title}”.</SaysBlock>
      ) : null}
    </StepFrame>
  );

  function openList(): void {
    change((now) => ({ ...now, list: true }));
  }
}
