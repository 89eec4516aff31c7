import { describe, expect, it } from 'vitest';
import { PureBench } from '../../../tests/support/pure-bench';
import { ADA, idOf, MILO, TABLET_B, TARIQ, type WriteOptions } from '../../../tests/support/pure-book';
import { testSpec } from '../../../tests/support/test-lab';
import type { StepResult } from '../book/bodies/check-bodies';
import type { SheetSpec, Step } from '../book/sheet-spec';
import { checkProgress, mayWaive, stepLimits } from './check-progress';

const base = { detail: '', waive: 'never' } as const;
const STEPS: readonly Step[] = [
  { ...base, type: 'confirm', key: 'tags', title: 'Tags out' },
  {
    ...base,
    type: 'reading',
    key: 'creep',
    title: 'Creep',
    quantity: 'creep',
    unit: 'bar(g)',
    lowest: null,
    highest: 0.05,
    highest_from_rig: null,
  },
  {
    ...base,
    type: 'reading',
    key: 'vessel',
    title: 'Vessel',
    quantity: 'pressure',
    unit: 'bar(g)',
    lowest: 0,
    highest: 5,
    highest_from_rig: 'envelope.max_bar_g',
  },
  { ...base, type: 'wait', key: 'wait', title: 'Wait' },
  { ...base, type: 'second-person', key: 'second', title: 'All clear' },
  { ...base, type: 'confirm', key: 'door', title: 'Door sign', waive: 'reviewer' },
  { ...base, type: 'confirm', key: 'note', title: 'Numbers noted', waive: 'operator' },
];
const SHEET: SheetSpec = {
  title: 'Long',
  purpose: 'before-firing',
  topologies: ['charge-transfer'],
  caution: 'Treat as charged.',
  steps: [...STEPS],
};

function open() {
  const bench = new PureBench();
  const { book, rig } = bench;
  const sheet = book.write('sheet.published', null, { spec: SHEET, replaces: null }, { by: MILO }).entry.id;
  const check = book.write('check.opened', null, { rig, rig_revision: rig, sheet }).entry.id;
  const done = (step: string, result: StepResult, options: WriteOptions = {}) =>
    book.write('check.step-done', check, { step, result, note: '' }, options);
  const waive = (step: string, by = ADA) =>
    book.write('check.step-waived', check, { step, why: 'Not fitted' }, { by });
  const states = () =>
    Object.fromEntries(
      checkProgress(book.doc('sheet', sheet), book.doc('check', check), testSpec).steps.map((one) => [
        one.step.key,
        one.state,
      ]),
    );
  return { bench, book, rig, sheet, check, done, waive, states };
}

const second: StepResult = { type: 'second-person' };
const reading = (value: number): StepResult => ({ type: 'reading', value, unit: 'bar(g)' });

describe('publishing and opening', () => {
  it('refuses two steps of one key and a second person who may be waived', () => {
    const { book } = new PureBench();
    const publish = (steps: Step[], replaces: string | null = null) =>
      book.write('sheet.published', null, { spec: { ...SHEET, steps }, replaces }, { by: MILO }).reason
        ?.code ?? 'applied';
    const [tags, , , , person] = STEPS as readonly [Step, Step, Step, Step, Step];
    expect(publish([tags, tags])).toBe('step-keys');
    expect(publish([tags, { ...person, waive: 'operator' }])).toBe('second-person-waivable');
    expect(publish([tags], idOf(1))).toBe('unknown-sheet');
    expect(publish([tags])).toBe('applied');
    expect(book.write('sheet.retired', idOf(1), { why: '?' }, { by: MILO }).reason?.code).toBe(
      'unknown-sheet',
    );
  });

  it('opens on a rig, revision and sheet of the Book, and on none that was retired', () => {
    const { book, rig, sheet } = open();
    const code = (more: object) =>
      book.write('check.opened', null, { rig, rig_revision: rig, sheet, ...more }).reason?.code ?? 'applied';
    expect([
      code({ rig: idOf(1) }),
      code({ rig_revision: idOf(1) }),
      code({ sheet: idOf(1) }),
      code({}),
    ]).toEqual(['unknown-rig', 'unknown-revision', 'unknown-sheet', 'applied']);
    book.write('sheet.published', null, { spec: SHEET, replaces: sheet }, { by: MILO });
    expect(code({})).toBe('sheet-retired');
  });
});

