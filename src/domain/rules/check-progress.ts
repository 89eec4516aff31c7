import type { CheckDoc, StepRecord } from '../book/documents/check';
import type { SheetDoc } from '../book/documents/sheet';
import type { RigSpec } from '../book/rig-spec';
import type { Step } from '../book/sheet-spec';
import type { StepResult } from '../book/bodies/check-bodies';
import type { Role } from '../book/bodies/people-bodies';
import { isRole } from './roles';
import { neverWaived } from './sheet-check';

export interface StepProgress {
  readonly step: Step;
  readonly record: StepRecord | null;
  readonly state: 'open' | 'done' | 'waived' | 'outside-limits';
}

export interface CheckProgress {
  readonly steps: readonly StepProgress[];
  /** The first step still open; null when every step is done or properly waived. */
  readonly next: Step | null;
  readonly complete: boolean;
}

export function checkProgress(sheet: SheetDoc, check: CheckDoc, spec: RigSpec): CheckProgress {
  const steps = sheet.spec.steps.map((step) => progressOf(step, check.steps[step.key] ?? null, spec));
  const next = steps.find((one) => one.state === 'open' || one.state === 'outside-limits')?.step ?? null;
  return { steps, next, complete: next === null };
}

/** Irregular for its value alone: judged again below, since a correction may have put the value right. */
const BY_VALUE: ReadonlySet<string> = new Set(['outside-limits', 'wait-too-short', 'no-second-person']);

function progressOf(step: Step, record: StepRecord | null, spec: RigSpec): StepProgress {
  if (record === null) return { step, record, state: 'open' };
  // What was irregular counts as an observation, never as leave to go on (protocol 1.2).
  if (record.irregular !== null && !BY_VALUE.has(record.irregular)) return { step, record, state: 'open' };
  if (record.state === 'waived') return { step, record, state: 'waived' };
  if (record.result === null || record.result.type !== step.type) return { step, record, state: 'open' };
  if (record.result.type === 'reading' && !withinLimits(step, record.result.value, spec))
    return { step, record, state: 'outside-limits' };
  if (record.result.type === 'wait' && !waitedLongEnough(record.result))
    return { step, record, state: 'open' };
  if (record.result.type === 'second-person' && !hasSecondPerson(record))
    return { step, record, state: 'open' };
  return { step, record, state: 'done' };
}

/** The least wait that any rig asks for (PRODUCT: Checks). */
export const SHORTEST_WAIT_S = 60;

/** With an unknown bleed no wait is ever enough by itself, but 60 s are still waited before the short. */
function waitedLongEnough(result: Extract<StepResult, { type: 'wait' }>): boolean {
  return result.waited_s >= Math.max(SHORTEST_WAIT_S, result.required_s ?? SHORTEST_WAIT_S);
}

function hasSecondPerson(record: StepRecord): boolean {
  return record.witness !== null && record.witness !== record.by;
}

export interface Limits {
  readonly lowest: number | null;
  readonly highest: number | null;
}

/** Limits of a reading step on this revision of the rig. */
export function stepLimits(step: Step, spec: RigSpec): Limits {
  if (step.type !== 'reading') return { lowest: null, highest: null };
  const fromRig =
    step.highest_from_rig === 'envelope.max_bar_g'
      ? spec.envelope.max_bar_g
      : step.highest_from_rig === 'envelope.max_kV'
        ? spec.envelope.max_kV
        : null;
  const highest = fromRig === null ? step.highest : Math.min(fromRig, step.highest ?? fromRig);
  return { lowest: step.lowest, highest };
}

export function withinLimits(step: Step, value: number, spec: RigSpec): boolean {
  const { lowest, highest } = stepLimits(step, spec);
  return (lowest === null || value >= lowest) && (highest === null || value <= highest);
}

/** Each step says who may leave it out: never, a reviewer, or the operator. */
export function mayWaive(step: Step, role: Role | null): boolean {
  if (step.waive === 'never' || neverWaived(step)) return false;
  if (step.waive === 'reviewer') return isRole(role, 'reviewer', 'lead');
  return isRole(role, 'operator', 'reviewer', 'lead');
}
