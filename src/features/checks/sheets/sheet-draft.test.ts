import { describe, expect, it } from 'vitest';
import { READY_SHEETS } from '../../../domain/rules/ready-sheets/ready-sheets';
import {
  addStep,
  draftOf,
  EMPTY_SHEET,
  moveStep,
  readSheet,
  takeStepOut,
  waiveFixed,
  withStep,
  type SheetDraft,
} from './sheet-draft';

const begun: SheetDraft = { ...EMPTY_SHEET, title: 'Bench', caution: 'Charged.', purpose: 'dye-handling' };
const words = (draft: Parameters<typeof readSheet>[0]) => readSheet(draft).problems.map((one) => one.words);

describe('a sheet being written', () => {
  it.each(READY_SHEETS)('reads back $key as it was copied', ({ spec }) => {
    expect(readSheet(draftOf(spec))).toEqual({ spec, problems: [] });
  });

  it('says what an empty sheet lacks', () => {
    expect(words(EMPTY_SHEET).slice(0, 3)).toEqual([
      'Title: give the sheet a name.',
      'Caution: say what can hurt while it is walked.',
      'Steps: add at least one.',
    ]);
  });

  it('refuses limits beside their step, in words', () => {
    const draft = withStep(addStep(begun, 'reading'), 'step-1', {
      title: 'Vessel',
      quantity: 'Gauge pressure',
      unit: 'bar',
      lowest: '2',
      highest: '1',
    });
    expect(readSheet(draft).problems).toEqual([
      {
        step: 'step-1',
        words: 'Unit: bar(g) or bar(abs); bar alone is for a difference.',
        weight: 'refusal',
      },
      {
        step: 'step-1',
        words: 'The lowest limit lies above the highest: no reading could pass.',
        weight: 'refusal',
      },
    ]);
    expect(words(withStep(draft, 'step-1', { highest: '1,234' }))).toContainEqual(
      expect.stringContaining('can be read two ways'),
    );
    const right = withStep(draft, 'step-1', { from_rig: 'envelope.max_bar_g', lowest: '0', highest: '' });
    expect(readSheet(right).spec?.steps[0]).toMatchObject({ unit: 'bar(g)', lowest: 0, highest: null });
  });

  it('fixes "never" for shorting, beam stop and second person', () => {
    const added = addStep(addStep(begun, 'confirm'), 'second-person');
    const waived = withStep(withStep(added, 'step-1', { waive: 'operator' }), 'step-2', {
      waive: 'operator',
    });
    expect(waived.steps.map((step) => step.waive)).toEqual(['operator', 'never']);
    const guarded = withStep(waived, 'step-1', { guards: 'shorting' });
    expect(guarded.steps[0]?.waive).toBe('never');
    expect(waiveFixed(guarded.steps[0]!)).toBe(true);
    expect(withStep(waived, 'step-1', { title: 'Beam stop in' }).steps[0]?.waive).toBe('never');
  });

  it('moves steps by one, stops at the ends, and never uses a key twice', () => {
    const three = (['confirm', 'wait', 'photo'] as const).reduce(addStep, begun);
    const keys = (draft: typeof three) => draft.steps.map((step) => step.key);
    expect(keys(moveStep(three, 'step-1', 1))).toEqual(['step-2', 'step-1', 'step-3']);
    expect(keys(moveStep(three, 'step-1', -1))).toEqual(keys(three));
    expect(keys(addStep(takeStepOut(three, 'step-3'), 'photo'))).toEqual(['step-1', 'step-2', 'step-4']);
  });
});
