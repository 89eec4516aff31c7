import { useParams } from 'react-router-dom';
import { Screen } from '../../components/frame';
import { SaysBlock } from '../../components/says-block';
import { useSession } from '../../data/use-session';
import { CloseStep, EndedStep } from './close-step';
import { ComputedStep } from './computed-step';
import { ConfirmStep } from './confirm-step';
import { PhotoStep } from './photo-step';
import { ReadStep } from './read-step';
import { ReadingStep } from './reading-step';
import { SecondPersonStep } from './second-person-step';
import { useCheckFacts, useCheckWalk, type CheckFacts, type CheckWalk } from './use-check-walk';
import { WaitStep } from './wait-step';
import './checks.css';

/** One check, one step at a time. Making safe is walked before any PIN too; the others wait for one. */
export function CheckRoute() {
  const { check: id = '' } = useParams();
  const facts = useCheckFacts(id);
  const session = useSession();
  if (facts === undefined) {
    return <Told lead="This check is not in the tablet’s Book.">The Book may still be filling.</Told>;
  }
  if (session.state === 'locked' && facts.check.purpose !== 'make-safe') {
    return (
      <Told lead="This check needs a person.">
        Unlock the tablet first; only making safe is walked before a PIN.
      </Told>
    );
  }
  return <Walk key={id} facts={facts} />;
}

function Walk({ facts }: { readonly facts: CheckFacts }) {
  const walk = useCheckWalk(facts);
  const { shown, actionable, check } = walk;
  if (shown !== null && (!actionable || check.ended !== null) && walk.draft.viewed !== null)
    return <ReadStep key={shown.step.key} walk={walk} shown={shown} />;
  if (check.ended !== null) return <EndedStep walk={walk} />;
  if (shown === null) return <CloseStep walk={walk} />;
  return <ActStep key={shown.step.key} walk={walk} />;
}

function ActStep({ walk }: { readonly walk: CheckWalk }) {
  const step = walk.shown?.step;
  switch (step?.type) {
    case undefined:
      return null;
    case 'confirm':
      return <ConfirmStep walk={walk} step={step} />;
    case 'reading':
      return <ReadingStep walk={walk} step={step} />;
    case 'wait':
      return <WaitStep walk={walk} step={step} />;
    case 'photo':
      return <PhotoStep walk={walk} step={step} />;
    case 'second-person':
      return <SecondPersonStep walk={walk} step={step} />;
    case 'computed':
      return <ComputedStep walk={walk} step={step} />;
  }
}

function Told({ lead, children }: { readonly lead: string; readonly children: string }) {
  return (
    <Screen>
      <div className="check-figure">
        <SaysBlock lead={lead}>{children}</SaysBlock>
      </div>
    </Screen>
  );
}
