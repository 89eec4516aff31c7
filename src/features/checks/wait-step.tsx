import { Caution } from '../../components/caution';
import { FieldRow } from '../../components/field-row';
import { Reading } from '../../components/reading';
import { SaysBlock } from '../../components/says-block';
import { ThumbDome } from '../../components/thumb-dome';
import { useWait } from '../../data/use-wait';
import type { Step } from '../../domain/book/sheet-spec';
import { StepFrame } from './step-frame';
import type { CheckWalk } from './use-check-walk';
import { secondsLeft, waitPlan, waitShare, type WaitPlan } from './wait-plan';

interface WaitStepProps {
  readonly walk: CheckWalk;
  readonly step: Extract<Step, { type: 'wait' }>;
}

/** The wait before the stick. It never proves a voltage, and says so when it ends. */
export function WaitStep({ walk, step }: WaitStepProps) {
  const { check, revision, settings } = walk;
  const plan = waitPlan(revision.spec, settings);
  const wait = useWait(check.id, step.key);
  const over = secondsLeft(plan, wait.waited_s) === 0;
  return (
    <StepFrame
      walk={walk}
      main={
        over ? (
          <ThumbDome
            size="big"
            label={'Hold:\nI short now'}
            hold="half-second"
            holdLabel="Hold: waited, I short now"
            onComplete={() =>
              walk.done(step, { type: 'wait', required_s: plan.required_s, waited_s: wait.waited_s })
            }
          />
        ) : wait.running ? (
          <ThumbDome
            size="big"
            label={'Waiting'}
            disabled
            reason="The wait is not over yet."
            onComplete={() => undefined}
          />
        ) : (
          <ThumbDome
            size="big"
            label={wait.waited_s > 0 ? 'Go on\nwaiting' : 'Start\nthe wait'}
            onComplete={wait.start}
          />
        )
      }
      also={
        wait.running && !over ? (
          <ThumbDome key="pause" label="Pause the wait" onComplete={wait.pause} />
        ) : undefined
      }
      fields={plan.type === 'known' ? <NodeRows plan={plan} /> : undefined}
    >
      {over ? (
        <p className="check-lead" role="alert">
          Voltage not proven: short now.
        </p>
      ) : (
        <StillWaiting plan={plan} waited_s={wait.waited_s} running={wait.running} />
      )}
      {plan.type === 'unknown' ? <Caution>{plan.words}</Caution> : null}
      <SaysBlock muted>
        Supply to zero, off, key out before it starts. Computed from the supply’s limit, every node by itself;
        the app counts only while it runs.
      </SaysBlock>
    </StepFrame>
  );
}

interface StillWaitingProps {
  readonly plan: WaitPlan;
  readonly waited_s: number;
  readonly running: boolean;
}

function StillWaiting({ plan, waited_s, running }: StillWaitingProps) {
  const state = running ? 'still to wait' : waited_s > 0 ? 'still to wait, paused' : 'to wait, every node';
  return (
    <div className="check-wait">
      {plan.type === 'known' ? (
        <>
          <Reading value={String(secondsLeft(plan, waited_s))} unit="s" size="answer" />
          <span className="muted">{state}</span>
        </>
      ) : (
        <p className="check-lead">
          {running
            ? 'A minute passes before the stick. It proves nothing.'
            : 'A minute is waited all the same. It proves nothing.'}
        </p>
      )}
      <WaitBar share={waitShare(plan, waited_s)} />
    </div>
  );
}

/** Two faces that close as the time goes: a length that can be read across the room. */
function WaitBar({ share }: { readonly share: number }) {
  return (
    <div
      className="check-wait-bar"
      role="progressbar"
      aria-label="Wait"
      aria-valuenow={Math.floor(share * 100)}
    >
      <span style={{ width: `${share * 50}%` }} />
      <span style={{ width: `${share * 50}%` }} />
    </div>
  );
}

function NodeRows({ plan }: { readonly plan: Extract<WaitPlan, { type: 'known' }> }) {
  return (
    <>
      {plan.nodes.map((node) => (
        <FieldRow
          key={node.name}
          label={node.name}
          source="computed"
          value={<span className="check-node">{node.words}</span>}
          carried
        />
      ))}
    </>
  );
}
