import type { StepResult } from '../bodies/check-bodies';
import type { EntryOf } from '../read-body';
import type { SheetSpec } from '../sheet-spec';
import { getDoc, putDoc, type Effect } from './effect';
import { kitNote, type KitNote } from './kit';
import { declare, updateRig, voidCheck } from './rig';
import { traceOf, type Standing, type Trace } from './trace';

export interface StepRecord extends Trace {
  readonly state: 'done' | 'waived';
  readonly result: StepResult | null;
  readonly words: string;
  readonly witness: string | null;
  /** Pieces of the register that the step named. */
  readonly kit: readonly string[];
  readonly irregular: string | null;
}

export interface CheckDoc {
  readonly kind: 'check';
  readonly id: string;
  readonly parent: string;
  readonly rig_revision: string;
  readonly sheet: string;
  readonly purpose: SheetSpec['purpose'];
  readonly opened: Trace;
  /** By step key; of several records of one step the last stands and the earlier stay in the Book. */
  readonly steps: Readonly<Record<string, StepRecord>>;
  readonly ended:
    | (Trace & {
        readonly how: 'closed' | 'abandoned';
        readonly irregular: string | null;
        readonly words: string;
      })
    | null;
}

type CheckEntry = EntryOf<
  'check.opened' | 'check.step-done' | 'check.step-waived' | 'check.closed' | 'check.abandoned'
>;

export function* foldCheck(entry: CheckEntry, standing: Standing): Effect {
  const trace = traceOf(entry.meta, standing);
  if (entry.kind === 'check.opened') {
    yield* openCheck(entry, trace);
    return;
  }
  const check = yield* getDoc('check', entry.meta.subject);
  if (check === undefined) return;
  switch (entry.kind) {
    case 'check.step-done':
      yield* putDoc(
        withStep(check, entry.body.step, {
          ...trace,
          state: 'done',
          result: entry.body.result,
          words: entry.body.note,
          kit: entry.body.kit ?? [],
          ...seen(entry, standing),
        }),
      );
      return;
    case 'check.step-waived':
      yield* putDoc(
        withStep(check, entry.body.step, {
          ...trace,
          state: 'waived',
          result: null,
          words: entry.body.why,
          kit: [],
          ...seen(entry, standing),
        }),
      );
      return;
    case 'check.abandoned':
      if (check.ended !== null) return;
      yield* putDoc({
        ...check,
        ended: { ...trace, how: 'abandoned', irregular: standing.irregular, words: entry.body.why },
      });
      yield* updateRig(check.parent, (rig) => ({
        ...rig,
        open_checks: rig.open_checks.filter((id) => id !== check.id),
      }));
      // Left half done: a check that was closed in between did not see how.
      yield* voidAfter(check, trace);
      return;
    case 'check.closed':
      yield* closeCheck(check, trace, standing);
  }
}

function* openCheck(entry: EntryOf<'check.opened'>, trace: Trace): Effect {
  const { rig, rig_revision, sheet } = entry.body;
  const { id } = entry.meta;
  const sheetDoc = yield* getDoc('sheet', sheet);
  // An unknown sheet has no steps to close, so the purpose cannot make anything ready.
  const purpose = sheetDoc?.spec.purpose ?? 'before-firing';
  yield* putDoc({
    kind: 'check',
    id,
    parent: rig,
    rig_revision,
    sheet,
    purpose,
    opened: trace,
    steps: {},
    ended: null,
  });
  const begun = WORK[purpose]?.begun;
  yield* updateRig(rig, (doc) => {
    const opened = { ...doc, open_checks: [...doc.open_checks, id] };
    return begun === undefined ? opened : voidCheck(opened, trace, begun);
  });
}

interface Why {
  readonly code: string;
  readonly words: string;
}

/** Work that takes the rig out of the state that its before-firing check saw, from its beginning to its end. */
const WORK: Partial<Record<SheetSpec['purpose'], { readonly begun: Why; readonly ended: Why }>> = {
  'gas-change': {
    begun: { code: 'gas-changed', words: 'A gas change was begun after the check.' },
    ended: { code: 'gas-changed', words: 'The gas was changed after the check.' },
  },
  'weekly-care': {
    begun: { code: 'weekly-care', words: 'Weekly care was begun after the check.' },
    ended: { code: 'weekly-care', words: 'Weekly care was done after the check.' },
  },
};

function* voidAfter(check: CheckDoc, trace: Trace): Effect {
  const worked = WORK[check.purpose];
  if (worked !== undefined) yield* updateRig(check.parent, (rig) => voidCheck(rig, trace, worked.ended));
}

/**
 * A closed check declares: before firing "short off", make safe "shorted". An irregular closing (a step missing) keeps
 * its place in the history and declares nothing but the danger: short off. The others declare nothing; a closed gas
 * change is a change of the gas.
 */
function* closeCheck(check: CheckDoc, trace: Trace, standing: Standing): Effect {
  if (check.ended !== null) return;
  yield* putDoc({ ...check, ended: { ...trace, how: 'closed', irregular: standing.irregular, words: '' } });
  const kit = yield* namedKit(check);
  yield* updateRig(check.parent, (rig) => {
    const without = { ...rig, open_checks: rig.open_checks.filter((id) => id !== check.id) };
    if (check.purpose === 'make-safe')
      return standing.irregular === null ? declare(without, trace, 'shorted') : without;
    const worked = WORK[check.purpose];
    if (check.purpose === 'gas-change' && worked !== undefined)
      return voidCheck({ ...without, gas_changed: trace }, trace, worked.ended);
    if (check.purpose !== 'before-firing')
      return worked === undefined ? without : voidCheck(without, trace, worked.ended);
    const declared = declare(without, trace, 'short-off');
    if (standing.irregular !== null) return declared;
    const ready_check = {
      check: check.id,
      rig_revision: check.rig_revision,
      closed: trace,
      active: trace.stamp,
      voided: null,
      present: presentAt(check, trace),
      kit,
    };
    return { ...declared, ready_check };
  });
}

/** Who was there: whoever walked the check, and the second person of its steps. */
function presentAt(check: CheckDoc, closed: Trace): readonly string[] {
  const steps = Object.values(check.steps).filter((step) => step.irregular === null);
  const people = [closed.by, ...steps.flatMap((step) => [step.by, step.witness])];
  return [...new Set(people.filter((id) => id !== null))];
}

function* namedKit(check: CheckDoc): Effect<readonly KitNote[]> {
  const notes: KitNote[] = [];
  for (const id of new Set(Object.values(check.steps).flatMap((step) => step.kit))) {
    const kit = yield* getDoc('kit', id);
    if (kit !== undefined) notes.push(kitNote(kit));
  }
  return notes;
}

function withStep(check: CheckDoc, key: string, record: StepRecord): CheckDoc {
  return check.ended === null ? { ...check, steps: { ...check.steps, [key]: record } } : check;
}

function seen(entry: CheckEntry, standing: Standing) {
  return { witness: entry.meta.witness, irregular: standing.irregular };
}
