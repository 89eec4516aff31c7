import { useNavigate } from 'react-router-dom';
import { Caution } from '../../components/caution';
import { SaysBlock } from '../../components/says-block';
import { ThumbDome } from '../../components/thumb-dome';
import { paths } from '../../config/paths';
import { StepFrame } from './step-frame';
import type { CheckWalk } from './use-check-walk';

/** Every step is done: the check can be closed, and closing it declares. */
export function CloseStep({ walk }: { readonly walk: CheckWalk }) {
  const { sheet, rig, progress } = walk;
  const waived = progress.steps.filter((one) => one.state === 'waived').length;
  const makesSafe = sheet.spec.purpose === 'make-safe';
  return (
    <StepFrame
      walk={walk}
      main={
        <ThumbDome
          size="big"
          critical
          label={'Close\ncheck'}
          hold="second"
          holdLabel="Hold: close check"
          onComplete={walk.close}
        />
      }
    >
      <h1 className="check-title">Every step is done{waived === 0 ? '' : ` or waived, ${waived} of them`}</h1>
      <p className="check-detail">
        Closing declares {rig.name}: <b>{makesSafe ? 'shorted' : 'short off'}</b>, by you, now.
      </p>
      <Caution>
        {makesSafe
          ? 'A declaration is no measurement. The shorts stay on.'
          : 'From here on treat it as charged. The check lapses after 30 min without activity, and after 4 h.'}
      </Caution>
    </StepFrame>
  );
}

/** The check has ended: what it declared, and where to go from here. */
export function EndedStep({ walk }: { readonly walk: CheckWalk }) {
  const { check, sheet, rig, nameOf, change } = walk;
  const navigate = useNavigate();
  const { ended } = check;
  if (ended === null) return null;
  const toFire = ended.how === 'closed' && sheet.spec.purpose === 'before-firing';
  return (
    <StepFrame
      walk={walk}
      main={
        toFire ? (
          <ThumbDome
            size="big"
            label={'To\nfiring'}
            onComplete={() => void navigate(paths.openFiring(rig.id))}
          />
        ) : (
          <ThumbDome
            size="big"
            label={'All\nchecks'}
            onComplete={() => void navigate(paths.checks(rig.id))}
          />
        )
      }
      also={
        <ThumbDome
          key="list"
          label="Show the list"
          onComplete={() => {
            change((now) => ({ ...now, list: true }));
          }}
        />
      }
    >
      <h1 className="check-title">
        {ended.how === 'closed' ? 'Closed' : 'Abandoned'} by {nameOf(ended.by)}
      </h1>
      {ended.how === 'abandoned' ? (
        <SaysBlock>{ended.words}</SaysBlock>
      ) : (
        <p className="check-detail">
          {ended.irregular === null
            ? `${rig.name} was declared ${toFire ? 'short off' : 'shorted'}.`
            : 'Steps were missing: it declared nothing but the danger.'}
        </p>
      )}
    </StepFrame>
  );
}
