import { describe, expect, it } from 'vitest';
import { BEFORE_FIRING } from '../../domain/rules/ready-sheets/before-firing';
import { checkProgress } from '../../domain/rules/check-progress';
import type { SheetDoc } from '../../domain/book/documents/sheet';
import { CHECK, SPEC, stepRecord, trace } from './check.fixture';
import { bookWords, recordRows, whenWords } from './check-record';

const sheet: SheetDoc = {
  kind: 'sheet',
  id: 'sheet',
  parent: null,
  spec: BEFORE_FIRING,
  published: trace('sheet'),
  version: 1,
  replaces: null,
  retired: null,
};
const nameOf = (id: string | null) => (id === null ? 'author open' : id);

describe('the record of a closed check', () => {
  it('has every step: what was found, what was left out and why, and what was never done', () => {
    const check = {
      ...CHECK,
      steps: {
        'hands-out': stepRecord({ result: { type: 'confirm' } }),
        flow: stepRecord({ state: 'waived', words: 'Meter away for calibration' }),
        'second-person': stepRecord({ result: { type: 'second-person' }, witness: 'milo' }),
      },
    };
    const rows = recordRows({ progress: checkProgress(sheet, check, SPEC), nameOf, zone: 'Etc/UTC' });
    expect(rows).toHaveLength(BEFORE_FIRING.steps.length);
    const row = (key: string) => rows.find((one) => one.key === key);
    expect(row('hands-out')).toMatchObject({ no: '1', state: 'done', said: 'confirmed by ada', by: 'ada' });
    expect(row('flow')?.said).toBe('waived by ada: Meter away for calibration');
    expect(row('second-person')?.by).toBe('ada, with milo');
    expect(row('stick')).toMatchObject({ state: 'open', said: 'not done; never waived', when: '' });
  });

  it('names its place in the Book, or that it has none yet', () => {
    const book = { revision: 530, hash: 'a'.repeat(64) };
    expect(bookWords(CHECK, book)).toContain('on this tablet only');
    const taken = { ...CHECK, ended: { ...CHECK.ended!, at: 512 } };
    expect(bookWords(taken, book)).toBe(
      `Closing entry closing, revision 512 of the Book. Printed from revision 530, chain hash ${'a'.repeat(64)}.`,
    );
  });

  it('says that a clock was uncertain', () => {
    const { stamp } = trace('step');
    expect(whenWords({ ...stamp, time_uncertain: true }, 'Etc/UTC')).toMatch(/, time uncertain$/);
  });
});