describe('doing the steps', () => {
  it('goes from step to step and is complete when each is done or properly waived', () => {
    const { book, check, sheet, done, waive } = open();
    const progress = () => checkProgress(book.doc('sheet', sheet), book.doc('check', check), testSpec);
    expect(progress()).toMatchObject({ complete: false, next: { key: 'tags' } });
    const written = [
      done('tags', { type: 'confirm' }),
      done('creep', reading(0.05)),
      done('vessel', reading(1.2)),
      done('wait', { type: 'wait', required_s: 75, waited_s: 75 }),
      done('second', second, { witness: MILO }),
      waive('door', MILO),
      waive('note'),
    ];
    expect(written.map((one) => one.verdict)).toEqual(written.map(() => 'applied'));
    expect(progress()).toMatchObject({ complete: true, next: null });
    expect(book.write('check.closed', check, {}).verdict).toBe('applied');
  });

  it('leaves a reading outside its limits open, also where the rig is stricter than the sheet', () => {
    const { done, states } = open();
    expect(done('creep', reading(0.06)).reason?.code).toBe('outside-limits');
    expect(done('vessel', reading(1.3)).reason?.code).toBe('outside-limits');
    expect(done('vessel', reading(-0.1)).reason?.code).toBe('outside-limits');
    expect(states()).toMatchObject({ creep: 'outside-limits', vessel: 'outside-limits' });
    const [, creep, vessel] = STEPS as readonly [Step, Step, Step];
    expect(stepLimits(vessel, testSpec)).toEqual({ lowest: 0, highest: 1.2 });
    expect(stepLimits(creep, testSpec)).toEqual({ lowest: null, highest: 0.05 });
  });

  it('takes a corrected reading for what it says now', () => {
    const { book, check, done, states } = open();
    const slip = done('creep', reading(0.5)).entry.id;
    const body = { step: 'creep', result: reading(0.05), note: 'Slip of the keypad' };
    const corrected = book.write('entry.corrected', check, {
      corrects: slip,
      kind: 'check.step-done',
      body,
      why: '',
    });
    expect(corrected.verdict).toBe('applied');
    expect(states()).toMatchObject({ creep: 'done' });
  });

  it('waits what the rig asks for, and a minute where the bleed is not known or quick', () => {
    const { done, states } = open();
    const wait = (required_s: number | null, waited_s: number) => {
      const { verdict } = done('wait', { type: 'wait', required_s, waited_s });
      return [verdict, states()['wait']];
    };
    expect(wait(90, 89)).toEqual(['irregular', 'open']);
    expect(wait(10, 59)).toEqual(['irregular', 'open']);
    expect(wait(null, 59)).toEqual(['irregular', 'open']);
    expect(wait(null, 60)).toEqual(['applied', 'done']);
    expect(wait(90, 90)).toEqual(['applied', 'done']);
  });

  it('wants a second person who is another one and has signed in on this tablet', () => {
    const { done, states } = open();
    const state = (options: WriteOptions) => [
      done('second', second, options).reason?.code ?? 'applied',
      states()['second'],
    ];
    expect(state({})).toEqual(['no-second-person', 'open']);
    expect(state({ witness: ADA })).toEqual(['no-second-person', 'open']);
    expect(state({ witness: TARIQ })).toEqual(['second-person-unknown', 'open']);
    expect(state({ witness: MILO })).toEqual(['applied', 'done']);
  });

  it('counts no step of somebody whose role does not include walking a check', () => {
    const { done, states } = open();
    expect(done('tags', { type: 'confirm' }, { by: TARIQ }).reason?.code).toBe('role');
    expect(states()).toMatchObject({ tags: 'open' });
  });

  it('waives only what the sheet lets this role waive', () => {
    const { waive, states } = open();
    expect([
      waive('tags', MILO).reason?.code,
      waive('door').reason?.code,
      waive('note').reason?.code,
    ]).toEqual(['may-not-waive', 'may-not-waive', undefined]);
    expect(states()).toMatchObject({ tags: 'open', door: 'open', note: 'waived' });
    const [tags, , , , , door, note] = STEPS as readonly [Step, Step, Step, Step, Step, Step, Step];
    expect([
      mayWaive(tags, 'lead'),
      mayWaive(door, 'operator'),
      mayWaive(door, 'reviewer'),
      mayWaive(note, 'operator'),
      mayWaive(note, 'reader'),
      mayWaive(note, null),
    ]).toEqual([false, false, true, true, false, false]);
  });

  it('refuses results of another step, unknown steps and anything after the end', () => {
    const { book, check, done } = open();
    expect(done('nowhere', { type: 'confirm' }).reason?.code).toBe('unknown-step');
    expect(done('tags', reading(1)).reason?.code).toBe('other-step-type');
    expect(book.write('check.closed', check, {}).reason?.code).toBe('steps-missing');
    expect(done('tags', { type: 'confirm' }).reason?.code).toBe('check-ended');
    expect(book.write('check.closed', idOf(1), {}).reason?.code).toBe('unknown-check');
  });

  it('is the same on any tablet: what was irregular stays readable', () => {
    const { book, check, done } = open();
    const odd = done('second', second, { witness: TARIQ, device: TABLET_B });
    expect(book.doc('check', check).steps['second']).toMatchObject({
      entry: odd.entry.id,
      irregular: 'second-person-unknown',
    });
  });
});
