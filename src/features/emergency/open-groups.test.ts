import { describe, expect, it } from 'vitest';
import { PureBench } from '../../../tests/support/pure-bench';
import { idOf } from '../../../tests/support/pure-book';
import { openGroups } from './open-groups';

describe('entries to be claimed', () => {
  it('stand together by what they are about and when the tablet was on, the newest first', () => {
    const { book, rig, sheet } = new PureBench();
    const open = { by: null };
    const down = book.write('rig.stood-down', rig, { why: 'Smoke' }, open).entry;
    const check = book.write('check.opened', null, { rig, rig_revision: rig, sheet }, open).entry;
    const step = { step: 'hands-out', result: { type: 'confirm' as const }, note: '' };
    const done = book.write('check.step-done', check.id, step, open).entry;
    const later = { ...open, stamp: { page_life: idOf(0xcc09) } };
    const again = book.write('rig.stood-down', rig, { why: 'Smoke again' }, later).entry;
    expect(openGroups([again, done, check, down]).map((group) => group.entries)).toEqual([
      [again],
      [check, done],
      [down],
    ]);
    expect(openGroups([])).toEqual([]);
  });
});
