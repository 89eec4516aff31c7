import { useState, type ReactNode } from 'react';
import { Link } from 'react-router-dom';
import { FieldColumn } from '../../components/field-column';
import { FieldRow } from '../../components/field-row';
import { Screen } from '../../components/frame';
import { SaysBlock } from '../../components/says-block';
import { ThumbDome } from '../../components/thumb-dome';
import { ThumbZone } from '../../components/thumb-zone';
import { paths } from '../../config/paths';
import { PURPOSE_WORDS } from '../../domain/report/words';
import { ReasonDialog } from './reason-dialog';
import { StepList } from './step-list';
import type { CheckWalk } from './use-check-walk';

interface StepFrameProps {
  readonly walk: CheckWalk;
  /** The dome of this step. */
  readonly main: ReactNode;
  /** Beside it, such as a pause. */
  readonly also?: ReactNode;
  /** Instead of the step, such as the keypad. */
  readonly panel?: ReactNode | null;
  readonly fields?: ReactNode;
  readonly children: ReactNode;
}

/** What every step has round it: how far the walk is, the whole list one touch away, waiving and abandoning. */
export function StepFrame({ walk, main, also, panel, fields, children }: StepFrameProps) {
  const { draft, change, shown, check } = walk;
  const [asking, setAsking] = useState<'waive' | 'abandon' | null>(null);
  const open = check.ended === null;
  const mayWaive = open && walk.actionable && walk.may_waive;
  const step = shown?.step;
  const hideList = (): void => {
    change((now) => ({ ...now, list: false }));
  };
  const others = [
    also,
    mayWaive ? (
      <ThumbDome
        key="waive"
        label="Waive step"
        onComplete={() => {
          setAsking('waive');
        }}
      />
    ) : null,
  ].filter((dome) => dome !== null && dome !== undefined);
  return (
    <Screen
      fields={
        <FieldColumn label="Check">
          <WalkRow walk={walk} />
          {fields}
          {open ? (
            <FieldRow
              label="Abandon check"
              source="with a reason"
              value=""
              onPress={() => {
                setAsking('abandon');
              }}
            />
          ) : null}
        </FieldColumn>
      }
      thumbs={
        draft.list ? (
          // A step that is hidden behind the list cannot be done by a thumb that rests there.
          <ThumbZone
            label="Actions"
            main={<ThumbDome size="big" label={'Back to\nthe step'} onComplete={hideList} />}
          />
        ) : (
          <ThumbZone label="Actions" main={main} others={others} />
        )
      }
    >
      {draft.list ? <StepList walk={walk} /> : (panel ?? <StepFigure walk={walk}>{children}</StepFigure>)}
      {asking === 'waive' && step !== undefined ? (
        <ReasonDialog
          title={`Waive: ${step.title}`}
          label="Why it is left out"
          words={draft.waiveWhy}
          onWords={(waiveWhy) => {
            change((now) => ({ ...now, waiveWhy }));
          }}
          act="Hold to waive"
          hold="half-second"
          onAct={() => walk.waive(step)}
          onClose={() => {
            setAsking(null);
          }}
        />
      ) : null}
      {asking === 'abandon' ? (
        <ReasonDialog
          title="Abandon this check"
          label="Why it is abandoned"
          words={draft.abandonWhy}
          onWords={(abandonWhy) => {
            change((now) => ({ ...now, abandonWhy }));
          }}
          act="Hold to abandon"
          hold="second"
          onAct={walk.abandon}
          onClose={() => {
            setAsking(null);
          }}
        />
      ) : null}
    </Screen>
  );
}

function WalkRow({ walk }: { readonly walk: CheckWalk }) {
  const { progress, shown, draft, change } = walk;
  const total = progress.steps.length;
  const at = shown === null ? total : progress.steps.indexOf(shown) + 1;
  return (
    <FieldRow
      label={shown === null ? 'All steps' : 'Step'}
      source={draft.list ? 'hide the list' : 'show the list'}
      value={<span className="check-count">{shown === null ? total : `${at} of ${total}`}</span>}
      onPress={() => {
        change((now) => ({ ...now, list: !now.list }));
      }}
    />
  );
}

function StepFigure({ walk, children }: { readonly walk: CheckWalk; readonly children: ReactNode }) {
  const { shown, sheet, rig, revision, said, check } = walk;
  return (
    <div className="check-figure">
      <p className="muted">
        {PURPOSE_WORDS[sheet.spec.purpose]}, {rig.name}, revision {revision.number};{' '}
        <Link to={paths.notesOf('check', check.id)}>notes and photos</Link>
      </p>
      {shown === null ? null : (
        <>
          <h1 className="check-title">{shown.step.title}</h1>
          {shown.step.detail === '' ? null : <p className="check-detail">{shown.step.detail}</p>}
        </>
      )}
      {children}
      <After walk={walk} />
      <div role="status">{said === null ? null : <SaysBlock muted>{said}</SaysBlock>}</div>
    </div>
  );
}

/** What comes next, so that a hand can get ready for it. */
function After({ walk }: { readonly walk: CheckWalk }) {
  const { progress, shown, actionable } = walk;
  const after = shown === null ? undefined : progress.steps[progress.steps.indexOf(shown) + 1];
  return actionable && after !== undefined ? (
    <p className="check-after muted">Then: {after.step.title}</p>
  ) : null;
}
