import type { SheetPurpose, SheetSpec, Step, StepGuard, StepType } from '../../../domain/book/sheet-spec';
import { RIG_LIMIT_UNIT, neverWaived, sheetProblems } from '../../../domain/rules/sheet-check';
import { parseQuantity } from '../../../domain/units/parse-number';

type Reading = Extract<Step, { type: 'reading' }>;
type Shows = Extract<Step, { type: 'computed' }>['shows'];

/** A step while it is being written: every kind's fields, so that a change of kind and back loses nothing. */
export interface StepDraft {
  readonly key: string;
  readonly type: StepType;
  readonly title: string;
  readonly detail: string;
  readonly waive: Step['waive'];
  readonly guards: StepGuard | 'none';
  readonly quantity: string;
  readonly unit: string;
  readonly lowest: string;
  readonly highest: string;
  readonly from_rig: NonNullable<Reading['highest_from_rig']> | 'none';
  readonly shows: Shows;
}

export interface SheetDraft {
  readonly begun: boolean;
  readonly title: string;
  readonly purpose: SheetPurpose;
  readonly topologies: readonly SheetSpec['topologies'][number][];
  readonly rigs: readonly string[];
  readonly caution: string;
  readonly steps: readonly StepDraft[];
  /** Highest number that a key of this draft was given, so that none is used again. */
  readonly numbered: number;
  /** Key of the step that is open. */
  readonly open: string | null;
}

export const EMPTY_SHEET: SheetDraft = {
  begun: false,
  title: '',
  purpose: 'before-firing',
  topologies: ['lc-inversion', 'charge-transfer'],
  rigs: [],
  caution: '',
  steps: [],
  numbered: 0,
  open: null,
};

const EMPTY_STEP: Omit<StepDraft, 'key'> = {
  type: 'confirm',
  title: '',
  detail: '',
  waive: 'never',
  guards: 'none',
  quantity: '',
  unit: '',
  lowest: '',
  highest: '',
  from_rig: 'none',
  shows: 'permit',
};

export function draftOf(spec: SheetSpec): SheetDraft {
  return {
    begun: true,
    title: spec.title,
    purpose: spec.purpose,
    topologies: spec.topologies,
    rigs: spec.rigs ?? [],
    caution: spec.caution,
    steps: spec.steps.map(stepDraftOf),
    numbered: Math.max(0, ...spec.steps.map(({ key }) => Number(/^step-(\d+)$/.exec(key)?.[1] ?? 0))),
    open: null,
  };
}

function stepDraftOf(step: Step): StepDraft {
  const { key, type, title, detail, waive, guards = 'none' } = step;
  const base: StepDraft = { ...EMPTY_STEP, key, type, title, detail, waive, guards };
  if (step.type === 'computed') return { ...base, shows: step.shows };
  if (step.type !== 'reading') return base;
  const { quantity, unit, lowest, highest, highest_from_rig } = step;
  return {
    ...base,
    quantity,
    unit,
    lowest: lowest === null ? '' : String(lowest),
    highest: highest === null ? '' : String(highest),
    from_rig: highest_from_rig ?? 'none',
  };
}

/** What stands in the way of publishing, or is advised; beside a step, or with the sheet as a whole. */
export interface DraftProblem {
  readonly step: string | null;
  readonly words: string;
  readonly weight: 'refusal' | 'advice';
}

export interface SheetRead {
  /** Null while something is refused. */
  readonly spec: SheetSpec | null;
  readonly problems: readonly DraftProblem[];
}

export function readSheet(draft: SheetDraft): SheetRead {
  const problems: DraftProblem[] = [];
  const refuse = (step: string | null, words: string): void => {
    problems.push({ step, words, weight: 'refusal' });
  };
  if (draft.title.trim() === '') refuse(null, 'Title: give the sheet a name.');
  if (draft.caution.trim() === '') refuse(null, 'Caution: say what can hurt while it is walked.');
  if (draft.topologies.length === 0) refuse(null, 'Circuits: choose at least one.');
  if (draft.steps.length === 0) refuse(null, 'Steps: add at least one.');
  if (draft.steps.length > 60) refuse(null, 'Steps: 60 at most.');
  const steps = draft.steps.map((step) => readStep(step, refuse));
  const spec: SheetSpec = {
    title: draft.title.trim(),
    purpose: draft.purpose,
    topologies: [...draft.topologies],
    ...(draft.rigs.length === 0 ? {} : { rigs: [...draft.rigs] }),
    caution: draft.caution.trim(),
    steps,
  };
  for (const { step, words, weight } of sheetProblems(spec)) {
    problems.push({ step: step === null ? null : (draft.steps[step]?.key ?? null), words, weight });
  }
  return { spec: problems.some((one) => one.weight === 'refusal') ? null : spec, problems };
}

