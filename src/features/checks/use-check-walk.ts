import { useMemo, useState } from 'react';
import type { HoldOutcome } from '../../components/hold';
import { useAppend } from '../../data/use-append';
import { useCheck, useLab, usePeople, usePerson, useRig, useSheet } from '../../data/use-book';
import { useDraft } from '../../data/use-draft';
import { useResume } from '../../data/use-resume';
import { useSession } from '../../data/use-session';
import type { StepResult } from '../../domain/book/bodies/check-bodies';
import type { CheckDoc } from '../../domain/book/documents/check';
import { revisionById, type RigDoc, type RigRevision } from '../../domain/book/documents/rig';
import type { SheetDoc } from '../../domain/book/documents/sheet';
import type { LabSettings } from '../../domain/book/rig-spec';
import type { Step } from '../../domain/book/sheet-spec';
import {
  checkProgress,
  mayWaive,
  type CheckProgress,
  type StepProgress,
} from '../../domain/rules/check-progress';
import { afterStep, EMPTY_WALK, type WalkDraft } from './walk-draft';

export interface CheckFacts {
  readonly check: CheckDoc;
  readonly sheet: SheetDoc;
  readonly rig: RigDoc;
  /** The revision that the check was opened on. */
  readonly revision: RigRevision;
  readonly settings: LabSettings | undefined;
}

/** Undefined while something of it is not in the tablet's Book. */
export function useCheckFacts(id: string): CheckFacts | undefined {
  const check = useCheck(id);
  const sheet = useSheet(check?.sheet ?? '');
  const rig = useRig(check?.parent ?? '');
  const settings = useLab()?.settings;
  if (check === undefined || sheet === undefined || rig === undefined) return undefined;
  const revision = revisionById(rig, check.rig_revision);
  return revision === undefined ? undefined : { check, sheet, rig, revision, settings };
}

export interface CheckWalk extends CheckFacts {
  readonly progress: CheckProgress;
  /** The step on the screen; null when all are done and none is being looked at. */
  readonly shown: StepProgress | null;
  /** The shown step is the one to be done now. */
  readonly actionable: boolean;
  readonly draft: WalkDraft;
  readonly change: (next: (now: WalkDraft) => WalkDraft) => void;
  /** Words of the last thing that was done or failed. */
  readonly said: string | null;
  readonly may_waive: boolean;
  readonly nameOf: (person: string | null) => string;
  readonly done: (step: Step, result: StepResult, witness?: string) => Promise<HoldOutcome>;
  readonly waive: (step: Step) => Promise<HoldOutcome>;
  readonly close: () => Promise<HoldOutcome>;
  readonly abandon: () => Promise<HoldOutcome>;
}

const SETTLED: HoldOutcome = { type: 'settled' };

/** Walks one check a step at a time. Earlier steps are read, later ones wait for their turn. */
export function useCheckWalk(facts: CheckFacts): CheckWalk {
  const { check, sheet, revision } = facts;
  const append = useAppend();
  const resume = useResume();
  const session = useSession();
  const person = usePerson(session.state === 'open' ? session.person.id : null);
  const people = usePeople();
  const kept = useDraft<WalkDraft>(`check/${check.id}`, EMPTY_WALK);
  const draft = { ...EMPTY_WALK, ...kept.value };
  const [said, setSaid] = useState<string | null>(null);
  const progress = useMemo(() => checkProgress(sheet, check, revision.spec), [sheet, check, revision.spec]);
  const next = progress.next?.key ?? null;
  const key = draft.viewed ?? next;
  const shown = progress.steps.find((one) => one.step.key === key) ?? null;

  const change = (make: (now: WalkDraft) => WalkDraft): void => {
    kept.set((now) => make({ ...EMPTY_WALK, ...now }));
    resume.field(`check/${key ?? 'close'}`, null);
  };
  const failed = (words: string): HoldOutcome => {
    setSaid(words);
    return { type: 'failed', words };
  };
  const settled = (words: string): HoldOutcome => {
    setSaid(words);
    return SETTLED;
  };

  return {
    ...facts,
    progress,
    shown,
    actionable:
      check.ended === null && shown !== null && (shown.step.key === next || shown.step.key === draft.again),
    draft,
    change,
    said,
    may_waive: shown !== null && mayWaive(shown.step, person?.role ?? null),
    nameOf: (id) => (id === null ? 'author open' : (people.find((one) => one.id === id)?.name ?? 'somebody')),
    done: async (step, result, witness) => {
      const note = (draft.notes[step.key] ?? '').trim();
      const outcome = await append({
        kind: 'check.step-done',
        subject: check.id,
        body: { step: step.key, result, note },
        ...(witness === undefined ? {} : { witness }),
      });
      if (outcome.type !== 'logged') return failed(outcome.words);
      change((now) => afterStep(now, step.key));
      const reason = outcome.forecast?.reason ?? null;
      return settled(
        reason === null
          ? `${step.title}: ${outcome.words}.`
          : `${step.title}: ${outcome.words}. ${reason.words}`,
      );
    },
    waive: async (step) => {
      const why = draft.waiveWhy.trim();
      if (why === '') return failed('Reason: say in words why the step is left out.');
      const body = { step: step.key, why };
      const outcome = await append({ kind: 'check.step-waived', subject: check.id, body });
      if (outcome.type !== 'logged') return failed(outcome.words);
      change((now) => afterStep(now, step.key));
      return settled(`${step.title}: waived, ${outcome.words}.`);
    },
    close: async () => {
      const outcome = await append({ kind: 'check.closed', subject: check.id, body: {} });
      if (outcome.type !== 'logged') return failed(outcome.words);
      kept.clear();
      return settled(`Check closed, ${outcome.words}.`);
    },
    abandon: async () => {
      const why = draft.abandonWhy.trim();
      if (why === '') return failed('Reason: say in words why the check is abandoned.');
      const outcome = await append({ kind: 'check.abandoned', subject: check.id, body: { why } });
      if (outcome.type !== 'logged') return failed(outcome.words);
      kept.clear();
      return settled(`Check abandoned, ${outcome.words}.`);
    },
  };
}
