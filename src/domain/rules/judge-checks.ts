import type { CheckDoc } from '../book/documents/check';
import { getDoc, type Effect } from '../book/documents/effect';
import { revisionById, type RigDoc } from '../book/documents/rig';
import type { SheetDoc } from '../book/documents/sheet';
import type { EntryOf } from '../book/read-body';
import type { SheetSpec, Step } from '../book/sheet-spec';
import { checkProgress, mayWaive, SHORTEST_WAIT_S, withinLimits } from './check-progress';
import type { JudgeContext } from './judge-context';
import { objection, type Objection } from './objection';
import { sheetRefusal } from './sheet-check';
import { namesRig } from './sheet-fits';

type StepEntry = EntryOf<'check.step-done' | 'check.step-waived' | 'check.closed' | 'check.abandoned'>;
type CheckEntry = StepEntry | EntryOf<'check.opened' | 'sheet.published' | 'sheet.retired'>;

export function* checkObjection(entry: CheckEntry, context: JudgeContext): Effect<Objection | null> {
  switch (entry.kind) {
    case 'sheet.published':
      return yield* sheetObjection(entry.body.spec, entry.body.replaces);
    case 'sheet.retired':
      return (yield* getDoc('sheet', entry.meta.subject)) === undefined
        ? objection('unknown-sheet', 'This check sheet is not in the Book.')
        : null;
    case 'check.opened':
      return yield* openingObjection(entry);
    default:
      return yield* stepObjection(entry, context);
  }
}

function* sheetObjection(spec: SheetSpec, replaces: string | null): Effect<Objection | null> {
  const broken = sheetRefusal(spec);
  if (broken !== null) return objection(broken.code, broken.words);
  if (replaces === null) return null;
  const before = yield* getDoc('sheet', replaces);
  if (before === undefined)
    return objection('unknown-sheet', 'The sheet that it replaces is not in the Book.');
  return before.retired === null
    ? null
    : objection(
        'sheet-replaced',
        'The sheet that it replaces was replaced or retired meanwhile.',
        before.retired.at,
      );
}

function* openingObjection(entry: EntryOf<'check.opened'>): Effect<Objection | null> {
  const { rig, rig_revision, sheet } = entry.body;
  const rigDoc = yield* getDoc('rig', rig);
  if (rigDoc === undefined) return objection('unknown-rig', 'This rig is not in the Book.');
  const revision = revisionById(rigDoc, rig_revision);
  if (revision === undefined) return objection('unknown-revision', 'This revision is not in the Book.');
  const sheetDoc = yield* getDoc('sheet', sheet);
  if (sheetDoc === undefined) return objection('unknown-sheet', 'This check sheet is not in the Book.');
  if (sheetDoc.retired !== null)
    return objection('sheet-retired', 'This check sheet was retired.', sheetDoc.retired.at);
  if (!sheetDoc.spec.topologies.includes(revision.spec.topology))
    return objection('sheet-topology', 'This check sheet is for another kind of circuit.');
  if (!namesRig(sheetDoc.spec, rig)) return objection('sheet-rig', 'This check sheet is for other rigs.');
  if (entry.meta.author === null && sheetDoc.spec.purpose !== 'make-safe') {
    return objection('author-open', 'Only making safe may be walked before a PIN.');
  }
  return null;
}

function* stepObjection(entry: StepEntry, context: JudgeContext): Effect<Objection | null> {
  const check = yield* getDoc('check', entry.meta.subject);
  if (check === undefined) return objection('unknown-check', 'This check is not in the Book.');
  if (check.ended !== null) return objection('check-ended', 'This check has ended.', check.ended.at);
  const sheet = yield* getDoc('sheet', check.sheet);
  const rig = yield* getDoc('rig', check.parent);
  if (sheet === undefined || rig === undefined)
    return objection('unknown-sheet', 'The rig or sheet of this check is not in the Book.');
  return yield* judgeStep(entry, { check, sheet, rig }, context);
}

interface CheckFacts {
  readonly check: CheckDoc;
  readonly sheet: SheetDoc;
  readonly rig: RigDoc;
}

function* judgeStep(entry: StepEntry, facts: CheckFacts, context: JudgeContext): Effect<Objection | null> {
  const spec = revisionById(facts.rig, facts.check.rig_revision)?.spec;
  if (spec === undefined)
    return objection('unknown-revision', 'The revision of this check is not in the Book.');
  switch (entry.kind) {
    case 'check.abandoned':
      return null;
    case 'check.closed':
      return checkProgress(facts.sheet, facts.check, spec).complete
        ? null
        : objection('steps-missing', 'Not every step of the check is done.');
    case 'check.step-waived': {
      const step = stepOf(facts.sheet, entry.body.step);
      if (step === undefined) return objection('unknown-step', 'The sheet has no such step.');
      const person = entry.meta.author === null ? undefined : yield* getDoc('person', entry.meta.author);
      return mayWaive(step, person?.role ?? null)
        ? null
        : objection('may-not-waive', `This step may be waived by: ${step.waive}.`);
    }
    case 'check.step-done': {
      const step = stepOf(facts.sheet, entry.body.step);
      if (step === undefined) return objection('unknown-step', 'The sheet has no such step.');
      if (entry.body.result.type !== step.type)
        return objection('other-step-type', 'The result does not belong to this kind of step.');
      if (step.type === 'second-person') return secondPersonObjection(entry, context);
      const { result } = entry.body;
      if (result.type === 'reading' && !withinLimits(step, result.value, spec))
        return objection('outside-limits', 'The reading is outside its limits.');
      if (result.type === 'wait' && result.waited_s < Math.max(SHORTEST_WAIT_S, result.required_s ?? 0)) {
        return objection('wait-too-short', 'The wait was shorter than the rig asks for.');
      }
      return null;
    }
  }
}

/** Somebody else, who has signed in on this tablet before (protocol 3.5). */
function secondPersonObjection(entry: EntryOf<'check.step-done'>, context: JudgeContext): Objection | null {
  const { witness, author } = entry.meta;
  if (witness === null || witness === author)
    return objection('no-second-person', 'A second person is missing.');
  return context.hasGrant(witness)
    ? null
    : objection('second-person-unknown', 'The second person has never signed in on this tablet.');
}

function stepOf(sheet: SheetDoc, key: string): Step | undefined {
  return sheet.spec.steps.find((step) => step.key === key);
}