const LIMIT_RULE = { field: 'limit', unit: '', min: -1e9, max: 1e9 } as const;

function readStep(step: StepDraft, refuse: (step: string, words: string) => void): Step {
  const { key, type, waive, guards } = step;
  const title = step.title.trim();
  if (title === '') refuse(key, 'Title: say what is done.');
  const base = {
    key,
    title,
    detail: step.detail.trim(),
    waive,
    ...(guards === 'none' ? {} : { guards }),
  };
  if (type === 'computed') return { ...base, type, shows: step.shows };
  if (type !== 'reading') return { ...base, type };
  if (step.quantity.trim() === '') refuse(key, 'Quantity: say what is read.');
  if (step.unit.trim() === '') refuse(key, 'Unit: say in what it is read.');
  if (/^bar$/i.test(step.unit.trim()) && !/creep|change|fall|rise|drop|loss|difference/i.test(step.quantity))
    refuse(key, 'Unit: bar(g) or bar(abs); bar alone is for a difference.');
  const limit = (side: 'Lowest' | 'Highest', text: string): number | null => {
    if (text.trim() === '') return null;
    const read = parseQuantity(text, { ...LIMIT_RULE, name: side });
    if (read.ok) return read.value;
    refuse(key, read.refusal.words);
    return null;
  };
  return {
    ...base,
    type,
    quantity: step.quantity.trim(),
    unit: step.unit.trim(),
    lowest: limit('Lowest', step.lowest),
    highest: limit('Highest', step.highest),
    highest_from_rig: step.from_rig === 'none' ? null : step.from_rig,
  };
}

/** The step as it may be published: nobody waives what may never be waived, whatever was chosen before. */
export function changeStep(step: StepDraft, part: Partial<StepDraft>): StepDraft {
  const next = { ...step, ...part };
  const unit =
    next.from_rig === 'none' || part.from_rig === undefined ? next.unit : RIG_LIMIT_UNIT[next.from_rig];
  const fixed = { ...next, unit };
  return neverWaived(looksAs(fixed)) ? { ...fixed, waive: 'never' } : fixed;
}

/** Whether the choice of who may waive it is fixed. */
export function waiveFixed(step: StepDraft): boolean {
  return neverWaived(looksAs(step));
}

function looksAs(step: StepDraft): Step {
  return readStep(step, () => undefined);
}

/** Adds an empty step at the end and opens it. Its key was never used in this sheet, nor in a step taken out of it. */
export function addStep(draft: SheetDraft, type: StepType): SheetDraft {
  const numbered = draft.numbered + 1;
  const step = changeStep({ ...EMPTY_STEP, key: `step-${numbered}` }, { type });
  return { ...draft, begun: true, numbered, steps: [...draft.steps, step], open: step.key };
}

export function takeStepOut(draft: SheetDraft, key: string): SheetDraft {
  return { ...draft, steps: draft.steps.filter((step) => step.key !== key), open: null };
}

/** Moves a step up or down by one; at the end it stays. */
export function moveStep(draft: SheetDraft, key: string, by: -1 | 1): SheetDraft {
  const at = draft.steps.findIndex((step) => step.key === key);
  const [step, other] = [draft.steps[at], draft.steps[at + by]];
  if (step === undefined || other === undefined) return draft;
  const steps = [...draft.steps];
  steps[at] = other;
  steps[at + by] = step;
  return { ...draft, steps };
}

export function withStep(draft: SheetDraft, key: string, part: Partial<StepDraft>): SheetDraft {
  return { ...draft, steps: draft.steps.map((step) => (step.key === key ? changeStep(step, part) : step)) };
}
