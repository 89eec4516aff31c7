import { describe, expect, it } from 'vitest';
import type { Step } from '../../domain/book/sheet-spec';
import { stepRecord } from './check.fixture';
import { recordWords, waiveWords } from './step-words';
import { afterStep, EMPTY_WALK } from './walk-draft';

const confirm: Step = { key: 'eyewear', type: 'confirm', title: 'Eyewear on', detail: '', waive: 'never' };
const nameOf = (id: string | null) => (id === 'milo' ? 'Milo Venn' : 'Ada Brook');

describe('what stands in the Book for a step', () => {
  it('names who confirmed it, and the note', () => {
    const record = stepRecord({ result: { type: 'confirm' }, words: '3 and 7' });
    expect(recordWords({ step: confirm, record, state: 'done' }, nameOf)).toBe(
      'confirmed by Ada Brook; 3 and 7',
    );
  });

  it('says that a wait without a number proves nothing', () => {
    const record = stepRecord({ result: { type: 'wait', required_s: null, waited_s: 63.4 } });
    expect(recordWords({ step: confirm, record, state: 'done' }, nameOf)).toBe(
      'waited 63\u2009s, which proves nothing',
    );
  });

  it('says outside limits, waived and the second person in words', () => {
    const reading = stepRecord({ result: { type: 'reading', value: 1.3, unit: 'bar(g)' } });
    expect(recordWords({ step: confirm, record: reading, state: 'outside-limits' }, nameOf)).toBe(
      '1.3\u2009bar(g), outside its limits',
    );
    const waived = stepRecord({ state: 'waived', words: 'no camera here' });
    expect(recordWords({ step: confirm, record: waived, state: 'waived' }, nameOf)).toBe(
      'waived by Ada Brook: no camera here',
    );
    const second = stepRecord({ result: { type: 'second-person' }, witness: 'milo' });
    expect(recordWords({ step: confirm, record: second, state: 'done' }, nameOf)).toBe('Milo Venn was there');
    expect(waiveWords('never')).toBe('never waived');
  });
});

describe('the draft of a walk', () => {
  it('forgets what was typed for a step that is done and keeps the rest', () => {
    const draft = {
      ...EMPTY_WALK,
      notes: { a: 'x', b: 'y' },
      typed: { a: '1' },
      viewed: 'a',
      again: 'a',
      keypad: true,
    };
    expect(afterStep(draft, 'a')).toEqual({ ...EMPTY_WALK, notes: { b: 'y' } });
  });
});
